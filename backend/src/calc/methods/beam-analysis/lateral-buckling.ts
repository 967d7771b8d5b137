/**
 * Elastic lateral-torsional buckling of a length of beam between two places that are held sideways and against twist,
 * under its own moment diagram and with its loads at their own height: what EN 1993-1-1 6.3.2.2(2) asks M_cr to take into
 * account. The energy of a doubly symmetric section (S. P. Timoshenko and J. M. Gere, Theory of Elastic Stability, chapter 6),
 *   ½∫(E·I_z·v″² + E·I_w·φ″² + G·I_t·φ′²) + ∫M·v″·φ − ½Σ q·z_g·φ²,
 * is minimised over a series for the twist φ (Rayleigh and Ritz). The sideways movement v follows from φ: by E·I_z·v″ = −M·φ
 * where the length is free between its ends; by v = −d·φ where an axis at the height d is held along it.
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
  /** sagging positive */
  momentAt: (xMm: number) => number;
  /** where the diagram has a kink, jump or end of load; the ends need not be named */
  kinksMm: readonly number[];
  loads: readonly LateralLoad[];
  /** of the loads above the shear centre; below is negative */
  loadHeightMm: number;
  /** both ends held against sideways movement and twist; or the right end free, the left built in but free to warp */
  ends: 'held' | 'free-at-right';
  /** height above the shear centre of an axis that is held sideways all along, as a top flange by a slab; null where none is */
  heldHeightMm: number | null;
}

/** The highest terms come first, so that the last pivots tell of the lowest modes. */
const TERMS = 10;
const termAt = (i: number): number => TERMS - i;
const gauss: readonly (readonly [number, number])[] = [
  [0, 128 / 225],
  [-Math.sqrt(5 - 2 * Math.sqrt(10 / 7)) / 3, (322 + 13 * Math.sqrt(70)) / 900], [Math.sqrt(5 - 2 * Math.sqrt(10 / 7)) / 3, (322 + 13 * Math.sqrt(70)) / 900],
  [-Math.sqrt(5 + 2 * Math.sqrt(10 / 7)) / 3, (322 - 13 * Math.sqrt(70)) / 900], [Math.sqrt(5 + 2 * Math.sqrt(10 / 7)) / 3, (322 - 13 * Math.sqrt(70)) / 900],
];
/** Square, by rows; only the lower triangle is used. */
type Matrix = Float64Array;
const square = (): Matrix => new Float64Array(TERMS * TERMS);

/** The series: sines between held ends; powers where an end is free, whose conditions no sine meets. Derivatives by ξ = x/L. */
function fillTerms(ends: LateralLength['ends'], xi: number, value: Float64Array, curvature: Float64Array): void {
  if (ends === 'free-at-right') {
    for (let i = 0; i < TERMS; i += 1) {
      const n = termAt(i);
      value[i] = xi ** n;
      curvature[i] = n < 2 ? 0 : n * (n - 1) * xi ** (n - 2);
    }
    return;
  }
  // sin((n + 1)a) = 2·cos(a)·sin(na) − sin((n − 1)a)
  const twice = 2 * Math.cos(Math.PI * xi);
  let before = 0;
  let sine = Math.sin(Math.PI * xi);
  for (let i = TERMS - 1; i >= 0; i -= 1) {
    value[i] = sine;
    curvature[i] = -((termAt(i) * Math.PI) ** 2) * sine;
    [before, sine] = [sine, twice * sine - before];
  }
}

/** ∫f″ᵢf″ⱼ dξ and ∫f′ᵢf′ⱼ dξ of the series over its length, in closed form. */
const elasticParts = (ends: LateralLength['ends']): { warping: Matrix; twisting: Matrix } => {
  const [warping, twisting] = [square(), square()];
  for (let i = 0; i < TERMS; i += 1) {
    for (let j = 0; j <= i; j += 1) {
      const [n, m] = [termAt(i), termAt(j)];
      if (ends === 'free-at-right') {
        warping[i * TERMS + j] = n < 2 || m < 2 ? 0 : (n * (n - 1) * m * (m - 1)) / (n + m - 3);
        twisting[i * TERMS + j] = (n * m) / (n + m - 1);
      } else if (i === j) {
        warping[i * TERMS + j] = (n * Math.PI) ** 4 / 2;
        twisting[i * TERMS + j] = (n * Math.PI) ** 2 / 2;
      }
    }
  }
  return { warping, twisting };
};
const parts = { held: elasticParts('held'), 'free-at-right': elasticParts('free-at-right') } as const;

/** Adds weight·½(a·bᵀ + b·aᵀ). */
function addProduct(into: Matrix, weight: number, a: Float64Array, b: Float64Array): void {
  for (let i = 0; i < TERMS; i += 1) {
    const [ai, bi] = [0.5 * weight * a[i]!, 0.5 * weight * b[i]!];
    for (let j = 0; j <= i; j += 1) into[i * TERMS + j]! += ai * b[j]! + bi * a[j]!;
  }
}

