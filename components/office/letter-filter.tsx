import Link from 'next/link';
import { Fragment } from 'react';

const STATES = [['all', 'every letter'], ['failing', 'those that fail'], ['waiting', 'those that wait'], ['sent', 'those sent'], ['dropped', 'those not sent']] as const;

/** Which letters are shown, in one sentence of links. */
export function LetterFilter({ shown, path, find }: { shown: string; path: string; find: string }) {
  return (
    <p className="mt-3">
      Show {STATES.map(([state, words], index) => (
        <Fragment key={state}>
          {index === 0 ? '' : ', '}
          <Link
            href={`${path}?${new URLSearchParams({ ...(state === 'all' ? {} : { state }), ...(find === '' ? {} : { find }) })}`}
            className={state === shown ? 'font-bold text-ink underline decoration-[3px] underline-offset-4' : 'link'}
            {...(state === shown ? { 'aria-current': 'true' as const } : {})}
          >
            {words}
          </Link>
        </Fragment>
      ))}.
    </p>
  );
}
