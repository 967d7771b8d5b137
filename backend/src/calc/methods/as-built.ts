import { message } from '@mantlet/common';
import type { ProductKind, ReadingRules, RegressionFit, ThermalProperties, ThicknessTable } from '@mantlet/common';
import { curveRefusal, groupNames, limitInWords } from '../standards/en-13381/coverage.js';
import { coefficientsOf, fitInWords, placeInFits, regressionTime } from '../standards/en-13381/regression.js';
import { placeInTable, readingInWords, roundUpThickness, tablesFor, thicknessAt } from '../standards/en-13381/thickness-table.js';
import type { AssessedProduct, Determined, ThicknessRequest } from '../types.js';
import { protectedMinutes, protectedTemperature } from './heating.js';
import { heatingOf, placeInThermal } from './thermal-thickness.js';

export type AsBuiltRequest = Omit<ThicknessRequest, 'periodMin'>;

/** The period a member really reaches with the thickness that is on it. */
export interface PeriodReached {
  /** tables: the longest tabulated period whose thickness is met; otherwise whole minutes, downwards. null: not even the shortest assessed */
  periodMin: number | null;
  shortestAssessedMin: number;
  /** the assessment ends here; the member may reach more */
  limitedByAssessment: boolean;
  reading: string;
}

function fromTables(
  tables: readonly ThicknessTable[], kind: ProductKind, request: AsBuiltRequest, thickness: number, rules: ReadingRules,
): Determined<PeriodReached> {
  const candidates = tablesFor(tables, request.group, request.orientation);
  const shortest = candidates[0];
  if (!shortest) return { ok: false, reason: message('product.outside-shape', { group: groupNames[request.group], orientation: request.orientation }) };
  let reached = null as PeriodReached | null;
  let refusal: Determined<PeriodReached> | null = null;
  for (const table of candidates) {
    const place = placeInTable(table, kind, request.sectionFactorPerM, request.criticalTemperatureC, rules);
    if (!place.ok) {
      refusal ??= place;
      continue;
    }
    const needed = thicknessAt(table, place.value);
    if (needed === null) {
      refusal ??= { ok: false, reason: message('product.outside-cell', { sectionFactorPerM: request.sectionFactorPerM, temperatureC: request.criticalTemperatureC, periodMin: table.periodMin }) };
      continue;
    }
    const reading = `${readingInWords(table, place.value)}: ${roundUpThickness(needed, kind)} needed`;
    if (roundUpThickness(needed, kind) > thickness + 1e-9) {
      return { ok: true, value: reached ?? { periodMin: null, shortestAssessedMin: table.periodMin, limitedByAssessment: false, reading } };
    }
    reached = { periodMin: table.periodMin, shortestAssessedMin: reached?.shortestAssessedMin ?? table.periodMin, limitedByAssessment: false, reading };
  }
  if (reached) return { ok: true, value: { ...reached, limitedByAssessment: true } };
  return refusal as Determined<PeriodReached>;
}

function fromFits(fits: readonly RegressionFit[], kind: ProductKind, request: AsBuiltRequest, thickness: number): Determined<PeriodReached> {
  const found = placeInFits(fits, request);
  if (!found.ok) return found;
  const { fit, temperatureC, sectionFactorPerM } = found.value;
  if (thickness < fit.minThickness) {
    return { ok: false, reason: message('product.outside-measured', { measured: thickness, least: fit.minThickness, unit: kind === 'coating' ? 'µm' : 'mm' }) };
  }
  const used = Math.min(thickness, fit.maxThickness);
  const minutes = regressionTime.evaluate({ ...coefficientsOf(fit), thickness: used, temperatureC, sectionFactorPerM });
  const whole = Math.floor(Math.min(minutes, fit.maxPeriodMin) + 1e-9);
  const short = whole < fit.minPeriodMin;
  return {
    ok: true,
    value: {
      periodMin: short ? null : whole,
      shortestAssessedMin: fit.minPeriodMin,
      limitedByAssessment: minutes > fit.maxPeriodMin || thickness > fit.maxThickness,
      reading: `Regression: ${fitInWords(found.value)}, thickness ${used}`,
    },
  };
}

function fromThermal(properties: ThermalProperties, kind: ProductKind, request: AsBuiltRequest, thicknessMm: number): Determined<PeriodReached> {
  const found = placeInThermal(properties, kind, request);
  if (!found.ok) return found;
  if (thicknessMm < properties.minThicknessMm) {
    return { ok: false, reason: message('product.outside-measured', { measured: thicknessMm, least: properties.minThicknessMm, unit: 'mm' }) };
  }
  const used = Math.min(thicknessMm, properties.maxThicknessMm);
  const heating = heatingOf(found.value, request.curve, used);
  const limit = properties.maxPeriodMin;
  const survives = request.curve.kind === 'parametric' && protectedTemperature({ ...heating, minutes: limit }) <= found.value.temperatureC;
  const minutes = survives ? null : protectedMinutes({ ...heating, targetC: found.value.temperatureC, limitMin: limit });
  const whole = Math.floor((minutes ?? limit) + 1e-9);
  return {
    ok: true,
    value: {
      periodMin: whole < 1 ? null : whole,
      shortestAssessedMin: 1,
      limitedByAssessment: minutes === null || thicknessMm > properties.maxThicknessMm,
      reading: `Thermal properties, (4.27): ${used} mm at A/V ${Math.round(found.value.sectionFactorPerM)} to ${limitInWords(found.value.temperatureC)}`,
    },
  };
}

/**
 * As-built check: reads the assessed data the other way, from a measured mean thickness (µm coating with primer deducted, mm board
 * and spray) to the period reached. Nothing is credited beyond the assessed range.
 */
export function periodReached(product: AssessedProduct, request: AsBuiltRequest, thickness: number, rules: ReadingRules): Determined<PeriodReached> {
  const refusal = curveRefusal(product, request.curve);
  if (refusal) return { ok: false, reason: refusal };
  const { evidence, kind } = product;
  if (evidence.form === 'table') return fromTables(evidence.tables, kind, request, thickness, rules);
  if (evidence.form === 'regression') return fromFits(evidence.fits, kind, request, thickness);
  return fromThermal(evidence.properties, kind, request, thickness);
}
