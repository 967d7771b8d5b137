import { boxesAlong, placeLabels } from './label-layout.js';
import type { Box, LabelWish, Place } from './label-layout.js';
import { firstReach, linearScale, minuteTicks, niceTicks, valueAt } from './chart-scale.js';
import type { Points, Scale } from './chart-scale.js';

/**
 * One temperature axis for two drawings: load across on the left, minutes across on the right, steel temperature upwards on both.
 * The load meets the resistance at θ_cr; along θ_cr the eye goes on to the minute at which the steel is that hot.
 */
export interface LoadCurve { name: string; /** [°C, resistance] */ points: Points; className: string }
export interface LoadSide {
  curves: readonly LoadCurve[];
  /** in the unit of the curves */
  effect: number;
  /** in two lines: "effect in fire", "331.8 kNm" */
  effectText: readonly [string, string];
  /** what is measured, with its unit: "bending moment, kNm" */
  axis: string;
  format: (value: number | null) => string;
}
export interface SteelReadingData {
  /** null where no load was compared with a resistance: a declared or assumed temperature, or none */
  load: LoadSide | null;
  /** °C against minutes */
  fire: Points;
  bare: Points;
  protected: Points | null;
  periodMin: number;
  /** e.g. "Standard fire" */
  fireName: string;
  /** what the protected steel must not pass; null: not determined, and no line is drawn */
  criticalC: number | null;
  /** "θ_cr 577 °C" */
  criticalText: string;
  /** what the bare steel must not pass: another where κ1 differs without protection */
  bareLimitC: number | null;
}

export interface Pane { plot: Box; x: Scale; y: Scale; ticks: number[] }
export interface PaneLabel extends LabelWish { className?: string; weight?: number }
export interface ReadingLayout { width: number; height: number; joined: boolean; load: Pane | null; time: Pane; temperatures: number[] }

const joinsFrom = 620;
const margin = { left: 18, right: 16, top: 28, bottom: 46, scale: 62 };

function temperatureTop({ fire, bare, load, criticalC }: SteelReadingData): number[] {
  const hottest = Math.max(20, criticalC ?? 0, ...fire.map(([, c]) => c), ...bare.map(([, c]) => c));
  const strengthEnds = Math.max(0, ...(load?.curves.flatMap(({ points }) => points.map(([c]) => c)) ?? []));
  return niceTicks(0, Math.max(hottest, Math.min(strengthEnds, 1200)), 7);
}

function loadScale({ curves, effect }: LoadSide, plot: Box): { x: Scale; ticks: number[] } {
  const most = Math.max(effect, ...curves.flatMap(({ points }) => points.map(([, r]) => r)));
  const ticks = niceTicks(0, most * 1.04, plot.width < 240 ? 4 : 6);
  return { ticks, x: linearScale([0, ticks.at(-1) ?? most], [plot.x, plot.x + plot.width]) };
}

export function layoutReading(data: SteelReadingData, width: number): ReadingLayout {
  const joined = data.load !== null && width >= joinsFrom;
  const temperatures = temperatureTop(data);
  const tall = joined ? Math.round(Math.min(440, Math.max(300, width * 0.36))) : Math.round(Math.min(380, Math.max(250, width * 0.5)));
  const free = width - margin.scale - margin.right;
  const loadWidth = joined ? Math.round((free - margin.left) * 0.42) : free;
  const loadPlot: Box = { x: joined ? margin.left : margin.scale, y: margin.top, width: loadWidth, height: tall };
  const below = data.load && !joined ? loadPlot.y + tall + margin.bottom + margin.top : margin.top;
  const left = joined ? margin.left + loadWidth + margin.scale : margin.scale;
  const timePlot: Box = { x: left, y: below, width: width - left - margin.right, height: tall };
  const y = (plot: Box) => linearScale([0, temperatures.at(-1) ?? 1200], [plot.y + plot.height, plot.y]);
  const to = Math.max(data.periodMin, data.fire.at(-1)?.[0] ?? 0);
  return {
    width, joined, temperatures, height: timePlot.y + tall + margin.bottom,
    load: data.load ? { plot: loadPlot, y: y(loadPlot), ...loadScale(data.load, loadPlot) } : null,
    time: { plot: timePlot, y: y(timePlot), x: linearScale([0, to], [timePlot.x, timePlot.x + timePlot.width]), ticks: minuteTicks(to, timePlot.width < 300 ? 5 : 8) },
  };
}

/** Ticks of the temperature axis that leave room for the figure of θ_cr. */
export const ticksBeside = (ticks: readonly number[], y: Scale, criticalC: number | null): number[] =>
  ticks.filter((t) => criticalC === null || Math.abs(y(t) - y(criticalC)) >= 15);

/** The same curve with the load across and the temperature upwards. */
export const turned = (points: Points): Points => points.map(([c, r]) => [r, c] as const);

/** Small boxes along a curve that is drawn turned. */
function boxesAlongTurned(points: Points, { x, y }: Pane): Box[] {
  return points.slice(1).flatMap(([c, r], i) => {
    const [before, from] = points[i] as readonly [number, number];
    const steps = Math.max(1, Math.ceil(Math.max(Math.abs(x(r) - x(from)), Math.abs(y(c) - y(before))) / 8));
    return Array.from({ length: steps + 1 }, (_, k) => ({ x: x(from + ((r - from) * k) / steps) - 3, y: y(before + ((c - before) * k) / steps) - 3, width: 6, height: 6 }));
  });
}

