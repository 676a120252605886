import 'server-only';
import { z } from 'zod';

/** The job that sends one letter; a nudge only, the row in `letters_due` is what must survive. */
export const SEND_LETTER = 'sendLetter';
export const sendLetterPayload = z.object({ letterId: z.uuid() });

/** One job at most waits for a letter. */
export const sendLetterKey = (letterId: string): string => `letter:${letterId}`;
