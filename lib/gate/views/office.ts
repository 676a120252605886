import { formatDay, formatInstant, formatTime, type ClubTime } from '@/lib/core/time';
import { counted } from '@/lib/opendays/rules/words';
import { headCount, type GateFact } from '../rules/facts';
import { foldFacts, headsInGarden } from '../rules/fold';

/** A gate pass as the coordinator sees it; never its secret. */
export type OfficePass = { gatePassId: string; number: number; garden: string; helper: string; madeText: string; phonesText: string; seenText: string; isLive: boolean };

/** One stop's gate: heads expected, let in, and in the garden now against its limit. */
export type OfficeGate = { stopId: string; number: number; garden: string; headsLimit: number; expected: number; cameIn: number; now: number; refusals: number };

export type OfficeGates = { title: string; dayText: string; isCalledOff: boolean; gates: OfficeGate[]; passes: OfficePass[] };

type PassFacts = { gatePassId: string; stopId: string; helper: string; madeAt: Date; revokedAt: Date | null; devicesAllowed: number; devices: number; seenAt: Date | null };
type Found = {
  day: { title: string; heldOn: string; calledOffAt: Date | null };
  gates: { stopId: string; number: number; garden: string; headsLimit: number }[];
  expected: { stopId: string; heads: number }[];
  passes: PassFacts[];
  facts: ReadonlyMap<string, GateFact[]>;
};

/** Sets the gates of an open day, by stop number, for the staff copy. */
export function toOfficeGates({ day, gates, expected, passes, facts }: Found, club: ClubTime & { babesTakePlace: boolean }): OfficeGates {
  const babes = club.babesTakePlace ? 'counted' : 'not counted';
  return {
    title: day.title,
    dayText: formatDay(day.heldOn, club),
    isCalledOff: day.calledOffAt !== null,
    gates: gates.map((gate) => {
      const fold = foldFacts(facts.get(gate.stopId) ?? []);
      return {
        ...gate,
        expected: expected.find(({ stopId }) => stopId === gate.stopId)?.heads ?? 0,
        cameIn: headCount(fold.cameIn, babes),
        now: headsInGarden(fold, babes),
        refusals: fold.refused.size,
      };
    }),
    passes: gates.flatMap((gate) => passes.filter(({ stopId }) => stopId === gate.stopId).map((pass) => toPass(pass, gate, club))),
  };
}

const toPass = (pass: PassFacts, { number, garden }: { number: number; garden: string }, club: ClubTime): OfficePass => ({
  gatePassId: pass.gatePassId,
  number,
  garden,
  helper: pass.helper,
  madeText: formatInstant(pass.madeAt, club, 'short'),
  phonesText: `${pass.devices} of ${pass.devicesAllowed} ${pass.devicesAllowed === 1 ? 'phone' : 'phones'}`,
  seenText: pass.revokedAt ? `taken back ${formatInstant(pass.revokedAt, club, 'short')}` : pass.seenAt ? `seen ${formatTime(pass.seenAt, club)}` : 'not opened yet',
  isLive: pass.revokedAt === null,
});

/** The day's gates in one sentence for the bill. */
export function gateSums({ gates, passes, isCalledOff }: OfficeGates): string {
  const sum = (of: (gate: OfficeGate) => number) => gates.reduce((total, gate) => total + of(gate), 0);
  const live = passes.filter((pass) => pass.isLive).length;
  const counts = `${sum((gate) => gate.cameIn)} of ${counted(sum((gate) => gate.expected), 'head', 'heads')} let in, ${sum((gate) => gate.now)} in the gardens now, ${counted(live, 'pass', 'passes')} handed out.`;
  return isCalledOff ? `Called off. ${counts}` : counts;
}
