import { describe, expect, it } from 'vitest';
import { lineOf, type LineFacts } from '@/lib/dues/rules/line';

const CLUB = { locale: 'en-US', currency: 'USD' };
const TODAY = '2027-05-01';
const facts = (changes: Partial<LineFacts> = {}): LineFacts => ({ joinedOn: '2016-03-24', standing: { kind: 'paid', to: '2027-12-31' }, payments: [], firstHosted: null, ...changes });
const said = (changes: Partial<LineFacts>) => lineOf(facts(changes), TODAY, CLUB).map((each) => `${each.isLaid ? '' : 'to come: '}${each.name} ${each.on}${each.note === '' ? '' : ` (${each.note})`}`);

describe('a household\'s line', () => {
  it('begins with joining and ends with the day dues are paid to, which has no rail yet', () => {
    expect(said({})).toEqual(['joined 2016-03-24', 'to come: paid to 2027-12-31']);
  });

  it('puts every fact in the order of its day', () => {
    const payments = [{ on: '2026-01-05', amountMinor: 6200, method: 'card' as const, reference: null }, { on: '2016-03-24', amountMinor: 4800, method: 'cheque' as const, reference: 'no. 204' }];

    expect(said({ payments, firstHosted: { on: '2018-05-26', railway: 'Fennick Quay Tramway' } })).toEqual([
      'joined 2016-03-24', 'paid 2016-03-24 ($48.00, cheque, no. 204)', 'hosted first 2018-05-26 (Fennick Quay Tramway)', 'paid 2026-01-05 ($62.00, card)', 'to come: paid to 2027-12-31',
    ]);
  });

  it('shows the newest four of many payments', () => {
    const payments = ['2021', '2022', '2023', '2024', '2025', '2026'].map((year) => ({ on: `${year}-01-05`, amountMinor: 6200, method: 'cash' as const, reference: null }));

    expect(said({ payments }).filter((each) => each.startsWith('paid 20')).map((each) => each.slice(5, 9))).toEqual(['2023', '2024', '2025', '2026']);
  });

  it.each([
    { standing: { kind: 'kept', owingSince: '2027-04-01', keptOnTo: '2027-05-16', owedMinor: 6200 } as const, ends: ['owing 2027-04-01', 'to come: kept on to 2027-05-16 (then lapses)'] },
    { standing: { kind: 'kept', owingSince: '2027-03-17', keptOnTo: TODAY, owedMinor: 6200 } as const, ends: ['owing 2027-03-17', `kept on to ${TODAY} (then lapses)`] },
    { standing: { kind: 'lapsed', owingSince: '2027-01-01', keptOnTo: '2027-02-15', owedMinor: 6200 } as const, ends: ['owing 2027-01-01', 'lapsed 2027-02-15'] },
    { standing: { kind: 'left', on: '2027-03-03' } as const, ends: ['left 2027-03-03'] },
    { standing: { kind: 'life', since: '2016-03-24' } as const, ends: [] },
    { standing: { kind: 'new', owedMinor: 6200 } as const, ends: [] },
  ])('ends as the household stands: $standing.kind', ({ standing, ends }) => {
    expect(said({ standing })).toEqual(['joined 2016-03-24', ...ends]);
  });

  it('says "hosts first" of an open day that is still to come', () => {
    expect(said({ standing: { kind: 'life', since: '2016-03-24' }, firstHosted: { on: '2027-05-15', railway: 'Old Orchard Line' } })).toContain('to come: hosts first 2027-05-15 (Old Orchard Line)');
  });
});
