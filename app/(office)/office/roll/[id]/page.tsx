import type { Metadata } from 'next';
import Link from 'next/link';
import { notFound } from 'next/navigation';
import { z } from 'zod';
import { Bill } from '@/components/layout/bill';
import { Part } from '@/components/layout/columns';
import { StandingLine } from '@/components/member/standing-line';
import { HouseholdLine } from '@/components/member/household-line';
import { RecordPaymentForm } from '@/components/office/record-payment-form';
import { Money } from '@/components/ui/money';
import { Table } from '@/components/ui/table';
import { When } from '@/components/ui/when';
import { idField } from '@/lib/core/ids';
import { decimalText, minorDigits } from '@/lib/core/money';
import { dayOf } from '@/lib/core/time';
import { householdDues, lineFacts } from '@/lib/dues/queries';
import { lineOf } from '@/lib/dues/rules/line';
import { findHousehold } from '@/lib/people/roll-household';
import { may } from '@/lib/people/rules/capabilities';
import { pageContext } from '@/lib/web/context';
import { OfficePage } from '../../office-page';
import { recordPaymentAction } from '../actions';

export const metadata: Metadata = { title: 'Household', robots: { index: false } };

const paramsInput = z.object({ id: idField<'household'>() });

export default async function HouseholdPage({ params }: { params: Promise<{ id: string }> }) {
  const ctx = await pageContext('roll.see');
  const { club } = ctx;
  const asked = paramsInput.safeParse(await params);
  const household = asked.success ? await findHousehold(ctx, asked.data.id) : null;
  if (!household || !asked.success) notFound();
  const { standing, charges, receipts } = await householdDues(ctx, asked.data.id);
  const stations = lineOf({ joinedOn: household.joinedOn, standing, ...(await lineFacts(ctx, asked.data.id)) }, dayOf(ctx.now, club.timeZone), club);
  const owing = charges.filter((charge) => charge.paidMinor < charge.amountMinor);
  const money = (amountMinor: number) => <Money amountMinor={amountMinor} currency={club.currency} locale={club.locale} />;
  return (
    <OfficePage ctx={ctx} here="/office/roll" bill={<Bill name={household.name} line={<>No. {household.memberNumber}, since <When on={household.joinedOn} club={club} style="short" /></>} sums={<StandingLine standing={standing} club={club} />} />}>
      <Part title="Its line" place="first">
        <HouseholdLine stations={stations} club={club} />
      </Part>
      <Part title="People">
        <ul className="border-t border-rule">
          {household.people.map((person) => (
            <li key={person.id} className="border-b border-rule py-2">
              <strong>{person.name}</strong>{person.age === 'junior' ? ', junior' : ''}{person.isContact ? ', letters go here' : ''}
              {person.reached === null || person.reached === '' ? null : <span className="block text-ink-soft">{person.reached}</span>}
            </li>
          ))}
        </ul>
      </Part>
      <Part title="Owing">
        {owing.length === 0 ? <p>Nothing is owed.</p> : null}
        {owing.map((charge) => (
          <div key={charge.id} className="mb-6">
            <p className="mb-3">{charge.className}, <When on={charge.termFrom} club={club} style="short" /> to <When on={charge.termTo} club={club} style="short" />: {money(charge.amountMinor - charge.paidMinor)} of {money(charge.amountMinor)}</p>
            {may(ctx.actor.roles, 'dues.record') ? (
              <RecordPaymentForm action={recordPaymentAction} chargeId={charge.id} amount={decimalText(charge.amountMinor - charge.paidMinor, minorDigits(club.currency))} today={dayOf(ctx.now, club.timeZone)} />
            ) : null}
          </div>
        ))}
      </Part>
      <Part title="Receipts">
        <Table
          caption="Receipts of this household"
          rows={receipts}
          rowKey={(receipt) => receipt.id}
          empty="No payment has come yet."
          columns={[
            { key: 'number', head: 'Receipt', names: 'row', cell: (receipt) => (may(ctx.actor.roles, 'books.see') ? <Link className="link" href={`/office/books/receipts/${receipt.id}`}>{receipt.number}</Link> : receipt.number) },
            { key: 'on', head: 'Received', cell: (receipt) => <When on={receipt.receivedOn} club={club} style="short" /> },
            { key: 'method', head: 'As', cell: (receipt) => receipt.method },
            { key: 'for', head: 'For', cell: (receipt) => (receipt.termTo === null ? 'tickets' : <>dues to <When on={receipt.termTo} club={club} style="short" /></>) },
            { key: 'amount', head: 'Amount', set: 'figures', cell: (receipt) => money(receipt.amountMinor) },
          ]}
        />
      </Part>
    </OfficePage>
  );
}
