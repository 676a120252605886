import type { CameraState } from './use-camera';

const RIVETS = Array.from({ length: 12 }, (_, at) => at * 30);

type CabWindowProps = { show: (screen: HTMLVideoElement | null) => void; state: CameraState };

/** The camera, through the round window of a cab. Without a camera it shows the garden path. */
export function CabWindow({ show, state }: CabWindowProps) {
  return (
    <div className="relative aspect-square w-full">
      <video ref={show} muted playsInline aria-label="What the camera sees" className="absolute inset-[9%] h-[82%] w-[82%] bg-card-ink object-cover [clip-path:circle(50%)]" />
      <svg aria-hidden viewBox="0 0 152 152" className="absolute inset-0 h-full w-full">
        {state === 'watching' ? null : <Path />}
        <circle cx="76" cy="76" r="67.7" fill="none" stroke="var(--gate-ground)" strokeWidth="9" />
        <circle cx="76" cy="76" r="73.5" fill="none" stroke="currentColor" strokeWidth="3" />
        <circle cx="76" cy="76" r="62.2" fill="none" stroke="currentColor" strokeWidth="3" />
        {RIVETS.map((turn) => (
          <circle key={turn} cx="76" cy="8.4" r="2.3" fill="currentColor" transform={`rotate(${turn} 76 76)`} />
        ))}
      </svg>
    </div>
  );
}

/** A path between fences, for the time when nobody is seen. */
function Path() {
  return (
    <g>
      <circle cx="76" cy="76" r="62" fill="currentColor" />
      <g fill="none" stroke="var(--gate-ground)" strokeOpacity="0.6">
        <path d="M20 104V70m14 34V70m14 34V70m56 34V70m14 34V70m14 34V70M16 80h40m40 0h40" strokeWidth="4" />
        <path d="M62 104 36 124M90 104l26 20M17 104h118" strokeWidth="3" />
      </g>
    </g>
  );
}
