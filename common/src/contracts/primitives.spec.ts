import { describe, expect, it } from 'vitest';
import { nonNegativeSchema, numberSchema, positiveSchema } from './primitives.js';
import { levelInputSchema } from './projects.js';

const said = (schema: { safeParse: (v: unknown) => { error?: { issues: { message: string }[] } | undefined } }, value: unknown) => schema.safeParse(value).error?.issues[0]?.message;

describe('numbers in the contracts', () => {
  it('say which limit was passed, not that a number is no number', () => {
    expect(said(positiveSchema.max(100), 900)).toBe('must be at most 100');
    expect(said(nonNegativeSchema.max(3), 9)).toBe('must be at most 3');
    expect(said(numberSchema.min(-200), -300)).toBe('must be at least -200');
    expect(said(numberSchema.lt(5), 5)).toBe('must be below 5');
    expect(said(levelInputSchema, { code: 'L1', name: 'First', elevationM: 5000, heightM: 3 })).toBe('must be at most 1000');
  });
  it('keep their own sentences for what is no number, and for zero', () => {
    for (const value of [null, undefined, 'ten', Number.NaN]) expect(said(positiveSchema, value)).toBe('must be a number');
    expect(said(positiveSchema.max(100), 0)).toBe('must be above 0');
    expect(said(nonNegativeSchema, -1)).toBe('must not be below 0');
  });
});
