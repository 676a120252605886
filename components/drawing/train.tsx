/* Drawn in metres of a narrow-gauge line, wheels on nought, the engine's cowcatcher to the right. */

const ENGINE_LENGTH = 8.1;
const COACH_LENGTH = 7.65;
const TALL = 3.6;

/** How long a train is on the page, in px, for a height in px: what the rail rule needs to place it. */
export const trainLength = (coaches: number, height: number): number =>
  Math.round(((ENGINE_LENGTH + coaches * COACH_LENGTH) / TALL) * height * 10) / 10;

/** The small train of the rail rule, in the ink of the text around it. */
export function Train({ coaches = 1, height = 34 }: { coaches?: number; height?: number }) {
  const length = ENGINE_LENGTH + coaches * COACH_LENGTH;
  return (
    <svg width={trainLength(coaches, height)} height={height} viewBox={`0 ${-TALL} ${length} ${TALL}`} className="block" aria-hidden="true" fill="currentColor">
      {Array.from({ length: coaches }, (_, index) => (
        <g key={index} transform={`translate(${index * COACH_LENGTH + 0.05} 0)`}>
          <Coach />
        </g>
      ))}
      <g transform={`translate(${length - ENGINE_LENGTH + 0.05} 0)`}>
        <Engine />
      </g>
    </svg>
  );
}

const ground = 'var(--ground)';

function Engine() {
  return (
    <>
      <path d="M-.35-1v-1.100h.7v-.95h-.25v-.27h2.500v.27h-.3v.8h1.900v.05h.75l-.08-.9h.16v-.24h.8v.24h-.16l-.08.9h.25v.2h.26v.3h-.21v.97h.82v.13h.18v.17l.68.85h-.9l.15-.35V-.65H6.500v.2h-.95v-.25H.3V-1Z" transform="translate(-.02 0)" />
      <path d="M4.100-2.200c0-.75.8-.75.8 0ZM3.050-2.200c0-.45.5-.45.5 0ZM3.240-2.400v-.4h.12v.4ZM2.300-2.250h4v1.350h-4Z" />
      <path d="M.75-2.750h.55v.66H.75ZM1.500-2.750h.55v.66H1.500Z" fill={ground} />
      <path d="M2.500-1.860H5v.84H2.500ZM5.500-2.200v1.100M6.050-2.200v1.100M2.500-2.100h2.800M.35-1.850h1.950" fill="none" stroke={ground} strokeWidth=".07" />
      <Wheel x={2.1} r={0.5} />
      <Wheel x={3.55} r={0.5} />
      <Wheel x={5} r={0.5} />
      <Wheel x={6.5} r={0.32} />
      <path d="M2.100-.42H5M3.550-.42 5.950-.66" fill="none" stroke="currentColor" strokeWidth=".12" strokeLinecap="round" />
    </>
  );
}

function Coach() {
  return (
    <>
      <path d="M-.05-2.520C.3-2.950.8-3 3.600-3s3.300.05 3.650.48ZM1-2.550h5.200v1.900H1ZM0-.78h7.900v.16H0ZM.65-.62h1.700v.2H.65ZM4.850-.62h1.700v.2h-1.700Z" />
      <path d="M.15-2.500v1.800M7.050-2.500v1.800M.15-1.450H1M6.200-1.450h.85" fill="none" stroke="currentColor" strokeWidth=".1" />
      <path d="M1.400-2.250h.86v.78H1.400ZM2.580-2.250h.86v.78h-.86ZM3.760-2.250h.86v.78h-.86ZM4.940-2.250h.86v.78h-.86Z" fill={ground} />
      <path d="M1.100-1.200h5" fill="none" stroke={ground} strokeWidth=".06" />
      {[0.95, 2.05, 5.15, 6.25].map((x) => (
        <Wheel key={x} x={x} r={0.32} />
      ))}
    </>
  );
}

function Wheel({ x, r }: { x: number; r: number }) {
  const inner = r * 0.72;
  const spoke = inner * 0.7;
  return (
    <g transform={`translate(${x} ${-r})`}>
      <circle r={r} />
      <circle r={inner} fill={ground} />
      <path
        d={`M${-inner} 0H${inner}M0 ${-inner}V${inner}M${-spoke} ${-spoke}L${spoke} ${spoke}M${-spoke} ${spoke}L${spoke} ${-spoke}`}
        stroke="currentColor"
        strokeWidth=".07"
      />
      <circle r={r * 0.2} />
    </g>
  );
}
