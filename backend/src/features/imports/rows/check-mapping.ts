import { importFieldNames, message } from '@mantlet/common';
import type { ImportField, ImportMapping, Message } from '@mantlet/common';
import { columnLetters } from '../reading/cell-grid.js';
import type { CellGrid } from '../reading/cell-grid.js';

export interface MappingFault {
  path: string;
  reason: Message;
}

/** What keeps a mapping from being used on this file at all. */
export function checkMapping(mapping: ImportMapping, sheets: readonly CellGrid[]): MappingFault[] {
  const sheet = sheets.find((s) => s.name === mapping.sheet);
  if (!sheet) return [{ path: 'sheet', reason: message('import.no-such-sheet', { sheet: mapping.sheet, sheets: sheets.map((s) => s.name) }) }];
  if (mapping.headerRow > sheet.rows.length) return [{ path: 'headerRow', reason: message('import.no-such-row', { row: mapping.headerRow, rows: sheet.rows.length }) }];
  if (mapping.headerRow === sheet.rows.length) return [{ path: 'headerRow', reason: message('import.only-headers', { sheet: sheet.name, row: mapping.headerRow }) }];
  if (mapping.columns.mark === undefined) return [{ path: 'columns.mark', reason: message('import.mark-needed', {}) }];
  return columnFaults(mapping, sheet);
}

function columnFaults(mapping: ImportMapping, sheet: CellGrid): MappingFault[] {
  const width = sheet.rows.reduce((widest, row) => Math.max(widest, row.length), 0);
  const faults: MappingFault[] = [];
  const users = new Map<number, ImportField[]>();
  for (const [field, column] of Object.entries(mapping.columns) as [ImportField, number][]) {
    users.set(column, [...(users.get(column) ?? []), field]);
    if (column >= width) faults.push({ path: `columns.${field}`, reason: message('import.no-such-column', { field: importFieldNames[field], column: columnLetters(column) }) });
  }
  for (const [column, fields] of users) {
    if (fields.length < 2) continue;
    const reason = message('import.column-twice', { column: columnLetters(column), fields: fields.map((field) => importFieldNames[field]) });
    faults.push({ path: `columns.${fields[1]}`, reason });
  }
  return faults;
}

/** Fields that every new member needs and that neither a column nor a value for all rows gives. */
export function ungivenFields({ columns, defaults }: ImportMapping): ImportField[] {
  const given = (field: ImportField, byDefault: unknown = null): boolean => columns[field] !== undefined || byDefault !== null;
  const needed: [ImportField, boolean][] = [
    ['zone', given('zone', defaults.zoneId) || given('level')],
    ['memberType', given('memberType', defaults.memberType)],
    ['section', given('section')],
    ['grade', given('grade', defaults.grade)],
    ['length', given('length')],
    ['exposure', given('exposure', defaults.exposure)],
    ['protectionForm', given('protectionForm', defaults.protectionForm)],
  ];
  return needed.flatMap(([field, ok]) => (ok ? [] : [field]));
}
