import { memberTypeNames, productKindNames, sentence } from '@mantlet/common';
import type { QuantityLineDto } from '@mantlet/common';

export type Cell = string | number | null;
export interface Table {
  head: string[];
  rows: Cell[][];
}

/**
 * Spreadsheets take text that begins with one of these for a formula. A leading apostrophe makes it plain text; numbers are no text.
 * Source: OWASP, CSV injection.
 */
export function plainText(text: string): string {
  return /^[=+\-@\t\r]/.test(text) ? `'${text}` : text;
}
const numeric = (value: string | null): number | null => (value === null ? null : Number(value));

/** One row for each printed line. */
export function linesTable(lines: readonly QuantityLineDto[], names: Record<string, string>, currency: string): Table {
  const named = (id: string): string => names[id] ?? '';
  const columns: [string, (line: QuantityLineDto) => Cell][] = [
    ['Level', (l) => named(l.levelId)], ['Zone', (l) => named(l.zoneId)], ['System', (l) => named(l.productId)], ['Kind', (l) => productKindNames[l.kind]],
    ['Thickness', (l) => l.thickness], ['Thickness unit', (l) => l.thicknessUnit], ['Layers', (l) => l.layers?.join(' + ') ?? null],
    ['Member type', (l) => memberTypeNames[l.memberType]], ['Section', (l) => l.profile], ['Applied', (l) => (l.onSite ? 'on site' : 'off site')],
    ['Marks', (l) => l.marks], ['Pieces', (l) => l.pieces], ['Length m', (l) => numeric(l.lengthM)],
    ['Gross m²', (l) => numeric(l.grossM2)], ['End laps m²', (l) => numeric(l.endLapM2)], ['Openings m²', (l) => numeric(l.openingM2)],
    ['Coat-back m²', (l) => numeric(l.coatBackM2)], ['Net m²', (l) => numeric(l.netM2)], ['Volume m³', (l) => numeric(l.volumeM3)],
    ['Litres', (l) => numeric(l.litres)], ['kg', (l) => numeric(l.kg)], ['Sheet m²', (l) => numeric(l.sheetM2)],
    ['Wet film µm', (l) => numeric(l.wetFilmUm)], ['Coats', (l) => l.coats],
    [`Material ${currency}`, (l) => numeric(l.materialCost)], [`Labour ${currency}`, (l) => numeric(l.labourCost)], [`Cost ${currency}`, (l) => numeric(l.cost)],
    ['Not determined', (l) => l.missing.map(sentence).join(' ') || null],
  ];
  return { head: columns.map(([head]) => head), rows: lines.map((line) => columns.map(([, value]) => value(line))) };
}

function csvCell(cell: Cell): string {
  if (cell === null) return '';
  if (typeof cell === 'number') return String(cell);
  const text = plainText(cell);
  return /[",\r\n;]/.test(text) ? `"${text.replace(/"/g, '""')}"` : text;
}

/** RFC 4180, with a byte order mark so that m² and µm are read as UTF-8. */
export function csvOf(table: Table): string {
  return `\uFEFF${[table.head, ...table.rows].map((row) => row.map(csvCell).join(',')).join('\r\n')}\r\n`;
}
