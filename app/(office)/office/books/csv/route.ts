import { receiptLines } from '@/lib/books/queries';
import { receiptsInput } from '@/lib/books/schema';
import { decimalText, minorDigits } from '@/lib/core/money';
import { receiptNumber } from '@/lib/dues/views';
import { csvFile } from '@/lib/web/csv-file';
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
    return csvFile('receipts.csv', HEAD, lines);
  },
});
