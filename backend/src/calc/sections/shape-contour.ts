import { message } from '@mantlet/common';
import type { SectionShape } from '@mantlet/common';
import type { Determined } from '../types.js';
import { circleLoop, corner, faceBits, girthOf, reversed, roundedLoop, taperReferenceMm } from './contour.js';
import type { Contour, ContourSegment } from './contour.js';
import { rememberByShape } from './remember.js';
import { shapeFault } from './shape-fault.js';

type Shape<K extends SectionShape['kind']> = Extract<SectionShape, { kind: K }>;
type Loops = (ContourSegment[] | null)[];
const { top, bottom, left, right } = faceBits;

/** I and H of any flanges; the space between the flanges is reached from its own side only. */
function iLoops(hMm: number, twMm: number, topFlange: [number, number], bottomFlange: [number, number], r: number): Loops {
  const y = hMm / 2;
  const web = twMm / 2;
  const [topX, bottomX] = [topFlange[0] / 2, bottomFlange[0] / 2];
  const [under, over] = [y - topFlange[1], -y + bottomFlange[1]];
  return [roundedLoop([
    corner(-bottomX, -y, bottom), corner(bottomX, -y, right), corner(bottomX, over, right, 0, true),
    corner(web, over, right, r, true), corner(web, under, right, r, true), corner(topX, under, right),
    corner(topX, y, top), corner(-topX, y, left), corner(-topX, under, left, 0, true),
    corner(-web, under, left, r, true), corner(-web, over, left, r, true), corner(-bottomX, over, left),
  ])];
}

/** Web at the left, open to the right; the inner faces of tapered flanges slope by `flangeSlope`. */
function channelLoops(s: Shape<'channel'>): Loops {
  const [x, y] = [s.bMm / 2, s.hMm / 2];
  const toeMm = s.tfMm - s.flangeSlope * taperReferenceMm(s);
  const rootMm = toeMm + s.flangeSlope * (s.bMm - s.twMm);
  const web = -x + s.twMm;
  return [roundedLoop([
    corner(-x, -y, bottom), corner(x, -y, right), corner(x, -y + toeMm, right, s.toeRadiusMm, true),
    corner(web, -y + rootMm, right, s.rootRadiusMm, true), corner(web, y - rootMm, right, s.rootRadiusMm, true),
    corner(x, y - toeMm, right, s.toeRadiusMm), corner(x, y, top), corner(-x, y, left),
  ])];
}

/** Flange on top, stem down; the corners beside the stem are reached from their side and from below. */
function teeLoops(s: Shape<'tee'>): Loops {
  const [x, y, stem] = [s.bMm / 2, s.hMm / 2, s.twMm / 2];
  const under = y - s.tfMm;
  return [roundedLoop([
    corner(-stem, -y, bottom), corner(stem, -y, right | bottom, 0, true), corner(stem, under, right | bottom, s.rootRadiusMm, true),
    corner(x, under, right), corner(x, y, top), corner(-x, y, left), corner(-x, under, left | bottom, 0, true),
    corner(-stem, under, left | bottom, s.rootRadiusMm, true),
  ])];
}

/** Horizontal leg on top, the other down at the left, so that "slab on top" means the leg lies against the slab. */
function angleLoops(s: Shape<'angle'>): Loops {
  const [x, y] = [s.bMm / 2, s.hMm / 2];
  const inside = right | bottom;
  // the thinnest angles are listed with a toe radius above their thickness: the toe is then rounded over its whole thickness
  const toeRadiusMm = Math.min(s.toeRadiusMm, s.tMm);
  return [roundedLoop([
    corner(-x, -y, bottom), corner(-x + s.tMm, -y, inside, toeRadiusMm, true),
    corner(-x + s.tMm, y - s.tMm, inside, s.rootRadiusMm, true), corner(x, y - s.tMm, right, toeRadiusMm),
    corner(x, y, top), corner(-x, y, left),
  ])];
}

function rectangle(bMm: number, hMm: number, radiusMm: number, hole = false): ContourSegment[] | null {
  const [x, y] = [bMm / 2, hMm / 2];
  const loop = roundedLoop([
    corner(-x, -y, hole ? 0 : bottom, radiusMm), corner(x, -y, hole ? 0 : right, radiusMm),
    corner(x, y, hole ? 0 : top, radiusMm), corner(-x, y, hole ? 0 : left, radiusMm),
  ]);
  return loop && hole ? reversed(loop) : loop;
}

/** Two flanges and two webs; flanges may stand out beyond the webs. */
function boxLoops(s: Shape<'box'>): Loops {
  const outerWebMm = s.clearWidthMm + 2 * s.twMm;
  const flange: [number, number] = [s.bMm, s.tfMm];
  const outer = s.bMm - outerWebMm < 1e-9 * s.bMm ? [rectangle(s.bMm, s.hMm, 0)] : iLoops(s.hMm, outerWebMm, flange, flange, 0);
  return [...outer, rectangle(s.clearWidthMm, s.hMm - 2 * s.tfMm, 0, true)];
}

function loopsOf(s: SectionShape): Loops {
  switch (s.kind) {
    case 'i': return iLoops(s.hMm, s.twMm, [s.bMm, s.tfMm], [s.bMm, s.tfMm], s.rootRadiusMm);
    case 'i-unequal':
      return iLoops(s.hMm, s.twMm, [s.topWidthMm, s.topThicknessMm], [s.bottomWidthMm, s.bottomThicknessMm], s.rootRadiusMm);
    case 'channel': return channelLoops(s);
    case 'tee': return teeLoops(s);
    case 'angle': return angleLoops(s);
    case 'rectangular-hollow':
      return [rectangle(s.bMm, s.hMm, s.outerRadiusMm), rectangle(s.bMm - 2 * s.tMm, s.hMm - 2 * s.tMm, s.innerRadiusMm, true)];
    case 'circular-hollow': return [circleLoop(s.dMm / 2), circleLoop(s.dMm / 2 - s.tMm, true)];
    case 'box': return boxLoops(s);
    case 'flat': return [rectangle(s.tMm, s.hMm, 0)];
    case 'round': return [circleLoop(s.dMm / 2)];
  }
}

/** Width and height of the enclosing box, mm. */
export function boxSize(s: SectionShape): { widthMm: number; heightMm: number } {
  switch (s.kind) {
    case 'circular-hollow':
    case 'round': return { widthMm: s.dMm, heightMm: s.dMm };
    case 'flat': return { widthMm: s.tMm, heightMm: s.hMm };
    case 'i-unequal': return { widthMm: Math.max(s.topWidthMm, s.bottomWidthMm), heightMm: s.hMm };
    default: return { widthMm: s.bMm, heightMm: s.hMm };
  }
}

/** The contour of a shape, or why its dimensions make none. */
export const contourOf = rememberByShape((shape): Determined<Contour> => {
  const fault = shapeFault(shape);
  if (fault) return { ok: false, reason: fault };
  const loops = loopsOf(shape);
  if (loops.some((loop) => loop === null)) return { ok: false, reason: message('section.radii-do-not-fit', {}) };
  return { ok: true, value: { loops: loops as ContourSegment[][], girth: girthOf(loops[0] as ContourSegment[]), ...boxSize(shape) } };
});
