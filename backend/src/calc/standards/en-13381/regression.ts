import { message } from '@mantlet/common';
import type { Message, ProductKind, RegressionFit } from '@mantlet/common';
import { defineFormula } from '../../formula.js';
import type { Determined, RequiredThickness, ThicknessRequest } from '../../types.js';
import { groupNames, limitInWords } from './coverage.js';

export interface RegressionInput {
  a0: number; a1: number; a2: number; a3: number; a4: number; a5: number; a6: number; a7: number;
  thickness: number;
  temperatureC: number;
  sectionFactorPerM: number;
}

/** A coating's evidence counts in µm, a board's or spray's in mm; the working names which. */
export const EVIDENCE_UNIT = 'µm or mm';

const coefficient = (n: number) => ({ symbol: `a_${n}`, meaning: 'regression coefficient of the assessment', unit: '' });
const coefficientSymbols = {
  a0: coefficient(0), a1: coefficient(1), a2: coefficient(2), a3: coefficient(3), a4: coefficient(4), a5: coefficient(5), a6: coefficient(6), a7: coefficient(7),
};
const source = { standard: 'EN 13381-8', clause: 'annex on numerical regression analysis', note: 'clause letter differs between editions', memory: true };

/** Minutes at no thickness: the terms without d_p. */
function constantMinutes(a0: number, a3: number, a6: number, a7: number, temperatureC: number, sectionFactorPerM: number): number {
  return a0 + a3 * temperatureC + (a6 * temperatureC + a7) / sectionFactorPerM;
}

/** Minutes that one more unit of thickness gains: the terms with d_p. */
function gainMinutes(a1: number, a2: number, a4: number, a5: number, temperatureC: number, sectionFactorPerM: number): number {
  return a1 + a4 * temperatureC + (a2 + a5 * temperatureC) / sectionFactorPerM;
}

/** Time for protected steel to reach a design temperature. */
export const regressionTime = defineFormula<RegressionInput>({
  label: 'Time to the design temperature by multiple linear regression',
  source,
  expression: 'a_0 + a_1·d_p + a_2·d_p/(A_m/V) + a_3·θ_a + a_4·d_p·θ_a + a_5·d_p·θ_a/(A_m/V) + a_6·θ_a/(A_m/V) + a_7/(A_m/V)',
  result: { symbol: 't', meaning: 'time to the design temperature', unit: 'min' },
  symbols: {
    ...coefficientSymbols,
    thickness: { symbol: 'd_p', meaning: 'thickness of protection', unit: EVIDENCE_UNIT },
    temperatureC: { symbol: 'θ_a', meaning: 'design temperature of the steel', unit: '°C' },
    sectionFactorPerM: { symbol: 'A_m/V', meaning: 'section factor', unit: '1/m' },
  },
  evaluate: (i) =>
    constantMinutes(i.a0, i.a3, i.a6, i.a7, i.temperatureC, i.sectionFactorPerM)
    + i.thickness * gainMinutes(i.a1, i.a2, i.a4, i.a5, i.temperatureC, i.sectionFactorPerM),
});

/** The same equation solved for the thickness; it is linear in d_p. */
export const regressionThickness = defineFormula<Omit<RegressionInput, 'thickness'> & { periodMin: number }>({
  label: 'Thickness by multiple linear regression, solved from the time',
  source,
  expression: '(t − a_0 − a_3·θ_a − a_6·θ_a/(A_m/V) − a_7/(A_m/V))/(a_1 + a_2/(A_m/V) + a_4·θ_a + a_5·θ_a/(A_m/V))',
  result: { symbol: 'd_p', meaning: 'thickness of protection', unit: EVIDENCE_UNIT },
  symbols: {
    ...coefficientSymbols,
    temperatureC: regressionTime.symbols.temperatureC,
    sectionFactorPerM: regressionTime.symbols.sectionFactorPerM,
    periodMin: { symbol: 't', meaning: 'required period', unit: 'min' },
  },
  evaluate: (i) =>
    (i.periodMin - constantMinutes(i.a0, i.a3, i.a6, i.a7, i.temperatureC, i.sectionFactorPerM))
    / gainMinutes(i.a1, i.a2, i.a4, i.a5, i.temperatureC, i.sectionFactorPerM),
});

export function coefficientsOf(fit: RegressionFit): Omit<RegressionInput, 'thickness' | 'temperatureC' | 'sectionFactorPerM'> {
  const [a0 = 0, a1 = 0, a2 = 0, a3 = 0, a4 = 0, a5 = 0, a6 = 0, a7 = 0] = fit.coefficients;
  return { a0, a1, a2, a3, a4, a5, a6, a7 };
}

