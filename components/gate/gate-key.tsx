/** One letter of the finding pad: a key where it leads to somebody, a bare letter where it does not. */
export function GateKey({ letter, leads, onPress }: { letter: string; leads: boolean; onPress: () => void }) {
  if (!leads) return <span aria-hidden className="grid min-h-[56px] place-items-center font-heading text-xl">{letter}</span>;
  return (
    <button type="button" onClick={onPress} className="min-h-[56px] cursor-pointer border-[2.5px] border-current bg-sun-paper font-heading text-2xl leading-none font-extrabold group-data-[sun=yes]:border-[3.5px]">
      {letter}
    </button>
  );
}
