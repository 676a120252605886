import Link from 'next/link';
import { Fragment } from 'react';
import type { RollFilter } from '@/lib/dues/schema';
import { counted } from '@/lib/opendays/rules/words';

type Sums = { households: number; people: number; by: { left: number; life: number; paid: number; kept: number; lapsed: number; new: number } };

/** The roll's figures inside a sentence; each figure shows its own households. */
export function RollSums({ sums: { households, people, by }, shown }: { sums: Sums; shown: RollFilter | null }) {
  const figure = (standing: RollFilter, words: string) => (
    <Link className={shown === standing ? 'font-bold text-ink underline decoration-[3px] underline-offset-4' : 'link'} href={standing === 'all' ? '/office/roll' : `/office/roll?standing=${standing}`} {...(shown === standing ? { 'aria-current': 'true' } : {})}>
      {words}
    </Link>
  );
  const others = PARTS.filter(({ kind }) => by[kind] > 0);
  return (
    <>
      {figure('all', counted(households, 'household', 'households'))}, {counted(people, 'person', 'people')}
      {others.map(({ kind, one, many }, index) => (
        <Fragment key={kind}>{index === 0 ? ': ' : index === others.length - 1 ? ' and ' : ', '}{figure(kind, counted(by[kind], one, many))}</Fragment>
      ))}.
    </>
  );
}

const PARTS = [
  { kind: 'paid', one: 'is paid up', many: 'are paid up' },
  { kind: 'life', one: 'is a member for life', many: 'are members for life' },
  { kind: 'kept', one: 'owes and is kept on', many: 'owe and are kept on' },
  { kind: 'lapsed', one: 'has lapsed', many: 'have lapsed' },
  { kind: 'new', one: 'is joining', many: 'are joining' },
  { kind: 'left', one: 'has left', many: 'have left' },
] as const;
