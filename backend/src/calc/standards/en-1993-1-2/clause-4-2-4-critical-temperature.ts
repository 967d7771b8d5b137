import { defineFormula } from '../../formula.js';

/** 4.2.4(2): a lower degree of utilisation is read as this one */
export const LEAST_UTILISATION = 0.013;

export const criticalTemperatureFormula = defineFormula<{ utilisation: number }>({
  label: 'Critical temperature from the degree of utilisation',
  source: { standard: 'EN 1993-1-2:2005', clause: '4.2.4 (4.22)', note: 'μ0 not below 0.013; classes 1 to 3 and tension members where neither stability nor deformation governs' },
  expression: '39.19·ln(1/(0.9674·μ0^3.833) − 1) + 482',
  result: { symbol: 'θ_a,cr', meaning: 'critical temperature', unit: '°C' },
  symbols: { utilisation: { symbol: 'μ0', meaning: 'degree of utilisation E_fi,d/R_fi,d,0', unit: '' } },
  evaluate: ({ utilisation }) => 39.19 * Math.log(1 / (0.9674 * Math.max(utilisation, LEAST_UTILISATION) ** 3.833) - 1) + 482,
});
