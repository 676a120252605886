import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { calendarLetter, confirmationLetter, givenBackLetter, peopleWords, reminderLetter, type BookingFacts, type LetterClub, type LetterVisit } from '@/lib/letters/rules/booking-letter';
import { escapeHtml } from '@/lib/letters/rules/escape-html';
import { letterHtml } from '@/lib/letters/rules/html';
import { blanked } from '@/lib/letters/rules/letter';
import { noticeLetter, signInLetter } from '@/lib/letters/rules/other-letters';
import { letterText } from '@/lib/letters/rules/plain';
import { oneLine } from '@/lib/letters/rules/printable';

const club: LetterClub = {
  name: 'Test Valley Garden Railway Society', footLine: 'founded in a shed', email: 'club@testvalley.example', timeZone: 'America/New_York', locale: 'en-US', hourCycle: 'h23',
  currency: 'USD', addressReleaseHours: 72, refundRules: [{ hoursBefore: 168, percent: 100 }, { hoursBefore: 1, percent: 50 }], changesEndMinutes: 60,
};
const aVisit = (stopNumber: number, time: string, changes: Partial<LetterVisit> = {}): LetterVisit => {
  const arrivesAt = new Date(`2027-05-15T${time}:00-04:00`);
  return {
    visitId: `visit ${stopNumber}`, version: 1, stopNumber, gardenName: `Garden ${stopNumber} Railway`, shortName: `Garden ${stopNumber}`, area: 'by the river', address: null, directions: null,
    arrivesAt, leavesAt: new Date(arrivesAt.getTime() + 35 * 60_000), graceUntil: new Date(arrivesAt.getTime() + 20 * 60_000), adults: 2, children: 1, babes: 0,
    isGivenBack: false, isSteam: false, hasWater: false, isStepFree: true, stepsNote: null, cautions: [], minutesFromLast: null, ...changes,
  };
};
const aBooking = (changes: Partial<BookingFacts> = {}): BookingFacts => ({
  code: '7Q2MXK4D', madeAt: new Date('2027-05-01T16:00:00Z'), totalMinor: 4000, heldOn: '2027-05-15', title: 'May gardens', placeLine: 'in the test valley', releasesAt: new Date('2027-05-12T14:00:00Z'),
  isCancelled: false, emailIsConfirmed: false, wantsInvitations: true, link: 'https://club.example/bookings/7Q2MXK4D/link/s3cret',
  visits: [aVisit(1, '10:00'), aVisit(3, '11:30', { minutesFromLast: 15, isSteam: true, hasWater: true })], ...changes,
});

describe('what a confirmation says', () => {
  const text = letterText(confirmationLetter(aBooking(), club));

  it.each([
    ['the day', 'Your day in two gardens'], ['date and place', 'Saturday 15 May 2027, in the test valley'], ['people, money and code', '2 adults and 1 child. $40.00 is paid. If a phone fails, say this at the gate: 7Q2M XK4D.'],
    ['arrival and departure', 'arr. 10:00  dep. 10:35  garden 1: Garden 1 Railway'], ['the journey with what is to spare', '15 minutes by road'], ['a warning', 'live steam, and water: hold small hands'],
    ['when addresses come', 'from Wednesday 12 May'], ['rain', 'Trains run in rain'], ['the refund rule', 'Given back until a week before a time: all of it is returned.'], ['care', 'Live steam stays hot after it has stopped.'],
  ])('says %s', (_, words) => {
    expect(text).toContain(words);
  });

  it('says when places were free, and who comes where when it is not the same everywhere', () => {
    const free = letterText(confirmationLetter(aBooking({ totalMinor: 0, visits: [aVisit(1, '10:00'), aVisit(3, '11:30', { adults: 1, children: 0 })] }), club));

    expect(free).toContain('2 adults and 1 child at Garden 1 and 1 adult at Garden 3. They cost nothing.');
  });

  it('promises a reminder only to who books before the addresses are released', () => {
    const released = new Date('2027-05-12T14:00:00Z');

    expect(confirmationLetter(aBooking({ madeAt: new Date(released.getTime() - 1) }), club).foot).toContain('one reminder follows');
    expect(confirmationLetter(aBooking({ madeAt: released }), club).foot).not.toContain('reminder');
  });

  it('leads to itself in large print', () => {
    expect(letterHtml(confirmationLetter(aBooking(), club))).toContain('/link/s3cret?print=large');
  });

  it('leaves out what was given back', () => {
    const one = confirmationLetter(aBooking({ visits: [aVisit(1, '10:00'), aVisit(3, '11:30', { isGivenBack: true })] }), club);

    expect(one.title).toBe('Your day in\none garden');
    expect(letterText(one)).not.toContain('Garden 3');
  });
});

