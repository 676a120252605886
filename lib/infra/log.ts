type Facts = Record<string, string | number | boolean | null | undefined>;

function write(level: 'info' | 'warn' | 'error', operation: string, facts: Facts): void {
  const line = JSON.stringify({ at: new Date().toISOString(), level, operation, ...facts });
  if (level === 'error') console.error(line);
  else if (level === 'warn') console.warn(line);
  else console.log(line);
}

/** One JSON line a fact. Never pass URLs, bodies, query parameters, addresses or secrets. */
export const log = {
  info: (operation: string, facts: Facts = {}) => write('info', operation, facts),
  warn: (operation: string, facts: Facts = {}) => write('warn', operation, facts),
  error: (operation: string, error: unknown, facts: Facts = {}) => write('error', operation, { ...facts, ...causeOf(error) }),
};

/** What may be said of an error: its class and code. A database error's message holds its parameters, so it stays out. */
export function causeOf(error: unknown): { error: string; code?: string; where?: string } {
  if (!(error instanceof Error)) return { error: typeof error };
  const root = rootOf(error);
  const code = 'code' in root && typeof root.code === 'string' ? root.code : undefined;
  const where = error.stack?.split('\n').find((line) => /\/(lib|app|scripts)\//.test(line))?.trim();
  const fromDatabase = code !== undefined && /^[0-9A-Z]{5}$/.test(code);
  const said = fromDatabase || error.message.startsWith('Failed query') ? root.name : `${error.name}: ${error.message.slice(0, 200)}`;
  return { error: said, ...(code === undefined ? {} : { code }), ...(where === undefined ? {} : { where }) };
}

function rootOf(error: Error): Error {
  return error.cause instanceof Error ? rootOf(error.cause) : error;
}
