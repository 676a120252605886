import type { Metadata } from 'next';
import { Bill } from '@/components/layout/bill';
import { CsvLink } from '@/components/office/csv-link';
import { FindForm } from '@/components/office/find-form';
import { LetterFilter } from '@/components/office/letter-filter';
import { LetterTable } from '@/components/office/letter-table';
import { Pagination } from '@/components/ui/pagination';
import { RailRule } from '@/components/ui/rail-rule';
import { letterPage } from '@/lib/letters/queries/list';
import { letterListInput } from '@/lib/letters/schema';
import { LETTER_PAGE_ROWS } from '@/lib/letters/views';
import { counted } from '@/lib/opendays/rules/words';
import { pageContext } from '@/lib/web/context';
import { OfficePage } from '../office-page';

export const metadata: Metadata = { title: 'Letters', robots: { index: false } };

const PATH = '/office/letters';

export default async function LettersPage({ searchParams }: { searchParams: Promise<Record<string, string | string[] | undefined>> }) {
  const ctx = await pageContext('letters.see');
  const asked = letterListInput.parse(await searchParams);
  const { rows, total, page } = await letterPage(ctx, asked);
  const before = (page - 1) * LETTER_PAGE_ROWS;
  const query = (next: number) => `${PATH}?${new URLSearchParams({ state: asked.state, kind: asked.kind, find: asked.find, page: String(next) })}`;
  return (
    <OfficePage
      ctx={ctx}
      here={PATH}
      bill={<Bill name="Letters" line="What the club sent and what could not be delivered; codes, links and garden addresses are blanked" sums={`${counted(total, 'letter', 'letters')}${asked.state === 'all' && asked.find === '' ? '' : ' of this kind'}.`} {...(total === 0 && asked.state === 'all' && asked.find === '' ? { rail: <RailRule state="empty" /> } : {})} />}
    >
      <h2>Letters</h2>
      <LetterFilter shown={asked.state} path={PATH} find={asked.find} />
      <FindForm path={PATH} label="Name, e-mail or subject" find={asked.find} submit="Find letters" keep={asked.state === 'all' ? {} : { state: asked.state }} />
      <LetterTable rows={rows} club={ctx.club} mayOpen empty={asked.state === 'failing' ? 'Every letter that was due has gone.' : 'No letter answers to that.'} />
      <Pagination what="letters" from={rows.length === 0 ? 0 : before + 1} to={before + rows.length} total={total} {...(page > 1 ? { previousHref: query(page - 1) } : {})} {...(before + rows.length < total ? { nextHref: query(page + 1) } : {})} />
      <p className="mt-4"><CsvLink href={`${PATH}/csv?${new URLSearchParams({ state: asked.state, kind: asked.kind, find: asked.find, page: String(page) })}`} what="this page" /></p>
    </OfficePage>
  );
}
