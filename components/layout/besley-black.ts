/* Advances of Besley at weight 900, in hundredths of an em, measured in a browser from the font that ships with the
   application (@fontsource-variable/besley 5.3.0). A name is fitted before any font has loaded, on the server. */
const ADVANCES: Record<number, string> = {
  24: ':',
  30: " '|;",
  34: '.,}{’‘°·',
  40: '!`j¡´º[]',
  43: 'iìíîïl',
  47: 'ft-)¸(',
  53: '/\\+^×<=>IÌÍÎÏ_',
  58: '"s?z17ß',
  63: '3cçeèéêë*',
  66: '58oòóôõöø4#r“”69ð',
  69: '0vg~aàáâãäå',
  72: '2£Jqxyýÿ–$',
  75: 'Sbdpþh',
  78: 'uùúûüLknñÞ',
  81: 'PFTZ',
  85: 'EÈÉÊËBCÇ',
  90: 'YÝOQÒÓÔÕÖØ&DXÐ',
  95: 'UÙÚÛÜAGRVwÀÁÂÃÄÅNÑæ…K',
  107: 'HM—m@',
  130: '%WÆMœŒ',
};

const BY_CHARACTER = new Map(Object.entries(ADVANCES).flatMap(([advance, characters]) => Array.from(characters, (each) => [each, Number(advance)])));

/* Letters that the table lacks (Greek, Cyrillic, other scripts) come from a fallback face: taken as wide. */
const UNKNOWN = 100;
const LETTER_SPACING = -2.6;

const withoutMarks = (character: string) => character.normalize('NFD').charAt(0);

/** The width of a text in em, set as a bill's name: Besley Black, letterspaced −0.026 em. */
export function besleyBlackEm(text: string): number {
  const hundredths = Array.from(text, (each) => (BY_CHARACTER.get(each) ?? BY_CHARACTER.get(withoutMarks(each)) ?? UNKNOWN) + LETTER_SPACING);
  return hundredths.reduce((sum, each) => sum + each, 0) / 100;
}
