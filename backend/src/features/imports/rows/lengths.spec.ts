import { sentence } from '@mantlet/common';
import { readLength } from './lengths.js';
import type { ImportLengthUnit } from './lengths.js';

const length = (text: string, unit: ImportLengthUnit = 'mm'): number | string => {
  const reading = readLength(text, 'Length', unit, null);
  return reading.ok ? reading.value : sentence(reading.reason);
};

// 1 in = 25.4 mm and 1 ft = 304.8 mm exactly (international yard agreement, 1959)
describe('lengths of a schedule', () => {
  it.each<[string, ImportLengthUnit, number]>([
    ['6500', 'mm', 6500], ['6.5', 'm', 6500], ['650', 'cm', 6500], ['12', 'ft', 3657.6], ['12', 'in', 304.8],
    ['6.5 m', 'mm', 6500], ['6500mm', 'm', 6500], ['12 ft', 'mm', 3657.6],
    ['12\'-6"', 'mm', 3810], ['12\' 6"', 'ft-in', 3810], ['12\'-6 1/2"', 'ft-in', 3822.7], ['12’-6”', 'ft-in', 3810], ['12 ft 6 in', 'mm', 3810],
    ['12\'-0"', 'ft-in', 3657.6], ["12'", 'ft-in', 3657.6], ['6 1/2"', 'ft-in', 165.1], ['30"', 'ft-in', 762], ['2 1/2"', 'in', 63.5],
    // 6.5 mm is no member and 6500 m none either, so only one reading is left
    ['6,500', 'm', 6500], ['6,500', 'mm', 6500],
  ])('reads %s in a column of %s as %d mm', (text, unit, expected) => {
    expect(length(text, unit)).toBeCloseTo(expected, 6);
  });

  it('says what is wrong with the others', () => {
    expect(length('-250')).toBe('Length must be above 0; it is -250.');
    expect(length('0')).toBe('Length must be above 0; it is 0.');
    expect(length('-12\'-6"', 'ft-in')).toMatch(/must be above 0/);
    expect(length('6500', 'm')).toBe('Length is 6500; it must lie between 50 mm and 100 m.');
    expect(length('about 6 m')).toBe('"about 6" is not a number. Length must be a number.');
    expect(length('6 yards')).toBe('"6 yards" is not a number. Length must be a number.');
    expect(length('12.5', 'ft-in')).toBe('"12.5" is not a length in feet and inches such as 12\'-6".');
    expect(length('4.5')).toBe('Length is 4.5; it must lie between 50 mm and 100 m.');
    expect(length('62,500', 'mm')).toMatch(/may mean 62500 or 62.5/);
    expect(length('1/0"')).toMatch(/not a number/);
  });
});
