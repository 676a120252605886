import { describe, expect, it } from 'vitest';
import { NipCard } from '@/components/drawing/nip';
import { nipOf } from '@/components/drawing/nips';
import { plantDrawing, plantKeyFor } from '@/components/drawing/plants';
import { Post } from '@/components/drawing/post';
import { numbered } from '@/components/layout/garden-margin';
import { Notice } from '@/components/ui/notice';
import { find, show } from './stage';

const stops = Array.from({ length: 14 }, (_, index) => index + 1);

describe('the marks of a stop', () => {
  it('have a nip of their own for each of fourteen stops', () => {
    expect(new Set(stops.map((each) => nipOf(each).name)).size).toBe(14);
    expect(new Set(stops.map((each) => nipOf(each).path)).size).toBe(14);
  });

  it('say the shape in words', () => {
    expect(find(show(<NipCard stopNumber={12} />), 'svg', SVGElement).getAttribute('aria-label')).toBe('nip: arrow');
  });

  it('say the number and the minutes on the post', () => {
    const at = show(<Post stopNumber={3} minutes={10} />);

    expect(find(at, 'svg', SVGElement).getAttribute('aria-label')).toBe('Garden 3, 10 minutes from the last');
    expect([...at.querySelectorAll('text')].map((each) => each.textContent)).toEqual(['3', '10']);
  });

  it('are left to the words beside them when those say the number already', () => {
    expect(find(show(<Post stopNumber={3} label={null} />), 'svg', SVGElement).getAttribute('aria-hidden')).toBe('true');
  });

  it('are told apart without colour: the second seven are woven', () => {
    const strokes = stops.map((each) => find(show(<NipCard stopNumber={each} />), 'svg', SVGElement).querySelectorAll('path').length);

    expect(strokes.slice(0, 7)).toEqual([2, 2, 2, 2, 2, 2, 2]);
    expect(strokes.slice(7)).toEqual([3, 3, 3, 3, 3, 3, 3]);
  });
});

describe('what grows in the margin', () => {
  it.each([['Mother-of-thyme', 'thyme'], ['Dwarf Alberta spruce', 'dwarf-spruce'], ['Blue star creeper', 'star-creeper'], ['iris', 'iris'], ['Unheard-of weed', 'seedling'], ['constructor', 'seedling']])(
    '%s is drawn as %s',
    (name, key) => {
      expect(plantKeyFor(name)).toBe(key);
      expect(plantDrawing(name).layers.length).toBeGreaterThan(0);
    },
  );

  it.each([[[6], 'garden 6'], [[4, 7], 'gardens 4 and 7'], [[1, 4, 7], 'gardens 1, 4 and 7']])('counts its gardens in words', (gardens, said) => {
    expect(numbered(gardens)).toBe(said);
  });
});

describe('a notice', () => {
  it.each([['danger', 'alert', 'It did not work.'], ['clear', 'status', 'Done.'], ['caution', 'status', 'Take care.']] as const)('of tone %s is announced as %s with its word', (tone, role, word) => {
    const at = show(<Notice tone={tone}>The bank did not answer.</Notice>);

    expect(find(at, `[role=${role}]`, HTMLDivElement).textContent).toBe(`${word}The bank did not answer.`);
  });
});
