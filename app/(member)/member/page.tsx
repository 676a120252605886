import type { Metadata } from 'next';
import Link from 'next/link';
import { Bill } from '@/components/layout/bill';
import { Columns, Part } from '@/components/layout/columns';
import { ContactForm } from '@/components/member/forms';
import { StandingLine } from '@/components/member/standing-line';
import { When } from '@/components/ui/when';
import { memberDues } from '@/lib/dues/queries';
import { myHousehold } from '@/lib/people/household';
import { pageContext } from '@/lib/web/context';
import { saveContactAction } from './actions';
import { MemberPage } from './member-page';

export const metadata: Metadata = { title: 'My household', robots: { index: false } };

export default async function HouseholdPage() {
  const ctx = await pageContext('member');
  const [household, dues] = [await myHousehold(ctx), await memberDues(ctx)];
  return (
    <MemberPage ctx={ctx} here="/member">
      <Bill
        name={household.name}
        line={<>Household {household.memberNumber}, members since <When on={household.joinedOn} club={ctx.club} style="short" /></>}
        sums={<>Dues: <StandingLine standing={dues.standing} club={ctx.club} />. <Link className="link" href="/member/dues">My dues</Link></>}
      />
      <Columns split="halves">
        {household.people.map((person) => (
          <Part key={person.id} title={`${person.givenName} ${person.familyName}`} place="first">
            <p className="mb-4 text-ink-soft">{person.age === 'junior' ? 'A junior member.' : person.isContact ? 'The club’s letters go here.' : 'A member of the household.'}</p>
            {person.age === 'junior' ? null : <ContactForm action={saveContactAction} person={person} />}
          </Part>
        ))}
      </Columns>
    </MemberPage>
  );
}
