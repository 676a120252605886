import { redirect } from 'next/navigation';
import { pageContext } from '@/lib/web/context';

/** Leads whoever has just signed in to their own pages: officers to the office, members to theirs. */
export default async function HomePage() {
  const { actor } = await pageContext('account');
  if (actor.roles.length > 0) redirect('/office');
  redirect(actor.householdId === null ? '/account' : '/member');
}
