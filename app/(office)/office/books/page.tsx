import type { Metadata } from 'next';
import { Bill } from '@/components/layout/bill';
import { Part } from '@/components/layout/columns';
import { CsvLink } from '@/components/office/csv-link';
import { FindForm } from '@/components/office/find-form';
import { IncomeTable, JournalTable, ReceiptTable, RefundTable } from '@/components/office/book-tables';
import { Pages } from '@/components/office/pages';
import { PaidByHandForm } from '@/components/office/refund-forms';
import { Money } from '@/components/ui/money';
import { accountBalances, incomeByFund, incomeByOpenDay, journalLines, receiptLines, refundsOpen } from '@/lib/books/queries';
import { receiptsInput } from '@/lib/books/schema';
import { sumMinor } from '@/lib/core/money';
import { pageContext } from '@/lib/web/context';
import { may } from '@/lib/people/rules/capabilities';
import { OfficePage } from '../office-page';
import { paidByHandAction } from './actions';

export const metadata: Metadata = { title: 'The books', robots: { index: false } };

const PATH = '/office/books';

export default async function BooksPage({ searchParams }: { searchParams: Promise<Record<string, string | string[] | undefined>> }) {
  const ctx = await pageContext('books.see');
  const { club } = ctx;
  const asked = receiptsInput.parse(await searchParams);
  const [days, byFund, balances] = [await incomeByOpenDay(ctx), await incomeByFund(ctx), await accountBalances(ctx)];
  const [receipts, refunds, journal] = [await receiptLines(ctx, asked), await refundsOpen(ctx), await journalLines(ctx)];
  const stuck = refunds.filter((refund) => refund.isByHandDue).length;
  const money = (amountMinor: number) => <Money amountMinor={amountMinor} currency={club.currency} locale={club.locale} />;
  const holds = (code: string) => balances.find((each) => each.code === code)?.balanceMinor ?? 0;
  return (
    <OfficePage
      ctx={ctx}
      here={PATH}
      bill={
        <Bill
          name="The books"
          line="Every dollar from payer to bank; nothing here is edited, only reversed"
          sums={<>{money(sumMinor(byFund.map((fund) => fund.cameInMinor)))} has come in. {money(holds('cards-clearing'))} is with the card service, {money(holds('cheques-in-hand'))} in cheques, {money(holds('cash-in-hand'))} in cash and {money(holds('bank'))} in the bank.</>}
        />
      }
      {...(stuck === 0 ? {} : { toSettle: [{ id: 'refunds', by: 'now', weight: 'now' as const, sentence: `${stuck === 1 ? 'One refund' : `${stuck} refunds`} must be paid out by hand`, link: { href: '#refunds', label: 'Pay and book' } }] })}
      foot="Nothing here is edited; a mistake is answered by a new entry that names it."
    >
      <Part title="By open day" place="first">
        <IncomeTable caption="What each open day brought in" first="Open day" rows={days.map((day) => ({ id: day.id, name: day.title, on: day.heldOn, cameInMinor: day.cameInMinor, feesMinor: day.feesMinor }))} club={club} />
      </Part>
      <Part title="By fund">
        <IncomeTable caption="What each fund took in" first="Fund" rows={byFund.map((fund) => ({ id: fund.key, name: fund.name, on: null, cameInMinor: fund.cameInMinor, feesMinor: fund.feesMinor }))} club={club} />
      </Part>
      <Part title="Refunds not yet through" id="refunds">
        <RefundTable caption="Refunds not yet through" rows={refunds} club={club} empty="None waits." {...(may(ctx.actor.roles, 'refunds.make') ? { settle: (refund) => <PaidByHandForm action={paidByHandAction} refundId={refund.id} /> } : {})} />
      </Part>
      <Part title="Receipts" id="receipts">
        <FindForm path={PATH} label="Payer, reference or receipt" find={asked.find} submit="Look" />
        <ReceiptTable rows={receipts.rows} asked={asked} path={PATH} club={club} />
        <Pages path={PATH} listing={asked} what="receipts" shown={receipts.rows.length} total={receipts.total} />
        <p className="mt-4"><CsvLink href={`${PATH}/csv?${new URLSearchParams({ find: asked.find, sort: asked.sort, order: asked.order })}`} what="these receipts" /></p>
      </Part>
      <Part title="The journal, newest first">
        <JournalTable rows={journal} club={club} />
      </Part>
    </OfficePage>
  );
}
