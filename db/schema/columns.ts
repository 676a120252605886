import { customType, timestamp, uuid } from 'drizzle-orm/pg-core';
import type { Id, IdKind } from '@/lib/core/ids';

/** An instant: `timestamptz`, read and written as a Date. */
export const instant = () => timestamp({ withTimezone: true, mode: 'date' });

/** A random UUID typed by the kind of row it names. */
export const idOf = <K extends IdKind>() => uuid().$type<Id<K>>();

/** The primary key every table uses unless it has a natural one. */
export const ownId = <K extends IdKind>() => idOf<K>().primaryKey().defaultRandom();

/** Raw bytes. */
export const bytes = customType<{ data: Buffer }>({ dataType: () => 'bytea' });

/** A half-open range of days, as Postgres writes it: `[2027-01-01,2028-01-01)`. */
export const dayRange = customType<{ data: string }>({ dataType: () => 'daterange' });
