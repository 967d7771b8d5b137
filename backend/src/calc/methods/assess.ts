import { memberTypeNames, message, thicknessUnit } from '@mantlet/common';
import type { MemberResultDto, MemberType, Message, Orientation, ProductKind, ProtectionForm } from '@mantlet/common';
import { profileGroup, sectionFactor } from '../sections/index.js';
import { verdictOfReason } from '../standards/en-13381/coverage.js';
import type { CriticalTemperature, Determined, MemberCase, SectionFactor } from '../types.js';
import { criticalTemperature } from './critical-temperature.js';
import { bareField } from './heating-field.js';
import { bareMinutes, unprotectedTemperature } from './heating.js';
import type { UnprotectedHeating } from './heating.js';
import { requiredThickness } from './required-thickness.js';

/** Assessed data come for beams and columns; bracing and hangers are read with the column data (common practice: heated on all sides). */
export function orientationOf(memberType: MemberType): Orientation {
  return memberType === 'beam' || memberType === 'secondary-beam' ? 'beam' : 'column';
}

/** Boards enclose, coatings follow the profile; a spray may do either. */
export function formRefusal(kind: ProductKind, form: ProtectionForm): Message | null {
  if (kind === 'board' && form !== 'boxed') return message('assessment.form-mismatch', { kind, form: 'boxed' });
  if (kind === 'coating' && form !== 'profile') return message('assessment.form-mismatch', { kind, form: 'profile' });
  return null;
}

/** The bare steel's own section factor: its profile, whatever the protection would do. */
export function bareHeating(c: MemberCase, own: SectionFactor): UnprotectedHeating | null {
  const profile = c.protectionForm === 'profile' ? own : valueOf(sectionFactor(c.shape, c.properties, c.exposure, 'profile'));
  if (!profile) return null;
  const shadow = c.curve.kind === 'parametric' ? profile.shadowFactorOther : profile.shadowFactorNominal;
  return {
    sectionFactorPerM: profile.sectionFactorPerM,
    shadowFactor: c.design.shadowEffect ? shadow : 1,
    curve: c.curve,
    emissivity: c.design.emissivitySteel,
  };
}

function valueOf<T>(d: Determined<T>): T | null {
  return d.ok ? d.value : null;
}

/** How the bare steel fares: its temperature at the end of the period (peak of a natural fire) and the minutes to its limit. */
export interface BareOutcome {
  temperatureC: number;
  minutes: number | null;
}
export type BareSolver = (heating: UnprotectedHeating, periodMin: number, limitC: number) => BareOutcome;

/** The two laborious parts of an assessment, so that many members can share work and a yardstick can do without. */
export interface Solvers {
  bare: BareSolver;
  thickness: typeof requiredThickness;
}

/** Nearer than this to the limit the member is integrated itself; the field is read to within a quarter of it. */
const nearLimitK = 2;

function integrated(heating: UnprotectedHeating, minutes: number): number {
  return unprotectedTemperature({ ...heating, minutes });
}

/**
 * Bare steel under a nominal curve is read from the field of histories, within 0.5 K. Where that is too near the limit to tell bare
 * from protected, and in natural fires, the member is integrated by (4.25) in steps of 5 s.
 */
export const solveBare: BareSolver = (heating, periodMin, limitC) => {
  if (heating.curve.kind === 'parametric') return { temperatureC: integrated(heating, periodMin), minutes: bareMinutes({ ...heating, targetC: limitC }) };
  const field = bareField(heating.curve.kind, heating.emissivity);
  const read = field.temperatureC(heating.sectionFactorPerM, heating.shadowFactor, periodMin);
  return {
    temperatureC: Math.abs(read - limitC) < nearLimitK ? integrated(heating, periodMin) : read,
    minutes: field.minutesTo(heating.sectionFactorPerM, heating.shadowFactor, limitC),
  };
};

