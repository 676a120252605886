import { readSpokenCode } from '@/lib/bookings/rules/spoken-code';

/** What finding needs of a party: its name and its spoken code. */
export type Findable = { name: string; code: string };

/** Looking by name or by spoken code: codes hold nearly every letter, so together they would light every key. */
export type FindBy = 'name' | 'code';

/** Who a typed beginning leads to, and which next keys lead further. */
export type Finding<P> = { hits: P[]; nextKeys: ReadonlySet<string> };

const LOOSE: Readonly<Record<string, string>> = { Ł: 'L', Ø: 'O', Đ: 'D', Ð: 'D', Æ: 'AE', Œ: 'OE', Þ: 'TH', ẞ: 'SS', ß: 'SS', ı: 'I' };

/** A name's letters and figures as keys: capitals without accents, words apart. Signs and emoji are no keys. */
export function keysOfName(name: string): string[] {
  const plain = name.normalize('NFKD').replace(/\p{M}/gu, '').toUpperCase().replace(/[ŁØĐÐÆŒÞẞßı]/g, (letter) => LOOSE[letter] ?? letter);
  return plain.split(/[^\p{L}\p{N}]+/u).filter((word) => word !== '');
}

/** Every beginning one may start typing at: the name from each of its words on, without the gaps. */
const startsOf = (party: Findable, by: FindBy): string[] => {
  if (by === 'code') return [party.code];
  const words = keysOfName(party.name);
  return words.map((_, from) => words.slice(from).join(''));
};

/**
 * The parties whose name (from any of its words on) or code begins with what was typed, by name, and the keys that
 * lead on to at least one of them. What leads nowhere has no key, so a helper cannot go astray.
 */
export function findParties<P extends Findable>(parties: readonly P[], typed: string, by: FindBy): Finding<P> {
  const wanted = by === 'code' ? typed.toUpperCase().replace(/[^0-9A-Z]/g, '') : keysOfName(typed).join('');
  const nextKeys = new Set<string>();
  const hits = parties.filter((party) => {
    const leads = startsOf(party, by).filter((start) => start.startsWith(wanted));
    for (const start of leads) {
      const next = Array.from(start.slice(wanted.length))[0];
      if (next !== undefined) nextKeys.add(next);
    }
    return leads.length > 0;
  });
  return { hits: hits.sort(byNameThenCode), nextKeys };
}

/** Why a typed code leads to nobody here, in one sentence. */
export function codeProblem(typed: string): string {
  const reading = readSpokenCode(typed);
  return 'problem' in reading ? reading.problem : 'That code is not for this garden today. Ask to see the ticket.';
}

/** The keys of the finding pad: the fixed rows, then any other first letters that this list needs. */
export function padKeys<P extends Findable>(parties: readonly P[], by: FindBy): string[] {
  const fixed = Array.from(by === 'name' ? 'ABCDEFGHIJKLMNOPQRSTUVWXYZ' : '0123456789ABCDEFGHJKMNPQRSTVWXYZ');
  if (by === 'code') return fixed;
  const others = new Set(parties.flatMap((party) => keysOfName(party.name).flatMap((word) => Array.from(word))));
  return [...fixed, ...[...others].filter((key) => !fixed.includes(key)).sort()];
}

const byNameThenCode = (a: Findable, b: Findable) => (a.name < b.name ? -1 : a.name > b.name ? 1 : a.code < b.code ? -1 : 1);
