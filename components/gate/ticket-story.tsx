import { storyOf } from '@/lib/gate/rules/fold';
import type { GateTicket } from '@/lib/gate/rules/verdict';
import { peopleInWords } from '@/lib/gate/views/screen';
import { storyLines } from '@/lib/gate/views/story';
import { AsideFrame } from './aside-frame';
import { GateButton } from './gate-button';
import { nameOf } from './showing';
import type { Gate } from './use-gate';

/** What a ticket did at this gate, line by line. Nothing here lets anyone in. */
export function TicketStory({ gate, ticket, onDone }: { gate: Gate; ticket: GateTicket | null; onDone: () => void }) {
  const lines = ticket === null ? [] : storyLines(storyOf(gate.fold, ticket.visitId), gate.list.deviceId, gate.list.time);
  return (
    <AsideFrame title="What this ticket did" presses={<GateButton onPress={onDone}>Back to the ticket</GateButton>}>
      {ticket && <p className="pb-3"><b>{nameOf(gate, ticket) ?? 'This party'}</b>, {peopleInWords(ticket)}.</p>}
      <ol>
        {lines.map(({ id, time, words }) => (
          <li key={id} className="grid grid-cols-[auto_1fr] gap-4 border-b-[1.5px] border-current py-3">
            <span className="font-mono font-semibold">{time}</span>
            <span>{words}</span>
          </li>
        ))}
      </ol>
    </AsideFrame>
  );
}
