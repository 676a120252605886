import type { Role } from '@/lib/core/words';

/** Where an account's own pages begin: officers in the office, members at their household, others at their account. */
export function homePathOf({ roles, householdId }: { roles: readonly Role[]; householdId: string | null }): string {
  if (roles.length > 0) return '/office';
  return householdId === null ? '/account' : '/member';
}
