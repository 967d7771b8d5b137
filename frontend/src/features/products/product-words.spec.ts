import { describe, expect, it } from 'vitest';
import type { Evidence, ProductSummaryDto, ThicknessTable } from '@mantlet/common';
import { pickTable } from './components/evidence-view.js';
import { hasTable, numbersOf, withTable } from './forms/product-form.js';
import { evidenceRange } from '@mantlet/common';
import { expiryWords, libraryWords, productHeading, rangeWords } from './product-words.js';

// invented: no real product behaves like this
const table = (periodMin: ThicknessTable['periodMin'], orientation: ThicknessTable['orientation'] = 'beam', shape: ThicknessTable['shape'] = 'open'): ThicknessTable =>
  ({ shape, orientation, periodMin, temperaturesC: [400, 550], sectionFactorsPerM: [60, 300], thickness: [[300, 200], [900, null]] });
const tables: Evidence = { form: 'table', tables: [table(30), table(60), table(60, 'column')] };
const today = new Date('2026-06-01T12:00:00Z');

describe('what evidence reaches, in words', () => {
  it('reads the range of tables without the cells that are outside', () =>
    expect(rangeWords(evidenceRange(tables), 'coating')).toEqual({ sectionFactor: 'A/V 60 to 300', temperature: '400 to 550 °C', period: 'R 30 to R 60', thickness: '200 to 900 µm' }));
  it('reads an open lower end as up to', () => {
    const thermal: Evidence = { form: 'thermal', properties: { conductivityWPerMK: 0.2, densityKgPerM3: 800, specificHeatJPerKgK: 1700, moisturePercent: 3, minThicknessMm: 12.5, maxThicknessMm: 60, minSectionFactorPerM: 30, maxSectionFactorPerM: 350, maxTemperatureC: 750, maxPeriodMin: 180, stockThicknessesMm: [], maxLayers: 1, thicknessStepMm: 1 } };
    expect(rangeWords(evidenceRange(thermal), 'board')).toEqual({ sectionFactor: 'A/V 30 to 350', temperature: 'up to 750 °C', period: 'up to R 180', thickness: '12.5 to 60 mm' });
    expect(productHeading(thermal)).toBe('Assessed for 180 minutes, up to A/V 350');
  });
});

describe('expiry', () => {
  it.each([
    ['2027-06-01', false, 'Valid', 'settled'], ['2026-06-11', false, 'Expires in 11 days', 'attention'], ['2026-06-01', false, 'Expires today', 'attention'], ['2026-05-31', true, 'Expired', 'attention'],
  ])('%s, expired %s: %s', (evidenceExpiresOn, expired, word, kind) => expect(expiryWords({ evidenceExpiresOn, expired }, today)).toEqual({ word, kind }));
  it('is the heading of the library', () => {
    const product = (expired: boolean) => ({ kind: 'coating', expired, usedByZones: 0 }) as ProductSummaryDto;
    expect(libraryWords([], true).heading).toBe('No products yet');
    expect(libraryWords([product(false), product(false)], true).heading).toBe('2 products, all assessments valid');
    expect(libraryWords([product(false), product(true)], true).heading).toBe('2 products, 1 with an expired assessment');
  });
});

describe('thickness tables', () => {
  it('shows the nearest where a choice has no table', () => {
    expect(pickTable(tables.form === 'table' ? tables.tables : [], { shape: 'open', orientation: 'column', periodMin: 30 })).toMatchObject({ orientation: 'column', periodMin: 60 });
    expect(pickTable([], {})).toBeUndefined();
  });
  it('takes the place of the one for the same shape, member and period, in order', () => {
    const next = { ...table(60), temperaturesC: [400, 600] };
    const list = withTable([table(60, 'column'), table(60), table(30)], next);
    expect(list.map((t) => `${t.orientation} ${t.periodMin}`)).toEqual(['beam 30', 'beam 60', 'column 60']);
    expect(list[1]?.temperaturesC).toEqual([400, 600]);
    expect(hasTable(list, { shape: 'open', orientation: 'beam', periodMin: 90 })).toBe(false);
  });
  it('keeps numbers once, in order, and drops what is none', () => expect(numbersOf(['20', '12,5', 'x', '20', '-3'])).toEqual([12.5, 20]));
});
