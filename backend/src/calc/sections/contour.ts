import type { FaceName, SectionShape } from '@mantlet/common';

/**
 * Closed loops of straight lines and circular arcs: the one description of a cross-section from which its properties,
 * its drawing and its heated perimeter are all taken. Millimetres, x to the right, y upwards.
 */
export type Point = [number, number];

/** Faces of the enclosing box, as bits, so that a set of them is one number. */
export const faceBits: Record<FaceName, number> = { top: 1, bottom: 2, left: 4, right: 8 };
export const allFaces = 15;

export interface ContourSegment {
  from: Point;
  to: Point;
  /** angles in radians; `to` lies at startRad + sweepRad, a positive sweep runs anticlockwise */
  arc: { centre: Point; radiusMm: number; startRad: number; sweepRad: number } | null;
  lengthMm: number;
  /** the faces of the box through which fire reaches this stretch; 0 for the inside of a hollow section */
  faces: number;
  /** lies inside the space between two flanges or legs */
  recess: boolean;
}

/** The outer loop's lengths, faces and recesses (1 or 0) side by side: all that a section factor reads, thousands of times. */
export interface Girth {
  lengthsMm: Float64Array;
  faces: Uint8Array;
  recesses: Uint8Array;
}

export function girthOf(outer: readonly ContourSegment[]): Girth {
  return {
    lengthsMm: Float64Array.from(outer, (s) => s.lengthMm),
    faces: Uint8Array.from(outer, (s) => s.faces),
    recesses: Uint8Array.from(outer, (s) => Number(s.recess)),
  };
}

export interface Contour {
  /** outer loop first, anticlockwise; holes after it, clockwise */
  loops: ContourSegment[][];
  girth: Girth;
  widthMm: number;
  heightMm: number;
}

/** A corner of a loop and the edge that leaves it. */
export interface Corner {
  x: number;
  y: number;
  radiusMm?: number;
  faces: number;
  recess?: boolean;
}

export function corner(x: number, y: number, faces: number, radiusMm = 0, recess = false): Corner {
  return { x, y, faces, radiusMm, recess };
}

interface Turn {
  /** length taken from each of the two edges by the rounding */
  tangentMm: number;
  start: Point;
  end: Point;
  arc: ContourSegment['arc'];
}

function turnAt(before: Corner, at: Corner, after: Corner): Turn {
  const radiusMm = at.radiusMm ?? 0;
  const sharp: Turn = { tangentMm: 0, start: [at.x, at.y], end: [at.x, at.y], arc: null };
  if (radiusMm === 0) return sharp;
  const inLength = Math.hypot(at.x - before.x, at.y - before.y);
  const outLength = Math.hypot(after.x - at.x, after.y - at.y);
  const inX = (at.x - before.x) / inLength;
  const inY = (at.y - before.y) / inLength;
  const outX = (after.x - at.x) / outLength;
  const outY = (after.y - at.y) / outLength;
  const sweepRad = Math.atan2(inX * outY - inY * outX, inX * outX + inY * outY);
  const tangentMm = radiusMm * Math.tan(Math.abs(sweepRad) / 2);
  const side = Math.sign(sweepRad);
  const start: Point = [at.x - inX * tangentMm, at.y - inY * tangentMm];
  const centre: Point = [start[0] - side * inY * radiusMm, start[1] + side * inX * radiusMm];
  const startRad = Math.atan2(start[1] - centre[1], start[0] - centre[0]);
  return {
    tangentMm,
    start,
    end: [at.x + outX * tangentMm, at.y + outY * tangentMm],
    arc: { centre, radiusMm, startRad, sweepRad },
  };
}

/**
 * Joins corners by straight edges and rounds each by its radius, tangent to both edges, whichever way it turns.
 * An arc belongs to the faces of both its neighbours. Returns null where the radii do not fit on the edges.
 */
export function roundedLoop(corners: Corner[]): ContourSegment[] | null {
  const count = corners.length;
  const turns = corners.map((at, i) => turnAt(corners[(i + count - 1) % count]!, at, corners[(i + 1) % count]!));
  const loop: ContourSegment[] = [];
  for (let i = 0; i < count; i += 1) {
    const at = corners[i]!;
    const next = corners[(i + 1) % count]!;
    const before = corners[(i + count - 1) % count]!;
    const turn = turns[i]!;
    const nextTurn = turns[(i + 1) % count]!;
    if (turn.arc) {
      loop.push({
        from: turn.start, to: turn.end, arc: turn.arc, lengthMm: turn.arc.radiusMm * Math.abs(turn.arc.sweepRad),
        faces: before.faces | at.faces, recess: Boolean(before.recess && at.recess),
      });
    }
    const edgeMm = Math.hypot(next.x - at.x, next.y - at.y);
    const straightMm = edgeMm - turn.tangentMm - nextTurn.tangentMm;
    if (straightMm < -1e-9 * edgeMm) return null;
    if (straightMm > 1e-9 * edgeMm) {
      loop.push({ from: turn.end, to: nextTurn.start, arc: null, lengthMm: straightMm, faces: at.faces, recess: Boolean(at.recess) });
    }
  }
  return loop;
}

/**
 * A circle about the origin in four quarters. Each quarter is seen from the two faces it lies between, so that one
 * exposed face heats the half of the circle turned towards it, and a slab touching the top line shields nothing.
 */
export function circleLoop(radiusMm: number, hole = false): ContourSegment[] {
  const { top, bottom, left, right } = faceBits;
  const quarters = [top | right, top | left, bottom | left, bottom | right];
  const loop = quarters.map((faces, i): ContourSegment => {
    const startRad = (i * Math.PI) / 2;
    const at = (rad: number): Point => [radiusMm * Math.cos(rad), radiusMm * Math.sin(rad)];
    return {
      from: at(startRad), to: at(startRad + Math.PI / 2), arc: { centre: [0, 0], radiusMm, startRad, sweepRad: Math.PI / 2 },
      lengthMm: (radiusMm * Math.PI) / 2, faces: hole ? 0 : faces, recess: false,
    };
  });
  return hole ? reversed(loop) : loop;
}

/** The same loop walked the other way: a hole subtracts from every integral. */
export function reversed(loop: ContourSegment[]): ContourSegment[] {
  return loop.toReversed().map((s) => ({
    ...s,
    from: s.to,
    to: s.from,
    arc: s.arc && { ...s.arc, startRad: s.arc.startRad + s.arc.sweepRad, sweepRad: -s.arc.sweepRad },
  }));
}

export function perimeterMm(loop: ContourSegment[]): number {
  let sum = 0;
  for (const segment of loop) sum += segment.lengthMm;
  return sum;
}

/** Where the thickness of a tapered channel flange is measured, from the toe: DIN 1026-1. */
export function taperReferenceMm(shape: Extract<SectionShape, { kind: 'channel' }>): number {
  return shape.hMm <= 300 ? shape.bMm / 2 : (shape.bMm - shape.twMm) / 2;
}
