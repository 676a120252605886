import { Sign } from '@/components/ui/sign';
import { standingSentence, standingTone, type Standing } from '@/lib/dues/rules/standing';

type StandingLineProps = { standing: Standing; club: { locale: string; currency: string } };

/** How a household stands, as its dated sentence with its sign. */
export function StandingLine({ standing, club }: StandingLineProps) {
  const tone = standingTone(standing);
  const sentence = standingSentence(standing, club);
  if (tone === 'plain') return <span>{sentence}</span>;
  return (
    <span className={`font-semibold ${tone === 'danger' ? 'text-danger' : 'text-caution'}`}>
      <Sign kind={tone} /> {sentence}
    </span>
  );
}