export function emptyResult(c: MemberCase): MemberResultDto {
  return {
    verdict: 'not-determined', reason: null,
    heatedPerimeterMm: null, sectionFactorPerM: null, coatedGirthMm: null,
    criticalTemperatureC: null, bareCriticalTemperatureC: null, way: c.basis.way, method: null, governing: null, utilisation: null, assumed: false,
    bareMinutes: null, bareTemperatureC: null,
    requiredThickness: null, appliedThickness: null, thicknessUnit: null, layers: null, productId: c.product?.id ?? null, evidenceReading: null,
  };
}

/** What is known before any heating: section factor and critical temperature, or the refusal of either in the result. */
export interface Prepared {
  result: MemberResultDto;
  /** null: the verdict already stands */
  heating: UnprotectedHeating | null;
  own: SectionFactor | null;
}

function applyCritical(result: MemberResultDto, critical: CriticalTemperature): boolean {
  if (critical.kind === 'determined') {
    result.criticalTemperatureC = critical.temperatureC;
    result.bareCriticalTemperatureC = critical.bareTemperatureC;
    result.method = critical.method;
    result.governing = critical.governing;
    result.utilisation = critical.utilisation;
    result.assumed = critical.assumed;
    return true;
  }
  result.reason = critical.reason;
  if (critical.kind === 'under-strength') {
    result.verdict = 'under-strength';
    result.governing = critical.governing;
    result.utilisation = critical.utilisation;
  }
  return false;
}

export function prepare(c: MemberCase): Prepared {
  const result = emptyResult(c);
  const factor = sectionFactor(c.shape, c.properties, c.exposure, c.protectionForm);
  const own = valueOf(factor);
  if (own) {
    result.heatedPerimeterMm = own.heatedPerimeterMm;
    result.sectionFactorPerM = own.sectionFactorPerM;
    result.coatedGirthMm = own.coatedGirthMm;
  }
  const strong = applyCritical(result, criticalTemperature(c));
  if (result.verdict === 'under-strength') return { result, heating: null, own };
  if (!factor.ok) result.reason = factor.reason;
  return { result, heating: strong && own ? bareHeating(c, own) : null, own };
}

/** Settles the verdict once the bare steel is known. Needs a critical temperature and a section factor in the result. */
export function conclude(c: MemberCase, { result, own }: Prepared, bare: BareOutcome, thickness: Solvers['thickness']): MemberResultDto {
  result.bareTemperatureC = bare.temperatureC;
  result.bareMinutes = bare.minutes;
  if (bare.temperatureC <= (result.bareCriticalTemperatureC as number)) {
    result.verdict = 'bare';
    return result;
  }
  const { product } = c;
  if (!product) {
    result.reason = message('assessment.no-system', { memberType: `${memberTypeNames[c.memberType].toLowerCase()} members` });
    return result;
  }
  result.thicknessUnit = thicknessUnit[product.kind];
  const mismatch = formRefusal(product.kind, c.protectionForm);
  if (mismatch) {
    result.reason = mismatch;
    return result;
  }
  const required = thickness(product, {
    group: profileGroup(c.shape), orientation: orientationOf(c.memberType), periodMin: c.periodMin, curve: c.curve,
    criticalTemperatureC: result.criticalTemperatureC as number, sectionFactorPerM: (own as SectionFactor).sectionFactorPerM,
  }, c.readingRules);
  if (!required.ok) {
    result.verdict = verdictOfReason(required.reason.code);
    result.reason = required.reason;
    return result;
  }
  result.verdict = 'protected';
  result.requiredThickness = required.value.thickness;
  result.layers = required.value.layers;
  result.evidenceReading = required.value.reading;
  return result;
}

const alone: Solvers = { bare: solveBare, thickness: requiredThickness };

/**
 * One member from its section to its verdict: section factor, critical temperature, bare steel, required thickness. A product's expiry
 * does not change the verdict; whoever prepares the schedule is stopped by it. appliedThickness is left to the zone's policy.
 * Never throws for what a user can enter: what cannot be justified is null with its reason.
 */
export function assessMember(c: MemberCase, solvers: Solvers = alone): MemberResultDto {
  const prepared = prepare(c);
  const { result, heating } = prepared;
  if (!heating) return result;
  return conclude(c, prepared, solvers.bare(heating, c.periodMin, result.bareCriticalTemperatureC as number), solvers.thickness);
}
