import type { Metadata } from 'next';
import Link from 'next/link';
import { Bill } from '@/components/layout/bill';
import { SignInCodeForm } from '@/components/people/sign-in-forms';
import { pageContext } from '@/lib/web/context';
import { PublicSheet } from '../../public-sheet';
import { signInWithCodeAction } from '../actions';
import { askedAddress } from '../session';

export const metadata: Metadata = { title: 'Your code' };

export default async function SignInCodePage() {
  const { club } = await pageContext('anyone');
  const email = await askedAddress();
  return (
    <PublicSheet club={club} here="/sign-in">
      <Bill name="Look in your post" line="If that address belongs to an account, a letter with a code is on its way" />
      <div className="mt-8 grid max-w-xl gap-5">
        <SignInCodeForm action={signInWithCodeAction} email={email} />
        <p>
          The letter also has a link that does the same. No letter after a few minutes? Look among the unwanted ones, or <Link className="link" href="/sign-in">ask again</Link>.
        </p>
      </div>
    </PublicSheet>
  );
}
