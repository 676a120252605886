import Link from 'next/link';
import { Post } from '@/components/drawing/post';
import { Train } from '@/components/drawing/train';
import { GardenMargin } from '@/components/layout/garden-margin';
import { BoardKey } from '@/components/time-board/board-key';
import { GardenHead } from '@/components/time-board/garden-head';
import { TimeBoard } from '@/components/time-board/time-board';
import { Notice } from '@/components/ui/notice';
import { RailRule } from '@/components/ui/rail-rule';
import type { FormAction } from '@/lib/core/form-state';
import type { BoardAsked } from '@/lib/opendays/rules/board-asked';
import type { OpenDayPage, OwnKept } from '@/lib/opendays/views';

type OpenDayBoardProps = { day: OpenDayPage; action: FormAction; first: BoardAsked; path: string; /** What this browser keeps already. */ own: OwnKept | null };

/** The board of a coming day with everything that is drawn on the server, or sleepers without rails when it has no times yet. */
export function OpenDayBoard({ day, action, first, path, own }: OpenDayBoardProps) {
  const { board } = day;
  if (board.columns.length === 0) return <NoTimesYet />;
  return (
    <>
      {own === null ? null : <KeptAlready until={own.keptUntil} />}
      <TimeBoard
        board={board}
        action={action}
        first={first}
        own={own?.heads ?? {}}
        path={path}
        caption={day.caption}
        heads={Object.fromEntries(board.stops.map((stop) => [stop.stopId, <GardenHead key={stop.stopId} stop={stop} />]))}
        posts={Object.fromEntries(board.stops.map((stop) => [stop.stopId, <Post key={stop.stopId} stopNumber={stop.number} label={null} />]))}
        train={<Train />}
        boardKey={<BoardKey />}
        beside={<GardenMargin plants={day.flowers} />}
      />
    </>
  );
}

function NoTimesYet() {
  return (
    <>
      <RailRule state="empty" />
      <p className="mt-5">The sleepers are down and the rails are not: this day has no entry times yet. Look again in a week or two.</p>
    </>
  );
}

function KeptAlready({ until }: { until: string }) {
  return (
    <div className="mt-4">
      <Notice tone="clear" as="standing" word={null}>
        Kept for you until {until}. <Link href="/hold">Go on with these places</Link>, or choose again: what you keep next takes their place.
      </Notice>
    </div>
  );
}