describe('the other letters of a booking', () => {
  it('tell a reminded but unconfirmed e-mail nothing but the link', () => {
    const text = letterText(reminderLetter(aBooking(), club));

    expect(text).toContain('/link/s3cret');
    expect(text).not.toMatch(/7Q2M XK4D|Garden 1 Railway|by the river/);
  });

  it('thank a party that gave everything back, and say what comes back', () => {
    const all = aBooking({ visits: [aVisit(1, '10:00', { isGivenBack: true })] });

    expect(letterText(givenBackLetter(all, { was: ['2 adults at Garden 1'], refundMinor: 1600 }, club))).toContain('Given back: 2 adults at Garden 1. Thank you for telling us: someone else can come. $16.00 is on its way back the way you paid.');
  });

  it('say in one line what a calendar letter is for', () => {
    const booking = aBooking();

    expect(calendarLetter(booking, aVisit(1, '10:00'), club).subject).toBe('Garden 1 Railway, Saturday 15 May 2027, 10:00');
    expect(calendarLetter(booking, aVisit(1, '10:00', { isGivenBack: true }), club).subject).toBe('Given back: Garden 1 Railway, Saturday 15 May 2027, 10:00');
  });

  it('count people in words', () => {
    expect(peopleWords({ adults: 1, children: 2, babes: 1 })).toBe('1 adult, 2 children and 1 babe in arms');
    expect(peopleWords({ adults: 2, children: 0, babes: 0 })).toBe('2 adults');
  });
});

describe('the office\'s copy', () => {
  it('has no code, no private link and no address in it, as HTML or as text', () => {
    const known = aBooking({ emailIsConfirmed: true, visits: [aVisit(1, '10:00', { address: '4 Marsh Lane', directions: 'The green gate' })] });
    for (const letter of [confirmationLetter(aBooking(), club), reminderLetter(known, club), signInLetter({ code: '493817', minutes: 15, link: 'https://club.example/sign-in/link/s3cret' }, club)]) {
      const copy = blanked(letter);

      expect(letterHtml(copy) + letterText(copy)).not.toMatch(/s3cret|7Q2M|493817|Marsh Lane|green gate/);
      expect(letterText(copy)).toContain('(blanked)');
    }
  });
});

describe('the HTML of a letter', () => {
  const html = letterHtml(confirmationLetter(aBooking(), club));

  it('fetches nothing, and asks for the evening where the mail program has one', () => {
    expect(html).not.toMatch(/<(img|link|script|iframe)|url\(|@import|src=/i);
    expect(html).toContain('name="color-scheme" content="light dark"');
    expect(html).toContain('prefers-color-scheme:dark');
  });

  it('draws the day as table cells only from two gardens on, and stays well below the size at which mail programs cut', () => {
    const many = aBooking({ visits: [...Array(7).keys()].map((at) => aVisit(at + 1, `${10 + at}:00`)) });

    expect(html).toContain('The same day as a line');
    expect(letterHtml(confirmationLetter(aBooking({ visits: [aVisit(1, '10:00')] }), club))).not.toContain('The same day as a line');
    expect(letterHtml(confirmationLetter(many, club)).length).toBeLessThan(90_000); // common practice, no source: about 100 kB
  });

  it('gives every row of the drawn day the same width', () => {
    const rows = /table-layout:fixed;border-collapse:separate">(.*?)<\/table>/s.exec(html)?.[1]?.split('<tr>').slice(1) ?? [];
    const widths = rows.map((row) => [...row.matchAll(/<td([^>]*)>/g)].slice(1).reduce((sum, [, attributes]) => sum + Number(/colspan="(\d+)"/.exec(attributes ?? '')?.[1] ?? 1), 0));

    expect(rows).toHaveLength(3);
    expect(new Set(widths).size).toBe(1);
  });

  it('shows whatever a person typed as text', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 60 }), (typed) => {
        const shown = letterHtml(noticeLetter({ subject: typed, body: `x ${typed}` }, club));

        expect(shown.replaceAll(escapeHtml(typed), '')).not.toContain('<script');
        expect(escapeHtml(typed)).not.toMatch(/[<>"']/);
        expect(oneLine(typed)).not.toMatch(/[\r\n\u0000-\u001f\u202a-\u202e\u2066-\u2069]/);
      }),
    );
    expect(letterHtml(noticeLetter({ subject: 'Coats', body: '<script>alert("1")</script> & \u202Egnp.exe' }, club))).toContain('&lt;script&gt;alert(&quot;1&quot;)&lt;/script&gt; &amp; gnp.exe');
  });
});
