/** What a garden holds that can hurt someone. */
export type Hazards = {
  readonly powers: readonly string[];
  readonly water: string;
  readonly waterNote: string | null;
  readonly trackHeightMm: number | null;
  readonly isStepFree: boolean;
  readonly stepsNote: string | null;
  readonly cautions: readonly string[];
};

/** Below this the line is where small feet go; above it, where small fingers reach (common practice, no source). */
const ANKLE_MM = 250;

const POOL_WORDS: Readonly<Record<string, string>> = {
  brook: 'A brook runs through the garden', pond: 'There is a pond', pool: 'There is a pool', lagoon: 'The lagoon is real water',
};

const sentence = (words: string): string => {
  const trimmed = words.trim();
  return `${trimmed.charAt(0).toUpperCase()}${trimmed.slice(1)}${/[.?]$/.test(trimmed) ? '' : '.'}`;
};

function waterCaution({ water, waterNote }: Hazards): string[] {
  const words = POOL_WORDS[water];
  if (words === undefined) return [];
  return [waterNote ? `${sentence(waterNote).replace(/\.$/, '')}: keep hold of small children.` : `${words}: keep hold of small children.`];
}

/** The usual cautions of a garden, most serious first, then what the host adds. Plain sentences; the host's word and local codes come first. */
export function cautionsOf(garden: Hazards): string[] {
  const { powers, trackHeightMm, isStepFree, stepsNote } = garden;
  return [
    ...waterCaution(garden),
    ...(powers.includes('live-steam') ? ['A live-steam engine stays hot for an hour after its run, and its gas and spirit burn without much of a flame. Look close, and keep hands back.'] : []),
    ...(powers.includes('overhead') || powers.includes('track') ? ['The rails or wires carry low-voltage power: nothing metal across them, please, and no wet feet on the line.'] : []),
    ...(trackHeightMm !== null && trackHeightMm < ANKLE_MM ? ['The line runs at ankle height beside the path. Step over it only where the host says.'] : []),
    ...(isStepFree ? [] : [`Mind the step${stepsNote ? `: ${sentence(stepsNote).charAt(0).toLowerCase()}${sentence(stepsNote).slice(1)}` : 's.'}`]),
    'Trains do not see children. Small hands stay behind the edging, and nobody reaches over a moving train.',
    ...garden.cautions.map(sentence),
  ];
}
