import { sentence } from '@mantlet/common';
import type { Evidence, ReadingRules, RegressionFit, ThermalProperties, ThicknessTable } from '@mantlet/common';
import fc from 'fast-check';
import type { AssessedProduct, ThicknessRequest } from '../../types.js';
import { periodReached } from '../../methods/as-built.js';
import { requiredThickness } from '../../methods/required-thickness.js';
import { verdictOfReason } from './coverage.js';

/*
 * The data here are invented. What is checked is the reading: the rules of reading are those of engineering practice with assessment
 * reports (common practice), and expected values follow from the tables by arithmetic shown beside them.
 */
const table = (periodMin: 30 | 60 | 90, add: number): ThicknessTable => ({
  shape: 'open', orientation: 'beam', periodMin, temperaturesC: [450, 500, 550], sectionFactorsPerM: [100, 200, 300],
  thickness: [[300 + add, 250 + add, 200 + add], [500 + add, 430 + add, 360 + add], [null, 800 + add, 700 + add]],
});
const coating: AssessedProduct = { kind: 'coating', curves: ['standard'], evidence: { form: 'table', tables: [table(60, 400), table(30, 0)] } };
const request: ThicknessRequest = { group: 'open', orientation: 'beam', periodMin: 30, curve: { kind: 'standard' }, criticalTemperatureC: 520, sectionFactorPerM: 150 };
const rules: ReadingRules = { sectionFactor: 'linear', temperature: 'next-below' };

function read(change: Partial<ThicknessRequest> = {}, reading: Partial<ReadingRules> = {}, product = coating) {
  return requiredThickness(product, { ...request, ...change }, { ...rules, ...reading });
}
function thickness(...args: Parameters<typeof read>): number {
  const r = read(...args);
  if (!r.ok) throw new Error(sentence(r.reason));
  return r.value.thickness;
}
function refusal(...args: Parameters<typeof read>): { verdict: string; says: string } {
  const r = read(...args);
  if (r.ok) throw new Error(`read ${r.value.thickness}`);
  return { verdict: verdictOfReason(r.reason.code), says: sentence(r.reason) };
}

