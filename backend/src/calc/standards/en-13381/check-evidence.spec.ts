import { sentence, thermalPropertiesSchema } from '@mantlet/common';
import type { RegressionFit, ThermalProperties, ThicknessTable } from '@mantlet/common';
import { checkEvidence } from './check-evidence.js';
import { stacksOf } from './stacks.js';

const good: ThicknessTable = {
  shape: 'open', orientation: 'beam', periodMin: 30, temperaturesC: [450, 550], sectionFactorsPerM: [100, 200], thickness: [[300, 200], [400, null]],
};
const said = (tables: ThicknessTable[]): string[] => checkEvidence({ form: 'table', tables }, 'coating').map(sentence);

describe('evidence on upload', () => {
  it('accepts tables that rise and fall as they must, empty cells included', () => {
    expect(said([good, { ...good, periodMin: 60, thickness: [[500, 400], [600, 500]] }])).toEqual([]);
  });

  it.each<[string, ThicknessTable[], RegExp]>([
    ['a missing row', [{ ...good, thickness: [[300, 200]] }], /1 rows of thickness for 2 section factors/],
    ['a short row', [{ ...good, thickness: [[300, 200], [400]] }], /row 2 \(A\/V 200\) has 1 values for 2 temperatures/],
    ['an axis that does not rise', [{ ...good, sectionFactorsPerM: [100, 100] }], /section factors must rise; value 2 does not/],
    ['temperatures that do not rise', [{ ...good, temperaturesC: [550, 450] }], /temperatures must rise/],
    ['nothing but empty cells', [{ ...good, thickness: [[null, null], [null, null]] }], /every cell is empty/],
    ['less for more A/V', [{ ...good, thickness: [[300, 200], [290, 200]] }], /falls from 300 at A\/V 100 to 290 at A\/V 200/],
    ['less for more A/V across an empty cell', [{ ...good, sectionFactorsPerM: [100, 200, 300], thickness: [[300, 200], [null, 250], [280, 260]] }], /falls from 300 at A\/V 100 to 280 at A\/V 300/],
    ['more for a higher temperature', [{ ...good, thickness: [[300, 310], [400, 380]] }], /rises from 300 at 450 °C to 310 at 550 °C/],
    ['less for a longer period', [good, { ...good, periodMin: 60, thickness: [[290, 200], [400, 300]] }], /290 is less than the 300 of Table R 30/],
    ['the same table twice', [good, good], /occurs twice/],
  ])('finds %s', (_, tables, expected) => {
    const faults = said(tables);
    expect(faults.length).toBeGreaterThan(0);
    expect(faults.join('\n')).toMatch(expected);
  });

  const fit: RegressionFit = {
    shape: 'open', orientation: 'beam', coefficients: [5, 0.01, 4, 0.01, 0.00002, 0.001, 0.1, 200],
    minThickness: 250, maxThickness: 2000, minSectionFactorPerM: 60, maxSectionFactorPerM: 300, minTemperatureC: 400, maxTemperatureC: 700, minPeriodMin: 15, maxPeriodMin: 60,
  };
  it('checks a regression over its whole range', () => {
    const faults = (change: Partial<RegressionFit>) => checkEvidence({ form: 'regression', fits: [{ ...fit, ...change }] }, 'coating').map(sentence);
    expect(faults({})).toEqual([]);
    expect(faults({ minThickness: 3000 })).toEqual(['Regression, open, beam: least thickness 3000 is above the greatest, 2000.']);
    // with a2 negative a heavier section needs more
    expect(faults({ coefficients: [5, 0.05, -1.5, 0, 0, 0, 0, 0] }).join()).toMatch(/less thickness at a greater A\/V/);
    expect(faults({ coefficients: [5, 0.01, 4, -0.03, 0, 0, 0, 0] }).join()).toMatch(/more thickness at a higher temperature/);
  });

  const board = thermalPropertiesSchema.parse({
    conductivityWPerMK: 0.2, densityKgPerM3: 800, specificHeatJPerKgK: 1000, moisturePercent: 0, minThicknessMm: 15, maxThicknessMm: 50, maxSectionFactorPerM: 300,
    minSectionFactorPerM: 40, maxTemperatureC: 700, maxPeriodMin: 120, stockThicknessesMm: [20, 15, 25], maxLayers: 2,
  });
  it('checks thermal properties', () => {
    const faults = (change: Partial<ThermalProperties>, kind: 'board' | 'coating' = 'board') => checkEvidence({ form: 'thermal', properties: { ...board, ...change } }, kind).map(sentence).join('\n');
    expect(faults({})).toBe('');
    expect(faults({}, 'coating')).toMatch(/do not describe a coating/);
    expect(faults({ minThicknessMm: 60 })).toMatch(/least thickness 60 is above the greatest, 50/);
    expect(faults({ stockThicknessesMm: [20, 55] })).toMatch(/Stocked thickness 55 mm/);
    expect(faults({ conductivityWPerMK: [{ temperatureC: 100, value: 0.1 }, { temperatureC: 100, value: 0.2 }] })).toMatch(/must rise/);
  });

  it('lists every total of permitted layers once, with the fewest layers', () => {
    expect(stacksOf(board, 'board').map((s) => s.layers)).toEqual([[15], [20], [25], [15, 15], [20, 15], [25, 15], [25, 20], [25, 25]]);
  });
});
