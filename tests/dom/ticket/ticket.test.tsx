import { renderToStaticMarkup } from 'react-dom/server';
import jsQR from 'jsqr';
import sharp from 'sharp';
import { describe, expect, it } from 'vitest';
import { TicketPair } from '@/components/ticket/ticket-pair';
import { TicketSheet } from '@/components/ticket/ticket-sheet';
import { toTicketView, type TicketViewFacts } from '@/lib/bookings/rules/ticket-view';

const club = { timeZone: 'America/New_York', locale: 'en-US', hourCycle: 'h23' } as const;
const payload = 'A7'.repeat(102);
const aTicket = (changes: Partial<TicketViewFacts> = {}, time: Parameters<typeof toTicketView>[1] = club) => toTicketView({
  visitId: 'f3c1b9a0-2d44-4c6e-8f5a-90ab12cd34ef', stopNumber: 1, gardenName: 'Saltmarsh & Plover', entryAt: new Date('2027-05-15T14:00:00Z'), graceUntil: new Date('2027-05-15T14:20:00Z'),
  adults: 2, children: 1, babes: 0, ticketNumber: 411, code: '7Q2MXK4D', payload, state: { kind: 'live' }, ...changes,
}, time);
const drawn = (ticket: ReturnType<typeof aTicket>) => {
  const page = document.createElement('div');
  page.innerHTML = renderToStaticMarkup(<TicketPair ticket={ticket} />);
  return page;
};

describe('a ticket', () => {
  it('says garden, day, entry time, until when, how many and its number', () => {
    const words = drawn(aTicket()).textContent ?? '';

    for (const each of ['Saltmarsh & Plover', '15 May', '2027', '10:00', 'in by 10:20', '3', 'people', '000411', '7Q2M', 'XK4D', 'Show this or say it.']) expect(words).toContain(each);
  });

  it('is one article with a name that a screen reader can say whole', () => {
    expect(drawn(aTicket()).querySelector('article')?.getAttribute('aria-label')).toBe('Ticket for Saltmarsh & Plover, 15 May 2027, 10:00, in by 10:20, 2 adults and 1 child');
  });

  it('says "person" for one, and the half of the day for a 12-hour club', () => {
    const words = drawn(aTicket({ adults: 1, children: 0, entryAt: new Date('2027-05-15T16:15:00Z') }, { ...club, hourCycle: 'h12' })).textContent ?? '';

    expect(words).toContain('12:15pm');
    expect(words).toContain('1person');
  });

  it('has its stop\'s own nip: dashed until used, cut out when used', () => {
    const live = drawn(aTicket()).innerHTML;
    const used = drawn(aTicket({ state: { kind: 'used', words: 'Came in at 10:04' } })).innerHTML;

    expect(live).toContain('stroke-dasharray="2 1.400"');
    expect(used).not.toContain('stroke-dasharray="2 1.400"');
    expect(used).toContain('fill="black"');
    expect(used).toContain('Came in at 10:04');
    expect(drawn(aTicket({ stopNumber: 3 })).innerHTML).not.toContain('M4 0A8 8 0 0 0 20 0');
  });

  it('has no QR any more after it was given back', () => {
    const page = drawn(aTicket({ state: { kind: 'given-back', words: 'Given back on 9 May' } }));

    expect(page.querySelector('[aria-label^="QR code"]')).toBeNull();
    expect(page.textContent).toContain('Given back on 9 May');
  });

  it('draws a QR with a quiet zone of 4 modules that another program reads', async () => {
    const svg = drawn(aTicket()).querySelector('[aria-label^="QR code"]');
    const [x, y, width] = (svg?.getAttribute('viewBox') ?? '').split(' ').map(Number);
    const drawing = (svg?.outerHTML ?? '').replace('<svg', '<svg xmlns="http://www.w3.org/2000/svg" width="456" height="456"').replaceAll('var(--color-sun-paper)', 'white').replaceAll('var(--color-sun-ink)', 'black');

    const picture = await sharp(Buffer.from(drawing)).ensureAlpha().raw().toBuffer();

    expect([x, y, width]).toEqual([-4, -4, 49 + 8]);
    expect(jsQR(new Uint8ClampedArray(picture), 456, 456)?.data).toBe(payload);
  });

  it('shows a hostile name as text, and a very long one whole to a screen reader', () => {
    const name = '<script>alert(1)</script> "Ünï" 🚂 שלום '.repeat(8);
    const page = drawn(aTicket({ gardenName: name }));

    expect(page.querySelector('script')).toBeNull();
    expect(page.querySelector('h3')?.textContent).toBe(name);
  });
});

describe('the sheet of pasteboards', () => {
  it('says who it is for, the way to each garden in order, and holds every ticket with lines to cut and fold on', () => {
    const page = document.createElement('div');
    page.innerHTML = renderToStaticMarkup(<TicketSheet sheet={{
      clubName: 'Test Valley Garden Railway Society', to: 'Eve Visitor', title: 'Two gardens on 15 May 2027', letter: 'Bring this sheet.',
      directions: [
        { time: '10:00', shortName: 'Saltmarsh', place: '4 Marsh Lane', note: 'Step-free.', journey: 'leave by 10:35' },
        { time: '11:30', shortName: 'Pine Barrow', place: 'by the mill', note: null, journey: null },
      ],
      tickets: [aTicket(), aTicket({ visitId: '0b7a2f7e-5b0c-4a58-9d1c-6a1f7f2f0c11', stopNumber: 3 })],
    }} />);

    expect(page.querySelector('h1')?.textContent).toBe('Two gardens on 15 May 2027');
    expect([...page.querySelectorAll('ol > li')].map((item) => item.textContent)).toEqual(['10:00Saltmarsh4 Marsh LaneStep-free.leave by 10:35', '11:30Pine Barrowby the mill']);
    expect(page.querySelectorAll('article')).toHaveLength(2);
    expect(page.innerHTML).toContain('Cut on the dashes, fold on the dots');
  });
});
