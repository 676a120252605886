/** The plant at the foot of a post, one of five habits, so that the posts of a map are not all alike. */
const TUFTS = [
  'M11 82q-2-9-7-12M14 82q0-11-3-16M17 82q2-9 6-13',
  'M8 82q1-10-5-15M13 82q0-12 5-16M17 82q3-7 8-8',
  'M7 82q-1-6-5-7M13 82v-9M18 82q1-6 5-8',
  'M6 82q-1-8-4-9M12 82q-1-12 2-15M18 82q1-8 6-9',
  'M9 82q-3-5-8-5M13 82q1-9-2-13M17 82q1-7 7-10',
];

/** A cast milepost with its number, in daylight inks because it always stands on pasteboard colour, standing with its foot at the origin, 54 by 84 before scaling. */
export function MapPost({ number, height }: { readonly number: number; readonly height: number }) {
  const tuft = TUFTS[(number - 1) % TUFTS.length];
  return (
    <g transform={`scale(${height / 84}) translate(-27 -84)`} className={`card-${number}`} strokeWidth="2" strokeLinejoin="round">
      <path d="M17 54L27 58V83L17 79.4Z" className="fill-sun-paper stroke-card-ink" />
      <path d="M37 54L27 58V83L37 79.4Z" className="fill-card-ink stroke-card-ink" />
      <path d="M2 12L27 3 52 12 27 21Z" className="fill-sun-paper stroke-card-ink" />
      <path d="M2 12L27 21V65L2 56Z" className="fill-(--card) stroke-card-ink" />
      <path d="M52 12L27 21V65L52 56Z" className="fill-card-ink stroke-card-ink" />
      <text transform="matrix(1 .36 0 1 14.5 48)" textAnchor="middle" className="fill-card-ink font-heading" fontWeight="800" fontSize={number > 9 ? 23 : 29} stroke="none">
        {number}
      </text>
      <path d={tuft} className="stroke-paper" strokeWidth="6" strokeLinecap="round" fill="none" />
      <path d={tuft} className="stroke-conifer" strokeWidth="3" strokeLinecap="round" fill="none" />
    </g>
  );
}
