import type { ComponentProps, ReactNode } from 'react';
import { notFound } from 'next/navigation';
import { When } from '@/components/ui/when';
import type { AccountCtx } from '@/lib/infra/context';
import { findOfficeDay, officeTimes, planNotes } from '@/lib/opendays/office-queries';
import { dayContents, toOfficeStops, type OfficeStop } from '@/lib/opendays/office-views';
import { OfficePage } from '../office-page';

export type OfficeDay = NonNullable<Awaited<ReturnType<typeof findOfficeDay>>>;
type Copy = { day: OfficeDay; stops: OfficeStop[]; notes: Awaited<ReturnType<typeof planNotes>> };

/** An open day with its stops and its pencil notes, or the page that says it is not there. Three queries. */
export async function getDayCopy(ctx: AccountCtx, slug: string): Promise<Copy> {
  const day = await findOfficeDay(ctx, slug);
  if (!day) notFound();
  return { day, stops: toOfficeStops(await officeTimes(ctx, day.id)), notes: await planNotes(ctx, day.id) };
}

type DayCopyProps = { ctx: AccountCtx; copy: Copy; here: string; bill: ReactNode; toSettle?: ComponentProps<typeof OfficePage>['toSettle']; foot?: ReactNode; children: ReactNode };

/** A page of one open day's staff copy: its own contents above the office's, its pencil notes in the margin. */
export function DayCopy({ ctx, copy: { day, stops, notes }, here, bill, toSettle, foot, children }: DayCopyProps) {
  return (
    <OfficePage
      ctx={ctx}
      here={here}
      own={dayContents(day, stops, ctx.actor.roles)}
      bill={bill}
      notes={notes.map((note) => ({
        id: note.id, text: note.note, by: note.initials, on: <When at={note.at} show="day" style="bare" club={ctx.club} />,
        ...(note.stopNumber === null ? {} : { row: { href: `/office/open-days/${day.slug}#stop-${note.stopNumber}`, label: `stop ${note.stopNumber}` } }),
      }))}
      {...(toSettle === undefined ? {} : { toSettle })}
      {...(foot === undefined ? {} : { foot })}
    >
      {children}
    </OfficePage>
  );
}
