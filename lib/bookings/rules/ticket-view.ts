import QRCode from 'qrcode';
import { dayOf, formatDay, formatTime, type ClubTime } from '@/lib/core/time';
import { counted, inWordsFirst, listed } from '@/lib/opendays/rules/words';
import { showSpokenCode } from './spoken-code';

/** A QR code as one path: `size` modules a side, without the quiet zone. */
export type QrView = { size: number; path: string };

/** How a ticket stands: live, used at the gate, or given back; `words` is the dated fact. */
export type TicketState = { kind: 'live' } | { kind: 'used'; words: string } | { kind: 'given-back'; words: string };

/** One ticket as its two cards show it. */
export type TicketView = {
  visitId: string;
  stopNumber: number;
  gardenName: string;
  /** "15 May" and "2027". */
  day: string;
  year: string;
  /** "11:30", and "am" or "pm" for a 12-hour club, else empty. */
  time: string;
  timeSuffix: string;
  inBy: string;
  people: number;
  /** "2 adults and 1 child". */
  peopleWords: string;
  /** The printed number, six figures. */
  number: string;
  code: string;
  /** Null when the ticket was given back. */
  qr: QrView | null;
  state: TicketState;
};

/** What a ticket is made of; `payload` is the signed text of its QR. */
export type TicketViewFacts = {
  visitId: string; stopNumber: number; gardenName: string; entryAt: Date; graceUntil: Date; adults: number; children: number; babes: number;
  ticketNumber: number; code: string; payload: string | null; state: TicketState;
};

/** A ticket's cards from its facts, in the club's time and words. */
export function toTicketView(facts: TicketViewFacts, club: ClubTime): TicketView {
  const on = dayOf(facts.entryAt, club.timeZone);
  const [time = '', timeSuffix = ''] = formatTime(facts.entryAt, club).split(' ');
  const { adults, children, babes } = facts;
  const parts = [adults > 0 ? counted(adults, 'adult', 'adults') : '', children > 0 ? counted(children, 'child', 'children') : '', babes > 0 ? counted(babes, 'babe in arms', 'babes in arms') : ''];
  return {
    visitId: facts.visitId, stopNumber: facts.stopNumber, gardenName: facts.gardenName, day: formatDay(on, club, 'short').replace(/ \d{4}$/, ''), year: on.slice(0, 4), time, timeSuffix,
    inBy: formatTime(facts.graceUntil, club), people: adults + children + babes, peopleWords: listed(parts.filter((part) => part !== '')),
    number: String(facts.ticketNumber).padStart(6, '0'), code: showSpokenCode(facts.code), state: facts.state,
    qr: facts.payload === null || facts.state.kind === 'given-back' ? null : qrOf(facts.payload),
  };
}

/** A text as a QR code of level M (ISO/IEC 18004), drawn row by row in runs of dark modules. */
export function qrOf(text: string): QrView {
  const { modules } = QRCode.create(text, { errorCorrectionLevel: 'M' });
  const { size, data } = modules;
  let path = '';
  for (let y = 0; y < size; y += 1) {
    for (let x = 0; x < size; x += 1) {
      const from = x;
      while (x < size && data[y * size + x]) x += 1;
      if (x > from) path += `M${from} ${y}h${x - from}v1h-${x - from}z`;
    }
  }
  return { size, path };
}

/** One garden of the print sheet's directions. `place` is the address once it may be said, else the area. */
export type DirectionsView = { time: string; shortName: string; place: string; note: string | null; journey: string | null };

/** The print sheet: who it is for, what it says, where to go, and the tickets. */
export type TicketSheetView = { clubName: string; to: string; title: string; letter: string; directions: DirectionsView[]; tickets: TicketView[] };

/** "Three gardens on 15 May 2027": the sheet's title. */
export const sheetTitle = (gardens: number, heldOn: string, club: ClubTime): string =>
  `${inWordsFirst(gardens)} ${gardens === 1 ? 'garden' : 'gardens'} on ${formatDay(heldOn, club, 'bare')} ${heldOn.slice(0, 4)}`;
