import type { z } from 'zod';
import type { RefusalCode } from '@/lib/core/refusal';

/** Zod's problems as sentences by field name, `wanted.0.adults` for nested ones, '' for the whole form. */
export function fieldErrorsOf(error: z.ZodError): Record<string, string[]> {
  const byField: Record<string, string[]> = {};
  for (const issue of error.issues) {
    const name = issue.path.map(String).join('.');
    byField[name] = [...(byField[name] ?? []), issue.message];
  }
  return byField;
}

const STATUS: Partial<Record<RefusalCode, number>> = { not_found: 404, not_allowed: 403, wrong_origin: 403, too_many_tries: 429, cards_unavailable: 503, busy: 503, pass_unknown: 401, pass_revoked: 401 };

/** The HTTP status that a refusal answers with; 409 unless it says otherwise. */
export const statusOf = (code: RefusalCode): number => STATUS[code] ?? 409;
