import { linearScale, niceTicks } from './chart-scale.js';
import { placeLabels } from './label-layout.js';
import type { Place } from './label-layout.js';
import type { Scale } from './chart-scale.js';

export interface ThicknessMapData {
  /** rising */
  sectionFactorsPerM: readonly number[];
  /** rising */
  temperaturesC: readonly number[];
  /** [section factor][temperature]; null is outside the assessment */
  thickness: readonly (readonly (number | null)[])[];
}
export interface MapCell { row: number; column: number; x: number; y: number; width: number; height: number; value: number | null; /** 0…1 of the greatest thickness */ share: number }
export interface MapLayout { width: number; height: number; plot: { x: number; y: number; width: number; height: number }; x: Scale; y: Scale; cells: MapCell[] }

const margin = { top: 26, right: 14, bottom: 42, left: 52 };
/** The axis begins this many steps before the first row: that row serves every smaller A/V as well. */
function startOf(values: readonly number[]): number {
  const [first = 0, second] = values;
  return Math.max(0, first - (second === undefined ? Math.max(first * 0.2, 10) : second - first));
}
function endOf(values: readonly number[]): number {
  const last = values.at(-1) ?? 0;
  const before = values.at(-2);
  return last + (before === undefined ? 50 : last - before);
}

/**
 * Cells lie where the table is read for them: to the left of their section factor, down to the row before, because the next row up
 * bounds what lies between; and from their design temperature up to the next, because the column at or below θ_cr is read.
 * Both axes are to scale.
 */
export function layoutThicknessMap(data: ThicknessMapData, width: number): MapLayout {
  const { sectionFactorsPerM: factors, temperaturesC: temperatures, thickness } = data;
  const tall = Math.max(220, Math.min(380, temperatures.length * 44));
  const plot = { x: margin.left, y: margin.top, width: Math.max(80, width - margin.left - margin.right), height: tall };
  const x = linearScale([startOf(factors), factors.at(-1) ?? 1], [plot.x, plot.x + plot.width]);
  const y = linearScale([temperatures[0] ?? 0, endOf(temperatures)], [plot.y + plot.height, plot.y]);
  const greatest = Math.max(0, ...thickness.flat().filter((v) => v !== null));
  const cells = factors.flatMap((factor, row) => temperatures.map((temperature, column): MapCell => {
    const value = thickness[row]?.[column] ?? null;
    const left = x(row === 0 ? x.domain[0] : (factors[row - 1] as number));
    const top = y(temperatures[column + 1] ?? y.domain[1]);
    return { row, column, x: left, y: top, width: x(factor) - left, height: y(temperature) - top, value, share: value === null || greatest === 0 ? 0 : value / greatest };
  }));
  return { width, height: plot.y + plot.height + margin.bottom, plot, x, y, cells };
}

/** The cell that an arrow key leads to, staying on the map. */
export function stepCell(at: { row: number; column: number }, key: string, rows: number, columns: number): { row: number; column: number } | null {
  const moved = { ...at };
  if (key === 'ArrowLeft') moved.row -= 1;
  else if (key === 'ArrowRight') moved.row += 1;
  else if (key === 'ArrowUp') moved.column += 1;
  else if (key === 'ArrowDown') moved.column -= 1;
  else if (key === 'Home') moved.row = 0;
  else if (key === 'End') moved.row = rows - 1;
  else return null;
  return { row: Math.min(rows - 1, Math.max(0, moved.row)), column: Math.min(columns - 1, Math.max(0, moved.column)) };
}

/** Labels of an axis, leaving out those that would touch the one before. */
export function thinLabels(values: readonly number[], px: (value: number) => number, least: number): number[] {
  const kept: number[] = [];
  for (const value of values) {
    const last = kept.at(-1);
    if (last === undefined || Math.abs(px(value) - px(last)) >= least) kept.push(value);
  }
  return kept;
}

export interface StepLine { level: number; edges: { x1: number; y1: number; x2: number; y2: number }[] }
/**
 * Lines on the map where the thickness passes a round figure. They run along the cells' edges, since the table is read in steps:
 * a smooth line would promise values between them. No line is drawn against what is outside.
 */
export function stepLines({ cells }: MapLayout, data: ThicknessMapData): StepLine[] {
  const values = data.thickness.flat().filter((v) => v !== null);
  if (values.length === 0) return [];
  const [least, greatest] = [Math.min(...values), Math.max(...values)];
  const at = new Map(cells.map((c) => [`${c.row} ${c.column}`, c]));
  return niceTicks(least, greatest, 6).filter((level) => level > least && level <= greatest).map((level) => ({
    level,
    edges: cells.flatMap((cell) => {
      const differs = (other: MapCell | undefined) => other?.value != null && cell.value !== null && (cell.value >= level) !== (other.value >= level);
      const right = at.get(`${cell.row + 1} ${cell.column}`);
      const above = at.get(`${cell.row} ${cell.column + 1}`);
      return [
        ...(differs(right) ? [{ x1: cell.x + cell.width, x2: cell.x + cell.width, y1: cell.y, y2: cell.y + cell.height }] : []),
        ...(differs(above) ? [{ x1: cell.x, x2: cell.x + cell.width, y1: cell.y, y2: cell.y }] : []),
      ];
    }),
  })).filter((line) => line.edges.length > 0);
}

export interface StepLabel { level: number; text: string; place: Place }
/** Figures on the lines; for maps whose cells are too small to hold their own. One that fits nowhere without covering another is left out. */
export function stepLabels(lines: readonly StepLine[], { plot }: MapLayout, write: (level: number) => string): StepLabel[] {
  const wishes = lines.map(({ level, edges }) => ({
    level, text: write(level), fontSize: 11.5,
    places: [0.5, 0.3, 0.7, 0.15, 0.85].map((share): Place => {
      const edge = edges[Math.min(edges.length - 1, Math.floor(edges.length * share))] as StepLine['edges'][number];
      return { x: (edge.x1 + edge.x2) / 2, y: (edge.y1 + edge.y2) / 2 + 4, anchor: 'middle' };
    }),
  }));
  return placeLabels(wishes, plot).flatMap((place, i) => (place ? [{ level: (wishes[i] as { level: number }).level, text: (wishes[i] as { text: string }).text, place }] : []));
}
