import type { Metadata } from 'next';
import Link from 'next/link';
import { Bill } from '@/components/layout/bill';
import { Columns, Part } from '@/components/layout/columns';
import { Money } from '@/components/ui/money';
import { membershipOffer } from '@/lib/dues/class-queries';
import { pageContext } from '@/lib/web/context';
import { FootFlowers } from '../foot-flowers';
import { PublicSheet } from '../public-sheet';

export const metadata: Metadata = { title: 'Membership' };

export default async function MembershipPage() {
  const ctx = await pageContext('anyone');
  const { club } = ctx;
  const classes = await membershipOffer(ctx);
  return (
    <PublicSheet club={club} here="/membership" foot={<FootFlowers ctx={ctx} />}>
      <Bill name="Membership" line="For people with a railway in the garden, a garden with room for one, or neither yet" sums={`Dues run from 1 January to 31 December. Whoever forgets is kept on for ${club.duesKeptOnDays} days, with a letter.`} />
      <Columns split="main-aside">
        <div>
          <Part title="Classes and dues" place="first">
            <dl className="border-t-2 border-ink">
              {classes.map((each) => (
                <div key={each.key} className="grid gap-x-6 border-b border-rule py-3 sm:grid-cols-[1fr_auto]">
                  <dt className="font-heading text-2xl font-bold">{each.name}</dt>
                  <dd className="figures sm:text-right">{each.amountMinor === null ? 'by the committee’s invitation' : <><Money amountMinor={each.amountMinor} currency={club.currency} locale={club.locale} show="price" /> {each.isForLife ? 'once' : 'a year'}</>}</dd>
                  <dd className="text-ink-soft sm:col-span-2">{each.about}</dd>
                </div>
              ))}
            </dl>
          </Part>
          <Part title="What you get">
            <ul className="list-disc pl-6">
              <li>other people’s gardens, by invitation, all year; and yours looked at kindly</li>
              <li>help with the first curve, the second-hand engine, and the plant that grew over the points</li>
              <li>a turn at a gate on open days, which is the best seat there is</li>
              <li>your own page here: dues, receipts, visits, and who is coming to your garden</li>
            </ul>
          </Part>
        </div>
        <div>
          <Part title="How to join" place="first">
            <p>Write to <a className="link" href={`mailto:${club.email}?subject=Joining`}>{club.email}</a>, or speak to anyone at a gate on an open day. The membership secretary answers, usually with a question about scale.</p>
          </Part>
          <Part title="If you are a member">
            <p><Link className="link" href="/sign-in">Sign in</Link> to pay your dues by card, see your receipts, and change how we reach you. A cheque or a transfer is as welcome.</p>
          </Part>
          <Part title="Take care">
            <p>Live steam is hot, ponds are deep enough, and low-voltage power still starts fires. New members are shown how; local codes and a licensed person’s advice come first.</p>
          </Part>
        </div>
      </Columns>
    </PublicSheet>
  );
}
