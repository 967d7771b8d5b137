import type { FireCurve } from '@mantlet/common';
import fc from 'fast-check';
import { gasTemperatureC, naturalFireDurationMin } from '../standards/gas-temperature.js';
import { bareField } from './heating-field.js';
import { bareMinutes, protectedHistory, protectedMinutes, protectedTemperature, unprotectedHistory, unprotectedPeak, unprotectedTemperature } from './heating.js';

const standard: FireCurve = { kind: 'standard' };
const bare = { shadowFactor: 1, curve: standard, emissivity: 0.7 };
const board = { conductivityWPerMK: 0.2, densityKgPerM3: 800, specificHeatJPerKgK: 1700, moisturePercent: 0, thicknessMm: 20, sectionFactorPerM: 150, curve: standard };
const natural: FireCurve = { kind: 'parametric', openingFactor: 0.06, thermalAbsorptivity: 1200, fireLoadTotalMjPerM2: 150, limitTimeMin: 20 };

describe('unprotected steel', () => {
  it('reads A_m/V below 10 1/m as 10 (4.2.5.1(3))', () => {
    const at = (sectionFactorPerM: number) => unprotectedTemperature({ ...bare, sectionFactorPerM, minutes: 60 });
    expect(at(3)).toBe(at(10));
    expect(at(12)).toBeGreaterThan(at(10));
  });

  it('refuses a step above 5 s, and 30 s for protected steel', () => {
    expect(() => unprotectedTemperature({ ...bare, sectionFactorPerM: 100, minutes: 30, stepS: 6 })).toThrow('5 s');
    expect(() => protectedTemperature({ ...board, minutes: 30, stepS: 31 })).toThrow('30 s');
    expect(() => protectedTemperature({ ...board, thicknessMm: 0, minutes: 30 })).toThrow('thickness');
  });

  it('stays below the gas and rises with the section factor', () => {
    fc.assert(fc.property(fc.double({ min: 10, max: 600, noNaN: true }), fc.double({ min: 1, max: 240, noNaN: true }), (sectionFactorPerM, minutes) => {
      const low = unprotectedTemperature({ ...bare, sectionFactorPerM, minutes });
      const high = unprotectedTemperature({ ...bare, sectionFactorPerM: sectionFactorPerM * 1.1, minutes });
      expect(low).toBeLessThan(gasTemperatureC(standard, minutes));
      expect(high).toBeGreaterThan(low);
    }), { numRuns: 60 });
  });

  it('gives the time of a temperature as the inverse of the temperature at a time', () => {
    for (const targetC of [350, 550, 620, 735, 800]) {
      const minutes = bareMinutes({ ...bare, sectionFactorPerM: 130, targetC })!;
      expect(unprotectedTemperature({ ...bare, sectionFactorPerM: 130, minutes })).toBeCloseTo(targetC, 6);
    }
    expect(bareMinutes({ ...bare, sectionFactorPerM: 130, targetC: 1190 })).toBeNull();
  });

  it('samples the history it computes', () => {
    const history = unprotectedHistory({ ...bare, sectionFactorPerM: 130, minutes: 30 });
    expect(history).toHaveLength(31);
    expect(history[15]!.temperatureC).toBe(unprotectedTemperature({ ...bare, sectionFactorPerM: 130, minutes: 15 }));
  });

  it('judges a natural fire on its peak, reached after the gas has begun to cool', () => {
    const peak = unprotectedPeak({ ...bare, curve: natural, sectionFactorPerM: 80 });
    const history = unprotectedHistory({ ...bare, curve: natural, sectionFactorPerM: 80, minutes: naturalFireDurationMin(natural)!, everyMin: 0.5 });
    const highest = history.reduce((a, b) => (b.temperatureC > a.temperatureC ? b : a));
    expect(Math.abs(highest.temperatureC - peak.temperatureC)).toBeLessThan(0.5);
    expect(unprotectedTemperature({ ...bare, curve: natural, sectionFactorPerM: 80, minutes: 1 })).toBe(peak.temperatureC);
    // at its peak steel is exactly as hot as the gas, which then is cooler: no net flux
    expect(Math.abs(gasTemperatureC(natural, peak.minutes) - peak.temperatureC)).toBeLessThan(2);
    expect(history.at(-1)!.temperatureC).toBeLessThan(peak.temperatureC);
  });
});

