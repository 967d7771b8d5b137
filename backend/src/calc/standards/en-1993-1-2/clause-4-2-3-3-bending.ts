import type { Exposure } from '@mantlet/common';
import { defineFormula } from '../../formula.js';

const standard = 'EN 1993-1-2:2005';

/** κ1 (4.2.3.3(7)): with a slab on the fourth side the top flange is cooler than the rest. */
export function kappa1(arrangement: Exposure['arrangement'], protectedMember: boolean): number {
  if (arrangement !== 'three-sides' && arrangement !== 'three-sides-web-filled') return 1;
  return protectedMember ? 0.85 : 0.7;
}
/** κ2 (4.2.3.3(8)): at the supports of a statically indeterminate beam. */
export function kappa2(continuousBeam: boolean): number {
  return continuousBeam ? 0.85 : 1;
}

interface BendingInput {
  modulusMm3: number;
  ky: number;
  yieldStrengthMPa: number;
  gammaMFi: number;
  kappa1: number;
  kappa2: number;
}
/** N·mm, laterally restrained; W_pl for class 1 and 2, W_el for class 3. γ_M0 = 1.0, so M_Rd = W·f_y. */
export const bendingResistanceFormula = defineFormula<BendingInput>({
  label: 'Bending resistance in fire, laterally restrained',
  source: { standard, clause: '4.2.3.3(1) to (3), (7), (8) in class 1 and 2; 4.2.3.4 in class 3', note: 'never above M_Rd at 20 °C, with γ_M0 = 1.0' },
  expression: 'min(W·k_y,θ·f_y/(γ_M,fi·κ1·κ2) ; W·f_y)',
  result: { symbol: 'M_fi,t,Rd', meaning: 'design bending resistance', unit: 'N·mm' },
  symbols: {
    modulusMm3: { symbol: 'W', meaning: 'section modulus about y: plastic in class 1 and 2, elastic in class 3', unit: 'mm³' },
    ky: { symbol: 'k_y,θ', meaning: 'reduction of the yield strength', unit: '' },
    yieldStrengthMPa: { symbol: 'f_y', meaning: 'yield strength at 20 °C', unit: 'MPa' },
    gammaMFi: { symbol: 'γ_M,fi', meaning: 'partial factor in fire', unit: '' },
    kappa1: { symbol: 'κ1', meaning: 'factor for uneven temperature across the section', unit: '' },
    kappa2: { symbol: 'κ2', meaning: 'factor for uneven temperature along the beam', unit: '' },
  },
  evaluate: (i) => {
    const cold = i.modulusMm3 * i.yieldStrengthMPa;
    return Math.min((cold * i.ky) / (i.gammaMFi * i.kappa1 * i.kappa2), cold);
  },
});

export const shearResistanceFormula = defineFormula<{ shearAreaMm2: number; ky: number; yieldStrengthMPa: number; gammaMFi: number }>({
  label: 'Shear resistance in fire',
  source: { standard, clause: '4.2.3.3(6) with EN 1993-1-1 6.2.6', note: 'k_y,θ at the web temperature, which is the uniform one here' },
  expression: 'A_v·k_y,θ·f_y/(√3·γ_M,fi)',
  result: { symbol: 'V_fi,t,Rd', meaning: 'design shear resistance', unit: 'N' },
  symbols: {
    shearAreaMm2: { symbol: 'A_v', meaning: 'shear area parallel to the web', unit: 'mm²' },
    ky: { symbol: 'k_y,θ', meaning: 'reduction of the yield strength', unit: '' },
    yieldStrengthMPa: { symbol: 'f_y', meaning: 'yield strength at 20 °C', unit: 'MPa' },
    gammaMFi: { symbol: 'γ_M,fi', meaning: 'partial factor in fire', unit: '' },
  },
  evaluate: (i) => (i.shearAreaMm2 * i.ky * i.yieldStrengthMPa) / (Math.sqrt(3) * i.gammaMFi),
});

interface ShearLossInput {
  shearN: number;
  shearResistanceN: number;
}
/** EN 1993-1-1 6.2.8: share of the web's part of the modulus that high shear takes away. */
export const shearReductionFormula = defineFormula<ShearLossInput>({
  label: 'Reduction of the bending resistance by high shear',
  source: { standard: 'EN 1993-1-1:2005', clause: '6.2.8(2), (3)', note: 'with the resistance at temperature, which is the safe side' },
  expression: '(2·V_fi/V_fi,t,Rd − 1)² where V_fi > 0.5·V_fi,t,Rd, else 0; at most 1',
  result: { symbol: 'ρ', meaning: 'reduction', unit: '' },
  symbols: {
    shearN: { symbol: 'V_fi', meaning: 'shear force in fire', unit: 'N' },
    shearResistanceN: { symbol: 'V_fi,t,Rd', meaning: 'shear resistance at temperature', unit: 'N' },
  },
  evaluate: ({ shearN, shearResistanceN }) => shearLoss(shearN, shearResistanceN),
});

export function shearLoss(shearN: number, shearResistanceN: number): number {
  if (shearN <= 0.5 * shearResistanceN) return 0;
  return shearN >= shearResistanceN ? 1 : ((2 * shearN) / shearResistanceN - 1) ** 2;
}
