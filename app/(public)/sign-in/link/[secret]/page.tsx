import type { Metadata } from 'next';
import { Bill } from '@/components/layout/bill';
import { SignInLinkForm } from '@/components/people/sign-in-forms';
import { pageContext } from '@/lib/web/context';
import { PublicSheet } from '../../../public-sheet';
import { signInWithLinkAction } from '../../actions';

export const metadata: Metadata = { title: 'Sign in', referrer: 'same-origin', robots: { index: false } };

/** Where a letter's link lands. Opening it changes nothing: mail scanners open links, only people press buttons. */
export default async function SignInLinkPage({ params }: { params: Promise<{ secret: string }> }) {
  const { club } = await pageContext('anyone');
  const { secret } = await params;
  return (
    <PublicSheet club={club} here="/sign-in">
      <Bill name="Sign in here" line="One press, and this browser knows you for 30 days" />
      <div className="mt-8">
        <SignInLinkForm action={signInWithLinkAction} secret={secret} />
      </div>
    </PublicSheet>
  );
}
