import { describe, expect, it } from 'vitest';
import { suggestRevisionCode } from './revisions.js';

describe('the next revision code', () => {
  it.each([
    [[], 'P01'],
    [['P01'], 'P02'],
    [['P09', 'P01'], 'P10'],
    [['C1', 'C2'], 'C3'],
    [['P02', 'for tender'], 'P03'],
    [['A', 'B'], 'P01'],
  ])('after %j comes %s', (codes, next) => expect(suggestRevisionCode(codes)).toBe(next));
});
