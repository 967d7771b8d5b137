import type { ContourSegment } from './contour.js';

/**
 * Area integrals by Green's theorem: ∬ f(v) dA = ∮ u·f(v) dv round the contour, v being the ordinate (y for the strong
 * axis, x for the weak) and u the other one. Lines and arcs are integrated by Gauss–Legendre rules: three points are exact
 * for the polynomials on a line, eight give ten digits of the products of sines on a quarter circle.
 */
export type Axis = 'y' | 'z';

const linePoints: [number, number][] = [
  [0.5 - Math.sqrt(0.15), 5 / 18], [0.5, 8 / 18], [0.5 + Math.sqrt(0.15), 5 / 18],
];
/** Abramowitz and Stegun, Table 25.4, n = 8, moved to 0…1. */
const arcPoints: [number, number][] = [
  [0.1834346424956498, 0.362683783378362], [0.525532409916329, 0.3137066458778873],
  [0.7966664774136267, 0.2223810344533745], [0.9602898564975363, 0.1012285362903763],
].flatMap(([x, w]): [number, number][] => [[0.5 - x! / 2, w! / 2], [0.5 + x! / 2, w! / 2]]);

/** Parameters 0…1 along a segment at which its ordinate crosses `level`. */
function crossings(s: ContourSegment, axis: Axis, level: number): number[] {
  const v = axis === 'y' ? 1 : 0;
  if (!s.arc) {
    const rise = s.to[v] - s.from[v];
    return rise === 0 ? [] : [(level - s.from[v]) / rise];
  }
  const { centre, radiusMm, startRad, sweepRad } = s.arc;
  const ratio = (level - centre[v]) / radiusMm;
  if (Math.abs(ratio) >= 1) return [];
  const angles = axis === 'y' ? [Math.asin(ratio), Math.PI - Math.asin(ratio)] : [Math.acos(ratio), -Math.acos(ratio)];
  const turn = 2 * Math.PI;
  return angles.map((angle) => {
    const ahead = sweepRad > 0 ? angle - startRad : startRad - angle;
    return (((ahead % turn) + turn) % turn) / Math.abs(sweepRad);
  });
}

function overPiece(s: ContourSegment, axis: Axis, f: (v: number) => number, from: number, to: number): number {
  const sign = axis === 'y' ? 1 : -1;
  let sum = 0;
  for (const [at, weight] of s.arc ? arcPoints : linePoints) {
    const t = from + (to - from) * at;
    let x, y, slope;
    if (s.arc) {
      const angle = s.arc.startRad + s.arc.sweepRad * t;
      const [dx, dy] = [s.arc.radiusMm * Math.cos(angle), s.arc.radiusMm * Math.sin(angle)];
      [x, y] = [s.arc.centre[0] + dx, s.arc.centre[1] + dy];
      slope = (axis === 'y' ? dx : -dy) * s.arc.sweepRad;
    } else {
      const [dx, dy] = [s.to[0] - s.from[0], s.to[1] - s.from[1]];
      [x, y] = [s.from[0] + dx * t, s.from[1] + dy * t];
      slope = axis === 'y' ? dy : dx;
    }
    sum += weight * (axis === 'y' ? x * f(y) : y * f(x)) * slope;
  }
  return sign * sum * (to - from);
}

/** ∬ f dA over the section; `level` names a kink or step of f. */
export function areaIntegral(loops: ContourSegment[][], axis: Axis, f: (v: number) => number, level?: number): number {
  let sum = 0;
  for (const loop of loops) {
    for (const s of loop) {
      const cuts = level === undefined ? [] : crossings(s, axis, level).filter((t) => t > 0 && t < 1).sort((a, b) => a - b);
      let from = 0;
      for (const to of [...cuts, 1]) {
        sum += overPiece(s, axis, f, from, to);
        from = to;
      }
    }
  }
  return sum;
}

/** The level with half the area on either side of it. */
function equalAreaLevel(loops: ContourSegment[][], axis: Axis, areaMm2: number, halfDepthMm: number): number {
  let [low, high] = [-halfDepthMm, halfDepthMm];
  for (let i = 0; i < 48; i += 1) {
    const middle = (low + high) / 2;
    const above = areaIntegral(loops, axis, (v) => (v > middle ? 1 : 0), middle);
    if (above > areaMm2 / 2) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

export interface AxisProperties {
  /** from the middle of the enclosing box, mm */
  centroidMm: number;
  inertiaMm4: number;
  elasticModulusMm3: number;
  plasticModulusMm3: number;
}

/** Second moment, elastic modulus at the farther fibre, and plastic modulus about the equal-area axis. */
export function axisProperties(loops: ContourSegment[][], axis: Axis, depthMm: number, symmetric: boolean): AxisProperties {
  const areaMm2 = areaIntegral(loops, axis, () => 1);
  const centroidMm = symmetric ? 0 : areaIntegral(loops, axis, (v) => v) / areaMm2;
  const inertiaMm4 = areaIntegral(loops, axis, (v) => (v - centroidMm) ** 2);
  const plasticMm = symmetric ? 0 : equalAreaLevel(loops, axis, areaMm2, depthMm / 2);
  return {
    centroidMm,
    inertiaMm4,
    elasticModulusMm3: inertiaMm4 / (depthMm / 2 + Math.abs(centroidMm)),
    plasticModulusMm3: areaIntegral(loops, axis, (v) => Math.abs(v - plasticMm), plasticMm),
  };
}
