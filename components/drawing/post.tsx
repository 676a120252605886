import { cardClass, isWoven } from './card-class';

type PostProps = {
  stopNumber: number;
  /** From the garden above, to the next 5: what the right face says. */
  minutes?: number;
  height?: number;
  /** Instead of "Garden 3, 10 minutes from the last"; null beside text that says the number already. */
  label?: string | null;
};

/* What grows at a post's foot, in turn: grass, sedge, moss, a seedling, reed, thyme, a shoot. */
const TUFTS = [
  'M11 82q-2-9-7-12M14 82q0-11-3-16M17 82q2-9 6-13',
  'M8 82q1-10-5-15M13 82q0-12 5-16M17 82q3-7 8-8',
  'M7 82q-1-6-5-7M13 82v-9M18 82q1-6 5-8',
  'M13 82v-14M13 75q-5-1-7-6M13 74q5-1 8-6',
  'M9 82q-1-12-4-18M13 82q1-14 0-20M16 82q2-10 6-15',
  'M11 82q-3-7-8-8M14 82q0-9-1-13M18 82q3-7 7-9',
  'M13 82v-11M13 76q-6 0-8-5M14 75q6 0 8-6',
];

const outline = { stroke: 'var(--post-edge)', strokeWidth: 2, strokeLinejoin: 'round' } as const;

/** A cast milepost seen from its corner: the stop's number on its card colour, the minutes on the dark face. */
export function Post({ stopNumber, minutes, height = 75, label }: PostProps) {
  const spoken = label === undefined ? `Garden ${stopNumber}${minutes === undefined ? '' : `, ${minutes} minutes from the last`}` : label;
  const tuft = TUFTS[(stopNumber - 1) % TUFTS.length];
  return (
    <svg
      width={Math.round((height * 54) / 84)}
      height={height}
      viewBox="0 0 54 84"
      className={`post block shrink-0 overflow-visible ${cardClass(stopNumber)}`}
      {...(spoken === null ? { 'aria-hidden': true } : { role: 'img', 'aria-label': spoken })}
    >
      <path d="M17 54 27 58V83L17 79.400Z" className="fill-paper" {...outline} />
      <path d="M37 54 27 58V83L37 79.400Z" className="fill-ink" {...outline} />
      <path d="M2 12 27 3 52 12 27 21Z" className="fill-paper" {...outline} />
      <path d="M2 12 27 21V65L2 56Z" fill="var(--card)" {...outline} />
      {isWoven(stopNumber) ? <path d={WOVEN_FACE} stroke="var(--color-card-ink)" strokeOpacity=".45" strokeWidth="1" /> : null}
      <path d="M52 12 27 21V65L52 56Z" className="fill-ink" {...outline} />
      <Face stopNumber={stopNumber} />
      {minutes === undefined ? null : <Minutes minutes={minutes} />}
      <path d={tuft} fill="none" stroke="var(--ground)" strokeWidth="6" strokeLinecap="round" />
      <path d={tuft} fill="none" className="stroke-conifer" strokeWidth="3" strokeLinecap="round" />
    </svg>
  );
}

function Face({ stopNumber }: { stopNumber: number }) {
  return (
    <text
      transform={`matrix(1 .36 0 1 ${stopNumber > 9 ? 13.7 : 14.5} ${stopNumber > 9 ? 45 : 48})`}
      textAnchor="middle"
      className="fill-card-ink font-heading font-extrabold"
      fontSize={stopNumber > 9 ? 20 : 29}
      letterSpacing={stopNumber > 9 ? -1.6 : 0}
      {...(isWoven(stopNumber) ? { stroke: 'var(--card)', strokeWidth: 5, paintOrder: 'stroke', strokeLinejoin: 'round' } : {})}
    >
      {stopNumber}
    </text>
  );
}

/* A prime stands after a single figure ("5′"); two figures fill the face. */
function Minutes({ minutes }: { minutes: number }) {
  const isWide = minutes > 9;
  return (
    <text
      transform={`matrix(1 -.36 0 1 ${isWide ? 39.5 : 41} 47)`}
      textAnchor="middle"
      className="fill-paper font-mono font-bold"
      fontSize={minutes > 99 ? 13 : 18.4}
      letterSpacing="-0.7"
    >
      {isWide ? minutes : `${minutes}′`}
    </text>
  );
}

/* The weave on the leaning face: a step right is a step and 0.36 down. */
const WOVEN_FACE = [-36, -27, -18, -9, 0, 9, 18]
  .map((start) => {
    const left = Math.max(0, start);
    const right = Math.min(25, start + 44);
    const down = (u: number, v: number) => `${2 + u} ${12 + 0.36 * u + v}`;
    return right <= left ? '' : `M${down(left, left - start)}L${down(right, right - start)}M${down(left, 44 - left + start)}L${down(right, 44 - right + start)}`;
  })
  .join('');
