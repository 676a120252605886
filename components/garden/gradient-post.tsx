import { BUILT, Drawing } from './drawing-parts';

const Arm = ({ words }: { words: string }) => (
  <text x="51" y="86" textAnchor="middle" className="fill-ink font-mono font-bold" fontSize="17">
    {words}
  </text>
);

/** A gradient post: level on the one side, the steepest climb on the other. */
export function GradientPost({ climb, caption }: { climb: string; caption: string }) {
  const isLevel = climb === 'level';
  return (
    <Drawing left={-88} top={26} width={198} height={190} caption={caption} align="centre">
      <path d="M-7 40 0 30 7 40V214H-7Z" className="fill-ink" />
      <path d="M-16 214H16" {...BUILT} />
      <path d="M-7 66H-76L-86 80-76 94H-7Z" {...BUILT} className="fill-paper" />
      <text x="-42" y="86" textAnchor="middle" className="fill-ink font-mono font-bold" fontSize="17">
        level
      </text>
      <g transform={isLevel ? '' : 'rotate(-12 7 80)'}>
        <path d="M7 66H92L102 80 92 94H7Z" {...BUILT} className="fill-paper" />
        <Arm words={climb} />
      </g>
      <path d="M-7 58H7V100H-7Z" className="fill-ink" />
    </Drawing>
  );
}
