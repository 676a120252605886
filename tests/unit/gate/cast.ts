import type { GateFact } from '@/lib/gate/rules/facts';
import type { GateHere, GateTicket } from '@/lib/gate/rules/verdict';

/** Saturday 15 May 2027 at a time of the demo zone, UTC for plainness. */
export const at = (time: string): Date => new Date(`2027-05-15T${time}:00Z`);

export const club = { timeZone: 'UTC', locale: 'en', hourCycle: 'h23' } as const;

export const here = (changes: Partial<GateHere> = {}): GateHere => ({
  stopId: 'saltmarsh', stopNumber: 3, heldOn: '2027-05-15', headsLimit: 28, earlyMinutes: 0, babes: 'not counted', calledOff: false, ...changes,
});

export const ticket = (changes: Partial<GateTicket> = {}): GateTicket => ({
  visitId: 'v1', stopId: 'saltmarsh', stopNumber: 3, heldOn: '2027-05-15', opensAt: at('11:30'), graceUntil: at('11:50'),
  givenBackAt: null, adults: 2, children: 1, babes: 0, ...changes,
});

let made = 0;
export const fact = (changes: Partial<GateFact> = {}): GateFact => ({
  id: `fact-${(made += 1)}`, kind: 'admit', undoesId: null, visitId: 'v1', adults: 2, children: 1, babes: 0, at: at('11:34'), deviceId: 'this', reason: null, ...changes,
});
