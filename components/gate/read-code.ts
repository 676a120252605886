import { decodeTicket, type TicketFacts } from '@/lib/bookings/rules/ticket-payload';
import type { GateTicket } from '@/lib/gate/rules/verdict';
import type { GateList } from '@/lib/gate/schema';
import { addMinutes, dayOf } from '@/lib/core/time';

/** Asks the server what a code stands for; throws when there is no signal. */
export type AskServer = (text: string) => Promise<{ ticket: GateTicket | null }>;

/**
 * What a shown code stands for; null is not one of ours. The phone verifies by itself where its browser knows
 * Ed25519. A ticket on this gate's list is judged by the list, which is newer than the paper; for any other the server
 * is asked, and without signal the paper's own signed words must do.
 */
export async function readCode(text: string, list: GateList, askServer: AskServer): Promise<GateTicket | null> {
  const read = decodeTicket(text);
  if (read === null) return null;
  const isOurs = await verifyHere(read, list.keys);
  if (isOurs === false) return null;
  const listed = list.parties.find(({ visitId }) => visitId === read.facts.visitId);
  if (isOurs && listed) return listed;
  try {
    return (await askServer(text)).ticket;
  } catch (error) {
    if (isOurs) return onPaper(read.facts, list);
    throw error;
  }
}

/** Whether the signature holds by one of the list's keys; null when this browser cannot tell. */
async function verifyHere({ facts, signed, signature }: NonNullable<ReturnType<typeof decodeTicket>>, keys: GateList['keys']): Promise<boolean | null> {
  const key = keys.find(({ keyId }) => keyId === facts.keyId);
  if (!key) return null; // a key made since the list: the server knows
  try {
    const publicKey = await crypto.subtle.importKey('raw', bytesOf(key.publicKey), { name: 'Ed25519' }, false, ['verify']);
    return await crypto.subtle.verify({ name: 'Ed25519' }, publicKey, signature.slice(), signed.slice());
  } catch {
    return null; // browsers without Ed25519 throw NotSupportedError, and an insecure address has no subtle at all
  }
}

const bytesOf = (base64url: string) => Uint8Array.from(atob(base64url.replaceAll('-', '+').replaceAll('_', '/')), (character) => character.charCodeAt(0));

const onPaper = (facts: TicketFacts, list: GateList): GateTicket => ({
  visitId: facts.visitId, stopId: facts.stopId, stopNumber: facts.stopNumber, heldOn: dayOf(facts.entryAt, list.time.timeZone),
  opensAt: facts.entryAt, graceUntil: addMinutes(facts.entryAt, facts.graceMinutes), givenBackAt: null,
  adults: facts.adults, children: facts.children, babes: facts.babes,
});
