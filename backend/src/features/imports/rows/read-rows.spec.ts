import { sentence } from '@mantlet/common';
import type { ImportMapping } from '@mantlet/common';
import type { RowContext } from './read-row.js';
import { readRows } from './read-rows.js';

const mapping: ImportMapping = {
  sheet: 'S', headerRow: 1, lengthUnit: 'mm', temperatureUnit: 'C',
  columns: { mark: 0, level: 1, zone: 2, memberType: 3, section: 4, grade: 5, length: 6, quantity: 7, exposure: 8, criticalTemperature: 9, utilisation: 10, reference: 11 },
  defaults: { zoneId: null, memberType: null, grade: null, exposure: null, protectionForm: null },
};
const context: Omit<RowContext, 'decimalSign'> = {
  mapping,
  places: {
    levels: [{ id: 'l0', code: '00', name: 'Ground floor' }, { id: 'l1', code: '01', name: 'First floor' }],
    zones: [{ id: 'z1', code: 'Z1', name: 'Hall', levelId: 'l0' }, { id: 'z2', code: 'Z2', name: 'Stacks', levelId: 'l1' }, { id: 'z3', code: 'Z3', name: 'Hall', levelId: 'l1' }],
  },
  section: (text) => (text === 'IPE 300' ? { id: 's1', designation: 'IPE 300' } : null),
  suggestSections: (text) => (text === 'IPE 310' ? ['IPE 300', 'IPE 330'] : []),
};
const headers = ['Mark', 'Level', 'Zone', 'Type', 'Section', 'Grade', 'Length', 'No off', 'Exposure', 'θcr', 'μ0', 'Ref'];
const right = ['B1', '00', 'Z1', 'beam', 'IPE 300', 'S355', '6500', '2', '3 sides'];
const one = (...cells: string[]): ReturnType<typeof readRows>['rows'][number] => readRows([headers, cells], context).rows[0]!;
const problems = (...cells: string[]): string[] => one(...cells).problems.map((p) => `${p.field}: ${sentence(p.reason)}`);
/** the right row with some cells set otherwise */
const row = (changes: Record<number, string>): string[] => Array.from({ length: 12 }, (_, i) => changes[i] ?? right[i] ?? '');

