import { Sign } from '@/components/ui/sign';

/** Cautions under "Take care": each with the sign, none by colour alone. */
export function CareList({ cautions }: { cautions: readonly string[] }) {
  return (
    <>
      <ul>
        {cautions.map((caution) => (
          <li key={caution} className="grid grid-cols-[2.1rem_1fr] border-t border-rule py-2 leading-snug first:border-t-0">
            <Sign kind="caution" />
            <span>{caution}</span>
          </li>
        ))}
      </ul>
      <p className="note mt-2 border-t border-rule pt-2.5 leading-snug">What the host says on the day goes before anything here, and local codes go before both.</p>
    </>
  );
}
