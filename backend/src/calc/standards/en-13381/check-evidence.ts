import { message } from '@mantlet/common';
import type { Evidence, Message, ProductKind, ThermalProperties, ThicknessTable } from '@mantlet/common';
import { checkFits, turnedRange } from './check-fits.js';
import { formNames, groupNames } from './coverage.js';
import { stacksOf } from './stacks.js';

/** Faults of one kind in a file are seldom alone; a reader is helped by the first few. */
const mostPerTable = 5;

export function tableName(t: Pick<ThicknessTable, 'shape' | 'orientation' | 'periodMin'>): string {
  return `Table R ${t.periodMin}, ${groupNames[t.shape]}, ${t.orientation}`;
}

function axisFaults(table: ThicknessTable, axis: readonly number[], name: string): Message[] {
  const index = axis.findIndex((v, i) => i > 0 && !(v > (axis[i - 1] as number)));
  return index < 0 ? [] : [message('product.axis-not-rising', { table: tableName(table), axis: name, index: index + 1 })];
}

function shapeFaults(table: ThicknessTable): Message[] {
  const name = tableName(table);
  const rows = table.sectionFactorsPerM.length;
  const columns = table.temperaturesC.length;
  if (table.thickness.length !== rows) {
    return [message('product.table-shape', { table: name, problem: `${table.thickness.length} rows of thickness for ${rows} section factors` })];
  }
  const wrong = table.thickness.findIndex((r) => r.length !== columns);
  if (wrong >= 0) {
    const problem = `row ${wrong + 1} (A/V ${table.sectionFactorsPerM[wrong]}) has ${table.thickness[wrong]?.length} values for ${columns} temperatures`;
    return [message('product.table-shape', { table: name, problem })];
  }
  if (table.thickness.every((r) => r.every((c) => c === null))) return [message('product.table-empty', { table: name })];
  return [...axisFaults(table, table.sectionFactorsPerM, 'section factors'), ...axisFaults(table, table.temperaturesC, 'temperatures')];
}

/** Compares each cell with the nearest filled cell before it, so that an empty cell hides nothing. */
function monotonicFaults(table: ThicknessTable): Message[] {
  const name = tableName(table);
  const faults: Message[] = [];
  const { sectionFactorsPerM: rows, temperaturesC: columns, thickness } = table;
  const above: ({ row: number; value: number } | null)[] = columns.map(() => null);
  thickness.forEach((cells, r) => {
    let left: { column: number; value: number } | null = null;
    cells.forEach((value, c) => {
      if (value === null) return;
      const up = above[c];
      if (up && value < up.value) {
        faults.push(message('product.falls-with-section-factor', {
          table: name, temperatureC: columns[c] as number, fromPerM: rows[up.row] as number, toPerM: rows[r] as number, from: up.value, to: value,
        }));
      }
      if (left && value > left.value) {
        faults.push(message('product.rises-with-temperature', {
          table: name, sectionFactorPerM: rows[r] as number, fromC: columns[left.column] as number, toC: columns[c] as number, from: left.value, to: value,
        }));
      }
      above[c] = { row: r, value };
      left = { column: c, value };
    });
  });
  return faults.slice(0, mostPerTable);
}

/** Cells that two consecutive periods both give must not fall with the period. */
function periodFaults(shorter: ThicknessTable, longer: ThicknessTable): Message[] {
  const faults: Message[] = [];
  shorter.sectionFactorsPerM.forEach((sectionFactorPerM, r) => {
    const row = longer.sectionFactorsPerM.indexOf(sectionFactorPerM);
    shorter.temperaturesC.forEach((temperatureC, c) => {
      const column = longer.temperaturesC.indexOf(temperatureC);
      const from = shorter.thickness[r]?.[c] ?? null;
      const to = longer.thickness[row]?.[column] ?? null;
      if (from !== null && to !== null && to < from) {
        faults.push(message('product.falls-with-period', { table: tableName(shorter), nextTable: tableName(longer), sectionFactorPerM, temperatureC, from, to }));
      }
    });
  });
  return faults.slice(0, mostPerTable);
}

function checkTables(tables: readonly ThicknessTable[]): Message[] {
  const faults = tables.flatMap((t) => {
    const shape = shapeFaults(t);
    return shape.length > 0 ? shape : monotonicFaults(t);
  });
  const groups = new Map<string, ThicknessTable[]>();
  for (const t of tables) {
    const key = `${t.shape}/${t.orientation}`;
    groups.set(key, [...(groups.get(key) ?? []), t]);
  }
  for (const group of groups.values()) {
    group.sort((a, b) => a.periodMin - b.periodMin);
    group.forEach((t, i) => {
      const next = group[i + 1];
      if (!next) return;
      if (next.periodMin === t.periodMin) faults.push(message('product.table-twice', { table: tableName(t) }));
      else faults.push(...periodFaults(t, next));
    });
  }
  return faults;
}

function checkThermal(p: ThermalProperties, kind: ProductKind): Message[] {
  const where = 'Thermal properties';
  if (kind === 'coating') return [message('product.form-not-for-kind', { form: formNames.thermal, kind })];
  const faults = [
    ...turnedRange(where, 'thickness', p.minThicknessMm, p.maxThicknessMm),
    ...turnedRange(where, 'A/V', p.minSectionFactorPerM, p.maxSectionFactorPerM),
  ];
  if (Array.isArray(p.conductivityWPerMK)) {
    const points = p.conductivityWPerMK;
    const index = points.findIndex((v, i) => i > 0 && !(v.temperatureC > (points[i - 1]?.temperatureC ?? 0)));
    if (index >= 0) faults.push(message('product.axis-not-rising', { table: where, axis: 'temperatures of the conductivity', index: index + 1 }));
  }
  if (faults.length > 0) return faults;
  for (const stockMm of p.stockThicknessesMm) {
    const fits = Array.from({ length: p.maxLayers }, (_, i) => stockMm * (i + 1)).some((t) => t <= p.maxThicknessMm);
    if (!fits) faults.push(message('product.stock-outside-range', { stockMm, leastMm: p.minThicknessMm, greatestMm: p.maxThicknessMm }));
  }
  if (stacksOf(p, kind).length === 0) faults.push(message('product.no-stock', {}));
  return faults;
}

/** What is wrong with uploaded evidence, in words; empty when it can be used. */
export function checkEvidence(evidence: Evidence, kind: ProductKind): Message[] {
  if (evidence.form === 'table') return checkTables(evidence.tables);
  if (evidence.form === 'regression') return checkFits(evidence.fits);
  return checkThermal(evidence.properties, kind);
}
