import 'server-only';
import { toCsv } from '@/lib/core/csv';

/** A table as a file to keep; private to whoever asked. */
export const csvFile = (name: string, head: readonly string[], rows: readonly (readonly (string | number | null)[])[]): Response =>
  new Response(toCsv(head, rows), {
    headers: { 'Content-Type': 'text/csv; charset=utf-8', 'Content-Disposition': `attachment; filename="${name}"`, 'Cache-Control': 'private, no-store' },
  });
