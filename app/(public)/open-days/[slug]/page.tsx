import type { Metadata } from 'next';
import { notFound, redirect } from 'next/navigation';
import { cache } from 'react';
import { PublicSheet } from '@/app/(public)/public-sheet';
import { Bill } from '@/components/layout/bill';
import { OpenDayBoard } from '@/components/open-day/open-day-board';
import { DayCalledOff, DayDone } from '@/components/open-day/day-over';
import { TakeCare } from '@/components/open-day/take-care';
import { WhereTheyAre } from '@/components/open-day/where-they-are';
import { RailRule } from '@/components/ui/rail-rule';
import { builtInValley } from '@/lib/gardens/rules/valley-data';
import { findOpenDay, findOwnKept } from '@/lib/opendays/queries';
import { cleanAddress, readBoardAsked } from '@/lib/opendays/rules/board-asked';
import { holderContext, pageContext } from '@/lib/web/context';
import { holdPlacesAction } from './actions';

type Props = { params: Promise<{ slug: string }>; searchParams: Promise<Record<string, string | string[] | undefined>> };

const read = cache(async (slug: string) => {
  const ctx = await pageContext('anyone');
  const day = await findOpenDay(ctx, slug);
  if (!day) notFound();
  return { club: ctx.club, day };
});

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { club, day } = await read((await params).slug);
  return { title: `${day.title}, ${club.name}`, description: `${day.line}. ${day.sums}` };
}

export default async function OpenDayPage({ params, searchParams }: Props) {
  const { club, day } = await read((await params).slug);
  const asked = await searchParams;
  const path = `/open-days/${day.slug}`;
  const clean = cleanAddress(path, asked);
  if (clean !== null) redirect(clean);
  const first = readBoardAsked(asked);
  const holder = await holderContext();
  const own = holder && (await findOwnKept(holder, day.slug));
  return (
    <PublicSheet club={club} here="/open-days">
      <Bill name={day.title} line={day.line} sums={day.sums} rail={day.phase === 'coming' ? null : <RailRule state={day.phase === 'past' ? 'done' : 'failed'} />} />
      {day.phase === 'called-off' ? <DayCalledOff note={day.note} /> : null}
      {day.phase === 'past' ? <DayDone /> : null}
      {day.phase === 'coming' ? <OpenDayBoard day={day} action={holdPlacesAction} first={first} own={own} path={path} /> : null}
      {day.phase === 'coming' ? <TakeCare cautions={day.cautions} howToCome={day.howToCome} count={day.gardens.length} /> : null}
      <WhereTheyAre valley={builtInValley} gardens={day.gardens} visited={day.phase === 'coming' ? first.chosen : []} board={day.board} />
    </PublicSheet>
  );
}
