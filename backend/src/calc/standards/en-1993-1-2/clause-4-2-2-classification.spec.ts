import type { SectionShape } from '@mantlet/common';
import { yieldStrength } from '../en-1993-1-1/table-3-1.js';
import { fireEpsilonFormula, sectionClass } from './clause-4-2-2-classification.js';

/*
 * Expected classes follow from EN 1993-1-1 Table 5.2 with ε = 0.85·√(235/f_y): 0.786 for S275, 0.692 for S355; ratios beside each.
 */
const i = (hMm: number, bMm: number, twMm: number, tfMm: number, rootRadiusMm: number): SectionShape => ({ kind: 'i', hMm, bMm, twMm, tfMm, rootRadiusMm });
const he200a = i(190, 200, 6.5, 10, 18);
const ipe400 = i(400, 180, 8.6, 13.5, 21);

describe('section class in fire', () => {
  it('reduces ε by 0.85', () => {
    expect(fireEpsilonFormula.evaluate({ yieldStrengthMPa: 235 })).toBe(0.85);
  });

  it.each<[string, SectionShape, 'bending' | 'compression', number, number]>([
    ['HE 200 A, S355: flange 7.88 between 10ε = 6.92 and 14ε = 9.68', he200a, 'bending', 355, 3],
    ['HE 200 A, S235: flange 7.88 between 9ε = 7.65 and 10ε = 8.5', he200a, 'bending', 235, 2],
    ['IPE 400, S355, bending: web 38.5 below 72ε = 49.8', ipe400, 'bending', 355, 1],
    ['IPE 400, S355, compression: web 38.5 above 42ε = 29.0', ipe400, 'compression', 355, 4],
    ['IPE 400, S235, compression: web 38.5 above 42ε = 35.7', ipe400, 'compression', 235, 4],
    ['CHS 219.1 × 5, S355: 43.8 above 90ε² = 43.0', { kind: 'circular-hollow', dMm: 219.1, tMm: 5 }, 'compression', 355, 4],
    ['CHS 219.1 × 6.3, S355: 34.8 above 70ε² = 33.5', { kind: 'circular-hollow', dMm: 219.1, tMm: 6.3 }, 'compression', 355, 3],
    ['SHS 150 × 8, S275: (150 − 24)/8 = 15.8 below 33ε = 25.9', { kind: 'rectangular-hollow', hMm: 150, bMm: 150, tMm: 8, outerRadiusMm: 12, innerRadiusMm: 8 }, 'compression', 275, 1],
    ['SHS 300 × 6.3, S355: (300 − 18.9)/6.3 = 44.6 above 42ε = 29.0', { kind: 'rectangular-hollow', hMm: 300, bMm: 300, tMm: 6.3, outerRadiusMm: 9.45, innerRadiusMm: 6.3 }, 'bending', 355, 4],
    ['box: clear flange 400/25 = 16, web 450/15 = 30 below 42ε = 33.0', { kind: 'box', hMm: 500, bMm: 460, twMm: 15, tfMm: 25, clearWidthMm: 400 }, 'compression', 275, 3],
    ['L 100 × 100 × 12, S275: 8.33 below 15ε and 11.5ε = 9.04', { kind: 'angle', hMm: 100, bMm: 100, tMm: 12, rootRadiusMm: 12, toeRadiusMm: 6 }, 'compression', 275, 3],
    ['L 100 × 100 × 10, S275: 10 above 11.5ε = 9.04', { kind: 'angle', hMm: 100, bMm: 100, tMm: 10, rootRadiusMm: 12, toeRadiusMm: 6 }, 'compression', 275, 4],
    ['unequal I: web in bending below, never better than 3', { kind: 'i-unequal', hMm: 600, twMm: 10, topWidthMm: 200, topThicknessMm: 20, bottomWidthMm: 250, bottomThicknessMm: 25, rootRadiusMm: 0 }, 'bending', 275, 3],
    ['solid round', { kind: 'round', dMm: 60 }, 'compression', 355, 1],
  ])('%s', (_, shape, loading, fy, expected) => {
    expect(sectionClass(shape, loading, fy)).toEqual({ ok: true, value: expected });
  });

  it('refuses a flat', () => {
    expect(sectionClass({ kind: 'flat', hMm: 100, tMm: 10 }, 'bending', 355)).toMatchObject({ ok: false, reason: { code: 'assessment.shape-not-classified' } });
  });
});

describe('yield strength (EN 1993-1-1 Table 3.1)', () => {
  it.each([['S235', 20, 235], ['S235', 41, 215], ['S275', 40, 275], ['S275', 60, 255], ['S355', 40, 355], ['S355', 80, 335], ['S420', 50, 390], ['S460', 41, 430], ['A992', 30, 345]] as const)('%s at %d mm: %d MPa', (grade, thickness, expected) => {
    expect(yieldStrength(grade, thickness)).toEqual({ ok: true, value: expected });
  });
  it('is not determined above 80 mm or for an unknown grade', () => {
    expect(yieldStrength('S355', 90)).toMatchObject({ ok: false, reason: { code: 'assessment.too-thick-for-grade' } });
    expect(yieldStrength('S1000', 10)).toMatchObject({ ok: false, reason: { code: 'assessment.unknown-grade' } });
  });
});
