import { dialPiece, handsAt } from '@/lib/gate/rules/dial';
import { CARD_PAINT, CardPaint, OpenLeaf, Posts, TallPosts } from './gate-parts';

/* Fills what the screen leaves it, so that the presses below stay under the thumb. */
const SCENE = 'absolute inset-0 block h-full w-full text-current';

/** What stands between the open posts: two lines of sentence at most, and the number below. */
type OpenGateProps = { lines: readonly string[]; number: number; isFramed: boolean };

/** The gate wide open: the number of people is the largest thing on the screen. */
export function OpenGate({ lines, number, isFramed }: OpenGateProps) {
  const digits = String(number).length;
  const size = lines.length > 1 ? 238 : 266;
  const squeeze = digits > 1 ? { textLength: isFramed ? 182 : 206, lengthAdjust: 'spacingAndGlyphs' as const } : {};
  return (
    <svg aria-hidden viewBox="0 0 390 322" preserveAspectRatio="xMidYMax meet" className={SCENE}>
      <TallPosts />
      <OpenLeaf />
      <OpenLeaf right />
      {isFramed && <path d="M91 12H299V312H91zM98 19H292V305H98z" fill="none" stroke="currentColor" strokeWidth="2.5" />}
      <g className="font-heading" fill="currentColor" textAnchor="middle" fontWeight="900">
        {lines.map((line, at) => (
          <text key={line} x="195" y={lines.length > 1 ? 60 + at * 50 : 76} fontSize={lines.length > 1 ? 50 : 52} letterSpacing="-1">
            {line}
          </text>
        ))}
        <text x="195" y={lines.length > 1 ? 308 : 287} fontSize={digits > 1 ? 216 : size} {...squeeze}>
          {number}
        </text>
      </g>
    </svg>
  );
}

/** The open posts with nobody between them: the words above, and below them the camera's window. */
export function WaitingGate({ lines }: { lines: readonly string[] }) {
  return (
    <svg aria-hidden viewBox="0 0 390 322" preserveAspectRatio="xMidYMax meet" className={SCENE}>
      <TallPosts />
      <OpenLeaf />
      <OpenLeaf right />
      <g className="font-heading" fill="currentColor" textAnchor="middle" fontWeight="900" fontSize="48" letterSpacing="-1">
        {lines.map((line, at) => (
          <text key={line} x="195" y={44 + at * 48}>
            {line}
          </text>
        ))}
      </g>
    </svg>
  );
}

const DIAL = { x: 252, y: 147 };
const TICKS = Array.from({ length: 12 }, (_, hour) => hour * 30);

/** The gate ajar with a clock: the piece of the dial still to wait and the gap are in the card's colour. */
export function AjarGate({ minutesOfDay, waitMinutes, isWoven }: { minutesOfDay: number; waitMinutes: number; isWoven: boolean }) {
  const hands = handsAt(minutesOfDay, DIAL, 54);
  const piece = dialPiece(minutesOfDay, waitMinutes, DIAL, 53);
  return (
    <svg aria-hidden viewBox="0 80 390 250" preserveAspectRatio="xMidYMax meet" className={SCENE}>
      <CardPaint woven={isWoven} />
      <path d="M226 150H346V330H226z" fill={CARD_PAINT} />
      <Posts />
      <g fill="none" stroke="currentColor">
        <path d="M46 176 222 156V340L46 324z" fill="var(--gate-ground)" strokeWidth="5" strokeLinejoin="round" />
        <path d="M46 204 222 188M46 296 222 304" strokeWidth="8" />
        <path d="M48 290 220 194" strokeWidth="6" />
        <path d="M70 164V325M97 161V327M124 158V330M150 155V332M176 152V335M202 149V337" strokeWidth="5" />
        <path d="M346 160H310M346 184c-18 0-26-6-30-18" strokeWidth="5" />
        <circle cx={DIAL.x} cy={DIAL.y} r="64" fill="var(--gate-ground)" strokeWidth="5" />
        {piece !== null && <path d={piece} fill={CARD_PAINT} strokeWidth="2" />}
        {TICKS.map((turn) => (
          <path key={turn} d={turn % 90 === 0 ? 'M252 88v10' : 'M252 88v8'} strokeWidth={turn % 90 === 0 ? 4.5 : 2.5} transform={`rotate(${turn} ${DIAL.x} ${DIAL.y})`} />
        ))}
        <path d={`M${DIAL.x} ${DIAL.y}L${hands.hour}`} strokeWidth="8" />
        <path d={`M${DIAL.x} ${DIAL.y}L${hands.minute}`} strokeWidth="4.5" />
      </g>
      <circle cx={DIAL.x} cy={DIAL.y} r="6" fill="currentColor" />
    </svg>
  );
}

