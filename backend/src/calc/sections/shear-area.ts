import type { SectionShape } from '@mantlet/common';

/**
 * Shear area for a force parallel to the web or depth, mm²: EN 1993-1-1:2005 + AC:2009 6.2.6(3), with η = 1.0, the value
 * the clause allows as conservative. Root radius 0 means welded from plates. The clause gives none for angles: the leg is
 * taken to the middle of the other, as the clause does for a welded tee.
 */
export function shearAreaZ(s: SectionShape, areaMm2: number): number {
  switch (s.kind) {
    case 'i': {
      const web = (s.hMm - 2 * s.tfMm) * s.twMm;
      if (s.rootRadiusMm === 0) return web;
      return Math.max(areaMm2 - 2 * s.bMm * s.tfMm + (s.twMm + 2 * s.rootRadiusMm) * s.tfMm, web);
    }
    case 'i-unequal': {
      const web = (s.hMm - s.topThicknessMm - s.bottomThicknessMm) * s.twMm;
      if (s.rootRadiusMm === 0) return web;
      const flanges = s.topWidthMm * s.topThicknessMm + s.bottomWidthMm * s.bottomThicknessMm;
      const meanThickness = (s.topThicknessMm + s.bottomThicknessMm) / 2;
      return Math.max(areaMm2 - flanges + (s.twMm + 2 * s.rootRadiusMm) * meanThickness, web);
    }
    case 'channel': return areaMm2 - 2 * s.bMm * s.tfMm + (s.twMm + s.rootRadiusMm) * s.tfMm;
    case 'tee':
      return s.rootRadiusMm === 0
        ? s.twMm * (s.hMm - s.tfMm / 2)
        : areaMm2 - s.bMm * s.tfMm + ((s.twMm + 2 * s.rootRadiusMm) * s.tfMm) / 2;
    case 'angle': return s.tMm * (s.hMm - s.tMm / 2);
    case 'rectangular-hollow': return (areaMm2 * s.hMm) / (s.bMm + s.hMm);
    case 'circular-hollow': return (2 * areaMm2) / Math.PI;
    case 'box': return 2 * (s.hMm - 2 * s.tfMm) * s.twMm;
    case 'flat':
    case 'round': return areaMm2;
  }
}
