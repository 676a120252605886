import type { ComponentProps } from 'react';
import { Sheet } from '@/components/layout/sheet';
import type { ClubSettings } from '@/lib/infra/context';
import { currentAccount } from '@/lib/web/context';

type PublicSheetProps = Omit<ComponentProps<typeof Sheet>, 'club' | 'account'> & { club: ClubSettings };

/** A public page of this club, with the reader's own name in place of "Sign in" once they have. */
export async function PublicSheet({ club, ...sheet }: PublicSheetProps) {
  const account = await currentAccount();
  const own = account === null ? {} : { account: { href: account.householdId === null ? (account.roles.length > 0 ? '/office' : '/account') : '/member', label: account.name } };
  return <Sheet club={{ name: club.name, line: club.footLine }} {...own} {...sheet} />;
}
