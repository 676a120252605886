type Facts = { failing: number; stuck: number; lapsed: number; unpublished: readonly { slug: string; title: string }[] };

/** One thing that waits for an officer, and where it is settled. */
export type OfficeWaiting = { id: string; sentence: string; href: string; label: string };

const some = (count: number, one: string, many: string) => (count === 1 ? one : `${count} ${many}`);

/** What waits for an officer over the whole club, money and letters first; only what is really so. */
export function officeWaiting({ failing, stuck, lapsed, unpublished }: Facts): OfficeWaiting[] {
  return [
    ...(stuck === 0 ? [] : [{ id: 'refunds', sentence: `${some(stuck, 'One refund', 'refunds')} must be paid out by hand`, href: '/office/books#refunds', label: 'Pay and book' }]),
    ...(failing === 0 ? [] : [{ id: 'letters', sentence: `${some(failing, 'One letter has', 'letters have')} not been delivered yet`, href: '/office/letters?state=failing', label: 'See which' }]),
    ...unpublished.map(({ slug, title }) => ({ id: slug, sentence: `${title} is not published: nobody can see it or book`, href: `/office/open-days/${slug}`, label: 'Go on planning it' })),
    ...(lapsed === 0 ? [] : [{ id: 'lapsed', sentence: `${some(lapsed, 'One household has', 'households have')} lapsed`, href: '/office/roll?standing=lapsed', label: 'See who' }]),
  ];
}
