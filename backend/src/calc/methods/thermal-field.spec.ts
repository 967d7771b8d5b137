import type { FireCurve, ThermalProperties } from '@mantlet/common';
import fc from 'fast-check';
import { stacksOf } from '../standards/en-13381/stacks.js';
import { protectedTemperature } from './heating.js';
import { thermalField } from './thermal-field.js';
import { heatingOf, leastIndex, leastThatHolds } from './thermal-thickness.js';

/** Materials invented to reach from the lightest spray to the densest board, wet and dry. */
const rising = [{ temperatureC: 50, value: 0.08 }, { temperatureC: 400, value: 0.12 }, { temperatureC: 900, value: 0.25 }];
const steep = [{ temperatureC: 20, value: 0.1 }, { temperatureC: 300, value: 0.1 }, { temperatureC: 310, value: 0.3 }, { temperatureC: 900, value: 0.35 }];
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const material: fc.Arbitrary<ThermalProperties> = fc.record({
  conductivityWPerMK: fc.oneof(between(0.03, 0.5), fc.constantFrom(rising, steep)),
  densityKgPerM3: between(100, 2000), specificHeatJPerKgK: between(600, 2000), moisturePercent: fc.constantFrom(0, 3, 12, 30),
  minThicknessMm: fc.constantFrom(5, 10), maxThicknessMm: fc.constantFrom(50, 100), minSectionFactorPerM: fc.constantFrom(15, 40), maxSectionFactorPerM: fc.constantFrom(300, 600),
  maxTemperatureC: fc.constant(1200), maxPeriodMin: fc.constant(240),
  stockThicknessesMm: fc.constantFrom([], [12, 15, 20, 25, 30]), maxLayers: fc.constant(3), thicknessStepMm: fc.constantFrom(1, 2.5),
});
const curve: fc.Arbitrary<FireCurve> = fc.constantFrom('standard', 'external', 'hydrocarbon').map((kind) => ({ kind }) as FireCurve);
const period = fc.constantFrom(15, 30, 45, 60, 75, 90, 120, 180, 240);
/** Several members of one material: the field is filled by one and read by the next, in any order of periods. */
const members = fc.array(fc.record({ share: between(0, 1), periodMin: period, temperatureC: between(100, 900) }), { minLength: 40, maxLength: 40 });
const factorOf = (p: ThermalProperties, share: number) => p.minSectionFactorPerM + (p.maxSectionFactorPerM - p.minSectionFactorPerM) * share;

describe('field of protected steel', () => {
  it('gives the thickness of the direct search, for thousands of members of any material', () => {
    let read = 0;
    let asked = 0;
    fc.assert(fc.property(material, curve, members, (p, fire, all) => {
      const stacks = stacksOf(p, 'spray');
      for (const m of all) {
        const place = { properties: p, sectionFactorPerM: factorOf(p, m.share), temperatureC: m.temperatureC };
        expect(leastIndex(stacks, place, fire, m.periodMin)).toBe(leastThatHolds(stacks, place, fire, m.periodMin, stacks.length >> 1));
        asked += 1;
        if (thermalField(p, stacks, fire)?.leastThatHolds(place.sectionFactorPerM, m.periodMin, m.temperatureC)?.certain) read += 1;
      }
    }), { numRuns: 75 });
    // the comparison says something only where the field decides
    expect(asked).toBe(3000);
    expect(read).toBeGreaterThan(asked / 3);
  });

  it('reads within the doubt it states of a direct run, where a limit may lie', () => {
    let compared = 0;
    let worst = 0;
    fc.assert(fc.property(material, curve, members, fc.integer({ min: 0, max: 1000 }), (p, fire, all, pick) => {
      const stacks = stacksOf(p, 'spray');
      const index = pick % stacks.length;
      const field = thermalField(p, stacks, fire);
      for (const m of all) {
        const sectionFactorPerM = factorOf(p, m.share);
        const place = { properties: p, sectionFactorPerM, temperatureC: 1200 };
        const alone = protectedTemperature({ ...heatingOf(place, fire, stacks[index]!.thicknessMm), minutes: m.periodMin });
        if (alone < 150 || alone > 730) continue;
        const { temperatureC, doubtK } = field!.temperature(sectionFactorPerM, m.periodMin, index)!;
        compared += 1;
        worst = Math.max(worst, Math.abs(temperatureC - alone) / doubtK);
      }
    }), { numRuns: 75 });
    expect(compared).toBeGreaterThan(500);
    expect(worst).toBeGreaterThan(0);
    expect(worst).toBeLessThan(1);
  });

  it('leaves to the member’s own runs what it cannot read: kinked curves, natural fires, other periods, limits where steel lingers', () => {
    const p: ThermalProperties = {
      conductivityWPerMK: 0.2, densityKgPerM3: 800, specificHeatJPerKgK: 1700, moisturePercent: 3, minThicknessMm: 10, maxThicknessMm: 60, minSectionFactorPerM: 20, maxSectionFactorPerM: 400,
      maxTemperatureC: 800, maxPeriodMin: 240, stockThicknessesMm: [], maxLayers: 1, thicknessStepMm: 1,
    };
    const stacks = stacksOf(p, 'spray');
    for (const kind of ['astm-e119', 'slow-heating'] as const) expect(thermalField(p, stacks, { kind })).toBeNull();
    expect(thermalField(p, stacks, { kind: 'parametric', openingFactor: 0.06, thermalAbsorptivity: 1200, fireLoadTotalMjPerM2: 150, limitTimeMin: 20 })).toBeNull();
    const field = thermalField(p, stacks, { kind: 'standard' })!;
    expect([field.leastThatHolds(150, 50, 550), field.leastThatHolds(150, 255, 550), field.leastThatHolds(450, 60, 550)]).toEqual([null, null, null]);
    expect([field.leastThatHolds(150, 60, 110)?.certain, field.leastThatHolds(150, 60, 740)?.certain]).toEqual([false, false]);
    // at both ends of the assessed section factors it still reads
    for (const factor of [20, 400]) expect(field.leastThatHolds(factor, 60, 550)).not.toBeNull();
  });
});
