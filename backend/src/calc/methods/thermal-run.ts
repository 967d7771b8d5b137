import type { FireCurve, ThermalProperties } from '@mantlet/common';
import { GREATEST_PROTECTED_STEP_S, moistureDwellFormula } from '../standards/en-1993-1-2/clause-4-2-5-2-protected.js';
import { STEEL_DENSITY_KG_PER_M3, steelSpecificHeat } from '../standards/en-1993-1-2/clause-3-4-1-thermal-properties.js';
import { gasHistory } from './heating-gas.js';
import { conductivityAt } from './heating-protected.js';

const startC = 20;
const dwellC = 100;

/** How a run ended: the steel's temperature, and how much of the period had passed. Below 1: it grew too hot on the way. */
export interface ThermalRun {
  steelC: number;
  shareOfPeriod: number;
}

/** e^x − 1; the series is good to the last digit for the small x of a step, and quicker than the library's */
function expm1(x: number): number {
  return x < 0.1 ? x * (1 + (x / 2) * (1 + (x / 3) * (1 + (x / 4) * (1 + (x / 5) * (1 + (x / 6) * (1 + x / 7)))))) : Math.expm1(x);
}

/**
 * Protected steel under a nominal curve to the end of the period or until it passes the limit: `protectedTemperature` of heating.ts
 * in the same steps of 30 s, written out for searches that need thousands of runs. Its spec holds the two together.
 */
export function thermalRun(
  p: ThermalProperties, sectionFactorPerM: number, curve: FireCurve, periodMin: number, thicknessMm: number, limitC: number,
): ThermalRun {
  const stepS = GREATEST_PROTECTED_STEP_S;
  const gas = gasHistory(curve, stepS, periodMin);
  const { middleC, nodesC } = gas;
  const steps = Math.ceil((periodMin * 60) / stepS - 1e-9);
  const thicknessM = thicknessMm / 1000;
  const flow = (sectionFactorPerM * stepS) / (thicknessM * STEEL_DENSITY_KG_PER_M3);
  const ratio = (p.specificHeatJPerKgK * p.densityKgPerM3 * thicknessM * sectionFactorPerM) / STEEL_DENSITY_KG_PER_M3;
  const rows = typeof p.conductivityWPerMK === 'number' ? null : p.conductivityWPerMK;
  let lambda = rows ? (rows[0] as { value: number }).value : (p.conductivityWPerMK as number);
  let next = 0;
  let dwellSteps = p.moisturePercent === 0 ? 0 : (moistureDwellFormula.evaluate({
    moisturePercent: p.moisturePercent, densityKgPerM3: p.densityKgPerM3, thicknessM, conductivityWPerMK: conductivityAt(p.conductivityWPerMK, dwellC),
  }) * 60) / stepS;
  let steelC = startC;
  for (let i = 0; i < steps; i += 1) {
    const gasC = middleC[i] as number;
    const gasRise = (nodesC[i + 1] as number) - (nodesC[i] as number);
    if (rows) {
      // gas and steel only rise, so that the row is never behind
      const meanC = (gasC + steelC) / 2;
      while (next < rows.length && (rows[next] as { temperatureC: number }).temperatureC < meanC) next += 1;
      const high = rows[Math.min(next, rows.length - 1)] as { temperatureC: number; value: number };
      const low = rows[Math.max(next - 1, 0)] as { temperatureC: number; value: number };
      lambda = high === low || next >= rows.length ? high.value
        : low.value + ((high.value - low.value) * (meanC - low.temperatureC)) / (high.temperatureC - low.temperatureC);
    }
    const heat = steelSpecificHeat(steelC);
    const phi = ratio / heat;
    let rise = (lambda * flow * (gasC - steelC)) / (heat * (1 + phi / 3)) - expm1(phi / 10) * gasRise;
    if (gasRise > 0 && rise < 0) rise = 0;
    if (dwellSteps > 0 && rise > 0 && steelC + rise > dwellC) {
      const held = Math.min(dwellSteps, 1 - (dwellC - steelC) / rise);
      dwellSteps -= held;
      rise *= 1 - held;
    }
    steelC += rise;
    if (steelC > limitC) return { steelC, shareOfPeriod: i / steps };
  }
  return { steelC, shareOfPeriod: 1 };
}
