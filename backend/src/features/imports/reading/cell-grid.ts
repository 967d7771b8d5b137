import { message } from '@mantlet/common';
import { unprocessable } from '../../../shared/refusal.js';
import { fileLimits } from './limits.js';

/** One sheet as text; rows[0] is row 1 of the file, short rows end where their content ends. */
export interface CellGrid {
  name: string;
  rows: string[][];
}

/** Text that a page can show and the database can hold: no control characters, no half surrogates, single spaces. */
export function cleanCell(text: string): string {
  return text
    .slice(0, fileLimits.cellCharacters)
    .replace(/\p{Surrogate}/gu, '\uFFFD')
    .replace(/[\p{Cc}\p{Zs}\p{Zl}\p{Zp}\uFEFF]+/gu, ' ')
    .trim();
}

/** Drops empty cells at row ends and empty rows at the end. */
export function trimGrid(rows: string[][]): string[][] {
  const trimmed = rows.map((row) => {
    let end = row.length;
    while (end > 0 && !row[end - 1]) end -= 1;
    return row.slice(0, end);
  });
  while (trimmed.length && !trimmed[trimmed.length - 1]?.length) trimmed.pop();
  return trimmed;
}

/** A → 0-based 0, AA → 26, the way spreadsheets name columns. */
export function columnLetters(index: number): string {
  let letters = '';
  for (let n = index + 1; n > 0; n = Math.floor((n - 1) / 26)) letters = String.fromCharCode(65 + ((n - 1) % 26)) + letters;
  return letters;
}

/** @throws Refusal where the file is longer or wider than a schedule is read */
export function checkGridSize(file: string, grids: readonly CellGrid[]): void {
  let cells = 0;
  for (const grid of grids) {
    if (grid.rows.length > fileLimits.rows) {
      throw unprocessable(message('import.too-many-rows', { file, sheet: grid.name, rows: grid.rows.length, limit: fileLimits.rows }));
    }
    for (const row of grid.rows) cells += row.length;
  }
  if (cells > fileLimits.cells) throw unprocessable(message('import.too-many-cells', { file, limit: fileLimits.cells }));
}
