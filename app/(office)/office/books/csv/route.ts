import { receiptLines } from '@/lib/books/queries';
import { receiptsInput } from '@/lib/books/schema';
import { toCsv } from '@/lib/core/csv';
import { decimalText, minorDigits } from '@/lib/core/money';
import { receiptNumber } from '@/lib/dues/views';
import { route } from '@/lib/web/route';

const HEAD = ['Receipt', 'Received on', 'From', 'For', 'As', 'Reference', 'Amount', 'Given back', 'Currency'];

export const GET = route({
  name: '/office/books/csv',
  requires: 'books.see',
  input: receiptsInput,
  run: async ({ ctx, input }) => {
    const { rows } = await receiptLines(ctx, input, 'all');
    const { currency } = ctx.club;
    const amount = (amountMinor: number) => decimalText(amountMinor, minorDigits(currency));
    const lines = rows.map((row) => [receiptNumber(row.year, row.number), row.receivedOn, row.payer, row.isDues ? 'dues' : 'tickets', row.method, row.reference, amount(row.amountMinor), amount(row.givenBackMinor), currency]);
    return new Response(toCsv(HEAD, lines), { headers: { 'Content-Type': 'text/csv; charset=utf-8', 'Content-Disposition': 'attachment; filename="receipts.csv"', 'Cache-Control': 'private, no-store' } });
  },
});
