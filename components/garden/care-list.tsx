import { Sign } from '@/components/ui/sign';

/** Cautions, each with the sign, none by colour alone. */
export function CautionList({ cautions }: { cautions: readonly string[] }) {
  return (
    <ul className="max-w-[66ch]">
      {cautions.map((caution) => (
        <li key={caution} className="grid grid-cols-[2.1rem_1fr] border-t border-rule py-2 leading-snug first:border-t-0">
          <Sign kind="caution" />
          <span>{caution}</span>
        </li>
      ))}
    </ul>
  );
}

/** A garden's cautions and who has the last word. */
export function CareList({ cautions }: { cautions: readonly string[] }) {
  return (
    <>
      <CautionList cautions={cautions} />
      <p className="note mt-2 border-t border-rule pt-2.5 leading-snug">What the host says on the day goes before anything here, and local codes go before both.</p>
    </>
  );
}
