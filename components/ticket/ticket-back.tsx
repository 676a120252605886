import type { QrView, TicketView } from '@/lib/bookings/rules/ticket-view';
import look from './ticket.module.css';

const QUIET = 4; // modules, ISO/IEC 18004

/** A ticket's second card: the QR and the spoken code; it stays black on white in the evening too, for the camera's sake. */
export function TicketBack({ ticket: { qr, code, state } }: { ticket: TicketView }) {
  const [first = '', second = ''] = code.split(' ');
  return (
    <div className={`${look['back']} ${state.kind === 'given-back' ? look['givenBack'] : ''}`}>
      <div className={look['backIn']}>
        {qr === null ? null : <Qr qr={qr} />}
        <div>
          <p className={look['code']}>{first} <br />{second}</p>
          {state.kind === 'live' ? <p className={look['say']}>Show this or say it. No&nbsp;signal needed.</p> : <p className={look['fact']}>{state.words}</p>}
        </div>
      </div>
    </div>
  );
}

function Qr({ qr: { size, path } }: { qr: QrView }) {
  const whole = size + 2 * QUIET;
  return (
    <svg className={look['qr']} viewBox={`${-QUIET} ${-QUIET} ${whole} ${whole}`} shapeRendering="crispEdges" role="img" aria-label="QR code: the spoken code says the same">
      <rect x={-QUIET} y={-QUIET} width={whole} height={whole} fill="var(--color-sun-paper)" />
      <path d={path} fill="var(--color-sun-ink)" />
    </svg>
  );
}
