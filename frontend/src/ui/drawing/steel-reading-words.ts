import { formatLimitTemperature } from '@mantlet/common';
import { joinWords } from '../../lib/format.js';
import { firstReach, valueAt } from './chart-scale.js';
import type { Points } from './chart-scale.js';
import { reachedAfter } from './steel-reading-layout.js';
import type { LoadCurve, SteelReadingData } from './steel-reading-layout.js';

export const degrees = (value: number | null): string => (value === null ? 'no value' : `${value.toFixed(0)} °C`);
const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

/** The temperature at which a falling resistance meets its effect; null where it starts below it or never falls to it. */
export function crossing(points: Points, effect: number): number | null {
  const [first] = points;
  if (!first || first[1] < effect) return null;
  for (let i = 1; i < points.length; i += 1) {
    const [x0, y0] = points[i - 1] as readonly [number, number];
    const [x1, y1] = points[i] as readonly [number, number];
    if (y0 >= effect && y1 < effect) return x0 + ((x1 - x0) * (y0 - effect)) / (y0 - y1);
  }
  return null;
}

export function curveInWords({ name, points }: LoadCurve, effect: number, format: (value: number | null) => string): string {
  const cold = points[0]?.[1] ?? null;
  const at = crossing(points, effect);
  return [
    `${capital(name)} against steel temperature: ${format(cold)} cold; the effect in fire is ${format(effect)}.`,
    at !== null ? `They meet at ${formatLimitTemperature(at)}.` : cold !== null && cold < effect ? 'The effect is above the resistance from the start.' : 'They do not meet as far as drawn.',
  ].join(' ');
}

/** The drawing in a few sentences, for those who do not see it. */
export function readingInWords(data: SteelReadingData): string {
  const { load, criticalC, bareLimitC, periodMin, fireName } = data;
  const end = (points: Points) => degrees(valueAt(points, periodMin));
  const { bare, protected: held } = reachedAfter(data);
  return [
    ...(load ? load.curves.map((curve) => curveInWords(curve, load.effect, load.format)) : []),
    `${fireName} against time. At ${periodMin} min the fire is at ${end(data.fire)}, bare steel at ${end(data.bare)}${data.protected ? ` and protected steel at ${end(data.protected)}` : ''}.`,
    criticalC === null || bareLimitC === null ? 'The critical temperature is not determined.'
      : bare === null ? `Bare steel stays below ${formatLimitTemperature(bareLimitC)} as far as drawn.`
        : `Bare steel reaches its critical temperature of ${formatLimitTemperature(bareLimitC)} after ${Math.floor(bare)} min.`,
    ...(held !== null && criticalC !== null ? [`Protected steel reaches ${formatLimitTemperature(criticalC)} after ${Math.floor(held)} min.`] : []),
  ].join(' ');
}

export const timeSeries = (data: SteelReadingData): [string, Points][] => [['fire', data.fire], ['bare steel', data.bare], ...(data.protected ? [['protected steel', data.protected] as [string, Points]] : [])];

export const sayAtMinute = (data: SteelReadingData, minute: number): string =>
  `At ${minute} min: ${joinWords(timeSeries(data).map(([name, points]) => `${name} ${degrees(valueAt(points, minute))}`))}`;

/** Both drawings at one steel temperature. */
export function sayAtTemperature(data: SteelReadingData, temperatureC: number): string {
  const { load } = data;
  const after = (name: string, points: Points) => { const at = firstReach(points, temperatureC); return at === null ? `${name} does not get there` : `${name} is there after ${Math.floor(at)} min`; };
  const carried = load ? `${load.curves.map(({ name, points }) => `${name} ${load.format(valueAt(points, temperatureC))}`).join(', ')} against ${load.format(load.effect)}; ` : '';
  return `At ${temperatureC} °C: ${carried}${joinWords(timeSeries(data).slice(1).map(([name, points]) => after(name, points)))}`;
}