describe('field of bare histories', () => {
  it.each(['standard', 'external', 'hydrocarbon', 'slow-heating', 'astm-e119'] as const)('stays within 0.5 K of the member integrated alone at 1 s: %s', (kind) => {
    const field = bareField(kind, 0.7);
    let worst = 0;
    fc.assert(fc.property(fc.double({ min: 10, max: 700, noNaN: true }), fc.double({ min: 0.55, max: 1, noNaN: true }), fc.double({ min: 0.1, max: 240, noNaN: true }), (sectionFactorPerM, shadowFactor, minutes) => {
      const alone = unprotectedTemperature({ sectionFactorPerM, shadowFactor, minutes, curve: { kind }, emissivity: 0.7, stepS: 1 });
      const read = field.temperatureC(sectionFactorPerM, shadowFactor, minutes);
      worst = Math.max(worst, Math.abs(read - alone));
      const back = field.minutesTo(sectionFactorPerM, shadowFactor, read);
      expect(Math.abs(field.temperatureC(sectionFactorPerM, shadowFactor, back!) - read)).toBeLessThan(1e-3);
    }), { numRuns: 150 });
    expect(worst).toBeGreaterThan(0);
    expect(worst).toBeLessThan(0.5);
  });

  it('says when a temperature is not reached, and falls back on integration beyond its rows', () => {
    const field = bareField('standard', 0.7);
    expect(field.minutesTo(100, 1, 1190)).toBeNull();
    expect(field.temperatureC(2000, 1, 20)).toBe(unprotectedTemperature({ ...bare, sectionFactorPerM: 2000, minutes: 20, stepS: 1 }));
  });
});

describe('protected steel', () => {
  it('falls with thickness and rises with conductivity and section factor', () => {
    const at = (change: Partial<typeof board>) => protectedTemperature({ ...board, ...change, minutes: 60 });
    const base = at({});
    expect(at({ thicknessMm: 25 })).toBeLessThan(base);
    expect(at({ conductivityWPerMK: 0.25 })).toBeGreaterThan(base);
    expect(at({ sectionFactorPerM: 200 })).toBeGreaterThan(base);
  });

  it('never falls while the gas rises', () => {
    const history = protectedHistory({ ...board, densityKgPerM3: 2000, thicknessMm: 60, minutes: 120, everyMin: 0.5 });
    for (let i = 1; i < history.length; i += 1) expect(history[i]!.temperatureC).toBeGreaterThanOrEqual(history[i - 1]!.temperatureC);
  });

  it('holds at 100 °C for p·ρ·d²/(5·λ) minutes', () => {
    // 4 % · 800 kg/m³ · (0.02 m)² / (5 · 0.2 W/mK) = 1.28 min
    const wet = { ...board, moisturePercent: 4, stepS: 1 };
    const dry = { ...board, stepS: 1 };
    const passes = (h: typeof wet, targetC: number) => protectedMinutes({ ...h, targetC })!;
    const stay = passes(wet, 100.001) - passes(wet, 99.999);
    expect(Math.abs(stay - 1.28)).toBeLessThan(1 / 60); // one step
    expect(passes(wet, 99)).toBe(passes(dry, 99));
    expect(passes(wet, 500)).toBeGreaterThan(passes(dry, 500));
  });

  it('reads conductivity by temperature: a flat table is the constant', () => {
    const flat = [{ temperatureC: 20, value: 0.2 }, { temperatureC: 1000, value: 0.2 }];
    const rising = [{ temperatureC: 20, value: 0.2 }, { temperatureC: 1000, value: 0.3 }];
    expect(protectedTemperature({ ...board, conductivityWPerMK: flat, minutes: 90 })).toBeCloseTo(protectedTemperature({ ...board, minutes: 90 }), 9);
    expect(protectedTemperature({ ...board, conductivityWPerMK: rising, minutes: 90 })).toBeGreaterThan(protectedTemperature({ ...board, minutes: 90 }));
  });

  it('gives the time of a temperature as the inverse, and the peak of a natural fire', () => {
    const minutes = protectedMinutes({ ...board, targetC: 550 })!;
    expect(protectedTemperature({ ...board, minutes })).toBeCloseTo(550, 6);
    const peak = protectedTemperature({ ...board, curve: natural, minutes: 30 });
    const history = protectedHistory({ ...board, curve: natural, minutes: naturalFireDurationMin(natural)!, everyMin: 0.5 });
    expect(peak).toBeCloseTo(Math.max(...history.map((s) => s.temperatureC)), 6);
  });
});
