import fc from 'fast-check';
import { sentence } from '@mantlet/common';
import { provenDecimalSign, readNumber } from './numbers.js';

const value = (text: string, sign: 'point' | 'comma' | null = null, possible?: (n: number) => boolean): number | string => {
  const reading = readNumber(text, 'Length', sign, possible);
  return reading.ok ? reading.value : sentence(reading.reason);
};

describe('numbers of a schedule', () => {
  it.each([
    ['6500', 6500], ['6.5', 6.5], ['6,5', 6.5], ['1,234.5', 1234.5], ['1.234,5', 1234.5], ['1 234,5', 1234.5], ['12 345', 12345], ["1'234.50", 1234.5],
    ['1,234,567', 1234567], ['1.234.567', 1234567], ['−250', -250], ['-0.5', -0.5], ['0,650', 0.65], ['.75', 0.75], ['+3', 3],
  ])('reads %s as %d whatever the file proves', (text, expected) => {
    expect(value(text)).toBe(expected);
  });

  it('reads a lone group of three by what the file proves, or by what is possible, or not at all', () => {
    expect(value('6,500', 'point')).toBe(6500);
    expect(value('6,500', 'comma')).toBe(6.5);
    expect(value('6.500', 'comma')).toBe(6500);
    expect(value('6,500', null, (n) => n < 100)).toBe(6.5);
    expect(value('6,500')).toBe('"6,500" may mean 6500 or 6.5. Write it without a thousands separator.');
  });

  it.each(['', 'long', '12a', '1.2.3', '1,2,3', '--5', '1e5', '12/3', 'NaN', 'Infinity', '1,23,456'])('refuses "%s" in words', (text) => {
    expect(value(text)).toBe(`"${text}" is not a number. Length must be a number.`);
  });

  it('says when a formula in the file went wrong', () => {
    expect(value('#N/A')).toBe("The cell's formula gives #N/A. Correct it in the schedule.");
    expect(value('#DIV/0!')).toMatch(/#DIV\/0!/);
  });

  it('proves the decimal sign by numbers that leave no doubt, and not by those that contradict', () => {
    expect(provenDecimalSign(['6,500', '7,25'])).toBe('comma');
    expect(provenDecimalSign(['6,500', '7.25 m'])).toBe('point');
    expect(provenDecimalSign(['1.234,5'])).toBe('comma');
    expect(provenDecimalSign(['6,500', '6500'])).toBeNull();
    expect(provenDecimalSign(['7,25', '7.25'])).toBeNull();
  });

  it('never gives a number that is none, for any text', () => {
    fc.assert(fc.property(fc.string(), fc.constantFrom('point' as const, 'comma' as const, null), (text, sign) => {
      const reading = readNumber(text, 'x', sign);
      return reading.ok ? Number.isFinite(reading.value) : sentence(reading.reason).length > 0;
    }));
    fc.assert(fc.property(fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e6, max: 1e6 }), (n) => {
      const text = n.toFixed(4);
      return value(text, 'point') === Number(text) && value(text.replace('.', ','), 'comma') === Number(text);
    }));
  });
});
