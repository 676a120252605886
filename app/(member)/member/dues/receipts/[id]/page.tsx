import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { z } from 'zod';
import { Bill } from '@/components/layout/bill';
import { Money } from '@/components/ui/money';
import { When } from '@/components/ui/when';
import { idField } from '@/lib/core/ids';
import { findReceipt } from '@/lib/dues/queries';
import { pageContext } from '@/lib/web/context';
import { MemberPage } from '../../../member-page';

export const metadata: Metadata = { title: 'Receipt', robots: { index: false } };

const METHOD = { card: 'by card', cheque: 'by cheque', cash: 'in cash', transfer: 'by bank transfer' } as const;
const paramsInput = z.object({ id: idField<'payment'>() });

export default async function ReceiptPage({ params }: { params: Promise<{ id: string }> }) {
  const ctx = await pageContext('member');
  const asked = paramsInput.safeParse(await params);
  const receipt = asked.success ? await findReceipt(ctx, asked.data.id) : null;
  if (!receipt) notFound();
  const { club } = ctx;
  return (
    <MemberPage ctx={ctx} here="/member/dues">
      <Bill name={`Receipt ${receipt.number}`} line={<When on={receipt.receivedOn} club={club} />} />
      <dl className="mt-6 grid max-w-xl grid-cols-[auto_1fr] gap-x-6 gap-y-2">
        <Line name="from">{receipt.household}, household {receipt.memberNumber}</Line>
        <Line name="for">{receipt.className} dues, <When on={receipt.termFrom} club={club} style="short" /> to <When on={receipt.termTo} club={club} style="short" /></Line>
        <Line name="received"><Money amountMinor={receipt.amountMinor} currency={receipt.currency} locale={club.locale} /> {METHOD[receipt.method]}{receipt.reference === null ? '' : `, ${receipt.reference}`}</Line>
        <Line name="by">{club.name}</Line>
      </dl>
      <p className="mt-6 text-ink-soft">What dues mean for your tax is for a tax adviser to say, not for this page.</p>
    </MemberPage>
  );
}

function Line({ name, children }: { name: string; children: React.ReactNode }) {
  return (
    <>
      <dt className="note">{name}</dt>
      <dd>{children}</dd>
    </>
  );
}
