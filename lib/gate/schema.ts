import { z } from 'zod';
import { idField } from '@/lib/core/ids';
import { optionalTextField, textField, wholeField } from '@/lib/core/fields';
import { FACT_KINDS } from '@/lib/core/words';

/** How many facts one batch may bring: a phone that was without signal sends several. */
export const FACTS_A_BATCH = 200;

const instant = z.iso.datetime().pipe(z.coerce.date());
const heads = z.number().int().min(0).max(99);
const people = { adults: heads, children: heads, babes: heads };
/* A batch is never lost for its words: what no text of the database may hold is left out of them. */
const words = (max: number) => z.string().max(max).transform((text) => text.replaceAll('\u0000', ''));
const reason = words(200).transform((text) => text.trim() || null).nullable();

/** A device's own key, made on the phone: 32 random bytes in base64url (RFC 4648 section 5). */
export const deviceKey = z.string().regex(/^[A-Za-z0-9_-]{43}$/, { error: 'That is not a gate device.' });

/** What a phone sends once to become a device of a pass. The key is the phone's own, so a repeat changes nothing. */
export const exchangePassInput = z.object({ secret: z.string().min(8).max(100), deviceKey });
export type ExchangePassInput = z.output<typeof exchangePassInput>;

/** Which of the pass's phones this is. */
export const deviceNumber = z.object({ number: z.number().int() });

/** One fact as a phone sends it. A refusal and an admission name a visit; an undo names what it takes back. */
export const sentFact = z
  .object({ id: idField<'gateFact'>(), kind: z.enum(FACT_KINDS), undoesId: idField<'gateFact'>().nullable(), visitId: idField<'visit'>().nullable(), ...people, at: instant, verdict: words(40).nullable(), reason })
  .refine((fact) => (fact.kind === 'undo') === (fact.undoesId !== null), { error: 'An undo names what it takes back, and nothing else does.' })
  .refine((fact) => fact.kind !== 'admit' || fact.visitId !== null, { error: 'An admission names its ticket.' })
  .refine((fact) => fact.kind === 'undo' || fact.kind === 'refuse' || fact.adults + fact.children + fact.babes > 0, { error: 'Say how many people.' });
export type SentFact = z.output<typeof sentFact>;

/** A batch of facts with the phone's own time of sending, by which its clock is set right. */
export const recordFactsInput = z.object({ phoneTime: instant, listVersion: words(80), facts: z.array(sentFact).min(1).max(FACTS_A_BATCH) });
export type RecordFactsInput = z.output<typeof recordFactsInput>;

/** What became of each fact. `kept` also answers a repeat; `refused` facts are kept as refusals. */
export const factAnswers = z.object({
  answers: z.array(z.object({ id: z.string(), outcome: z.enum(['kept', 'refused']), reason: z.string().nullable() })),
});
export type FactAnswers = z.output<typeof factAnswers>;

/** A ticket read from a code that this gate's list does not hold. */
export const readTicketInput = z.object({ text: z.string().min(1).max(400) });
export type ReadTicketInput = z.output<typeof readTicketInput>;

const ticket = {
  visitId: z.string(), stopId: z.string(), stopNumber: z.number().int(), heldOn: z.string(), opensAt: instant, graceUntil: instant, givenBackAt: instant.nullable(), ...people,
};

/** The server's reading of a shown code; null is not one of ours. No name: the party is not on this gate's list. */
export const ticketReading = z.object({ ticket: z.object(ticket).nullable() });

/** A party on the list: no contact details, nothing but what the gate shows. */
export const listedParty = z.object({ ...ticket, name: z.string(), code: z.string(), version: z.number().int() });
export type ListedParty = z.output<typeof listedParty>;

/** All that a gate's phone holds of one garden on one day. */
export const gateList = z.object({
  version: z.string(),
  madeAt: instant,
  deviceId: z.string(),
  here: z.object({
    stopId: z.string(), stopNumber: z.number().int(), heldOn: z.string(), headsLimit: z.number().int(),
    earlyMinutes: z.number().int(), babes: z.enum(['counted', 'not counted']), calledOff: z.boolean(),
  }),
  garden: z.string(),
  dayName: z.string(),
  time: z.object({ timeZone: z.string(), locale: z.string(), hourCycle: z.enum(['h12', 'h23']) }),
  parties: z.array(listedParty),
  /** What was done at this stop, by every phone; times set right by the server's clock. */
  facts: z.array(z.object({ id: z.string(), kind: z.enum(FACT_KINDS), undoesId: z.string().nullable(), visitId: z.string().nullable(), ...people, at: instant, deviceId: z.string(), reason: z.string().nullable() })),
  /** The club's ticket keys: raw Ed25519 public keys (RFC 8032) in base64url. */
  keys: z.array(z.object({ keyId: z.number().int(), publicKey: z.string() })),
});
export type GateList = z.output<typeof gateList>;

/** Where this garden is, for an ambulance. Each asking is a showing and is recorded. */
export const gatePlace = z.object({ garden: z.string(), address: z.string(), directions: z.string().nullable(), lat: z.number(), lon: z.number() });
export type GatePlace = z.output<typeof gatePlace>;

/** The coordinator's wish for a gate pass. */
export const makeGatePassInput = z.object({
  stopId: idField<'stop'>(),
  helper: textField('who will stand at the gate', 60),
  devices: wholeField({ min: 1, max: 6, what: 'Type how many phones, from 1 to 6.' }),
});
export type MakeGatePassInput = z.output<typeof makeGatePassInput>;

/** Which gate pass to take back. */
export const revokeGatePassInput = z.object({ gatePassId: idField<'gatePass'>(), why: optionalTextField(120) });
export type RevokeGatePassInput = z.output<typeof revokeGatePassInput>;
