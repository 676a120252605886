import { GateButton } from './gate-button';
import { ShutGate } from './gate-drawings';
import { Track } from './gate-parts';
import { GateSheet } from './gate-sheet';

/** The shut gate with one sentence: before a pass is exchanged, while waiting, and when a pass is refused. */
export function GateClosed({ sentence, press }: { sentence: string; press?: { words: string; onPress: () => void } }) {
  return (
    <GateSheet stopNumber={1} ground="white" scheme="day">
      <div className="mx-auto flex min-h-dvh max-w-xl flex-col">
        <h1 className="px-5 pt-8 text-4xl leading-none font-black">The gate</h1>
        <p role="status" className="flex-1 px-5 py-5 text-2xl leading-snug">{sentence}</p>
        {press && <div className="px-5 pb-6"><GateButton onPress={press.onPress}>{press.words}</GateButton></div>}
        <div className="relative h-56"><ShutGate /></div>
        <Track />
        <div className="h-10" />
      </div>
    </GateSheet>
  );
}
