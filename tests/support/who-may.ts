/** The actors of the authorization table. `other member` is a member of another household than the booking's. */
export const ACTORS = ['visitor', 'holder', 'booking link', 'gate phone', 'member', 'other member', 'coordinator', 'secretary', 'treasurer', 'administrator'] as const;
export type ActorName = (typeof ACTORS)[number];

/** Who is let through to the command; everyone else is told no before it runs. */
export type Who = 'everyone' | readonly ActorName[];

const OFFICERS = ['coordinator', 'secretary', 'treasurer', 'administrator'] as const;
const SIGNED_IN = ['member', 'other member', ...OFFICERS] as const;
const COORDINATOR = ['coordinator'] as const;
const BOOKING = ['booking link', 'member'] as const;

/** Every server action and who may. The members of the cast have households, officers too. */
export const ACTIONS: Readonly<Record<string, Who>> = {
  // signing in and the account
  askForCodeAction: 'everyone',
  signInWithCodeAction: 'everyone',
  signInWithLinkAction: 'everyone',
  signInWithPasswordAction: 'everyone',
  signOutAction: SIGNED_IN,
  signOutEverywhereAction: SIGNED_IN,
  setPasswordAction: SIGNED_IN,
  dropPasswordAction: SIGNED_IN,
  // booking
  holdPlacesAction: 'everyone',
  keepLongerAction: 'everyone', // each reaches only its own browser's hold
  letGoAction: 'everyone',
  keepAgainAction: 'everyone',
  payAction: 'everyone',
  payOnAction: 'everyone',
  openBookingAction: 'everyone',
  giveBackAction: BOOKING,
  changeVisitAction: BOOKING,
  confirmEmailAction: ['booking link'], // only whoever reads the mailbox
  makeFeedAction: BOOKING,
  revokeFeedAction: BOOKING,
  // members
  saveContactAction: SIGNED_IN,
  payDuesAction: SIGNED_IN,
  // the office
  makeOpenDayAction: COORDINATOR,
  changeOpenDayAction: COORDINATOR,
  publishOpenDayAction: COORDINATOR,
  addStopAction: COORDINATOR,
  changeStopAction: COORDINATOR,
  setStopPricesAction: COORDINATOR,
  makeEntryTimesAction: COORDINATOR,
  changeEntryTimeAction: COORDINATOR,
  closeEntryTimeAction: COORDINATOR,
  reopenEntryTimeAction: COORDINATOR,
  addPlanNoteAction: COORDINATOR,
  writeToPartiesAction: ['coordinator', 'administrator'],
  makeGatePassAction: COORDINATOR,
  revokeGatePassAction: COORDINATOR,
  recordPaymentAction: ['secretary', 'treasurer'],
  inviteOfficerAction: ['administrator'],
  takeRoleAction: ['administrator'],
  saveSettingsAction: ['administrator'],
  moveVisitAction: COORDINATOR,
  giveBackForPartyAction: COORDINATOR,
  giveBackPaymentAction: ['treasurer'],
  paidByHandAction: ['treasurer'],
  sendAgainAction: ['coordinator', 'administrator'],
};

/** Every route handler but next-auth's own and the health answer. */
export const ROUTES: Readonly<Record<string, Who>> = {
  'GET /api/board/[openDay]': 'everyone',
  'GET /gardens/[slug]/plate': 'everyone',
  'POST /api/holds': 'everyone',
  'POST /api/stripe': 'everyone', // believed only with the processor's signature
  'GET /api/calendar/[secret]': 'everyone', // the secret is the permission
  'GET /bookings/[code]/link/[secret]': 'everyone',
  'GET /bookings/[code]/calendar.ics': BOOKING,
  'GET /large-print': 'everyone',
  'POST /api/gate/device': 'everyone',
  'POST /api/gate/facts': ['gate phone'],
  'GET /api/gate/list': ['gate phone'],
  'POST /api/gate/place': ['gate phone'],
  'POST /api/gate/ticket': ['gate phone'],
  'GET /office/roll/csv': ['secretary', 'treasurer'],
  'GET /office/books/csv': ['treasurer'],
  'GET /office/open-days/csv': ['coordinator', 'treasurer'],
  'GET /office/open-days/[slug]/csv': ['coordinator', 'treasurer'],
  'GET /office/bookings/csv': ['coordinator', 'treasurer'],
  'GET /office/letters/csv': OFFICERS,
  'GET /office/people/csv': ['administrator'],
  'GET /office/audit/csv': ['administrator'],
};
