import type { ReactNode } from 'react';
import { useState } from 'react';
import { dayOf, formatDay } from '@/lib/core/time';
import { crowdSentence, dueNow } from '@/lib/gate/views/screen';
import { GateButton } from './gate-button';
import { WaitingGate } from './gate-drawings';
import { Track } from './gate-parts';
import { countOut, takeBack, type Place } from './showing';
import type { CameraState } from './use-camera';
import type { Gate } from './use-gate';

const CAMERA_WORDS: Record<CameraState, readonly string[]> = {
  starting: ['Show', 'a ticket'],
  watching: ['Show', 'a ticket'],
  refused: ['No', 'camera'],
  none: ['No', 'camera'],
};

type WatchingProps = { gate: Gate; cab: ReactNode; camera: CameraState; note: string | null; go: (place: Place) => void; sun: { scheme: 'day' | 'sun'; toggle: () => void } };

/** Nobody at the gate: the window between its posts, the crowd in one sentence, and what may happen next. */
export function Watching({ gate, cab, camera, note, go, sun }: WatchingProps) {
  const { list, fold, now } = gate;
  const [lastOut, setLastOut] = useState<string | null>(null);
  const isOutStanding = lastOut !== null && fold.standing.has(lastOut);
  const due = dueNow(list.parties, fold, list.here.babes, now);
  return (
    <div className="flex flex-1 flex-col landscape:grid landscape:grid-cols-2 landscape:gap-x-6">
      <div className="landscape:sticky landscape:top-0 landscape:self-start">
        <div className="relative mx-auto aspect-[390/322] w-full landscape:h-[calc(100dvh-4.6rem)] landscape:w-auto">
          <WaitingGate lines={CAMERA_WORDS[camera]} />
          <div className="absolute inset-x-[24.5%] bottom-[2%]">{cab}</div>
        </div>
        <Track />
      </div>
      <div className="flex flex-1 flex-col px-5 pt-4 pb-5">
        <div role="status" className="mb-4 flex-1 space-y-2 text-xl leading-snug">
          {note && <p className="font-bold">{note}</p>}
          {(camera === 'refused' || camera === 'none') && <p className="font-bold">{camera === 'refused' ? 'The camera is not allowed here: find each party by name or code.' : 'This phone shows no camera here: find each party by name or code.'}</p>}
          {dayOf(now, list.time.timeZone) !== list.here.heldOn && <p className="font-bold">This gate is for {formatDay(list.here.heldOn, list.time)}.</p>}
          {list.here.calledOff && <p className="font-bold">This open day is called off. Nobody is let in.</p>}
          <p>{crowdSentence(fold, list.here, due, list.time)}</p>
        </div>
        <div className="grid grid-cols-[repeat(auto-fit,minmax(7rem,1fr))] gap-4">
          <div className="col-span-full"><GateButton tone="main" onPress={() => go({ at: 'finding' })}>Find by name or code</GateButton></div>
          <GateButton onPress={() => setLastOut(countOut(gate))}>One came out</GateButton>
          <GateButton isOff={!isOutStanding} onPress={() => lastOut !== null && takeBack(gate, lastOut)}>Take that back</GateButton>
          <GateButton tone="bare" onPress={sun.toggle}>{sun.scheme === 'sun' ? 'By ordinary light' : 'Black on white'}</GateButton>
          <GateButton tone="bare" onPress={() => go({ at: 'where' })}>Where we are</GateButton>
        </div>
      </div>
    </div>
  );
}
