import { describe, expect, it } from 'vitest';
import { count, formatLevel, formatNumber, joinWords, keepUnits } from './format.js';

describe('formatting', () => {
  it('sets numbers with fixed decimals and a thin space', () => {
    expect(formatNumber(12345.678, 1)).toBe('12\u202f345.7');
    expect(formatNumber(-4.5, 1)).toBe('\u22124.5');
    expect(formatNumber('1234567.10', 2)).toBe('1\u202f234\u202f567.10');
  });
  it('never turns a missing number into zero', () => {
    expect(formatNumber(null)).toBe('–');
    expect(formatNumber(Number.NaN)).toBe('–');
    expect(formatNumber(undefined, 2)).toBe('–');
  });
  it('writes level marks with a sign and three decimals', () => {
    expect([4.2, -4.5, 0].map(formatLevel)).toEqual(['+4.200', '\u22124.500', '±0.000']);
  });
  it('joins words, counts, and keeps units by their numbers', () => {
    expect(joinWords(['a', 'b', 'c'])).toBe('a, b and c');
    expect([count(1, 'member'), count(2, 'member')]).toEqual(['1 member', '2 members']);
    expect(keepUnits('2 columns rest on 550 °C in 30 minutes')).toBe('2 columns rest on 550\u00a0°C in 30 minutes');
  });
});
