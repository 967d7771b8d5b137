import { message, sentence } from '@mantlet/common';
import { unprocessable } from '../../../shared/refusal.js';
import { checkGridSize } from './cell-grid.js';
import type { CellGrid } from './cell-grid.js';
import { decodeText } from './decode-text.js';
import { fileKind } from './file-kind.js';
import { readCsv } from './read-csv.js';
import { readXlsx } from './read-xlsx.js';

export interface ReadSchedule {
  sheets: CellGrid[];
  notes: string[];
}

/** An uploaded schedule as sheets of text. @throws Refusal in words where it is none */
export async function readSchedule(file: string, content: Buffer): Promise<ReadSchedule> {
  const read = await readByKind(file, content);
  const sheets = read.sheets.filter((sheet) => sheet.rows.length > 0);
  if (!sheets.length) throw unprocessable(message('import.no-content', { file }));
  checkGridSize(file, sheets);
  return { sheets, notes: read.notes };
}

async function readByKind(file: string, content: Buffer): Promise<ReadSchedule> {
  const kind = fileKind(content);
  if (kind.kind === 'empty') throw unprocessable(message('import.empty-file', { file }));
  if (kind.kind === 'other') throw unprocessable(message('import.not-a-schedule', { file, kind: kind.name }));
  if (kind.kind === 'zip') return { sheets: await readXlsx(file, content), notes: [] };
  const decoded = decodeText(content);
  if (!decoded) throw unprocessable(message('import.not-a-schedule', { file, kind: 'a binary file' }));
  const notes = decoded.guessed ? [sentence(message('import.encoding-guessed', { encoding: decoded.guessed }))] : [];
  return { sheets: [readCsv(file, decoded.text).grid], notes };
}
