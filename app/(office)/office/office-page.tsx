import type { ComponentProps, ReactNode } from 'react';
import { signOutAction } from '@/app/(public)/sign-in/actions';
import { StaffCopy } from '@/components/layout/staff-copy';
import { PressForm } from '@/components/people/sign-in-forms';
import { When } from '@/components/ui/when';
import type { AccountCtx } from '@/lib/infra/context';
import { officeContents } from '@/lib/people/rules/office-contents';

type OfficePageProps = Omit<ComponentProps<typeof StaffCopy>, 'clubName' | 'printedAt' | 'contents' | 'signOut'> & {
  ctx: AccountCtx;
  /** Lines that belong to this page's own subject, above the general ones. */
  own?: ComponentProps<typeof StaffCopy>['contents'][number];
  children: ReactNode;
};

/** An officer's page: the staff copy with the contents that this officer may open. */
export function OfficePage({ ctx: { actor, club, now }, own, ...copy }: OfficePageProps) {
  const general = officeContents(actor.roles);
  return (
    <StaffCopy
      clubName={club.name}
      printedAt={<When at={now} club={club} style="bare" />}
      contents={own === undefined ? general : [own, ...general]}
      signOut={<PressForm action={signOutAction} submit="Sign out" size="small" />}
      {...copy}
    />
  );
}
