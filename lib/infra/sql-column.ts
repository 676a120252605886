import { sql, type Column, type SQL } from 'drizzle-orm';

/**
 * A column by its full name, for subqueries inside a selection: in a query of one table the library leaves table names
 * out, and a bare `id` inside a subquery would be the subquery's own.
 */
export const full = <T>(column: Column & { _: { data: T } }): SQL<T> => sql<T>`${column}`;