describe('thickness tables', () => {
  it('reads A/V linearly and the temperature at or below: (250 + 430)/2', () => expect(thickness()).toBe(340));
  it('reads the next row up where the project says so', () => expect(thickness({}, { sectionFactor: 'next-row-up' })).toBe(430));
  it('interpolates temperature only where the project says so: 340 − 0.4·(340 − 280)', () => expect(thickness({}, { temperature: 'linear' })).toBe(316));
  it('takes a row or column it meets exactly', () => {
    for (const sectionFactor of ['linear', 'next-row-up'] as const) expect(thickness({ sectionFactorPerM: 200, criticalTemperatureC: 550 }, { sectionFactor, temperature: 'linear' })).toBe(360);
  });
  it('rounds film up to the next whole µm: 250 + 0.335·180 = 310.3', () => expect(thickness({ sectionFactorPerM: 133.5 })).toBe(311));
  it('uses the tabulated period at or above', () => expect(thickness({ periodMin: 45 })).toBe(740));
  it('uses the first row below it and the greatest temperature above it', () => {
    expect(thickness({ sectionFactorPerM: 20 })).toBe(250);
    expect(thickness({ criticalTemperatureC: 700, sectionFactorPerM: 100 })).toBe(200);
  });
  it('says where the value was read', () => {
    const r = read();
    expect(r.ok && r.value.reading).toBe('R 30, 500 °C, A/V 100 to 200, open section, beam');
  });
  it('does not interpolate boards: what lies between two cannot be bought', () => {
    expect(thickness({}, { temperature: 'linear' }, { ...coating, kind: 'board' })).toBe(430);
  });

  it.each<[string, Parameters<typeof read>, RegExp]>([
    ['A/V above the last row', [{ sectionFactorPerM: 342 }], /A\/V 342 is above 300/],
    ['A/V a little above the last row', [{ sectionFactorPerM: 300.3 }], /A\/V 300\.3 is above 300\.0/],
    ['temperature below the lowest', [{ criticalTemperatureC: 440 }], /440 °C is below 450 °C/],
    ['period above the greatest', [{ periodMin: 90 }], /R 90 is above R 60/],
    ['an empty cell', [{ criticalTemperatureC: 460, sectionFactorPerM: 300 }], /no thickness is given at A\/V 300/],
    ['between a cell and an empty one', [{ criticalTemperatureC: 460, sectionFactorPerM: 250 }], /no thickness is given/],
    ['another shape', [{ group: 'hollow-circular' }], /circular hollow sections as beams/],
    ['another orientation', [{ orientation: 'column' }], /open sections as columns/],
    ['solid sections', [{ group: 'solid' }], /no data for solid sections/],
    ['a curve not covered', [{ curve: { kind: 'hydrocarbon' } }], /covers Standard fire, not Hydrocarbon fire/],
    ['a natural fire', [{ curve: { kind: 'parametric', openingFactor: 0.05, thermalAbsorptivity: 1000, fireLoadTotalMjPerM2: 200, limitTimeMin: 20 } }], /not Parametric fire/],
  ])('refuses %s as outside the assessment', (_, args, says) => {
    const r = refusal(...args);
    expect(r.verdict).toBe('outside');
    expect(r.says).toMatch(says);
  });

  it('never asks less for more A/V, a longer period or a lower temperature', () => {
    const axis = { s: fc.double({ min: 50, max: 300, noNaN: true }), t: fc.double({ min: 500, max: 700, noNaN: true }) };
    fc.assert(fc.property(axis.s, axis.s, axis.t, axis.t, fc.constantFrom('linear', 'next-row-up' as const), fc.constantFrom('linear', 'next-below' as const), (s1, s2, t1, t2, sectionFactor, temperature) => {
      const reading = { sectionFactor, temperature } as ReadingRules;
      const low = thickness({ sectionFactorPerM: Math.min(s1, s2), criticalTemperatureC: Math.max(t1, t2) }, reading);
      const high = thickness({ sectionFactorPerM: Math.max(s1, s2), criticalTemperatureC: Math.min(t1, t2) }, reading);
      expect(high).toBeGreaterThanOrEqual(low);
      expect(thickness({ sectionFactorPerM: s1, criticalTemperatureC: t1, periodMin: 60 }, reading)).toBeGreaterThan(thickness({ sectionFactorPerM: s1, criticalTemperatureC: t1 }, reading));
    }));
  });
});

const fit: RegressionFit = {
  shape: 'open', orientation: 'beam', coefficients: [5, 0.01, 4, 0.01, 0.00002, 0.001, 0.1, 200],
  minThickness: 250, maxThickness: 2000, minSectionFactorPerM: 60, maxSectionFactorPerM: 300, minTemperatureC: 400, maxTemperatureC: 700, minPeriodMin: 15, maxPeriodMin: 60,
};
const byFit = (change: Partial<RegressionFit> = {}): AssessedProduct => ({ ...coating, evidence: { form: 'regression', fits: [{ ...fit, ...change }] } });

