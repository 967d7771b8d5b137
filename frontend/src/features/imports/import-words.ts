import type { ImportDto, ImportPreviewDto, ImportResultDto, ImportRowDto, ImportRowState } from '@mantlet/common';
import { importFieldNames, importFields } from '@mantlet/common';
import { count, formatNumber, joinWords } from '../../lib/format.js';

export const stateNames: Record<ImportRowState, string> = { new: 'New', changed: 'Changed', unchanged: 'Unchanged', wrong: 'Wrong' };
export const rowStates = ['new', 'changed', 'unchanged', 'wrong'] as const satisfies readonly ImportRowState[];
export const steps = ['upload', 'columns', 'preview', 'done'] as const;
export type Step = (typeof steps)[number];
export const stepNames: Record<Step, string> = { upload: 'File', columns: 'Columns', preview: 'Check', done: 'Done' };

/** Where an import stands; going back to the columns of a checked one is allowed until it is confirmed. */
export function stepOf(state: ImportDto['state'] | null, back: boolean): Step {
  if (state === null || state === 'abandoned') return 'upload';
  if (state === 'confirmed') return 'done';
  return state === 'previewed' && !back ? 'preview' : 'columns';
}

export function previewHeading({ counts }: Pick<ImportPreviewDto, 'counts'>): string {
  const parts = [counts.new ? `${formatNumber(counts.new)} new` : '', counts.changed ? `${formatNumber(counts.changed)} changed` : '', counts.unchanged ? `${formatNumber(counts.unchanged)} unchanged` : ''].filter(Boolean);
  const right = counts.new + counts.changed + counts.unchanged;
  if (right === 0 && counts.wrong === 0) return 'The file has no rows to bring in';
  if (right === 0) return counts.wrong === 1 ? 'The only row is wrong' : `All ${formatNumber(counts.wrong)} rows are wrong`;
  return `${count(right, 'row')} can be brought in: ${joinWords(parts)}${counts.wrong ? `; ${count(counts.wrong, 'row')} ${counts.wrong === 1 ? 'is' : 'are'} wrong` : ''}`;
}

export function doneHeading(result: ImportResultDto | null): string {
  if (!result) return 'This import is done';
  const parts = [result.added ? `${count(result.added, 'member')} added` : '', result.changed ? `${formatNumber(result.changed)} changed` : '', result.unchanged ? `${formatNumber(result.unchanged)} unchanged` : '', result.leftOut ? `${count(result.leftOut, 'row')} left out` : ''].filter(Boolean);
  return parts.length > 0 ? joinWords(parts) : 'Nothing was different';
}

/** A spreadsheet's name of a column: 0 is A, 26 is AA. */
export function columnName(index: number): string {
  const letter = String.fromCharCode(65 + (index % 26));
  return index < 26 ? letter : columnName(Math.floor(index / 26) - 1) + letter;
}

/** The values of a row that say what it is, in one line and always in the same order. A member already there as the file has it needs none. */
export function rowInWords({ state, values }: Pick<ImportRowDto, 'state' | 'values'>): string {
  if (state === 'unchanged') return 'As it stands';
  return importFields.filter((field) => field !== 'mark' && values[field]).map((field) => `${importFieldNames[field]} ${values[field] ?? ''}`).join(', ');
}

const limitMb = 10;
/** What can be said of a file before sending it; the server looks at its content. Null: nothing against it. */
export function fileProblem(file: Pick<File, 'name' | 'size'>): string | null {
  if (!/\.(csv|txt|xlsx)$/i.test(file.name)) return `${file.name} is not a CSV or XLSX file. Save the schedule as CSV or XLSX and choose that.`;
  if (file.size === 0) return `${file.name} is empty.`;
  if (file.size > limitMb * 1024 * 1024) return `${file.name} is larger than ${limitMb} MB. Split the schedule, or save it without pictures.`;
  return null;
}
