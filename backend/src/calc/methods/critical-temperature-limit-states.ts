import { explain } from '../formula.js';
import type { WorkingStep } from '../formula.js';
import { bendingResistanceFormula, kappa1, kappa2, shearLoss, shearReductionFormula, shearResistanceFormula } from '../standards/en-1993-1-2/clause-4-2-3-3-bending.js';
import { tensionResistanceFormula } from '../standards/en-1993-1-2/clause-4-2-3-1-tension.js';
import {
  ELASTIC_MODULUS_MPA, bracedLengthFactor, bucklingReductionFormula, bucklingShare, compressionResistanceFormula, slendernessFormula, slendernessInFireFormula,
} from '../standards/en-1993-1-2/clause-4-2-3-2-compression.js';
import { STRENGTH_ENDS_C, kE, kY, table31Rows, table31Source, temperatureOfKy } from '../standards/en-1993-1-2/table-3-1.js';
import { citation } from '../formula.js';
import type { CriticalTemperatureCase, LimitStateResult } from '../types.js';
import type { SectionClass } from '../standards/en-1993-1-1/table-5-2.js';
import type { MemberDesign, MemberType } from '@mantlet/common';
import type { FireEffect } from './fire-effect.js';

/** One limit state of one member: effect and resistance in N or N·mm. `bare` asks with κ1 of an unprotected member. */
export interface LimitState {
  name: LimitStateResult['name'];
  clause: string;
  unit: LimitStateResult['unit'];
  effect: number;
  resistance: (temperatureC: number, bare: boolean) => number;
  /** highest temperature with effect ≤ resistance; asked only where the effect is carried at 20 °C */
  temperature: (bare: boolean) => number;
  /** the lines of working that hold at every temperature */
  explainFirst?: (working: WorkingStep[]) => void;
  /** the lines of working at one temperature */
  explainAt: (temperatureC: number, working: WorkingStep[]) => void;
}

export type Material = { fy: number; gamma: number };

export function tableStep(symbol: string, temperatureC: number, value: number): WorkingStep {
  return {
    what: symbol === 'k_y,θ' ? 'Reduction of the yield strength' : 'Reduction of the modulus of elasticity',
    equation: `${symbol} by Table 3.1, linear between rows`,
    inputs: [{ symbol: 'θ_a', value: temperatureC, unit: '°C' }], value, unit: '', source: citation(table31Source),
  };
}

export function tension(c: CriticalTemperatureCase, effect: number, { fy, gamma }: Material): LimitState {
  const area = c.properties.areaMm2;
  const input = (temperatureC: number) => ({ areaMm2: area, ky: kY(temperatureC), yieldStrengthMPa: fy, gammaMFi: gamma });
  return {
    name: 'tension', clause: '4.2.3.1', unit: 'kN', effect,
    resistance: (t) => tensionResistanceFormula.evaluate(input(t)),
    temperature: () => temperatureOfKy((effect * gamma) / (area * fy)),
    explainAt: (t, working) => working.push(tableStep('k_y,θ', t, kY(t)), explain(tensionResistanceFormula, input(t)).step),
  };
}

/** Root of χ·k_y = share: the row of Table 3.1 by bisection, then the temperature within it by false position (Illinois). */
export function bucklingTemperature(share: number, slenderness: number, imperfection: number): number {
  const excess = (temperatureC: number) => bucklingShare(temperatureC, slenderness, imperfection) - share;
  let low = 0;
  let high = table31Rows.length - 1;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (excess(table31Rows[middle]![0]) >= 0) low = middle;
    else high = middle;
  }
  let a = table31Rows[low]![0];
  let b = table31Rows[high]![0];
  let above = excess(a);
  let below = excess(b);
  let side = 0;
  for (let i = 0; i < 60 && b - a > 1e-9; i += 1) {
    const between = (a * below - b * above) / (below - above);
    const value = excess(between);
    if (Math.abs(value) <= 1e-13) return between;
    if (value > 0) {
      a = between;
      above = value;
      if (side === 1) below /= 2;
      side = 1;
    } else {
      b = between;
      below = value;
      if (side === -1) above /= 2;
      side = -1;
    }
  }
  return a;
}

export interface CompressionState extends LimitState {
  slendernessY: number;
  slendernessZ: number;
}

export function compression(
  c: CriticalTemperatureCase, rule: MemberDesign['bucklingRule'], systemLengthMm: { y: number; z: number }, effect: number, { fy, gamma }: Material, working: WorkingStep[] | null,
): CompressionState {
  const { areaMm2, iyMm4, izMm4 } = c.properties;
  const factor = bracedLengthFactor[rule];
  const about = (axis: 'y' | 'z') => {
    const input = {
      areaMm2, yieldStrengthMPa: fy, lengthMm: factor * systemLengthMm[axis],
      secondMomentMm4: axis === 'y' ? iyMm4 : izMm4, modulusMPa: ELASTIC_MODULUS_MPA,
    };
    if (working) {
      const { step } = explain(slendernessFormula, input);
      working.push({ ...step, what: `${step.what}, about ${axis}`, note: `buckling length ${factor} of the system length` });
    }
    return slendernessFormula.evaluate(input);
  };
  const y = about('y');
  const z = about('z');
  // one curve serves both axes, so the more slender one governs at every temperature
  const slenderness = Math.max(y, z);
  const imperfection = 0.65 * Math.sqrt(235 / fy);
  return {
    name: 'compression', clause: `4.2.3.2, about ${z >= y ? 'z' : 'y'}`, unit: 'kN', effect, slendernessY: y, slendernessZ: z,
    resistance: (t) => (areaMm2 * fy * bucklingShare(t, slenderness, imperfection)) / gamma,
    temperature: () => bucklingTemperature((effect * gamma) / (areaMm2 * fy), slenderness, imperfection),
    explainAt: (t, steps) => {
      const ky = kY(t);
      const ke = kE(t);
      steps.push(tableStep('k_y,θ', t, ky), tableStep('k_E,θ', t, ke));
      if (ky <= 0) return;
      const inFire = explain(slendernessInFireFormula, { slenderness, ky, ke });
      const chi = explain(bucklingReductionFormula, { slendernessInFire: inFire.value, yieldStrengthMPa: fy });
      steps.push(inFire.step, chi.step, explain(compressionResistanceFormula, { reduction: chi.value, areaMm2, ky, yieldStrengthMPa: fy, gammaMFi: gamma }).step);
    },
  };
}

