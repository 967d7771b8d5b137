import { describe, expect, it } from 'vitest';
import { fieldName, partsOfChange, valueInWords } from './record-words.js';

describe('stored fields and values in words', () => {
  it('names fields without their unit', () => {
    expect(['periodMin', 'lengthMm', 'class4TemperatureC', 'temperatureC', 'name', 'markUpPercent', 'curve.fireLoadTotalMjPerM2', 'high-temperature', 'design.actions.leading.axialKn'].map(fieldName))
      .toEqual(['period', 'length', 'class4 temperature', 'temperature', 'name', 'mark up', 'curve fire load total', 'critical temperature', 'leading variable action axial force N']);
  });
  it('gives the unit to the number and cuts a limit of temperature down', () => {
    expect(valueInWords('lengthMm', 4500)).toBe('4\u202f500\u00a0mm');
    expect(valueInWords('elevationM', -4.5)).toBe('\u22124.5\u00a0m');
    expect(valueInWords('bare', 797.6637327)).toBe('797 °C');
    expect(valueInWords('deductionM2', 0.1 + 0.2)).toBe('0.3\u00a0m²');
    expect(valueInWords('quantity', 6)).toBe('6');
  });
  it('never says "null" or "[object Object]", and puts codes in words', () => {
    expect(valueInWords('note', null)).toBe('nothing');
    expect(valueInWords('systems', [])).toBe('nothing');
    expect(valueInWords('onSite', false)).toBe('no');
    expect(valueInWords('memberType', 'secondary-beam')).toBe('Secondary beam');
    expect(valueInWords('basis', { way: 'declared', temperatureC: 560, note: '' })).toBe('basis of the critical temperature Declared; temperature 560\u00a0°C');
    expect(valueInWords('note', 'x'.repeat(300))).toHaveLength(160);
    expect(valueInWords('pdfSha256', 'ab'.repeat(32))).toBe('abababababab…');
  });
  it('says a beam and its loads as an engineer would', () => {
    const loads = [{ kind: 'distributed', action: 'permanent', fromMm: 0, toMm: 7500, startKnPerM: 12.5, endKnPerM: 12.5 }, { kind: 'distributed', action: 'B', fromMm: 0, toMm: 3000, startKnPerM: 0, endKnPerM: 6 }, { kind: 'point', action: 'wind', atMm: null, forceKn: 40 }];
    expect(valueInWords('basis.design.actions.loads', loads))
      .toBe('Permanent, 12.5\u00a0kN/m from 0 to 7\u202f500\u00a0mm; B office, 0 to 6\u00a0kN/m from 0 to 3\u202f000\u00a0mm; Wind, 40\u00a0kN at …\u00a0mm');
    expect(valueInWords('basis.design.actions.supports', 'fixed')).toBe('Built in at both ends');
    expect(valueInWords('note', 'fixed')).toBe('fixed');
    expect(valueInWords('lateralSupportsMm', [2500, 5000])).toBe('2\u202f500\u00a0mm, 5\u202f000\u00a0mm');
    expect(fieldName('lateralSupportsMm')).toBe('lateral supports between the ends');
  });
  it('takes a record apart into what differs, and leaves identifiers out', () => {
    const change = { field: 'basis', old: { way: 'none' }, new: { way: 'utilisation', mu0: 0.46 } };
    expect(partsOfChange(change)).toEqual([{ field: 'way', old: 'none', new: 'utilisation' }, { field: 'mu0', old: null, new: 0.46 }]);
    expect(partsOfChange({ field: 'levelId', old: null, new: '11111111-1111-4111-8111-111111111111' })).toEqual([]);
    expect(partsOfChange({ field: 'note', old: null, new: '' })).toEqual([]);
  });
});
