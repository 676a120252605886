import { refresh } from 'next/cache';
import type { FormState } from '@/lib/core/form-state';

/** Shows the page anew and says what was done. */
export function doneWith(message: string): FormState {
  refresh();
  return { status: 'done', message };
}