const storedCoefficient = (fit: RegressionFit, n: number): number => fit.coefficients[n] as number;

/** Minutes that one more unit of thickness gains; must be above zero for a thickness to follow from a period. */
export function gainPerThickness(fit: RegressionFit, sectionFactorPerM: number, temperatureC: number): number {
  const a = (n: number): number => storedCoefficient(fit, n);
  return gainMinutes(a(1), a(2), a(4), a(5), temperatureC, sectionFactorPerM);
}

/** What `regressionThickness` evaluates, for a fit as it is stored. */
export function solvedThickness(fit: RegressionFit, sectionFactorPerM: number, temperatureC: number, periodMin: number): number {
  const a = (n: number): number => storedCoefficient(fit, n);
  return (periodMin - constantMinutes(a(0), a(3), a(6), a(7), temperatureC, sectionFactorPerM)) / gainPerThickness(fit, sectionFactorPerM, temperatureC);
}

export interface RegressionPlace {
  fit: RegressionFit;
  sectionFactorPerM: number;
  temperatureC: number;
}

/** The fit for a request and the values it is read with: below the tested A/V the least tested, above the tested temperature the greatest. */
export function placeInFits(fits: readonly RegressionFit[], request: Omit<ThicknessRequest, 'periodMin' | 'curve'>): { ok: true; value: RegressionPlace } | { ok: false; reason: Message } {
  const { group, orientation, sectionFactorPerM, criticalTemperatureC } = request;
  const fit = fits.find((f) => f.shape === group && f.orientation === orientation);
  if (!fit) return { ok: false, reason: message('product.outside-shape', { group: groupNames[group], orientation }) };
  if (sectionFactorPerM > fit.maxSectionFactorPerM) {
    return { ok: false, reason: message('product.outside-section-factor', { sectionFactorPerM, limitPerM: fit.maxSectionFactorPerM }) };
  }
  if (criticalTemperatureC < fit.minTemperatureC) {
    return { ok: false, reason: message('product.outside-temperature', { temperatureC: criticalTemperatureC, limitC: fit.minTemperatureC }) };
  }
  const place = {
    fit,
    sectionFactorPerM: Math.max(sectionFactorPerM, fit.minSectionFactorPerM),
    temperatureC: Math.min(criticalTemperatureC, fit.maxTemperatureC),
  };
  if (!(gainPerThickness(fit, place.sectionFactorPerM, place.temperatureC) > 0)) {
    return { ok: false, reason: message('product.no-solution', { sectionFactorPerM: place.sectionFactorPerM, temperatureC: place.temperatureC }) };
  }
  return { ok: true, value: place };
}

export function fitInWords(place: RegressionPlace): string {
  const { fit } = place;
  return `${limitInWords(place.temperatureC)}, A/V ${Math.round(place.sectionFactorPerM)}, ${groupNames[fit.shape]} section, ${fit.orientation}`;
}

/** Required thickness from the regression: never below the least tested, refused above the greatest. */
export function thicknessFromFits(fits: readonly RegressionFit[], kind: ProductKind, request: ThicknessRequest): Determined<RequiredThickness> {
  const found = placeInFits(fits, request);
  if (!found.ok) return found;
  const { fit, sectionFactorPerM, temperatureC } = found.value;
  if (request.periodMin > fit.maxPeriodMin) {
    return { ok: false, reason: message('product.outside-period', { periodMin: request.periodMin, limitMin: fit.maxPeriodMin }) };
  }
  const periodMin = Math.max(request.periodMin, fit.minPeriodMin);
  const solved = solvedThickness(fit, sectionFactorPerM, temperatureC, periodMin);
  if (!Number.isFinite(solved)) return { ok: false, reason: message('product.no-solution', { sectionFactorPerM, temperatureC }) };
  const least = Math.max(solved, fit.minThickness);
  const unit = kind === 'coating' ? 'µm' : 'mm';
  if (least > fit.maxThickness + 1e-9) return { ok: false, reason: message('product.outside-thickness', { greatest: fit.maxThickness, unit }) };
  // rounding up may not leave the tested range
  const thickness = Math.min(Math.ceil(least - 1e-9), fit.maxThickness);
  const reading = `Regression: R ${periodMin}, ${fitInWords(found.value)}${solved < fit.minThickness ? ', least tested thickness' : ''}`;
  return { ok: true, value: { thickness, layers: kind === 'board' ? [thickness] : null, reading } };
}
