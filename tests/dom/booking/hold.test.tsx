import { act } from 'react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { DetailsForm } from '@/components/booking/hold-forms';
import { HeldVisits } from '@/components/booking/held-visits';
import { holdBill } from '@/components/booking/hold-body';
import { QuietReminder } from '@/components/booking/quiet-reminder';
import { remindAt, type HoldView } from '@/lib/bookings/views';
import { newId } from '@/lib/core/ids';
import type { FormAction } from '@/lib/core/form-state';
import { find, press, show, showWithoutScript, type } from '../ui/stage';

const hold: HoldView = {
  bookingId: newId<'booking'>(), state: 'kept', code: '7Q2MXK4D', day: { title: 'Spring Open Gardens', slug: 'spring', line: 'Saturday 15 May 2027, in and around Alder Fork' },
  visits: [{ visitId: newId<'visit'>(), stopNumber: 3, garden: '<i>Pine</i> Barrow', at: '11:30', people: '2 adults', costMinor: 1600 }, { visitId: newId<'visit'>(), stopNumber: 5, garden: 'Copperkettle', at: '13:45', people: '2 adults', costMinor: 0 }],
  totalMinor: 1600, currency: 'USD', keptUntil: '11:42', keptUntilAt: '2027-05-01T15:42:00.000Z', longerUntil: '11:52',
  typed: { name: '', email: '', phone: '', wantsInvitations: true }, where: 'Pine Barrow at 11:30 and Copperkettle at 13:45',
};

describe('the quiet reminder', () => {
  beforeEach(() => vi.useFakeTimers());
  afterEach(() => vi.useRealTimers());
  const reminder = (servedAt: string) => <QuietReminder at={remindAt(hold.keptUntilAt).toISOString()} servedAt={servedAt}>Two minutes are left.</QuietReminder>;

  it('is said once, two minutes before the end, and nothing ticks until then', () => {
    const at = show(reminder('2027-05-01T15:32:00.000Z'));
    act(() => vi.advanceTimersByTime(8 * 60_000 - 1));
    expect(at.textContent).toBe('');

    act(() => vi.advanceTimersByTime(1));

    expect(find(at, '[role=status]', HTMLElement).textContent).toBe('Two minutes are left.');
    expect(vi.getTimerCount()).toBe(0);
  });

  it('is said at once on a page that is opened later', () => {
    const at = show(reminder('2027-05-01T15:41:00.000Z'));
    act(() => vi.advanceTimersByTime(0));

    expect(at.textContent).toBe('Two minutes are left.');
  });
});

describe('the kept places', () => {
  it('stand with time, people and price, and anything that looks like HTML is text', () => {
    const at = show(<HeldVisits hold={hold} locale="en-US" />);

    expect(at.querySelector('i')).toBeNull();
    expect(at.textContent).toContain('<i>Pine</i> Barrow');
    expect([...at.querySelectorAll('td:last-child')].map((cell) => cell.textContent)).toEqual(['$16.00', 'free', '$16.00']);
  });

  it('say in the bill until when they are kept', () => {
    expect(holdBill(hold).name).toBe('Kept for you until 11:42');
    expect(holdBill({ ...hold, state: 'over' }).name).toBe('No longer kept');
  });
});

describe('the party’s details', () => {
  const sent: Record<string, string>[] = [];
  const action: FormAction = async (_state, form) => {
    sent.push(Object.fromEntries([...form].map(([name, value]) => [name, String(value)])));
    return { status: 'done' };
  };
  const form = <DetailsForm action={action} bookingId={hold.bookingId} typed={{ ...hold.typed, name: 'Eve Marlow' }} visitRules="Stay on the path." submit="Pay $16.00" isPaid />;

  it('have what was typed before and the invitations ticked, also before any script', () => {
    const { at } = showWithoutScript(form);

    expect(find(at, 'input[name=name]', HTMLInputElement).value).toBe('Eve Marlow');
    expect(find(at, 'input[name=wantsInvitations]', HTMLInputElement).checked).toBe(true);
    expect(find(at, 'input[name=rulesAgreed]', HTMLInputElement).checked).toBe(false);
  });

  it('do not go anywhere before the rules are agreed to', async () => {
    const at = show(form);
    await type(find(at, 'input[name=email]', HTMLInputElement), 'eve@visitors.example');

    await press(find(at, 'button[type=submit]', HTMLButtonElement));

    expect(sent).toEqual([]);
    expect(at.querySelector('[role=alert]')?.textContent).toContain('keep to the visit rules');
    expect(find(at, 'input[name=email]', HTMLInputElement).value).toBe('eve@visitors.example');
  });
});
