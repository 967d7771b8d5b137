import { message } from '@mantlet/common';
import type { SectionShape } from '@mantlet/common';
import { defineFormula, explain } from '../../formula.js';
import type { WorkingStep } from '../../formula.js';
import type { Determined } from '../../types.js';
import { angleLimits, classOf, internalClass3Limit, internalCombinedLimits, internalLimits, outstandLimits, tubeLimits } from '../en-1993-1-1/table-5-2.js';
import type { Loading, SectionClass } from '../en-1993-1-1/table-5-2.js';

export const fireEpsilonFormula = defineFormula<{ yieldStrengthMPa: number }>({
  label: 'ε for classification in fire',
  source: { standard: 'EN 1993-1-2:2005', clause: '4.2.2 (4.2)', note: 'limits from EN 1993-1-1 Table 5.2' },
  expression: '0.85·√(235/f_y)',
  result: { symbol: 'ε', meaning: 'reduced ε', unit: '' },
  symbols: { yieldStrengthMPa: { symbol: 'f_y', meaning: 'yield strength at 20 °C', unit: 'MPa' } },
  evaluate: ({ yieldStrengthMPa }) => 0.85 * Math.sqrt(235 / yieldStrengthMPa),
});

type Of<K extends SectionShape['kind']> = Extract<SectionShape, { kind: K }>;
const worst = (...classes: SectionClass[]): SectionClass => Math.max(...classes) as SectionClass;

function classOfI(s: Of<'i'>, loading: Loading, e: number): SectionClass {
  const flange = (s.bMm - s.twMm - 2 * s.rootRadiusMm) / 2 / s.tfMm;
  const web = (s.hMm - 2 * s.tfMm - 2 * s.rootRadiusMm) / s.twMm;
  return worst(classOf(flange, outstandLimits, e), classOf(web, internalLimits[loading], e));
}

/** Flat part of a wall: its width less two outer corner radii, or less two thicknesses where the corners are sharper. */
function classOfRectangularHollow(s: Of<'rectangular-hollow'>, loading: Loading, e: number): SectionClass {
  const corner = Math.max(s.outerRadiusMm, s.tMm);
  const flange = (s.bMm - 2 * corner) / s.tMm;
  const web = (s.hMm - 2 * corner) / s.tMm;
  return worst(classOf(flange, internalLimits.compression, e), classOf(web, internalLimits[loading], e));
}

function classOfBox(s: Of<'box'>, loading: Loading, e: number): SectionClass {
  const outstand = (s.bMm - s.clearWidthMm - 2 * s.twMm) / 2 / s.tfMm;
  return worst(
    classOf(s.clearWidthMm / s.tfMm, internalLimits.compression, e),
    classOf(Math.max(outstand, 0), outstandLimits, e),
    classOf((s.hMm - 2 * s.tfMm) / s.twMm, internalLimits[loading], e),
  );
}

/** Unequal flanges in bending: elastic stresses, the worse of either flange in compression; never called better than class 3. */
function classOfUnequalI(s: Of<'i-unequal'>, loading: Loading, e: number): SectionClass {
  const flange = (width: number, thickness: number) => classOf((width - s.twMm - 2 * s.rootRadiusMm) / 2 / thickness, outstandLimits, e);
  const c = s.hMm - s.topThicknessMm - s.bottomThicknessMm - 2 * s.rootRadiusMm;
  const flanges = worst(flange(s.topWidthMm, s.topThicknessMm), flange(s.bottomWidthMm, s.bottomThicknessMm));
  if (loading === 'compression') return worst(flanges, classOf(c / s.twMm, internalLimits.compression, e));
  const top = s.topWidthMm * s.topThicknessMm;
  const bottom = s.bottomWidthMm * s.bottomThicknessMm;
  const webDepth = s.hMm - s.topThicknessMm - s.bottomThicknessMm;
  const web = webDepth * s.twMm;
  const centroid = (bottom * (s.bottomThicknessMm / 2) + web * (s.bottomThicknessMm + webDepth / 2) + top * (s.hMm - s.topThicknessMm / 2)) / (top + bottom + web);
  const fromBottom = centroid - s.bottomThicknessMm - s.rootRadiusMm;
  const fromTop = c - fromBottom;
  const limit = Math.min(internalClass3Limit(-fromBottom / fromTop), internalClass3Limit(-fromTop / fromBottom));
  return worst(flanges, c / s.twMm <= limit * e ? 3 : 4);
}

function classOfAngle(s: Of<'angle'>, e: number): SectionClass {
  return s.hMm / s.tMm <= angleLimits.leg * e && (s.hMm + s.bMm) / (2 * s.tMm) <= angleLimits.mean * e ? 3 : 4;
}

/**
 * Class of a cross-section in fire under bending about y or uniform compression.
 * Tees: the stem in uniform compression whichever the loading, so that the class is never too good.
 * A solid round has no part that can buckle. A flat, alone in bending or compression, is not classified by Table 5.2: refused.
 */
