import type { ReactNode } from 'react';
import { MemberSheet } from '@/components/layout/member-sheet';
import { PressForm } from '@/components/people/sign-in-forms';
import type { MemberCtx } from '@/lib/infra/context';
import { signOutAction } from '@/app/(public)/sign-in/actions';

type MemberPageProps = { ctx: MemberCtx; here: string; children: ReactNode };

const LINES = [
  { href: '/member', label: 'My household' },
  { href: '/member/dues', label: 'My dues' },
  { href: '/member/visits', label: 'My visits' },
];

/** A member's own page, with one more line for hosts and one for officers. */
export function MemberPage({ ctx: { actor, club }, here, children }: MemberPageProps) {
  const lines = [
    ...LINES,
    ...(actor.isHost ? [{ href: '/member/garden', label: 'My garden' }] : []),
    ...(actor.roles.length > 0 ? [{ href: '/office', label: 'The office' }] : []),
    { href: '/account', label: 'Sign-ins' },
  ];
  return (
    <MemberSheet club={{ name: club.name, line: club.footLine }} account={{ href: '/member', label: actor.name }} lines={lines} here={here} signOut={<PressForm action={signOutAction} submit="Sign out" size="small" />}>
      {children}
    </MemberSheet>
  );
}
