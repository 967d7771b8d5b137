import type { FireCurve } from '@mantlet/common';
import { parametricFire, parametricHeatingFormula, parametricCoolingFormula } from '../standards/en-1991-1-2/annex-a-parametric.js';
import type { ParametricCurve } from '../standards/en-1991-1-2/annex-a-parametric.js';
import { gasTemperatureC } from '../standards/gas-temperature.js';
import type { ValidationCase, ValidationSet } from './validation-case.js';

const at = (curve: FireCurve, minutes: number, expected: number, tolerance = 0.5): ValidationCase => ({
  what: `θ_g at ${minutes} min`, expected, tolerance, unit: '°C', compute: () => gasTemperatureC(curve, minutes),
});
const standard: FireCurve = { kind: 'standard' };
const hydrocarbon: FireCurve = { kind: 'hydrocarbon' };
const astm: FireCurve = { kind: 'astm-e119' };
/** minutes, °F */
const fahrenheit: [number, number][] = [[5, 1000], [10, 1300], [15, 1399], [20, 1462], [30, 1550], [45, 1638], [60, 1700], [90, 1792], [120, 1850], [180, 1925], [240, 2000], [480, 2300]];
const office: ParametricCurve = { kind: 'parametric', openingFactor: 0.1024, thermalAbsorptivity: 1234, fireLoadTotalMjPerM2: 181.8, limitTimeMin: 20 };
const fire = parametricFire(office);
const rounded = 'the source rounds each intermediate value';

export const fireSets: ValidationSet[] = [
  {
    source: 'EN 1991-1-2:2002; ISO 834-1', where: '3.2.1 (3.4), the equation evaluated apart', standing: 'second computation',
    cases: [at(standard, 15, 738.6, 0.05), at(standard, 30, 841.8, 0.05), at(standard, 60, 945.3, 0.05), at(standard, 90, 1006, 0.05), at(standard, 120, 1049, 0.05)],
  },
  {
    source: 'EN 1363-1:2012', where: 'standard time-temperature relationship, customary table', standing: 'memory',
    cases: [at(standard, 5, 576), at(standard, 10, 678), at(standard, 45, 902), at(standard, 180, 1110), at(standard, 240, 1153)],
  },
  {
    source: 'EN 1991-1-2:2002', where: '3.2.3, table of EN 1363-2', standing: 'memory',
    cases: [at(hydrocarbon, 5, 948), at(hydrocarbon, 10, 1034), at(hydrocarbon, 30, 1098), at(hydrocarbon, 60, 1100)],
  },
  { source: 'EN 1991-1-2:2002', where: '3.2.2: the external curve levels off at 680 °C', standing: 'own check', cases: [at({ kind: 'external' }, 0.0001, 20, 0.2), at({ kind: 'external' }, 60, 680)] },
  {
    source: 'EN 1363-2:1999', where: 'slow heating curve at 20 min, and one hour of the standard fire after it', standing: 'second computation',
    cases: [at({ kind: 'slow-heating' }, 20, 345.7, 0.05), at({ kind: 'slow-heating' }, 80, 945.3, 0.05)],
  },
  {
    source: 'ASTM E119 / CAN/ULC-S101', where: 'time-temperature table, the column in °F', standing: 'memory',
    cases: fahrenheit.map(([minutes, f]) => ({ ...at(astm, minutes, Number(((f - 32) / 1.8).toFixed(1)), 0.7), toleranceReason: 'the standard rounds °F to whole °C' })),
  },
  {
    source: 'Access Steel SX042a, parametric fire curve of an office compartment', where: 'O = 0.1024 m^½, b = 1234 J/m²s^½K, q_t,d = 181.8 MJ/m², t_lim = 20 min', standing: 'published',
    cases: [
      { what: 'Γ', expected: 5.791, tolerance: 0.01, toleranceReason: rounded, unit: '', compute: () => fire.timeFactor },
      { what: 't_max', expected: 0.355, tolerance: 0.0005, unit: 'h', compute: () => fire.maxTimeH },
      { what: 't*_max', expected: 2.056, tolerance: 0.004, toleranceReason: rounded, unit: 'h', compute: () => fire.timeStarMaxH },
      { what: 'θ_max', expected: 1052, tolerance: 1, toleranceReason: rounded, unit: '°C', compute: () => fire.maxGasC },
      {
        what: 'cooling, θ_g at t* = 4 h by 1566 − 250·t*', expected: 566, tolerance: 2, toleranceReason: rounded, unit: '°C',
        compute: () => parametricCoolingFormula.evaluate({ maxGasC: fire.maxGasC, timeStarMaxH: fire.timeStarMaxH, afterMaxStarH: 4 - fire.timeStarMaxH }),
      },
    ],
  },
  {
    source: 'EN 1991-1-2:2002 Annex A', where: 'A.(2) note: with Γ = 1 the heating phase approximates the standard curve', standing: 'own check',
    cases: [15, 30, 60, 90, 120].map((minutes) => ({
      what: `parametric heating at ${minutes} min`, expected: Number(gasTemperatureC(standard, minutes).toFixed(1)), tolerance: 20,
      toleranceReason: 'an approximation by the standard’s own words', unit: '°C', compute: () => parametricHeatingFormula.evaluate({ timeStarH: minutes / 60 }),
    })),
  },
];
