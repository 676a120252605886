/** The inks of the sheet, read from the tokens as they stand where `place` stands, so that evening and the club's own ink hold here too. */
export interface MapInks {
  readonly ink: string;
  readonly inkSoft: string;
  readonly paper: string;
  readonly edge: string;
  readonly conifer: string;
  readonly damson: string;
  readonly cardInk: string;
  readonly cards: readonly string[];
}

const CARDS = ['primrose', 'lilac', 'rose', 'sage', 'sky', 'buff', 'mint'];

/** Reads the inks; a token that is missing is the paper's own black and white. */
export function inksAt(place: Element): MapInks {
  const style = getComputedStyle(place);
  const ink = (name: string, otherwise: string): string => style.getPropertyValue(`--color-${name}`).trim() || otherwise;
  return {
    ink: ink('ink', '#000'),
    inkSoft: ink('ink-soft', '#000'),
    paper: ink('paper', '#fff'),
    edge: ink('edge', '#000'),
    conifer: ink('conifer', '#000'),
    damson: ink('damson', '#000'),
    cardInk: ink('card-ink', '#000'),
    cards: CARDS.map((name) => ink(`card-${name}`, '#fff')),
  };
}
