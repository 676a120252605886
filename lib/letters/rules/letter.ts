/** A piece of a sentence. A code, a private link and an address are marked, so that the office's copy can leave them out. */
export type Inline = string | { strong: string } | { code: string } | { address: string } | { link: string; href: string };

/** One garden of the timetable in a letter. */
export type TimetableRow = { arrives: string; leaves: string; stopNumber: number; name: string; notes: Inline[][]; journey: string | null };

/** One visit of the day drawn as a line: minutes of the day in the club's zone. */
export type DayVisit = { stopNumber: number; name: string; arrives: number; leaves: number };

/** What a letter is built of. */
export type Block =
  | { kind: 'paragraph'; parts: Inline[] }
  | { kind: 'section'; title: string; parts: Inline[] }
  | { kind: 'button'; label: string; href: string }
  | { kind: 'code'; code: string }
  | { kind: 'timetable'; rows: TimetableRow[] }
  | { kind: 'day'; visits: DayVisit[]; hour: (minutes: number) => string }
  | { kind: 'figures'; rows: [string, string][] }
  | { kind: 'rule' };

/** A letter before it is HTML or plain text. `lead` stands above the rail rule, `body` below it. */
export type Letter = {
  clubName: string;
  subject: string;
  title: string;
  line: string;
  preview: string;
  lead: Block[];
  body: Block[];
  foot: string;
};

const BLANK = '(blanked)';

/** The letter as the office may read it: codes, private links and addresses left out. */
export function blanked(letter: Letter): Letter {
  return { ...letter, lead: letter.lead.map(blankBlock), body: letter.body.map(blankBlock) };
}

function blankBlock(block: Block): Block {
  switch (block.kind) {
    case 'paragraph':
    case 'section': return { ...block, parts: block.parts.map(blankInline) };
    case 'button': return { kind: 'paragraph', parts: [{ strong: block.label }, ` ${BLANK}`] };
    case 'code': return { ...block, code: BLANK };
    case 'timetable': return { ...block, rows: block.rows.map((row) => ({ ...row, notes: row.notes.map((note) => note.map(blankInline)) })) };
    default: return block;
  }
}

function blankInline(part: Inline): Inline {
  if (typeof part === 'string' || 'strong' in part) return part;
  return 'link' in part ? `${part.link} ${BLANK}` : BLANK;
}
