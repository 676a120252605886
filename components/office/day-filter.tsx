import Link from 'next/link';
import { Fragment } from 'react';

type DayFilterProps = { days: readonly { slug: string; title: string; year: string }[]; shown: string; path: string };

/** Which open day's bookings are shown, in one sentence of links. */
export function DayFilter({ days, shown, path }: DayFilterProps) {
  if (days.length === 0) return null;
  const look = (slug: string) => (slug === shown ? { className: 'font-bold text-ink underline decoration-[3px] underline-offset-4', 'aria-current': 'true' as const } : { className: 'link' });
  return (
    <p className="mt-3">
      Show <Link href={path} {...look('')}>every open day</Link>
      {days.map((day) => (
        <Fragment key={day.slug}>, <Link href={`${path}?day=${day.slug}`} {...look(day.slug)}>{day.title} {day.year}</Link></Fragment>
      ))}.
    </p>
  );
}
