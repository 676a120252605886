import { act } from 'react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { TimeBoard, type TimeBoardProps } from '@/components/time-board/time-board';
import { GardenHead } from '@/components/time-board/garden-head';
import { BoardKey } from '@/components/time-board/board-key';
import type { FormState } from '@/lib/core/form-state';
import { readBoardAsked } from '@/lib/opendays/rules/board-asked';
import { aBoard, entryIdAt } from '../../support/boards';
import { find, press, show, showWithoutScript, type } from '../ui/stage';

let places: Record<string, number | null> = {};
let sent: FormData[] = [];
let answer: FormState = { status: 'done' };

beforeEach(() => {
  window.history.replaceState(null, '', '/');
  places = {};
  sent = [];
  answer = { status: 'done' };
  vi.stubGlobal('fetch', async () => new Response(JSON.stringify({ places })));
});
afterEach(() => vi.unstubAllGlobals());

const action = async (_: FormState, form: FormData) => {
  sent.push(form);
  return answer;
};

const aTimeBoard = (changes: Partial<TimeBoardProps> = {}, query: Record<string, string | string[]> = { adults: '2', children: '1' }) => {
  const board = changes.board ?? aBoard();
  return (
    <TimeBoard
      board={board}
      action={action}
      first={readBoardAsked(query)}
      own={{}}
      path="/open-days/spring-2027"
      caption="Places left at each garden and entry time on Saturday 15 May 2027"
      heads={Object.fromEntries(board.stops.map((stop) => [stop.stopId, <GardenHead key={stop.stopId} stop={stop} />]))}
      posts={{}}
      train={null}
      boardKey={<BoardKey />}
      beside={null}
      {...changes}
    />
  );
};

const named = <E extends Element>(at: ParentNode, kind: new () => E, words: string): E => {
  const found = [...at.querySelectorAll('[aria-label]')].find((each) => each instanceof kind && (each.getAttribute('aria-label') ?? '').startsWith(words));
  if (found instanceof kind) return found;
  throw new Error(`nothing is called "${words}" among: ${[...at.querySelectorAll('[aria-label]')].map((each) => each.getAttribute('aria-label')).join(' | ')}`);
};
const tick = (at: ParentNode, words: string) => named(at, HTMLInputElement, words);
const bar = (at: ParentNode, words: string) => named(at, HTMLButtonElement, words);
const choose = (at: ParentNode, words: string) => act(async () => tick(at, words).click());
const keep = (at: ParentNode) => find(at, 'button[type=submit]', HTMLButtonElement);
const words = (at: Element) => (at.textContent ?? '').replace(/\s+/g, ' ');

describe('choosing times', () => {
  it('shows at once what can no longer be reached, and says it', async () => {
    const at = show(aTimeBoard());
    await choose(at, 'Copperkettle & Western, 13:45');

    expect(bar(at, 'Old Orchard Line, 14:30').getAttribute('aria-label')).toBe('Old Orchard Line, 14:30, cannot be reached: 15 min from Copperkettle, you would be 5 late');
    expect(bar(at, 'Saltmarsh & Plover, 13:45').getAttribute('aria-label')).toContain('you are at Copperkettle then');
    expect(words(find(at, '[role=status]', HTMLElement))).toMatch(/\d+ times cannot be reached with your choice/);
  });

  it('says the sum, the day and what the button will do', async () => {
    const at = show(aTimeBoard());
    await choose(at, 'Saltmarsh & Plover, 10:00');
    await choose(at, 'Pine Barrow Light Railway, 11:30');
    await choose(at, 'Copperkettle & Western, 13:45');

    expect(words(keep(at))).toBe('Keep 3 places at all three');
    expect(words(at)).toContain('Three visits for 2 adults at $8 and 1 child at $4: $60.00');
    expect(words(find(at, 'section ol', HTMLElement))).toContain('Saltmarsh & Plover: arr. 10:00, dep. 10:35');
    expect(words(find(at, 'section ol', HTMLElement))).toContain('10 min on the way, 45 min to spare');
  });

  it('asks once before a time that cannot be reached is chosen all the same, and says so to the server', async () => {
    const at = show(aTimeBoard());
    await choose(at, 'Copperkettle & Western, 13:45');
    await press(bar(at, 'Old Orchard Line, 14:30'));
    await press(bar(at, 'Choose 14:30 all the same'));

    expect(tick(at, 'Old Orchard Line, 14:30').checked).toBe(true);
    await press(keep(at));
    expect(sent[0]?.getAll('entryTimeId[]')).toEqual([entryIdAt(4, '13:45'), entryIdAt(6, '14:30')]);
    expect(sent[0]?.get('insists')).toBe('on');
  });

  it('takes a choice back, and everything can be reached again', async () => {
    const at = show(aTimeBoard());
    await choose(at, 'Copperkettle & Western, 13:45');
    await choose(at, 'Copperkettle & Western, 13:45');

    expect(at.querySelector('[data-state=barred]')).toBeNull();
    expect(words(keep(at))).toBe('Keep places at the times you choose');
  });

  it('sends nothing when no time is chosen, and says what to do', async () => {
    const at = show(aTimeBoard());
    await press(keep(at));

    expect(sent).toEqual([]);
    expect(words(find(at, '[role=alert]', HTMLElement))).toContain('Choose at least one time first.');
  });

  it('draws the line between two times in the cells that lie between them', async () => {
    const at = show(aTimeBoard());
    await choose(at, 'Saltmarsh & Plover, 10:00');
    await choose(at, 'Pine Barrow Light Railway, 11:30');

    const withTrack = [...at.querySelectorAll('td')].filter((cell) => cell.querySelector('[data-edge]')).map((cell) => cell.getAttribute('data-cell'));
    expect(withTrack).toEqual(['0-0', '0-1', '1-2', '2-2']);
  });
});

