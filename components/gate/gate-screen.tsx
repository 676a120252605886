import { useState } from 'react';
import { formatTime } from '@/lib/core/time';
import { drawingOf } from '@/lib/gate/rules/verdict';
import { CabWindow } from './cab-window';
import type { Keep } from './device';
import { Finding } from './finding';
import { GateSheet } from './gate-sheet';
import { readCode } from './read-code';
import { SayWhy } from './say-why';
import { show, ticketNow, verdictNow, type Place } from './showing';
import { SomeCame } from './some-came';
import { StatusLine } from './status-line';
import { TicketStory } from './ticket-story';
import { useCamera } from './use-camera';
import type { Gate } from './use-gate';
import { VerdictScreen } from './verdict-screen';
import { Watching } from './watching';
import { WhereWeAre } from './where-we-are';

const SUN = 'leafhalt-gate-sun';

/** The gate with its list: one screen at a time, the camera watching under the two that need it. */
export function GateScreen({ gate, keep }: { gate: Gate; keep: Keep }) {
  const [place, go] = useState<Place>({ at: 'watching', note: null });
  const [scheme, setScheme] = useState<'day' | 'sun'>(() => (keep.getItem(SUN) === 'yes' ? 'sun' : 'day'));
  const camera = useCamera((text) => {
    void readCode(text, gate.list, gate.readTicket).then(
      (ticket) => go({ at: 'ticket', showing: show(gate, ticket) }),
      () => go({ at: 'watching', note: 'This ticket cannot be read without a signal. Find the party by name or code.' }),
    );
  });
  const { here, garden, madeAt, time } = gate.list;
  const kept = gate.keptHere === 0 ? 'No signal' : `No signal: ${gate.keptHere} kept here`;
  const words = gate.hasSignal ? `list from ${formatTime(madeAt, time)}` : kept;
  const toggleSun = () => {
    keep.setItem(SUN, scheme === 'sun' ? 'no' : 'yes');
    setScheme(scheme === 'sun' ? 'day' : 'sun');
  };
  return (
    <GateSheet stopNumber={here.stopNumber} ground={isOpen(gate, place) ? 'card' : 'white'} scheme={scheme}>
      <div className="mx-auto flex min-h-dvh max-w-md flex-col landscape:max-w-5xl">
        <StatusLine stopNumber={here.stopNumber} garden={garden} hasSignal={gate.hasSignal} words={words} />
        {place.at === 'watching' || place.at === 'ticket' ? <AtTheGate gate={gate} place={place} go={go} camera={camera} sun={{ scheme, toggle: toggleSun }} /> : <Aside gate={gate} place={place} go={go} />}
      </div>
    </GateSheet>
  );
}

type Go = (place: Place) => void;

/** Whether the gate stands open: the ground is then the ticket's own colour. */
function isOpen(gate: Gate, place: Place): boolean {
  if (place.at !== 'ticket') return false;
  return gate.fold.standing.has(place.showing.admitId) || drawingOf(verdictNow(gate, place.showing)) === 'open';
}

type AtTheGateProps = { gate: Gate; place: Extract<Place, { at: 'watching' | 'ticket' }>; go: Go; camera: ReturnType<typeof useCamera>; sun: { scheme: 'day' | 'sun'; toggle: () => void } };

/** The two screens with the camera: nobody at the gate, or a ticket. */
function AtTheGate({ gate, place, go, camera, sun }: AtTheGateProps) {
  const cab = <CabWindow show={camera.show} state={camera.state} />;
  const next = () => {
    camera.forget();
    go({ at: 'watching', note: null });
  };
  if (place.at === 'watching') return <Watching gate={gate} cab={cab} camera={camera.state} note={place.note} go={go} sun={sun} />;
  return <VerdictScreen gate={gate} showing={place.showing} cab={cab} go={go} next={next} />;
}

type AsideProps = { gate: Gate; place: Exclude<Place, { at: 'watching' | 'ticket' }>; go: Go };

/** The screens without the camera. */
function Aside({ gate, place, go }: AsideProps) {
  switch (place.at) {
    case 'finding':
      return <Finding gate={gate} onFound={(party) => go({ at: 'ticket', showing: show(gate, party) })} onDone={() => go({ at: 'watching', note: null })} />;
    case 'where':
      return <WhereWeAre ask={gate.place} onDone={() => go({ at: 'watching', note: null })} />;
    case 'some':
      return <SomeCame gate={gate} showing={place.showing} go={go} />;
    case 'why':
      return <SayWhy gate={gate} showing={place.showing} heads={place.heads} go={go} />;
    case 'story':
      return <TicketStory gate={gate} ticket={ticketNow(gate, place.showing)} onDone={() => go({ at: 'ticket', showing: place.showing })} />;
  }
}
