import type { FireCurve, ThermalProperties } from '@mantlet/common';
import { GREATEST_PROTECTED_STEP_S, moistureDwellFormula } from '../standards/en-1993-1-2/clause-4-2-5-2-protected.js';
import { STEEL_DENSITY_KG_PER_M3, steelSpecificHeat } from '../standards/en-1993-1-2/clause-3-4-1-thermal-properties.js';
import { gasHistory } from './heating-gas.js';
import { conductivityAt } from './heating-protected.js';

export const START_C = 20;
const dwellC = 100;
const stepS = GREATEST_PROTECTED_STEP_S;

/** How a run ended: the steel's temperature, and how much of the period had passed. Below 1: it grew too hot on the way. */
export interface ThermalRun {
  steelC: number;
  shareOfPeriod: number;
}

/** e^x − 1 to the last digits for the small x of a step; quicker than the library's, with terms paired so that they need not wait for each other */
function expm1(x: number): number {
  if (x >= 0.1) return Math.expm1(x);
  const square = x * x;
  return x * (1 + x / 2 + square * (1 / 6 + x * (1 / 24) + square * (1 / 120 + x * (1 / 720) + square * (1 / 5040))));
}

/** λ_p by straight lines: below edges[k] it is intercepts[k] + slopes[k]·θ. One value is one line without edges. */
interface Lines {
  edges: Float64Array;
  intercepts: Float64Array;
  slopes: Float64Array;
}
const linesOf = new WeakMap<ThermalProperties, Lines>();

export function conductivityLines(p: ThermalProperties): Lines {
  const known = linesOf.get(p);
  if (known) return known;
  const rows = typeof p.conductivityWPerMK === 'number' ? [] : p.conductivityWPerMK;
  const lines: Lines = { edges: Float64Array.from(rows, (r) => r.temperatureC), intercepts: new Float64Array(rows.length + 1), slopes: new Float64Array(rows.length + 1) };
  for (let k = 0; k <= rows.length; k += 1) {
    const low = rows[k - 1] ?? rows[0];
    const high = rows[k] ?? rows[rows.length - 1];
    const slope = low && high && low !== high ? (high.value - low.value) / (high.temperatureC - low.temperatureC) : 0;
    lines.slopes[k] = slope;
    lines.intercepts[k] = low ? low.value - slope * low.temperatureC : (p.conductivityWPerMK as number);
    if (k === rows.length && high) lines.intercepts[k] = high.value;
  }
  linesOf.set(p, lines);
  return lines;
}

/** What one thickness brings into (4.27), worked out once: flow without λ, and φ·c_a/3 and φ·c_a/10, which do not change. */
export function constantsOf(p: ThermalProperties, sectionFactorPerM: number, thicknessMm: number) {
  const thicknessM = thicknessMm / 1000;
  const ratio = (p.specificHeatJPerKgK * p.densityKgPerM3 * thicknessM * sectionFactorPerM) / STEEL_DENSITY_KG_PER_M3;
  const dwellMin = p.moisturePercent === 0 ? 0 : moistureDwellFormula.evaluate({
    moisturePercent: p.moisturePercent, densityKgPerM3: p.densityKgPerM3, thicknessM, conductivityWPerMK: conductivityAt(p.conductivityWPerMK, dwellC),
  });
  return { flow: (sectionFactorPerM * stepS) / (thicknessM * STEEL_DENSITY_KG_PER_M3), third: ratio / 3, tenth: ratio / 10, dwellSteps: (dwellMin * 60) / stepS };
}

/** (4.27) over one step; c_a·(1 + φ/3) is written c_a + φ·c_a/3 */
export function riseOf(gasC: number, gasRise: number, steelC: number, lambdaFlow: number, third: number, tenth: number): number {
  const heat = steelSpecificHeat(steelC);
  const rise = (lambdaFlow * (gasC - steelC)) / (heat + third) - expm1(tenth / heat) * gasRise;
  return gasRise > 0 && rise < 0 ? 0 : rise;
}

/** Share of a step for which water holds the steel at 100 °C on its way up. */
export function heldShare(dwellSteps: number, steelC: number, rise: number): number {
  return dwellSteps > 0 && rise > 0 && steelC + rise > dwellC ? Math.min(dwellSteps, 1 - (dwellC - steelC) / rise) : 0;
}

/**
 * Protected steel under a nominal curve, to the end of the period or until it passes the limit, for two thicknesses side by side:
 * `protectedTemperature` of heating.ts in the same steps of 30 s, written out for searches that need thousands of runs (a processor
 * does two independent runs in little more time than one). Its spec holds them together. The runs end when the second is too hot.
 */
export function thermalRuns(
  p: ThermalProperties, sectionFactorPerM: number, curve: FireCurve, periodMin: number, thicknessesMm: readonly [thinner: number, thicker: number], limitC: number,
): [ThermalRun, ThermalRun] {
  const { middleC, nodesC } = gasHistory(curve, stepS, periodMin);
  const steps = Math.ceil((periodMin * 60) / stepS - 1e-9);
  const a = constantsOf(p, sectionFactorPerM, thicknessesMm[0]);
  const b = constantsOf(p, sectionFactorPerM, thicknessesMm[1]);
  const { edges, intercepts, slopes } = conductivityLines(p);
  // gas and steel only rise under these curves, so that a line once passed is never needed again
  let lineA = 0;
  let lineB = 0;
  let { dwellSteps: dwellA } = a;
  let { dwellSteps: dwellB } = b;
  let steelA = START_C;
  let steelB = START_C;
  let passedA = -1;
  for (let i = 0; i < steps; i += 1) {
    const gasC = middleC[i] as number;
    const gasRise = (nodesC[i + 1] as number) - (nodesC[i] as number);
    const meanA = (gasC + steelA) / 2;
    const meanB = (gasC + steelB) / 2;
    while (lineA < edges.length && (edges[lineA] as number) < meanA) lineA += 1;
    while (lineB < edges.length && (edges[lineB] as number) < meanB) lineB += 1;
    const lambdaA = (intercepts[lineA] as number) + (slopes[lineA] as number) * meanA;
    const lambdaB = (intercepts[lineB] as number) + (slopes[lineB] as number) * meanB;
    const riseA = riseOf(gasC, gasRise, steelA, a.flow * lambdaA, a.third, a.tenth);
    const riseB = riseOf(gasC, gasRise, steelB, b.flow * lambdaB, b.third, b.tenth);
    const heldA = heldShare(dwellA, steelA, riseA);
    const heldB = heldShare(dwellB, steelB, riseB);
    dwellA -= heldA;
    dwellB -= heldB;
    steelA += riseA * (1 - heldA);
    steelB += riseB * (1 - heldB);
    if (passedA < 0 && steelA > limitC) passedA = i;
    if (steelB > limitC) return [{ steelC: steelA, shareOfPeriod: passedA < 0 ? 1 : passedA / steps }, { steelC: steelB, shareOfPeriod: i / steps }];
  }
  return [{ steelC: steelA, shareOfPeriod: passedA < 0 ? 1 : passedA / steps }, { steelC: steelB, shareOfPeriod: 1 }];
}
