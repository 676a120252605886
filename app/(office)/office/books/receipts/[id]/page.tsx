import type { Metadata } from 'next';
import Link from 'next/link';
import { notFound } from 'next/navigation';
import { z } from 'zod';
import { Bill } from '@/components/layout/bill';
import { Part } from '@/components/layout/columns';
import { RefundTable } from '@/components/office/book-tables';
import { GiveBackPaymentForm, PaidByHandForm } from '@/components/office/refund-forms';
import { Money } from '@/components/ui/money';
import { When } from '@/components/ui/when';
import { findPayment, refundsOf } from '@/lib/books/queries';
import { idField } from '@/lib/core/ids';
import { decimalText, minorDigits, sumMinor } from '@/lib/core/money';
import { receiptNumber } from '@/lib/dues/views';
import { may } from '@/lib/people/rules/capabilities';
import { pageContext } from '@/lib/web/context';
import { OfficePage } from '../../../office-page';
import { giveBackPaymentAction, paidByHandAction } from '../../actions';

export const metadata: Metadata = { title: 'Receipt', robots: { index: false } };

const paramsInput = z.object({ id: idField<'payment'>() });
const WAY = { card: 'by card', cheque: 'by cheque', cash: 'in cash', transfer: 'by bank transfer' } as const;

export default async function OfficeReceiptPage({ params }: { params: Promise<{ id: string }> }) {
  const ctx = await pageContext('books.see');
  const { club } = ctx;
  const asked = paramsInput.safeParse(await params);
  const payment = asked.success ? await findPayment(ctx, asked.data.id) : null;
  if (!payment) notFound();
  const refunds = await refundsOf(ctx, payment.id);
  const left = payment.amountMinor - sumMinor(refunds.map((refund) => refund.amountMinor));
  const money = (amountMinor: number) => <Money amountMinor={amountMinor} currency={payment.currency} locale={club.locale} />;
  const payer = payment.code !== null
    ? <Link className="link" href={`/office/bookings/${payment.code}`}>{payment.party}, {payment.day}</Link>
    : <Link className="link" href={`/office/roll/${payment.householdId}`}>{payment.household}</Link>;
  const mayRefund = may(ctx.actor.roles, 'refunds.make');
  return (
    <OfficePage
      ctx={ctx}
      here="/office/books"
      bill={
        <Bill
          name={`Receipt ${receiptNumber(payment.year, payment.number)}`}
          line={<>{money(payment.amountMinor)} {WAY[payment.method]}, received <When on={payment.receivedOn} club={club} style="short" />{payment.reference === null ? '' : `, ${payment.reference}`}</>}
          sums={<>From {payer}, for {payment.termTo === null ? 'tickets' : <>dues to <When on={payment.termTo} club={club} style="short" /></>}. {refunds.length === 0 ? 'Nothing of it was given back.' : <>{money(payment.amountMinor - left)} of it was given back.</>}</>}
        />
      }
    >
      <Part title="Given back" place="first">
        <RefundTable caption="What was given back of this payment" rows={refunds} club={club} empty="Nothing yet." {...(mayRefund ? { settle: (refund) => <PaidByHandForm action={paidByHandAction} refundId={refund.id} /> } : {})} />
      </Part>
      {mayRefund && left > 0 ? (
        <Part title="Give money back">
          <p className="mb-4">
            {payment.method === 'card' ? 'It goes back to the card it came from, within some days.' : 'Pay it out first, then book it here: it counts as gone at once.'} {payment.code === null ? 'The household’s term stays as it is.' : 'The party keeps its places; to free them, give them back on its booking.'}
          </p>
          <GiveBackPaymentForm action={giveBackPaymentAction} paymentId={payment.id} amount={decimalText(left, minorDigits(payment.currency))} submit={payment.method === 'card' ? 'Give it back to the card' : 'Book it as paid out'} />
        </Part>
      ) : null}
    </OfficePage>
  );
}
