import { importFieldNames, importFields, message, sentence, structuralImportFields } from '@mantlet/common';
import type { ImportField, ImportMapping, ImportSheetDto, Message } from '@mantlet/common';
import { columnLetters } from '../reading/cell-grid.js';
import type { CellGrid } from '../reading/cell-grid.js';
import { findHeaderRow, readHeader } from './headers.js';
import type { HeaderReading } from './headers.js';
import { provenDecimalSign, readNumber } from './numbers.js';

export const isStructural = (field: ImportField): boolean => (structuralImportFields as readonly ImportField[]).includes(field);

interface SuggestedColumns {
  headerRow: number;
  columns: ImportMapping['columns'];
  units: HeaderReading['unit'][];
  notes: Message[];
}

/** What each sheet's headers are taken to mean, and the mapping of the one that says most. */
export function suggestMapping(sheets: readonly CellGrid[], mayStructural: boolean): { mapping: ImportMapping; sheets: ImportSheetDto[]; notes: string[] } {
  const suggested = sheets.map((sheet) => ({ sheet, suggestion: suggestColumns(sheet, mayStructural) }));
  const best = suggested.reduce((a, b) => (Object.keys(b.suggestion.columns).length > Object.keys(a.suggestion.columns).length ? b : a));
  const { lengthUnit, note } = lengthUnitOf(best.sheet, best.suggestion);
  const mapping: ImportMapping = {
    sheet: best.sheet.name, headerRow: best.suggestion.headerRow, columns: best.suggestion.columns, lengthUnit,
    temperatureUnit: best.suggestion.units.includes('F') ? 'F' : 'C',
    defaults: { zoneId: null, memberType: null, grade: null, exposure: null, protectionForm: 'profile' },
  };
  return { mapping, sheets: suggested.map((s) => toSheetDto(s.sheet, s.suggestion)), notes: [...best.suggestion.notes, ...note].map(sentence) };
}

function suggestColumns(sheet: CellGrid, mayStructural: boolean): SuggestedColumns {
  const index = findHeaderRow(sheet.rows);
  if (index === null) {
    const first = sheet.rows.findIndex((row) => row.some(Boolean));
    return { headerRow: first + 1, columns: {}, units: [], notes: [message('import.no-headers', { sheet: sheet.name })] };
  }
  const headers = sheet.rows[index]!;
  const readings = headers.map(readHeader);
  const columns: ImportMapping['columns'] = {};
  const notes: Message[] = [];
  for (const field of importFields) {
    if (isStructural(field) && !mayStructural) continue;
    const chosen = chooseColumn(field, headers, readings, index + 1, notes);
    if (chosen !== null) columns[field] = chosen;
  }
  notes.push(...leftOver(headers, readings, columns, mayStructural));
  const units = Object.values(columns).map((column) => readings[column]?.unit ?? null);
  return { headerRow: index + 1, columns, units, notes };
}

/** The surest of the columns that name a field; none where two have the very same header. */
function chooseColumn(field: ImportField, headers: string[], readings: (HeaderReading | null)[], row: number, notes: Message[]): number | null {
  const candidates = readings.flatMap((reading, column) => (reading?.field === field ? [{ column, rank: reading.rank }] : []));
  candidates.sort((a, b) => a.rank - b.rank || a.column - b.column);
  const first = candidates[0];
  if (!first) return null;
  const name = importFieldNames[field];
  const equal = candidates.filter((c) => c.rank === first.rank);
  if (equal.length > 1) {
    notes.push(message('import.duplicate-header', { header: headers[first.column]!, row, columns: equal.map((c) => columnLetters(c.column)), field: name }));
    return null;
  }
  for (const other of candidates.slice(1)) {
    notes.push(message('import.second-column', { header: headers[other.column]!, column: columnLetters(other.column), field: name, chosen: columnLetters(first.column) }));
  }
  return first.column;
}

function leftOver(headers: string[], readings: (HeaderReading | null)[], columns: ImportMapping['columns'], mayStructural: boolean): Message[] {
  const notes: Message[] = [];
  const unknown = headers.flatMap((header, column) => (header && !readings[column] ? [`"${header}" (column ${columnLetters(column)})`] : []));
  if (unknown.length) notes.push(message('import.column-not-read', { headers: unknown }));
  const structural = [...new Set(readings.flatMap((r) => (r && isStructural(r.field) ? [importFieldNames[r.field]] : [])))];
  if (structural.length && !mayStructural) notes.push(message('import.structural-ignored', { fields: structural }));
  const missing = neededFields.filter((field) => columns[field] === undefined).map((field) => importFieldNames[field]);
  if (missing.length) notes.push(message('import.missing-column', { fields: missing }));
  return notes;
}
const neededFields: ImportField[] = ['mark', 'zone', 'memberType', 'section', 'grade', 'length', 'exposure'];

/** The unit the header names; else metres or millimetres by the size of the numbers, with a note to check. */
function lengthUnitOf(sheet: CellGrid, suggestion: SuggestedColumns): { lengthUnit: ImportMapping['lengthUnit']; note: Message[] } {
  const column = suggestion.columns.length;
  if (column === undefined) return { lengthUnit: 'mm', note: [] };
  const header = readHeader(sheet.rows[suggestion.headerRow - 1]?.[column] ?? '')?.unit;
  if (header && header !== 'C' && header !== 'F') return { lengthUnit: header, note: [] };
  const texts = sheet.rows.slice(suggestion.headerRow).map((row) => row[column] ?? '').filter(Boolean);
  if (texts.some((text) => /['′]\s*-?\s*\d/.test(text))) return { lengthUnit: 'ft-in', note: [] };
  const sign = provenDecimalSign(texts);
  const numbers = texts.flatMap((text) => {
    const value = readNumber(text, '', sign);
    return value.ok ? [value.value] : [];
  });
  if (!numbers.length) return { lengthUnit: 'mm', note: [] };
  const lengthUnit = numbers.reduce((a, b) => Math.max(a, b), 0) <= 60 ? 'm' : 'mm';
  return { lengthUnit, note: [message('import.length-unit-guessed', { unit: lengthUnit })] };
}

function toSheetDto(sheet: CellGrid, suggestion: SuggestedColumns): ImportSheetDto {
  const width = sheet.rows.slice(0, 20).reduce((widest, row) => Math.max(widest, row.length), 0);
  const headers = Array.from({ length: Math.max(width, sheet.rows[suggestion.headerRow - 1]?.length ?? 0) }, (_, i) => sheet.rows[suggestion.headerRow - 1]?.[i] ?? '');
  return {
    name: sheet.name, rows: sheet.rows.length, headerRow: suggestion.headerRow, headers, columns: suggestion.columns,
    firstRows: sheet.rows.slice(0, 20).map((row) => row.map((cell) => cell.slice(0, 200))),
  };
}
