import { describe, expect, it } from 'vitest';
import { stepFrom } from './elevation-steps.js';

const box = (id: string, x: number, y: number, width: number) => ({ zone: { id }, x, y, width, height: 10 });
/**      d
 *   b   |   c
 *       a        */
const boxes = [box('a', 0, 20, 100), box('b', 0, 10, 40), box('c', 40, 10, 60), box('d', 60, 0, 20)];

describe('stepFrom', () => {
  it.each([
    ['a', 'ArrowUp', 'c'], ['b', 'ArrowRight', 'c'], ['c', 'ArrowLeft', 'b'], ['c', 'ArrowUp', 'd'], ['d', 'ArrowDown', 'c'], ['b', 'ArrowDown', 'a'],
    ['c', 'Home', 'b'], ['b', 'End', 'c'], ['b', 'ArrowLeft', null], ['d', 'ArrowUp', null], ['a', 'Enter', null],
  ])('from %s by %s to %s', (from, key, to) => expect(stepFrom(boxes, from, key)).toBe(to));
  it('starts where the zone is gone, and nowhere where there is none', () => {
    expect(stepFrom(boxes, 'gone', 'ArrowUp')).toBe('a');
    expect(stepFrom([], 'gone', 'ArrowUp')).toBeNull();
  });
});
