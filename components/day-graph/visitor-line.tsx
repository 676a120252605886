import { Fragment, type ReactNode } from 'react';
import { graphOf, type Graph } from '@/lib/opendays/rules/day-graph';
import { journeyInWords, type DayLine } from '@/lib/opendays/rules/day-line';
import type { BoardView } from '@/lib/opendays/views';
import styles from './visitor-line.module.css';

type VisitorLineProps = { board: BoardView; day: DayLine; postOf: (stopId: string) => ReactNode };

/** The party's own day: time across on the board's scale, gardens down by the minutes between them; the same as a list. */
export function VisitorLine({ board, day, postOf }: VisitorLineProps) {
  const graph = graphOf(board, day);
  return (
    <section className="mt-9 border-t border-edge pt-5">
      <h2>Your day</h2>
      <ol className={styles.list}>
        {day.stays.map((stay, index) => {
          const journey = day.journeys[index];
          return (
            <Fragment key={stay.entryTimeId}>
              <li><b>{board.stops[stay.row]?.name}</b>: <i>arr.</i> {stay.arrivesText}, <i>dep.</i> {stay.leavesText}</li>
              {journey ? <li className={styles.way}><i>{journeyInWords(journey)}</i></li> : null}
            </Fragment>
          );
        })}
      </ol>
      <div className={styles.graph} style={{ height: graph.height }} aria-hidden="true">
        {day.stays.map((stay, index) => {
          const stop = board.stops[stay.row];
          return stop ? <div key={stay.entryTimeId} className={styles.name} style={{ top: graph.ys[index] }}>{postOf(stop.stopId)}<b>{stop.name.replace(/ & /g, ' &\u00a0')}</b></div> : null;
        })}
        <Plot graph={graph} />
      </div>
    </section>
  );
}

/** The party's day on a page without the board. */
export function OwnDay(props: VisitorLineProps) {
  return (
    <div className={styles.alone}>
      <VisitorLine {...props} />
    </div>
  );
}

const percent = (share: number) => `${Math.round(share * 10_000) / 100}%`;

function Plot({ graph }: { graph: Graph }) {
  const { stays, ways, hours, ys, height } = graph;
  return (
    <svg className={styles.plot} height={height}>
      {hours.map((hour) => (
        <Fragment key={hour.text}>
          <line x1={percent(hour.x)} x2={percent(hour.x)} y1={26} y2={height - 8} className={styles.hourLine} />
          <text x={percent(hour.x)} y={18} textAnchor="middle" className={styles.hour}>{hour.text}</text>
        </Fragment>
      ))}
      {graph.quarters.map((x) => <line key={x} x1={percent(x)} x2={percent(x)} y1={26} y2={33} className={styles.hourLine} />)}
      {ys.map((y) => <line key={y} x1="0%" x2="100%" y1={y} y2={y} className={styles.station} />)}
      {ways.map((way) => <line key={way.y1} x1={percent(way.leaves)} y1={way.y1} x2={percent(way.arrives)} y2={way.y2} className={styles.line} />)}
      {ways.map((way) => (way.starts > way.arrives ? <line key={way.y2} x1={percent(way.arrives)} x2={percent(way.starts)} y1={way.y2} y2={way.y2} className={styles.wait} /> : null))}
      {stays.map((stay) => <line key={stay.y} x1={percent(stay.arrives)} x2={percent(stay.leaves)} y1={stay.y} y2={stay.y} className={styles.line} />)}
      {stays.map((stay) => <rect key={stay.y} x={percent(stay.arrives)} y={stay.y - 6} width={12} height={12} className={styles.node} />)}
      {stays.map((stay) => (
        <Fragment key={stay.y}>
          <text x={percent(stay.arrives)} dx={-10} y={stay.y + 23} textAnchor="end" className={styles.time}><tspan className={styles.word}>arr.</tspan> {stay.arrivesText}</text>
          <text x={percent(stay.leaves)} dx={stay.isLate ? -4 : 12} y={stay.y - 9} textAnchor={stay.isLate ? 'end' : 'start'} className={styles.time}><tspan className={styles.word}>dep.</tspan> {stay.leavesText}</text>
        </Fragment>
      ))}
      {ways.map((way) => (
        <text key={way.y1} x={percent(way.isLate ? way.leaves : way.arrives)} dx={way.isLate ? -16 : 18} y={(way.y1 + way.y2) / 2 + 5} textAnchor={way.isLate ? 'end' : 'start'} className={styles.journey}>{way.words}</text>
      ))}
    </svg>
  );
}
