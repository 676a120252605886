import { describe, expect, it } from 'vitest';
import { Bill } from '@/components/layout/bill';
import { besleyBlackEm } from '@/components/layout/besley-black';
import { billFit } from '@/components/layout/bill-fit';
import { find, show } from './stage';

const MEASURE = 1184;
const widthOf = (name: string) => {
  const { lines, fit } = billFit(name);
  return Math.max(...lines.map(besleyBlackEm)) * (fit / 100) * MEASURE;
};

describe('the name on a bill', () => {
  it.each(['Spring Open Gardens', 'Pine Barrow Light Railway', 'When things are otherwise'])('fills the measure on one line: %s', (name) => {
    expect(billFit(name).lines).toEqual([name]);
    expect(widthOf(name)).toBeGreaterThan(MEASURE * 0.95);
    expect(widthOf(name)).toBeLessThanOrEqual(MEASURE);
  });

  it('is set on two even lines rather than small when it is long', () => {
    const { lines } = billFit('The Upper Alder Valley and Saltings Joint Garden Railway Preservation Society');

    expect(lines.length).toBeGreaterThan(1);
    expect(lines.join(' ')).toBe('The Upper Alder Valley and Saltings Joint Garden Railway Preservation Society');
  });

  it.each(['W'.repeat(70), 'Łódź & Żółw', '園芸鉄道の庭園公開日', '', 'a'])('never sticks out, whatever is typed: "%s"', (name) => {
    const { fit, fitWords } = billFit(name);

    expect(widthOf(name)).toBeLessThanOrEqual(MEASURE);
    expect(Number.isFinite(fit) && Number.isFinite(fitWords)).toBe(true);
  });

  it('lets the longest word decide on a phone', () => {
    const { fitWords } = billFit('Spring Open Gardens');

    expect(besleyBlackEm('Gardens') * (fitWords / 100) * 350).toBeLessThanOrEqual(350);
    expect(fitWords).toBeGreaterThan(billFit('Spring Open Gardens').fit);
  });

  it('is read out as one name, however it is broken', () => {
    const name = 'The Upper Alder Valley and Saltings Joint Garden Railway Preservation Society';

    const at = show(<Bill name={name} line="Saturday 15 May 2027" />);

    expect(find(at, 'h1', HTMLHeadingElement).textContent).toBe(name);
  });
});
