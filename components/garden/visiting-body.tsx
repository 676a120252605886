import { Columns, Part } from '@/components/layout/columns';
import type { VisitingPage, VisitingPart } from '@/lib/gardens/views/visiting';
import { CautionList } from './care-list';

/** How a visit works, in two columns: what everybody needs on the left, what some need on the right. */
export function VisitingBody({ page }: { page: VisitingPage }) {
  return (
    <Columns split="main-aside">
      <div>
        {page.main.map((part, index) => (
          <Part key={part.id} id={part.id} title={part.title} place={index === 0 ? 'first' : 'next'}>
            <Told part={part} />
          </Part>
        ))}
      </div>
      <div>
        {page.aside.map((part, index) => (
          <section key={part.id} id={part.id} className={index === 0 ? 'pt-5' : 'mt-7 border-t border-rule pt-5'}>
            <h2 className="mb-2 text-[1.5rem]">{part.title}</h2>
            <Told part={part} />
          </section>
        ))}
      </div>
    </Columns>
  );
}

function Told({ part: { sentences, list, isCare } }: { part: VisitingPart }) {
  return (
    <>
      {sentences.map((sentence) => (
        <p key={sentence} className="mb-3 last:mb-0">
          {sentence}
        </p>
      ))}
      {list.length === 0 ? null : isCare ? (
        <CautionList cautions={list} />
      ) : (
        <ul className="max-w-[66ch] border-b border-rule">
          {list.map((line) => (
            <li key={line} className="border-t border-rule py-2 leading-snug">
              {line}
            </li>
          ))}
        </ul>
      )}
    </>
  );
}
