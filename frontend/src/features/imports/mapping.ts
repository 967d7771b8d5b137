import type { ImportField, ImportMapping, ImportSheetDto } from '@mantlet/common';
import { importFields, structuralImportFields } from '@mantlet/common';

/** The field a column is read as, or null. */
export const fieldOfColumn = (columns: ImportMapping['columns'], column: number): ImportField | null =>
  importFields.find((field) => columns[field] === column) ?? null;

/** Reads a column as a field. One field comes from one column: the column that had it before is then not read. */
export function readColumnAs(columns: ImportMapping['columns'], column: number, field: ImportField | null): ImportMapping['columns'] {
  const kept = Object.entries(columns).filter(([name, at]) => at !== column && name !== field);
  return { ...(Object.fromEntries(kept) as ImportMapping['columns']), ...(field && { [field]: column }) };
}

/** The row of headers as it stands, and the first rows below it under their own numbers in the file. */
export function rowsFromHeader({ firstRows, headers, headerRow: found }: Pick<ImportSheetDto, 'firstRows' | 'headers' | 'headerRow'>, headerRow: number): { headers: string[]; rows: { number: number; cells: string[] }[] } {
  const below = firstRows.slice(headerRow).map((cells, i) => ({ number: headerRow + 1 + i, cells }));
  return { headers: headerRow === found ? headers : firstRows[headerRow - 1] ?? [], rows: below };
}

/** What a person may choose: the structural engineer's columns only with that role. */
export const readableFields = (structural: boolean): ImportField[] =>
  importFields.filter((field) => structural || !(structuralImportFields as readonly ImportField[]).includes(field));

/** Why the columns cannot be checked yet; null: they can. */
export const mappingProblem = (mapping: ImportMapping): string | null =>
  mapping.columns.mark === undefined ? 'Choose the column that holds the mark: it tells one member from another.' : null;
