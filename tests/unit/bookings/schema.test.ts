import { describe, expect, it } from 'vitest';
import { boardFormInput, changeInput, detailsInput, giveBackInput, holdInput } from '@/lib/bookings/schema';
import { newId } from '@/lib/core/ids';
import { readForm } from '@/lib/core/form-data';

const day = newId<'openDay'>();
const [first, second] = [newId<'entryTime'>(), newId<'entryTime'>()];
const wish = { entryTimeId: first, adults: 2, children: 0, babes: 0 };

describe('what a party asks for, as JSON', () => {
  it('is read with its people', () => {
    expect(holdInput.parse({ openDayId: day, wanted: [wish, { entryTimeId: second, adults: '1' }] }))
      .toEqual({ openDayId: day, insists: false, wanted: [wish, { entryTimeId: second, adults: 1, children: 0, babes: 0 }] });
  });

  it.each([
    ['no times', { wanted: [] }],
    ['fifteen times', { wanted: Array.from({ length: 15 }, () => ({ ...wish, entryTimeId: newId() })) }],
    ['the same time twice', { wanted: [wish, wish] }],
    ['a forged id', { wanted: [{ ...wish, entryTimeId: "1'; drop table visits; --" }] }],
    ['another kind of day', { openDayId: '15 May' }],
    ['less than nobody', { wanted: [{ ...wish, adults: -1 }] }],
    ['a thousand million people', { wanted: [{ ...wish, adults: 1e9 }] }],
    ['half a person', { wanted: [{ ...wish, adults: 3.5 }] }],
    ['people as text with letters', { wanted: [{ ...wish, adults: 'two' }] }],
    ['no list at all', { wanted: 'everything' }],
    ['nothing', undefined],
  ])('is refused with %s', (_what, change) => {
    const asked = change === undefined ? null : { openDayId: day, wanted: [wish], ...change };

    expect(holdInput.safeParse(asked).success).toBe(false);
  });

  it('never reads a price, a code or a name that someone adds', () => {
    const read = holdInput.parse({ openDayId: day, wanted: [{ ...wish, adultMinor: 1, heads: 0 }], totalMinor: 1, code: 'AAAAAAAA' });

    expect(read).toEqual({ openDayId: day, insists: false, wanted: [wish] });
  });
});

describe('what a party asks for, as the board’s form', () => {
  const form = (...fields: [string, string][]) => {
    const data = new FormData();
    for (const [name, value] of fields) data.append(name, value);
    return readForm(data);
  };

  it('has the same people at every ticked time', () => {
    const typed = form(['openDayId', day], ['adults', '2'], ['children', ''], ['babes', '1'], ['entryTimeId[]', first], ['entryTimeId[]', second]);

    expect(boardFormInput.parse(typed)).toEqual({ openDayId: day, insists: false, wanted: [first, second].map((entryTimeId) => ({ entryTimeId, adults: 2, children: 0, babes: 1 })) });
  });

  it('says so when no time is ticked', () => {
    expect(boardFormInput.safeParse(form(['openDayId', day], ['adults', '2'])).error?.issues[0]?.message).toBe('Choose at least one entry time.');
  });

  it('knows "choose it all the same" without JavaScript', () => {
    expect(boardFormInput.parse(form(['openDayId', day], ['adults', '2'], ['entryTimeId[]', first], ['insists', 'on'])).insists).toBe(true);
  });
});

describe('who the party is', () => {
  const details = { bookingId: newId<'booking'>(), name: 'Eve Marlow', email: 'eve@visitors.example', phone: '', rulesAgreed: 'on', wantsInvitations: 'on' };

  it.each([
    ['a leaf and a train', 'Eve 🌿🚂 Marlow'],
    ['four-byte characters', '𠮷野 さくら'],
    ['right-to-left text', 'حواء مارلو'],
    ['an apostrophe and a dash', 'Zoë O’Hara-Łuczak'],
    ['what looks like HTML', '<b>Eve</b> & sons'],
    ['what looks like SQL', "Robert'); drop table bookings; --"],
  ])('keeps a name with %s as it is', (_what, name) => {
    expect(detailsInput.parse({ ...details, name }).name).toBe(name);
  });

  it('drops what turns text round, which could dress a name up as another', () => {
    expect(detailsInput.parse({ ...details, name: 'Eve \u202Egnp.exe' }).name).toBe('Eve gnp.exe');
  });

  it.each(['eve+spring@visitors.example', '"eve marlow"@visitors.example', "o'hara@visitors.example"])('takes %s for an e-mail address', (email) => {
    expect(detailsInput.parse({ ...details, email }).email).toBe(email);
  });

  it.each([
    ['a name of 300 characters', { name: 'x'.repeat(300) }, 'name'],
    ['no name', { name: '  ' }, 'name'],
    ['an address without a place', { email: 'eve@' }, 'email'],
    ['two addresses', { email: 'eve@a.example, bob@b.example' }, 'email'],
    ['a header in the address', { email: 'eve@a.example\r\nBcc: all@b.example' }, 'email'],
    ['a telephone of letters', { phone: 'call me' }, 'phone'],
    ['the rules not agreed to', { rulesAgreed: undefined }, 'rulesAgreed'],
  ])('says beside the field what is wrong with %s', (_what, change, field) => {
    const { error } = detailsInput.safeParse({ ...details, ...change });

    expect(error?.issues.map((issue) => issue.path[0])).toEqual([field]);
  });

  it('has no invitations when the party unticks them', () => {
    expect(detailsInput.parse({ ...details, wantsInvitations: undefined }).wantsInvitations).toBe(false);
  });
});

describe('what a party gives back or changes', () => {
  it.each(['0', '-1', '3.5', 'x', '1e3'])('refuses the version %s', (version) => {
    expect(giveBackInput.safeParse({ visitId: newId(), version, adults: '1' }).success).toBe(false);
    expect(changeInput.safeParse({ visitId: newId(), version, entryTimeId: first }).success).toBe(false);
  });
});
