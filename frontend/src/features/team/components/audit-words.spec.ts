import { describe, expect, it } from 'vitest';
import { fieldName, inWords } from './audit-words.js';

describe('the audit trail in words', () => {
  it('names fields with their units', () => {
    expect(['periodMin', 'lengthMm', 'class4TemperatureC', 'temperatureC', 'name', 'markUpPercent'].map(fieldName))
      .toEqual(['period, min', 'length, mm', 'class4 temperature, °C', 'temperature, °C', 'name', 'mark up, %']);
  });
  it('says stored values, and never "null" or "[object Object]"', () => {
    expect(inWords(null)).toBe('nothing');
    expect(inWords([])).toBe('nothing');
    expect(inWords(false)).toBe('no');
    expect(inWords(0)).toBe('0');
    expect(inWords({ way: 'declared', temperatureC: 560 })).toBe('way declared, temperature, °C 560');
    expect(inWords('x'.repeat(300))).toHaveLength(120);
  });
});
