import { STEEL_DENSITY_KG_PER_M3, assessMember, convectionCoefficient, gasTemperatureC, requiredThickness, steelSpecificHeat } from '../calc/index.js';
import type { BareSolver, MemberCase, Solvers, ThicknessRequest } from '../calc/index.js';
import type { MemberResultDto, ThermalProperties } from '@mantlet/common';

/**
 * The job done the obvious way, as a yardstick: each member alone, in the largest step that EN 1993-1-2 allows (5 s bare, 30 s
 * protected), the gas temperature worked out anew in every step, thicknesses tried from the thinnest. Nothing is shared or remembered.
 * It is also a second opinion: it must come to the same results.
 */
const bareStepS = 5;
const protectedStepS = 30;
const longestMin = 240;

const plainBare: BareSolver = (heating, periodMin, limitC) => {
  const convection = convectionCoefficient(heating.curve);
  const rate = (heating.shadowFactor * Math.max(heating.sectionFactorPerM, 10) * bareStepS) / STEEL_DENSITY_KG_PER_M3;
  const periodSteps = (periodMin * 60) / bareStepS;
  let steelC = 20;
  let minutes: number | null = null;
  let atPeriodC = steelC;
  for (let i = 0; i < (longestMin * 60) / bareStepS; i += 1) {
    const gasC = gasTemperatureC(heating.curve, ((i + 0.5) * bareStepS) / 60);
    const flux = convection * (gasC - steelC) + heating.emissivity * 5.67e-8 * ((gasC + 273) ** 4 - (steelC + 273) ** 4);
    const before = steelC;
    steelC += (rate * flux) / steelSpecificHeat(steelC);
    if (minutes === null && steelC >= limitC) minutes = ((i + (limitC - before) / (steelC - before)) * bareStepS) / 60;
    if (i + 1 === periodSteps) atPeriodC = steelC;
    if (minutes !== null && i + 1 >= periodSteps) break;
  }
  return { temperatureC: atPeriodC, minutes };
};

function conductivity(p: ThermalProperties, temperatureC: number): number {
  const rows = p.conductivityWPerMK;
  if (typeof rows === 'number') return rows;
  const after = rows.findIndex((r) => r.temperatureC >= temperatureC);
  const high = rows[after === -1 ? rows.length - 1 : after];
  const low = rows[after <= 0 ? (after === -1 ? rows.length - 1 : 0) : after - 1];
  if (!high || !low || high === low) return high?.value ?? 0;
  return low.value + ((high.value - low.value) * (temperatureC - low.temperatureC)) / (high.temperatureC - low.temperatureC);
}

/** Steel at the end of the period under a thickness, by (4.27) with the dwell at 100 °C. */
export function plainProtectedC(p: ThermalProperties, request: ThicknessRequest, thicknessMm: number): number {
  const d = thicknessMm / 1000;
  const factor = Math.max(request.sectionFactorPerM, p.minSectionFactorPerM);
  let dwellS = ((p.moisturePercent * p.densityKgPerM3 * d * d) / (5 * conductivity(p, 100))) * 60;
  let steelC = 20;
  for (let i = 0; i < (request.periodMin * 60) / protectedStepS; i += 1) {
    const minute = (i * protectedStepS) / 60;
    const gasC = gasTemperatureC(request.curve, minute + protectedStepS / 120);
    const gasRise = gasTemperatureC(request.curve, minute + protectedStepS / 60) - gasTemperatureC(request.curve, minute);
    const heat = steelSpecificHeat(steelC) * STEEL_DENSITY_KG_PER_M3;
    const phi = (p.specificHeatJPerKgK * p.densityKgPerM3 * d * factor) / heat;
    const flow = (conductivity(p, (gasC + steelC) / 2) * factor * (gasC - steelC) * protectedStepS) / (d * heat * (1 + phi / 3));
    let rise = flow - Math.expm1(phi / 10) * gasRise;
    if (rise < 0 && gasRise > 0) rise = 0;
    if (dwellS > 0 && rise > 0 && steelC + rise > 100) {
      const share = (100 - steelC) / rise;
      const heldS = Math.min(dwellS, (1 - share) * protectedStepS);
      dwellS -= heldS;
      rise *= 1 - heldS / protectedStepS;
    }
    steelC += rise;
  }
  return steelC;
}

function plainThicknesses(p: ThermalProperties): number[] {
  const totals = new Set<number>();
  if (p.stockThicknessesMm.length === 0) {
    for (let t = p.minThicknessMm; t <= p.maxThicknessMm; t += p.thicknessStepMm) totals.add(t);
    return [...totals];
  }
  let sums = [0];
  for (let layer = 0; layer < p.maxLayers; layer += 1) {
    sums = sums.flatMap((s) => p.stockThicknessesMm.map((t) => s + t));
    for (const s of sums) if (s >= p.minThicknessMm && s <= p.maxThicknessMm) totals.add(s);
  }
  return [...totals].sort((a, b) => a - b);
}

/** Reads everything as the product does, but finds a thermal thickness by trying each in turn. */
const plainThickness: Solvers['thickness'] = (product, request, rules) => {
  if (product.evidence.form !== 'thermal') return requiredThickness(product, request, rules);
  const p = product.evidence.properties;
  const limitC = Math.min(request.criticalTemperatureC, p.maxTemperatureC);
  const found = plainThicknesses(p).find((t) => plainProtectedC(p, request, t) <= limitC);
  // refusals carry words, which are no part of the arithmetic: leave them to the one place that has them
  const inRange = request.sectionFactorPerM <= p.maxSectionFactorPerM && request.periodMin <= p.maxPeriodMin;
  if (found === undefined || !inRange) return requiredThickness(product, request, rules);
  return { ok: true, value: { thickness: found, layers: null, reading: `R ${request.periodMin}` } };
};

export function assessPlainly(cases: readonly MemberCase[]): MemberResultDto[] {
  return cases.map((c) => assessMember(c, { bare: plainBare, thickness: plainThickness }));
}
