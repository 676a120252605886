import { describe, expect, it } from 'vitest';
import { FilterForm } from '@/components/garden/filter-form';
import { GardenIndex, NoGardens } from '@/components/garden/garden-list';
import { HomeDay, HomeRest } from '@/components/garden/home-body';
import { DrawnParticulars } from '@/components/garden/particulars';
import { PlantingChart } from '@/components/garden/planting-chart';
import { TimesList } from '@/components/garden/times-list';
import { newId } from '@/lib/core/ids';
import { gardenFilters } from '@/lib/gardens/schema';
import { plateSvg } from '@/lib/gardens/rules/plate/plate';
import { toGardenPage, toListed, type GardenRow, type NextDayRow } from '@/lib/gardens/views';
import { toHomePage } from '@/lib/gardens/views/home';
import { show, showWithoutScript } from '../ui/stage';

const club = { name: 'Test Valley Society', timeZone: 'America/New_York', locale: 'en-US', hourCycle: 'h23' as const, currency: 'USD', addressReleaseHours: 72 };
const garden: GardenRow = {
  slug: 'pine-barrow', railwayName: 'Pine & Barrow <Light> Railway', shortName: 'Pine Barrow', subtitle: 'a narrow-gauge line', about: null, hostsShownAs: null, scaleOneTo: 22.5, gaugeMm: 45,
  trackLengthMm: 64_618, minRadiusMm: 1219, steepestGradePercent: 2.38, powers: ['live-steam'], bridge: 'trestle', setIn: null, begunYear: null, plate: {}, isStepFree: true, pathWidthMm: 965,
  pathSurface: 'gravel', stepsNote: null, trackHeightMm: 457, seats: null, hasToilet: false, dogsNote: null, parkingNote: null, water: 'pond', waterNote: null, cautions: [], stayMinutes: 35,
  headsLimit: 28, areaKey: 'the-ridge', areaName: 'the ridge', areaCaption: 'Somewhere on the ridge.',
  plants: [
    { key: 'thyme', commonName: 'Mother-of-thyme', colour: 'mauve', drawing: 'thyme', bloomMonths: [5, 6, 7], isEvergreen: false, heightMm: 50 },
    { key: 'spruce', commonName: 'Dwarf spruce', colour: 'green', drawing: 'dwarf-spruce', bloomMonths: [], isEvergreen: true, heightMm: 500 },
  ],
};
const time = (places: number, isOver = false) => ({ entryTimeId: newId<'entryTime'>(), opensAt: new Date('2027-05-15T15:30:00Z'), places, isOver });
const day: NextDayRow = {
  slug: 'spring-2027', title: 'Spring', heldOn: '2027-05-15', isCalledOff: false, calledOffNote: null, number: 3, capacity: 40, taken: 26, from: null, times: [time(9), time(1), time(0), time(4, true)],
};
const pageOf = (next: NextDayRow | null) => toGardenPage({ ...garden, restNumber: 9 }, next, '2027-01-10', club);
const listed = toListed([{ ...garden, number: 3, placesLeft: 5, allPlaces: 14 }, { ...garden, slug: 'resting', railwayName: 'Resting Line', number: null, placesLeft: null, allPlaces: 0 }], club);

describe('the times on a garden’s page', () => {
  it('make each time with places a link that opens the board with it chosen', () => {
    const times = pageOf(day).times;
    if (!times) throw new Error('the garden takes part');
    const at = show(<TimesList day={times} />);
    const links = [...at.querySelectorAll('ol a')];

    expect(links.map((link) => link.getAttribute('aria-label'))).toEqual(['Choose 11:30, 9 places left', 'Choose 11:30, 1 place left']);
    expect(links[0]?.getAttribute('href')).toBe(`/open-days/spring-2027?with=${day.times[0]?.entryTimeId}`);
    expect(at.textContent).toContain('— full');
    expect(at.textContent).toContain('over');
  });

  it('say that a day is called off, and offer no time', () => {
    const times = pageOf({ ...day, isCalledOff: true, calledOffNote: 'Too much wind.' }).times;
    if (!times) throw new Error('the garden takes part');
    const at = show(<TimesList day={times} />);

    expect(at.textContent).toContain('Called off');
    expect(at.textContent).toContain('Too much wind.');
    expect(at.querySelector('a')).toBeNull();
  });

  it('are left out where the garden takes part in nothing, and the page keeps its own number', () => {
    expect(pageOf(null)).toMatchObject({ times: null, number: 9, line: 'A narrow-gauge line' });
  });
});

