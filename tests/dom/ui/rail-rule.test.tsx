import { describe, expect, it } from 'vitest';
import { RailRule } from '@/components/ui/rail-rule';
import { find, show } from './stage';

const rail = (at: HTMLElement) => find(at, '.rail', HTMLDivElement);

describe('the rail rule', () => {
  it('is an ornament when nothing is meant by it', () => {
    const at = show(<RailRule />);

    expect(rail(at).closest('[aria-hidden=true]')).not.toBeNull();
    expect(at.querySelector('svg')).toBeNull();
  });

  it('lays the rails of the share that is done, and says it in figures', () => {
    const at = show(<RailRule state="waiting" share={0.64} label="Working out your day" />);

    const progress = find(at, '[role=progressbar]', HTMLDivElement);

    expect(progress.getAttribute('aria-label')).toBe('Working out your day');
    expect(progress.getAttribute('aria-valuenow')).toBe('64');
    expect(rail(at).style.getPropertyValue('--laid')).toBe('64%');
  });

  it.each([[-1, '0'], [0, '0'], [1, '100'], [7, '100']])('keeps a share of %d on the rail', (share, percent) => {
    const at = show(<RailRule state="waiting" share={share} label="Waiting" />);

    expect(find(at, '[role=progressbar]', HTMLDivElement).getAttribute('aria-valuenow')).toBe(percent);
  });

  it('shows sleepers without rails for an empty list', () => {
    expect(rail(show(<RailRule state="empty" />)).classList.contains('rail-unlaid')).toBe(true);
  });

  it('ends at a buffer stop when something failed, and in the shed when the day is done', () => {
    const failed = show(<RailRule state="failed" />);
    const done = show(<RailRule state="done" />);

    expect(failed.querySelectorAll('svg')).toHaveLength(1);
    expect(rail(failed).style.getPropertyValue('--laid')).toBe('70%');
    expect(done.querySelectorAll('svg')).toHaveLength(2);
  });

  it('stands the train at the hour that was chosen', () => {
    const at = show(<RailRule trainAt={0.25} />);

    expect(find(at, '.rail-train', HTMLSpanElement).style.getPropertyValue('--at')).toBe('0.25');
  });
});
