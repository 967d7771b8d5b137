import { message } from '@mantlet/common';
import type { FireCurve, Message, ProductKind, ThermalProperties } from '@mantlet/common';
import { formNames, limitInWords } from '../standards/en-13381/coverage.js';
import { stacksOf } from '../standards/en-13381/stacks.js';
import type { Determined, RequiredThickness, ThicknessRequest } from '../types.js';
import type { Stack } from '../standards/en-13381/stacks.js';
import { protectedTemperature } from './heating.js';
import { thermalField } from './thermal-field.js';
import { thermalRuns } from './thermal-run.js';
import type { ThermalRun } from './thermal-run.js';

export interface ThermalPlace {
  properties: ThermalProperties;
  sectionFactorPerM: number;
  temperatureC: number;
}

/** The values a search works with: below the assessed A/V the least assessed, above the assessed temperature the greatest. */
export function placeInThermal(
  properties: ThermalProperties, kind: ProductKind, request: Pick<ThicknessRequest, 'sectionFactorPerM' | 'criticalTemperatureC'>,
): { ok: true; value: ThermalPlace } | { ok: false; reason: Message } {
  // (4.27) is for passive materials; a reactive coating has no constant thickness to put into it
  if (kind === 'coating') return { ok: false, reason: message('product.form-not-for-kind', { form: formNames.thermal, kind }) };
  const { sectionFactorPerM } = request;
  if (sectionFactorPerM > properties.maxSectionFactorPerM) {
    return { ok: false, reason: message('product.outside-section-factor', { sectionFactorPerM, limitPerM: properties.maxSectionFactorPerM }) };
  }
  return {
    ok: true,
    value: {
      properties,
      sectionFactorPerM: Math.max(sectionFactorPerM, properties.minSectionFactorPerM),
      temperatureC: Math.min(request.criticalTemperatureC, properties.maxTemperatureC),
    },
  };
}

export function heatingOf(place: ThermalPlace, curve: FireCurve, thicknessMm: number) {
  const { conductivityWPerMK, densityKgPerM3, specificHeatJPerKgK, moisturePercent } = place.properties;
  return { conductivityWPerMK, densityKgPerM3, specificHeatJPerKgK, moisturePercent, thicknessMm, sectionFactorPerM: place.sectionFactorPerM, curve };
}

/** Runs two thicknesses; a natural fire is judged on its peak. */
function runBoth(place: ThermalPlace, curve: FireCurve, periodMin: number, thicknessesMm: readonly [number, number]): [ThermalRun, ThermalRun] {
  if (curve.kind !== 'parametric') return thermalRuns(place.properties, place.sectionFactorPerM, curve, periodMin, thicknessesMm, place.temperatureC);
  const peak = (thicknessMm: number): ThermalRun => ({ steelC: protectedTemperature({ ...heatingOf(place, curve, thicknessMm), minutes: periodMin }), shareOfPeriod: 1 });
  return [peak(thicknessesMm[0]), peak(thicknessesMm[1])];
}

/**
 * Where the thickness that just holds lies, judged from one that was run: time gained grows a little slower than thickness, and
 * steel temperature falls about as its three-quarter power. Only the number of runs depends on this, never the answer.
 */
function predicted(thicknessMm: number, { steelC, shareOfPeriod }: ThermalRun, limitC: number): number {
  if (shareOfPeriod < 1) return thicknessMm * (1 / Math.max(shareOfPeriod, 0.05)) ** 1.1;
  return thicknessMm * ((steelC - 20) / (limitC - 20)) ** 1.4;
}

function indexNear(stacks: readonly Stack[], thicknessMm: number): number {
  let low = 0;
  let high = stacks.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((stacks[middle] as Stack).thicknessMm < thicknessMm) low = middle + 1;
    else high = middle;
  }
  return low;
}

/**
 * Index of the least thickness that holds the design temperature; stacks.length where none does. Steel under more thickness is never
 * hotter, so the answer is the one place where holding begins: a thickness that holds beside one that fails. Both are run together.
 */