export function sectionClass(shape: SectionShape, loading: Loading, yieldStrengthMPa: number): Determined<SectionClass> {
  const e = fireEpsilonFormula.evaluate({ yieldStrengthMPa });
  switch (shape.kind) {
    case 'i': return { ok: true, value: classOfI(shape, loading, e) };
    case 'i-unequal': return { ok: true, value: classOfUnequalI(shape, loading, e) };
    case 'rectangular-hollow': return { ok: true, value: classOfRectangularHollow(shape, loading, e) };
    case 'circular-hollow': return { ok: true, value: classOf(shape.dMm / shape.tMm, tubeLimits, e * e) };
    case 'box': return { ok: true, value: classOfBox(shape, loading, e) };
    case 'angle': return { ok: true, value: classOfAngle(shape, e) };
    case 'channel': {
      const flange = (shape.bMm - shape.twMm - shape.rootRadiusMm) / shape.tfMm;
      const web = (shape.hMm - 2 * shape.tfMm - 2 * shape.rootRadiusMm) / shape.twMm;
      return { ok: true, value: worst(classOf(flange, outstandLimits, e), classOf(web, internalLimits[loading], e)) };
    }
    case 'tee': {
      const flange = (shape.bMm - shape.twMm - 2 * shape.rootRadiusMm) / 2 / shape.tfMm;
      const stem = (shape.hMm - shape.tfMm - shape.rootRadiusMm) / shape.twMm;
      return { ok: true, value: worst(classOf(flange, outstandLimits, e), classOf(stem, outstandLimits, e)) };
    }
    case 'round': return { ok: true, value: 1 };
    case 'flat': return { ok: false, reason: message('assessment.shape-not-classified', { shape: 'a flat' }) };
  }
}

/**
 * Class under bending about y with axial compression (N): the web by Table 5.2 for its own share of compression, with the force in
 * fire and f_y at 20 °C, as 4.2.2 classifies "as for normal temperature"; the rest as in compression. Shapes without such a web: as in compression.
 */
export function combinedSectionClass(shape: SectionShape, compressionN: number, areaMm2: number, yieldStrengthMPa: number): Determined<SectionClass> {
  const compressed = sectionClass(shape, 'compression', yieldStrengthMPa);
  if (!compressed.ok || compressed.value === 1) return compressed;
  const web = webOf(shape);
  const bent = sectionClass(shape, 'bending', yieldStrengthMPa);
  if (!web || !bent.ok) return compressed;
  const e = fireEpsilonFormula.evaluate({ yieldStrengthMPa });
  const alpha = Math.min(0.5 * (1 + compressionN / (web.webs * web.depthMm * web.thicknessMm * yieldStrengthMPa)), 1);
  const psi = Math.min((2 * compressionN) / (areaMm2 * yieldStrengthMPa) - 1, 1);
  // bending leaves the flanges wholly compressed, so their class is in it already
  return { ok: true, value: worst(bent.value, classOf(web.depthMm / web.thicknessMm, internalCombinedLimits(alpha, psi), e)) };
}

function webOf(s: SectionShape): { depthMm: number; thicknessMm: number; webs: number } | null {
  if (s.kind === 'i') return { depthMm: s.hMm - 2 * s.tfMm - 2 * s.rootRadiusMm, thicknessMm: s.twMm, webs: 1 };
  if (s.kind === 'box') return { depthMm: s.hMm - 2 * s.tfMm, thicknessMm: s.twMm, webs: 2 };
  if (s.kind === 'rectangular-hollow') return { depthMm: s.hMm - 2 * Math.max(s.outerRadiusMm, s.tMm), thicknessMm: s.tMm, webs: 2 };
  return null;
}

/** The class at normal temperature, with ε = √(235/f_y); 4 where Table 5.2 gives none. */
export function coldSectionClass(shape: SectionShape, loading: Loading, yieldStrengthMPa: number): SectionClass {
  // the ε of fire is 0.85·√(235/f_y), which for 0.85²·f_y is the cold one
  const found = sectionClass(shape, loading, yieldStrengthMPa * 0.85 ** 2);
  return found.ok ? found.value : 4;
}

/** The lines of working of a class. */
export function explainedClass(yieldStrengthMPa: number, found: SectionClass, loading: string): WorkingStep[] {
  const epsilon = explain(fireEpsilonFormula, { yieldStrengthMPa });
  return [epsilon.step, {
    what: `Section class in ${loading}`, equation: 'c/t against the limits of Table 5.2 times ε',
    inputs: [{ symbol: 'ε', value: epsilon.value, unit: '' }], value: found, unit: '', source: 'EN 1993-1-2:2005 4.2.2 with EN 1993-1-1:2005 Table 5.2',
  }];
}
