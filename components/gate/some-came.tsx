import { useState } from 'react';
import { headCount, NO_HEADS, peopleCount, type Heads } from '@/lib/gate/rules/facts';
import { roomLeft } from '@/lib/gate/rules/verdict';
import { AsideFrame } from './aside-frame';
import { GateButton } from './gate-button';
import { letIn, nameOf, ticketNow, verdictNow, type Place, type Showing } from './showing';
import type { Gate } from './use-gate';

const KINDS = [
  { kind: 'adults', one: 'Adults' },
  { kind: 'children', one: 'Children' },
  { kind: 'babes', one: 'Babes in arms' },
] as const;

/** Lets in a part of a party, kind by kind; the others keep their places on the ticket. */
export function SomeCame({ gate, showing, go }: { gate: Gate; showing: Showing; go: (place: Place) => void }) {
  const verdict = verdictNow(gate, showing);
  const [chosen, setChosen] = useState<Heads>(NO_HEADS);
  const left = 'heads' in verdict ? verdict.heads : NO_HEADS;
  const room = roomLeft(gate.list.here, gate.fold);
  const isTooMany = headCount(chosen, gate.list.here.babes) > room;
  const back = () => go({ at: 'ticket', showing });
  const press = () => {
    go({ at: 'ticket', showing: letIn(gate, showing, chosen, { verdict: verdict.kind, reason: null }) });
  };
  return (
    <AsideFrame
      title="Who came?"
      presses={
        <>
          <GateButton tone="main" isOff={peopleCount(chosen) === 0 || isTooMany} onPress={press}>{`Let in ${peopleCount(chosen)}`}</GateButton>
          <GateButton tone="bare" onPress={back}>Back to the ticket</GateButton>
        </>
      }
    >
      <p className="pb-3"><b>{nameOf(gate, ticketNow(gate, showing)) ?? 'This party'}</b>. The others can come in later on the same ticket.{isTooMany && ` There is room for ${room}.`}</p>
      {KINDS.filter(({ kind }) => left[kind] > 0).map(({ kind, one }) => (
        <fieldset key={kind} className="pb-4">
          <legend className="pb-2 font-bold">{one}</legend>
          <div className="grid grid-cols-[repeat(auto-fill,minmax(56px,1fr))] gap-[16px]">
            {Array.from({ length: left[kind] + 1 }, (_, count) => (
              <GateButton key={count} isPressed={chosen[kind] === count} onPress={() => setChosen({ ...chosen, [kind]: count })}>{count}</GateButton>
            ))}
          </div>
        </fieldset>
      ))}
    </AsideFrame>
  );
}
