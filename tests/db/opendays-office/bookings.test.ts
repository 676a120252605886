import { beforeAll, describe, expect, it } from 'vitest';
import { bookingLines, daysWithBookings, findOfficeBooking, visitsOfBooking } from '@/lib/bookings/office-queries';
import { showSpokenCode } from '@/lib/bookings/rules/spoken-code';
import { lettersOfBooking } from '@/lib/letters/queries/of-booking';
import { bookingsInput } from '@/lib/opendays/schema';
import { aClub, cleo, ctxOf } from '@/tests/support/cast';
import { keep } from '../bookings/hold-cast';
import { aFreeDay, aParty } from './office-cast';

describe('the office\'s bookings', () => {
  let day: Awaited<ReturnType<typeof aFreeDay>>;
  let eve: Awaited<ReturnType<typeof aParty>>;

  beforeAll(async () => {
    await aClub();
    day = await aFreeDay({ capacity: 28 });
    eve = await aParty(day.day.id, [day.time.id], { name: 'Eve Marlow', email: 'eve+gardens@visitors.example' });
    await aParty(day.day.id, [day.time.id], { name: '100 % Steam 🚂', email: 'steam@visitors.example', people: { adults: 5, children: 0, babes: 0 } });
    await keep(day.day.id, [day.time.id]);
    const other = await aFreeDay();
    await aParty(other.day.id, [other.time.id], { name: 'Finn Quist', email: 'finn@visitors.example' });
  });

  const names = async (asked: Record<string, string>) => (await bookingLines(await ctxOf(await cleo()), bookingsInput.parse(asked))).lines.map((line) => line.name);

  it('are found by a part of the name or e-mail, and by the code however it is typed', async () => {
    expect(await names({ find: 'marl' })).toEqual(['Eve Marlow']);
    expect(await names({ find: 'EVE+GARDENS@' })).toEqual(['Eve Marlow']);
    expect(await names({ find: showSpokenCode(eve.code).toLowerCase().replace(' ', '-') })).toEqual(['Eve Marlow']);
    expect(await names({ find: eve.code.slice(0, 5) })).toContain('Eve Marlow');
    expect(await names({ find: 'nobody of that name' })).toEqual([]);
  });

  it('take the wildcards of a search literally', async () => {
    expect(await names({ find: '%' })).toEqual(['100 % Steam 🚂']);
    expect(await names({ find: '_' })).toEqual([]);
  });

  it('are those of one open day when it is asked for, sorted as asked, without parties that still decide', async () => {
    expect(await names({ day: day.day.slug, sort: 'people', order: 'desc' })).toEqual(['100 % Steam 🚂', 'Eve Marlow']);
    expect(await names({ day: day.day.slug, sort: 'name', order: 'asc' })).toEqual(['100 % Steam 🚂', 'Eve Marlow']);
    expect(await names({ sort: 'name' })).toHaveLength(3);
    expect(await daysWithBookings(await ctxOf(await cleo()))).toHaveLength(2);
  });

  it('open to the party, its visits and its letters; a hold does not', async () => {
    const ctx = await ctxOf(await cleo());
    const booking = (await findOfficeBooking(ctx, eve.code)) ?? expect.fail('it is confirmed');

    expect(booking).toMatchObject({ name: 'Eve Marlow', slug: day.day.slug });
    expect(await visitsOfBooking(ctx, booking.id)).toMatchObject([{ adults: 2, cameIn: 0, number: 1 }]);
    expect((await lettersOfBooking(ctx, booking.id)).map((letter) => letter.kind).sort()).toEqual(['calendar', 'confirmation']);
    expect(await findOfficeBooking(ctx, '00000000')).toBeNull();
  });
});
