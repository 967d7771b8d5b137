/** Scales, ticks and paths of a line chart. Values are [x, y] pairs with rising x. */
export type Points = readonly (readonly [number, number])[];

export interface Scale {
  (value: number): number;
  invert: (px: number) => number;
  domain: readonly [number, number];
  range: readonly [number, number];
}

export function linearScale(domain: readonly [number, number], range: readonly [number, number]): Scale {
  const span = domain[1] - domain[0] || 1;
  const perUnit = (range[1] - range[0]) / span;
  const scale = (value: number) => range[0] + (value - domain[0]) * perUnit;
  return Object.assign(scale, { invert: (px: number) => domain[0] + (px - range[0]) / perUnit, domain, range });
}

const roundSteps = [1, 2, 2.5, 5, 10];
/** Round ticks from 0 (or the first at or above `from`) that cover the values with at most `most` of them; the last is at or above `to`. */
export function niceTicks(from: number, to: number, most = 6): number[] {
  const span = to - from;
  if (!(span > 0) || !Number.isFinite(span)) return [from, from + 1];
  const power = 10 ** Math.floor(Math.log10(span / most));
  const step = roundSteps.map((s) => s * power).find((s) => Math.ceil(to / s - 1e-9) - Math.floor(from / s + 1e-9) < most) ?? 10 * power;
  return ticksBy(Math.floor(from / step + 1e-9) * step, to, step);
}

const minuteSteps = [5, 10, 15, 20, 30, 60, 120];
/** Ticks of a time axis, at steps a clock has. The axis ends at `to`, which need not be a tick. */
export function minuteTicks(to: number, most = 6): number[] {
  const step = minuteSteps.find((s) => to / s <= most) ?? 240;
  return ticksBy(0, to, step).filter((t) => t <= to + 1e-9);
}

function ticksBy(first: number, to: number, step: number): number[] {
  const count = Math.ceil((to - first) / step - 1e-9);
  return Array.from({ length: count + 1 }, (_, i) => Number((first + i * step).toPrecision(12)));
}

/** The value at x, linear between points; null outside them. */
export function valueAt(points: Points, x: number): number | null {
  for (let i = 0; i < points.length; i += 1) {
    const here = points[i] as readonly [number, number];
    if (here[0] === x) return here[1];
    const next = points[i + 1];
    if (next && here[0] < x && x < next[0]) return here[1] + ((next[1] - here[1]) * (x - here[0])) / (next[0] - here[0]);
  }
  return null;
}

/** The first x at which the line reaches the level from below; null where it never does. */
export function firstReach(points: Points, level: number): number | null {
  for (let i = 1; i < points.length; i += 1) {
    const [x0, y0] = points[i - 1] as readonly [number, number];
    const [x1, y1] = points[i] as readonly [number, number];
    if (y0 < level && y1 >= level) return x0 + ((x1 - x0) * (level - y0)) / (y1 - y0);
  }
  return null;
}

export function linePath(points: Points, x: Scale, y: Scale): string {
  return points.map(([px, py], i) => `${i === 0 ? 'M' : 'L'}${round(x(px))} ${round(y(py))}`).join('');
}

export const round = (value: number): number => Math.round(value * 100) / 100;
