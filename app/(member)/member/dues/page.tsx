import type { Metadata } from 'next';
import Link from 'next/link';
import { Bill } from '@/components/layout/bill';
import { Part } from '@/components/layout/columns';
import { PayDuesForm } from '@/components/member/forms';
import { HouseholdLine } from '@/components/member/household-line';
import { StandingLine } from '@/components/member/standing-line';
import { Money } from '@/components/ui/money';
import { When } from '@/components/ui/when';
import { formatMoney } from '@/lib/core/money';
import { memberDues, memberLine } from '@/lib/dues/queries';
import type { ChargeView } from '@/lib/dues/views';
import { pageContext } from '@/lib/web/context';
import { MemberPage } from '../member-page';
import { payDuesAction } from './actions';

export const metadata: Metadata = { title: 'My dues', robots: { index: false } };

const METHOD = { card: 'by card', cheque: 'by cheque', cash: 'in cash', transfer: 'by transfer' } as const;

export default async function DuesPage({ searchParams }: { searchParams: Promise<{ paid?: string }> }) {
  const ctx = await pageContext('member');
  const { club } = ctx;
  const dues = await memberDues(ctx);
  const { standing, charges, receipts } = dues;
  const stations = await memberLine(ctx, dues);
  const { paid } = await searchParams;
  const owing = charges.filter((charge) => charge.paidMinor < charge.amountMinor);
  return (
    <MemberPage ctx={ctx} here="/member/dues">
      <Bill name="My dues" line={<StandingLine standing={standing} club={club} />} {...(paid === undefined ? {} : { sums: <Back isSettled={owing.length === 0} /> })} />
      <Part title="To pay" place="first">
        {owing.length === 0 ? <p>Nothing is owed.</p> : owing.map((charge) => <Owing key={charge.id} charge={charge} club={club} isBack={paid !== undefined} />)}
      </Part>
      <Part title="My line">
        <HouseholdLine stations={stations} club={club} />
      </Part>
      <Part title="Receipts">
        {receipts.length === 0 ? <p>No payment has come yet. The first makes the first receipt.</p> : null}
        <ul className={receipts.length === 0 ? '' : 'border-t border-rule'}>
          {receipts.map((receipt) => (
            <li key={receipt.id} className="flex flex-wrap items-baseline gap-x-5 border-b border-rule py-2">
              <Link className="link inline-flex min-h-11 items-center font-mono" href={`/member/dues/receipts/${receipt.id}`}>{receipt.number}</Link>
              <When on={receipt.receivedOn} club={club} style="short" />
              <span>{METHOD[receipt.method]}</span>
              <span className="ml-auto figures"><Money amountMinor={receipt.amountMinor} currency={club.currency} locale={club.locale} /></span>
            </li>
          ))}
        </ul>
      </Part>
    </MemberPage>
  );
}

function Back({ isSettled }: { isSettled: boolean }) {
  return isSettled
    ? <>The payment has come, thank you. The receipt is below and on its way by letter.</>
    : <>The card service has not told us yet. This page will say so when it has; <Link className="link" href="/member/dues?paid=look">look again</Link> in a moment.</>;
}

type OwingProps = { charge: ChargeView; club: { currency: string; locale: string; timeZone: string; hourCycle: 'h12' | 'h23' }; isBack: boolean };

/** What is owed and its button; whoever is just back from paying it is not asked to pay it again. */
function Owing({ charge, club, isBack }: OwingProps) {
  const amount = formatMoney({ amountMinor: charge.amountMinor - charge.paidMinor, currency: club.currency }, club.locale);
  return (
    <div className="flex flex-wrap items-center justify-between gap-4 border-t border-rule py-3">
      <p>
        {charge.className}, <When on={charge.termFrom} club={club} style="short" /> to <When on={charge.termTo} club={club} style="short" />: <strong className="figures">{amount}</strong>
        {charge.isPaying ? ', a card payment is open' : ''}
      </p>
      {isBack && charge.isPaying ? null : <PayDuesForm action={payDuesAction} chargeId={charge.id} submit={`Pay ${amount} by card`} />}
    </div>
  );
}
