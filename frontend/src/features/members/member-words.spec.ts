import { describe, expect, it } from 'vitest';
import { rowResult } from './member-words.js';

const row = { verdict: 'protected' as const, requiredThickness: 34, appliedThickness: 42, thicknessUnit: 'mm' as const, productName: 'Demo Spray M', sentence: 'Needs 34 mm of Demo Spray M; gets 42 mm with its zone' };

describe('the result in a row of the list', () => {
  it('says what the member needs and what its zone gives, in one line', () => expect(rowResult(row)).toBe('34 mm Demo Spray M · zone gives 42 mm'));
  it('leaves out a zone that gives no more', () => {
    expect(rowResult({ ...row, appliedThickness: 34 })).toBe('34 mm Demo Spray M');
    expect(rowResult({ ...row, appliedThickness: null })).toBe('34 mm Demo Spray M');
  });
  it('keeps the sentence of every other result', () => {
    expect(rowResult({ ...row, verdict: 'outside', sentence: 'Outside the assessment: A/V 342 is above 300' })).toBe('Outside the assessment: A/V 342 is above 300');
    expect(rowResult({ ...row, requiredThickness: null, sentence: 'Not determined: no thickness was stored' })).toBe('Not determined: no thickness was stored');
  });
});