describe('regression', () => {
  // t = 5 + d·(0.01 + 4/150 + 0.00002·550 + 0.001·550/150) + 5.5 + 0.1·550/150 + 200/150 = 12.2 + 0.0513333·d; d = (60 − 12.2)/0.0513333 = 931.17
  it('solves the printed equation for the thickness and rounds up', () => expect(thickness({ periodMin: 60, criticalTemperatureC: 550 }, {}, byFit())).toBe(932));
  it('never goes below the least tested thickness', () => expect(thickness({ periodMin: 15, criticalTemperatureC: 700, sectionFactorPerM: 60 }, {}, byFit())).toBe(250));
  it('is not extrapolated below the tested A/V or above the tested temperature', () => {
    expect(thickness({ periodMin: 60, sectionFactorPerM: 20 }, {}, byFit())).toBe(thickness({ periodMin: 60, sectionFactorPerM: 60 }, {}, byFit()));
    expect(thickness({ periodMin: 60, criticalTemperatureC: 900 }, {}, byFit())).toBe(thickness({ periodMin: 60, criticalTemperatureC: 700 }, {}, byFit()));
  });
  it.each<[string, Partial<ThicknessRequest>, Partial<RegressionFit>, string, RegExp]>([
    ['thickness', { periodMin: 60, criticalTemperatureC: 550 }, { maxThickness: 900 }, 'outside', /greatest assessed thickness, 900 µm/],
    ['A/V', { sectionFactorPerM: 301 }, {}, 'outside', /301 is above 300/],
    ['temperature', { criticalTemperatureC: 399 }, {}, 'outside', /399 °C is below 400 °C/],
    ['period', { periodMin: 90 }, {}, 'outside', /R 90 is above R 60/],
    ['an equation without a solution', {}, { coefficients: [5, -1, 0, 0, 0, 0, 0, 0] }, 'not-determined', /gives no thickness/],
  ])('refuses %s', (_, change, fitChange, verdict, says) => {
    const r = refusal(change, {}, byFit(fitChange));
    expect(r.verdict).toBe(verdict);
    expect(r.says).toMatch(says);
  });
});

const board: ThermalProperties = {
  conductivityWPerMK: 0.2, densityKgPerM3: 800, specificHeatJPerKgK: 1700, moisturePercent: 0, minThicknessMm: 12, maxThicknessMm: 60, maxSectionFactorPerM: 350,
  minSectionFactorPerM: 30, maxTemperatureC: 750, maxPeriodMin: 120, stockThicknessesMm: [12, 15, 20, 25], maxLayers: 2, thicknessStepMm: 1,
};
const byProperties = (change: Partial<ThermalProperties> = {}, kind: AssessedProduct['kind'] = 'board'): AssessedProduct =>
  ({ kind, curves: ['standard'], evidence: { form: 'thermal', properties: { ...board, ...change } } satisfies Evidence });

