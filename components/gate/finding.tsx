import { useState } from 'react';
import { formatTime } from '@/lib/core/time';
import { counted, inWordsFirst } from '@/lib/opendays/rules/words';
import { headCount, headsLeft, peopleCount } from '@/lib/gate/rules/facts';
import { codeProblem, findParties, padKeys, type FindBy } from '@/lib/gate/rules/find';
import { storyOf } from '@/lib/gate/rules/fold';
import type { ListedParty } from '@/lib/gate/schema';
import { peopleInWords } from '@/lib/gate/views/screen';
import { SmallShutGate } from './gate-drawings';
import { GateKey, PadKey } from './gate-key';
import { takeFocus } from './take-focus';
import type { Gate } from './use-gate';

const SHOWN = 3;

type FindingProps = { gate: Gate; onFound: (party: ListedParty) => void; onDone: () => void };

/** Finds a party by name or code. Only keys that lead to a party on this gate's list can be pressed. */
export function Finding({ gate, onFound, onDone }: FindingProps) {
  const { parties } = gate.list;
  const [by, setBy] = useState<FindBy>('name');
  const [typed, setTyped] = useState('');
  const { hits, nextKeys } = findParties(parties, typed, by);
  const keys = padKeys(parties, by).filter((key, _, all) => nextKeys.has(key) || (by === 'name' ? /^[A-Z]$/.test(key) : all.length > 0));
  const switchTo = () => {
    setBy(by === 'name' ? 'code' : 'name');
    setTyped('');
  };
  return (
    <div className="flex flex-1 flex-col gap-2 px-5 pt-3 pb-5 landscape:grid landscape:grid-cols-2 landscape:gap-x-6">
      <div>
        <label className="flex min-h-14 flex-wrap items-center gap-x-3 border-[2.5px] border-current bg-sun-paper px-3 group-data-[sun=yes]:border-[3.5px]">
          <span className="sr-only">{by === 'name' ? 'The beginning of a name' : 'The beginning of a code'}</span>
          <input
            ref={takeFocus}
            value={typed}
            onChange={(event) => setTyped(event.target.value.toUpperCase().slice(0, 40))}
            inputMode="none"
            autoComplete="off"
            spellCheck={false}
            placeholder={by === 'name' ? 'Name' : 'Code'}
            className="min-w-24 flex-1 bg-sun-paper font-heading text-3xl font-extrabold placeholder:font-normal placeholder:text-current placeholder:opacity-80"
          />
          <span role="status">{hits.length} of {counted(parties.length, 'party', 'parties')}</span>
        </label>
        {typed !== '' && <ul>{hits.slice(0, SHOWN).map((party) => <li key={party.visitId} className="border-b-[1.5px] border-current"><Hit gate={gate} party={party} onFound={onFound} /></li>)}</ul>}
        <p className="py-1.5">{advice({ hits: hits.length, all: parties.length, typed, by })}</p>
      </div>
      <div className="mt-auto grid grid-cols-[repeat(auto-fill,minmax(56px,1fr))] gap-[16px]">
        {keys.map((key) => <GateKey key={key} letter={key} leads={nextKeys.has(key)} onPress={() => setTyped(typed + key)} />)}
        <PadKey words={by === 'name' ? 'Code' : 'Name'} onPress={switchTo} />
        <div className="col-span-2"><PadKey words="Back one" isOff={typed === ''} onPress={() => setTyped(Array.from(typed).slice(0, -1).join(''))} /></div>
        <PadKey words="Done" onPress={onDone} />
      </div>
    </div>
  );
}

/** What to do next, in one sentence. */
function advice({ hits, all, typed, by }: { hits: number; all: number; typed: string; by: FindBy }): string {
  if (all === 0) return 'Nobody has booked a visit at this garden yet.';
  if (typed === '') return by === 'name' ? 'Press the first letter of a first name or a surname.' : 'Press the code as it is said, letter by letter.';
  if (hits === 0) return by === 'name' ? 'Nobody on this gate’s list is called that. Try the code.' : codeProblem(typed);
  return hits > SHOWN ? `${inWordsFirst(hits - SHOWN)} more; one more letter will do.` : 'Press the party at the gate.';
}

/** One found party: heads still to come, the name, and its time or when it came in. */
function Hit({ gate, party, onFound }: { gate: Gate; party: ListedParty; onFound: (party: ListedParty) => void }) {
  const { time, here } = gate.list;
  const story = storyOf(gate.fold, party.visitId);
  const left = headsLeft(party, story.in);
  const cameIn = peopleCount(left) === 0 ? story.admissions.at(-1) : undefined;
  const what = party.givenBackAt ? 'given back' : cameIn ? `came in at ${formatTime(cameIn.at, time)}` : peopleInWords(left);
  return (
    <button type="button" onClick={() => onFound(party)} className="my-2 grid min-h-[56px] w-full cursor-pointer grid-cols-[2.5rem_1fr_auto] items-center gap-2 py-1 text-left">
      <span className="font-heading text-4xl leading-none font-black">{headCount(cameIn ? party : left, here.babes)}</span>
      <span className="min-w-0">
        <b className="block leading-tight break-words">{party.name}</b>
        <span className="block leading-tight">{what}</span>
      </span>
      {cameIn || party.givenBackAt ? <SmallShutGate /> : <span className="font-mono text-xl font-semibold whitespace-nowrap">{formatTime(party.opensAt, time)}</span>}
    </button>
  );
}
