import type { FireCurve } from '@mantlet/common';
import { gasFunction, naturalFireDurationMin } from '../standards/gas-temperature.js';

/** Gas temperatures of one curve at one step, worked out once and shared by every member under that curve. */
export interface GasHistory {
  stepS: number;
  /** whole steps held */
  steps: number;
  /** °C at the middle of each step, and (θ_g + 273)⁴ of it */
  middleC: Float64Array;
  middle4: Float64Array;
  /** °C at the start of each step, and at the end of the last */
  nodesC: Float64Array;
}

const NOMINAL_HORIZON_MIN = 240;
const MAX_KEPT = 32;
const kept = new Map<string, GasHistory>();

export function curveKey(curve: FireCurve): string {
  if (curve.kind !== 'parametric') return curve.kind;
  return `p/${curve.openingFactor}/${curve.thermalAbsorptivity}/${curve.fireLoadTotalMjPerM2}/${curve.limitTimeMin}`;
}

function build(curve: FireCurve, stepS: number, minutes: number): GasHistory {
  const gas = gasFunction(curve);
  const steps = Math.ceil((minutes * 60) / stepS - 1e-9);
  const history = { stepS, steps, middleC: new Float64Array(steps), middle4: new Float64Array(steps), nodesC: new Float64Array(steps + 1) };
  history.nodesC[0] = 20;
  for (let i = 0; i < steps; i += 1) {
    const middle = gas(((i + 0.5) * stepS) / 60);
    history.middleC[i] = middle;
    history.middle4[i] = (middle + 273) ** 4;
    history.nodesC[i + 1] = gas(((i + 1) * stepS) / 60);
  }
  return history;
}

/** At least `minutes` long; a natural fire is held to its end. The same inputs always give the same numbers: keeping them only saves time. */
export function gasHistory(curve: FireCurve, stepS: number, minutes: number): GasHistory {
  const horizon = Math.max(minutes, naturalFireDurationMin(curve) ?? NOMINAL_HORIZON_MIN);
  const key = `${curveKey(curve)}|${stepS}`;
  const found = kept.get(key);
  if (found && found.steps * stepS >= horizon * 60 - 1e-6) return found;
  const made = build(curve, stepS, horizon);
  if (kept.size >= MAX_KEPT) kept.delete(kept.keys().next().value as string);
  kept.set(key, made);
  return made;
}
