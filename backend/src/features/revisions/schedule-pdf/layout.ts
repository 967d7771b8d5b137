import type { Content, CustomTableLayout, TableCell } from 'pdfmake/interfaces.js';

export const PAGE_MARGIN_PT = 36;

/** Hairlines only; the head row stands on a stronger one. Nothing is said by colour. */
export const scheduleLayout: CustomTableLayout = {
  hLineWidth: (i, node) => {
    const head = node.table.headerRows ?? 0;
    if (i === 0 || i === node.table.body.length) return 0.75;
    return i === head && head > 0 ? 0.75 : 0.25;
  },
  vLineWidth: () => 0,
  hLineColor: () => '#000000',
  paddingLeft: () => 4,
  paddingRight: () => 4,
  paddingTop: () => 2,
  paddingBottom: () => 2,
};

/** The same under a title, which has no rule above it. */
const titledLayout: CustomTableLayout = {
  ...scheduleLayout,
  hLineWidth: (i, node) => (i === 0 ? 0 : i === 1 || i === (node.table.headerRows ?? 0) || i === node.table.body.length ? 0.75 : 0.25),
};

/** All edges ruled, as a title block is. */
export const blockLayout: CustomTableLayout = {
  hLineWidth: () => 0.5, vLineWidth: () => 0.5, hLineColor: () => '#000000', vLineColor: () => '#000000',
  paddingLeft: () => 5, paddingRight: () => 5, paddingTop: () => 4, paddingBottom: () => 4,
};

export interface Column<T> {
  head: string;
  width: number | 'auto' | '*';
  /** numbers stand to the right, so that their digits align */
  right?: boolean;
  value: (row: T) => string;
}

type Inline = string | { text: string; sub?: boolean; fontSize?: number; wordBreak?: 'break-all' };

function pieces(text: string, pattern: RegExp, replace: (found: RegExpMatchArray) => Inline[]): Inline[] {
  const out: Inline[] = [];
  let at = 0;
  for (const found of text.matchAll(pattern)) {
    if (found.index > at) out.push(text.slice(at, found.index));
    out.push(...replace(found));
    at = found.index + found[0].length;
  }
  if (at < text.length) out.push(text.slice(at));
  return out;
}

/** the library sets subscripts at 0.58 of their size: this leaves 5.8 pt, which can be read on paper */
const subscript = { sub: true, fontSize: 10 };

/** Symbols as printed: θ_cr with cr below the line. For words of this document's own. */
export const symbols = (text: string): Inline[] => pieces(text, /(\p{L})_(\p{L}[\p{L}\d]*(?:,\p{L}+)*|\d)/gu, ([, letter = '', below = '']) => [letter, { text: below, ...subscript }]);
/** What people or digests put in may have words longer than its column; those are broken anywhere. */
export const breakable = (text: string): string | Inline[] =>
  /\S{25,}/.test(text) ? pieces(text, /\S{25,}/g, ([word]) => [{ text: word, wordBreak: 'break-all' }]) : text;

const cell = (text: string, right: boolean | undefined, style: string): TableCell => ({ text: style === 'head' ? symbols(text) : breakable(text), style, alignment: right ? 'right' : 'left' });

/** A schedule whose title and head are repeated on every page and whose rows are never split. `totals` rows stand out in weight. */
export function schedule<T>(columns: readonly Column<T>[], rows: readonly T[], options: { title?: string; totals?: readonly T[] } = {}): Content {
  const { title, totals = [] } = options;
  // a title in the head stays with its table, whatever page that falls on
  const titleRow: TableCell[][] = title === undefined ? [] : [[{ text: breakable(title), style: 'tableTitle', colSpan: columns.length }, ...columns.slice(1).map(() => '')]];
  return {
    layout: title === undefined ? scheduleLayout : titledLayout,
    margin: [0, 2, 0, 10],
    table: {
      headerRows: 1 + titleRow.length, dontBreakRows: true, keepWithHeaderRows: 1, widths: columns.map((c) => c.width),
      body: [
        ...titleRow,
        columns.map((c) => cell(c.head, c.right, 'head')),
        ...rows.map((row) => columns.map((c) => cell(c.value(row), c.right, 'cell'))),
        ...totals.map((row) => columns.map((c) => cell(c.value(row), c.right, 'total'))),
      ],
    },
  };
}

/** Label and value, one under the other, in two columns of pairs. */
export function facts(pairs: readonly (readonly [label: string, value: string])[]): Content {
  const half = Math.ceil(pairs.length / 2);
  const rows = Array.from({ length: half }, (_, i): TableCell[] => [pairs[i], pairs[half + i]].flatMap((pair): TableCell[] => [
    { text: symbols(pair?.[0] ?? ''), style: 'label' }, { text: breakable(pair?.[1] ?? ''), style: 'cell' },
  ]));
  return { layout: scheduleLayout, margin: [0, 2, 0, 8], table: { widths: [120, '*', 120, '*'], dontBreakRows: true, body: rows.length > 0 ? rows : [['', '', '', '']] } };
}

export const heading = (text: string, options: { pageBreak?: 'before' } = {}): Content => ({ text, style: 'heading', tocItem: true, ...options });
export const subheading = (text: string): Content => ({ text: breakable(text), style: 'subheading' });
export const paragraph = (text: string): Content => ({ text: symbols(text), style: 'paragraph' });
/** 2026-12-01, in UTC: the same wherever it is printed */
export const day = (iso: string): string => iso.slice(0, 10);

export const styles = {
  title: { fontSize: 20, bold: true, margin: [0, 0, 0, 2] as [number, number, number, number] },
  subtitle: { fontSize: 11, margin: [0, 0, 0, 10] as [number, number, number, number] },
  answer: { fontSize: 12, bold: true, margin: [0, 8, 0, 8] as [number, number, number, number] },
  heading: { fontSize: 13, bold: true, margin: [0, 10, 0, 4] as [number, number, number, number] },
  subheading: { fontSize: 10, bold: true, margin: [0, 6, 0, 2] as [number, number, number, number] },
  paragraph: { fontSize: 8.5, margin: [0, 0, 0, 4] as [number, number, number, number] },
  tableTitle: { fontSize: 10, bold: true },
  head: { fontSize: 7.5, bold: true },
  cell: { fontSize: 8 },
  total: { fontSize: 8, bold: true },
  label: { fontSize: 7.5, bold: true },
  running: { fontSize: 7.5 },
};
