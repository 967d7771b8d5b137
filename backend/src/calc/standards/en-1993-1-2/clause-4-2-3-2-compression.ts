import { defineFormula } from '../../formula.js';
import { kE, kY } from './table-3-1.js';

const standard = 'EN 1993-1-2:2005';
export const ELASTIC_MODULUS_MPA = 210_000;
/** 4.2.3.2(5): buckling length of a braced continuous column, as a share of the system length */
export const bracedLengthFactor = { given: 1, 'braced-intermediate': 0.5, 'braced-top': 0.7 } as const;

export const slendernessFormula = defineFormula<{ areaMm2: number; yieldStrengthMPa: number; lengthMm: number; secondMomentMm4: number; modulusMPa: number }>({
  label: 'Slenderness at 20 °C',
  source: { standard: 'EN 1993-1-1:2005', clause: '6.3.1.2, with the buckling length in fire of EN 1993-1-2 4.2.3.2(3) to (5)' },
  expression: '√(A·f_y/N_cr), N_cr = π²·E·I/l_fi²',
  result: { symbol: 'λ̄', meaning: 'relative slenderness', unit: '' },
  symbols: {
    areaMm2: { symbol: 'A', meaning: 'gross area', unit: 'mm²' },
    yieldStrengthMPa: { symbol: 'f_y', meaning: 'yield strength at 20 °C', unit: 'MPa' },
    lengthMm: { symbol: 'l_fi', meaning: 'buckling length in fire', unit: 'mm' },
    secondMomentMm4: { symbol: 'I', meaning: 'second moment of area about the axis', unit: 'mm⁴' },
    modulusMPa: { symbol: 'E', meaning: 'modulus of elasticity', unit: 'MPa' },
  },
  evaluate: (i) => (i.lengthMm / Math.PI) * Math.sqrt((i.areaMm2 * i.yieldStrengthMPa) / (i.modulusMPa * i.secondMomentMm4)),
});

export const slendernessInFireFormula = defineFormula<{ slenderness: number; ky: number; ke: number }>({
  label: 'Slenderness at temperature',
  source: { standard, clause: '4.2.3.2 (4.7)' },
  expression: 'λ̄·√(k_y,θ/k_E,θ)',
  result: { symbol: 'λ̄_θ', meaning: 'relative slenderness at temperature', unit: '' },
  symbols: {
    slenderness: { symbol: 'λ̄', meaning: 'relative slenderness at 20 °C', unit: '' },
    ky: { symbol: 'k_y,θ', meaning: 'reduction of the yield strength', unit: '' },
    ke: { symbol: 'k_E,θ', meaning: 'reduction of the modulus', unit: '' },
  },
  evaluate: (i) => i.slenderness * Math.sqrt(i.ky / i.ke),
});

export const bucklingReductionFormula = defineFormula<{ slendernessInFire: number; yieldStrengthMPa: number }>({
  label: 'Reduction for flexural buckling in fire',
  source: { standard, clause: '4.2.3.2 (4.6)' },
  expression: '1/(φ + √(φ² − λ̄_θ²)), φ = ½·(1 + α·λ̄_θ + λ̄_θ²), α = 0.65·√(235/f_y)',
  result: { symbol: 'χ_fi', meaning: 'reduction factor', unit: '' },
  symbols: {
    slendernessInFire: { symbol: 'λ̄_θ', meaning: 'relative slenderness at temperature', unit: '' },
    yieldStrengthMPa: { symbol: 'f_y', meaning: 'yield strength at 20 °C', unit: 'MPa' },
  },
  evaluate: (i) => bucklingReduction(i.slendernessInFire, 0.65 * Math.sqrt(235 / i.yieldStrengthMPa)),
});

function bucklingReduction(slenderness: number, imperfection: number): number {
  const phi = 0.5 * (1 + imperfection * slenderness + slenderness * slenderness);
  return 1 / (phi + Math.sqrt(phi * phi - slenderness * slenderness));
}

export const compressionResistanceFormula = defineFormula<{ reduction: number; areaMm2: number; ky: number; yieldStrengthMPa: number; gammaMFi: number }>({
  label: 'Buckling resistance in fire',
  source: { standard, clause: '4.2.3.2 (4.5)' },
  expression: 'χ_fi·A·k_y,θ·f_y/γ_M,fi',
  result: { symbol: 'N_b,fi,θ,Rd', meaning: 'design buckling resistance', unit: 'N' },
  symbols: {
    reduction: { symbol: 'χ_fi', meaning: 'reduction for buckling', unit: '' },
    areaMm2: { symbol: 'A', meaning: 'gross area', unit: 'mm²' },
    ky: { symbol: 'k_y,θ', meaning: 'reduction of the yield strength', unit: '' },
    yieldStrengthMPa: { symbol: 'f_y', meaning: 'yield strength at 20 °C', unit: 'MPa' },
    gammaMFi: { symbol: 'γ_M,fi', meaning: 'partial factor in fire', unit: '' },
  },
  evaluate: (i) => (i.reduction * i.areaMm2 * i.ky * i.yieldStrengthMPa) / i.gammaMFi,
});

/** χ_fi·k_y,θ, the share of A·f_y that is left at a temperature; falls steadily with it, to 0 at 1200 °C. */
export function bucklingShare(temperatureC: number, slenderness: number, imperfection: number): number {
  const ky = kY(temperatureC);
  if (ky <= 0) return 0;
  return ky * bucklingReduction(slenderness * Math.sqrt(ky / kE(temperatureC)), imperfection);
}
