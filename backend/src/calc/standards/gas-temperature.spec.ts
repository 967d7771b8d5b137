import type { FireCurve } from '@mantlet/common';
import fc from 'fast-check';
import { parametricFire } from './en-1991-1-2/annex-a-parametric.js';
import type { ParametricCurve } from './en-1991-1-2/annex-a-parametric.js';
import { convectionCoefficient, gasTemperatureC, naturalFireDurationMin } from './gas-temperature.js';

const kinds = ['standard', 'external', 'hydrocarbon', 'slow-heating', 'astm-e119'] as const;
const parametric = (openingFactor: number, thermalAbsorptivity: number, fireLoadTotalMjPerM2: number, limitTimeMin: 15 | 20 | 25 = 20): ParametricCurve =>
  ({ kind: 'parametric', openingFactor, thermalAbsorptivity, fireLoadTotalMjPerM2, limitTimeMin });

describe('nominal curves', () => {
  it.each(kinds)('%s starts at 20 °C and never falls', (kind) => {
    expect(gasTemperatureC({ kind }, 0)).toBe(20);
    let before = 20;
    for (let minutes = 0.25; minutes <= 240; minutes += 0.25) {
      const now = gasTemperatureC({ kind }, minutes);
      expect(now).toBeGreaterThanOrEqual(before);
      before = now;
    }
    expect(naturalFireDurationMin({ kind })).toBeNull();
  });

  it('has the α_c of EN 1991-1-2 3.2 and 3.3.1.1(3)', () => {
    const of = (curve: FireCurve) => convectionCoefficient(curve);
    expect([...kinds.map((kind) => of({ kind })), of(parametric(0.05, 1200, 200))]).toEqual([25, 25, 50, 25, 25, 35]);
  });
});

describe('parametric fires (EN 1991-1-2 Annex A)', () => {
  it('is fuel controlled where the fuel burns out before t_lim, with O_lim and k', () => {
    // by hand from (A.8) to (A.10): O_lim = 0.018, k = 1 + 1.5·(−0.2)·0.13793 = 0.95862, Γ_lim = 0.2612, t* = 0.08707 h, θ_max = 570 °C
    const fire = parametricFire(parametric(0.1, 1000, 60));
    expect(fire.fuelControlled).toBe(true);
    expect(fire.maxTimeH).toBeCloseTo(20 / 60, 12);
    expect(fire.maxGasC).toBeCloseTo(570.4, 0);
    // k is 1 as soon as one of its three conditions fails
    const noK = parametricFire(parametric(0.1, 1160, 60));
    expect(noK.maxGasC).toBeCloseTo(20 + 1325 * (1 - 0.324 * Math.exp(-0.2 * 0.0675) - 0.204 * Math.exp(-1.7 * 0.0675) - 0.472 * Math.exp(-19 * 0.0675)), 6);
  });

  it('never lets k near zero or below put the fire out', () => {
    expect(1 + ((0.2 - 0.04) / 0.04) * ((50 - 75) / 75) * ((1160 - 100) / 1160)).toBeLessThan(0); // k as printed
    expect(parametricFire(parametric(0.2, 100, 50)).maxGasC).toBeGreaterThan(700);
  });

  it('peaks at t_max, cools steadily and is over when it says', () => {
    fc.assert(fc.property(
      fc.double({ min: 0.02, max: 0.2, noNaN: true }), fc.double({ min: 100, max: 2200, noNaN: true }), fc.double({ min: 50, max: 1000, noNaN: true }),
      (o, b, q) => {
        const curve = parametric(o, b, q);
        const fire = parametricFire(curve);
        const peakMin = fire.maxTimeH * 60;
        expect(gasTemperatureC(curve, peakMin)).toBeCloseTo(fire.maxGasC, 6);
        expect(gasTemperatureC(curve, peakMin * 0.8)).toBeLessThanOrEqual(fire.maxGasC); // long hot fires level off
        expect(gasTemperatureC(curve, peakMin + 1)).toBeLessThan(fire.maxGasC);
        const end = naturalFireDurationMin(curve)!;
        expect(gasTemperatureC(curve, end * 0.999)).toBeGreaterThan(20);
        expect(gasTemperatureC(curve, end * 1.001)).toBe(20);
      },
    ), { numRuns: 100 });
  });

  it('cools at 625, 250·(3 − t*_max) and 250 K per hour of t*', () => {
    const rate = (curve: ParametricCurve) => {
      const fire = parametricFire(curve);
      const start = fire.maxTimeH * 60;
      return ((gasTemperatureC(curve, start) - gasTemperatureC(curve, start + 0.6)) / 0.01) / fire.timeFactor;
    };
    // b = 1160 and O = 0.04 give Γ = 1, so t*_max = 0.005·q
    expect(rate(parametric(0.04, 1160, 90))).toBeCloseTo(625, 6);
    expect(rate(parametric(0.04, 1160, 200))).toBeCloseTo(500, 6);
    expect(rate(parametric(0.04, 1160, 500))).toBeCloseTo(250, 6);
  });
});