export function leastThatHolds(stacks: readonly Stack[], place: ThermalPlace, curve: FireCurve, periodMin: number, guess: number): number {
  const limitC = place.temperatureC;
  let fails = -1;
  let holds = stacks.length;
  let at = Math.min(Math.max(guess, 0), stacks.length - 1);
  while (holds - fails > 1) {
    const below = Math.max(at - 1, 0);
    const thinnerMm = (stacks[below] as Stack).thicknessMm;
    const thickerMm = (stacks[at] as Stack).thicknessMm;
    const [thinner, thicker] = runBoth(place, curve, periodMin, [thinnerMm, thickerMm]);
    let next: number;
    if (thicker.steelC > limitC) {
      fails = at;
      next = predicted(thickerMm, thicker, limitC);
    } else {
      holds = thinner.steelC <= limitC ? below : at;
      if (thinner.steelC > limitC) fails = Math.max(fails, below);
      next = predicted(thinnerMm, thinner, limitC);
    }
    at = Math.min(Math.max(indexNear(stacks, next), fails + 1), holds - 1);
  }
  return holds;
}

/** An earlier answer near this case; only the number of runs depends on what is remembered, never the answer. */
interface Remembered {
  thicknessMm: number;
  sectionFactorPerM: number;
  temperatureC: number;
}
const remembered = new WeakMap<ThermalProperties, Map<number, Remembered>>();
const mostRemembered = 20_000;

function neighbourhood(place: ThermalPlace, curve: FireCurve, periodMin: number): number {
  // one whole number, which maps find fastest: periods are below 512 min, names of curves below 32 letters
  return ((Math.round(Math.log(place.sectionFactorPerM) * 8) * 64 + Math.round(place.temperatureC / 30)) * 512 + periodMin) * 32 + curve.kind.length;
}

/** The earlier answer carried over: thickness grows a little slower than A/V, and falls with the temperature allowed. */
function guessed(near: Remembered | undefined, place: ThermalPlace, stacks: readonly Stack[]): number {
  if (!near) return stacks.length >> 1;
  const factor = (place.sectionFactorPerM / near.sectionFactorPerM) ** 0.8;
  return indexNear(stacks, near.thicknessMm * factor * ((near.temperatureC - 20) / (place.temperatureC - 20)) ** 1.4);
}

/** Searches by running, from where an earlier answer near this case suggests. */
function searched(stacks: readonly Stack[], place: ThermalPlace, curve: FireCurve, periodMin: number): number {
  let known = remembered.get(place.properties);
  if (!known) remembered.set(place.properties, (known = new Map()));
  const key = neighbourhood(place, curve, periodMin);
  const index = leastThatHolds(stacks, place, curve, periodMin, guessed(known.get(key), place, stacks));
  if (known.size > mostRemembered) known.clear();
  const stack = stacks[index];
  if (stack) known.set(key, { thicknessMm: stack.thicknessMm, sectionFactorPerM: place.sectionFactorPerM, temperatureC: place.temperatureC });
  return index;
}

/**
 * As `leastThatHolds`, read from the field where that leaves no doubt. Where it does, the member's own runs decide, begun at the
 * thickness read; where the field does not reach (fires other than the smooth nominal curves, periods that are no multiple of 15 min), they do all of it.
 */
export function leastIndex(stacks: readonly Stack[], place: ThermalPlace, curve: FireCurve, periodMin: number): number {
  const read = thermalField(place.properties, stacks, curve)?.leastThatHolds(place.sectionFactorPerM, periodMin, place.temperatureC);
  if (!read) return searched(stacks, place, curve, periodMin);
  return read.certain ? read.index : leastThatHolds(stacks, place, curve, periodMin, read.index);
}

/** Least stocked thickness, stack of layers or step of a spray that holds the design temperature by EN 1993-1-2 (4.27). */
export function thicknessFromThermal(properties: ThermalProperties, kind: ProductKind, request: ThicknessRequest): Determined<RequiredThickness> {
  const found = placeInThermal(properties, kind, request);
  if (!found.ok) return found;
  const { periodMin, curve } = request;
  if (periodMin > properties.maxPeriodMin) {
    return { ok: false, reason: message('product.outside-period', { periodMin, limitMin: properties.maxPeriodMin }) };
  }
  const stacks = stacksOf(properties, kind);
  const greatest = stacks[stacks.length - 1];
  if (!greatest) return { ok: false, reason: message('product.no-stock', {}) };
  const place = found.value;
  const stack = stacks[leastIndex(stacks, place, curve, periodMin)];
  if (!stack) return { ok: false, reason: message('product.outside-thickness', { greatest: greatest.thicknessMm, unit: 'mm' }) };
  const layers = stack.layers && stack.layers.length > 1 ? ` in layers of ${stack.layers.join(' + ')} mm` : '';
  const reading = `Thermal properties, (4.27): R ${periodMin}, ${limitInWords(place.temperatureC)}, A/V ${Math.round(place.sectionFactorPerM)}${layers}`;
  return { ok: true, value: { thickness: stack.thicknessMm, layers: stack.layers, reading } };
}
