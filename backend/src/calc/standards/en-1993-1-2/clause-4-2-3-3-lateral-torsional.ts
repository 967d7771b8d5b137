import { defineFormula } from '../../formula.js';
import { bucklingReductionFormula, slendernessInFireFormula } from './clause-4-2-3-2-compression.js';

const slendernessInFire = { symbol: 'λ̄_LT,θ,com', meaning: 'relative slenderness for lateral-torsional buckling at the temperature of the compression flange', unit: '' };

export const lateralSlendernessInFireFormula = defineFormula<{ slenderness: number; ky: number; ke: number }>({
  label: 'Slenderness for lateral-torsional buckling at temperature',
  source: { standard: 'EN 1993-1-2:2005', clause: '4.2.3.3(5) (4.15)', note: 'the compression flange at the uniform temperature, which is the safe side' },
  expression: 'λ̄_LT·√(k_y,θ,com/k_E,θ,com)',
  result: slendernessInFire,
  symbols: {
    slenderness: { symbol: 'λ̄_LT', meaning: 'relative slenderness at 20 °C', unit: '' },
    ky: { symbol: 'k_y,θ,com', meaning: 'reduction of the yield strength of the compression flange', unit: '' },
    ke: { symbol: 'k_E,θ,com', meaning: 'reduction of the modulus of the compression flange', unit: '' },
  },
  evaluate: slendernessInFireFormula.evaluate,
});

/** Of the same form and α as χ_fi. */
export const lateralReductionFormula = defineFormula<{ slendernessInFire: number; yieldStrengthMPa: number }>({
  label: 'Reduction for lateral-torsional buckling in fire',
  source: { standard: 'EN 1993-1-2:2005', clause: '4.2.3.3(5) (4.12) to (4.14)' },
  expression: '1/(φ + √(φ² − λ̄_LT,θ,com²)), φ = ½·(1 + α·λ̄_LT,θ,com + λ̄_LT,θ,com²), α = 0.65·√(235/f_y)',
  result: { symbol: 'χ_LT,fi', meaning: 'reduction for lateral-torsional buckling', unit: '' },
  symbols: { slendernessInFire, yieldStrengthMPa: { symbol: 'f_y', meaning: 'yield strength at 20 °C', unit: 'MPa' } },
  evaluate: bucklingReductionFormula.evaluate,
});

/** N·mm: 4.2.3.3(4) in class 1 and 2, 4.2.3.4(2) in class 3; χ_LT,fi by (4.12) to (4.15), of the same form and α as χ_fi. */
export const lateralBucklingResistanceFormula = defineFormula<{ reduction: number; modulusMm3: number; ky: number; yieldStrengthMPa: number; gammaMFi: number }>({
  label: 'Resistance to lateral-torsional buckling in fire',
  source: { standard: 'EN 1993-1-2:2005', clause: '4.2.3.3(4), (4.11); 4.2.3.4(2) in class 3' },
  expression: 'χ_LT,fi·W_y·k_y,θ,com·f_y/γ_M,fi',
  result: { symbol: 'M_b,fi,t,Rd', meaning: 'design buckling resistance moment', unit: 'N·mm' },
  symbols: {
    reduction: { symbol: 'χ_LT,fi', meaning: 'reduction for lateral-torsional buckling', unit: '' },
    modulusMm3: { symbol: 'W_y', meaning: 'section modulus about y: plastic in class 1 and 2, elastic in class 3', unit: 'mm³' },
    ky: { symbol: 'k_y,θ,com', meaning: 'reduction of the yield strength of the compression flange', unit: '' },
    yieldStrengthMPa: { symbol: 'f_y', meaning: 'yield strength at 20 °C', unit: 'MPa' },
    gammaMFi: { symbol: 'γ_M,fi', meaning: 'partial factor in fire', unit: '' },
  },
  evaluate: (i) => (i.reduction * i.modulusMm3 * i.ky * i.yieldStrengthMPa) / i.gammaMFi,
});