describe('thermal properties', () => {
  // (4.27) for λ 0.20, ρ 800, c 1700, A_p/V 150, 20 mm, standard fire: 260 °C at 30 min, 484 °C at 60, 639 °C at 90, 732 °C at 120 (computed twice over, ±2 K)
  it.each([[30, 260], [60, 484], [90, 639], [120, 732]])('takes 20 mm for %i min just above %i °C and more just below', (periodMin, temperatureC) => {
    const only20 = byProperties({ stockThicknessesMm: [15, 20, 25], maxLayers: 1 });
    expect(thickness({ periodMin, criticalTemperatureC: temperatureC + 3 }, {}, only20)).toBe(20);
    expect(thickness({ periodMin, criticalTemperatureC: temperatureC - 3 }, {}, only20)).toBe(25);
  });
  it('stacks layers to the smallest total that is enough', () => {
    const r = read({ periodMin: 90, criticalTemperatureC: 550 }, {}, byProperties());
    expect(r.ok && r.value).toMatchObject({ thickness: 25, layers: [25] });
    const thicker = read({ periodMin: 120, criticalTemperatureC: 550 }, {}, byProperties());
    expect(thicker.ok && thicker.value.layers?.length).toBe(2);
    expect(thicker.ok && thicker.value.layers?.reduce((a, b) => a + b)).toBe(thicker.ok && thicker.value.thickness);
  });
  it('steps a spray', () => {
    const spray = byProperties({ stockThicknessesMm: [], thicknessStepMm: 5, minThicknessMm: 12 }, 'spray');
    expect(thickness({ periodMin: 60, criticalTemperatureC: 487 }, {}, spray)).toBe(20);
    expect(thickness({ periodMin: 60, criticalTemperatureC: 481 }, {}, spray)).toBe(25);
  });
  it('credits moisture with the dwell at 100 °C only', () => {
    const steps = { stockThicknessesMm: [], thicknessStepMm: 0.1 };
    const dry = thickness({ periodMin: 60, criticalTemperatureC: 484 }, {}, byProperties(steps, 'spray'));
    expect(thickness({ periodMin: 60, criticalTemperatureC: 484 }, {}, byProperties({ ...steps, moisturePercent: 5 }, 'spray'))).toBeLessThan(dry);
  });
  it.each<[string, Partial<ThicknessRequest>, AssessedProduct, string, RegExp]>([
    ['A/V', { sectionFactorPerM: 351 }, byProperties(), 'outside', /351 is above 350/],
    ['period', { periodMin: 180 }, byProperties(), 'outside', /R 180 is above R 120/],
    ['thickness', { periodMin: 120, criticalTemperatureC: 300 }, byProperties({ maxLayers: 1 }), 'outside', /25 mm, does not hold/],
    ['a coating', {}, byProperties({}, 'coating'), 'not-determined', /do not describe a coating/],
    ['no stock in range', {}, byProperties({ stockThicknessesMm: [8], maxLayers: 1 }), 'not-determined', /no stocked thickness/],
  ])('refuses %s', (_, change, product, verdict, says) => {
    const r = refusal(change, {}, product);
    expect(r.verdict).toBe(verdict);
    expect(r.says).toMatch(says);
  });
  it('serves a natural fire only where the assessment says so', () => {
    const natural = { curve: { kind: 'parametric' as const, openingFactor: 0.06, thermalAbsorptivity: 1200, fireLoadTotalMjPerM2: 200, limitTimeMin: 20 as const } };
    expect(refusal(natural, {}, byProperties()).verdict).toBe('outside');
    expect(thickness(natural, {}, byProperties({ coversNaturalFire: true }))).toBeGreaterThanOrEqual(12);
  });
});

describe('as-built check', () => {
  it('reads the period that a required thickness reaches back, whatever the form', () => {
    fc.assert(fc.property(fc.constantFrom(coating, byFit(), byProperties()), fc.constantFrom(30, 60), fc.double({ min: 40, max: 200, noNaN: true }), fc.double({ min: 500, max: 690, noNaN: true }), (product, periodMin, sectionFactorPerM, criticalTemperatureC) => {
      const asked = { ...request, periodMin, sectionFactorPerM, criticalTemperatureC };
      const needed = requiredThickness(product, asked, rules);
      if (!needed.ok) return;
      const reached = periodReached(product, asked, needed.value.thickness, rules);
      expect(reached.ok && reached.value.periodMin).toBeGreaterThanOrEqual(periodMin);
      const less = periodReached(product, asked, needed.value.thickness * 0.9, rules);
      if (less.ok) expect(less.value.periodMin ?? 0).toBeLessThanOrEqual((reached.ok && reached.value.periodMin) || 0);
    }), { numRuns: 60 });
  });
  it('says null below the shortest assessed period and stops at the longest', () => {
    expect(periodReached(coating, request, 339, rules)).toMatchObject({ ok: true, value: { periodMin: null, shortestAssessedMin: 30 } });
    expect(periodReached(coating, request, 340, rules)).toMatchObject({ ok: true, value: { periodMin: 30, limitedByAssessment: false } });
    expect(periodReached(coating, request, 9000, rules)).toMatchObject({ ok: true, value: { periodMin: 60, limitedByAssessment: true } });
  });
  it('refuses a thickness below what was tested', () => {
    const r = periodReached(byFit(), request, 100, rules);
    expect(!r.ok && sentence(r.reason)).toMatch(/100 µm is below the least assessed thickness, 250 µm/);
  });
});
