import { message } from '@mantlet/common';
import type { MemberDesign, MemberType, Message, SectionShape } from '@mantlet/common';
import type { Loading } from '../standards/en-1993-1-1/table-5-2.js';
import type { CriticalTemperatureCase } from '../types.js';
import type { FireEffect } from './fire-effect.js';

export const shapeWords: Record<SectionShape['kind'], string> = {
  i: 'an I or H section', 'i-unequal': 'an I section with unequal flanges', channel: 'a channel', tee: 'a tee', angle: 'an angle',
  'rectangular-hollow': 'a rectangular hollow section', 'circular-hollow': 'a circular hollow section', box: 'a box girder', flat: 'a flat', round: 'a solid round',
};
const calculatedShapes: readonly SectionShape['kind'][] = ['i', 'rectangular-hollow', 'circular-hollow', 'box'];

/** EN 1993-1-1 6.3.2.1(2): square and circular hollow sections do not buckle sideways; nor does anything bent about its weaker axis. */
export function cannotTwist(c: CriticalTemperatureCase): boolean {
  const closed = c.shape.kind === 'circular-hollow' || c.shape.kind === 'rectangular-hollow';
  return closed && c.properties.iyMm4 <= c.properties.izMm4 * (1 + 1e-6);
}

/** EN 1993-1-5 5.1(2), with η = 1 as in the shear area: above this the web may buckle in shear. */
function shearBuckling(c: CriticalTemperatureCase): Message | null {
  const s = c.shape;
  let slenderness = 0;
  if (s.kind === 'i' || s.kind === 'box') slenderness = (s.hMm - 2 * s.tfMm) / s.twMm;
  if (s.kind === 'rectangular-hollow') slenderness = (s.hMm - 2 * s.tMm) / s.tMm;
  const limit = 72 * Math.sqrt(235 / c.steel.yieldStrengthMPa);
  return slenderness > limit ? message('assessment.shear-buckling', { slenderness, limit }) : null;
}

/** Why the full calculation does not cover this member, or null where it does. The first reason found is given. */
export function refusal(c: CriticalTemperatureCase, design: MemberDesign, effect: FireEffect): Message | null {
  if (design.composite) return message('assessment.composite', {});
  if (design.webOpenings) return message('assessment.web-openings', {});
  const { compressionN, momentYNmm, shearZN } = effect;
  if (!calculatedShapes.includes(c.shape.kind)) return message('assessment.shape-not-calculated', { shape: shapeWords[c.shape.kind] });
  if (compressionN > 0 && design.bucklingRule !== 'given' && c.memberType !== 'column') return message('assessment.braced-rule-for-columns', {});
  if (compressionN > 0 && design.bucklingLengthYMm === null) return message('assessment.no-buckling-length', { axis: 'y' });
  if (compressionN > 0 && design.bucklingLengthZMm === null) return message('assessment.no-buckling-length', { axis: 'z' });
  if (momentYNmm > 0 && design.lateralRestraint === null && !cannotTwist(c)) return message('assessment.no-lateral-restraint', {});
  return shearZN > 0 ? shearBuckling(c) : null;
}

/**
 * How a member is stressed where only its utilisation is known: by its type. Null for tension, where no part can buckle:
 * ties, and bracing of flats or rods, which can only pull.
 */
export function loadingByType(memberType: MemberType, shape: SectionShape): Loading | null {
  if (memberType === 'tie') return null;
  if (memberType === 'bracing' && (shape.kind === 'flat' || shape.kind === 'round')) return null;
  return memberType === 'column' || memberType === 'bracing' ? 'compression' : 'bending';
}