describe('the planting chart', () => {
  it('says in words what its bars show', () => {
    const { planting } = pageOf(day);
    const at = show(<PlantingChart plants={planting.plants} on={planting.on} dayText={planting.dayText} />);

    expect([...at.querySelectorAll('li')].map((row) => row.textContent)).toEqual(['Mother-of-thymemauve, 2 in: May to July', 'Dwarf spruceevergreen, 20 in: green all year']);
    expect(at.textContent).toContain('The strong line is 15 May.');
  });
});

describe('the particulars', () => {
  it('are one picture with one description', () => {
    const at = show(<DrawnParticulars {...pageOf(day).drawing} />);

    expect(at.querySelectorAll('[role=img]')).toHaveLength(1);
    expect(at.querySelector('[role=img]')?.getAttribute('aria-label')).toMatch(/^Tightest curve 4 ft radius; steepest climb 1 in 42; path 38 in wide/);
  });

  it('draw only what the host measured', () => {
    const at = show(<DrawnParticulars particulars={{ ...garden, minRadiusMm: null, steepestGradePercent: null, pathWidthMm: null, trackHeightMm: null, water: 'none' }} system="feet" words="x" />);

    expect(at.querySelectorAll('svg')).toHaveLength(1);
    expect(at.textContent).not.toMatch(/\d/);
  });
});

describe('the index of gardens', () => {
  it('says number, name, neighbourhood, and places only for those that take part', () => {
    const at = show(<GardenIndex gardens={listed} />);
    const rows = [...at.querySelectorAll('li')].map((row) => row.textContent);

    expect(rows[0]).toContain('Garden 3, Pine & Barrow <Light> Railway');
    expect(rows[0]).toContain('14 places left');
    expect(rows[1]).toContain('Garden 4, Resting Line');
    expect(rows[1]).not.toContain('left');
  });

  it('asks its filters in a plain GET form that keeps what was asked', () => {
    const { at } = showWithoutScript(<FilterForm filters={gardenFilters.parse({ scale: '22.5', access: 'step-free', places: '3' })} isNarrowed choices={{ scales: [20.3, 22.5], powers: ['battery'], days: [] }} />);
    const form = at.querySelector('form');

    expect([form?.method, form?.getAttribute('action')]).toEqual(['get', '/gardens']);
    expect(form && [...new FormData(form).entries()]).toEqual([['scale', '22.5'], ['runs', ''], ['day', ''], ['places', '3'], ['access', 'step-free']]);
  });

  it('draws sleepers without rails when nothing fits, and the way back', () => {
    const at = show(<NoGardens isNarrowed />);

    expect(at.querySelector('.rail-unlaid')).not.toBeNull();
    expect(at.querySelector('a')?.getAttribute('href')).toBe('/gardens');
  });
});

describe('the home page', () => {
  it('without a coming day says so, and shows the gardens meanwhile', () => {
    const page = toHomePage([], [{ ...garden, number: null, placesLeft: null, allPlaces: 0 }], '2027-01-10', club);
    const at = show(<><HomeDay page={page} /><HomeRest page={page} /></>);

    expect(page.name).toBe('No open day just now');
    expect(at.textContent).toContain('The sleepers are down');
    expect(at.textContent).toContain('Pine & Barrow <Light> Railway');
  });

  it('says what, when, where, for how much and how to come', () => {
    const row = { slug: 'spring', title: 'Spring Open Gardens', placeLine: 'in the valley', howToCome: 'By train.', heldOn: '2027-05-15', opensAt: new Date('2027-05-15T14:00:00Z'), closesAt: new Date('2027-05-15T20:00:00Z'), isCalledOff: false, calledOffNote: null, prices: [{ stopId: null, kind: 'adult' as const, amountMinor: 800 }] };
    const page = toHomePage([row], [{ ...garden, number: 1, placesLeft: 5, allPlaces: 14 }], '2027-01-10', club);

    expect(page.day?.lines.map(({ label }) => label)).toEqual(['what', 'when', 'where', 'for', 'how to come']);
    expect(page.line).toBe('Saturday 15 May 2027, one garden in the valley, from 10:00 until 16:00');
    expect(page.sums).toMatch(/^14 places are still to be had\./);
    expect(page.flowers).toEqual([{ plantKey: 'thyme', name: 'mother-of-thyme', gardens: [1] }]);
  });
});

describe('a plate', () => {
  it('is a well-formed picture, also for a railway with odd letters in its name', () => {
    const picture = new DOMParser().parseFromString(plateSvg({ ...garden, notes: {} }, 'rose', 'A & B <"x">'), 'image/svg+xml');

    expect(picture.querySelector('parsererror')).toBeNull();
    expect(picture.querySelector('title')?.textContent).toBe('A & B <"x">');
  });
});
