import Link from 'next/link';
import { Columns, Part } from '@/components/layout/columns';
import { Plate } from '@/components/plate/plate';
import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { RailRule } from '@/components/ui/rail-rule';
import type { HomePage } from '@/lib/gardens/views/home';
import { PlateWall } from './garden-list';
import { Handbill } from './handbill';

/** The rail below the bill: a train for a day to come, a buffer stop for one called off, sleepers for none. */
export function HomeRail({ day }: { day: HomePage['day'] }) {
  if (day === null) return <RailRule state="empty" />;
  return day.isCalledOff ? <RailRule state="failed" /> : <RailRule trainAt={0.72} coaches={2} />;
}

/** The next open day as a handbill: one plate, and beside it what, when, where and how to come. */
export function HomeDay({ page }: { page: HomePage }) {
  const { day, first } = page;
  return (
    <>
      {day?.isCalledOff ? (
        <div className="pt-6">
          <Notice tone="caution" word="Called off" as="standing">
            {day.note ?? 'This open day does not take place. Whoever holds tickets has a letter about it.'}
          </Notice>
        </div>
      ) : null}
      {day && first ? (
        <Columns split="halves">
          <div>
            <figure>
              <Link href={first.href} className="block">
                <Plate plate={first.plate} when="first" />
              </Link>
              <figcaption className="note mt-2.5 leading-snug">
                Garden {first.number}, {first.name}. {first.plate.caption}
              </figcaption>
            </figure>
            <p className="mt-6 border-t border-rule pt-4 leading-snug">
              <b className="font-heading font-bold">Take care.</b> Steam engines stay hot; ponds are deep enough. Small hands in larger ones, and no feet on the line. <Link href="/visiting" className="link">How a visit works</Link>
            </p>
          </div>
          <div>
            <Handbill lines={day.lines} />
            {day.isCalledOff ? null : (
              <p className="mt-5 flex flex-col">
                <LinkButton tone="main" href={day.href}>
                  {day.buttonWords}
                </LinkButton>
              </p>
            )}
          </div>
        </Columns>
      ) : (
        <EmptyDay />
      )}
    </>
  );
}

/** Below the handbill: its gardens, the days after it, and joining. */
export function HomeRest({ page }: { page: HomePage }) {
  return (
    <>
      {page.gardens.length === 0 ? null : (
        <Part title={page.gardensTitle}>
          <p>
            {page.gardensSentence} <Link href="/gardens">See them on the map.</Link>
          </p>
          <PlateWall gardens={page.gardens} />
        </Part>
      )}
      {page.later.length === 0 ? null : (
        <Part title="After that">
          <ul className="border-b border-rule">
            {page.later.map(({ href, title, words }) => (
              <li key={href} className="border-t border-rule py-3 first:border-t-0 first:pt-0">
                <Link href={href} className="link font-heading text-[1.3333rem] leading-tight font-bold">
                  {title}
                </Link>
                <p className="note leading-snug">{words}</p>
              </li>
            ))}
          </ul>
        </Part>
      )}
      <Part title="If you have a railway of your own">
        <p>
          Or a spare corner and a plan for one. Members visit each other all year, borrow each other’s track gauges and return most of them. <Link href="/membership">How to join</Link>.
        </p>
      </Part>
    </>
  );
}

function EmptyDay() {
  return (
    <section className="max-w-2xl pt-6" aria-label="No open day yet">
      <p className="text-lg">The sleepers are down; the rails come when a day is set. It is announced here first, and in the letters to members.</p>
      <p className="mt-5">
        <LinkButton href="/gardens">Look at the gardens meanwhile</LinkButton>
      </p>
    </section>
  );
}
