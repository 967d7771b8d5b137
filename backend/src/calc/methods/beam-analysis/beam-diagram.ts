import type { Beam, BeamLoad, BeamSupports } from './beam-types.js';

/**
 * Moment and shear along a beam of one stiffness throughout, by equilibrium and, where the supports are more than
 * equilibrium can settle, by the fixed-end moments of elementary beam theory. N·mm and N; sagging and upward-left positive.
 */
export interface BeamDiagram {
  spanMm: number;
  momentAt: (xMm: number) => number;
  /** just right of a point load */
  shearAt: (xMm: number) => number;
  /** where the diagram may turn or jump: ends, loads, points without shear; ascending */
  pointsMm: readonly number[];
}

/** Three points integrate polynomials up to the fifth degree exactly; a straight load times a cubic is of the fourth. */
const gauss = [[-Math.sqrt(0.6), 5 / 9], [0, 8 / 9], [Math.sqrt(0.6), 5 / 9]] as const;

/** Σ P·f(a), or ∫ w·f ds: the effect of a load by the influence line f of a unit force, f a cubic at most. */
function byInfluence(load: BeamLoad, influence: (xMm: number) => number): number {
  if (load.kind === 'point') return load.forceN * influence(load.atMm);
  const half = (load.toMm - load.fromMm) / 2;
  const middle = (load.toMm + load.fromMm) / 2;
  return gauss.reduce((sum, [place, weight]) => {
    const share = (place + 1) / 2;
    const intensity = load.startNPerMm + (load.endNPerMm - load.startNPerMm) * share;
    return sum + weight * half * intensity * influence(middle + half * place);
  }, 0);
}

const total = (loads: readonly BeamLoad[], influence: (xMm: number) => number): number =>
  loads.reduce((sum, load) => sum + byInfluence(load, influence), 0);

/** Moments at the two ends. Influence lines of a built-in end: handbooks of structural mechanics. */
function endMoments(supports: BeamSupports, spanMm: number, loads: readonly BeamLoad[]): [number, number] {
  const l = spanMm;
  switch (supports) {
    case 'simple': return [0, 0];
    case 'cantilever': return [-total(loads, (a) => a), 0];
    case 'propped': return [-total(loads, (a) => ((l - a) * (l * l - (l - a) ** 2)) / (2 * l * l)), 0];
    case 'fixed': return [-total(loads, (a) => (a * (l - a) ** 2) / (l * l)), -total(loads, (a) => (a * a * (l - a)) / (l * l))];
  }
}

/** What the part of a load left of x takes from the shear, and from the moment, at x. */
function leftOf(load: BeamLoad, xMm: number): { force: number; moment: number } {
  if (load.kind === 'point') {
    return xMm < load.atMm ? { force: 0, moment: 0 } : { force: load.forceN, moment: load.forceN * (xMm - load.atMm) };
  }
  const covered = Math.min(xMm, load.toMm) - load.fromMm;
  if (covered <= 0) return { force: 0, moment: 0 };
  const rise = (load.endNPerMm - load.startNPerMm) / (load.toMm - load.fromMm);
  const arm = xMm - load.fromMm;
  return {
    force: load.startNPerMm * covered + (rise * covered ** 2) / 2,
    moment: load.startNPerMm * (arm * covered - covered ** 2 / 2) + rise * ((arm * covered ** 2) / 2 - covered ** 3 / 3),
  };
}

/** Roots of the parabola through the values at 0, ½ and 1, strictly between. */
function rootsWithin(atStart: number, atMiddle: number, atEnd: number): number[] {
  const a = 2 * (atStart - 2 * atMiddle + atEnd);
  const b = atEnd - atStart - a;
  const scale = Math.max(Math.abs(atStart), Math.abs(atMiddle), Math.abs(atEnd));
  if (scale === 0) return [];
  if (Math.abs(a) <= 1e-12 * scale) return b === 0 ? [] : [-atStart / b].filter((t) => t > 0 && t < 1);
  const inner = b * b - 4 * a * atStart;
  if (inner < 0) return [];
  const q = -0.5 * (b + Math.sign(b || 1) * Math.sqrt(inner));
  return [q / a, q === 0 ? 0 : atStart / q].filter((t) => t > 0 && t < 1);
}

export function beamDiagram({ supports, spanMm, loads }: Beam): BeamDiagram {
  const [atLeft, atRight] = endMoments(supports, spanMm, loads);
  const reaction = supports === 'cantilever'
    ? total(loads, () => 1)
    : total(loads, (a) => (spanMm - a) / spanMm) + (atRight - atLeft) / spanMm;
  const momentAt = (x: number) => loads.reduce((sum, load) => sum - leftOf(load, x).moment, atLeft + reaction * x);
  const shearAt = (x: number) => loads.reduce((sum, load) => sum - leftOf(load, x).force, reaction);
  const breaks = [...new Set([0, spanMm, ...loads.flatMap((load) => (load.kind === 'point' ? [load.atMm] : [load.fromMm, load.toMm]))])].sort((a, b) => a - b);
  const turning = breaks.slice(1).flatMap((end, i) => {
    const start = breaks[i]!;
    const width = end - start;
    // the shear jumps at a point load: its value just left of the end is wanted
    const before = shearAt(end) + loads.reduce((sum, load) => sum + (load.kind === 'point' && load.atMm === end ? load.forceN : 0), 0);
    return rootsWithin(shearAt(start), shearAt(start + width / 2), before).map((share) => start + share * width);
  });
  return { spanMm, momentAt, shearAt, pointsMm: [...new Set([...breaks, ...turning])].sort((a, b) => a - b) };
}

/** Greatest moment in size between two places, ends included. */
export function greatestMoment(diagram: BeamDiagram, fromMm = 0, toMm = diagram.spanMm): { atMm: number; momentNmm: number } {
  const places = [fromMm, ...diagram.pointsMm.filter((x) => x > fromMm && x < toMm), toMm];
  return places
    .map((atMm) => ({ atMm, momentNmm: diagram.momentAt(atMm) }))
    .reduce((most, one) => (Math.abs(one.momentNmm) > Math.abs(most.momentNmm) ? one : most));
}

/** Greatest shear in size; both sides of every point load are looked at. */
export function greatestShear(diagram: BeamDiagram): number {
  const eps = diagram.spanMm * 1e-9;
  return diagram.pointsMm.reduce((most, x) => Math.max(most, Math.abs(diagram.shearAt(Math.min(x, diagram.spanMm - eps))), Math.abs(diagram.shearAt(Math.max(x - eps, 0)))), 0);
}
