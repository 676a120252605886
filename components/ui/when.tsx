import { dayOf, formatDay, formatInstant, formatTime, type ClubTime, type Day, type DayStyle } from '@/lib/core/time';

type WhenProps = { club: ClubTime; style?: DayStyle } & (
  | { on: Day; at?: never; show?: never }
  | { at: Date | string; on?: never; show?: 'time' | 'day' | 'both' }
);

/** A day (`on`) or an instant (`at`: its time, its day, or both) in the club's zone and manner. */
export function When({ club, style = 'long', on, at, show = 'both' }: WhenProps) {
  if (on !== undefined) return <time dateTime={on}>{formatDay(on, club, style)}</time>;
  const instant = typeof at === 'string' ? new Date(at) : at;
  return <time dateTime={instant.toISOString()}>{written(instant, club, style, show)}</time>;
}

function written(at: Date, club: ClubTime, style: DayStyle, show: 'time' | 'day' | 'both'): string {
  if (show === 'time') return formatTime(at, club);
  return show === 'day' ? formatDay(dayOf(at, club.timeZone), club, style) : formatInstant(at, club, style);
}
