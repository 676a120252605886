import type { ReactNode } from 'react';
import { NipCard } from '@/components/drawing/nip';
import { Pegs } from '@/components/drawing/pegs';

const boxed = 'grid h-[30px] w-11 place-items-center border-[1.5px] border-edge';

/** What the signs of the board mean. Drawn on the server. */
export function BoardKey() {
  return (
    <ul className="mt-4 grid list-none gap-x-9 gap-y-1 p-0 text-[0.9444rem] leading-snug md:grid-cols-2 lg:grid-cols-3 large-print:grid-cols-1">
      <Line sign={<span className={`${boxed} figures font-semibold`}>12</span>}>places left: choose it</Line>
      <Line sign={<span className={boxed}><Pegs count={4} /></span>}>five or fewer, a peg for each</Line>
      <Line sign={<Pegs count={2} />}>fewer places than you are</Line>
      <Line sign={<span className="figures font-semibold">—</span>}>full</Line>
      <Line sign={<span className="figures font-bold tracking-widest text-ink-soft">···</span>}>not open at that time</Line>
      <Line sign={<span className="h-[30px] w-0.5 bg-ink-soft" />}>too far from your other gardens, or you are in one of them then</Line>
      <Line sign={<i className="text-[1.2rem]">s</i>}>live steam</Line>
      <Line sign={<i className="text-[1.2rem]">w</i>}>step-free all the way round</Line>
      <Line sign={<i className="text-[1.2rem]">p</i>}>pond: hold small hands</Line>
      <Line sign={<span className="h-[30px] w-11 border-[3.5px] border-damson bg-damson-soft" />}>yours, joined by your line</Line>
      <Line sign={<MinutesFace />}>minutes from the garden above, to the next 5</Line>
      <Line sign={<NipCard stopNumber={5} width={44} />}>the garden’s card and the shape its gate nips</Line>
    </ul>
  );
}

function Line({ sign, children }: { sign: ReactNode; children: ReactNode }) {
  return (
    <li className="grid min-h-9 grid-cols-[52px_minmax(0,1fr)] items-center gap-3">
      <span className="grid place-items-center" aria-hidden="true">{sign}</span>
      <span>{children}</span>
    </li>
  );
}

function MinutesFace() {
  return (
    <svg width="26" height="38" viewBox="24 12 30 44" aria-hidden="true">
      <path d="M52 13 27 22V56L52 46Z" className="fill-ink" />
      <text transform="matrix(1 -.36 0 1 40 43)" textAnchor="middle" className="fill-paper font-mono font-bold" fontSize="16">5′</text>
    </svg>
  );
}
