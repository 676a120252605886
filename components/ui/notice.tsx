import type { ReactNode, Ref } from 'react';
import { Sign, type SignKind } from './sign';

const words: Record<SignKind, string> = { note: 'Note', caution: 'Take care', danger: 'It did not work', clear: 'Done' };
const edges: Record<SignKind, string> = { note: 'border-conifer', caution: 'border-caution', danger: 'border-danger', clear: 'border-clear' };
const inks: Record<SignKind, string> = { note: 'text-conifer', caution: 'text-caution', danger: 'text-danger', clear: 'text-clear' };

type NoticeProps = {
  tone: SignKind;
  /** Instead of the tone's own word; null when the sentence says it already. */
  word?: string | null;
  /** `announced` when it appears after something was done; `standing` when it is part of the page. */
  as?: 'announced' | 'standing';
  /** A notice that takes the focus when it appears. */
  ref?: Ref<HTMLDivElement>;
  autoFocus?: boolean;
  children: ReactNode;
};

/** A sentence with its own sign and word, read out when it appears. */
export function Notice({ tone, word = words[tone], as = 'announced', ref, autoFocus, children }: NoticeProps) {
  const role = as === 'standing' ? 'note' : tone === 'danger' ? 'alert' : 'status';
  return (
    <div
      role={role}
      ref={ref}
      className={`flex items-start gap-3 border-l-[3px] py-1 pl-4 ${edges[tone]}`}
      {...(ref === undefined ? {} : { tabIndex: -1, autoFocus: autoFocus ?? false })}
    >
      <span className="mt-0.5">
        <Sign kind={tone} {...(word === null ? { word: words[tone] } : {})} />
      </span>
      <div className="min-w-0 flex-1">
        {word === null ? null : <strong className={`mr-2 font-bold ${inks[tone]}`}>{word}.</strong>}
        {children}
      </div>
    </div>
  );
}
