import { describe, expect, it } from 'vitest';
import { Bill } from '@/components/layout/bill';
import { StaffCopy } from '@/components/layout/staff-copy';
import { Pagination } from '@/components/ui/pagination';
import { Table } from '@/components/ui/table';
import { find, show } from './stage';

const copy = (toSettle: { id: string; by: string; sentence: string; link: { href: string; label: string } }[]) =>
  show(
    <StaffCopy
      clubName="Alder Fork Garden Railway Society"
      printedAt="11 May 2027"
      here="/office/roll"
      bill={<Bill name="The roll" />}
      contents={[[{ href: '/office/roll', label: 'The roll', count: 143 }, { href: '/office/joiners', label: 'Joiners', count: 2 }]]}
      toSettle={toSettle}
    >
      <p>Rows</p>
    </StaffCopy>,
  );

describe('the staff copy', () => {
  it('letters what is to be settled, each with its day and one link', () => {
    const at = copy([
      { id: '1', by: 'now', sentence: 'Two cheques came without a name', link: { href: '/a', label: 'Find whose' } },
      { id: '2', by: '31 May', sentence: 'Six households are kept on', link: { href: '/b', label: 'Write the third' } },
    ]);

    const lines = [...at.querySelectorAll('ol > li')].map((line) => [...line.children].map((part) => part.textContent));

    expect(lines).toEqual([['a', 'now', 'Two cheques came without a name', 'Find whose'], ['b', '31 May', 'Six households are kept on', 'Write the third']]);
  });

  it('says so when nothing waits', () => {
    expect(copy([]).textContent).toContain('Nothing waits here for now.');
  });

  it('marks the page that is open in its contents', () => {
    const marked = [...copy([]).querySelectorAll('nav a[aria-current=page]')].map((link) => link.textContent);

    expect(new Set(marked)).toEqual(new Set(['The roll']));
  });
});

describe('a staff table', () => {
  const rows = [{ name: 'Abara', since: '2024' }];
  const columns = [
    { key: 'name', head: 'Household', names: 'row', sorting: { href: '?sort=name', order: 'ascending' }, cell: (row: { name: string; since: string }) => row.name },
    { key: 'since', head: 'Since', set: 'figures', sorting: { href: '?sort=since', order: 'none' }, cell: (row: { name: string; since: string }) => row.since },
  ] as const;

  it('tells by which column it is sorted, and sorts by link', () => {
    const at = show(<Table caption="Households" columns={columns} rows={rows} rowKey={(row) => row.name} empty="None yet" />);

    const heads = [...at.querySelectorAll('th[scope=col]')].map((head) => [head.getAttribute('aria-sort'), head.querySelector('a')?.getAttribute('href')]);

    expect(heads).toEqual([['ascending', '?sort=name'], ['none', '?sort=since']]);
    expect(find(at, 'th[scope=row]', HTMLTableCellElement).textContent).toBe('Abara');
  });

  it('shows what to do first instead of an empty grid', () => {
    const at = show(<Table caption="Households" columns={columns} rows={[]} rowKey={(row: { name: string; since: string }) => row.name} empty={<p>Invite the first household.</p>} />);

    expect(at.querySelector('table')).toBeNull();
    expect(at.textContent).toBe('Invite the first household.');
  });
});

describe('pages of a list', () => {
  it.each([
    [{ from: 1, to: 11, total: 143, nextHref: '?page=2' }, 'Households 1 to 11 of 143.The next 11'],
    [{ from: 133, to: 142, total: 143, nextHref: '?page=9' }, 'Households 133 to 142 of 143.The last one'],
    [{ from: 1, to: 3, total: 3 }, 'Households 1 to 3 of 3.'],
  ])('say where one is and how many follow', (place, said) => {
    expect(show(<Pagination what="households" {...place} />).textContent).toBe(said);
  });
});
