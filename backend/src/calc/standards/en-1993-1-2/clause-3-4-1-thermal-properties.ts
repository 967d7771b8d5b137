import { defineFormula } from '../../formula.js';

/** ρ_a, independent of temperature (EN 1993-1-2 3.2.2) */
export const STEEL_DENSITY_KG_PER_M3 = 7850;

/** c_a in J/kgK. Below 20 °C the value at 20 °C, above 1200 °C that of the last range. */
export function steelSpecificHeat(temperatureC: number): number {
  if (temperatureC < 600) {
    const t = temperatureC < 20 ? 20 : temperatureC;
    return 425 + t * (0.773 + t * (-1.69e-3 + t * 2.22e-6));
  }
  if (temperatureC < 735) return 666 + 13002 / (738 - temperatureC);
  return temperatureC < 900 ? 545 + 17820 / (temperatureC - 731) : 650;
}

const temperature = { temperatureC: { symbol: 'θ_a', meaning: 'steel temperature', unit: '°C' } };

export const steelSpecificHeatFormula = defineFormula<{ temperatureC: number }>({
  label: 'Specific heat of steel',
  source: { standard: 'EN 1993-1-2:2005', clause: '3.4.1.2 (3.2a) to (3.2d)' },
  expression:
    '425 + 0.773·θ_a − 1.69·10⁻³·θ_a² + 2.22·10⁻⁶·θ_a³ to 600 °C; 666 + 13002/(738 − θ_a) to 735 °C; 545 + 17820/(θ_a − 731) to 900 °C; 650 to 1200 °C',
  result: { symbol: 'c_a', meaning: 'specific heat of steel', unit: 'J/kgK' },
  symbols: temperature,
  evaluate: ({ temperatureC }) => steelSpecificHeat(temperatureC),
});

export const steelConductivityFormula = defineFormula<{ temperatureC: number }>({
  label: 'Thermal conductivity of steel',
  source: { standard: 'EN 1993-1-2:2005', clause: '3.4.1.3 (3.3a), (3.3b)' },
  expression: '54 − 3.33·10⁻²·θ_a to 800 °C; 27.3 above',
  result: { symbol: 'λ_a', meaning: 'thermal conductivity of steel', unit: 'W/mK' },
  symbols: temperature,
  evaluate: ({ temperatureC }) => (temperatureC < 800 ? 54 - 3.33e-2 * temperatureC : 27.3),
});
