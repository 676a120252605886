import { describe, expect, it } from 'vitest';
import { Checkbox } from '@/components/ui/checkbox';
import { Input } from '@/components/ui/input';
import { RadioGroup } from '@/components/ui/radio-group';
import { Select } from '@/components/ui/select';
import { Textarea } from '@/components/ui/textarea';
import { find, show } from './stage';

const described = (at: HTMLElement, control: Element) =>
  (control.getAttribute('aria-describedby') ?? '').split(' ').map((id) => at.querySelector(`[id="${id}"]`)?.textContent);

describe('a field', () => {
  it('is named by its label, and a press on the label reaches the box', () => {
    const at = show(<Input name="email" label="E-mail" />);

    const label = find(at, 'label', HTMLLabelElement);

    expect(label.textContent).toBe('E-mail');
    expect(label.control).toBe(find(at, 'input', HTMLInputElement));
  });

  it('has its hint and its mistake read out with the box', () => {
    const at = show(<Input name="code" label="Ticket code" hint="Eight characters" errors={['There is no letter O in our codes. Try a nought.']} />);

    const box = find(at, 'input', HTMLInputElement);

    expect(box.getAttribute('aria-invalid')).toBe('true');
    expect(described(at, box)).toEqual(['Eight characters', 'Mistake: There is no letter O in our codes. Try a nought.']);
  });

  it('is not called wrong, and points at nothing, when there is neither hint nor mistake', () => {
    const at = show(<Textarea name="notes" label="Notes" />);

    const box = find(at, 'textarea', HTMLTextAreaElement);

    expect(box.hasAttribute('aria-invalid')).toBe(false);
    expect(box.hasAttribute('aria-describedby')).toBe(false);
  });

  it('says that it is needed without the browser stopping the form', () => {
    const at = show(<Input name="name" label="Name" required />);

    const box = find(at, 'input', HTMLInputElement);

    expect(box.getAttribute('aria-required')).toBe('true');
    expect(box.required).toBe(false);
  });

  it('holds what it was given in the HTML itself', () => {
    const at = show(
      <>
        <Input name="people" label="People" defaultValue="3" />
        <Select name="by" label="Coming" defaultValue="bus" choices={[{ value: 'car', label: 'by car' }, { value: 'bus', label: 'by bus' }]} />
        <Checkbox name="steps" label="Step-free only" defaultChecked />
      </>,
    );

    expect(find(at, 'input[name=people]', HTMLInputElement).getAttribute('value')).toBe('3');
    expect(find(at, 'select', HTMLSelectElement).value).toBe('bus');
    expect(find(at, 'input[type=checkbox]', HTMLInputElement).checked).toBe(true);
  });

  it('tells a group of choices by its legend, with the mistake', () => {
    const choices = [{ value: 'car', label: 'by car' }, { value: 'foot', label: 'on foot' }];
    const at = show(<RadioGroup name="by" label="How do you come" choices={choices} errors={['Choose one.']} />);

    const group = find(at, 'fieldset', HTMLFieldSetElement);

    expect(find(group, 'legend', HTMLLegendElement).textContent).toBe('How do you come');
    expect(described(at, group)).toEqual(['Mistake: Choose one.']);
    expect([...group.querySelectorAll('input')].map((each) => each.labels?.[0]?.textContent)).toEqual(['by car', 'on foot']);
  });
});
