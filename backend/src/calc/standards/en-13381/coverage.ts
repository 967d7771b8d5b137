import { fireCurveNames, message } from '@mantlet/common';
import type { Evidence, FireCurve, Message, MessageCode, NominalCurve, ProfileGroup, VerdictKind } from '@mantlet/common';
import type { AssessedProduct } from '../../types.js';

/** Every refusal is one of two: the assessment does not reach, or something is missing. */
export function verdictOfReason(code: MessageCode): Extract<VerdictKind, 'outside' | 'not-determined'> {
  return code.startsWith('product.outside-') ? 'outside' : 'not-determined';
}

/**
 * Thickness tables and regressions hold for the nominal curves they were tested under. Thermal properties may be used in a natural
 * fire by EN 1993-1-2 4.2.5.2, but only where the assessment says so.
 */
export function curveRefusal(product: AssessedProduct, curve: FireCurve): Message | null {
  const covered =
    curve.kind === 'parametric'
      ? product.evidence.form === 'thermal' && product.evidence.properties.coversNaturalFire === true
      : product.curves.includes(curve.kind);
  if (covered) return null;
  const names = product.curves.map((c: NominalCurve) => fireCurveNames[c]).join(', ');
  return message('product.outside-curve', { curve: fireCurveNames[curve.kind], covered: names });
}

export const groupNames: Record<ProfileGroup, string> = {
  open: 'open', 'hollow-rectangular': 'rectangular hollow', 'hollow-circular': 'circular hollow', solid: 'solid',
};

export const formNames: Record<Evidence['form'], string> = {
  table: 'thickness tables', regression: 'regression coefficients', thermal: 'thermal properties',
};

/** A limit to 1 °C, downwards as `formatLimitTemperature`, without its cost: every reading of a search says it. */
export const limitInWords = (temperatureC: number): string => `${Math.floor(temperatureC + 1e-6)} °C`;
