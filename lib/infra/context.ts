import type { Db, Tx } from '@/db/client';
import type { Role } from '@/lib/core/words';
import type { Id } from '@/lib/core/ids';

/** The club's settings that nearly every command needs, read once a request. */
export type ClubSettings = {
  name: string;
  footLine: string;
  email: string;
  timeZone: string;
  currency: string;
  locale: string;
  hourCycle: 'h12' | 'h23';
  holdMinutes: number;
  holdsMayBeExtended: boolean;
  partyPeopleMax: number;
  partyVisitsMax: number;
  babesTakePlace: boolean;
  addressReleaseHours: number;
  changesEndMinutes: number;
  refundRules: { hoursBefore: number; percent: number }[];
  duesKeptOnDays: number;
  visitRules: string;
  coniferInk: string | null;
};

/** Nobody in particular: a visitor. */
export type Stranger = { kind: 'anyone' };
/** A signed-in account with its person and the roles it holds. */
export type AccountActor = {
  kind: 'account';
  accountId: Id<'account'>;
  signInId: Id<'signIn'>;
  personId: Id<'person'> | null;
  householdId: Id<'household'> | null;
  name: string;
  email: string;
  isHost: boolean;
  roles: Role[];
};
/** A browser that holds places, known by its cookie. */
export type HolderActor = { kind: 'holder'; holderHash: string; householdId: Id<'household'> | null };
/** Whoever followed a booking's private link; `provesMailbox` when that link came in a letter. */
export type BookingActor = { kind: 'booking'; bookingId: Id<'booking'>; provesMailbox?: true };
/** A phone that opened a gate pass. */
export type GateActor = { kind: 'gate'; passId: Id<'gatePass'>; deviceId: Id<'device'>; stopId: Id<'stop'>; openDayId: Id<'openDay'> };
/** A handler, job or script: machines have no role. */
export type SystemActor = { kind: 'system'; name: string };

export type Actor = Stranger | AccountActor | HolderActor | BookingActor | GateActor | SystemActor;

/** What every query and command is given: where to ask, who asks, when, and for which club. */
export type Ctx<A extends Actor = Actor> = {
  db: Db | Tx;
  actor: A;
  now: Date;
  club: ClubSettings;
  requestId: string;
  /** A hash of the client's address for rate limits, from the trusted proxies; null when there is none. */
  client: string | null;
};

/** A context of a signed-in member of a household. */
export type MemberActor = AccountActor & { householdId: Id<'household'> };
export type MemberCtx = Ctx<MemberActor>;
export type AccountCtx = Ctx<AccountActor>;
export type SystemCtx = Ctx<SystemActor>;
/** The same context inside a transaction. */
export const within = <A extends Actor>(ctx: Ctx<A>, tx: Tx): Ctx<A> => ({ ...ctx, db: tx });
