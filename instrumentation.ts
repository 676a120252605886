import { env } from '@/lib/infra/env';

/** Runs once when a server starts: a wrong or missing setting stops it with one clear line. */
export function register(): void {
  try {
    env();
  } catch (error) {
    console.error(error instanceof Error ? error.message : error);
    process.exit(1);
  }
}
