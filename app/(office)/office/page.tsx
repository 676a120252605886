import type { Metadata } from 'next';
import Link from 'next/link';
import { Bill } from '@/components/layout/bill';
import { officeContents } from '@/lib/people/rules/office-contents';
import { pageContext } from '@/lib/web/context';
import { OfficePage } from './office-page';

export const metadata: Metadata = { title: 'The office', robots: { index: false } };

export default async function OfficeHome() {
  const ctx = await pageContext('officer');
  const { actor } = ctx;
  return (
    <OfficePage ctx={ctx} here="/office" bill={<Bill name="The office" line={`${actor.name}, ${actor.roles.join(' and ')}`} />}>
      <h2>Where to begin</h2>
      <ul className="mt-2 border-t border-rule">
        {officeContents(actor.roles).flat().map((line) => (
          <li key={line.href} className="border-b border-rule">
            <Link className="link inline-flex min-h-11 items-center" href={line.href}>{line.label}</Link>
          </li>
        ))}
      </ul>
    </OfficePage>
  );
}
