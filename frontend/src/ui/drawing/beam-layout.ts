import type { BeamLoadInput, BeamSupport } from '@mantlet/common';
import { formatNumber } from '../../lib/format.js';
import { textWidth } from './label-layout.js';

type Nullable<T> = T extends unknown ? { [K in keyof T]: T[K] extends number ? number | null : T[K] } : never;
/** The beam as far as it is typed. */
export interface BeamToDraw { supports: BeamSupport; spanMm: number | null; loads: readonly Nullable<BeamLoadInput>[]; lateralSupportsMm: readonly (number | null)[] }

export interface PlacedLoad {
  /** as the form numbers it */
  number: number;
  kind: BeamLoadInput['kind'];
  from: number;
  to: number;
  /** ordinates at both ends, px; upward loads are drawn below the line they stand on, so negative */
  start: number;
  end: number;
  /** the line it stands on */
  base: number;
  label: { x: number; y: number; text: string };
}
export interface BeamLayout { left: number; right: number; axis: number; height: number; loads: PlacedLoad[]; lateral: number[]; /** numbers of loads that are not drawn */ missing: number[] }

const lane = 44;
const tallest = 24;
const margin = 34;
const figure = (value: number) => formatNumber(value, Number.isInteger(value) ? 0 : Number.isInteger(value * 10) ? 1 : 2);

/** What of a load can be drawn: whole numbers given, within the span. */
function extentOf(load: Nullable<BeamLoadInput>, spanMm: number): { from: number; to: number; start: number; end: number; text: string } | null {
  if (load.kind === 'point') {
    const { atMm, forceKn } = load;
    return atMm === null || forceKn === null || atMm < 0 || atMm > spanMm ? null : { from: atMm, to: atMm, start: forceKn, end: forceKn, text: `${figure(forceKn)} kN` };
  }
  const { fromMm, toMm, startKnPerM, endKnPerM } = load;
  if (fromMm === null || toMm === null || startKnPerM === null || endKnPerM === null || fromMm < 0 || toMm > spanMm || toMm <= fromMm) return null;
  return { from: fromMm, to: toMm, start: startKnPerM, end: endKnPerM, text: `${startKnPerM === endKnPerM ? figure(startKnPerM) : `${figure(startKnPerM)} to ${figure(endKnPerM)}`} kN/m` };
}

/**
 * Places along the span to scale; ordinates to scale among loads of one kind, since kN and kN/m share none.
 * Loads that would cover each other stand on lines of their own, one above the other.
 */
export function layOutBeam(beam: BeamToDraw, width: number): BeamLayout | null {
  const { spanMm } = beam;
  if (spanMm === null || !(spanMm > 0)) return null;
  const [left, right] = [margin, width - margin];
  const x = (mm: number) => left + (mm / spanMm) * (right - left);
  const extents = beam.loads.map((load, i) => ({ number: i + 1, kind: load.kind, extent: extentOf(load, spanMm) }));
  const greatest = (kind: string) => Math.max(0, ...extents.flatMap((e) => (e.kind === kind && e.extent ? [Math.abs(e.extent.start), Math.abs(e.extent.end)] : [])));
  const lanes: { from: number; to: number }[][] = [];
  const placed = extents.flatMap(({ number, kind, extent }) => {
    if (!extent) return [];
    const [from, to] = [x(extent.from), x(extent.to)];
    const text = `${number}: ${extent.text}`;
    const wide = textWidth(text, 12) + 8;
    const middle = Math.min(Math.max((from + to) / 2, 2 + wide / 2), width - 2 - wide / 2);
    const taken = { from: Math.min(from, middle - wide / 2), to: Math.max(to, middle + wide / 2) };
    let level = lanes.findIndex((others) => others.every((o) => taken.to < o.from || taken.from > o.to));
    if (level < 0) level = lanes.push([]) - 1;
    lanes[level]?.push(taken);
    const most = greatest(kind);
    const tall = (value: number) => (most === 0 ? 0 : (value / most) * tallest);
    return [{ number, kind, from, to, start: tall(extent.start), end: tall(extent.end), level, label: { x: middle, text } }];
  });
  const axis = Math.max(1, lanes.length) * lane + 8;
  return {
    left, right, axis, height: axis + 62,
    loads: placed.map(({ level, label, ...load }) => {
      const base = axis - 7 - level * lane;
      return { ...load, base, label: { ...label, y: base - tallest - 5 } };
    }),
    lateral: beam.lateralSupportsMm.flatMap((at) => (at === null || at < 0 || at > spanMm ? [] : [x(at)])),
    missing: extents.filter((e) => e.extent === null).map((e) => e.number),
  };
}
