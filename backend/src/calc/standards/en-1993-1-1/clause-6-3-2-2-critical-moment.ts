import { defineFormula } from '../../formula.js';

/** EN 1993-1-1 3.2.6 */
export const SHEAR_MODULUS_MPA = 81_000;

/** what resists bending sideways and twisting */
const stiffness = {
  modulusMPa: { symbol: 'E', meaning: 'modulus of elasticity', unit: 'MPa' },
  shearModulusMPa: { symbol: 'G', meaning: 'shear modulus', unit: 'MPa' },
  izMm4: { symbol: 'I_z', meaning: 'second moment of area about the weak axis', unit: 'mm⁴' },
  itMm4: { symbol: 'I_t', meaning: 'torsion constant', unit: 'mm⁴' },
  iwMm6: { symbol: 'I_w', meaning: 'warping constant', unit: 'mm⁶' },
};

export interface CriticalMomentInput {
  c1: number;
  c2: number;
  modulusMPa: number;
  shearModulusMPa: number;
  izMm4: number;
  itMm4: number;
  iwMm6: number;
  lengthMm: number;
  loadHeightMm: number;
}
/**
 * N·mm, between two places held sideways and against twist, free to warp and to turn in plan (k = k_w = 1).
 * The clause asks for the gross section, the real moment distribution and the lateral restraints, and gives no expression; this
 * is the general one for doubly symmetric sections, with C1 and C2 worked out from the member's own diagram.
 */
export const criticalMomentFormula = defineFormula<CriticalMomentInput>({
  label: 'Elastic critical moment',
  source: { standard: 'EN 1993-1-1:2005', clause: '6.3.2.2(2)', note: 'general expression for doubly symmetric sections; C1 and C2 by minimum energy for the diagram between the restraints' },
  expression: 'C_1·π²·E·I_z/L²·(√(I_w/I_z + L²·G·I_t/(π²·E·I_z) + (C_2·z_g)²) − C_2·z_g)',
  result: { symbol: 'M_cr', meaning: 'elastic critical moment', unit: 'N·mm' },
  symbols: {
    c1: { symbol: 'C_1', meaning: 'factor for the shape of the moment diagram', unit: '' },
    c2: { symbol: 'C_2', meaning: 'factor for the height of the loads', unit: '' },
    ...stiffness,
    lengthMm: { symbol: 'L', meaning: 'length between the restraints', unit: 'mm' },
    loadHeightMm: { symbol: 'z_g', meaning: 'height of the loads above the shear centre', unit: 'mm' },
  },
  evaluate: (i) => {
    const lift = i.c2 * i.loadHeightMm;
    const bending = i.modulusMPa * i.izMm4;
    const inner = i.iwMm6 / i.izMm4 + (i.lengthMm ** 2 * i.shearModulusMPa * i.itMm4) / (Math.PI ** 2 * bending) + lift * lift;
    return ((i.c1 * Math.PI ** 2 * bending) / i.lengthMm ** 2) * (Math.sqrt(inner) - lift);
  },
});

interface HeldAxisInput {
  factor: number;
  momentNmm: number;
  modulusMPa: number;
  shearModulusMPa: number;
  izMm4: number;
  itMm4: number;
  iwMm6: number;
  lengthMm: number;
  heldHeightMm: number | null;
}
/** N·mm, where the top flange is held along the length and a hogging moment compresses the bottom one. */
export const heldAxisCriticalMomentFormula = defineFormula<HeldAxisInput>({
  label: 'Elastic critical moment, top flange held along its length',
  source: { standard: 'EN 1993-1-1:2005', clause: '6.3.2.2(2)', note: 'the section twists about its held flange; α_cr by minimum energy of a doubly symmetric section for the diagram between the restraints' },
  expression: 'α_cr·M_Ed',
  result: { symbol: 'M_cr', meaning: 'elastic critical moment', unit: 'N·mm' },
  symbols: {
    factor: { symbol: 'α_cr', meaning: 'factor by which moments and loads must be raised for the length to buckle', unit: '' },
    momentNmm: { symbol: 'M_Ed', meaning: 'greatest hogging moment in fire on the length', unit: 'N·mm' },
    ...stiffness,
    lengthMm: { symbol: 'L', meaning: 'length between places held against twist', unit: 'mm' },
    heldHeightMm: { symbol: 'd', meaning: 'height of the held flange above the shear centre', unit: 'mm' },
  },
  evaluate: (i) => i.factor * i.momentNmm,
});

export const lateralSlendernessFormula = defineFormula<{ modulusMm3: number; yieldStrengthMPa: number; criticalMomentNmm: number }>({
  label: 'Slenderness for lateral-torsional buckling at 20 °C',
  source: { standard: 'EN 1993-1-1:2005', clause: '6.3.2.2(1)' },
  expression: '√(W_y·f_y/M_cr)',
  result: { symbol: 'λ̄_LT', meaning: 'relative slenderness', unit: '' },
  symbols: {
    modulusMm3: { symbol: 'W_y', meaning: 'section modulus about y: plastic in class 1 and 2, elastic in class 3', unit: 'mm³' },
    yieldStrengthMPa: { symbol: 'f_y', meaning: 'yield strength at 20 °C', unit: 'MPa' },
    criticalMomentNmm: { symbol: 'M_cr', meaning: 'elastic critical moment', unit: 'N·mm' },
  },
  evaluate: (i) => Math.sqrt((i.modulusMm3 * i.yieldStrengthMPa) / i.criticalMomentNmm),
});
