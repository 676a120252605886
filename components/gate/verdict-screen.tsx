import type { ReactNode } from 'react';
import { wallTime } from '@/lib/core/time';
import { headCount, peopleCount, type GateFact, type Heads } from '@/lib/gate/rules/facts';
import { storyOf } from '@/lib/gate/rules/fold';
import { drawingOf, pressesOf, type GatePress, type GateTicket, type Verdict } from '@/lib/gate/rules/verdict';
import { crowdSentence, dueNow, explain, letInSentence, peopleInWords, sentenceOf, whenInWords } from '@/lib/gate/views/screen';
import { isWoven } from '@/components/drawing/card-class';
import { GateButton } from './gate-button';
import { AjarGate, FullGate, OpenGate, ShutGate } from './gate-drawings';
import { Track } from './gate-parts';
import { countOut, letIn, nameOf, takeBack, ticketNow, verdictNow, type Place, type Showing } from './showing';
import { takeFocus } from './take-focus';
import type { Gate } from './use-gate';

type VerdictScreenProps = { gate: Gate; showing: Showing; cab: ReactNode; go: (place: Place) => void; next: () => void };

/** A ticket at the gate. The gate itself is the answer; a good ticket waits for one press on its number. */
export function VerdictScreen({ gate, showing, cab, go, next }: VerdictScreenProps) {
  const { list, fold, now } = gate;
  const done = fold.standing.get(showing.admitId);
  const ticket = ticketNow(gate, showing);
  const verdict = verdictNow(gate, showing);
  const due = dueNow(list.parties, fold, list.here.babes, now);
  const admit = (heads: Heads, reason: string | null) => go({ at: 'ticket', showing: letIn(gate, showing, heads, { verdict: verdict.kind, reason }) });
  return (
    <div className="flex flex-1 flex-col landscape:grid landscape:grid-cols-2 landscape:grid-rows-[auto_1fr] landscape:gap-x-6">
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2 px-5 pt-3 landscape:col-start-2 landscape:row-start-1">
        <div className="w-[min(8rem,36vw)] shrink-0 landscape:w-20">{cab}</div>
        <p className="min-w-0 flex-[1_1_8rem]">{crowdSentence(fold, list.here, due, list.time)}</p>
      </div>
      <div className={`flex flex-1 flex-col landscape:col-start-1 landscape:row-span-2 landscape:row-start-1 ${BESIDE}`}>
        {done && ticket ? <LetInScene gate={gate} fact={done} /> : <Scene gate={gate} verdict={verdict} onLetIn={(heads) => admit(heads, null)} />}
        <Track />
      </div>
      <div className="flex flex-col gap-4 px-5 pt-3 pb-4 landscape:col-start-2 landscape:row-start-2 landscape:justify-between">
        <p className="text-xl leading-snug"><WhoItIs gate={gate} ticket={ticket} verdict={verdict} done={done} wasTurnedDown={fold.refused.has(showing.admitId)} /></p>
        <div className="grid grid-cols-[fit-content(70%)_1fr] gap-4">
          {done
            ? <div className="col-span-2"><GateButton onPress={() => takeBack(gate, done.id)}>Take that back</GateButton></div>
            : <Presses gate={gate} verdict={verdict} showing={showing} go={go} admit={admit} />}
          <GateButton tone="bare" onPress={() => go({ at: 'finding' })}>Find by name or code</GateButton>
          <GateButton tone="bare" onPress={next}>Next ticket</GateButton>
        </div>
      </div>
    </div>
  );
}

/* With the phone on its side the drawing keeps to the screen's height and stays put while the presses scroll. */
const BESIDE = 'landscape:sticky landscape:top-0 landscape:h-[calc(100dvh-3.6rem)]';
const SENTENCE = 'px-5 pt-2 max-[360px]:px-3 max-[360px]:hyphens-auto font-heading text-[2.75rem] leading-none font-black tracking-tight'; // 49.5 px: never under 48, and two lines on the narrowest phone

/** The open gate after the press: "Three in at 11:34". */
function LetInScene({ gate, fact }: { gate: Gate; fact: GateFact }) {
  const count = headCount(fact, gate.list.here.babes) || peopleCount(fact);
  const sentence = letInSentence(count, fact.at, gate.list.time);
  const [first = '', second = ''] = sentence.split(/ (?=at )/);
  return (
    <div className="relative min-h-[288px] landscape:min-h-0 flex-1">
      <p ref={takeFocus} tabIndex={-1} role="status" className="sr-only">{sentence}</p>
      <OpenGate lines={[first, second]} number={count} isFramed={false} />
    </div>
  );
}

