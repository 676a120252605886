/** The SQLSTATE of a database error, wherever in its chain of causes, or null. Source: PostgreSQL manual, appendix A. */
export function sqlStateOf(error: unknown): string | null {
  const found = databaseErrorIn(error);
  return found?.code ?? null;
}

/** The name of the constraint that a database error broke, or null. */
export function constraintOf(error: unknown): string | null {
  return databaseErrorIn(error)?.constraint ?? null;
}

function databaseErrorIn(error: unknown): { code: string; constraint: string | null } | null {
  if (!(error instanceof Error)) return null;
  if ('code' in error && typeof error.code === 'string' && /^[0-9A-Z]{5}$/.test(error.code)) {
    return { code: error.code, constraint: 'constraint' in error && typeof error.constraint === 'string' ? error.constraint : null };
  }
  return databaseErrorIn(error.cause);
}