/** The gate shut, barred and locked, ink on white: every no. */
export function ShutGate() {
  const paper = 'var(--gate-ground)';
  return (
    <svg aria-hidden viewBox="0 98 390 226" preserveAspectRatio="xMidYMax meet" className={SCENE}>
      <Posts />
      <g fill="none" stroke="currentColor">
        <path d="M48 150H342V318H48z" strokeWidth="5" />
        <path d="M48 178H342M48 296H342" strokeWidth="9" />
        <path d="M71 136V318M95 136V318M119 136V318M143 136V318M170 136V318M195 136V318M221 136V318M247 136V318M271 136V318M295 136V318M319 136V318" strokeWidth="7" />
      </g>
      <path d="M4 222H386V250H4z" fill="currentColor" stroke={paper} strokeWidth="4" />
      <path d="M18 216h22v40H18zM350 216h22v40h-22z" fill="currentColor" stroke={paper} strokeWidth="3" />
      <path d="M183 236v-13a12 12 0 0 1 24 0v13" fill="none" stroke={paper} strokeWidth="9" />
      <path d="M183 240v-17a12 12 0 0 1 24 0v17" fill="none" stroke="currentColor" strokeWidth="5" />
      <path d="M173 238h44v36h-44z" fill={paper} stroke="currentColor" strokeWidth="5" />
      <path d="M195 250v12" stroke="currentColor" strokeWidth="6" />
    </svg>
  );
}

/** The gate of a full garden: one out, one in. */
export function FullGate({ isWoven }: { isWoven: boolean }) {
  return (
    <svg aria-hidden viewBox="0 98 390 226" preserveAspectRatio="xMidYMax meet" className={SCENE}>
      <CardPaint woven={isWoven} />
      <path d="M150 140H240V330H150z" fill={CARD_PAINT} />
      <Posts />
      <g fill="none" stroke="currentColor">
        <path d="M48 150H148V318H48zM242 150H342V318H242z" strokeWidth="5" />
        <path d="M48 178H148M48 296H148M242 178H342M242 296H342" strokeWidth="9" />
        <path d="M71 136V318M97 136V318M123 136V318M267 136V318M293 136V318M319 136V318" strokeWidth="7" />
      </g>
      <path d="M228 206h-46v-14l-32 22 32 22v-14h46z" fill="currentColor" />
      <path d="M154 262h46v-14l32 22-32 22v-14h-46z" fill="var(--gate-ground)" stroke="currentColor" strokeWidth="4" />
    </svg>
  );
}

/** A small shut gate beside a party that is in already. */
export function SmallShutGate() {
  return (
    <svg aria-hidden width="44" height="34" viewBox="0 0 44 34" className="shrink-0">
      <path d="M4 4v28M40 4v28" stroke="currentColor" strokeWidth="5" />
      <path d="M4 11h36M4 28h36M12 7v25M19 7v25M26 7v25M33 7v25" stroke="currentColor" strokeWidth="2.5" />
      <path d="M0 17h44v6H0z" fill="currentColor" />
    </svg>
  );
}