describe('the party', () => {
  it('that grows finds fewer boxes, and one that is too large is told so beside its boxes', async () => {
    const at = show(aTimeBoard());
    await type(tick(at, 'Adults'), '4');
    expect([...at.querySelectorAll('td')].find((cell) => words(cell).includes('Copperkettle & Western, 12:15'))?.textContent).toContain('fewer than your party');

    await type(tick(at, 'Adults'), '40');
    expect(words(find(at, '#people-mistake', HTMLElement))).toContain('Nine is the most one party can bring.');
    expect(tick(at, 'Adults').getAttribute('aria-describedby')).toBe('people-mistake');
  });

  it.each(['-1', '3.5', '1e9', 'three'])('of %s adults is kept as typed and never sent', async (typed) => {
    const at = show(aTimeBoard());
    await choose(at, 'Saltmarsh & Plover, 10:00');
    await type(tick(at, 'Adults'), typed);
    await press(keep(at));

    expect(tick(at, 'Adults').value).toBe(typed);
    expect(words(at)).toContain('Type whole numbers of people, from 0 to 99.');
    expect(sent).toEqual([]);
  });

  it('of children alone needs an adult', async () => {
    const at = show(aTimeBoard({}, { adults: '0', children: '2' }));

    expect(words(at)).toContain('A party with children needs at least one adult.');
  });
});

describe('places left', () => {
  it('are kept fresh, and a chosen time that filled up says so and stays ticked', async () => {
    places = { [entryIdAt(0, '10:00')]: 1, [entryIdAt(0, '10:45')]: 0 };
    const at = show(aTimeBoard({}, { adults: '2', with: entryIdAt(0, '10:00') }));
    await act(async () => { await vi.waitFor(() => expect(at.querySelector('[role=alert]')).not.toBeNull()); });

    expect(words(find(at, '[role=alert]', HTMLElement))).toContain('10:00 at Saltmarsh has too few places left for you now. Choose another time; the rest of your choice is kept.');
    expect(tick(at, 'Saltmarsh & Plover, 10:00').checked).toBe(true);
    expect(words(at)).toContain('Saltmarsh & Plover, 10:45, full');
    await press(keep(at));
    expect(sent).toEqual([]);
  });

  it('of the party’s own hold may be chosen again', () => {
    const at = show(aTimeBoard({ own: { [entryIdAt(2, '12:15')]: 3 } })); // full, but for three that this browser keeps

    expect(tick(at, 'Pine Barrow Light Railway, 12:15').getAttribute('aria-label')).toBe('Pine Barrow Light Railway, 12:15, 3 places left');
  });

  it('stay as they are when the server gives no answer', async () => {
    vi.stubGlobal('fetch', async () => new Response('<html>', { status: 502 }));
    const at = show(aTimeBoard());
    await act(async () => {});

    expect(tick(at, 'Saltmarsh & Plover, 10:45').getAttribute('aria-label')).toBe('Saltmarsh & Plover, 10:45, 12 places left');
  });
});

describe('what the server refused', () => {
  it('is said beside the button, and after a clash the party may say that it means it', async () => {
    answer = { status: 'refused', code: 'clash', message: '14:30 at Old Orchard: 15 min from Copperkettle, you would be 5 late.' };
    const at = show(aTimeBoard());
    await choose(at, 'Saltmarsh & Plover, 10:00');
    await press(keep(at));

    expect(words(find(at, '[role=alert]', HTMLElement))).toContain('you would be 5 late');
    await act(async () => find(at, 'input[name=insists]', HTMLInputElement).click());
    await press(keep(at));
    expect(sent[1]?.get('insists')).toBe('on');
  });
});

