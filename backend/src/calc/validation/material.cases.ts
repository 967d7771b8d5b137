import { kE, kP, kY } from '../standards/en-1993-1-2/table-3-1.js';
import { steelConductivityFormula, steelSpecificHeat } from '../standards/en-1993-1-2/clause-3-4-1-thermal-properties.js';
import { criticalTemperatureFormula } from '../standards/en-1993-1-2/clause-4-2-4-critical-temperature.js';
import { bucklingReductionFormula } from '../standards/en-1993-1-2/clause-4-2-3-2-compression.js';
import type { ValidationCase, ValidationSet } from './validation-case.js';

/** EN 1993-1-2 Table 3.1 as printed: θ, k_y, k_p, k_E. Typed apart from the table the core computes with. */
const printed = `
20 1.000 1.000 1.000
100 1.000 1.000 1.000
200 1.000 0.807 0.900
300 1.000 0.613 0.800
400 1.000 0.420 0.700
500 0.780 0.360 0.600
600 0.470 0.180 0.310
700 0.230 0.075 0.130
800 0.110 0.050 0.090
900 0.060 0.0375 0.0675
1000 0.040 0.0250 0.0450
1100 0.020 0.0125 0.0225
1200 0.000 0.0000 0.0000`;

const table31: ValidationCase[] = printed.trim().split('\n').flatMap((line) => {
  const [theta, ky, kp, ke] = line.split(' ').map(Number) as [number, number, number, number];
  return [
    { what: `k_y at ${theta} °C`, expected: ky, tolerance: 1e-12, unit: '', compute: () => kY(theta) },
    { what: `k_p at ${theta} °C`, expected: kp, tolerance: 1e-12, unit: '', compute: () => kP(theta) },
    { what: `k_E at ${theta} °C`, expected: ke, tolerance: 1e-12, unit: '', compute: () => kE(theta) },
  ];
});

/** EN 1993-1-2 Table 4.1: μ0 and θ_a,cr */
const table41: [number, number][] = [[0.22, 711], [0.3, 664], [0.4, 620], [0.5, 585], [0.6, 554], [0.7, 526], [0.8, 496]];
const table41Recalled: [number, number][] = [[0.24, 698], [0.26, 685], [0.28, 674], [0.34, 645], [0.44, 605], [0.54, 572], [0.74, 514]];
const fromTable41 = (rows: [number, number][]): ValidationCase[] => rows.map(([utilisation, expected]) => ({
  what: `θ_a,cr at μ0 = ${utilisation}`, expected, tolerance: 0.5 + 1e-9, unit: '°C', compute: () => criticalTemperatureFormula.evaluate({ utilisation }),
}));

const perry = (slenderness: number, fy: number): ValidationCase => ({
  what: `(1 − χ)(1 − χ·λ̄²) − α·λ̄·χ at λ̄_θ = ${slenderness}, f_y = ${fy} MPa`, expected: 0, tolerance: 1e-12, unit: '',
  compute: () => {
    const chi = bucklingReductionFormula.evaluate({ slendernessInFire: slenderness, yieldStrengthMPa: fy });
    return (1 - chi) * (1 - chi * slenderness ** 2) - 0.65 * Math.sqrt(235 / fy) * slenderness * chi;
  },
});

export const materialSets: ValidationSet[] = [
  { source: 'EN 1993-1-2:2005', where: 'Table 3.1', standing: 'published', cases: table31 },
  {
    source: 'EN 1993-1-2:2005', where: '3.4.1.2, Figure 3.4', standing: 'memory',
    cases: [
      { what: 'c_a at 20 °C', expected: 439.8, tolerance: 0.05, unit: 'J/kgK', compute: () => steelSpecificHeat(20) },
      { what: 'c_a at 735 °C, the peak', expected: 5000, tolerance: 0.5, unit: 'J/kgK', compute: () => steelSpecificHeat(735) },
      { what: 'c_a from 900 °C', expected: 650, tolerance: 0, unit: 'J/kgK', compute: () => steelSpecificHeat(900) },
      { what: 'c_a just below 600 °C less c_a at 600 °C', expected: 0, tolerance: 1, toleranceReason: 'the printed ranges meet to 1 J/kgK', unit: 'J/kgK', compute: () => steelSpecificHeat(599.999) - steelSpecificHeat(600) },
      { what: 'c_a just below 735 °C less c_a at 735 °C', expected: 0, tolerance: 5, toleranceReason: 'the printed ranges meet to 5 J/kgK, steep as they are there', unit: 'J/kgK', compute: () => steelSpecificHeat(734.9999) - steelSpecificHeat(735) },
    ],
  },
  {
    source: 'EN 1993-1-2:2005', where: '3.4.1.3, Figure 3.5', standing: 'memory',
    cases: [
      { what: 'λ_a at 20 °C', expected: 53.3, tolerance: 0.05, unit: 'W/mK', compute: () => steelConductivityFormula.evaluate({ temperatureC: 20 }) },
      { what: 'λ_a from 800 °C', expected: 27.3, tolerance: 0, unit: 'W/mK', compute: () => steelConductivityFormula.evaluate({ temperatureC: 800 }) },
    ],
  },
  { source: 'EN 1993-1-2:2005', where: '4.2.4 Table 4.1', standing: 'published', cases: fromTable41(table41) },
  { source: 'EN 1993-1-2:2005', where: '4.2.4 Table 4.1, further rows', standing: 'memory', cases: fromTable41(table41Recalled) },
  {
    source: 'Ayrton-Perry equation, of which (4.6) is the solution (background of EN 1993-1-1 6.3.1.2)', where: '(1 − χ)(1 − χ·λ̄²) = α·λ̄·χ', standing: 'own check',
    cases: [perry(0.2, 235), perry(0.7, 275), perry(1, 355), perry(1.6, 460), perry(3, 355)],
  },
];
