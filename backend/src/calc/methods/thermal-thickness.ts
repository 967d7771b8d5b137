import { formatNumber, message } from '@mantlet/common';
import type { FireCurve, Message, ProductKind, ThermalProperties } from '@mantlet/common';
import { formNames } from '../standards/en-13381/coverage.js';
import { stacksOf } from '../standards/en-13381/stacks.js';
import type { Determined, RequiredThickness, ThicknessRequest } from '../types.js';
import { protectedMinutes, protectedTemperature } from './heating.js';
import { leastIndex } from './least-index.js';

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

/** Whether steel under this thickness stays at or below the design temperature, through the period or, in a natural fire, to its end. */
export function holds(place: ThermalPlace, curve: FireCurve, periodMin: number, thicknessMm: number): boolean {
  const heating = heatingOf(place, curve, thicknessMm);
  if (curve.kind === 'parametric') return protectedTemperature({ ...heating, minutes: periodMin }) <= place.temperatureC;
  // stops as soon as the steel is too hot, which is soon for a thickness that is far from enough
  const minutes = protectedMinutes({ ...heating, targetC: place.temperatureC, limitMin: periodMin });
  return minutes === null || minutes >= periodMin;
}

/** Where earlier searches of the same data ended: a nearby case starts there. Only the number of steps depends on it, never the answer. */
const guesses = new WeakMap<ThermalProperties, Map<number, number>>();

function guessKey(place: ThermalPlace, curve: FireCurve, periodMin: number): number {
  return (Math.round(Math.log(place.sectionFactorPerM) * 12) * 64 + Math.round(place.temperatureC / 20)) * 512 + periodMin + curve.kind.length / 32;
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
  let known = guesses.get(properties);
  if (!known) guesses.set(properties, (known = new Map()));
  const key = guessKey(place, curve, periodMin);
  const index = leastIndex(stacks.length, (i) => holds(place, curve, periodMin, (stacks[i] as { thicknessMm: number }).thicknessMm), known.get(key));
  if (known.size > 20_000) known.clear();
  known.set(key, index);
  const stack = stacks[index];
  if (!stack) return { ok: false, reason: message('product.outside-thickness', { greatest: greatest.thicknessMm, unit: 'mm' }) };
  const layers = stack.layers && stack.layers.length > 1 ? ` in layers of ${stack.layers.join(' + ')} mm` : '';
  const reading = `Thermal properties, (4.27): R ${periodMin}, ${formatNumber(place.temperatureC)} °C, A/V ${formatNumber(place.sectionFactorPerM)}${layers}`;
  return { ok: true, value: { thickness: stack.thicknessMm, layers: stack.layers, reading } };
}
