/** Pieces of the drawn gate. 390 wide, ground at 322; ink is the text colour, the ground is var(--gate-ground). */

/** The two tall posts of the open gate. */
export function TallPosts() {
  return (
    <>
      <g fill="currentColor">
        <path d="M14 46h30v284H14zM9 38h40v9H9zM346 46h30v284h-30zM341 38h40v9h-40z" />
        <circle cx="29" cy="25" r="12.5" />
        <circle cx="361" cy="25" r="12.5" />
      </g>
      <path fill="var(--gate-ground)" d="M20 54h2.5v262H20zM352 54h2.5v262H352z" />
    </>
  );
}

/** The posts of the ajar and the shut gate: the sentence stands above them. */
export function Posts() {
  return (
    <>
      <g fill="currentColor">
        <path d="M14 130h30v200H14zM9 124h40v8H9zM346 130h30v200h-30zM341 124h40v8h-40z" />
        <circle cx="29" cy="112" r="11.5" />
        <circle cx="361" cy="112" r="11.5" />
      </g>
      <path fill="var(--gate-ground)" d="M20 138h2.5v178H20zM352 138h2.5v178H352z" />
    </>
  );
}

/** One leaf swung wide open, seen end on; `right` hangs on the other post. */
export function OpenLeaf({ right = false }: { right?: boolean }) {
  return (
    <g fill="none" stroke="currentColor" {...(right ? { transform: 'matrix(-1 0 0 1 390 0)' } : {})}>
      <path d="M46 92 82 112V306L46 322z" strokeWidth="4" strokeLinejoin="round" />
      <path d="M46 142 82 156M46 276 82 268" strokeWidth="5" />
      <path d="M55 84V322M64 90v224M73 98v212" strokeWidth="4" />
    </g>
  );
}

/** The track before the gate, rail on sleeper ends, as wide as the phone. */
export function Track() {
  return <div aria-hidden className="rail w-full" style={{ '--rail-ink': 'currentColor' } as React.CSSProperties} />;
}

/** A stop's card as a fill: plain, or woven from the eighth stop on. Returns the paint for what is drawn in it. */
export const CARD_PAINT = 'url(#gate-card)';

/** Defines CARD_PAINT inside a drawing. */
export function CardPaint({ woven }: { woven: boolean }) {
  return (
    <defs>
      <pattern id="gate-card" width="14" height="14" patternUnits="userSpaceOnUse">
        <path d="M0 0h14v14H0z" fill="var(--card)" />
        {woven && <path d="M0 14 14 0M0 0l14 14" stroke="currentColor" strokeOpacity="0.5" strokeWidth="1" />}
      </pattern>
    </defs>
  );
}
