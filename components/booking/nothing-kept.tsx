import { Bill } from '@/components/layout/bill';
import { LinkButton } from '@/components/ui/link-button';
import { RailRule } from '@/components/ui/rail-rule';

/** A browser that has kept nothing lately. */
export function NothingKept() {
  return (
    <>
      <Bill name="Nothing kept" line="This browser keeps no places just now" rail={<RailRule state="empty" />} />
      <p className="mt-5 mb-5 max-w-prose">Choose an open day and the times that suit you. Places are kept for you while you say who is coming. If you have booked already, open the link in our letter.</p>
      <LinkButton href="/open-days" tone="main">See the open days</LinkButton>
    </>
  );
}
