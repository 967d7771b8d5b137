import { beamDiagram } from './beam-diagram.js';
import type { BeamLoad, BeamSupports } from './beam-types.js';
import { bucklingFactor } from './lateral-buckling.js';
import type { LateralLength, LateralStiffness } from './lateral-buckling.js';

/*
 * Second route for M_cr: line elements with cubic sideways movement v and twist φ (four unknowns a node: v, v′, φ, φ′), both kept as
 * unknowns, where the code under test eliminates one and takes a series for the other. The energy is the one of Timoshenko and Gere,
 *   ½∫(E·I_z·v″² + E·I_w·φ″² + G·I_t·φ′²) + λ·(∫M·v″·φ − ½Σ q·z_g·φ²);
 * λ is where the stiffness first loses a positive pivot.
 */
const ELEMENTS = 12;
const gauss = [[-0.8611363115940526, 0.3478548451374538], [-0.3399810435848563, 0.6521451548625461], [0.3399810435848563, 0.6521451548625461], [0.8611363115940526, 0.3478548451374538]] as const;
interface Line {
  lengthMm: number;
  momentAt: (x: number) => number;
  intensityNPerMm?: number;
  forces?: { atMm: number; forceN: number }[];
  heightMm?: number;
  /** unknowns that are nothing: node (from the left, ELEMENTS the last), which of v, v′, φ, φ′ */
  fixed: [number, 0 | 1 | 2 | 3][];
  /** height of an axis held by springs stiff enough */
  heldMm?: number;
}
const forks: Line['fixed'] = [[0, 0], [0, 2], [ELEMENTS, 0], [ELEMENTS, 2]];

const hermite = (s: number, h: number) => ({
  f: [1 - 3 * s * s + 2 * s ** 3, h * (s - 2 * s * s + s ** 3), 3 * s * s - 2 * s ** 3, h * (s ** 3 - s * s)],
  d: [(-6 * s + 6 * s * s) / h, 1 - 4 * s + 3 * s * s, (6 * s - 6 * s * s) / h, 3 * s * s - 2 * s],
  dd: [(-6 + 12 * s) / (h * h), (-4 + 6 * s) / h, (6 - 12 * s) / (h * h), (6 * s - 2) / h],
});

function lineElementFactor(line: Line, { modulusMPa: E, shearModulusMPa: G, izMm4, itMm4, iwMm6 }: LateralStiffness): number {
  const h = line.lengthMm / ELEMENTS;
  const size = 4 * (ELEMENTS + 1);
  const K = Array.from({ length: size }, () => new Float64Array(size));
  const S = Array.from({ length: size }, () => new Float64Array(size));
  const height = line.heightMm ?? 0;
  for (let e = 0; e < ELEMENTS; e += 1) {
    const v = [0, 1, 4, 5].map((i) => 4 * e + i);
    const p = [2, 3, 6, 7].map((i) => 4 * e + i);
    for (const [place, weight] of gauss) {
      const s = (1 + place) / 2;
      const w = (weight * h) / 2;
      const { f, d, dd } = hermite(s, h);
      const moment = line.momentAt((e + s) * h);
      for (let i = 0; i < 4; i += 1) {
        for (let j = 0; j < 4; j += 1) {
          K[v[i]!]![v[j]!]! += w * E * izMm4 * dd[i]! * dd[j]!;
          K[p[i]!]![p[j]!]! += w * (E * iwMm6 * dd[i]! * dd[j]! + G * itMm4 * d[i]! * d[j]!);
          S[v[i]!]![p[j]!]! += w * moment * dd[i]! * f[j]!;
          S[p[j]!]![v[i]!]! += w * moment * dd[i]! * f[j]!;
          S[p[i]!]![p[j]!]! -= w * (line.intensityNPerMm ?? 0) * height * f[i]! * f[j]!;
          if (line.heldMm === undefined) continue;
          const spring = w * 1e3 * f[i]! * f[j]!;
          K[v[i]!]![v[j]!]! += spring;
          K[v[i]!]![p[j]!]! += spring * line.heldMm;
          K[p[i]!]![v[j]!]! += spring * line.heldMm;
          K[p[i]!]![p[j]!]! += spring * line.heldMm ** 2;
        }
      }
    }
  }
  for (const { atMm, forceN } of line.forces ?? []) {
    const at = 4 * Math.round(atMm / h) + 2;
    S[at]![at]! -= forceN * height;
  }
  const fixed = new Set(line.fixed.map(([node, which]) => 4 * node + which));
  const free = Array.from({ length: size }, (_, i) => i).filter((i) => !fixed.has(i));
  const stands = (factor: number): boolean => {
    const m = free.map((i) => Float64Array.from(free, (j) => K[i]![j]! + factor * S[i]![j]!));
    for (let k = 0; k < free.length; k += 1) {
      const pivot = m[k]![k]!;
      if (!(pivot > 0)) return false;
      // unknowns of one node meet those of its neighbours only
      for (let i = k + 1; i < Math.min(k + 9, free.length); i += 1) {
        const share = m[i]![k]! / pivot;
        if (share !== 0) for (let j = k; j < Math.min(k + 9, free.length); j += 1) m[i]![j]! -= share * m[k]![j]!;
      }
    }
    return true;
  };
  let [low, high] = [0, 1e-6];
  while (stands(high)) [low, high] = [high, high * 2];
  for (let i = 0; i < 24; i += 1) {
    const middle = (low + high) / 2;
    if (stands(middle)) low = middle; else high = middle;
  }
  return low;
}

