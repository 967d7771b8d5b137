import type { Source } from '../../formula.js';

export const table52Source: Source = { standard: 'EN 1993-1-1:2005', clause: 'Table 5.2' };

export type SectionClass = 1 | 2 | 3 | 4;
export type Loading = 'bending' | 'compression';

/** Greatest ratio of classes 1, 2 and 3, to be multiplied by ε (by ε² for tubes). */
export type Limits = readonly [number, number, number];

export const internalLimits: Record<Loading, Limits> = { bending: [72, 83, 124], compression: [33, 38, 42] };
/** outstand flanges wholly in compression: the same under bending and axial force */
export const outstandLimits: Limits = [9, 10, 14];
/** d/t, times ε² */
export const tubeLimits: Limits = [50, 70, 90];
/** sheet 3, class 3 only: h/t and (b + h)/2t of angles in compression */
export const angleLimits = { leg: 15, mean: 11.5 };

/** ratio is c/t or d/t, factor is ε or ε² */
export function classOf(ratio: number, limits: Limits, factor: number): SectionClass {
  if (ratio <= limits[0] * factor) return 1;
  if (ratio <= limits[1] * factor) return 2;
  return ratio <= limits[2] * factor ? 3 : 4;
}

/** Class 3 limit, times ε, of an internal part under a stress from 1 (compression) to ψ. */
export function internalClass3Limit(psi: number): number {
  return psi > -1 ? 42 / (0.67 + 0.33 * psi) : 62 * (1 - psi) * Math.sqrt(-psi);
}

/** Limits, times ε, of an internal part under bending with compression: α the compressed share when plastic, ψ the stress ratio when elastic. */
export function internalCombinedLimits(alpha: number, psi: number): Limits {
  return alpha > 0.5
    ? [396 / (13 * alpha - 1), 456 / (13 * alpha - 1), internalClass3Limit(psi)]
    : [36 / alpha, 41.5 / alpha, internalClass3Limit(psi)];
}
