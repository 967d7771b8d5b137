import { message } from '@mantlet/common';
import type { Message, SectionShape } from '@mantlet/common';
import { taperReferenceMm } from './contour.js';

/** what, its value in mm, and the value it must stay below */
type Limit = [part: string, givenMm: number, limitMm: number];

function limitsOf(s: SectionShape): Limit[] {
  switch (s.kind) {
    case 'i':
    case 'tee':
      return [
        ['The web thickness', s.twMm, s.bMm],
        s.kind === 'i' ? ['Twice the flange thickness', 2 * s.tfMm, s.hMm] : ['The flange thickness', s.tfMm, s.hMm],
      ];
    case 'i-unequal':
      return [
        ['The web thickness', s.twMm, Math.min(s.topWidthMm, s.bottomWidthMm)],
        ['The sum of the flange thicknesses', s.topThicknessMm + s.bottomThicknessMm, s.hMm],
      ];
    case 'channel': {
      const reference = taperReferenceMm(s);
      const atWeb = s.tfMm + s.flangeSlope * (s.bMm - s.twMm - reference);
      return [
        ['The web thickness', s.twMm, s.bMm],
        ['Twice the flange thickness at the web', 2 * atWeb, s.hMm],
        ['The taper of the flange from its reference point to its toe', s.flangeSlope * reference, s.tfMm],
      ];
    }
    case 'angle': return [['The thickness', s.tMm, Math.min(s.hMm, s.bMm)]];
    case 'rectangular-hollow':
      return [
        ['Twice the wall thickness', 2 * s.tMm, Math.min(s.hMm, s.bMm)],
        // beyond this the inner arc would reach through the outer one
        ['The outer corner radius', s.outerRadiusMm, s.innerRadiusMm + s.tMm * (2 + Math.SQRT2)],
      ];
    case 'circular-hollow': return [['Twice the wall thickness', 2 * s.tMm, s.dMm]];
    case 'box':
      return [
        ['Twice the flange thickness', 2 * s.tfMm, s.hMm],
        ['The width over both webs', s.clearWidthMm + 2 * s.twMm, s.bMm * (1 + 1e-9) + 1e-9],
      ];
    case 'flat':
    case 'round': return [];
  }
}

/** Why no such section can exist, or null. Bounds of single dimensions are the contract's; these are between dimensions. */
export function shapeFault(shape: SectionShape): Message | null {
  for (const [part, givenMm, limitMm] of limitsOf(shape)) {
    if (!(givenMm < limitMm)) return message('section.does-not-fit', { part, givenMm, limitMm });
  }
  return null;
}
