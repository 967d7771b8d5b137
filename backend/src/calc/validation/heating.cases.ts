import type { FireCurve } from '@mantlet/common';
import { bareField } from '../methods/heating-field.js';
import { protectedTemperature, unprotectedTemperature } from '../methods/heating.js';
import type { ValidationCase, ValidationSet } from './validation-case.js';

const curve: FireCurve = { kind: 'standard' };
const times = [10, 15, 20, 30, 45, 60];
const rows: [number, number[]][] = [
  [50, [242, 384, 511, 691, 815, 923]],
  [100, [393, 565, 676, 768, 890, 938]],
  [200, [553, 682, 734, 828, 897, 942]],
];
const bare = (compute: (sectionFactorPerM: number, minutes: number) => number, tolerance: number, toleranceReason: string): ValidationCase[] =>
  rows.flatMap(([sectionFactorPerM, expected]) => times.map((minutes, i) => ({
    what: `bare steel, A_m/V = ${sectionFactorPerM} 1/m, ${minutes} min`, expected: expected[i]!, tolerance, toleranceReason, unit: '°C', compute: () => compute(sectionFactorPerM, minutes),
  })));
const alone = (stepS: number) => (sectionFactorPerM: number, minutes: number) =>
  unprotectedTemperature({ sectionFactorPerM, minutes, stepS, shadowFactor: 1, curve, emissivity: 0.7 });

interface Board {
  conductivityWPerMK: number;
  densityKgPerM3: number;
  specificHeatJPerKgK: number;
  sectionFactorPerM: number;
}
const board = (b: Board, expected: number[]): ValidationCase[] => [30, 60, 90, 120].map((minutes, i) => ({
  what: `20 mm, λ_p ${b.conductivityWPerMK}, ρ_p ${b.densityKgPerM3}, c_p ${b.specificHeatJPerKgK}, A_p/V ${b.sectionFactorPerM}, ${minutes} min`,
  expected: expected[i]!, tolerance: 3, toleranceReason: 'the reference holds to ±2 K by step scheme: the gas temperature is taken at the start, middle or end of a 30 s step', unit: '°C',
  compute: () => protectedTemperature({ ...b, moisturePercent: 0, thicknessMm: 20, curve, minutes }),
}));

export const heatingSets: ValidationSet[] = [
  {
    source: 'EN 1993-1-2:2005 4.2.5.1 (4.25) under the standard fire, k_sh = 1, ε_m = 0.7', where: 'time step 1 s', standing: 'second computation',
    cases: bare(alone(1), 1, 'printed to 1 K; the gas temperature is taken at the start or the middle of a step'),
  },
  {
    source: 'EN 1993-1-2:2005 4.2.5.1 (4.25), the same at the largest step allowed', where: 'time step 5 s', standing: 'second computation',
    cases: bare(alone(5), 2, 'the larger step differs by up to 1.5 K'),
  },
  {
    source: 'EN 1993-1-2:2005 4.2.5.1 (4.25), read from the shared field of histories', where: 'time step 1 s', standing: 'second computation',
    cases: bare((s, minutes) => bareField('standard', 0.7).temperatureC(s, 1, minutes), 1.5, 'as at 1 s, and up to 0.5 K for reading between rows'),
  },
  {
    source: 'EN 1993-1-2:2005 4.2.5.2 (4.27) under the standard fire', where: 'time step 30 s', standing: 'second computation',
    cases: [
      ...board({ conductivityWPerMK: 0.12, densityKgPerM3: 350, specificHeatJPerKgK: 1200, sectionFactorPerM: 100 }, [170, 322, 449, 552]),
      ...board({ conductivityWPerMK: 0.2, densityKgPerM3: 800, specificHeatJPerKgK: 1700, sectionFactorPerM: 150 }, [260, 484, 639, 732]),
    ],
  },
];
