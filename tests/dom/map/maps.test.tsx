import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { AreaMap } from '@/components/map/area-map';
import { LiveMap } from '@/components/map/live-map';
import { type MapGarden, ValleyMap } from '@/components/map/valley-map';
import { placesBetweenAreas } from '@/components/map/visit-line';
import { neighbourhoodsOf } from '@/lib/gardens/rules/valley';
import { builtInValley } from '@/lib/gardens/rules/valley-data';
import { show } from '../ui/stage';

const gardens: MapGarden[] = [
  { number: 1, areaKey: 'the-saltings', name: 'Saltmarsh & Plover', href: '/gardens/saltmarsh-and-plover' },
  { number: 9, areaKey: 'the-saltings', name: 'Bellwether Street Tram', href: '/gardens/bellwether-street-tram' },
  { number: 12, areaKey: 'the-ridge', name: 'Gorsefoot Timber Line', href: '/gardens/gorsefoot-timber-line' },
];

function drawn(element: React.ReactElement): HTMLElement {
  const sheet = document.createElement('div');
  sheet.innerHTML = renderToStaticMarkup(element);
  return sheet;
}

describe('the printed map', () => {
  it('carries one link for each garden, named by number, railway and neighbourhood', () => {
    const links = [...drawn(<ValleyMap valley={builtInValley} gardens={gardens} />).querySelectorAll('a')];

    expect(links.map((link) => [link.getAttribute('href'), link.getAttribute('aria-label')])).toEqual([
      ['/gardens/saltmarsh-and-plover', 'Garden 1, Saltmarsh & Plover: the saltings'],
      ['/gardens/bellwether-street-tram', 'Garden 9, Bellwether Street Tram: the saltings'],
      ['/gardens/gorsefoot-timber-line', 'Garden 12, Gorsefoot Timber Line: the ridge'],
    ]);
  });

  it('hatches a neighbourhood once and lets two gardens in it stand side by side', () => {
    const sheet = drawn(<ValleyMap valley={builtInValley} gardens={gardens} />);
    const posts = [...sheet.querySelectorAll('a > g')].map((post) => post.getAttribute('transform'));

    expect(sheet.querySelectorAll('pattern')).toHaveLength(2);
    expect(new Set(posts).size).toBe(3);
  });

  it('says nothing that depends on where in its neighbourhood a garden lies: it is given no place at all', () => {
    const [area] = neighbourhoodsOf(builtInValley).filter(({ key }) => key === 'the-ridge');
    const places = placesBetweenAreas(builtInValley, neighbourhoodsOf(builtInValley).filter(({ key }) => ['the-saltings', 'the-ridge'].includes(key)));

    expect(places).toContainEqual(area?.labelPoint);
  });

  it('joins a party’s gardens by a line along the roads, and draws none for one garden', () => {
    const withLine = drawn(<ValleyMap valley={builtInValley} gardens={gardens} line={[1, 12]} />);
    const without = drawn(<ValleyMap valley={builtInValley} gardens={gardens} line={[1]} />);

    expect(withLine.querySelectorAll('.stroke-damson')).toHaveLength(1);
    expect(without.querySelectorAll('.stroke-damson')).toHaveLength(0);
  });

  it('leaves out a garden whose neighbourhood it does not know', () => {
    const sheet = drawn(<ValleyMap valley={builtInValley} gardens={[{ number: 2, areaKey: 'nowhere', name: 'Nowhere Line', href: '/gardens/nowhere' }]} />);

    expect(sheet.querySelectorAll('a')).toHaveLength(0);
    expect(sheet.querySelector('svg')?.getAttribute('aria-label')).toContain('0 neighbourhoods');
  });
});

describe('the map of one neighbourhood', () => {
  it('names the neighbourhood in words and carries the garden’s number', () => {
    const sheet = drawn(<AreaMap valley={builtInValley} areaKey="the-middle-of-the-town" number={3} />);

    expect(sheet.querySelector('svg')?.getAttribute('aria-label')).toBe('A hatched neighbourhood: the middle of the town');
    expect([...sheet.querySelectorAll('text')].map((text) => text.textContent)).toContain('3');
  });
});

describe('the map that moves', () => {
  it('leaves the printed map standing where no live one can be drawn', () => {
    const sheet = show(
      <LiveMap posts={[]} sheet={builtInValley.sheet}>
        <ValleyMap valley={builtInValley} gardens={gardens} />
      </LiveMap>,
    );

    expect(sheet.querySelectorAll('a')).toHaveLength(3);
    expect(sheet.querySelector('[inert]')).toBeNull();
  });
});
