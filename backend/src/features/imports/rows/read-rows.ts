import { message, sentence } from '@mantlet/common';
import type { ImportField } from '@mantlet/common';
import { provenDecimalSign } from './numbers.js';
import { readRow } from './read-row.js';
import type { ReadRow, RowContext } from './read-row.js';
import { plainWords } from './words.js';

export interface ReadRows {
  rows: ReadRow[];
  notes: string[];
}
const numberFields: ImportField[] = ['length', 'quantity', 'criticalTemperature', 'utilisation'];

/** Every row below the headers; empty ones, totals and repeated headers are passed over, the latter two with a note. */
export function readRows(rows: readonly (readonly string[])[], context: Omit<RowContext, 'decimalSign'>): ReadRows {
  const { headerRow, columns } = context.mapping;
  const headers = rows[headerRow - 1] ?? [];
  const body = rows.slice(headerRow);
  const numberColumns = numberFields.flatMap((field) => columns[field] ?? []);
  const decimalSign = provenDecimalSign(numbersOf(body, numberColumns));
  const result: ReadRow[] = [];
  const totals: number[] = [];
  const repeated: number[] = [];
  body.forEach((cells, i) => {
    const row = headerRow + 1 + i;
    if (!cells.some(Boolean)) return;
    if (isHeaderAgain(cells, headers)) repeated.push(row);
    else if (isTotal(cells, columns)) totals.push(row);
    else result.push(readRow(row, cells, { ...context, decimalSign }));
  });
  noteTwins(result);
  const notes = [
    ...(totals.length ? [message('import.skipped-total', { rows: totals })] : []),
    ...(repeated.length ? [message('import.skipped-headers', { rows: repeated })] : []),
  ];
  return { rows: result, notes: notes.map(sentence) };
}

function* numbersOf(body: readonly (readonly string[])[], columns: readonly number[]): Generator<string> {
  for (const cells of body) for (const column of columns) if (cells[column]) yield cells[column];
}

function isHeaderAgain(cells: readonly string[], headers: readonly string[]): boolean {
  const filled = headers.filter(Boolean).length;
  return filled > 1 && cells.filter((cell, i) => cell && cell === headers[i]).length >= Math.max(2, filled * 0.8);
}

/** A row that says "total" where a mark or any first word would stand, and names no section. */
function isTotal(cells: readonly string[], columns: RowContext['mapping']['columns']): boolean {
  if (columns.section !== undefined && cells[columns.section] && !totalWord.test(plainWords(cells[columns.section]!))) return false;
  const first = cells.find(Boolean) ?? '';
  return totalWord.test(plainWords(first)) || totalWord.test(plainWords(cells[columns.mark ?? 0] ?? ''));
}
const totalWord = /^(grand |sub ?|zwischen|gesamt|sous )?(total|totals|totaux|sum|summe|gesamt|gesamtsumme|ensemble)\b/;

/** Two rows with one mark: neither can be right by itself. */
function noteTwins(rows: readonly ReadRow[]): void {
  const byMark = new Map<string, ReadRow[]>();
  for (const row of rows) {
    if (!row.mark) continue;
    const same = byMark.get(row.mark);
    if (same) same.push(row);
    else byMark.set(row.mark, [row]);
  }
  for (const [mark, same] of byMark) {
    if (same.length < 2) continue;
    const numbers = same.slice(0, 7).map((r) => r.row);
    for (const row of same) row.problems.push({ field: 'mark', reason: message('import.row-mark-twice', { mark, rows: numbers.filter((n) => n !== row.row) }) });
  }
}
