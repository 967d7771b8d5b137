import { describe, expect, it } from 'vitest';
import { columnName, doneHeading, fileProblem, previewHeading, rowInWords, stepOf } from './import-words.js';
import { fieldOfColumn, mappingProblem, readableFields, readColumnAs, rowsFromHeader } from './mapping.js';

describe('columns', () => {
  it('reads one field from one column and one column as one field', () => {
    const columns = readColumnAs({ mark: 0, section: 3 }, 2, 'section');
    expect(columns).toEqual({ mark: 0, section: 2 });
    expect(readColumnAs(columns, 2, 'note')).toEqual({ mark: 0, note: 2 });
    expect(readColumnAs(columns, 2, null)).toEqual({ mark: 0 });
    expect(fieldOfColumn(columns, 2)).toBe('section');
    expect(fieldOfColumn(columns, 9)).toBeNull();
  });
  it('keeps the structural engineer’s columns to those with the role', () => {
    expect(readableFields(false)).not.toContain('criticalTemperature');
    expect(readableFields(true)).toContain('utilisation');
  });
  it('needs the mark', () => {
    const mapping = { sheet: 'A', headerRow: 1, columns: {}, lengthUnit: 'mm' as const, temperatureUnit: 'C' as const, defaults: { zoneId: null, memberType: null, grade: null, exposure: null, protectionForm: null } };
    expect(mappingProblem(mapping)).toMatch(/mark/);
    expect(mappingProblem({ ...mapping, columns: { mark: 0 } })).toBeNull();
  });
  it.each([[0, 'A'], [25, 'Z'], [26, 'AA'], [51, 'AZ'], [52, 'BA'], [701, 'ZZ'], [702, 'AAA']])('column %d is %s', (index, name) => expect(columnName(index)).toBe(name));
});

describe('the first rows of the file', () => {
  const sheet = { headerRow: 2, headers: ['Mark', 'Section'], firstRows: [['Steel list'], ['Mark', 'Section'], ['B1', 'IPE 200'], ['B2', 'IPE 240']] };
  it('stand below the headers under their own numbers', () => {
    expect(rowsFromHeader(sheet, 2)).toEqual({ headers: ['Mark', 'Section'], rows: [{ number: 3, cells: ['B1', 'IPE 200'] }, { number: 4, cells: ['B2', 'IPE 240'] }] });
  });
  it('follow another row of headers', () => expect(rowsFromHeader(sheet, 3)).toMatchObject({ headers: ['B1', 'IPE 200'], rows: [{ number: 4 }] }));
});

describe('steps and words', () => {
  it('says a new row in a fixed order, and nothing of one that stays as it is', () => {
    const values = { note: 'Trimmer', section: 'IPE 240', zone: 'Z01', mark: 'B1', grade: '' };
    expect(rowInWords({ state: 'new', values })).toMatch(/Z01, .*IPE 240, .*Trimmer$/);
    expect(rowInWords({ state: 'unchanged', values })).toBe('As it stands');
  });
  it('stands where the server left it, and goes back to the columns until it is confirmed', () => {
    expect([stepOf(null, false), stepOf('mapping', false), stepOf('previewed', false), stepOf('previewed', true), stepOf('confirmed', true), stepOf('abandoned', false)])
      .toEqual(['upload', 'columns', 'preview', 'columns', 'done', 'upload']);
  });
  it('says what would come in and what did', () => {
    expect(previewHeading({ counts: { new: 3, changed: 1, unchanged: 0, wrong: 2 } })).toBe('4 rows can be brought in: 3 new and 1 changed; 2 rows are wrong');
    expect(previewHeading({ counts: { new: 0, changed: 0, unchanged: 0, wrong: 5 } })).toBe('All 5 rows are wrong');
    expect(doneHeading({ added: 1, changed: 2, unchanged: 0, leftOut: 1 })).toBe('1 member added, 2 changed and 1 row left out');
  });
  it('refuses before sending what cannot be a schedule', () => {
    expect(fileProblem({ name: 'a.pdf', size: 10 })).toMatch(/not a CSV or XLSX/);
    expect(fileProblem({ name: 'a.csv', size: 0 })).toMatch(/empty/);
    expect(fileProblem({ name: 'a.xlsx', size: 11 * 1024 * 1024 })).toMatch(/larger than 10 MB/);
    expect(fileProblem({ name: 'A.XLSX', size: 5 })).toBeNull();
  });
});
