/**
 * Elastic lateral-torsional buckling of a length of beam between two places that are held sideways and against twist,
 * under its own moment diagram and with its loads at their own height: what EN 1993-1-1 6.3.2.2(2) asks M_cr to take into
 * account. The energy of a doubly symmetric section (S. P. Timoshenko and J. M. Gere, Theory of Elastic Stability, chapter 6),
 * with the sideways bending eliminated (E·I_z·v″ = −M·φ), is minimised over a series for the twist φ (Rayleigh and Ritz).
 */
export interface LateralStiffness {
  modulusMPa: number;
  shearModulusMPa: number;
  izMm4: number;
  itMm4: number;
  /** 0 where warping is neglected, as of hollow sections */
  iwMm6: number;
}

/** Loads on the length, x from its start; down is positive. */
export type LateralLoad = { atMm: number; forceN: number } | { fromMm: number; toMm: number; intensityAt: (xMm: number) => number };

export interface LateralLength {
  lengthMm: number;
  momentAt: (xMm: number) => number;
  /** where the diagram has a kink, jump or end of load; the ends need not be named */
  kinksMm: readonly number[];
  loads: readonly LateralLoad[];
  /** of the loads above the shear centre; below is negative */
  loadHeightMm: number;
  /** both ends held against sideways movement and twist; or the right end free, the left built in but free to warp */
  ends: 'held' | 'free-at-right';
}

const TERMS = 8;
const gauss: readonly (readonly [number, number])[] = [
  [0, 128 / 225],
  [-Math.sqrt(5 - 2 * Math.sqrt(10 / 7)) / 3, (322 + 13 * Math.sqrt(70)) / 900], [Math.sqrt(5 - 2 * Math.sqrt(10 / 7)) / 3, (322 + 13 * Math.sqrt(70)) / 900],
  [-Math.sqrt(5 + 2 * Math.sqrt(10 / 7)) / 3, (322 - 13 * Math.sqrt(70)) / 900], [Math.sqrt(5 + 2 * Math.sqrt(10 / 7)) / 3, (322 - 13 * Math.sqrt(70)) / 900],
];
type Matrix = number[][];
const square = (): Matrix => Array.from({ length: TERMS }, () => new Array<number>(TERMS).fill(0));

/** A term of the series and its derivatives by ξ = x/L. Powers suit the free end, whose conditions no sine meets. */
interface Term { value: (xi: number) => number; slope: (xi: number) => number; curvature: (xi: number) => number }
const sine = (n: number): Term => {
  const k = n * Math.PI;
  return { value: (xi) => Math.sin(k * xi), slope: (xi) => k * Math.cos(k * xi), curvature: (xi) => -k * k * Math.sin(k * xi) };
};
const power = (n: number): Term => ({ value: (xi) => xi ** n, slope: (xi) => n * xi ** (n - 1), curvature: (xi) => (n < 2 ? 0 : n * (n - 1) * xi ** (n - 2)) });
const series = {
  held: Array.from({ length: TERMS }, (_, i) => sine(i + 1)),
  'free-at-right': Array.from({ length: TERMS }, (_, i) => power(i + 1)),
} satisfies Record<LateralLength['ends'], Term[]>;

/** Adds weight·a·aᵀ. */
function addOuter(into: Matrix, weight: number, a: readonly number[]): void {
  for (let i = 0; i < TERMS; i += 1) for (let j = 0; j <= i; j += 1) into[i]![j]! += weight * a[i]! * a[j]!;
}

/** Whether the lower triangle is that of a positive definite matrix (Cholesky). */
function isPositiveDefinite(m: Matrix): boolean {
  const l = square();
  for (let i = 0; i < TERMS; i += 1) {
    for (let j = 0; j <= i; j += 1) {
      let sum = m[i]![j]!;
      for (let k = 0; k < j; k += 1) sum -= l[i]![k]! * l[j]![k]!;
      if (i === j) {
        if (!(sum > 0)) return false;
        l[i]![i] = Math.sqrt(sum);
      } else l[i]![j] = sum / l[j]![j]!;
    }
  }
  return true;
}

/**
 * The factor by which moments and loads together must be raised for the length to buckle; Infinity where nothing buckles it.
 * Lengths in mm, moments in N·mm.
 */
export function bucklingFactor(length: LateralLength, stiffness: LateralStiffness): number {
  const { lengthMm: l, loadHeightMm } = length;
  const { modulusMPa: e, shearModulusMPa: g, izMm4, itMm4, iwMm6 } = stiffness;
  const terms = series[length.ends];
  const [elastic, bending, lifting] = [square(), square(), square()];
  const cuts = [...new Set([0, ...length.kinksMm.filter((x) => x > 0 && x < l), l, ...[1, 2, 3].map((i) => (i * l) / 4)])].sort((a, b) => a - b);
  let greatest = 0;
  cuts.slice(1).forEach((end, i) => {
    const half = (end - cuts[i]!) / 2;
    for (const [place, weight] of gauss) {
      const x = cuts[i]! + half * (1 + place);
      const xi = x / l;
      const width = weight * half;
      const moment = length.momentAt(x);
      greatest = Math.max(greatest, Math.abs(moment));
      const value = terms.map((t) => t.value(xi));
      addOuter(elastic, (e * iwMm6 * width) / l ** 4, terms.map((t) => t.curvature(xi)));
      addOuter(elastic, (g * itMm4 * width) / l ** 2, terms.map((t) => t.slope(xi)));
      addOuter(bending, (moment * moment * width) / (e * izMm4), value);
      for (const load of length.loads) {
        if ('fromMm' in load && x > load.fromMm && x < load.toMm) addOuter(lifting, load.intensityAt(x) * loadHeightMm * width, value);
      }
    }
  });
  for (const load of length.loads) if ('atMm' in load) addOuter(lifting, load.forceN * loadHeightMm, terms.map((t) => t.value(load.atMm / l)));
  if (greatest === 0) return Infinity;
  const stands = (factor: number) => isPositiveDefinite(elastic.map((row, i) => row.map((k, j) => k - factor * factor * bending[i]![j]! - factor * lifting[i]![j]!)));
  return greatestThatStands(stands, uniformCriticalMoment(l, stiffness) / greatest);
}

/** Bisection from a first guess; 40 halvings leave a relative error below 1e-11. */
function greatestThatStands(stands: (factor: number) => boolean, guess: number): number {
  let low = 0;
  let high = guess;
  for (let i = 0; i < 60 && stands(high); i += 1) {
    low = high;
    high *= 2;
  }
  for (let i = 0; i < 44; i += 1) {
    const middle = (low + high) / 2;
    if (stands(middle)) low = middle;
    else high = middle;
  }
  return low;
}

/** M_cr of a length under uniform moment, held at both ends. */
export function uniformCriticalMoment(lengthMm: number, { modulusMPa, shearModulusMPa, izMm4, itMm4, iwMm6 }: LateralStiffness): number {
  const k = Math.PI / lengthMm;
  return k * Math.sqrt(modulusMPa * izMm4 * (shearModulusMPa * itMm4 + modulusMPa * iwMm6 * k * k));
}