describe('rows of a schedule', () => {
  it('are read into what a member needs', () => {
    expect(one(...right)).toMatchObject({
      row: 2, mark: 'B1', problems: [],
      draft: { zoneId: 'z1', memberType: 'beam', sectionId: 's1', grade: 'S355', lengthMm: 6500, quantity: 2, exposure: { arrangement: 'three-sides' } },
    });
  });

  it('keep the row number of the file past empty rows, totals and repeated headers', () => {
    const read = readRows([headers, right, [], ['Total', '', '', '', '', '', '6500'], headers, row({ 0: 'B2' }), ['', '', '', '', '', '', ''], ['', '', '', 'Grand total', '', '', '13000']], context);
    expect(read.rows.map((r) => [r.row, r.mark])).toEqual([[2, 'B1'], [6, 'B2']]);
    expect(read.notes).toEqual(['Rows 4, 8 look like totals and were not read.', 'Row 5 repeats the headers and was not read.']);
  });

  it('do not take a member for a total because of its mark', () => {
    expect(readRows([headers, row({ 0: 'Total-1' })], context).rows).toHaveLength(1);
  });

  it('find the zone by code or name, alone or with the level', () => {
    expect(one(...row({ 1: '', 2: 'z2' })).draft.zoneId).toBe('z2');
    expect(one(...row({ 1: 'Ground floor', 2: '' })).draft.zoneId).toBe('z1');
    expect(one(...row({ 1: '01', 2: 'hall' })).draft.zoneId).toBe('z3');
    expect(problems(...row({ 1: '', 2: 'Hall' }))).toEqual(['zone: "Hall" is the name of more than one zone: Z1, Z3. Use the code.']);
    expect(problems(...row({ 1: '01', 2: '' }))).toEqual(['level: Level 01 has the zones Z2, Z3. Say which one.']);
    expect(problems(...row({ 1: '01', 2: 'Z1' }))).toEqual(['zone: Zone Z1 lies on level 00, not on 01.']);
    expect(problems(...row({ 1: '07' }))).toEqual(['level: There is no level "07". The project has 00, 01.']);
    expect(problems(...row({ 2: 'Z9' }))).toEqual(['zone: There is no zone "Z9". The project has Z1, Z2, Z3.']);
  });

  it('say every thing that is wrong, each in its column', () => {
    expect(problems(...row({ 0: '', 3: 'widget', 4: 'IPE 310', 5: 'steel', 6: 'long', 7: '1.5', 8: '2 sides' }))).toEqual([
      'mark: Mark is needed; the cell is empty.',
      expect.stringMatching(/^memberType: "widget" is not known/),
      'section: There is no section "IPE 310". Did you mean IPE 300, IPE 330?',
      expect.stringMatching(/^grade: "steel" is not known/),
      'length: "long" is not a number. Length must be a number.',
      'quantity: Number off must be a whole number; it is 1.5.',
      expect.stringMatching(/^exposure: "2 sides" does not say which faces/),
    ]);
    expect(problems(...row({ 6: '-6500', 7: '0' }))).toEqual(['length: Length must be above 0; it is -6500.', 'quantity: Number off must be above 0; it is 0.']);
    expect(problems(...row({ 0: 'x'.repeat(61) }))).toEqual(['mark: Mark is longer than 60 characters.']);
    expect(problems(...row({ 4: 'nonsense' }))).toEqual(['section: There is no section "nonsense". Correct its name, or make it as a section of the project first.']);
  });

  it('with one mark are both wrong, and name each other', () => {
    const read = readRows([headers, right, row({ 0: 'B2' }), right], context);
    expect(read.rows.map((r) => r.problems.map((p) => sentence(p.reason)))).toEqual([
      ['Mark B1 also stands in row 4. A mark names one member; use "number off" for identical ones.'], [],
      ['Mark B1 also stands in row 2. A mark names one member; use "number off" for identical ones.'],
    ]);
  });

  it('bring a declared temperature or a utilisation, never both, never without a reference', () => {
    expect(one(...row({ 9: '550', 11: 'Calc 3' })).draft.basis).toEqual({ way: 'declared', temperatureC: 550, reference: 'Calc 3' });
    // 1022 °F is 550 °C
    expect(one(...row({ 9: '1022 °F', 11: 'Calc 3' })).draft.basis).toEqual({ way: 'declared', temperatureC: 550, reference: 'Calc 3' });
    expect(one(...row({ 10: '0.6', 11: 'Calc 3' })).draft.basis).toEqual({ way: 'utilisation', mu0: 0.6, reference: 'Calc 3' });
    expect(one(...row({ 10: '60 %', 11: 'Calc 3' })).draft.basis).toMatchObject({ mu0: 0.6 });
    expect(one(...row({ 11: 'Calc 3' })).draft.basis).toBeUndefined();
    expect(problems(...row({ 9: '550', 10: '0.6', 11: 'Calc 3' }))).toEqual(['utilisation: A critical temperature and a utilisation are both given. Give one of them.']);
    expect(problems(...row({ 9: '550' }))).toEqual(['reference: Say where the value comes from: the reference is empty.']);
    expect(problems(...row({ 9: '5500', 11: 'Calc 3' }))).toEqual(['criticalTemperature: Critical temperature is 5500; it must lie between 100 °C and 1200 °C.']);
    expect(problems(...row({ 10: '60', 11: 'Calc 3' }))).toEqual(['utilisation: Utilisation in fire is 60; it must lie between 0 and 10.']);
  });

  it('take the decimal sign that other rows prove', () => {
    const read = readRows([headers, row({ 6: '6,500' }), row({ 0: 'B2', 6: '7,25' })], { ...context, mapping: { ...mapping, lengthUnit: 'm' } });
    expect(read.rows.map((r) => r.draft.lengthMm)).toEqual([6500, 7250]);
    expect(readRows([headers, row({ 6: '62,500' })], context).rows[0]!.problems.map((p) => sentence(p.reason))).toEqual([
      '"62,500" may mean 62500 or 62.5. Write it without a thousands separator.',
    ]);
  });
});
