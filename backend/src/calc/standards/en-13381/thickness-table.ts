import { message } from '@mantlet/common';
import type { Message, Orientation, ProductKind, ProfileGroup, ReadingRules, ThicknessTable } from '@mantlet/common';
import type { Determined, RequiredThickness, ThicknessRequest } from '../../types.js';
import { groupNames } from './coverage.js';

/** Where the tables come from; the reading rules beside it are the project's, within what the reports allow. */
export const thicknessTableSource = { standard: 'EN 13381-4 and EN 13381-8', clause: 'report of the assessment, tables of thickness' };

type Refused = { ok: false; reason: Message };
const refuse = (reason: Message): Refused => ({ ok: false, reason });

const sortedTables = new WeakMap<readonly ThicknessTable[], Map<string, ThicknessTable[]>>();

/** The tables of one shape and orientation, shortest period first. */
export function tablesFor(tables: readonly ThicknessTable[], group: ProfileGroup, orientation: Orientation): readonly ThicknessTable[] {
  let groups = sortedTables.get(tables);
  if (!groups) sortedTables.set(tables, (groups = new Map()));
  const key = `${group}/${orientation}`;
  let found = groups.get(key);
  if (!found) {
    found = tables.filter((t) => t.shape === group && t.orientation === orientation).sort((a, b) => a.periodMin - b.periodMin);
    groups.set(key, found);
  }
  return found;
}

/** Index of the last entry that is not above the value; −1 if all are. Axes rise. */
export function lastNotAbove(axis: readonly number[], value: number): number {
  let low = 0;
  let high = axis.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((axis[middle] as number) <= value) low = middle + 1;
    else high = middle;
  }
  return low - 1;
}

export interface TablePlace {
  /** the rows read and the share of the upper one */
  row: number;
  nextRow: number;
  rowShare: number;
  column: number;
  nextColumn: number;
  columnShare: number;
}

/**
 * Where a table is read. A/V below the first row uses the first row; above the last is outside. A temperature above the greatest
 * column uses that column (the thickness for it is enough at a hotter limit too); below the least is outside.
 * Boards are never interpolated: what lies between two tabulated boards cannot be bought.
 */
export function placeInTable(
  table: ThicknessTable, kind: ProductKind, sectionFactorPerM: number, temperatureC: number, rules: ReadingRules,
): { ok: true; value: TablePlace } | Refused {
  const rows = table.sectionFactorsPerM;
  const columns = table.temperaturesC;
  const lastRow = rows.length - 1;
  const greatest = rows[lastRow] as number;
  if (sectionFactorPerM > greatest) return refuse(message('product.outside-section-factor', { sectionFactorPerM, limitPerM: greatest }));
  const column = lastNotAbove(columns, temperatureC);
  if (column < 0) return refuse(message('product.outside-temperature', { temperatureC, limitC: columns[0] as number }));

  const place: TablePlace = { row: 0, nextRow: 0, rowShare: 0, column, nextColumn: column, columnShare: 0 };
  const below = lastNotAbove(rows, sectionFactorPerM);
  if (below >= 0) {
    const onRow = rows[below] === sectionFactorPerM;
    place.row = below;
    place.nextRow = onRow ? below : below + 1;
    if (!onRow) {
      if (rules.sectionFactor === 'linear' && kind !== 'board') {
        place.rowShare = (sectionFactorPerM - (rows[below] as number)) / ((rows[below + 1] as number) - (rows[below] as number));
      } else {
        place.row = below + 1;
      }
    }
  }
  if (rules.temperature === 'linear' && kind !== 'board' && column < columns.length - 1 && columns[column] !== temperatureC) {
    place.nextColumn = column + 1;
    place.columnShare = (temperatureC - (columns[column] as number)) / ((columns[column + 1] as number) - (columns[column] as number));
  }
  return { ok: true, value: place };
}

function alongRow(table: ThicknessTable, row: number, place: TablePlace): number | null {
  const cells = table.thickness[row];
  const here = cells?.[place.column] ?? null;
  if (here === null || place.columnShare === 0) return here;
  const next = cells?.[place.nextColumn] ?? null;
  // the cooler column alone is on the safe side where the hotter one is empty
  return next === null ? here : here + (next - here) * place.columnShare;
}

/** The thickness at a place, or null where a cell that it rests on is empty. */
export function thicknessAt(table: ThicknessTable, place: TablePlace): number | null {
  const here = alongRow(table, place.row, place);
  if (here === null || place.rowShare === 0) return here;
  const next = alongRow(table, place.nextRow, place);
  return next === null ? null : here + (next - here) * place.rowShare;
}

/** Film to the next whole µm, boards and sprays to the next whole mm where the table gives no board of that thickness. */
export function roundUpThickness(thickness: number, kind: ProductKind): number {
  return kind === 'board' ? thickness : Math.ceil(thickness - 1e-9);
}

export function readingInWords(table: ThicknessTable, place: TablePlace): string {
  const row = table.sectionFactorsPerM[place.row];
  const rowText = place.rowShare === 0 ? `A/V ${row}` : `A/V ${row} to ${table.sectionFactorsPerM[place.nextRow]}`;
  const column = table.temperaturesC[place.column];
  const columnText = place.columnShare === 0 ? `${column} °C` : `${column} to ${table.temperaturesC[place.nextColumn]} °C`;
  return `R ${table.periodMin}, ${columnText}, ${rowText}, ${groupNames[table.shape]} section, ${table.orientation}`;
}

/** Required thickness from tables, in the unit of the evidence. Refuses what lies outside, with the limit. */
export function thicknessFromTables(
  tables: readonly ThicknessTable[], kind: ProductKind, request: ThicknessRequest, rules: ReadingRules,
): Determined<RequiredThickness> {
  const { group, orientation, periodMin, sectionFactorPerM, criticalTemperatureC: temperatureC } = request;
  const candidates = tablesFor(tables, group, orientation);
  const longest = candidates[candidates.length - 1];
  if (!longest) return refuse(message('product.outside-shape', { group: groupNames[group], orientation }));
  const table = candidates.find((t) => t.periodMin >= periodMin);
  if (!table) return refuse(message('product.outside-period', { periodMin, limitMin: longest.periodMin }));
  const place = placeInTable(table, kind, sectionFactorPerM, temperatureC, rules);
  if (!place.ok) return place;
  const thickness = thicknessAt(table, place.value);
  if (thickness === null) return refuse(message('product.outside-cell', { sectionFactorPerM, temperatureC, periodMin: table.periodMin }));
  const rounded = roundUpThickness(thickness, kind);
  return { ok: true, value: { thickness: rounded, layers: kind === 'board' ? [rounded] : null, reading: readingInWords(table, place.value) } };
}
