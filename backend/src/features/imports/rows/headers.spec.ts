import { findHeaderRow, readHeader } from './headers.js';
import { suggestMapping } from './suggest-mapping.js';

describe('headers of a schedule', () => {
  it.each([
    ['Mark', 'mark', null], ['PIECE MARK', 'mark', null], ['Pos.-Nr.', 'mark', null], ['Repère', 'mark', null],
    ['Length (mm)', 'length', 'mm'], ['L [m]', 'length', 'm'], ['Länge in mm', 'length', 'mm'], ['Length, ft', 'length', 'ft'], ['Length (ft-in)', 'length', 'ft-in'], ['Longueur/mm', 'length', 'mm'],
    ['Profil', 'section', null], ['Section size', 'section', null], ['Stahlgüte', 'grade', null], ['Nuance d’acier', 'grade', null], ["Nuance d'acier", 'grade', null],
    ['No. off', 'quantity', null], ['Stück', 'quantity', null], ['Qté', 'quantity', null], ['θcr (°C)', 'criticalTemperature', 'C'], ['Critical temp. [°F]', 'criticalTemperature', 'F'],
    ['Utilisation in fire', 'utilisation', null], ['Geschoss', 'level', null], ['Brandabschnitt', 'zone', null],
  ])('%s is %s', (text, field, unit) => {
    expect(readHeader(text)).toMatchObject({ field, unit });
  });

  it.each(['', 'Weight', 'A/V', 'mm', '(mm)', '12'])('"%s" is none', (text) => {
    expect(readHeader(text)).toBeNull();
  });

  it('are found below title rows, and not in rows that name one thing by chance', () => {
    expect(findHeaderRow([['Steel schedule'], [], ['Project', 'T-1', 'Zone'], ['Mark', 'Section', 'Length (m)'], ['B1', 'IPE 300', '6']])).toBe(3);
    expect(findHeaderRow([['B1', 'IPE 300', '6.5']])).toBeNull();
    expect(findHeaderRow([])).toBeNull();
  });

  it('make a mapping, with notes on what was not understood', () => {
    const rows = [['Mark', 'Section', 'Length', 'Weight', 'Tag', 'Utilisation'], ['B1', 'IPE 300', '6.5', '274', 'x', '0.6']];
    const { mapping, notes, sheets } = suggestMapping([{ name: 'S', rows }], false);
    expect(mapping).toMatchObject({ sheet: 'S', headerRow: 1, columns: { mark: 0, section: 1, length: 2 }, lengthUnit: 'm' });
    expect(mapping.columns.utilisation).toBeUndefined();
    expect(notes).toEqual([
      'Column E, "Tag", was left aside: Mark is read from column A.',
      'Not understood and not read: "Weight" (column D). Assign it by hand if needed.',
      "Utilisation in fire is not read: only the structural engineer may set how a member's critical temperature comes about.",
      'No column was recognised for Zone, Type, Steel grade, Exposure. Choose the column, or a value for all rows where there is one.',
      'The file does not say in which unit lengths are; they look like metres. Check the unit.',
    ]);
    expect(sheets[0]).toMatchObject({ name: 'S', rows: 2, headerRow: 1, headers: rows[0], columns: mapping.columns });
    expect(suggestMapping([{ name: 'S', rows }], true).mapping.columns.utilisation).toBe(5);
  });

  it('that occur twice are not chosen between', () => {
    const { mapping, notes } = suggestMapping([{ name: 'S', rows: [['Mark', 'Length (mm)', 'Length (m)', 'Section'], ['B1', '6500', '6.5', 'IPE 300']] }], false);
    expect(mapping.columns).toEqual({ mark: 0, section: 3 });
    expect(notes[0]).toBe('Row 1: columns B and C are both headed "Length (mm)". Choose which of them holds Length.');
  });
});