export function shear(c: CriticalTemperatureCase, effect: number, { fy, gamma }: Material): LimitState {
  const shearAreaMm2 = c.properties.shearAreaZMm2;
  const input = (t: number) => ({ shearAreaMm2, ky: kY(t), yieldStrengthMPa: fy, gammaMFi: gamma });
  const cold = shearResistanceFormula.evaluate(input(20));
  return {
    name: 'shear', clause: '4.2.3.3(6)', unit: 'kN', effect,
    resistance: (t) => cold * kY(t),
    temperature: () => temperatureOfKy(effect / cold),
    explainAt: (t, working) => working.push(tableStep('k_y,θ', t, kY(t)), explain(shearResistanceFormula, input(t)).step),
  };
}

/**
 * The part of the modulus that high shear takes away (EN 1993-1-1 6.2.8): A_w²/(4·t_w) for the webs of an I, a rectangular
 * hollow or a box section in class 1 and 2; the whole modulus otherwise, which is the safe side.
 */
export function shearedModulus(c: CriticalTemperatureCase, modulus: number, plastic: boolean): number {
  const s = c.shape;
  if (!plastic) return modulus;
  if (s.kind === 'i') return ((s.hMm - 2 * s.tfMm) ** 2 * s.twMm) / 4;
  if (s.kind === 'rectangular-hollow') return ((s.hMm - 2 * s.tMm) ** 2 * 2 * s.tMm) / 4;
  if (s.kind === 'box') return ((s.hMm - 2 * s.tfMm) ** 2 * 2 * s.twMm) / 4;
  return modulus;
}

const isBeam = (type: MemberType): boolean => type === 'beam' || type === 'secondary-beam';

/** `continuous`: over a support of a statically indeterminate beam */
export function bending(c: CriticalTemperatureCase, continuous: boolean, effect: FireEffect, sectionClass: SectionClass, { fy, gamma }: Material): LimitState {
  const plastic = sectionClass <= 2;
  const modulus = plastic ? c.properties.wplYMm3 : c.properties.welYMm3;
  const sheared = shearedModulus(c, modulus, plastic);
  const shearCold = (c.properties.shearAreaZMm2 * fy) / (Math.sqrt(3) * gamma);
  const k2 = kappa2(continuous);
  // κ1 is for beams under a slab; a column against a wall is as warm on both flanges for all that is known
  const k1 = (bare: boolean) => (isBeam(c.memberType) ? kappa1(c.exposure.arrangement, !bare) : 1);
  const left = (ky: number) => modulus - (effect.shearZN > 0 ? shearLoss(effect.shearZN, ky * shearCold) * sheared : 0);
  const at = (ky: number, bare: boolean) => Math.min((left(ky) * ky * fy) / (gamma * k1(bare) * k2), left(1) * fy);
  const demand = effect.momentYNmm;
  return {
    name: 'bending', clause: plastic ? '4.2.3.3' : '4.2.3.4', unit: 'kNm', effect: demand,
    resistance: (t, bare) => at(kY(t), bare),
    temperature: (bare) => {
      let ky = (demand * gamma * k1(bare) * k2) / (modulus * fy);
      if (effect.shearZN > 0.5 * ky * shearCold) ky = kyUnderShear((k) => at(k, bare) >= demand, ky);
      return temperatureOfKy(ky);
    },
    explainAt: (t, working) => {
      const ky = kY(t);
      working.push(tableStep('k_y,θ', t, ky));
      if (effect.shearZN > 0.5 * ky * shearCold) {
        working.push(explain(shearReductionFormula, { shearN: effect.shearZN, shearResistanceN: ky * shearCold }).step);
      }
      const input = { modulusMm3: left(ky), ky, yieldStrengthMPa: fy, gammaMFi: gamma, kappa1: k1(false), kappa2: k2 };
      const { step } = explain(bendingResistanceFormula, input);
      working.push({ ...step, value: at(ky, false) });
    },
  };
}

/** Least k_y that still carries the moment beside high shear; the resistance rises with k_y. */
function kyUnderShear(carries: (ky: number) => boolean, from: number): number {
  let low = from;
  let high = 1;
  for (let i = 0; i < 48; i += 1) {
    const middle = (low + high) / 2;
    if (carries(middle)) high = middle;
    else low = middle;
  }
  return high;
}

export const RESISTANCE_CURVE_ENDS_C = STRENGTH_ENDS_C;
