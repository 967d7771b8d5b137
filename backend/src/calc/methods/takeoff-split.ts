import { Decimal } from '@mantlet/common';
import type { Message, ProductKind, QuantityAmounts, QuantityLineDto, QuantitySplitDto, QuantityTotals, SplitKey } from '@mantlet/common';
import { quantityAmountKeys } from '@mantlet/common';

/** Which amounts a kind of product has; the others are null because they do not apply, not because they are missing. */
const inapplicable: Record<ProductKind, readonly (keyof QuantityAmounts)[]> = {
  coating: ['sheetM2'],
  board: ['litres', 'kg'],
  spray: ['litres', 'sheetM2'],
};

function decimalsOf(text: string): number {
  return text.split('.')[1]?.length ?? 0;
}

/** Sums one amount over the lines it applies to: null where it applies to none, or where any of them lacks it. */
function sumOf(lines: readonly QuantityLineDto[], key: keyof QuantityAmounts): string | null {
  let sum: Decimal | null = null;
  let places = 0;
  for (const line of lines) {
    if (inapplicable[line.kind].includes(key)) continue;
    const value = line[key];
    if (value === null) return null;
    places = Math.max(places, decimalsOf(value));
    sum = (sum ?? new Decimal(0)).plus(value);
  }
  return sum && sum.toFixed(places);
}

const alwaysThere = ['grossM2', 'endLapM2', 'openingM2', 'coatBackM2', 'netM2', 'volumeM3'] as const;

/** The sum of printed lines. */
export function totalOf(lines: readonly QuantityLineDto[]): QuantityTotals {
  const missing = new Map<string, Message>();
  for (const line of lines) for (const m of line.missing) missing.set(JSON.stringify(m), m);
  const sums = Object.fromEntries(quantityAmountKeys.map((key) => [key, sumOf(lines, key)])) as unknown as QuantityAmounts;
  for (const key of alwaysThere) sums[key] ??= key === 'volumeM3' ? '0.0000' : '0.00';
  return { ...sums, lines: lines.length, pieces: lines.reduce((n, l) => n + l.pieces, 0), missing: [...missing.values()] };
}

/** The value of a line under a key. Thicknesses of different products are different bands only by their number and unit. */
export function splitValue(line: QuantityLineDto, key: SplitKey): string {
  switch (key) {
    case 'level': return line.levelId;
    case 'zone': return line.zoneId;
    case 'product': return line.productId;
    case 'thickness': return `${line.thickness} ${line.thicknessUnit}`;
    case 'member-type': return line.memberType;
    case 'profile': return line.profile;
    case 'application': return line.onSite ? 'on-site' : 'off-site';
  }
}

function grouped(lines: readonly QuantityLineDto[], keyOf: (line: QuantityLineDto) => string): Map<string, QuantityLineDto[]> {
  const groups = new Map<string, QuantityLineDto[]>();
  for (const line of lines) {
    const key = keyOf(line);
    const group = groups.get(key);
    if (group) group.push(line);
    else groups.set(key, [line]);
  }
  return groups;
}

/** Lines split by two keys. Each cell, row, column and the whole is a sum of lines, so that the grand total is one number. */
export function splitQuantities(lines: readonly QuantityLineDto[], rows: SplitKey, columns: SplitKey): QuantitySplitDto {
  const totals = (key: SplitKey) => [...grouped(lines, (l) => splitValue(l, key))].map(([k, group]) => ({ key: k, totals: totalOf(group) }));
  const cells = [...grouped(lines, (l) => splitValue(l, rows))].flatMap(([row, inRow]) =>
    [...grouped(inRow, (l) => splitValue(l, columns))].map(([column, group]) => ({ row, column, totals: totalOf(group) })),
  );
  return { rows: totals(rows), columns: totals(columns), cells, total: totalOf(lines) };
}
