import { defaultDesignBasis, memberDesignSchema, sentence } from '@mantlet/common';
import type { CriticalTemperatureBasis, SectionShape } from '@mantlet/common';
import fc from 'fast-check';
import { sectionProperties } from '../sections/index.js';
import type { CriticalTemperatureCase } from '../types.js';
import { leastBucklingShare } from './cold-resistance.js';
import { criticalTemperature, explainCriticalTemperature } from './critical-temperature.js';

/** dimensions of EN 10365 and EN 10210-2; beside each the imperfection factor about its weak axis by EN 1993-1-1 Tables 6.1 and 6.2 (memory) */
const shapes: [string, SectionShape, number][] = [
  ['IPE 300, curve b', { kind: 'i', hMm: 300, bMm: 150, twMm: 7.1, tfMm: 10.7, rootRadiusMm: 15 }, 0.34],
  ['HE 200 B, curve c', { kind: 'i', hMm: 200, bMm: 200, twMm: 9, tfMm: 15, rootRadiusMm: 18 }, 0.49],
  ['SHS 150 × 8, hot finished, curve a', { kind: 'rectangular-hollow', hMm: 150, bMm: 150, tMm: 8, outerRadiusMm: 12, innerRadiusMm: 8 }, 0.21],
];
const member = (basis: CriticalTemperatureBasis, shape: SectionShape, memberType: CriticalTemperatureCase['memberType'], yieldStrengthMPa = 275): CriticalTemperatureCase => ({
  basis, memberType, shape, properties: sectionProperties(shape), steel: { grade: `S${yieldStrengthMPa}`, yieldStrengthMPa },
  exposure: { arrangement: 'four-sides', reason: '' }, design: defaultDesignBasis, accepted: false,
});
const cold = (utilisation: number, etaFi: number, more: object = {}): CriticalTemperatureBasis => ({ way: 'ambient-utilisation', utilisation, etaFi, reference: 'test', ...more });

/** EN 1993-1-1 (6.49), written out here once more. */
function coldResistanceN(shape: SectionShape, lengthMm: number, alpha: number, fy: number): number {
  const { areaMm2, izMm4 } = sectionProperties(shape);
  const slenderness = (lengthMm / Math.PI) * Math.sqrt((areaMm2 * fy) / (210_000 * izMm4));
  const phi = 0.5 * (1 + alpha * (slenderness - 0.2) + slenderness ** 2);
  return Math.min(1, 1 / (phi + Math.sqrt(phi ** 2 - slenderness ** 2))) * areaMm2 * fy;
}

describe('a cold utilisation of a member that may buckle', () => {
  // by hand: λ̄ = 0.9, S355. Fire α = 0.65·√(235/355) = 0.5289, φ = 1.1430, χ_fi = 0.5411; cold a: α = 0.21, Φ = 0.9785, χ = 0.7339; 0.737
  it('loses at least what the fire curve takes at λ̄ = 0.9', () => {
    const least = leastBucklingShare((shapes[2] as (typeof shapes)[number])[1], 355);
    expect(least).toBeLessThanOrEqual(0.5411 / 0.7339 + 1e-4);
    expect(least).toBeGreaterThan(0.7);
  });

  it.each(shapes)('%s: is never read higher than the full calculation from the same load', (_, shape, alpha) => {
    fc.assert(fc.property(
      fc.double({ min: 0.2, max: 1, noNaN: true }), fc.double({ min: 0.3, max: 0.7, noNaN: true }), fc.double({ min: 500, max: 9000, noNaN: true }), fc.constantFrom(235, 275, 355),
      (utilisation, etaFi, lengthMm, fy) => {
        const axialKn = (utilisation * etaFi * coldResistanceN(shape, lengthMm, alpha, fy)) / 1e3;
        const design = memberDesignSchema.parse({ actions: { given: 'fire-effect', effect: { axialKn } }, bucklingLengthYMm: lengthMm, bucklingLengthZMm: lengthMm });
        const full = criticalTemperature(member({ way: 'calculated', design, reference: 'test' }, shape, 'column', fy));
        const read = criticalTemperature(member(cold(utilisation, etaFi), shape, 'column', fy));
        if (read.kind !== 'determined' || full.kind !== 'determined') return;
        expect(read.temperatureC).toBeLessThanOrEqual(full.temperatureC + 1e-6);
      },
    ), { numRuns: 150 });
  });

  it('is refused where the difference leaves no room', () => {
    const result = criticalTemperature(member(cold(1, 0.9), (shapes[2] as (typeof shapes)[number])[1], 'column'));
    expect(result.kind).toBe('not-determined');
    expect(result.kind !== 'determined' && sentence(result.reason)).toMatch(/η_fi times the cold utilisation is 0\.90/);
  });

  it('prints what it lost', () => {
    const c = member(cold(0.6, 0.65), (shapes[1] as (typeof shapes)[number])[1], 'column');
    const { result, working } = explainCriticalTemperature(c);
    expect(result).toEqual(criticalTemperature(c));
    const share = leastBucklingShare(c.shape, 275);
    expect(result).toMatchObject({ kind: 'determined', utilisation: (0.6 * 0.65) / share });
    expect(working.map((s) => s.value)).toContain(share);
  });
});

describe('a beam known by its utilisation', () => {
  const ipe = (shapes[0] as (typeof shapes)[number])[1];
  // flange c/t = 95/12 = 7.9: in S355 class 3 in fire (above 10·ε = 6.9), class 2 cold (above 9·ε = 7.3, below 10·ε = 8.1)
  const wide: SectionShape = { kind: 'i', hMm: 300, bMm: 220, twMm: 10, tfMm: 12, rootRadiusMm: 10 };
  it('in class 3 by the reduced ε has W_el of what was W_pl cold', () => {
    const { welYMm3, wplYMm3 } = sectionProperties(wide);
    expect(criticalTemperature(member(cold(0.8, 0.6), wide, 'beam', 355))).toMatchObject({ kind: 'determined', utilisation: (0.48 * wplYMm3) / welYMm3 });
    expect(criticalTemperature(member(cold(0.8, 0.6), ipe, 'beam', 355))).toMatchObject({ kind: 'determined', utilisation: 0.48 });
  });
  it('that may buckle is read from the smaller of k_y and k_E, and only from its utilisation in fire', () => {
    // k_E = 0.5 at 500 + 100·0.1/0.29 (Table 3.1)
    const result = criticalTemperature(member({ way: 'utilisation', mu0: 0.5, mayBuckle: true, reference: 'test' }, ipe, 'beam'));
    expect(result.kind === 'determined' && result.temperatureC).toBeCloseTo(500 + 10 / 0.29, 9);
    const refused = criticalTemperature(member(cold(0.8, 0.6, { mayBuckle: true }), ipe, 'beam'));
    expect(refused.kind !== 'determined' && sentence(refused.reason)).toMatch(/may buckle sideways/);
  });
});
