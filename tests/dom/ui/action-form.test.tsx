import { act } from 'react';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { ActionForm } from '@/components/forms/action-form';
import { Checkbox } from '@/components/ui/checkbox';
import { Input } from '@/components/ui/input';
import { emailField, textField, tickField } from '@/lib/core/fields';
import type { FormAction, FormState } from '@/lib/core/form-state';
import { find, press, show, showWithoutScript, type } from './stage';

const schema = z.object({ name: textField('your name'), email: emailField, rules: tickField });

/** A server that answers when told to, and remembers what it was sent. */
function aServer(answer: FormState = { status: 'done', message: 'Sent.' }) {
  const sent: Record<string, string>[] = [];
  const waiting: (() => void)[] = [];
  const action: FormAction = async (_state, form) => {
    sent.push(Object.fromEntries([...form].map(([name, value]) => [name, String(value)])));
    await new Promise<void>((resolve) => waiting.push(resolve));
    return answer;
  };
  return { action, sent, answers: () => act(async () => waiting.forEach((resolve) => resolve())) };
}

const form = (action: FormAction) => (
  <ActionForm action={action} schema={schema} submit="Send me a code" sending="Writing the letter.">
    <Input name="name" label="Name" />
    <Input name="email" label="E-mail" type="email" />
    <Checkbox name="rules" label="I know the rules" />
  </ActionForm>
);

const box = (at: HTMLElement, name: string) => find(at, `input[name=${name}]`, HTMLInputElement);
const button = (at: HTMLElement) => find(at, 'button[type=submit]', HTMLButtonElement);
const summary = (at: HTMLElement) => at.querySelector('[role=alert]');
const noteOf = (at: HTMLElement, name: string) => at.querySelector(`[id="${box(at, name).id}-error"]`)?.textContent ?? null;

describe('a form with a mistake', () => {
  it('says it beside the field without asking the server, keeps what was typed, and moves to the summary', async () => {
    const server = aServer();
    const at = show(form(server.action));
    await type(box(at, 'name'), 'Ada Fennimore');
    await type(box(at, 'email'), 'ada at home');

    await press(button(at));

    expect(server.sent).toEqual([]);
    expect(noteOf(at, 'email')).toContain('not an e-mail address we can write to');
    expect(noteOf(at, 'name')).toBeNull();
    expect(box(at, 'email').value).toBe('ada at home');
    expect(document.activeElement).toBe(summary(at));
  });

  it('leads from the summary into the field', async () => {
    const at = show(form(aServer().action));
    await press(button(at));

    await act(async () => find(at, '[role=alert] a', HTMLAnchorElement).click());

    expect(document.activeElement).toBe(box(at, 'name'));
  });

  it('takes the note away as soon as the field is right, and leaves the person in the field', async () => {
    const at = show(form(aServer().action));
    await type(box(at, 'name'), 'Ada');
    await press(button(at));
    box(at, 'email').focus();

    await type(box(at, 'email'), 'ada@fennimore.example');

    expect(noteOf(at, 'email')).toBeNull();
    expect(document.activeElement).toBe(box(at, 'email'));
  });
});

describe('a form that the server answers', () => {
  const filled = async (at: HTMLElement) => {
    await type(box(at, 'name'), 'Ada');
    await type(box(at, 'email'), 'ada@fennimore.example');
    await act(async () => box(at, 'rules').click());
  };

  it('is sent once, however often the button is pressed, and says that it is on its way', async () => {
    const server = aServer();
    const at = show(form(server.action));
    await filled(at);

    await press(button(at));
    await press(button(at));

    expect(server.sent).toEqual([{ name: 'Ada', email: 'ada@fennimore.example', rules: 'on' }]);
    expect(at.querySelector('[role=status]')?.textContent).toBe('Writing the letter.');

    await server.answers();
    expect(at.textContent).toContain('Sent.');
  });

  it('shows a refusal, with problems of fields that are not on screen, and keeps every word and tick', async () => {
    const server = aServer({
      status: 'refused',
      message: 'Those places have just gone.',
      fieldErrors: { email: ['We could not write there.'], openDayId: ['That day is over.'] },
      values: { name: 'Ada', email: 'ada@fennimore.example', rules: 'on' },
    });
    const at = show(form(server.action));
    await filled(at);

    await press(button(at));
    await server.answers();

    expect(document.activeElement).toBe(summary(at));
    expect(summary(at)?.textContent).toContain('Those places have just gone.');
    expect(noteOf(at, 'email')).toContain('We could not write there.');
    expect([...(summary(at)?.querySelectorAll('li') ?? [])].map((each) => each.querySelector('a') !== null)).toEqual([true, false]);
    expect([box(at, 'name').value, box(at, 'email').value, box(at, 'rules').checked]).toEqual(['Ada', 'ada@fennimore.example', true]);
  });

  it('can be sent again after a refusal', async () => {
    const server = aServer({ status: 'refused', message: 'The card office did not answer.' });
    const at = show(form(server.action));
    await filled(at);
    await press(button(at));
    await server.answers();

    await press(button(at));

    expect(server.sent).toHaveLength(2);
    await server.answers();
  });
});

describe('a form before its script arrives', () => {
  it('holds the values it was given in the HTML', () => {
    const { at } = showWithoutScript(
      <ActionForm action={aServer().action} submit="Save" values={{ name: 'Ben', rules: 'on' }}>
        <Input name="name" label="Name" />
        <Checkbox name="rules" label="I know the rules" />
      </ActionForm>,
    );

    expect(box(at, 'name').getAttribute('value')).toBe('Ben');
    expect(box(at, 'rules').checked).toBe(true);
  });

  it('keeps and judges what was typed before the script came', async () => {
    const server = aServer();
    const { at, wake } = showWithoutScript(form(server.action));
    box(at, 'name').value = 'Eve';
    box(at, 'email').value = 'eve@road.example';

    await wake();
    await press(button(at));

    expect(server.sent).toEqual([{ name: 'Eve', email: 'eve@road.example' }]);
    await server.answers();
  });
});
