import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  Decimal, allocateDecimal, celsiusToFahrenheit, fahrenheitToCelsius, forceToKn, formatApart, formatFeetInches, formatFilmThickness, formatLimitTemperature,
  formatMoney, formatNumber, formatSectionFactor, formatThickness, lengthFromMm, lengthToMm, massPerHeatedPerimeter, momentToKnm, roundMoney, stressToMPa,
  sumDecimals, weightToHeatedPerimeterLbFtIn,
} from './index.js';

describe('conversions', () => {
  // exact by definition: NIST Special Publication 811, appendix B.8
  it.each([
    ['1 ft', lengthToMm(1, 'ft'), 304.8], ['1 in', lengthToMm(1, 'in'), 25.4], ['1 kip', forceToKn(1, 'kip'), 4.448222], ['1 lbf', forceToKn(1, 'lbf') * 1000, 4.448222],
    ['1 ksi', stressToMPa(1, 'ksi'), 6.894757], ['1 lbf·ft × 1000', momentToKnm(1, 'kip-ft'), 1.355818], ['1 lbf·in × 1000', momentToKnm(1, 'kip-in'), 0.1129848],
  ])('%s', (_, value, published) => expect(Math.abs(value - published)).toBeLessThan(published * 1e-6));

  it('turns temperatures both ways: 1000 °F is 537.8 °C (ASTM E119 gives both)', () => {
    expect(fahrenheitToCelsius(1000)).toBeCloseTo(537.8, 1);
    expect(celsiusToFahrenheit(fahrenheitToCelsius(1000))).toBeCloseTo(1000, 9);
  });

  it('shows a section factor as W/D: 1 lb/ft per in is 58.59 kg/m per m (from the definitions of pound and inch)', () => {
    const factor = 7850 / ((0.45359237 / 0.3048) / 0.0254);
    expect(weightToHeatedPerimeterLbFtIn(factor)).toBeCloseTo(1, 9);
    expect(massPerHeatedPerimeter(factor)).toBeCloseTo(58.59, 2);
  });

  it('comes back to the same length', () => {
    fc.assert(fc.property(fc.double({ min: 0.01, max: 1e5, noNaN: true }), fc.constantFrom('mm', 'cm', 'm', 'in', 'ft' as const), (v, u) => {
      expect(lengthToMm(lengthFromMm(v, u as 'mm'), u as 'mm') / v).toBeCloseTo(1, 12);
    }));
  });
});

describe('formats', () => {
  it('shows film in mm, with a third decimal only where two would say less than is needed', () => {
    expect(formatThickness(620, 'µm')).toBe('0.62 mm');
    expect(formatThickness(623, 'µm')).toBe('0.623 mm');
    expect(formatThickness(622.2, 'µm')).toBe('0.623 mm');
    expect(formatThickness(5000, 'µm')).toBe('5.00 mm');
    expect(formatFilmThickness(620)).toBe('620 µm');
  });

  it('never shows a requirement smaller than it is', () => {
    fc.assert(fc.property(fc.double({ min: 0.1, max: 9e4, noNaN: true }), fc.constantFrom('µm' as const, 'mm' as const), (value, unit) => {
      const shown = Number(formatThickness(value, unit).replace(/[^\d.]|mm/g, ''));
      expect(shown).toBeGreaterThanOrEqual((unit === 'µm' ? value / 1000 : value) - 1e-6);
    }));
  });

  it('shows boards in whole mm and limits rounded down', () => {
    expect(formatThickness(20, 'mm')).toBe('20 mm');
    expect(formatThickness(12.55, 'mm')).toBe('12.6 mm');
    expect(formatLimitTemperature(549.9)).toBe('549 °C');
    expect(formatLimitTemperature(550)).toBe('550 °C');
  });

  it('has a dash where there is no number, never NaN or zero', () => {
    for (const nothing of [null, undefined, Number.NaN, Infinity]) expect(formatNumber(nothing)).toBe('–');
    expect(formatThickness(null, 'mm')).toBe('–');
    expect(formatMoney(null, 'EUR')).toBe('–');
    expect(formatNumber(-0.001, 2)).toBe('0.00');
  });

  it('reports section factors to 1 1/m but tells apart what a refusal compares', () => {
    expect(formatSectionFactor(215.6)).toBe('216 1/m');
    expect(formatApart(342, 300)).toEqual(['342', '300']);
    expect(formatApart(300.3, 300)).toEqual(['300.3', '300.0']);
  });

  it('writes feet and inches to a sixteenth', () => {
    expect(formatFeetInches(3810)).toBe('12 ft 6 in');
    expect(formatFeetInches(165.1)).toBe('6 1/2 in');
    expect(formatFeetInches(3.175)).toBe('1/8 in');
    expect(formatFeetInches(304.79)).toBe('1 ft 0 in');
    expect(formatFeetInches(0)).toBe('0 in');
  });
});

describe('money', () => {
  it('rounds half up in decimal, where binary would not: 1.005 → 1.01', () => {
    expect(roundMoney('1.005').toFixed(2)).toBe('1.01');
    expect(sumDecimals(['0.1', '0.2']).toString()).toBe('0.3');
    expect(formatMoney('1234567.5', 'EUR')).toBe('EUR 1\u202f234\u202f567.50');
    expect(formatMoney('-1234.5', 'GBP')).toBe('GBP -1\u202f234.50');
  });

  it('shares out a total to the last cent', () => {
    expect(allocateDecimal(new Decimal('100'), [1, 1, 1], 2).map(String)).toEqual(['33.34', '33.33', '33.33']);
    expect(() => allocateDecimal(new Decimal(1), [0, 0], 2)).toThrow(RangeError);
    fc.assert(fc.property(fc.integer({ min: 0, max: 1e9 }), fc.array(fc.double({ min: 0, max: 1e4, noNaN: true }), { minLength: 1, maxLength: 30 }), (cents, weights) => {
      fc.pre(weights.some((w) => w > 1e-6));
      const total = new Decimal(cents).div(100);
      const shares = allocateDecimal(total, weights, 2);
      expect(sumDecimals(shares).equals(total)).toBe(true);
      const sum = weights.reduce((a, b) => a + b, 0);
      shares.forEach((s, i) => expect(Math.abs(s.toNumber() - (total.toNumber() * (weights[i] ?? 0)) / sum)).toBeLessThan(0.0101));
    }));
  });
});
