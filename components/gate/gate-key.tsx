/** One letter of the finding pad: a key where it leads to somebody, a bare letter where it does not. */
export function GateKey({ letter, leads, onPress }: { letter: string; leads: boolean; onPress: () => void }) {
  if (!leads) return <span aria-hidden className="grid min-h-[56px] place-items-center font-heading text-xl">{letter}</span>;
  return (
    <button type="button" onClick={onPress} className="min-h-[56px] cursor-pointer border-[2.5px] border-current bg-sun-paper font-heading text-2xl leading-none font-extrabold group-data-[sun=yes]:border-[3.5px]">
      {letter}
    </button>
  );
}

/** One of the pad's own keys: its words are as small as a key is wide. */
export function PadKey({ words, isOff = false, onPress }: { words: string; isOff?: boolean; onPress: () => void }) {
  return (
    <button
      type="button"
      disabled={isOff}
      onClick={onPress}
      className="min-h-[56px] w-full cursor-pointer border-[2.5px] border-current bg-sun-paper text-base leading-none font-bold group-data-[sun=yes]:border-[3.5px] disabled:cursor-default disabled:border-dashed disabled:font-normal"
    >
      {words}
    </button>
  );
}
