import type { ReactNode } from 'react';
import { PencilArrow } from '@/components/drawing/line-side';

export type PencilNote = {
  id: string;
  /** The day it was made: "9 May". */
  on: ReactNode;
  text: ReactNode;
  /** Initials of who made it. */
  by: string;
  /** The row it is about: `#id` of that row, with what to call it. */
  row?: { href: string; label: string };
};

/** Changes as pencil notes in the staff copy's margin: date, words, initials and an arrow to their row. */
export function PencilNotes({ notes }: { notes: readonly PencilNote[] }) {
  if (notes.length === 0) return null;
  return (
    <aside aria-label="Pencil notes" className="mt-6 grid gap-6 lg:mt-12">
      {notes.map((note) => (
        <p key={note.id} className="note relative text-base leading-snug text-pencil">
          <strong className="font-heading font-semibold not-italic">{note.on}.</strong> {note.text}
          <span className="block">{note.by}</span>
          {note.row === undefined ? null : (
            <a href={note.row.href} className="inline-flex min-h-11 items-center lg:absolute lg:-right-9 lg:top-0 lg:min-h-7">
              <span className="sr-only">To {note.row.label}</span>
              <PencilArrow />
            </a>
          )}
        </p>
      ))}
    </aside>
  );
}