describe('the keyboard', () => {
  const arrow = (key: string) => act(async () => void document.activeElement?.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true })));
  const here = () => document.activeElement?.getAttribute('aria-label');

  beforeEach(() => {
    Element.prototype.getClientRects = () => Object.assign([new DOMRect()], { item: () => null }); // jsdom lays nothing out: everything is on the page
    return () => Reflect.deleteProperty(Element.prototype, 'getClientRects');
  });

  it('goes between times with the arrows, past what cannot be chosen, and to the ends of a garden', async () => {
    const at = show(aTimeBoard());
    await act(async () => tick(at, 'Pine Barrow Light Railway, 11:30').focus());

    await arrow('ArrowRight'); // 12:15 is full
    expect(here()).toBe('Pine Barrow Light Railway, 13:00, 5 places left');
    await arrow('ArrowDown'); // Thistledown has too few then
    expect(here()).toBe('Tansy Bank & Dunlin, 13:00, 4 places left');
    await arrow('Home');
    expect(here()).toBe('Tansy Bank & Dunlin, 10:00, 7 places left');
    await arrow('End');
    expect(here()).toBe('Tansy Bank & Dunlin, 15:15, 6 places left');
  });

  it('has one stop for the Tab key in each garden, where the reader was last', async () => {
    const at = show(aTimeBoard());
    await act(async () => tick(at, 'Saltmarsh & Plover, 13:00').focus());

    const stops = [...at.querySelectorAll('td [tabindex="0"]')].map((each) => each.getAttribute('aria-label'));
    expect(stops).toHaveLength(7);
    expect(stops[0]).toContain('Saltmarsh & Plover, 13:00');
  });

  it('hears the reason on a time that cannot be reached, and Escape puts it away', async () => {
    const at = show(aTimeBoard());
    await choose(at, 'Copperkettle & Western, 13:45');
    await act(async () => bar(at, 'Old Orchard Line, 14:30').focus());
    expect(words(find(at, '[data-asked]', HTMLElement))).toContain('15 min away, you would be 5 late: choose it all the same');

    await arrow('Escape');
    expect(at.querySelector('[data-asked]')).toBeNull();
  });
});

describe('without JavaScript', () => {
  it('is one form of tick boxes, each with its garden, time and places, and nothing is barred', () => {
    const { at } = showWithoutScript(aTimeBoard({}, { adults: '2', with: entryIdAt(4, '13:45') }));

    expect(tick(at, 'Copperkettle & Western, 13:45').checked).toBe(true);
    expect(tick(at, 'Old Orchard Line, 14:30').name).toBe('entryTimeId[]');
    expect(at.querySelector('[data-state=barred]')).toBeNull();
    expect(new Set([...at.querySelectorAll<HTMLInputElement>('td input')].map((input) => input.value)).size).toBe(at.querySelectorAll('td input').length);
  });

  it('keeps what was ticked and typed before the script came', async () => {
    const { at, wake } = showWithoutScript(aTimeBoard());
    tick(at, 'Saltmarsh & Plover, 10:00').checked = true;
    tick(at, 'Adults').value = '4';
    await wake();

    expect(tick(at, 'Saltmarsh & Plover, 10:00').checked).toBe(true);
    expect(words(keep(at))).toBe('Keep 5 places at 10:00');
  });
});

it('says in the address what is chosen, so that a reload finds it again', async () => {
  const at = show(aTimeBoard());
  await choose(at, 'Saltmarsh & Plover, 10:00');

  expect(window.location.pathname + window.location.search).toBe(`/open-days/spring-2027?children=1&with=${entryIdAt(0, '10:00')}`);
});

it('finds the later choice of the address on the way back to a kept page', async () => {
  window.history.replaceState(null, '', `/open-days/spring-2027?adults=4&with=${entryIdAt(0, '10:00')}`);
  const at = show(aTimeBoard({}, {}));

  expect(tick(at, 'Saltmarsh & Plover, 10:00').checked).toBe(true);
  expect(words(keep(at))).toBe('Keep 4 places at 10:00');
});

describe('filters', () => {
  it('show only step-free gardens, and keep one that has a chosen time', async () => {
    const at = show(aTimeBoard());
    await choose(at, 'Mossgill Quarry Tramway, 10:45');
    await act(async () => find(at, 'input[name=step-free]', HTMLInputElement).click());

    expect([...at.querySelectorAll('tbody th a')].map(words)).toEqual(['Saltmarsh & Plover', 'Mossgill Quarry Tramway', 'Pine Barrow Light Railway', 'Thistledown Junction', 'Tansy Bank & Dunlin']);
  });
});

it('sets neighbouring times that one visit bars as one line with one reason, and unfolds it on a tap', async () => {
  const at = show(aTimeBoard());
  await choose(at, 'Copperkettle & Western, 13:45');
  const first = bar(at, 'Saltmarsh & Plover, 13:00');
  const cell = first.closest('td');
  expect(words(cell ?? at)).toBe('13:00–14:3020 min from Copperkettle, too close to your 13:45');
  expect(at.querySelectorAll('tr:first-child [data-run=rest]')).toHaveLength(2);

  await press(first);
  expect(at.querySelectorAll('tr:first-child [data-run=rest]')).toHaveLength(0);
});

it('fourteen times stand across, fifteen are set in strips', () => {
  const starts = (count: number) => Array.from({ length: count }, (_, index) => `${String(9 + Math.floor(index / 3)).padStart(2, '0')}:${['00', '20', '40'][index % 3] ?? '00'}`);
  const settingOf = (count: number) => find(show(aTimeBoard({ board: aBoard({ starts: starts(count), placesAt: () => 4 }) })), 'form', HTMLFormElement).dataset['size'];

  expect([settingOf(14), settingOf(15)]).toEqual(['many', 'strips']);
});