/** The energy of a length: elastic − factor²·quadratic − factor·(linear + lifting). */
export interface LateralEnergy {
  elastic: Matrix;
  quadratic: Matrix;
  linear: Matrix;
  /** of the loads' height */
  lifting: Matrix;
  /** a first guess of the factor; 0 where there is no moment */
  guess: number;
}

/** Upward loads above the shear centre would help; that help is not counted, since the height may be no more than a default. */
const liftOf = (load: number, heightMm: number): number => (load < 0 && heightMm > 0 ? 0 : load * heightMm);

export function lateralEnergy(length: LateralLength, stiffness: LateralStiffness): LateralEnergy {
  const { lengthMm: l, loadHeightMm, heldHeightMm: held, ends } = length;
  const { modulusMPa: e, shearModulusMPa: g, izMm4, itMm4, iwMm6 } = stiffness;
  const { warping, twisting } = parts[ends];
  const warpingStiffness = (e * (iwMm6 + izMm4 * (held ?? 0) ** 2)) / l ** 3;
  const elastic = warping.map((one, i) => warpingStiffness * one + ((g * itMm4) / l) * twisting[i]!);
  const [quadratic, linear, lifting] = [square(), square(), square()];
  const [value, curvature] = [new Float64Array(TERMS), new Float64Array(TERMS)];
  const cuts = [...new Set([0, ...length.kinksMm.filter((x) => x > 0 && x < l), l, ...[1, 2, 3].map((i) => (i * l) / 4)])].sort((a, b) => a - b);
  let greatest = 0;
  for (let c = 1; c < cuts.length; c += 1) {
    const half = (cuts[c]! - cuts[c - 1]!) / 2;
    for (const [place, weight] of gauss) {
      const x = cuts[c - 1]! + half * (1 + place);
      const moment = length.momentAt(x);
      greatest = Math.max(greatest, Math.abs(moment));
      fillTerms(ends, x / l, value, curvature);
      if (held === null) addProduct(quadratic, (moment * moment * weight * half) / (e * izMm4), value, value);
      else addProduct(linear, (2 * held * moment * weight * half) / l ** 2, value, curvature);
      let lift = 0;
      for (const load of length.loads) if ('fromMm' in load && x > load.fromMm && x < load.toMm) lift += liftOf(load.intensityAt(x), loadHeightMm);
      if (lift !== 0) addProduct(lifting, lift * weight * half, value, value);
    }
  }
  for (const load of length.loads) {
    if (!('atMm' in load)) continue;
    fillTerms(ends, load.atMm / l, value, curvature);
    addProduct(lifting, liftOf(load.forceN, loadHeightMm), value, value);
  }
  return { elastic, quadratic, linear, lifting, guess: greatest === 0 ? 0 : uniformCriticalMoment(l, stiffness) / greatest };
}

/** Whether the energy is positive at a factor for every twist: all pivots of its factorisation are. `work` is scratch space. */
function stands({ elastic, quadratic, linear, lifting }: LateralEnergy, factor: number, heightCounts: boolean, work: Matrix): boolean {
  const height = heightCounts ? factor : 0;
  for (let i = 0; i < TERMS; i += 1) {
    for (let j = 0; j <= i; j += 1) {
      const at = i * TERMS + j;
      let sum = elastic[at]! - factor * factor * quadratic[at]! - factor * linear[at]! - height * lifting[at]!;
      for (let k = 0; k < j; k += 1) sum -= work[i * TERMS + k]! * work[j * TERMS + k]!;
      if (i !== j) work[at] = sum / work[j * TERMS + j]!;
      else if (sum > 0) work[at] = Math.sqrt(sum);
      else return false;
    }
  }
  return true;
}

/** Nothing that matters buckles at so many times the first guess. */
const BEYOND = 1e4;

/** The factor by which moments and loads together must be raised for the length to buckle; Infinity where nothing buckles it. */
export function factorOf(energy: LateralEnergy, heightCounts = true): number {
  const { guess } = energy;
  if (guess === 0) return Infinity;
  const work = square();
  let low = 0;
  let high = guess;
  while (stands(energy, high, heightCounts, work)) {
    if (high > BEYOND * guess) return Infinity;
    low = high;
    high *= 2;
  }
  while (high - low > 1e-10 * high) {
    const middle = (low + high) / 2;
    if (stands(energy, middle, heightCounts, work)) low = middle;
    else high = middle;
  }
  return low;
}

/** Lengths in mm, moments in N·mm. */
export const bucklingFactor = (length: LateralLength, stiffness: LateralStiffness): number => factorOf(lateralEnergy(length, stiffness));

/** M_cr of a length under uniform moment, held at both ends. */
export function uniformCriticalMoment(lengthMm: number, { modulusMPa, shearModulusMPa, izMm4, itMm4, iwMm6 }: LateralStiffness): number {
  const k = Math.PI / lengthMm;
  return k * Math.sqrt(modulusMPa * izMm4 * (shearModulusMPa * itMm4 + modulusMPa * iwMm6 * k * k));
}
