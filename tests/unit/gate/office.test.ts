import jsQR from 'jsqr';
import { describe, expect, test } from 'vitest';
import { gateSums, toOfficeGates } from '@/lib/gate/views/office';
import { passCardOf, toPassCard } from '@/lib/gate/views/pass-card';
import { at, club, fact } from './cast';

describe('all gates on the staff copy', () => {
  const found = {
    day: { title: 'Test Open Gardens', heldOn: '2027-05-15', calledOffAt: null },
    gates: [{ stopId: 's1', number: 1, garden: 'Saltmarsh', headsLimit: 28 }, { stopId: 's2', number: 2, garden: 'Mossgill', headsLimit: 20 }],
    expected: [{ stopId: 's1', heads: 21 }],
    passes: [
      { gatePassId: 'p2', stopId: 's2', helper: 'Ben', madeAt: at('09:00'), revokedAt: at('10:00'), devicesAllowed: 1, devices: 0, seenAt: null },
      { gatePassId: 'p1', stopId: 's1', helper: 'Gus', madeAt: at('09:30'), revokedAt: null, devicesAllowed: 2, devices: 1, seenAt: at('11:40') },
    ],
    facts: new Map([['s1', [fact(), fact({ kind: 'count-out', visitId: null, adults: 1, children: 0 }), fact({ kind: 'refuse' })]]]),
  };

  test('a gate nobody came to yet stands at nought', () => {
    const { gates } = toOfficeGates(found, { ...club, babesTakePlace: false });

    expect(gates).toMatchObject([{ expected: 21, cameIn: 3, now: 2, refusals: 1 }, { expected: 0, cameIn: 0, now: 0, refusals: 0 }]);
  });

  test('passes stand in the order of their gates, and say whether they were opened, seen or taken back', () => {
    const { passes } = toOfficeGates(found, { ...club, babesTakePlace: false });

    expect(passes.map(({ helper, phonesText, seenText, isLive }) => [helper, phonesText, seenText, isLive]))
      .toEqual([['Gus', '1 of 2 phones', 'seen 11:40', true], ['Ben', '0 of 1 phone', 'taken back 15 May 2027, 10:00', false]]);
  });

  test('the day is summed in one sentence', () => {
    expect(gateSums(toOfficeGates(found, { ...club, babesTakePlace: false }))).toBe('3 of 21 heads let in, 2 in the gardens now, 1 pass handed out.');
  });
});

describe('the card of a new gate pass', () => {
  const card = toPassCard({ helper: 'Gus', garden: 'Saltmarsh', secret: 'aVerySecretSecret' }, 'https://club.example');

  test('has the pass in the fragment, which no server or log sees', () => {
    expect(card.link).toBe('https://club.example/gate#aVerySecretSecret');
  });

  test('is read by an independent decoder as its own link', () => {
    const size = Number(card.size);
    const scale = 4;
    const pixels = new Uint8ClampedArray(size * size * scale * scale * 4).fill(255);
    for (const [, x, y] of card.path.matchAll(/M(\d+) (\d+)h1/g)) {
      for (let dy = 0; dy < scale; dy += 1) {
        for (let dx = 0; dx < scale; dx += 1) pixels.fill(0, ((Number(y) * scale + dy) * size * scale + Number(x) * scale + dx) * 4, ((Number(y) * scale + dy) * size * scale + Number(x) * scale + dx) * 4 + 3);
      }
    }

    expect(jsQR(pixels, size * scale, size * scale)?.data).toBe(card.link);
  });

  test('is found again in the form that made it, and in no other', () => {
    expect(passCardOf({ status: 'done', fact: card })).toEqual(card);
    expect(passCardOf({ status: 'idle' })).toBeNull();
  });
});
