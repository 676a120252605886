import type { Role } from '@/lib/core/words';

/** What an officer's role lets its holder do. Nothing else does: deny by default. */
const GRANTS = {
  administrator: ['settings.edit', 'roles.edit', 'audit.see', 'letters.see', 'letters.send', 'people.see'],
  coordinator: ['openDays.see', 'openDays.edit', 'bookings.see', 'bookings.edit', 'gates.edit', 'gardens.see', 'letters.see', 'letters.send'],
  secretary: ['people.see', 'people.edit', 'roll.see', 'dues.see', 'dues.record', 'letters.see', 'gardens.see'],
  treasurer: ['roll.see', 'dues.see', 'dues.record', 'books.see', 'refunds.make', 'bookings.see', 'openDays.see', 'letters.see'],
} as const satisfies Record<Role, readonly string[]>;

/** A thing an officer may do. */
export type Capability = (typeof GRANTS)[Role][number];

/** Whether someone who holds `roles` may do what `capability` names. */
export const may = (roles: readonly Role[], capability: Capability): boolean =>
  roles.some((role) => GRANTS[role].some((granted) => granted === capability));

/** Whether someone holds any officer's role at all. */
export const isOfficer = (roles: readonly Role[]): boolean => roles.length > 0;
