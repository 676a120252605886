/** One lock or constraint taken out, and the test that must then fail. Each `from` stands exactly once in its file. */
export type Mutant = { what: string; file: string; from: string; to: string; test: string; named: string };

const RACES = 'tests/db/bookings/races.test.ts';
const PAYMENTS = 'tests/db/bookings/payment-races.test.ts';

export const mutants: Mutant[] = [
  {
    // Without any order the rows come as they lie on disk, alike for everyone; in the party's own order they do not.
    what: 'the lock on entry times in id order', file: 'migrations/0003_hold_facts.sql', from: ' ORDER BY e.id FOR NO KEY UPDATE', to: ' ORDER BY array_position(ids, e.id) FOR NO KEY UPDATE',
    test: RACES, named: 'serves 200 parties that want three times each',
  },
  {
    what: 'the condition that places are left', file: 'migrations/0003_hold_facts.sql', from: 'e.taken + w.delta <= e.capacity AND ', to: '',
    test: RACES, named: 'gives 40 places to 20 of 400 parties',
  },
  {
    what: 'the constraint against overselling', file: 'migrations/0000_tables.sql',
    from: '\tCONSTRAINT "entry_times_never_oversold" CHECK (0 <= "entry_times"."taken" and "entry_times"."taken" <= "entry_times"."capacity"),\n', to: '',
    test: 'tests/db/bookings/hold.test.ts', named: 'is kept from overselling by the database itself',
  },
  {
    what: 'one hold a browser and open day', file: 'migrations/0000_tables.sql',
    from: 'CREATE UNIQUE INDEX "bookings_one_hold_a_browser"', to: 'CREATE INDEX "bookings_one_hold_a_browser"',
    test: RACES, named: 'gives the two tabs of one browser one hold',
  },
  {
    what: 'the lock on a hold that is given back', file: 'lib/bookings/commands/places.ts',
    from: ".from(bookings).where(eq(bookings.id, bookingId)).for('no key update'));", to: '.from(bookings).where(eq(bookings.id, bookingId)));',
    test: PAYMENTS, named: 'keeps longer or gives back, never both',
  },
  {
    what: 'the lock on a party’s own hold', file: 'lib/bookings/commands/keeping.ts',
    from: "eq(bookings.holderHash, actor.holderHash))).for('no key update'));", to: 'eq(bookings.holderHash, actor.holderHash))));',
    test: PAYMENTS, named: 'opens one payment when Pay is pressed in two tabs',
  },
  {
    what: 'a payment and its outcome only once', file: 'migrations/0000_tables.sql',
    from: 'CREATE UNIQUE INDEX "card_payments_once"', to: 'CREATE INDEX "card_payments_once"',
    test: PAYMENTS, named: 'confirms once when the webhook comes ten times',
  },
  {
    what: 'the lock on the booking that money came for', file: 'lib/bookings/commands/apply-payment.ts',
    from: "eq(bookings.id, known.bookingId)).for('no key update'));", to: 'eq(bookings.id, known.bookingId)));',
    test: PAYMENTS, named: 'ends with the places paid for when it is told',
  },
  {
    what: 'the lock on a booking whose people are given back', file: 'lib/bookings/commands/standing.ts',
    from: "eq(bookings.id, owner.bookingId)).for('no key update');", to: 'eq(bookings.id, owner.bookingId));',
    test: 'tests/db/bookings/changes.test.ts', named: 'happens once when pressed twice at once',
  },
  {
    what: 'the lock on a party at the gate', file: 'lib/gate/commands.ts',
    from: ".orderBy(asc(bookings.id)).for('no key update');", to: '.orderBy(asc(bookings.id));',
    test: 'tests/db/gate/facts.test.ts', named: 'lets the last people in by one of two phones',
  },
];
