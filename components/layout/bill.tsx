import { Fragment, type CSSProperties, type ReactNode } from 'react';
import { RailRule } from '@/components/ui/rail-rule';
import { billFit } from './bill-fit';

type BillProps = {
  /** The day's, the garden's or the page's name: the page's h1. */
  name: string;
  /** One italic line of date and place. */
  line?: ReactNode;
  /** Figures inside sentences. */
  sums?: ReactNode;
  /** A short form that belongs to the bill ("We are 2 adults and 1 child"). */
  children?: ReactNode;
  /** The rail rule below; null where the page draws its own (the time board's top edge). */
  rail?: ReactNode;
};

const vars = (values: Record<`--${string}`, number | string>): CSSProperties => values;

/** How a page opens, like a handbill: the name filling the measure, an italic line, sums in a sentence, the rail rule. */
export function Bill({ name, line, sums, children, rail = <RailRule /> }: BillProps) {
  const { lines, fit, fitWords, phoneRem } = billFit(name);
  return (
    <>
      <header className="bill pt-3">
        <h1 className="bill-name" style={vars({ '--fit': fit, '--fit-words': fitWords, '--bill-phone': `${phoneRem}rem` })}>
          {lines.map((each, index) => (
            <Fragment key={index}>
              {index === 0 ? null : ' '}
              <span className="bill-line">{each}</span>
            </Fragment>
          ))}
        </h1>
        {line === undefined ? null : <p className="bill-when">{line}</p>}
        {sums === undefined ? null : <p className="bill-sums">{sums}</p>}
        {children}
      </header>
      {rail}
    </>
  );
}
