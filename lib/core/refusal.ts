/**
 * Every "no" the product can say, with the one sentence a person reads. Rules return codes, commands throw them,
 * edges catch them. A sentence says what is so and what to do next.
 */
export const REFUSALS = {
  // anyone
  not_found: 'That is not here any more, or never was. Go back and choose again.',
  not_allowed: 'That is not yours to change. Sign in as someone who may, or ask an officer.',
  too_many_tries: 'Too many tries in a short while. Wait a few minutes, then try again.',
  busy: 'Many people are changing that just now, so nothing was done. Try again in a moment.',
  wrong_origin: 'That came from another website, so it was not done. Open this page again and try from here.',
  changed_meanwhile: 'Someone changed this while you were looking. Look again, then decide.',
  // holds and bookings
  places_gone: 'Those places went to someone else a moment ago. Choose another time; the rest of your choice is kept.',
  entry_time_closed: 'That entry time is closed. Choose another.',
  entry_time_over: 'That entry time is over. Choose a later one.',
  open_day_not_open: 'This open day is not taking bookings.',
  wrong_open_day: 'Those times belong to different open days. Choose times of one day.',
  nobody_in_party: 'Say how many people are coming: at least one.',
  child_needs_adult: 'A party with children needs at least one adult.',
  party_too_large: 'That is more people than one party can bring. For a school or a club, write to the coordinator.',
  too_many_for_day: 'That is more visits than one party may hold on one open day. Leave one out.',
  clash: 'Two of those times cannot both be reached. Choose another, or choose it all the same.',
  hold_over: 'The places are no longer kept for you. Choose again; what you typed is still here.',
  hold_not_longer: 'These places cannot be kept any longer. Pay now, or choose again.',
  hold_paying: 'A payment is open for these places. Finish it, or wait until it ends.',
  terms_not_agreed: 'Tick that everyone in your party will keep to the visit rules.',
  nothing_to_pay: 'There is nothing to pay.',
  must_be_paid: 'These places must be paid for before they are yours.',
  changes_over: 'Changes ended before this entry time. Ask the coordinator.',
  dearer: 'That time costs more than yours. Choose one at the same or a lower price.',
  already_given_back: 'Those places are given back already.',
  already_came_in: 'That ticket has been used at the gate, so it cannot be changed.',
  more_than_booked: 'That is more people than the ticket carries.',
  called_off: 'This open day is called off.',
  // cards
  cards_unavailable: 'The card service did not answer, and no money has moved. Your places are still kept; try the payment again.',
  refund_too_large: 'That is more than was paid and not yet given back.',
  // people
  wrong_code: 'That code is not right, or it is used up. Ask for a new one.',
  wrong_password: 'That address and password do not belong together. Try again, or ask for a code by letter.',
  password_too_short: 'A password needs at least 15 characters. Four words are good.',
  password_too_common: 'That password is on every list of guessed ones. Choose another.',
  role_held: 'That person holds this role already.',
  last_administrator: 'The club needs at least one administrator. Give the role to someone else first.',
  // dues and books
  already_paid: 'That is paid already.',
  wrong_amount: 'Type an amount like 62.00.',
  // office
  capacity_below_taken: 'More places are taken than that. Move or give back some first.',
  entry_times_overlap: 'Another entry time at this garden starts then. Choose another start.',
  day_has_times: 'Entry times stand on that day already, so it cannot be moved. Make another open day.',
  heads_over_limit: 'The garden carries fewer people than that. The host has the last word, downwards.',
  slug_taken: 'Another page has that name. Change a word.',
  // gate
  pass_revoked: 'This gate pass was taken back. Ask the coordinator for a new one.',
  pass_unknown: 'This gate pass is not known. Ask the coordinator for a new one.',
  pass_full: 'This pass has been opened on as many phones as it allows. Ask the coordinator.',
  not_on_ticket: 'The ticket has no more people to let in.',
} as const;

export type RefusalCode = keyof typeof REFUSALS;

/** An expected "no". Thrown by commands; a throw rolls the transaction back. `fields` says beside which fields it is shown. */
export class Refusal extends Error {
  constructor(
    readonly code: RefusalCode,
    readonly detail: { fields?: Record<string, string>; sentence?: string } = {},
  ) {
    super(code);
    this.name = 'Refusal';
  }

  /** The sentence a person reads. */
  get sentence(): string {
    return this.detail.sentence ?? REFUSALS[this.code];
  }
}

/** Throws the refusal that a rule returned, if it returned one. */
export function refuseIf(code: RefusalCode | null): void {
  if (code !== null) throw new Refusal(code);
}
