import { describe, expect, it } from 'vitest';
import { toCsv } from '@/lib/core/csv';
import { likeOf, listingHref, listingOf, sortingOf } from '@/lib/core/listing';

describe('a CSV file', () => {
  it('keeps quotes, commas, lines and emoji as they are (RFC 4180)', () => {
    expect(toCsv(['a', 'b'], [['say "hi", twice', 'one\ntwo'], ['🚂', null]])).toBe('\ufeffa,b\r\n"say ""hi"", twice","one\ntwo"\r\n🚂,\r\n');
  });

  it.each(['=1+1', '+1', '-1', '@sum', '\t=1', '\r=1'])('never lets a spreadsheet run %j', (text) => {
    expect(toCsv(['a'], [[text]])).toMatch(/\r\n"?'/);
  });

  it('leaves numbers numbers, the negative too', () => {
    expect(toCsv(['a'], [[-5]])).toContain('\r\n-5\r\n');
  });
});

describe('how a table is asked for', () => {
  const asked = listingOf(['name', 'since'], { sort: 'name', order: 'asc' });

  it('falls back from anything odd in the address', () => {
    expect(asked.parse({ sort: 'password', order: 'sideways', page: '-3', find: ['a', 'b'] })).toEqual({ find: 'a', sort: 'name', order: 'asc', page: 1 });
  });

  it('turns the order when the same column is pressed again, and goes back to the first page', () => {
    const listing = asked.parse({ page: '4', find: 'fen' });

    expect(sortingOf('/office/roll', listing, 'name')).toEqual({ href: '/office/roll?find=fen&sort=name&order=desc', order: 'ascending' });
    expect(sortingOf('/office/roll', listing, 'since').order).toBe('none');
    expect(listingHref('/office/roll', listing, { page: 5 }, { standing: 'kept' })).toBe('/office/roll?standing=kept&find=fen&sort=name&order=asc&page=5');
  });

  it('finds a percent sign as a percent sign', () => {
    expect(likeOf('100%_')).toBe('%100\\%\\_%');
    expect(likeOf('')).toBeNull();
  });
});
