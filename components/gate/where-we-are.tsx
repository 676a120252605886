import { useMutation } from '@tanstack/react-query';
import type { GatePlace } from '@/lib/gate/schema';
import { AsideFrame } from './aside-frame';
import { GateButton } from './gate-button';
import { GateRefused } from './gate-api';

/** The exact address, for an ambulance. Asked for by a press, and each showing is written down. */
export function WhereWeAre({ ask, onDone }: { ask: () => Promise<GatePlace>; onDone: () => void }) {
  const { data, error, mutate, isPending } = useMutation({ mutationFn: ask, networkMode: 'always' });
  return (
    <AsideFrame
      title="Where we are"
      presses={
        <>
          {!data && <GateButton tone="main" isOff={isPending} onPress={() => mutate()}>Show the address</GateButton>}
          <GateButton onPress={onDone}>Back to the gate</GateButton>
        </>
      }
    >
      <div role="status">
        {data ? <Address place={data} /> : <p>For an ambulance or the fire service: call your local emergency number first, then read them this address. Each showing is written down.</p>}
        {error && <p className="pt-3 font-bold">{error instanceof GateRefused ? error.message : 'No signal just now. Walk to where there is some, then press again.'}</p>}
      </div>
    </AsideFrame>
  );
}

function Address({ place }: { place: GatePlace }) {
  return (
    <>
      <p className="text-3xl leading-tight font-bold whitespace-pre-line">{place.address}</p>
      {place.directions && <p className="pt-3">{place.directions}</p>}
      <p className="pt-3">
        {degrees(place.lat, 'north', 'south')}, {degrees(place.lon, 'east', 'west')}
      </p>
    </>
  );
}

const degrees = (value: number, over: string, under: string) => `${Math.abs(value).toFixed(5)}° ${value < 0 ? under : over}`;
