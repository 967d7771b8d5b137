import { bucklingFactor, uniformCriticalMoment } from './lateral-buckling.js';
import type { LateralLength, LateralStiffness } from './lateral-buckling.js';

/** A narrow rectangle: no warping, so that the classical closed results apply. */
const narrow: LateralStiffness = { modulusMPa: 210_000, shearModulusMPa: 81_000, izMm4: 1e6, itMm4: 4e6, iwMm6: 0 };
const unit = Math.sqrt(narrow.modulusMPa * narrow.izMm4 * narrow.shearModulusMPa * narrow.itMm4);
/** an I section about the size of an IPE 400 */
const rolled: LateralStiffness = { modulusMPa: 210_000, shearModulusMPa: 81_000, izMm4: 1318e4, itMm4: 51.1e4, iwMm6: 490e9 };
const L = 6000;
const plain = (momentAt: (x: number) => number, more: Partial<LateralLength> = {}): LateralLength => ({ lengthMm: L, momentAt, kinksMm: [], loads: [], loadHeightMm: 0, ends: 'held', heldHeightMm: null, ...more });

describe('elastic lateral-torsional buckling', () => {
  // S. P. Timoshenko and J. M. Gere, Theory of Elastic Stability, chapter 6 (memory)
  it.each([
    ['uniform moment: π', plain(() => 1), Math.PI, 1],
    ['mid-span force: P·L²/√ = 16.94', plain((x) => Math.min(x, L - x), { kinksMm: [L / 2], loads: [{ atMm: L / 2, forceN: 2 }] }), 16.94 / 4, L / 2],
    ['uniform load: w·L³/√ = 28.3', plain((x) => (x * (L - x)) / 2), 28.3 / 8, (L * L) / 8],
    ['cantilever, force at the tip: 4.013', plain((x) => x - L, { ends: 'free-at-right' }), 4.013, L],
    ['cantilever, uniform load: 12.85/2', plain((x) => -((L - x) ** 2) / 2, { ends: 'free-at-right' }), 12.85 / 2, (L * L) / 2],
    ['cantilever, moment at the tip: π/2', plain(() => -1, { ends: 'free-at-right' }), Math.PI / 2, 1],
  ])('agrees with the classical result for a narrow rectangle under %s', (_, length, expected, greatest) => {
    const moment = bucklingFactor(length, narrow) * greatest;
    expect((moment * L) / unit / expected).toBeCloseTo(1, 2.5);
  });

  it('gives the closed expression for uniform moment with warping', () => {
    expect(bucklingFactor(plain(() => 1), rolled) / uniformCriticalMoment(L, rolled)).toBeCloseTo(1, 6);
  });

  // C1 for end moments, NCCI SN003 Table 3.1 (memory): the least values, which hold without warping
  it.each([[1, 1], [0.75, 1.14], [0.5, 1.31], [0.25, 1.52], [0, 1.77], [-0.25, 2.05], [-0.5, 2.33], [-0.75, 2.57], [-1, 2.55]])('C1 for end moments in the ratio %d is %d without warping, no less with it', (psi, c1) => {
    const c1Of = (stiffness: LateralStiffness) => bucklingFactor(plain((x) => 1 + (psi - 1) * (x / L)), stiffness) / uniformCriticalMoment(L, stiffness);
    expect(Math.abs(c1Of(narrow) - c1)).toBeLessThan(0.006);
    expect(c1Of(rolled)).toBeGreaterThan(c1Of(narrow) - 1e-6);
  });

  it('falls as the load rises above the shear centre, and gains below it', () => {
    const at = (loadHeightMm: number) => bucklingFactor(
      plain((x) => (x * (L - x)) / 2, { loads: [{ fromMm: 0, toMm: L, intensityAt: () => 1 }], loadHeightMm }), rolled);
    expect(at(200)).toBeLessThan(at(0));
    expect(at(-200)).toBeGreaterThan(at(0));
    // NCCI SN003 Table 3.2 (memory): C1 = 1.127, C2 = 0.454 for a uniform load
    const general = (zg: number) => {
      const s2 = rolled.iwMm6 / rolled.izMm4 + (L * L * rolled.shearModulusMPa * rolled.itMm4) / (Math.PI ** 2 * rolled.modulusMPa * rolled.izMm4);
      return ((1.127 * Math.PI ** 2 * rolled.modulusMPa * rolled.izMm4) / (L * L)) * (Math.sqrt(s2 + (0.454 * zg) ** 2) - 0.454 * zg);
    };
    for (const zg of [-200, 0, 200]) expect(Math.abs((at(zg) * L * L) / 8 / general(zg) - 1)).toBeLessThan(0.02);
  });

  it('is the same whichever end comes first and whichever way the moment turns', () => {
    const one = bucklingFactor(plain((x) => 1 - (0.7 * x) / L), rolled);
    expect(bucklingFactor(plain((x) => 0.3 + (0.7 * x) / L), rolled) / one).toBeCloseTo(1, 8);
    expect(bucklingFactor(plain((x) => -1 + (0.7 * x) / L), rolled) / one).toBeCloseTo(1, 8);
  });

  it('never buckles where there is no moment', () => {
    expect(bucklingFactor(plain(() => 0), rolled)).toBe(Infinity);
  });
});
