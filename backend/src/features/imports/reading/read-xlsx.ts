import { message } from '@mantlet/common';
import ExcelJS from 'exceljs';
import type { CellValue, Worksheet } from 'exceljs';
import { unprocessable } from '../../../shared/refusal.js';
import { cleanCell, trimGrid } from './cell-grid.js';
import type { CellGrid } from './cell-grid.js';
import { inspectZip } from './inspect-zip.js';
import { fileLimits } from './limits.js';

/** Parts of a sheet that say nothing of its cells' text; some of them make the reader build every cell of a range. */
const unread = [
  'dataValidations', 'conditionalFormatting', 'mergeCells', 'autoFilter', 'hyperlinks', 'drawing', 'picture', 'tableParts', 'extLst',
  'sheetViews', 'rowBreaks', 'pageSetup', 'printOptions', 'pageMargins', 'headerFooter', 'sheetProtection', 'legacyDrawing',
];

/** The visible sheets of a workbook as text. @throws Refusal where it is none, is damaged, or unpacks to too much */
export async function readXlsx(file: string, content: Buffer): Promise<CellGrid[]> {
  const entries = await inspectZip(file, content);
  const other = otherKind(entries);
  if (other) throw unprocessable(message('import.not-a-schedule', { file, kind: other }));
  const workbook = await load(file, content);
  const visible = workbook.worksheets.filter((sheet) => sheet.state === 'visible' || !sheet.state);
  let characters = 0;
  const take = (text: string): string => {
    characters += text.length;
    if (characters > fileLimits.characters) throw unprocessable(message('import.too-much-text', { file, limit: fileLimits.characters }));
    return text;
  };
  return (visible.length ? visible : workbook.worksheets).map((sheet) => ({ name: sheet.name.slice(0, 200), rows: sheetRows(file, sheet, take) }));
}

function otherKind(entries: readonly string[]): string | null {
  const has = (name: RegExp): boolean => entries.some((entry) => name.test(entry));
  if (has(/^xl\/workbook\.xml$/i)) return null;
  if (has(/^xl\/workbook\.bin$/i)) return 'a binary workbook (XLSB)';
  if (has(/^word\//i)) return 'a text document';
  if (has(/^ppt\//i)) return 'a presentation';
  if (has(/^content\.xml$/i)) return 'an OpenDocument file';
  return 'a ZIP archive';
}

async function load(file: string, content: Buffer): Promise<ExcelJS.Workbook> {
  const workbook = new ExcelJS.Workbook();
  // defined names are spelt out cell by cell when read, a whole sheet if they say so; none is needed here
  Object.assign(workbook, { _definedNames: { set model(_: unknown) {}, get model() { return []; } } });
  try {
    await workbook.xlsx.load(content as unknown as ExcelJS.Buffer, { ignoreNodes: unread });
  } catch {
    throw unprocessable(message('import.damaged', { file }));
  }
  return workbook;
}

/** `take` is given every cell's text, and throws where the file holds too much of it. */
function sheetRows(file: string, sheet: Worksheet, take: (text: string) => string): string[][] {
  const rows: string[][] = [];
  sheet.eachRow((row, number) => {
    const cells: string[] = [];
    row.eachCell((cell, column) => {
      const text = column <= fileLimits.columns ? take(cleanCell(cellText(cell.value))) : '';
      if (text) cells[column - 1] = text;
    });
    if (!cells.length) return;
    if (number > fileLimits.rows) throw unprocessable(message('import.too-many-rows', { file, sheet: sheet.name, rows: number, limit: fileLimits.rows }));
    rows[number - 1] = Array.from(cells, (cell) => cell ?? '');
  });
  return trimGrid(Array.from(rows, (row) => row ?? []));
}

/** A cell as its text: formulas by their result, rich text and links by their words, dates as 2026-11-30. */
export function cellText(value: CellValue | undefined): string {
  if (value === null || value === undefined) return '';
  if (typeof value === 'number') return numberText(value);
  if (typeof value === 'boolean') return value ? 'TRUE' : 'FALSE';
  if (value instanceof Date) return Number.isNaN(value.getTime()) ? '' : value.toISOString().slice(0, 10);
  if (typeof value === 'string') return value;
  if ('richText' in value) return value.richText.map((run) => run.text ?? '').join('');
  if ('error' in value) return String(value.error);
  if ('text' in value) return cellText(value.text as CellValue);
  if ('result' in value) return cellText(value.result as CellValue);
  return '';
}

/**
 * A number cell is sure of its value: always a decimal point, and never exactly three decimals, which in text might
 * be a thousands group. 15 digits hide the noise of binary arithmetic.
 */
function numberText(value: number): string {
  if (!Number.isFinite(value)) return '';
  const text = String(Number(value.toPrecision(15)));
  return /\.\d{3}$/.test(text) ? `${text}0` : text;
}
