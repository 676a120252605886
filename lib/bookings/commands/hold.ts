import 'server-only';
import { randomBytes } from 'node:crypto';
import type { Queryable } from '@/db/client';
import { only } from '@/lib/core/only';
import { Refusal, refuseIf } from '@/lib/core/refusal';
import { asId, type Id } from '@/lib/core/ids';
import type { Ctx, HolderActor } from '@/lib/infra/context';
import { runNamed } from '@/lib/infra/named-query';
import { constraintOf, sqlStateOf } from '@/lib/infra/sql-state';
import { clashSentence, holdRefusal, keptUntil, priced, type PricedVisit } from '../rules/hold';
import { drawSpokenCode } from '../rules/spoken-code';
import type { HoldInput } from '../schema';
import { countTryAndFindFacts } from '../queries/entry-facts';

/** A family at one address may try again and again; a script may not. */
const HOLDS_FROM_ONE_PLACE = { tries: 60, minutes: 10 };

/**
 * Keeps all the wanted places for this browser, or none; returns the booking's id. Its earlier hold of the same open day
 * is given back in the same transaction. Two round trips: the limiter with the facts, and one statement that locks
 * the entry times in id order and decides. The club's settings come with the facts, so a context without them will do.
 */
export async function holdPlaces(ctx: Omit<Ctx<HolderActor>, 'club'>, input: HoldInput): Promise<Id<'booking'>> {
  const { db, now, actor } = ctx;
  const tried = { key: `hold:${ctx.client ?? actor.holderHash}`, limit: HOLDS_FROM_ONE_PLACE, now };
  const facts = await countTryAndFindFacts(db, tried, input.openDayId, input.wanted.map((wish) => wish.entryTimeId));
  if (!facts) throw new Refusal('not_found');
  const { club } = facts;
  refuseIf(holdRefusal(facts.day, facts.entries, input.wanted, club, now));
  const clash = input.insists ? null : clashSentence(facts.entries, facts.minutes, club);
  if (clash !== null) throw new Refusal('clash', { sentence: clash });
  const { visits, totalMinor } = priced(input.wanted, facts.entries, club.babesTakePlace);
  const wanted = wantedJson(visits);
  const until = keptUntil(now, club.holdMinutes).toISOString();
  return decide(db, () => [input.openDayId, actor.holderHash, actor.householdId, drawSpokenCode(randomBytes), now.toISOString(), until, input.insists, totalMinor, club.currency, wanted]);
}

const HOLD = 'select hold_places($1::uuid, $2::text, $3::uuid, $4::text, $5::timestamptz, $6::timestamptz, $7::boolean, $8::integer, $9::text, $10::jsonb) as id';

const wantedJson = (visits: readonly PricedVisit[]) => JSON.stringify(visits.map((visit) => ({
  id: visit.entryTimeId, adults: visit.adults, children: visit.children, babes: visit.babes, heads: visit.heads,
  adult: visit.adultMinor, child: visit.childMinor, babe: visit.babeMinor,
})));

const REFUSED_BY_DATABASE = new Map([['LH001', 'places_gone'], ['LH002', 'hold_paying']] as const);
// deadlock_detected, serialization_failure, lock_not_available: somebody else went first (PostgreSQL manual, appendix A)
const TRIED_AGAIN = new Set(['40P01', '40001', '55P03']);
const DRAWN_AGAIN = new Set(['bookings_code_unique', 'bookings_one_hold_a_browser']); // the code is taken; another tab of this browser was first

/** Of the tabs of one browser that press at once, one gets through in each round. */
const TABS_MOST = 12;

/** Runs the deciding statement again when it lost a race that another try wins, and reads its refusals. */
async function decide(db: Queryable, valuesNow: () => unknown[]): Promise<Id<'booking'>> {
  for (let tries = 1; ; tries += 1) {
    try {
      return asId<'booking'>(only(await runNamed<{ id: string }>(db, 'hold places', HOLD, valuesNow())).id);
    } catch (error) {
      const state = sqlStateOf(error) ?? '';
      const refused = [...REFUSED_BY_DATABASE].find(([code]) => code === state);
      if (refused) throw new Refusal(refused[1]);
      const isDrawnAgain = DRAWN_AGAIN.has(constraintOf(error) ?? '');
      if (!isDrawnAgain && !TRIED_AGAIN.has(state)) throw error;
      if (tries >= (isDrawnAgain ? TABS_MOST : 4)) throw new Refusal('busy');
    }
  }
}
