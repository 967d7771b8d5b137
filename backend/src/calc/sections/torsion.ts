import type { SectionShape } from '@mantlet/common';

/**
 * St Venant torsion and warping constants, y strong axis.
 * Rolled open sections: A. A. El Darwish and B. G. Johnston, "Torsion of structural shapes", J. Struct. Div. ASCE 91
 * (ST1), 1965: rectangles, less their free ends, plus the bulge of the inscribed circle at each junction. (memory)
 * Hollow rectangles: EN 10210-2 Annex B. Welded boxes: Bredt. Warping: V. Z. Vlasov's thin-walled theory.
 */
type Shape<K extends SectionShape['kind']> = Extract<SectionShape, { kind: K }>;
type Flange = { bMm: number; tMm: number };

/** Junction of a web with the middle of a flange. */
function teeJunction(twMm: number, tfMm: number, r: number): number {
  const alpha = -0.042 + (0.2204 * twMm) / tfMm + (0.1355 * r) / tfMm - (0.0865 * r * twMm) / tfMm ** 2 - (0.0725 * twMm ** 2) / tfMm ** 2;
  const diameter = ((tfMm + r) ** 2 + (r + 0.25 * twMm) * twMm) / (2 * r + tfMm);
  return alpha * diameter ** 4;
}

/** Junction of a web with the end of a flange, or of two legs. */
function cornerJunction(twMm: number, tfMm: number, r: number): number {
  const alpha = -0.0908 + (0.2621 * twMm) / tfMm + (0.1231 * r) / tfMm - (0.0752 * r * twMm) / tfMm ** 2 - 0.0945 * (twMm / tfMm) ** 2;
  const diameter = 2 * (3 * r + twMm + tfMm - Math.sqrt(2 * (2 * r + twMm) * (2 * r + tfMm)));
  return alpha * diameter ** 4;
}

function iTorsion(hMm: number, twMm: number, flanges: [Flange, Flange], r: number): number {
  const clear = hMm - flanges[0].tMm - flanges[1].tMm;
  const plates = flanges.reduce((sum, f) => sum + (f.bMm * f.tMm ** 3) / 3, (clear * twMm ** 3) / 3);
  // fillet welds are not counted, so a welded section is its plates
  if (r === 0) return plates;
  return flanges.reduce((sum, f) => sum + teeJunction(twMm, f.tMm, r) - 0.21 * f.tMm ** 4, plates);
}

function channelTorsion(s: Shape<'channel'>): number | null {
  // the published correction is for parallel flanges
  if (s.flangeSlope > 0) return null;
  return (2 * s.bMm * s.tfMm ** 3 + (s.hMm - 2 * s.tfMm) * s.twMm ** 3) / 3
    + 2 * cornerJunction(s.twMm, s.tfMm, s.rootRadiusMm) - 0.42 * s.tfMm ** 4;
}

function teeTorsion(s: Shape<'tee'>): number {
  const plates = (s.bMm * s.tfMm ** 3 + (s.hMm - s.tfMm) * s.twMm ** 3) / 3;
  if (s.rootRadiusMm === 0) return plates;
  return plates + teeJunction(s.twMm, s.tfMm, s.rootRadiusMm) - 0.21 * s.tfMm ** 4 - 0.105 * s.twMm ** 4;
}

function angleTorsion(s: Shape<'angle'>): number {
  const plates = ((s.hMm + s.bMm - s.tMm) * s.tMm ** 3) / 3;
  return plates + cornerJunction(s.tMm, s.tMm, s.rootRadiusMm) - 0.21 * s.tMm ** 4;
}

function hollowTorsion(s: Shape<'rectangular-hollow'>): number {
  const radius = (s.outerRadiusMm + s.innerRadiusMm) / 2;
  const [b, h] = [s.bMm - s.tMm, s.hMm - s.tMm];
  const girth = 2 * (b + h) - 2 * radius * (4 - Math.PI);
  const enclosed = b * h - radius ** 2 * (4 - Math.PI);
  return (s.tMm ** 3 * girth) / 3 + (4 * enclosed ** 2 * s.tMm) / girth;
}

function boxTorsion(s: Shape<'box'>): number {
  const [b, h] = [s.clearWidthMm + s.twMm, s.hMm - s.tfMm];
  return (4 * (b * h) ** 2) / ((2 * b) / s.tfMm + (2 * h) / s.twMm);
}

function flatTorsion(s: Shape<'flat'>): number {
  const [long, short] = [Math.max(s.hMm, s.tMm), Math.min(s.hMm, s.tMm)];
  const ratio = short / long;
  // Roark's fit of the series for a rectangle
  return long * short ** 3 * (1 / 3 - 0.21 * ratio * (1 - ratio ** 4 / 12));
}

/** I_t in mm⁴, or null where it is not computed here (tapered channels). */
export function torsionConstant(s: SectionShape, polarMm4: number): number | null {
  switch (s.kind) {
    case 'i': return iTorsion(s.hMm, s.twMm, [{ bMm: s.bMm, tMm: s.tfMm }, { bMm: s.bMm, tMm: s.tfMm }], s.rootRadiusMm);
    case 'i-unequal':
      return iTorsion(s.hMm, s.twMm,
        [{ bMm: s.topWidthMm, tMm: s.topThicknessMm }, { bMm: s.bottomWidthMm, tMm: s.bottomThicknessMm }], s.rootRadiusMm);
    case 'channel': return channelTorsion(s);
    case 'tee': return teeTorsion(s);
    case 'angle': return angleTorsion(s);
    case 'rectangular-hollow': return hollowTorsion(s);
    case 'circular-hollow':
    case 'round': return polarMm4;
    case 'box': return boxTorsion(s);
    case 'flat': return flatTorsion(s);
  }
}

/** Vlasov's constant of a channel about its shear centre, from I_z, I_y, A and the distance of the centroid from the web's back. */
function channelWarping(s: Shape<'channel'>, p: WarpingInput): number | null {
  if (s.flangeSlope > 0) return null;
  const between = s.hMm - s.tfMm;
  return (between ** 2 / 4)
    * (p.izMm4 - p.areaMm2 * (p.centroidFromBackMm - s.twMm / 2) ** 2 * ((between ** 2 * p.areaMm2) / (4 * p.iyMm4) - 1));
}

export interface WarpingInput {
  areaMm2: number;
  iyMm4: number;
  izMm4: number;
  /** channels: from the back of the web */
  centroidFromBackMm: number;
}

/** I_w in mm⁶ about the shear centre, or null where it is not computed here (hollow and solid sections, tapered channels). */
export function warpingConstant(s: SectionShape, p: WarpingInput): number | null {
  switch (s.kind) {
    case 'i': return (p.izMm4 * (s.hMm - s.tfMm) ** 2) / 4;
    case 'i-unequal': {
      const top = (s.topThicknessMm * s.topWidthMm ** 3) / 12;
      const bottom = (s.bottomThicknessMm * s.bottomWidthMm ** 3) / 12;
      const between = s.hMm - (s.topThicknessMm + s.bottomThicknessMm) / 2;
      return (between ** 2 * top * bottom) / (top + bottom);
    }
    case 'channel': return channelWarping(s, p);
    // sections of plates that meet in one line warp only across their thickness
    case 'tee': return (s.tfMm * s.bMm) ** 3 / 144 + ((s.hMm - s.tfMm / 2) * s.twMm) ** 3 / 36;
    case 'angle': return (s.tMm ** 3 * ((s.hMm - s.tMm / 2) ** 3 + (s.bMm - s.tMm / 2) ** 3)) / 36;
    default: return null;
  }
}
