import { message, sentence } from '@mantlet/common';
import type { Message, ReadTable, ReadTableDto, ThicknessTable } from '@mantlet/common';
import { checkEvidence } from '../../calc/index.js';
import { unprocessable } from '../../shared/refusal.js';
import type { Issue } from '../../shared/refusal.js';
import { columnLetters, provenDecimalSign, readNumber } from '../imports/file-reading.service.js';
import type { CellGrid } from '../imports/file-reading.service.js';

/** how reports write "not assessed" */
const emptyCell = /^(?:-+|–|—|n\/?a|\/|\*)?$/i;
const unitAtEnd = /\s*(?:°\s*C|℃|µm|μm|um|mm|1\/m|m-1|m⁻¹|m\^-1)\s*$/i;
const limits = { temperatures: 60, sectionFactors: 400 };

/**
 * One thickness table from a sheet of text: the first row with numbers holds the design temperatures (°C), the first column
 * the section factors (1/m), every other cell a thickness; an empty cell or a dash is outside the assessment.
 * @throws Refusal that names every cell at fault
 */
export function readThicknessTable(file: string, grid: CellGrid, options: ReadTable): ReadTableDto {
  const reader = new TableReader(grid.rows);
  const heading = reader.headingRow();
  if (heading < 0) throw unprocessable(message('product.table-no-temperatures', { file }));
  const columns = reader.columnsOf(heading);
  const rows = reader.rowsBelow(heading);
  if (!rows.length) throw unprocessable(message('product.table-no-rows', { file }));
  requireCount('temperatures', columns.length, limits.temperatures);
  requireCount('section factors', rows.length, limits.sectionFactors);
  const scale = scaleOf(options);
  const table: ThicknessTable = {
    shape: options.shape, orientation: options.orientation, periodMin: options.periodMin,
    temperaturesC: columns.map((column) => reader.number(heading, column, 'a temperature between 100 and 1200 °C', (v) => v >= 100 && v <= 1200)),
    sectionFactorsPerM: rows.map((row) => reader.number(row, 0, 'a section factor above 0, up to 1000 1/m', (v) => v > 0 && v <= 1000)),
    thickness: rows.map((row) => columns.map((column) => reader.thickness(row, column, scale))),
  };
  if (reader.issues.length) throw unprocessable(reader.faults[0] as Message, reader.issues.slice(0, 50));
  return { table, messages: [...checkEvidence({ form: 'table', tables: [table] }, options.kind), ...reader.notes] };
}

function requireCount(what: string, found: number, limit: number): void {
  if (found > limit) throw unprocessable(message('product.table-too-large', { what, count: found, limit }));
}

/** to the unit of the evidence */
function scaleOf({ kind, fileUnit }: ReadTable): number {
  const own = kind === 'coating' ? 'µm' : 'mm';
  if (!fileUnit || fileUnit === own) return 1;
  return own === 'µm' ? 1000 : 0.001;
}

class TableReader {
  readonly faults: Message[] = [];
  readonly issues: Issue[] = [];
  readonly notes: Message[] = [];
  private readonly cells: string[][];
  private readonly decimalSign: ReturnType<typeof provenDecimalSign>;

  constructor(rows: string[][]) {
    this.cells = rows.map((row) => row.map((cell) => cell.replace(unitAtEnd, '').trim()));
    this.decimalSign = provenDecimalSign(this.cells.flat());
  }

  headingRow(): number {
    return this.cells.findIndex((row) => row.slice(1).some((cell) => this.parse(cell) !== null));
  }

  /** columns up to the last that the heading row fills */
  columnsOf(heading: number): number[] {
    return Array.from({ length: (this.cells[heading]?.length ?? 1) - 1 }, (_, i) => i + 1);
  }

  /** rows with content; one without any number is a note of the report and is left out, said so */
  rowsBelow(heading: number): number[] {
    return this.cells.flatMap((row, i) => {
      if (i <= heading || row.every((cell) => cell === '')) return [];
      if (row.some((cell) => this.parse(cell) !== null)) return [i];
      this.notes.push(message('product.table-row-left-out', { row: i + 1, text: row.filter(Boolean).join(' ').slice(0, 80) }));
      return [];
    });
  }

  number(row: number, column: number, wanted: string, possible: (value: number) => boolean): number {
    const text = this.cells[row]?.[column] ?? '';
    const value = this.parse(text, possible);
    if (value !== null && possible(value)) return value;
    const fault = message('product.table-cell', { cell: `${columnLetters(column)}${row + 1}`, text, wanted });
    this.faults.push(fault);
    this.issues.push({ path: `${columnLetters(column)}${row + 1}`, message: sentence(fault) });
    return NaN;
  }

  thickness(row: number, column: number, scale: number): number | null {
    if (emptyCell.test(this.cells[row]?.[column] ?? '')) return null;
    const value = this.number(row, column, 'a thickness above 0', (v) => v * scale > 0 && v * scale <= 100_000);
    // 0.62 mm is 620 µm, not 620.0000000000001
    return Number((value * scale).toPrecision(12));
  }

  private parse(text: string, possible?: (value: number) => boolean): number | null {
    const reading = readNumber(text, 'the table', this.decimalSign, possible);
    return reading.ok ? reading.value : null;
  }
}