/** about an IPE 400, and a narrow tall box that hardly warps */
const rolled: LateralStiffness = { modulusMPa: 210_000, shearModulusMPa: 81_000, izMm4: 1318e4, itMm4: 51.1e4, iwMm6: 490e9 };
const tube: LateralStiffness = { modulusMPa: 210_000, shearModulusMPa: 81_000, izMm4: 800e4, itMm4: 2000e4, iwMm6: 0 };
const L = 6000;
const length = (own: Partial<LateralLength> & Pick<LateralLength, 'momentAt'>): LateralLength =>
  ({ lengthMm: L, kinksMm: [], loads: [], loadHeightMm: 0, ends: 'held', heldHeightMm: null, ...own });

describe('the buckling factor against line elements', () => {
  it.each([1, 0.5, 0, -0.5, -1])('end moments in the ratio %d', (ratio) => {
    const momentAt = (x: number) => 1e6 * (1 + ((ratio - 1) * x) / L);
    for (const stiffness of [rolled, tube]) {
      expect(bucklingFactor(length({ momentAt }), stiffness) / lineElementFactor({ lengthMm: L, momentAt, fixed: forks }, stiffness)).toBeCloseTo(1, 2.3);
    }
  });

  it.each([-200, 0, 200])('a distributed load %d mm above the shear centre', (heightMm) => {
    const momentAt = (x: number) => (x * (L - x)) / 2;
    const own = bucklingFactor(length({ momentAt, loads: [{ fromMm: 0, toMm: L, intensityAt: () => 1 }], loadHeightMm: heightMm }), rolled);
    expect(own / lineElementFactor({ lengthMm: L, momentAt, intensityNPerMm: 1, heightMm, fixed: forks }, rolled)).toBeCloseTo(1, 2.3);
  });

  it.each([-200, 0, 200])('a force at a third, %d mm above the shear centre', (heightMm) => {
    const momentAt = (x: number) => 1e3 * (x < L / 3 ? (2 * x) / 3 : (L - x) / 3);
    const own = bucklingFactor(length({ momentAt, kinksMm: [L / 3], loads: [{ atMm: L / 3, forceN: 1e3 }], loadHeightMm: heightMm }), rolled);
    expect(own / lineElementFactor({ lengthMm: L, momentAt, forces: [{ atMm: L / 3, forceN: 1e3 }], heightMm, fixed: forks }, rolled)).toBeCloseTo(1, 2.3);
  });

  it('a force at mid-span with lateral supports at the quarters: each length as by elements, the whole beam no weaker than its weakest length', () => {
    const momentAt = (x: number) => 500 * Math.min(x, L - x);
    const load = { forceN: 1e3, heightMm: 200 };
    const outer = bucklingFactor(length({ lengthMm: L / 4, momentAt }), rolled);
    const inner = bucklingFactor(length({ lengthMm: L / 2, momentAt: (x) => momentAt(x + L / 4), kinksMm: [L / 4], loads: [{ atMm: L / 4, forceN: 1e3 }], loadHeightMm: 200 }), rolled);
    expect(outer / lineElementFactor({ lengthMm: L / 4, momentAt, fixed: forks }, rolled)).toBeCloseTo(1, 2.3);
    expect(inner / lineElementFactor({ lengthMm: L / 2, momentAt: (x) => momentAt(x + L / 4), forces: [{ atMm: L / 4, forceN: load.forceN }], heightMm: load.heightMm, fixed: forks }, rolled)).toBeCloseTo(1, 2.3);
    const quarters: Line['fixed'] = [ELEMENTS / 4, (3 * ELEMENTS) / 4].flatMap((node): Line['fixed'] => [[node, 0], [node, 2]]);
    const whole = lineElementFactor({ lengthMm: L, momentAt, forces: [{ atMm: L / 2, forceN: load.forceN }], heightMm: load.heightMm, fixed: [...forks, ...quarters] }, rolled);
    expect(Math.min(outer, inner)).toBeLessThanOrEqual(whole * 1.001);
  });

  const rootFreeToWarp: Line['fixed'] = [[0, 0], [0, 1], [0, 2]];
  it.each([-200, 0, 200])('a cantilever with a force at its tip, %d mm above the shear centre; a root that cannot warp is stronger', (heightMm) => {
    const momentAt = (x: number) => 1e3 * (x - L);
    const forces = [{ atMm: L, forceN: 1e3 }];
    const own = bucklingFactor(length({ momentAt, loads: forces, loadHeightMm: heightMm, ends: 'free-at-right' }), rolled);
    expect(own / lineElementFactor({ lengthMm: L, momentAt, forces, heightMm, fixed: rootFreeToWarp }, rolled)).toBeCloseTo(1, 2.3);
    expect(own).toBeLessThan(lineElementFactor({ lengthMm: L, momentAt, forces, heightMm, fixed: [...rootFreeToWarp, [0, 3]] }, rolled));
  });

  const d = 200;
  it('a hogging moment with the top flange held: (E·(I_w + I_z·d²)·π²/L² + G·I_t)/(2·d)', () => {
    const closed = (rolled.modulusMPa * (rolled.iwMm6 + rolled.izMm4 * d * d) * (Math.PI / L) ** 2 + rolled.shearModulusMPa * rolled.itMm4) / (2 * d);
    expect(bucklingFactor(length({ momentAt: () => -1, heldHeightMm: d }), rolled) / closed).toBeCloseTo(1, 6);
    expect(lineElementFactor({ lengthMm: L, momentAt: () => -1e6, heldMm: d, fixed: forks }, rolled) / (closed / 1e6)).toBeCloseTo(1, 2.3);
    expect(bucklingFactor(length({ momentAt: () => 1, heldHeightMm: d }), rolled)).toBe(Infinity);
  });

  it.each<[BeamSupports, number, Line['fixed']]>([
    ['fixed', 6000, forks], ['fixed', 12_000, forks], ['propped', 9000, forks], ['cantilever', 4000, [[0, 0], [0, 2]]],
  ])('a %s beam of %d mm whose top flange is held, loaded on top', (supports, spanMm, fixed) => {
    const loads: BeamLoad[] = [{ kind: 'distributed', fromMm: 0, toMm: spanMm, startNPerMm: 10, endNPerMm: 10 }];
    const { momentAt } = beamDiagram({ supports, spanMm, loads });
    const own = bucklingFactor(length({
      lengthMm: spanMm, momentAt, loads: [{ fromMm: 0, toMm: spanMm, intensityAt: () => 10 }], loadHeightMm: d, heldHeightMm: d, ends: supports === 'cantilever' ? 'free-at-right' : 'held',
    }), rolled);
    expect(own / lineElementFactor({ lengthMm: spanMm, momentAt, intensityNPerMm: 10, heightMm: d, heldMm: d, fixed }, rolled)).toBeCloseTo(1, 2.3);
  });
});
