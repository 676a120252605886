import { describe, expect, it } from 'vitest';
import { likeOf, listingHref, listingOf, sortingOf } from '@/lib/core/listing';

const input = listingOf(['name', 'since'], { sort: 'name', order: 'asc' });
const usual = { find: '', sort: 'name', order: 'asc', page: 1 } as const;

describe('how a staff table is asked for', () => {
  it.each([
    { asked: {}, reads: usual },
    { asked: { find: '  Okonjo-Hale ', sort: 'since', order: 'desc', page: '3' }, reads: { find: 'Okonjo-Hale', sort: 'since', order: 'desc', page: 3 } },
    { asked: { sort: 'password_hash', order: 'sideways', page: '0' }, reads: usual },
    { asked: { page: '-1' }, reads: usual },
    { asked: { page: '1e9' }, reads: usual },
    { asked: { page: '2.5' }, reads: usual },
    { asked: { page: 'two', find: ['Ada', 'Ben'] }, reads: { ...usual, find: 'Ada' } },
    { asked: { find: 'x'.repeat(201) }, reads: usual },
  ])('reads $asked', ({ asked, reads }) => {
    expect(input.parse(asked)).toEqual(reads);
  });

  it('keeps the words and the filters when it is sorted or paged', () => {
    const href = listingHref('/office/roll', { ...usual, find: 'Fern & Co' }, { page: 2 }, { standing: 'paid' });

    expect(href).toBe('/office/roll?standing=paid&find=Fern+%26+Co&sort=name&order=asc&page=2');
  });

  it('turns the sorted column round, and begins again at the first page', () => {
    expect(sortingOf('/office/roll', { ...usual, page: 4 }, 'name')).toEqual({ href: '/office/roll?sort=name&order=desc', order: 'ascending' });
    expect(sortingOf('/office/roll', usual, 'since')).toEqual({ href: '/office/roll?sort=since&order=asc', order: 'none' });
  });
});

describe('words to find', () => {
  it.each([
    { find: '', like: null },
    { find: '100 %', like: '%100 \\%%' },
    { find: 'a_b\\', like: '%a\\_b\\\\%' },
    { find: "O'Neill; drop table", like: "%O'Neill; drop table%" },
  ])('takes "$find" literally', ({ find, like }) => {
    expect(likeOf(find)).toBe(like);
  });
});