type SceneProps = { gate: Gate; verdict: Verdict; onLetIn: (heads: Heads) => void };

/** The sentence and the drawing of a verdict. The open gate is one large button. */
function Scene({ gate, verdict, onLetIn }: SceneProps) {
  const { list, now } = gate;
  const sentence = sentenceOf(verdict, list.here.stopNumber, list.time);
  if (verdict.kind === 'let_in') {
    return (
      <div className="flex flex-1 flex-col">
        <p ref={takeFocus} tabIndex={-1} role="status" className="sr-only">{sentence}. Press the number.</p>
        <button type="button" aria-label={sentence} onClick={() => onLetIn(verdict.heads)} className="relative min-h-[288px] landscape:min-h-0 w-full flex-1 cursor-pointer">
          <OpenGate lines={['Let in']} number={verdict.number} isFramed />
        </button>
      </div>
    );
  }
  return (
    <>
      <p ref={takeFocus} tabIndex={-1} role="status" className={SENTENCE}>{sentence}</p>
      <div className="relative mt-2 min-h-40 landscape:min-h-0 flex-1"><Drawing verdict={verdict} minutesOfDay={minutesOf(wallTime(now, list.time.timeZone))} stopNumber={list.here.stopNumber} /></div>
    </>
  );
}

function minutesOf(wall: string): number {
  const [hours, minutes] = wall.split(':').map(Number);
  return (hours ?? 0) * 60 + (minutes ?? 0);
}

function Drawing({ verdict, minutesOfDay, stopNumber }: { verdict: Verdict; minutesOfDay: number; stopNumber: number }) {
  switch (drawingOf(verdict)) {
    case 'ajar':
      return <AjarGate minutesOfDay={minutesOfDay} waitMinutes={verdict.kind === 'early' ? verdict.minutes : 0} isWoven={isWoven(stopNumber)} />;
    case 'one out':
      return <FullGate isWoven={isWoven(stopNumber)} />;
    default:
      return <ShutGate />;
  }
}

type WhoProps = { gate: Gate; ticket: GateTicket | null; verdict: Verdict; done: GateFact | undefined; wasTurnedDown: boolean };

/** Who it is and what to do, in one or two sentences. */
function WhoItIs({ gate, ticket, verdict, done, wasTurnedDown }: WhoProps) {
  const { time, deviceId, here } = gate.list;
  const name = nameOf(gate, ticket);
  const who = name && <><b>{name}</b>, </>;
  if (done && ticket) return <>{who}{peopleInWords(done)}. {whenInWords(ticket, time)}. Ready for the next ticket.</>;
  const before = wasTurnedDown ? 'The other phone was first, so nobody was let in here. ' : '';
  if (verdict.kind === 'let_in' && ticket) return <>{before}{who}{peopleInWords(verdict.heads)}. {whenInWords(ticket, time)}. {explain(verdict, { deviceId, club: time })}</>;
  const seenBy = ticket !== null && ticket.stopId === here.stopId && storyOf(gate.fold, ticket.visitId).admissions.length > 0 ? peopleInWords(ticket) : null;
  const heads = 'heads' in verdict ? who : name && <><b>{name}</b>{seenBy ? `, ${seenBy}` : ''}. </>;
  return <>{before}{heads}{explain(verdict, { deviceId, club: time })}</>;
}

type PressesProps = { gate: Gate; verdict: Verdict; showing: Showing; go: (place: Place) => void; admit: (heads: Heads, reason: string | null) => void };

/** What may be pressed under a verdict; the open gate's own press is its number. */
function Presses({ gate, verdict, showing, go, admit }: PressesProps) {
  const presses = pressesOf(verdict);
  const wide = (press: GatePress, button: ReactNode) => presses.includes(press) && <div className="col-span-2">{button}</div>;
  return (
    <>
      {wide('one came out', <GateButton tone="main" onPress={() => void countOut(gate)}>One came out</GateButton>)}
      {wide('only some', <GateButton onPress={() => go({ at: 'some', showing })}>Only some came</GateButton>)}
      {wide('say why', <GateButton onPress={() => go(why(verdict, showing))}>Let them in and say why</GateButton>)}
      {wide('host says yes', <GateButton onPress={() => 'heads' in verdict && admit(verdict.heads, 'The host says yes')}>The host says yes</GateButton>)}
      {wide('see story', <GateButton onPress={() => go({ at: 'story', showing })}>See what this ticket did</GateButton>)}
    </>
  );
}

const why = (verdict: Verdict, showing: Showing): Place => ('heads' in verdict ? { at: 'why', showing, heads: verdict.heads } : { at: 'ticket', showing });
