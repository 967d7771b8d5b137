import type { FireCurve } from '@mantlet/common';
import { astmE119Curve } from './astm-e119/time-temperature-table.js';
import { slowHeatingCurve } from './en-1363-2/slow-heating-curve.js';
import { parametricFire } from './en-1991-1-2/annex-a-parametric.js';
import { externalCurve, hydrocarbonCurve, standardCurve } from './en-1991-1-2/clause-3-2-nominal-curves.js';
import type { Formula } from '../formula.js';

export const nominalCurveFormulas: Record<Exclude<FireCurve['kind'], 'parametric'>, Formula<{ minutes: number }>> = {
  standard: standardCurve,
  external: externalCurve,
  hydrocarbon: hydrocarbonCurve,
  'slow-heating': slowHeatingCurve,
  'astm-e119': astmE119Curve,
};

/** Gas temperature in °C as a function of minutes, with everything fixed by the curve worked out once. */
export function gasFunction(curve: FireCurve): (minutes: number) => number {
  if (curve.kind === 'parametric') return parametricFire(curve).gasC;
  const formula = nominalCurveFormulas[curve.kind];
  return (minutes) => formula.evaluate({ minutes });
}

/** θ_g in °C after the given minutes; 20 °C before the fire. */
export function gasTemperatureC(curve: FireCurve, minutes: number): number {
  return minutes <= 0 ? 20 : gasFunction(curve)(minutes);
}

/** α_c in W/m²K: EN 1991-1-2 3.2.1 to 3.2.3 and 3.3.1.1(3); 25 for the test curves of other standards. */
export function convectionCoefficient(curve: FireCurve): number {
  if (curve.kind === 'hydrocarbon') return 50;
  return curve.kind === 'parametric' ? 35 : 25;
}

/** Minutes until a natural fire is back at 20 °C; null for nominal curves, which have no end. */
export function naturalFireDurationMin(curve: FireCurve): number | null {
  return curve.kind === 'parametric' ? parametricFire(curve).durationMin : null;
}
