import { describe, expect, test } from 'vitest';
import { dialPiece, handsAt } from '@/lib/gate/rules/dial';

const centre = { x: 0, y: 0 };
const at = (hours: number, minutes: number) => hours * 60 + minutes;

describe('the clock on the gate', () => {
  test.each([
    [at(12, 0), '0.0 -62.0', '0.0 -98.0'],
    [at(3, 0), '62.0 0.0', '0.0 -98.0'],
    [at(9, 30), '-59.9 -16.0', '0.0 98.0'],
    [at(21, 30), '-59.9 -16.0', '0.0 98.0'],
  ])('at minute %i of the day the hands point right', (minutes, hour, minute) => {
    const plain = (text: string) => text.replace(/-0\.0/g, '0.0');
    const hands = handsAt(minutes, centre, 100);

    expect([plain(hands.hour), plain(hands.minute)]).toEqual([hour, minute]);
  });

  test('a quarter of an hour still to wait is a quarter of the dial from the minute hand on', () => {
    expect(dialPiece(at(11, 15), 15, centre, 100)).toBe('M0 0L100.0 -0.0A100 100 0 0 1 0.0 100.0Z');
  });

  test('more than half an hour takes the long way round', () => {
    expect(dialPiece(at(11, 0), 45, centre, 100)).toContain('0 1 1');
  });

  test('an hour or more is the whole dial, and no wait is no piece', () => {
    expect(dialPiece(at(11, 0), 60, centre, 100)).toBe(dialPiece(at(8, 20), 300, centre, 100));
    expect(dialPiece(at(11, 0), 0, centre, 100)).toBeNull();
    expect(dialPiece(at(11, 0), -5, centre, 100)).toBeNull();
  });
});
