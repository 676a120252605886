import { REFUSALS } from '@/lib/core/refusal';

/** The least length of a password that is a sign-in's only step. NIST SP 800-63B-4 (2025), section 3.1.1.2: 15. */
export const PASSWORD_MIN = 15;

// Whole-string matches after folding; common practice: the guesses that reach 15 characters are repeats and runs.
const COMMON = ['passwordpassword', 'password12345678', '123456789012345', '1234567890123456', 'qwertyuiopasdfgh', 'iloveyouiloveyou', 'correcthorsebatterystaple', 'abcdefghijklmno', 'abcdefghijklmnop', 'administrator123'];

/** Why a password will not do, in a sentence, or null when it will. */
export function passwordProblem(password: string): string | null {
  const characters = Array.from(password);
  if (characters.length < PASSWORD_MIN) return REFUSALS.password_too_short;
  const folded = password.toLowerCase().replace(/\s/g, '');
  if (COMMON.includes(folded) || new Set(folded).size < 5) return REFUSALS.password_too_common;
  return null;
}
