import Link from 'next/link';
import type { RollFilter } from '@/lib/dues/schema';

type Sums = { households: number; people: number; by: { left: number; life: number; paid: number; kept: number; lapsed: number; new: number } };

/** The roll's figures inside a sentence; each figure shows its own households. */
export function RollSums({ sums: { households, people, by }, shown }: { sums: Sums; shown: RollFilter }) {
  const figure = (standing: RollFilter, words: string) => (
    <Link className={shown === standing ? 'font-bold text-ink underline decoration-[3px] underline-offset-4' : 'link'} href={standing === 'all' ? '/office/roll' : `/office/roll?standing=${standing}`} {...(shown === standing ? { 'aria-current': 'true' } : {})}>
      {words}
    </Link>
  );
  return (
    <>
      {figure('all', `${households} households`)}, {people} people: {figure('paid', `${by.paid} are paid up`)}, {figure('life', `${by.life} are members for life`)},{' '}
      {figure('kept', `${by.kept} owe and are kept on`)}, {figure('lapsed', `${by.lapsed} have lapsed`)}, {figure('new', `${by.new} are joining`)} and {figure('left', `${by.left} have left`)}.
    </>
  );
}
