import { cardClass, isWoven } from './card-class';
import { nipOf } from './nips';

type NipProps = {
  stopNumber: number;
  /** `open`: clipped out; `dashed`: where the gate will clip. */
  state?: 'open' | 'dashed';
  width?: number;
};

/** A stop's small card with its nip: how a stop is told apart where colour does not do it. */
export function NipCard({ stopNumber, state = 'open', width = 46 }: NipProps) {
  const nip = nipOf(stopNumber);
  return (
    <svg width={width} height={Math.round((width * 30) / 57)} viewBox="0 0 57 30" className={`block shrink-0 overflow-visible ${cardClass(stopNumber)}`} role="img" aria-label={`nip: ${nip.name}`}>
      <path d="M1 1H56V29H1Z" fill="var(--card)" stroke="var(--color-card-ink)" strokeWidth="1.400" />
      {isWoven(stopNumber) ? <path d={WEAVE} stroke="var(--color-card-ink)" strokeOpacity=".5" strokeWidth=".8" /> : null}
      <g transform="translate(28.500 30.300) scale(1.360 -1.360) translate(-12 0)">
        <path
          d={nip.path}
          fillRule="evenodd"
          fill={state === 'open' ? 'var(--ground)' : 'var(--card)'}
          stroke="var(--color-card-ink)"
          strokeWidth="1.400"
          strokeLinejoin="round"
          {...(state === 'open' ? {} : { strokeDasharray: '2.600 1.600' })}
        />
      </g>
    </svg>
  );
}

/* Both diagonals of the card, nine apart, cut at its edges. */
const WEAVE = [-18, -9, 0, 9, 18, 27, 36, 45, 54]
  .map((x) => {
    const left = Math.max(1, x);
    const right = Math.min(56, x + 28);
    return right <= left ? '' : `M${left} ${1 + left - x}L${right} ${1 + right - x}M${left} ${29 - left + x}L${right} ${29 - right + x}`;
  })
  .join('');
