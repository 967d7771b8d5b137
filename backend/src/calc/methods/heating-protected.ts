import type { CurveSample, FireCurve, ThermalProperties } from '@mantlet/common';
import { moistureDwellFormula, GREATEST_PROTECTED_STEP_S } from '../standards/en-1993-1-2/clause-4-2-5-2-protected.js';
import { STEEL_DENSITY_KG_PER_M3, steelSpecificHeat } from '../standards/en-1993-1-2/clause-3-4-1-thermal-properties.js';
import { gasHistory } from './heating-gas.js';
import type { GasHistory } from './heating-gas.js';

/** A protected member in a fire. Source: EN 1993-1-2 4.2.5.2 (4.27), moisture as in ENV 1993-1-2. */
export interface ProtectedHeating {
  /** λ_p: one value, or rising by temperature of the material, linear between rows, the end rows holding beyond them */
  conductivityWPerMK: ThermalProperties['conductivityWPerMK'];
  densityKgPerM3: number;
  specificHeatJPerKgK: number;
  /** p, % by mass; holds the steel at 100 °C for a time */
  moisturePercent: number;
  /** d_p */
  thicknessMm: number;
  /** A_p/V, 1/m */
  sectionFactorPerM: number;
  curve: FireCurve;
  /** s; the standard allows up to 30 */
  stepS?: number;
}

const START_C = 20;
const DWELL_AT_C = 100;
const LONGEST_MIN = 240;

export function conductivityAt(conductivity: ThermalProperties['conductivityWPerMK'], temperatureC: number): number {
  if (typeof conductivity === 'number') return conductivity;
  let before = conductivity[0]!;
  if (temperatureC <= before.temperatureC) return before.value;
  for (const row of conductivity) {
    if (temperatureC <= row.temperatureC) {
      return before.value + ((row.value - before.value) * (temperatureC - before.temperatureC)) / (row.temperatureC - before.temperatureC);
    }
    before = row;
  }
  return before.value;
}

class ProtectedSteel {
  readonly gas: GasHistory;
  /** steel temperature now, and steps done */
  steelC = START_C;
  step = 0;
  private dwellSteps: number;
  private readonly flow: number;
  private readonly ratio: number;
  private readonly conductivity: ThermalProperties['conductivityWPerMK'];

  constructor(h: ProtectedHeating, minutes: number) {
    const stepS = h.stepS ?? GREATEST_PROTECTED_STEP_S;
    if (!(stepS > 0 && stepS <= GREATEST_PROTECTED_STEP_S)) throw new RangeError(`Time step ${stepS} s is not between 0 and ${GREATEST_PROTECTED_STEP_S} s`);
    if (!(h.thicknessMm > 0)) throw new RangeError('A protected member needs a thickness above 0 mm');
    const thicknessM = h.thicknessMm / 1000;
    this.gas = gasHistory(h.curve, stepS, minutes);
    this.conductivity = h.conductivityWPerMK;
    this.flow = (h.sectionFactorPerM * stepS) / (thicknessM * STEEL_DENSITY_KG_PER_M3);
    this.ratio = (h.specificHeatJPerKgK * h.densityKgPerM3 * thicknessM * h.sectionFactorPerM) / STEEL_DENSITY_KG_PER_M3;
    const dwellMin = h.moisturePercent === 0 ? 0 : moistureDwellFormula.evaluate({
      moisturePercent: h.moisturePercent, densityKgPerM3: h.densityKgPerM3, thicknessM,
      conductivityWPerMK: conductivityAt(h.conductivityWPerMK, DWELL_AT_C),
    });
    this.dwellSteps = (dwellMin * 60) / stepS;
  }

