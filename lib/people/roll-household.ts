import 'server-only';
import { desc, eq } from 'drizzle-orm';
import { contactDetails, households, people } from '@/db/schema/people';
import type { Id } from '@/lib/core/ids';
import { may } from '@/lib/people/rules/capabilities';
import type { AccountCtx } from '@/lib/infra/context';

/** One household on the roll with its people; how they are reached only for who may see people. Null when there is none. */
export async function findHousehold({ db, actor }: AccountCtx, id: Id<'household'>) {
  const rows = await db.select({
    name: households.name, memberNumber: households.memberNumber, joinedOn: households.joinedOn, leftOn: households.leftOn,
    personId: people.id, givenName: people.givenName, familyName: people.familyName, age: people.age, isContact: people.isContact,
    email: contactDetails.email, phone: contactDetails.phone, street: contactDetails.street, town: contactDetails.town, postcode: contactDetails.postcode,
  })
    .from(households).leftJoin(people, eq(people.householdId, households.id)).leftJoin(contactDetails, eq(contactDetails.personId, people.id))
    .where(eq(households.id, id)).orderBy(desc(people.isContact), people.givenName).limit(20);
  const first = rows[0];
  if (!first) return null;
  const seesContacts = may(actor.roles, 'people.see');
  return {
    name: first.name, memberNumber: first.memberNumber, joinedOn: first.joinedOn, leftOn: first.leftOn,
    people: rows.filter((row) => row.personId !== null).map((row) => ({
      id: row.personId, name: `${row.givenName} ${row.familyName}`, age: row.age, isContact: row.isContact,
      reached: seesContacts ? [row.email, row.phone, [row.street, row.town, row.postcode].filter(Boolean).join(', ')].filter(Boolean).join('; ') : null,
    })),
  };
}
