/** Who can sign in to the demo club, what each may do there, and the password beside the code by letter. Printed by scripts/start; the demo alone has them. */
export const DEMO_SIGN_INS = [
  { name: 'Nell Abara', email: 'nell@alderfork.example', does: 'administrator: settings, people and roles, the audit trail', password: 'nell has all the keys' },
  { name: 'Cleo Haldane', email: 'cleo@alderfork.example', does: 'coordinator: open days, bookings, gates', password: 'cleo counts the gates' },
  { name: 'Wren Castellane', email: 'wren@alderfork.example', does: 'secretary: the roll and its dues', password: 'wren writes the roll' },
  { name: 'Dov Dorrell', email: 'dov@alderfork.example', does: 'treasurer: dues, refunds, the books', password: 'dov minds the cash tin' },
  { name: 'Ada Fennimore', email: 'ada@alderfork.example', does: 'member and host of the Pine Barrow Light Railway', password: 'ada stokes the engine' },
  { name: 'Ben Okonjo', email: 'ben@alderfork.example', does: 'member with dues to pay and places booked', password: 'ben brings the cake' },
] as const;

export type DemoSignIn = (typeof DEMO_SIGN_INS)[number];
