import { useId } from 'react';
import { cardClass, isWoven } from '@/components/drawing/card-class';
import { nipOf } from '@/components/drawing/nips';
import { Post } from '@/components/drawing/post';
import type { TicketView } from '@/lib/bookings/rules/ticket-view';
import look from './ticket.module.css';

/* The drawing is 353.4 by 186, the measure of the printed card in CSS pixels. */
const NIP_PLACE = 'translate(150 187.400) scale(2.100 -2.100) translate(-12 0)';

/** A ticket's pasteboard: garden, entry time, people, number; its nip dashed until used, open when used. */
export function TicketCard({ ticket }: { ticket: TicketView }) {
  const { gardenName, stopNumber, day, year, time, timeSuffix, inBy, people, number, state } = ticket;
  const length = Array.from(gardenName).length;
  const nameSize = length > 44 ? look['nameVeryLong'] : length > 28 ? look['nameLong'] : '';
  return (
    <div className={`${look['front']} ${cardClass(stopNumber)} ${state.kind === 'given-back' ? look['givenBack'] : ''}`}>
      <Pasteboard stopNumber={stopNumber} isUsed={state.kind === 'used'} />
      <h3 className={`${look['name']} ${nameSize}`}>{gardenName}</h3>
      <p className={look['day']}>{day} <br />{year}</p>
      <div className={look['post']}><Post stopNumber={stopNumber} /></div>
      <p className={`${look['time']} ${timeSuffix === '' ? '' : look['timeShort']}`}>
        {time}
        {timeSuffix === '' ? null : <span className={look['suffix']}>{timeSuffix}</span>}
      </p>
      <p className={look['inBy']}>in by {inBy}</p>
      <p className={`${look['people']} ${people > 9 ? look['peopleMany'] : ''}`}>{people}</p>
      <p className={look['peopleWord']}>{people === 1 ? 'person' : 'people'}</p>
      <p className={look['number']}><span className="sr-only">number </span>{number}</p>
    </div>
  );
}

function Pasteboard({ stopNumber, isUsed }: { stopNumber: number; isUsed: boolean }) {
  const id = useId();
  const nip = nipOf(stopNumber);
  const ink = 'var(--color-card-ink)';
  return (
    <svg className={look['drawing']} viewBox="0 0 353.400 186" preserveAspectRatio="none" aria-hidden="true">
      <defs>
        <mask id={`${id}nip`}>
          <rect width="353.400" height="186" fill="white" />
          {isUsed ? <path d={`${nip.path}Z`} transform={NIP_PLACE} fill="black" fillRule="evenodd" /> : null}
        </mask>
        <pattern id={`${id}weave`} width="13.400" height="13.400" patternUnits="userSpaceOnUse">
          <path d="M0 0L13.400 13.400M13.400 0L0 13.400" stroke={ink} strokeOpacity=".28" strokeWidth="1" />
        </pattern>
      </defs>
      <g mask={`url(#${id}nip)`}>
        <rect width="353.400" height="186" fill="var(--card)" />
        {isWoven(stopNumber) ? <rect width="353.400" height="186" fill={`url(#${id}weave)`} /> : null}
        {isWoven(stopNumber) ? <path d="M14 9H246V64H14ZM66 66H232V152H66ZM246 66H306V152H246ZM316 12H344V174H316Z" fill="var(--card)" fillOpacity=".82" /> : null}
        <rect className={look['outline']} x=".75" y=".75" width="351.900" height="184.500" fill="none" stroke={ink} strokeWidth="1.500" />
      </g>
      <path
        d={nip.path} transform={NIP_PLACE} fill="none" stroke={ink} strokeLinejoin="round" strokeWidth={isUsed ? 0.9 : 0.75}
        {...(isUsed ? {} : { strokeDasharray: '2 1.400' })}
      />
      <path d="M313 12V174M241 72V150" stroke={ink} strokeWidth="1.200" />
    </svg>
  );
}
