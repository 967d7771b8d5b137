import type { CurveSample, MemberChartsDto, MemberResultDto, WorkingStepDto } from '@mantlet/common';
import { formatLimitTemperature } from '@mantlet/common';
import { profileGroup, sectionFactor } from '../sections/index.js';
import { defineFormula, explain } from '../formula.js';
import { gasTemperatureC, naturalFireDurationMin } from '../standards/gas-temperature.js';
import type { MemberCase, SectionFactor, ThicknessRequest } from '../types.js';
import { assessMember, bareHeating, orientationOf } from './assess.js';
import { explainCriticalTemperature, resistanceCurve } from './critical-temperature.js';
import { utilisationCurve } from './critical-temperature-utilisation.js';
import { explainThickness, refusedStep } from './explain-thickness.js';
import { protectedHistory, unprotectedHistory } from './heating.js';
import { heatingOf, placeInThermal } from './thermal-thickness.js';

export const sectionFactorFormula = defineFormula<{ heatedPerimeterMm: number; areaMm2: number }>({
  label: 'Section factor',
  source: { standard: 'EN 1993-1-2:2005', clause: 'Tables 4.2 and 4.3' },
  expression: 'A_m/A·1000',
  result: { symbol: 'A_m/V', meaning: 'section factor', unit: '1/m' },
  symbols: {
    heatedPerimeterMm: { symbol: 'A_m', meaning: 'heated perimeter', unit: 'mm' },
    areaMm2: { symbol: 'A', meaning: 'area of the cross-section', unit: 'mm²' },
  },
  evaluate: (i) => (i.heatedPerimeterMm / i.areaMm2) * 1000,
});

export interface ExplainedMember {
  result: MemberResultDto;
  working: WorkingStepDto[];
  /** null where there is no section factor to heat */
  charts: MemberChartsDto | null;
}

function bareSteps(c: MemberCase, own: SectionFactor, result: MemberResultDto): WorkingStepDto[] {
  const heating = bareHeating(c, own);
  if (!heating || result.bareTemperatureC === null) return [];
  const natural = c.curve.kind === 'parametric';
  const limit = result.bareCriticalTemperatureC as number;
  const shadow: WorkingStepDto = {
    what: 'Shadow effect of the bare section', equation: natural ? 'k_sh = [A_m/V]_b/[A_m/V]' : 'k_sh = 0.9·[A_m/V]_b/[A_m/V] for I sections',
    inputs: [{ symbol: '[A_m/V]_b', value: own.boxSectionFactorPerM, unit: '1/m' }, { symbol: 'A_m/V', value: heating.sectionFactorPerM, unit: '1/m' }],
    note: c.design.shadowEffect ? 'never above 1; 1 for convex shapes' : 'not used in this project: 1',
    value: heating.shadowFactor, unit: '', source: 'EN 1993-1-2:2005 4.2.5.1(2)',
  };
  return [shadow, {
    what: natural ? 'Bare steel, peak of the fire' : 'Bare steel at the end of the period', equation: 'θ_a,t+Δt = θ_a,t + Δθ_a,t in steps of 5 s',
    inputs: [
      { symbol: 'k_sh', value: heating.shadowFactor, unit: '' }, { symbol: 'A_m/V', value: heating.sectionFactorPerM, unit: '1/m' },
      { symbol: 't', value: c.periodMin, unit: 'min' },
    ],
    note: result.bareTemperatureC <= limit
      ? `not above ${formatLimitTemperature(limit)}: may stay bare`
      : `above ${formatLimitTemperature(limit)}${result.bareMinutes === null ? '' : `, which it reaches after ${result.bareMinutes.toFixed(1)} min`}: needs protection`,
    value: result.bareTemperatureC, unit: '°C', source: 'EN 1993-1-2:2005 4.2.5.1 (4.25)',
  }];
}

function requestOf(c: MemberCase, result: MemberResultDto): ThicknessRequest {
  return {
    group: profileGroup(c.shape), orientation: orientationOf(c.memberType), periodMin: c.periodMin, curve: c.curve,
    criticalTemperatureC: result.criticalTemperatureC as number, sectionFactorPerM: result.sectionFactorPerM as number,
  };
}

function pairs(samples: readonly CurveSample[]): [number, number][] {
  return samples.map((s) => [s.minutes, s.temperatureC]);
}

/** Minutes the drawing shows: the period with room after it, or the whole of a natural fire. */
function horizonOf(c: MemberCase): number {
  return naturalFireDurationMin(c.curve) ?? Math.min(Math.ceil(c.periodMin * 1.25), 240);
}

function protectedPoints(c: MemberCase, result: MemberResultDto, minutes: number): [number, number][] | null {
  const { product } = c;
  if (!product || product.evidence.form !== 'thermal' || result.requiredThickness === null) return null;
  const place = placeInThermal(product.evidence.properties, product.kind, requestOf(c, result));
  return place.ok ? pairs(protectedHistory({ ...heatingOf(place.value, c.curve, result.requiredThickness), minutes })) : null;
}

function utilisationOf({ method, utilisation, verdict }: MemberResultDto): MemberChartsDto['utilisation'] {
  const points = verdict === 'under-strength' || utilisation === null ? null : utilisationCurve(method);
  return points === null || utilisation === null ? null : { value: utilisation, points };
}

function chartsOf(c: MemberCase, own: SectionFactor, result: MemberResultDto): MemberChartsDto | null {
  const heating = bareHeating(c, own);
  if (!heating) return null;
  const minutes = horizonOf(c);
  const { basis, memberType, shape, properties, steel, exposure, design, accepted } = c;
  return {
    resistance: resistanceCurve({ basis, memberType, shape, properties, steel, exposure, design, accepted }).map((r) => ({
      limitState: r.limitState, unit: r.unit, effect: r.effect, points: r.points.map((p) => [p.temperatureC, p.resistance] as [number, number]),
    })),
    utilisation: utilisationOf(result),
    fire: Array.from({ length: Math.floor(minutes) + 1 }, (_, minute) => [minute, gasTemperatureC(c.curve, minute)]),
    bare: pairs(unprotectedHistory({ ...heating, minutes })),
    protected: protectedPoints(c, result, minutes),
    periodMin: c.periodMin,
  };
}

/** A member's sheet: the result of `assessMember` with the working of every number and the curves of its drawing. */
export function explainMember(c: MemberCase): ExplainedMember {
  const result = assessMember(c);
  const { basis, memberType, shape, properties, steel, exposure, design, accepted } = c;
  const working: WorkingStepDto[] = [];
  const factor = sectionFactor(shape, properties, exposure, c.protectionForm);
  if (factor.ok) working.push(explain(sectionFactorFormula, factor.value).step);
  working.push(...explainCriticalTemperature({ basis, memberType, shape, properties, steel, exposure, design, accepted }).working);
  if (factor.ok) working.push(...bareSteps(c, factor.value, result));
  if (c.product && result.requiredThickness !== null) {
    const required = { thickness: result.requiredThickness, layers: result.layers, reading: result.evidenceReading ?? '' };
    working.push(...explainThickness(c.product, requestOf(c, result), required));
  }
  if (result.reason) working.push(refusedStep(result.reason, result.verdict === 'outside' ? (c.product?.name ?? '') : ''));
  return { result, working, charts: factor.ok ? chartsOf(c, factor.value, result) : null };
}
