import { message } from '@mantlet/common';
import { CsvError, parse } from 'csv-parse/sync';
import { unprocessable } from '../../../shared/refusal.js';
import { cleanCell, trimGrid } from './cell-grid.js';
import type { CellGrid } from './cell-grid.js';
import { fileLimits } from './limits.js';

const delimiters = [',', ';', '\t', '|'] as const;
export type Delimiter = (typeof delimiters)[number];

/** A text schedule as one sheet, named after the file. @throws Refusal where it is no CSV */
export function readCsv(file: string, text: string): { grid: CellGrid; delimiter: Delimiter } {
  const delimiter = findDelimiter(text);
  try {
    const rows = records(text, delimiter, fileLimits.rows + 1).map((row) => row.slice(0, fileLimits.columns).map(cleanCell));
    return { grid: { name: file.replace(/\.[^.]*$/, '').slice(0, 200) || 'Schedule', rows: trimGrid(rows) }, delimiter };
  } catch (error) {
    if (!(error instanceof CsvError)) throw error;
    const line = Number((error as unknown as { lines?: number }).lines ?? 1);
    throw unprocessable(message('import.quote-open', { file, line }));
  }
}

/** Every record counts as a row, empty ones too, so that row numbers are those a spreadsheet shows. */
function records(text: string, delimiter: string, atMost: number, lenient = false): string[][] {
  return parse(text, { delimiter, relax_column_count: true, relax_quotes: lenient || hasInchMarks(text), to: atMost, max_record_size: 1_000_000 });
}

/** 12'-6" unquoted is usual in North American schedules; then a quotation mark within a field is only itself. */
function hasInchMarks(text: string): boolean {
  return /\d\s*"\s*(?:[,;\t|\r\n]|$)/.test(text);
}

/** The separator that cuts the first rows into the most columns, most evenly; a first line `sep=;` says it outright. */
export function findDelimiter(text: string): Delimiter {
  const said = /^\uFEFF?"?sep=([,;\t|])"?\r?\n/i.exec(text)?.[1];
  if (said) return said as Delimiter;
  const opening = text.slice(0, 20_000);
  const scored = delimiters.map((delimiter) => ({ delimiter, score: evenness(opening, delimiter) }));
  scored.sort((a, b) => b.score - a.score);
  return scored[0]?.score ? scored[0].delimiter : ',';
}

/** rows that share the commonest width above 1, times that width */
function evenness(text: string, delimiter: string): number {
  let rows: string[][];
  try {
    rows = records(text, delimiter, 60, true);
  } catch {
    // a field cut off by the end of the sample, or quotes that fit another separator
    rows = text.split(/\r?\n/).slice(0, 60).map((line) => line.split(delimiter));
  }
  const counts = new Map<number, number>();
  for (const row of rows) if (row.length > 1) counts.set(row.length, (counts.get(row.length) ?? 0) + 1);
  let best = 0;
  for (const [width, count] of counts) best = Math.max(best, count * (width - 1));
  return best;
}
