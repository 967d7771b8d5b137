import { defaultDesignBasis, memberDesignSchema } from '@mantlet/common';
import type { MemberType, SectionShape } from '@mantlet/common';
import { bucklingFactor, uniformCriticalMoment } from '../methods/beam-analysis/lateral-buckling.js';
import type { LateralLength, LateralStiffness } from '../methods/beam-analysis/lateral-buckling.js';
import { criticalTemperature } from '../methods/critical-temperature.js';
import { sectionProperties } from '../sections/index.js';
import type { ValidationCase, ValidationSet } from './validation-case.js';

/** NaN, which no case accepts, where the core refuses. */
function temperatureOf(shape: SectionShape, yieldStrengthMPa: number, memberType: MemberType, design: object): number {
  const result = criticalTemperature({
    basis: { way: 'calculated', reference: 'validation', design: memberDesignSchema.parse(design) }, memberType, shape, properties: sectionProperties(shape),
    steel: { grade: `S${yieldStrengthMPa}`, yieldStrengthMPa }, exposure: { arrangement: 'four-sides', reason: '' }, design: defaultDesignBasis, accepted: false,
  });
  return result.kind === 'determined' ? result.temperatureC : NaN;
}
const i = (hMm: number, bMm: number, twMm: number, tfMm: number, rootRadiusMm: number): SectionShape => ({ kind: 'i', hMm, bMm, twMm, tfMm, rootRadiusMm });
const printed = 'section properties rounded as tables print them';

const members: ValidationCase[] = [
  {
    what: 'Simple beam of 9 m, 453.4 × 189.9 × 8.5 × 12.7, S355, forces of 53.33 kN at 3 m and 6 m where it is held: uniform moment between', expected: 559.46,
    tolerance: 0.1, toleranceReason: printed, unit: '°C',
    compute: () => temperatureOf(i(453.4, 189.9, 8.5, 12.7, 10.2), 355, 'beam', {
      lateralRestraint: 'at-points',
      actions: { given: 'loads', supports: 'simple', spanMm: 9000, lateralSupportsMm: [3000, 6000], loads: [3000, 6000].map((atMm) => ({ kind: 'point', action: 'permanent', atMm, forceKn: 160 / 3 })) },
    }),
  },
  {
    what: 'Column of 4 m, 209.6 × 205.8 × 9.4 × 14.2, S275: 450 kN, 25 kNm about y at one end, 8 kNm about z throughout; (4.21b) governs', expected: 485.69,
    tolerance: 0.1, toleranceReason: printed, unit: '°C',
    compute: () => temperatureOf(i(209.6, 205.8, 9.4, 14.2, 10.2), 275, 'column', {
      lateralRestraint: 'at-points', lateralSpacingMm: 4000, momentShapeY: { kind: 'end-moments', ratio: 0 }, bucklingLengthYMm: 4000, bucklingLengthZMm: 4000,
      actions: { given: 'fire-effect', effect: { axialKn: 450, momentYKnm: 25, momentZKnm: 8 } },
    }),
  },
  {
    what: 'Beam of 8 m built in at both ends, 500 × 200 × 10.2 × 16, S355, 40 kN/m on a top flange that is held: the bottom flange buckles at the ends', expected: 543.94,
    tolerance: 0.1, toleranceReason: printed, unit: '°C',
    compute: () => temperatureOf(i(500, 200, 10.2, 16, 21), 355, 'beam', {
      lateralRestraint: 'continuous',
      actions: { given: 'loads', supports: 'fixed', spanMm: 8000, loads: [{ kind: 'distributed', action: 'permanent', fromMm: 0, toMm: 8000, startKnPerM: 40, endKnPerM: 40 }] },
    }),
  },
];

const L = 6000;
const narrow: LateralStiffness = { modulusMPa: 210_000, shearModulusMPa: 81_000, izMm4: 1e6, itMm4: 4e6, iwMm6: 0 };
const unit = Math.sqrt(narrow.modulusMPa * narrow.izMm4 * narrow.shearModulusMPa * narrow.itMm4);
const length = (momentAt: (x: number) => number, more: Partial<LateralLength> = {}): LateralLength =>
  ({ lengthMm: L, momentAt, kinksMm: [], loads: [], loadHeightMm: 0, ends: 'held', heldHeightMm: null, ...more });
const classical = (what: string, expected: number, tolerance: number, own: LateralLength, perFactor: number): ValidationCase =>
  ({ what, expected, tolerance, unit: '', compute: () => (bucklingFactor(own, narrow) * perFactor) / unit });
const c1 = (ratio: number, expected: number): ValidationCase => ({
  what: `C1 for end moments in the ratio ${ratio}`, expected, tolerance: 0.006, toleranceReason: 'the last printed digit', unit: '',
  compute: () => bucklingFactor(length((x) => 1 + ((ratio - 1) * x) / L), narrow) / uniformCriticalMoment(L, narrow),
});

export const memberSets: ValidationSet[] = [
  { source: 'EN 1993-1-2:2005', where: '4.2.3.3(4) and 4.2.3.5, with arithmetic of its own from printed section properties', standing: 'second computation', cases: members },
  {
    source: 'S. P. Timoshenko and J. M. Gere, Theory of Elastic Stability', where: 'chapter 6, narrow rectangles', standing: 'memory',
    cases: [
      classical('M·L/√(E·I_z·G·I_t), uniform moment', 3.1416, 0.0005, length(() => 1), L),
      classical('P·L²/√(E·I_z·G·I_t), force at mid-span', 16.94, 0.02, length((x) => Math.min(x, L - x) / 2, { kinksMm: [L / 2] }), L * L),
      classical('w·L³/√(E·I_z·G·I_t), uniform load', 28.3, 0.05, length((x) => (x * (L - x)) / 2), L ** 3),
      classical('P·L²/√(E·I_z·G·I_t), cantilever, force at the tip', 4.013, 0.005, length((x) => x - L, { ends: 'free-at-right' }), L * L),
      classical('w·L³/√(E·I_z·G·I_t), cantilever, uniform load', 12.85, 0.02, length((x) => -((L - x) ** 2) / 2, { ends: 'free-at-right' }), L ** 3),
    ],
  },
  {
    source: 'NCCI SN003, elastic critical moment', where: 'Table 3.1', standing: 'memory',
    cases: [c1(0.75, 1.14), c1(0.5, 1.31), c1(0.25, 1.52), c1(0, 1.77), c1(-0.25, 2.05), c1(-0.5, 2.33), c1(-0.75, 2.57), c1(-1, 2.55)],
  },
];
