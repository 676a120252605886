'use client';

import { useEffect, useRef, type MouseEvent, type ReactNode } from 'react';
import { Notice } from '@/components/ui/notice';
import { plainName, type Problems } from './problems';

type FormSummaryProps = {
  message: string | undefined;
  problems: Problems;
  onScreen: readonly string[];
  idOf: (name: string) => string;
  wayOn: ReactNode;
};

/**
 * What is wrong with the whole form, at its head, taking the focus when it appears. Problems of fields on screen lead to
 * them; the others are said here, so that none is invisible. Without JavaScript all are sentences.
 */
export function FormSummary({ message, problems, onScreen, idOf, wayOn }: FormSummaryProps) {
  const box = useRef<HTMLDivElement>(null);
  const isShown = message !== undefined;
  useEffect(() => {
    box.current?.focus(); // once, when a judgement has made it: never while someone mends a field
  }, []);
  if (!isShown) return null;
  const known = onScreen.map(plainName);
  return (
    <Notice tone="danger" word="Not yet" ref={box} autoFocus>
      {message}
      <Sentences problems={problems} known={known} idOf={idOf} />
      {wayOn}
    </Notice>
  );
}

function Sentences({ problems, known, idOf }: { problems: Problems; known: string[]; idOf: (name: string) => string }) {
  const entries = Object.entries(problems);
  if (entries.length === 0) return null;
  return (
    <ul className="mt-1 grid gap-1">
      {entries.map(([name, sentences]) => (
        <li key={name}>
          {known.includes(name) ? (
            <a href={`#${idOf(name)}`} className="link" onClick={(event) => goToField(event, name)}>
              {sentences.join(' ')}
            </a>
          ) : (
            sentences.join(' ')
          )}
        </li>
      ))}
    </ul>
  );
}

/* Straight into the box: the first of its name, which may be one of several that share it. */
function goToField(event: MouseEvent<HTMLAnchorElement>, name: string) {
  const controls = [...(event.currentTarget.closest('form')?.elements ?? [])];
  const field = controls.find((each) => plainName(each.getAttribute('name') ?? '') === name);
  if (!(field instanceof HTMLElement)) return;
  event.preventDefault();
  field.focus();
}
