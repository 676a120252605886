import { formatMoney } from '@/lib/core/money';
import { formatDay } from '@/lib/core/time';
import type { Role } from '@/lib/core/words';
import type { LetterClub } from './booking-letter';
import type { Letter } from './letter';

const money = (minor: number, club: LetterClub) => formatMoney({ amountMinor: minor, currency: club.currency }, club.locale);

/** A code and a link to sign in with; the code does not stand in the subject, where a locked phone would show it. */
export function signInLetter(facts: { code: string; minutes: number; link: string }, club: LetterClub): Letter {
  return {
    clubName: club.name, subject: `Your sign-in code for ${club.name}`, title: 'Your sign-in code', line: `good for ${facts.minutes} minutes, once`,
    preview: 'Type it on the page that asked for it, or open the link.',
    lead: [{ kind: 'code', code: facts.code }],
    body: [
      { kind: 'paragraph', parts: ['Type it on the page that asked for it. Or open this link and press the button there:'] },
      { kind: 'button', label: 'Sign in', href: facts.link },
      { kind: 'paragraph', parts: ['If you did not ask for it, do nothing: nobody gets in without it. We never ask for it by telephone.'] },
    ],
    foot: 'Sent because someone typed this address on the sign-in page. Leafhalt',
  };
}

/** A role was given to someone. */
export function invitationLetter(facts: { role: Role; invitedBy: string; link: string }, club: LetterClub): Letter {
  return {
    clubName: club.name, subject: `You are ${facts.role} of ${club.name}`, title: `You are our ${facts.role}`, line: `given by ${facts.invitedBy}`,
    preview: 'Sign in with this address to begin.',
    lead: [{ kind: 'paragraph', parts: [`${facts.invitedBy} gave you the role of ${facts.role}. Sign in with the address this letter came to: we send a code, and there is no password to remember.`] }],
    body: [{ kind: 'button', label: 'Go to the sign-in page', href: facts.link }, { kind: 'paragraph', parts: ['If that is a mistake, answer this letter.'] }],
    foot: 'Sent because you were given a role. Leafhalt',
  };
}

/** Dues came in: the receipt. */
export type ReceiptFacts = { number: string; amountMinor: number; receivedOn: string; method: string; className: string | null; termFrom: string | null; termTo: string | null; household: string };

export function duesReceiptLetter(facts: ReceiptFacts, club: LetterClub): Letter {
  const day = (on: string) => formatDay(on, club, 'short');
  const rows: [string, string][] = [['Receipt', facts.number], ['From', facts.household], ['Received', `${day(facts.receivedOn)}, ${facts.method}`]];
  if (facts.className) rows.push(['For', `dues, ${facts.className}`]);
  if (facts.termFrom && facts.termTo) rows.push(['Term', `${day(facts.termFrom)} to ${day(facts.termTo)}`]);
  return {
    clubName: club.name, subject: `Receipt ${facts.number}: dues, ${money(facts.amountMinor, club)}`, title: 'Thank you', line: facts.termTo ? `paid to ${formatDay(facts.termTo, club, 'short')}` : `received on ${day(facts.receivedOn)}`,
    preview: `${money(facts.amountMinor, club)}, receipt ${facts.number}.`,
    lead: [{ kind: 'paragraph', parts: [`We have your dues of ${money(facts.amountMinor, club)}. Keep this letter as your receipt; it is on your dues page too.`] }],
    body: [{ kind: 'figures', rows: [...rows, ['Amount', money(facts.amountMinor, club)]] }],
    foot: 'Sent because dues came in for your household. Leafhalt',
  };
}

/** Money on its way back. */
export function refundLetter(facts: { amountMinor: number; reason?: string | undefined }, club: LetterClub): Letter {
  const amount = money(facts.amountMinor, club);
  return {
    clubName: club.name, subject: `${amount} is on its way back`, title: `${amount} comes back`, line: 'the way it was paid',
    preview: 'A card shows it within a few working days.',
    lead: [{ kind: 'paragraph', parts: [`We sent back ${amount} the way it was paid.${facts.reason ? ` The reason: ${facts.reason}` : ''}`] }],
    body: [{ kind: 'paragraph', parts: ['A card shows it within a few working days. If it has not come after ten, answer this letter.'] }],
    foot: 'Sent because money of yours was returned. Leafhalt',
  };
}

/** Money came after the places were gone; all of it goes back at once. */
export function placesLostLetter(facts: { refundMinor: number }, club: LetterClub): Letter {
  const amount = money(facts.refundMinor, club);
  return {
    clubName: club.name, subject: `Your places could not be kept; ${amount} comes back`, title: 'We are sorry', line: 'your places were gone when the payment came',
    preview: `${amount} is on its way back.`,
    lead: [{ kind: 'paragraph', parts: [`Your payment of ${amount} reached us after your places had gone to someone else. That is our fault, not yours. You have no booking, and all ${amount} is on its way back the way you paid.`] }],
    body: [{ kind: 'paragraph', parts: ['If you still want to come, look at the day once more: other times may be free. Or answer this letter, and the coordinator will help.'] }],
    foot: 'Sent because a payment of yours could not buy its places. Leafhalt',
  };
}

/** An officer's own words, as they were written. */
export function noticeLetter(facts: { subject: string; body: string }, club: LetterClub): Letter {
  const paragraphs = facts.body.split(/\n{2,}/).map((text) => text.trim()).filter((text) => text !== '');
  return {
    clubName: club.name, subject: facts.subject, title: facts.subject, line: `from ${club.name}`, preview: (paragraphs[0] ?? '').slice(0, 140),
    lead: [], body: paragraphs.map((text) => ({ kind: 'paragraph', parts: [text] })),
    foot: 'Sent because it concerns a visit or a garden of yours; answer this letter with any question. Leafhalt',
  };
}
