import type { ReactNode } from 'react';
import { Columns, Part } from '@/components/layout/columns';
import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { remindAt, type HoldView } from '@/lib/bookings/views';
import type { FormAction } from '@/lib/core/form-state';
import { formatMoney } from '@/lib/core/money';
import { HeldVisits } from './held-visits';
import { DetailsForm, HoldButton } from './hold-forms';
import { QuietReminder } from './quiet-reminder';

export type HoldActions = { pay: FormAction; payOn: FormAction; keepLonger: FormAction; letGo: FormAction; keepAgain: FormAction; open: FormAction };
type HoldBodyProps = { hold: HoldView; actions: HoldActions; club: { locale: string; visitRules: string }; servedAt: string };

/** The hold page below its bill, by how the places stand. */
export function HoldBody(props: HoldBodyProps) {
  const { hold, actions } = props;
  switch (hold.state) {
    case 'kept':
      return <Kept {...props} />;
    case 'paying':
      return <Paying {...props} />;
    case 'confirmed':
      return (
        <Standing {...props}>
          <p className="mb-5 max-w-prose">These places are yours. {hold.totalMinor === 0 ? 'They cost nothing.' : 'They are paid for; nothing more is taken.'} Your tickets are on their way by letter, and here:</p>
          <HoldButton action={actions.open} bookingId={hold.bookingId} submit="See our tickets" tone="main" />
        </Standing>
      );
    case 'too-late':
      return (
        <Standing {...props}>
          <Notice tone="caution" as="standing">Your payment came when these places were gone. All of it goes back the way you paid, and a letter says so. It can take your bank some days to show it.</Notice>
          <p className="mt-5"><LinkButton href={`/open-days/${hold.day.slug}`} tone="main">Look for other times</LinkButton></p>
        </Standing>
      );
    case 'over':
      return (
        <Standing {...props}>
          <p className="mb-5 max-w-prose">The time to keep these places is up, and someone else may have them now. What you typed is still here. No money has moved.</p>
          <div className="flex flex-wrap items-start gap-5">
            <HoldButton action={actions.keepAgain} bookingId={hold.bookingId} submit="Keep the same places again" tone="main" />
            <LinkButton href={`/open-days/${hold.day.slug}`}>Choose other times</LinkButton>
          </div>
        </Standing>
      );
  }
}

function Kept({ hold, actions, club, servedAt }: HoldBodyProps) {
  const sum = formatMoney({ amountMinor: hold.totalMinor, currency: hold.currency }, club.locale);
  return (
    <Columns split="halves">
      <Part title="Who is coming" place="first">
        <DetailsForm action={actions.pay} bookingId={hold.bookingId} typed={hold.typed} visitRules={club.visitRules} isPaid={hold.totalMinor > 0}
          submit={hold.totalMinor > 0 ? `Pay ${sum}` : 'Confirm these places'} />
        {hold.totalMinor > 0 ? <p className="note mt-4">By card, on the card service’s own page. Pressing this keeps your places until that page closes, half an hour at most.</p> : null}
      </Part>
      <Part title="What is kept" place="first">
        <HeldVisits hold={hold} locale={club.locale} />
        <QuietReminder at={remindAt(hold.keptUntilAt).toISOString()} servedAt={servedAt}>
          <p className="note mt-4">Two minutes are left. {hold.longerUntil === null ? 'Finish now, or choose again afterwards.' : 'One press below keeps the places longer.'}</p>
        </QuietReminder>
        <div className="mt-5 flex flex-wrap items-start gap-5">
          {hold.longerUntil === null ? null : <HoldButton action={actions.keepLonger} bookingId={hold.bookingId} submit={`Keep them until ${hold.longerUntil}`} />}
          <HoldButton action={actions.letGo} bookingId={hold.bookingId} submit="Let them go" tone="bare" />
        </div>
      </Part>
    </Columns>
  );
}

function Paying({ hold, actions, club }: HoldBodyProps) {
  return (
    <Columns split="halves">
      <Part title="A payment is open" place="first">
        <p className="mb-5 max-w-prose">Your places stay kept until {hold.keptUntil} while the card service’s page is open. Nothing is taken until you pay there, and nothing twice.</p>
        <HoldButton action={actions.payOn} bookingId={hold.bookingId} submit="Go on to the card service’s page" tone="main" />
      </Part>
      <Part title="What is kept" place="first">
        <HeldVisits hold={hold} locale={club.locale} />
        <p className="note mt-4">Do you want other times instead? Let these go first.</p>
        <div className="mt-3"><HoldButton action={actions.letGo} bookingId={hold.bookingId} submit="Let them go" tone="bare" /></div>
      </Part>
    </Columns>
  );
}

function Standing({ hold, club, children }: HoldBodyProps & { children: ReactNode }) {
  return (
    <Columns split="halves">
      <div className="part-first">{children}</div>
      <Part title={hold.state === 'confirmed' ? 'Your visits' : 'What was kept'} place="first"><HeldVisits hold={hold} locale={club.locale} /></Part>
    </Columns>
  );
}

const NAMES = { over: 'No longer kept', confirmed: 'It is yours', 'too-late': 'Paid too late' } as const;

/** The bill's words of a hold: its name and the italic line. */
export function holdBill(hold: HoldView): { name: string; line: string; sums: string } {
  const name = hold.state === 'kept' || hold.state === 'paying' ? `Kept for you until ${hold.keptUntil}` : NAMES[hold.state];
  return { name, line: `${hold.day.title}, ${hold.day.line}`, sums: `${hold.where}.` };
}
