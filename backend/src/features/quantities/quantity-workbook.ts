import { memberTypeNames, sentence, splitKeyNames } from '@mantlet/common';
import type { MemberType, QuantitiesDto, QuantityQuery, QuantityTotals } from '@mantlet/common';
import ExcelJS from 'exceljs';
import { linesTable, plainText } from './quantity-table.js';
import type { Cell, Table } from './quantity-table.js';

const amount = (value: string | null): number | null => (value === null ? null : Number(value));

function splitTable(quantities: QuantitiesDto, query: QuantityQuery): Table {
  const { split, names, currency } = quantities;
  const named = (key: string): string => names[key] ?? memberTypeNames[key as MemberType] ?? key;
  const numbers = (t: QuantityTotals): Cell[] => [
    t.pieces, amount(t.grossM2), amount(t.netM2), amount(t.volumeM3), amount(t.litres), amount(t.kg), amount(t.sheetM2), amount(t.cost),
  ];
  return {
    head: [splitKeyNames[query.rows], splitKeyNames[query.columns], 'Pieces', 'Gross m²', 'Net m²', 'Volume m³', 'Litres', 'kg', 'Sheet m²', `Cost ${currency}`],
    rows: [
      ...split.cells.map((cell): Cell[] => [named(cell.row), named(cell.column), ...numbers(cell.totals)]),
      ['Total', null, ...numbers(split.total)],
    ],
  };
}

function purchaseTable({ purchases, names }: QuantitiesDto): Table {
  return {
    head: ['System', 'Delivery', 'Litres', 'Containers', 'Container L', 'Bags', 'Bag kg', 'Board mm', 'Sheets', 'Sheet mm', 'Waste %', 'Not determined'],
    rows: purchases.flatMap((p): Cell[][] => {
      const lead: Cell[] = [
        names[p.productId] ?? '', p.levelId === null ? 'Whole project' : (names[p.levelId] ?? ''), amount(p.litres), p.containers, p.containerL, p.bags, p.bagKg,
      ];
      const missing = p.missing.map(sentence).join(' ') || null;
      if (p.boards.length === 0) return [[...lead, null, null, null, null, missing]];
      return p.boards.map((plan): Cell[] => [
        ...lead, plan.thicknessMm, plan.sheets, `${plan.sheetLengthMm} × ${plan.sheetWidthMm}`, Number((plan.wasteFraction * 100).toFixed(1)), missing,
      ]);
    }),
  };
}

function addSheet(book: ExcelJS.Workbook, name: string, table: Table): void {
  const sheet = book.addWorksheet(name, { views: [{ state: 'frozen', ySplit: 1 }] });
  sheet.addRow(table.head).font = { bold: true };
  for (const row of table.rows) sheet.addRow(row.map((cell) => (typeof cell === 'string' ? plainText(cell) : cell)));
  sheet.columns.forEach((column, i) => {
    column.width = Math.min(40, Math.max(10, ...[table.head, ...table.rows].map((row) => String(row[i] ?? '').length + 2)));
  });
}

/** The split that was asked for, the printed lines it sums, and what to buy. Numbers are numbers. */
export async function workbookOf(quantities: QuantitiesDto, query: QuantityQuery): Promise<Buffer> {
  const book = new ExcelJS.Workbook();
  addSheet(book, 'Split', splitTable(quantities, query));
  addSheet(book, 'Lines', linesTable(quantities.lines, quantities.names, quantities.currency));
  addSheet(book, 'Purchase', purchaseTable(quantities));
  return Buffer.from(await book.xlsx.writeBuffer());
}
