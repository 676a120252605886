import type { Metadata } from 'next';
import Link from 'next/link';
import { Bill } from '@/components/layout/bill';
import { Columns } from '@/components/layout/columns';
import { NewPasswordForm, PressForm } from '@/components/people/sign-in-forms';
import { When } from '@/components/ui/when';
import { accountPage } from '@/lib/people/account-queries';
import { isOfficer } from '@/lib/people/rules/capabilities';
import { pageContext } from '@/lib/web/context';
import { PublicSheet } from '../public-sheet';
import { signOutAction, signOutEverywhereAction } from '../sign-in/actions';
import { dropPasswordAction, setPasswordAction } from './actions';

export const metadata: Metadata = { title: 'Your account', robots: { index: false } };

const METHOD = { code: 'by a code', link: 'by a letter’s link', password: 'with the password' } as const;

export default async function AccountPage() {
  const ctx = await pageContext('account');
  const { club, actor } = ctx;
  const { hasPassword, signIns } = await accountPage(ctx);
  return (
    <PublicSheet club={club} here="/account">
      <Bill
        name={actor.name}
        line={`You sign in as ${actor.email}`}
        sums={
          <>
            {actor.householdId === null ? null : <Link className="link mr-6" href="/member">Your household</Link>}
            {isOfficer(actor.roles) ? <Link className="link" href="/office">The office</Link> : null}
          </>
        }
      />
      <Columns split="halves">
        <section aria-labelledby="sign-ins" className="grid content-start gap-4">
          <h2 id="sign-ins">Where you are signed in</h2>
          <ul className="border-t border-rule">
            {signIns.map((each) => (
              <li key={each.id} className="border-b border-rule py-2">
                <When at={each.signedInAt} club={club} /> {METHOD[each.method]}
                {each.id === actor.signInId ? <strong>, here</strong> : null}
              </li>
            ))}
          </ul>
          <PressForm action={signOutAction} submit="Sign out here" tone="plain" />
          <PressForm action={signOutEverywhereAction} submit="Sign out everywhere at once" tone="danger" />
        </section>
        <section aria-labelledby="password" className="grid content-start gap-4">
          <h2 id="password">Password</h2>
          <p>{hasPassword ? 'You have a password. A code by letter works as well.' : 'You have none, and need none: a code by letter does.'}</p>
          <NewPasswordForm action={setPasswordAction} has={hasPassword ? 'password' : 'none'} />
          {hasPassword ? <PressForm action={dropPasswordAction} submit="Do without a password" /> : null}
        </section>
      </Columns>
    </PublicSheet>
  );
}