const around = (x: number, y: number, gap = 10): Place[] => [
  { x: x + gap, y: y - 8, anchor: 'start' }, { x: x - gap, y: y - 8, anchor: 'end' }, { x: x + gap, y: y + 18, anchor: 'start' }, { x: x - gap, y: y + 18, anchor: 'end' },
];
const upright = (x: number, { plot }: Pane): Box => ({ x: x - 1, y: plot.y, width: 2, height: plot.height });
const level = (y: number, { plot }: Pane): Box => ({ x: plot.x, y: y - 1, width: plot.width, height: 2 });

export interface Placed { label: PaneLabel; place: Place }
function place(labels: readonly PaneLabel[], { plot }: Pane, lines: readonly Box[]): Placed[] {
  const bounds = { x: plot.x + 4, y: plot.y + 2, width: plot.width - 6, height: plot.height - 6 };
  return placeLabels(labels, bounds, lines).flatMap((found, i) => (found ? [{ label: labels[i] as PaneLabel, place: found }] : []));
}

/** Names on the left drawing: θ_cr at its crossing, the effect beside its line, each curve beside itself. */
export function loadLabels(side: LoadSide, pane: Pane, { criticalC, criticalText }: SteelReadingData): Placed[] {
  const { x, y, plot } = pane;
  const [effectX, foot] = [x(side.effect), plot.y + plot.height];
  const labels: PaneLabel[] = [];
  if (criticalC !== null) {
    const over = y(criticalC) - 7;
    labels.push({ text: criticalText, fontSize: 13.5, weight: 600, className: 'd-attention', places: [{ x: plot.x + plot.width - 4, y: over, anchor: 'end' }, ...around(effectX, y(criticalC))] });
  }
  for (const [i, text] of side.effectText.entries()) {
    const base = foot - 28 + 15 * i;
    labels.push({ text, fontSize: 12, weight: i === 0 ? 400 : 600, className: 'd-attention', places: [{ x: effectX + 7, y: base, anchor: 'start' }, { x: effectX - 7, y: base, anchor: 'end' }, { x: plot.x + 8, y: base, anchor: 'start' }] });
  }
  for (const [i, { name, points }] of side.curves.entries()) {
    const c = 120 + 130 * i;
    const r = valueAt(points, c);
    if (r !== null) labels.push({ text: name, fontSize: 12, places: [{ x: x(r) - 8, y: y(c), anchor: 'end' }, { x: x(r) + 8, y: y(c), anchor: 'start' }] });
  }
  const lines = [...side.curves.flatMap(({ points }) => boxesAlongTurned(points, pane)), upright(effectX, pane), ...(criticalC === null ? [] : [level(y(criticalC), pane)])];
  return place(labels, pane, lines);
}

/** When bare and protected steel reach what they must not pass; null where they do not, as far as drawn. */
export const reachedAfter = (data: SteelReadingData): { bare: number | null; protected: number | null } => ({
  bare: data.bareLimitC === null ? null : firstReach(data.bare, data.bareLimitC),
  protected: data.criticalC === null || !data.protected ? null : firstReach(data.protected, data.criticalC),
});

export function timeLabels(data: SteelReadingData, pane: Pane): Placed[] {
  const { x, y, plot } = pane;
  const { criticalC, bareLimitC, periodMin } = data;
  const [to, foot] = [x.domain[1], plot.y + plot.height];
  const reached = reachedAfter(data);
  const labels: PaneLabel[] = [{ text: `R ${periodMin}`, fontSize: 13.5, weight: 600, places: [{ x: x(periodMin) + 6, y: foot - 12, anchor: 'start' }, { x: x(periodMin) - 6, y: foot - 12, anchor: 'end' }] }];
  const minutes = (at: number, limit: number): PaneLabel => ({ text: `${Math.floor(at)} min`, fontSize: 12, weight: 600, places: around(x(at), y(limit)) });
  if (reached.bare !== null && bareLimitC !== null) labels.push(minutes(reached.bare, bareLimitC));
  if (reached.protected !== null && criticalC !== null) labels.push(minutes(reached.protected, criticalC));
  if (criticalC !== null && !data.load) labels.push({ text: data.criticalText, fontSize: 13.5, weight: 600, className: 'd-attention', places: [{ x: x(to) - 6, y: y(criticalC) - 7, anchor: 'end' }, { x: x(to) - 6, y: y(criticalC) + 17, anchor: 'end' }, { x: plot.x + 8, y: y(criticalC) - 7, anchor: 'start' }] });
  const named: [string, Points | null, number, string, boolean][] = [
    ['fire', data.fire, to * 0.12, 'd-sub', true], ['bare steel', data.bare, to * 0.3, '', false], ['protected steel', data.protected, to * 0.5, 'd-settled-text', false],
  ];
  for (const [text, points, at, className, above] of named) {
    const value = points && valueAt(points, at);
    if (value === null) continue;
    const [up, down]: [Place, Place] = [{ x: x(at) - 4, y: y(value) - 8, anchor: 'end' }, { x: x(at) + 8, y: y(value) + 16, anchor: 'start' }];
    labels.push({ text, fontSize: 12, className, places: above ? [up, down] : [down, up] });
  }
  const curves = [data.fire, data.bare, ...(data.protected ? [data.protected] : [])];
  return place(labels, pane, [upright(x(periodMin), pane), ...(criticalC === null ? [] : [level(y(criticalC), pane)]), ...curves.flatMap((points) => boxesAlong(points, x, y))]);
}
