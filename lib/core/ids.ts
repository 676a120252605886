import { z } from 'zod';

/** The kinds of row that an id can name; an id of one kind never fits where another is asked for. */
export type IdKind =
  | 'account' | 'attempt' | 'auditLine' | 'bearerLink' | 'booking' | 'charge' | 'device' | 'entryTime' | 'gateFact' | 'gatePass'
  | 'garden' | 'household' | 'journalEntry' | 'letter' | 'openDay' | 'payment' | 'person' | 'receipt' | 'signIn' | 'stop' | 'visit';

declare const kind: unique symbol;
/** A random UUID, typed by the kind of row it names. Sort by time, never by id. */
export type Id<K extends IdKind> = string & { readonly [kind]: K };

const uuid = z.uuid();

/** A zod schema for an id of kind `K`; anything but a UUID is refused. Capitals become small letters: ids are compared as text. */
export const idField = <K extends IdKind>() => uuid.transform((value) => value.toLowerCase() as Id<K>); // the one place where a string becomes an id

/** A new random id. Works in the browser too: a phone without signal must be able to make one. */
export const newId = <K extends IdKind>(): Id<K> => crypto.randomUUID() as Id<K>; // a fresh UUID has whatever kind its maker says

/** Reads an id from a trusted place (a database row, a test); throws on anything but a UUID. */
export const asId = <K extends IdKind>(value: string): Id<K> => uuid.parse(value) as Id<K>; // checked on the same line
