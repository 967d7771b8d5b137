import type { ThermalProperties } from '@mantlet/common';
import fc from 'fast-check';
import { stacksOf } from '../standards/en-13381/stacks.js';
import { protectedTemperature } from './heating.js';
import { heatingOf, leastThatHolds } from './thermal-thickness.js';
import { thermalRuns } from './thermal-run.js';

const base: ThermalProperties = {
  conductivityWPerMK: 0.2, densityKgPerM3: 800, specificHeatJPerKgK: 1700, moisturePercent: 0, minThicknessMm: 5, maxThicknessMm: 80, maxSectionFactorPerM: 400,
  minSectionFactorPerM: 20, maxTemperatureC: 800, maxPeriodMin: 240, stockThicknessesMm: [], maxLayers: 1, thicknessStepMm: 1,
};
const rising = [{ temperatureC: 50, value: 0.08 }, { temperatureC: 400, value: 0.12 }, { temperatureC: 900, value: 0.25 }];
const cases = {
  conductivity: fc.oneof(fc.double({ min: 0.05, max: 0.4, noNaN: true }), fc.constant(rising)),
  density: fc.double({ min: 150, max: 1200, noNaN: true }),
  moisture: fc.constantFrom(0, 3, 12),
  thickness: fc.double({ min: 5, max: 80, noNaN: true }),
  factor: fc.double({ min: 20, max: 400, noNaN: true }),
  period: fc.constantFrom(15, 30, 60, 90, 120, 240),
  curve: fc.constantFrom('standard', 'external', 'hydrocarbon', 'slow-heating', 'astm-e119' as const),
};

describe('thermal run', () => {
  it('is protectedTemperature to a billionth of a degree, to the end or to where it passes the limit', () => {
    fc.assert(fc.property(fc.record(cases), (c) => {
      const p = { ...base, conductivityWPerMK: c.conductivity, densityKgPerM3: c.density, moisturePercent: c.moisture };
      const curve = { kind: c.curve };
      const place = { properties: p, sectionFactorPerM: c.factor, temperatureC: 550 };
      const thicknesses: [number, number] = [c.thickness, c.thickness * 1.3];
      const steel = thicknesses.map((t) => protectedTemperature({ ...heatingOf(place, curve, t), minutes: c.period }));
      thermalRuns(p, c.factor, curve, c.period, thicknesses, 2000).forEach((run, i) => {
        expect(Math.abs(run.steelC - (steel[i] ?? 0))).toBeLessThan(1e-9);
        expect(run.shareOfPeriod).toBe(1);
      });
      const [thinner, thicker] = thermalRuns(p, c.factor, curve, c.period, thicknesses, 550);
      expect(thicker.steelC > 550).toBe((steel[1] ?? 0) > 550);
      expect(thicker.shareOfPeriod < 1).toBe(thicker.steelC > 550);
      if (thicker.steelC <= 550) expect(thinner.steelC > 550).toBe((steel[0] ?? 0) > 550);
    }), { numRuns: 120 });
  });

  it('finds the same thickness from any first guess as trying each in turn', () => {
    fc.assert(fc.property(fc.record(cases), fc.double({ min: 300, max: 750, noNaN: true }), fc.integer({ min: 0, max: 200 }), (c, temperatureC, guess) => {
      const p = { ...base, conductivityWPerMK: c.conductivity, densityKgPerM3: c.density, moisturePercent: c.moisture };
      const place = { properties: p, sectionFactorPerM: c.factor, temperatureC };
      const curve = { kind: c.curve };
      const stacks = stacksOf(p, 'spray');
      const inTurn = stacks.findIndex((s) => protectedTemperature({ ...heatingOf(place, curve, s.thicknessMm), minutes: c.period }) <= temperatureC);
      expect(leastThatHolds(stacks, place, curve, c.period, guess)).toBe(inTurn === -1 ? stacks.length : inTurn);
    }), { numRuns: 60 });
  });
});
