import type { CurveSample, FireCurve } from '@mantlet/common';
import { convectionCoefficient } from '../standards/gas-temperature.js';
import { FIRE_EMISSIVITY, STEFAN_BOLTZMANN_W_PER_M2K4 } from '../standards/en-1991-1-2/clause-3-1-net-heat-flux.js';
import { GREATEST_UNPROTECTED_STEP_S, LEAST_SECTION_FACTOR_PER_M } from '../standards/en-1993-1-2/clause-4-2-5-1-unprotected.js';
import { STEEL_DENSITY_KG_PER_M3, steelSpecificHeat } from '../standards/en-1993-1-2/clause-3-4-1-thermal-properties.js';
import { gasHistory } from './heating-gas.js';
import type { GasHistory } from './heating-gas.js';

export { protectedHistory, protectedMinutes, protectedTemperature } from './heating-protected.js';
export type { ProtectedHeating } from './heating-protected.js';

export const START_C = 20;
export const LONGEST_MIN = 240;

/** A bare member in a fire. Source: EN 1993-1-2 4.2.5.1 (4.25) with EN 1991-1-2 3.1. */
export interface UnprotectedHeating {
  /** A_m/V, 1/m; not taken below 10 */
  sectionFactorPerM: number;
  /** k_sh; 1 for convex shapes or where the project leaves the effect out */
  shadowFactor: number;
  curve: FireCurve;
  /** ε_m */
  emissivity: number;
  /** s; the standard allows up to 5 */
  stepS?: number;
}

function checkStep(stepS: number, greatest: number): void {
  if (!(stepS > 0 && stepS <= greatest)) throw new RangeError(`Time step ${stepS} s is not between 0 and ${greatest} s`);
}

/** What the steps of one member share. */
class BareSteel {
  readonly gas: GasHistory;
  private readonly rate: number;
  private readonly convection: number;
  private readonly radiation: number;

  constructor(h: UnprotectedHeating, minutes: number) {
    const stepS = h.stepS ?? GREATEST_UNPROTECTED_STEP_S;
    checkStep(stepS, GREATEST_UNPROTECTED_STEP_S);
    this.gas = gasHistory(h.curve, stepS, minutes);
    this.rate = (h.shadowFactor * Math.max(h.sectionFactorPerM, LEAST_SECTION_FACTOR_PER_M) * stepS) / STEEL_DENSITY_KG_PER_M3;
    this.convection = convectionCoefficient(h.curve);
    this.radiation = FIRE_EMISSIVITY * h.emissivity * STEFAN_BOLTZMANN_W_PER_M2K4;
  }

  /** (4.25) over step i, gas taken at the middle of the step */
  rise(i: number, steelC: number): number {
    const kelvin = steelC + 273;
    const square = kelvin * kelvin;
    const flux = this.convection * (this.gas.middleC[i]! - steelC) + this.radiation * (this.gas.middle4[i]! - square * square);
    return (this.rate * flux) / steelSpecificHeat(steelC);
  }
}

/**
 * Steel temperature in °C after `minutes` under a nominal curve; under a natural fire the peak over the
 * whole fire, cooling included, whatever `minutes` says.
 */
export function unprotectedTemperature(h: UnprotectedHeating & { minutes: number }): number {
  if (h.curve.kind === 'parametric') return unprotectedPeak(h).temperatureC;
  const steel = new BareSteel(h, h.minutes);
  const steps = (h.minutes * 60) / steel.gas.stepS;
  const whole = Math.floor(steps + 1e-9);
  let steelC = START_C;
  for (let i = 0; i < whole; i += 1) steelC += steel.rise(i, steelC);
  const rest = steps - whole;
  return rest > 1e-9 ? steelC + rest * steel.rise(whole, steelC) : steelC;
}

/** Highest steel temperature over a whole natural fire, and when. */
export function unprotectedPeak(h: UnprotectedHeating): { temperatureC: number; minutes: number } {
  const steel = new BareSteel(h, 0);
  let peak = START_C;
  let peakStep = 0;
  let steelC = START_C;
  for (let i = 0; i < steel.gas.steps; i += 1) {
    steelC += steel.rise(i, steelC);
    if (steelC > peak) {
      peak = steelC;
      peakStep = i + 1;
    } else if (steel.gas.nodesC[i + 1]! < steel.gas.nodesC[i]!) break; // cooler than its peak in a gas that only cools from here
  }
  return { temperatureC: peak, minutes: (peakStep * steel.gas.stepS) / 60 };
}

/** Minutes until the bare steel reaches targetC, linear within the step; null where it does not within `limitMin` (240). */
export function bareMinutes(h: UnprotectedHeating & { targetC: number; limitMin?: number }): number | null {
  if (h.targetC <= START_C) return 0;
  const limitMin = h.limitMin ?? LONGEST_MIN;
  const steel = new BareSteel(h, limitMin);
  const steps = Math.min(steel.gas.steps, Math.floor((limitMin * 60) / steel.gas.stepS + 1e-9));
  let steelC = START_C;
  for (let i = 0; i < steps; i += 1) {
    const rise = steel.rise(i, steelC);
    if (steelC + rise >= h.targetC) return ((i + (h.targetC - steelC) / rise) * steel.gas.stepS) / 60;
    steelC += rise;
  }
  return null;
}

/** Samples for a chart, one every `everyMin` (1) minute, the last at `minutes`. */
export function unprotectedHistory(h: UnprotectedHeating & { minutes: number; everyMin?: number }): CurveSample[] {
  const steel = new BareSteel(h, h.minutes);
  const steps = Math.min(steel.gas.steps, Math.ceil((h.minutes * 60) / steel.gas.stepS - 1e-9));
  const every = Math.max(1, Math.round(((h.everyMin ?? 1) * 60) / steel.gas.stepS));
  const samples: CurveSample[] = [{ minutes: 0, temperatureC: START_C }];
  let steelC = START_C;
  for (let i = 0; i < steps; i += 1) {
    steelC += steel.rise(i, steelC);
    if ((i + 1) % every === 0 || i === steps - 1) samples.push({ minutes: ((i + 1) * steel.gas.stepS) / 60, temperatureC: steelC });
  }
  return samples;
}
