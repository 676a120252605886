import { useId, useState } from 'react';
import type { Heads } from '@/lib/gate/rules/facts';
import { peopleInWords } from '@/lib/gate/views/screen';
import { AsideFrame } from './aside-frame';
import { GateButton } from './gate-button';
import { letIn, nameOf, ticketNow, verdictNow, type Place, type Showing } from './showing';
import type { Gate } from './use-gate';

const REASONS: Record<string, readonly string[]> = {
  early: ['The garden is quiet', 'They have far to go', 'The host says yes'],
  late: ['Held up on the way', 'Another garden kept them', 'The host says yes'],
};

/** Lets a party in against the clock, with the reason that is written down beside it. One press on a reason does it. */
export function SayWhy({ gate, showing, heads, go }: { gate: Gate; showing: Showing; heads: Heads; go: (place: Place) => void }) {
  const verdict = verdictNow(gate, showing);
  const [typed, setTyped] = useState('');
  const id = useId();
  const back = () => go({ at: 'ticket', showing });
  const press = (reason: string) => {
    go({ at: 'ticket', showing: letIn(gate, showing, heads, { verdict: verdict.kind, reason }) });
  };
  return (
    <AsideFrame title="Let them in: why?" presses={<GateButton tone="bare" onPress={back}>Back to the ticket</GateButton>}>
      <p className="pb-4"><b>{nameOf(gate, ticketNow(gate, showing)) ?? 'This party'}</b>, {peopleInWords(heads)}.</p>
      <div className="grid gap-4">
        {(REASONS[verdict.kind] ?? REASONS['late'] ?? []).map((reason) => <GateButton key={reason} onPress={() => press(reason)}>{reason}</GateButton>)}
        <label htmlFor={id} className="font-bold">Another reason</label>
        <input id={id} value={typed} maxLength={200} onChange={(event) => setTyped(event.target.value)} className="min-h-14 w-full border-[2.5px] border-current bg-sun-paper px-3 text-lg" />
        <GateButton isOff={typed.trim() === ''} onPress={() => press(typed.trim())}>Let them in for that</GateButton>
      </div>
    </AsideFrame>
  );
}
