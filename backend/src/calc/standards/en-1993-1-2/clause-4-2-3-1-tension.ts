import { defineFormula } from '../../formula.js';

/** N at one uniform temperature. 4.2.3.1(2): holes filled with bolts need no net section, the joint being cooler. */
export const tensionResistanceFormula = defineFormula<{ areaMm2: number; ky: number; yieldStrengthMPa: number; gammaMFi: number }>({
  label: 'Tension resistance in fire',
  source: { standard: 'EN 1993-1-2:2005', clause: '4.2.3.1 (4.3)' },
  expression: 'A·k_y,θ·f_y/γ_M,fi',
  result: { symbol: 'N_fi,θ,Rd', meaning: 'design tension resistance', unit: 'N' },
  symbols: {
    areaMm2: { symbol: 'A', meaning: 'gross area', unit: 'mm²' },
    ky: { symbol: 'k_y,θ', meaning: 'reduction of the yield strength', unit: '' },
    yieldStrengthMPa: { symbol: 'f_y', meaning: 'yield strength at 20 °C', unit: 'MPa' },
    gammaMFi: { symbol: 'γ_M,fi', meaning: 'partial factor in fire', unit: '' },
  },
  evaluate: (i) => (i.areaMm2 * i.ky * i.yieldStrengthMPa) / i.gammaMFi,
});
