import type { OutlineSegment, SectionOutline, SectionShape } from '@mantlet/common';

/**
 * A section drawn from its dimensions before the server knows it: for choosing and typing sections only.
 * It marks no face as heated; the sheet of a member shows the server's outline, from which its section factor is summed.
 */
type Corner = readonly [x: number, y: number, radiusMm?: number];
type Point = [number, number];

function unit(from: Corner, to: Corner): Point {
  const length = Math.hypot(to[0] - from[0], to[1] - from[1]) || 1;
  return [(to[0] - from[0]) / length, (to[1] - from[1]) / length];
}

/** A corner cut back to where its rounding begins and ends. */
function rounded(before: Corner, at: Corner, after: Corner): { start: Point; end: Point; arc: OutlineSegment['arc'] } {
  const radius = at[2] ?? 0;
  const here: Point = [at[0], at[1]];
  if (radius <= 0) return { start: here, end: here, arc: undefined };
  const u = unit(at, before);
  const v = unit(at, after);
  const half = Math.acos(Math.min(1, Math.max(-1, u[0] * v[0] + u[1] * v[1]))) / 2;
  const back = radius / Math.tan(half);
  const out = radius / Math.sin(half);
  const bisector = unit([0, 0], [u[0] + v[0], u[1] + v[1]]);
  const cross = u[0] * v[1] - u[1] * v[0];
  return {
    start: [at[0] + u[0] * back, at[1] + u[1] * back], end: [at[0] + v[0] * back, at[1] + v[1] * back],
    arc: { centre: [at[0] + bisector[0] * out, at[1] + bisector[1] * out], radiusMm: radius, anticlockwise: cross < 0 },
  };
}

const plain = (from: Point, to: Point): OutlineSegment => ({ from, to, lengthMm: Math.hypot(to[0] - from[0], to[1] - from[1]), heated: false, coated: false });

function polygon(corners: readonly Corner[]): OutlineSegment[] {
  const turns = corners.map((at, i) => rounded(corners[(i + corners.length - 1) % corners.length] as Corner, at, corners[(i + 1) % corners.length] as Corner));
  return turns.flatMap((turn, i) => {
    const next = turns[(i + 1) % turns.length] as (typeof turns)[number];
    const edge = plain(turn.end, next.start);
    return turn.arc ? [{ ...plain(turn.start, turn.end), arc: turn.arc }, edge] : [edge];
  });
}

const rectangle = (b: number, h: number, r = 0): OutlineSegment[] =>
  polygon([[-b / 2, -h / 2, r], [b / 2, -h / 2, r], [b / 2, h / 2, r], [-b / 2, h / 2, r]]);

function circle(diameter: number): OutlineSegment[] {
  const r = diameter / 2;
  const arc = { centre: [0, 0] as Point, radiusMm: r, anticlockwise: true };
  return [{ ...plain([r, 0], [-r, 0]), arc }, { ...plain([-r, 0], [r, 0]), arc }];
}

function iCorners(h: number, tw: number, top: Point, bottom: Point, r: number): Corner[] {
  const [y, w] = [h / 2, tw / 2];
  const [over, under] = [-y + bottom[1], y - top[1]];
  return [
    [-bottom[0] / 2, -y], [bottom[0] / 2, -y], [bottom[0] / 2, over], [w, over, r], [w, under, r], [top[0] / 2, under],
    [top[0] / 2, y], [-top[0] / 2, y], [-top[0] / 2, under], [-w, under, r], [-w, over, r], [-bottom[0] / 2, over],
  ];
}

function channelCorners(s: Extract<SectionShape, { kind: 'channel' }>): Corner[] {
  const [x, y, web] = [s.bMm / 2, s.hMm / 2, -s.bMm / 2 + s.twMm];
  const toe = s.tfMm - (s.flangeSlope * (s.bMm - s.twMm)) / 2;
  const root = s.tfMm + (s.flangeSlope * (s.bMm - s.twMm)) / 2;
  return [[-x, -y], [x, -y], [x, -y + toe, s.toeRadiusMm], [web, -y + root, s.rootRadiusMm], [web, y - root, s.rootRadiusMm], [x, y - toe, s.toeRadiusMm], [x, y], [-x, y]];
}

