import type { Role } from '@/lib/core/words';
import { may, type Capability } from './capabilities';

type Line = { href: string; label: string };

const LINES: readonly (readonly (Line & { needs: Capability })[])[] = [
  [
    { href: '/office/open-days', label: 'Open days', needs: 'openDays.see' },
    { href: '/office/bookings', label: 'Bookings', needs: 'bookings.see' },
  ],
  [
    { href: '/office/roll', label: 'The roll', needs: 'roll.see' },
    { href: '/office/books', label: 'The books', needs: 'books.see' },
  ],
  [
    { href: '/office/letters', label: 'Letters', needs: 'letters.see' },
    { href: '/office/people', label: 'People and roles', needs: 'roles.edit' },
    { href: '/office/settings', label: 'Settings', needs: 'settings.edit' },
    { href: '/office/audit', label: 'Audit trail', needs: 'audit.see' },
  ],
];

/** The office's contents that someone with these roles may open, in groups; empty groups are left out. */
export function officeContents(roles: readonly Role[]): Line[][] {
  const open = LINES.map((group) => group.filter((line) => may(roles, line.needs)).map(({ href, label }) => ({ href, label })));
  return open.filter((group) => group.length > 0);
}
