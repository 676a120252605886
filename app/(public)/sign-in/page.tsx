import type { Metadata } from 'next';
import { Bill } from '@/components/layout/bill';
import { Columns } from '@/components/layout/columns';
import { AskForCodeForm, SignInPasswordForm } from '@/components/people/sign-in-forms';
import { pageContext } from '@/lib/web/context';
import { PublicSheet } from '../public-sheet';
import { askForCodeAction, signInWithPasswordAction } from './actions';

export const metadata: Metadata = { title: 'Sign in' };

export default async function SignInPage() {
  const { club } = await pageContext('anyone');
  return (
    <PublicSheet club={club} here="/sign-in">
      <Bill name="Sign in" line="For members, hosts and officers; visitors need no account" />
      <Columns split="halves">
        <section aria-labelledby="by-letter" className="grid content-start gap-4">
          <h2 id="by-letter">By letter</h2>
          <p>We write to your address with a code and a link. Nothing to remember.</p>
          <AskForCodeForm action={askForCodeAction} />
        </section>
        <section aria-labelledby="by-password" className="grid content-start gap-4">
          <h2 id="by-password">With a password</h2>
          <p>Only if you have set one on your account page.</p>
          <SignInPasswordForm action={signInWithPasswordAction} />
        </section>
      </Columns>
    </PublicSheet>
  );
}