function loopsOf(s: SectionShape): OutlineSegment[][] {
  switch (s.kind) {
    case 'i': return [polygon(iCorners(s.hMm, s.twMm, [s.bMm, s.tfMm], [s.bMm, s.tfMm], s.rootRadiusMm))];
    case 'i-unequal': return [polygon(iCorners(s.hMm, s.twMm, [s.topWidthMm, s.topThicknessMm], [s.bottomWidthMm, s.bottomThicknessMm], s.rootRadiusMm))];
    case 'channel': return [polygon(channelCorners(s))];
    case 'tee': {
      const [x, y, w] = [s.bMm / 2, s.hMm / 2, s.twMm / 2];
      return [polygon([[-w, -y], [w, -y], [w, y - s.tfMm, s.rootRadiusMm], [x, y - s.tfMm], [x, y], [-x, y], [-x, y - s.tfMm], [-w, y - s.tfMm, s.rootRadiusMm]])];
    }
    case 'angle': {
      const [x, y, t] = [s.bMm / 2, s.hMm / 2, s.tMm];
      const toe = Math.min(s.toeRadiusMm, t);
      return [polygon([[-x, -y], [-x + t, -y, toe], [-x + t, y - t, s.rootRadiusMm], [x, y - t, toe], [x, y], [-x, y]])];
    }
    case 'rectangular-hollow': return [rectangle(s.bMm, s.hMm, s.outerRadiusMm), rectangle(s.bMm - 2 * s.tMm, s.hMm - 2 * s.tMm, s.innerRadiusMm)];
    case 'circular-hollow': return [circle(s.dMm), circle(s.dMm - 2 * s.tMm)];
    case 'box': return [rectangle(s.bMm, s.hMm), rectangle(s.clearWidthMm, s.hMm - 2 * s.tfMm)];
    case 'flat': return [rectangle(s.tMm, s.hMm)];
    case 'round': return [circle(s.dMm)];
  }
}

/** Width and height of the enclosing box, mm. */
export function shapeSize(s: SectionShape): { widthMm: number; heightMm: number } {
  switch (s.kind) {
    case 'circular-hollow': case 'round': return { widthMm: s.dMm, heightMm: s.dMm };
    case 'flat': return { widthMm: s.tMm, heightMm: s.hMm };
    case 'i-unequal': return { widthMm: Math.max(s.topWidthMm, s.bottomWidthMm), heightMm: s.hMm };
    default: return { widthMm: s.bMm, heightMm: s.hMm };
  }
}

/** The drawing of a shape, or null where a dimension is missing or the parts cannot be drawn. */
export function shapePreview(shape: SectionShape): SectionOutline | null {
  const size = shapeSize(shape);
  if (!(size.widthMm > 0) || !(size.heightMm > 0)) return null;
  const loops = loopsOf(shape);
  const sound = loops.flat().every((s) => [...s.from, ...s.to].every(Number.isFinite));
  return sound ? { loops, box: null, ...size } : null;
}

const names: Record<string, string> = {
  twMm: 't_w', tfMm: 't_f', tMm: 't', rootRadiusMm: 'r', topWidthMm: 'b_top', topThicknessMm: 't_top', bottomWidthMm: 'b_bottom',
  bottomThicknessMm: 't_bottom', outerRadiusMm: 'r_o', innerRadiusMm: 'r_i', clearWidthMm: 'b_clear',
};
/** The thicknesses and radii that the dimension lines do not show: [symbol, mm]. */
export function shapeDetails(shape: SectionShape): [string, number][] {
  return Object.entries(shape).flatMap(([key, value]) => (typeof value === 'number' && value > 0 && names[key] ? [[names[key], value] as [string, number]] : []));
}
