import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { z } from 'zod';
import { Bill } from '@/components/layout/bill';
import { Part } from '@/components/layout/columns';
import { LetterState } from '@/components/office/letter-table';
import { FactForm } from '@/components/office/open-day-forms';
import { Table } from '@/components/ui/table';
import { When } from '@/components/ui/when';
import { idField } from '@/lib/core/ids';
import { findLetter } from '@/lib/letters/queries/list';
import { may } from '@/lib/people/rules/capabilities';
import { pageContext } from '@/lib/web/context';
import { OfficePage } from '../../office-page';
import { sendAgainAction } from '../actions';

export const metadata: Metadata = { title: 'Letter', robots: { index: false } };

const paramsInput = z.object({ id: idField<'letter'>() });
const OUTCOME = { sent: 'the mail server took it', failed: 'failed', dropped: 'not sent' } as const;

export default async function LetterPage({ params }: { params: Promise<{ id: string }> }) {
  const ctx = await pageContext('letters.see');
  const { club } = ctx;
  const asked = paramsInput.safeParse(await params);
  const letter = asked.success ? await findLetter(ctx, asked.data.id) : null;
  if (!letter) notFound();
  return (
    <OfficePage
      ctx={ctx}
      here="/office/letters"
      bill={<Bill name={letter.subject ?? letter.kindWords} line={<>To {letter.to}, written <When at={letter.madeAt} club={club} style="short" /></>} sums={<LetterState row={letter} club={club} />} />}
    >
      <Part title="What it says" place="first">
        {letter.text === null ? <p>It is put together when it is sent, from how things stand then.</p> : <pre className="max-w-3xl font-mono text-base whitespace-pre-wrap [overflow-wrap:anywhere]">{letter.text}</pre>}
      </Part>
      <Part title="Tries">
        <Table
          caption="Each try to send it, the newest first"
          rows={letter.tries}
          rowKey={(each) => each.triedAt.toISOString()}
          empty="It has not been tried yet."
          columns={[
            { key: 'at', head: 'When', names: 'row', cell: (each) => <When at={each.triedAt} style="short" club={club} /> },
            { key: 'how', head: 'How it ended', cell: (each) => OUTCOME[each.outcome] },
            { key: 'detail', head: 'The server’s words', cell: (each) => each.detail ?? '' },
          ]}
        />
        {letter.maySendAgain && may(ctx.actor.roles, 'letters.send') ? <div className="mt-5"><FactForm action={sendAgainAction} name="letterId" value={letter.id} submit="Send it again" tone="plain" /></div> : null}
      </Part>
    </OfficePage>
  );
}