  /** (4.27) over the next step: gas at its middle, Δθ_g over the whole of it, λ_p at the mean of gas and steel */
  private rise(): number {
    const gasC = this.gas.middleC[this.step]!;
    const gasRise = this.gas.nodesC[this.step + 1]! - this.gas.nodesC[this.step]!;
    const heat = steelSpecificHeat(this.steelC);
    const phi = this.ratio / heat;
    const lambda = typeof this.conductivity === 'number' ? this.conductivity : conductivityAt(this.conductivity, (gasC + this.steelC) / 2);
    const rise = (lambda * this.flow * (gasC - this.steelC)) / (heat * (1 + phi / 3)) - Math.expm1(phi / 10) * gasRise;
    return gasRise > 0 && rise < 0 ? 0 : rise;
  }

  /** Does one step; water in the protection holds the steel at 100 °C on its way up until it is driven out. */
  advance(): void {
    let rise = this.rise();
    this.step += 1;
    if (this.dwellSteps > 0 && rise > 0 && this.steelC + rise > DWELL_AT_C) {
      const toDwell = (DWELL_AT_C - this.steelC) / rise;
      const held = Math.min(this.dwellSteps, 1 - toDwell);
      this.dwellSteps -= held;
      rise *= 1 - held;
    }
    this.steelC += rise;
  }
}

/** Steel temperature in °C after `minutes` under a nominal curve; the peak over the whole fire where it is natural. */
export function protectedTemperature(h: ProtectedHeating & { minutes: number }): number {
  if (h.curve.kind === 'parametric') return protectedPeak(h).temperatureC;
  const steel = new ProtectedSteel(h, h.minutes);
  const steps = (h.minutes * 60) / steel.gas.stepS;
  const whole = Math.floor(steps + 1e-9);
  while (steel.step < whole) steel.advance();
  const before = steel.steelC;
  if (steps - whole < 1e-9) return before;
  steel.advance();
  return before + (steps - whole) * (steel.steelC - before);
}

export function protectedPeak(h: ProtectedHeating): { temperatureC: number; minutes: number } {
  const steel = new ProtectedSteel(h, 0);
  let peak = START_C;
  let peakStep = 0;
  while (steel.step < steel.gas.steps) {
    steel.advance();
    if (steel.steelC > peak) {
      peak = steel.steelC;
      peakStep = steel.step;
    } else if (steel.gas.nodesC[steel.step]! < steel.steelC) break; // the gas is cooler than the steel and cools on
  }
  return { temperatureC: peak, minutes: (peakStep * steel.gas.stepS) / 60 };
}

/** Minutes until the steel reaches targetC, linear within the step; null where it does not within `limitMin` (240). Stops as soon as it does. */
export function protectedMinutes(h: ProtectedHeating & { targetC: number; limitMin?: number }): number | null {
  if (h.targetC <= START_C) return 0;
  const limitMin = h.limitMin ?? LONGEST_MIN;
  const steel = new ProtectedSteel(h, limitMin);
  const steps = Math.min(steel.gas.steps, Math.floor((limitMin * 60) / steel.gas.stepS + 1e-9));
  while (steel.step < steps) {
    const before = steel.steelC;
    steel.advance();
    if (steel.steelC >= h.targetC) return ((steel.step - 1 + (h.targetC - before) / (steel.steelC - before)) * steel.gas.stepS) / 60;
  }
  return null;
}

/** Samples for a chart, one every `everyMin` (1) minute, the last at `minutes`. */
export function protectedHistory(h: ProtectedHeating & { minutes: number; everyMin?: number }): CurveSample[] {
  const steel = new ProtectedSteel(h, h.minutes);
  const steps = Math.min(steel.gas.steps, Math.ceil((h.minutes * 60) / steel.gas.stepS - 1e-9));
  const every = Math.max(1, Math.round(((h.everyMin ?? 1) * 60) / steel.gas.stepS));
  const samples: CurveSample[] = [{ minutes: 0, temperatureC: START_C }];
  while (steel.step < steps) {
    steel.advance();
    if (steel.step % every === 0 || steel.step === steps) samples.push({ minutes: (steel.step * steel.gas.stepS) / 60, temperatureC: steel.steelC });
  }
  return samples;
}
