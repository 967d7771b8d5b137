import { defineFormula } from '../../formula.js';
import type { Source } from '../../formula.js';

const source = (clause: string): Source => ({
  standard: 'EN 1993-1-2:2005', clause: `4.2.3.5 ${clause}`, memory: true, note: 'the factors μ as corrected since the first printing; confirm against the edition in force. The limit λ̄_y ≤ 1.1 at 20 °C beside μ_y is not used to lower the slenderness, which is the safe side',
});
const beta = { symbol: 'β_M', meaning: 'equivalent uniform moment factor', unit: '' };
const slenderness = (axis: string) => ({ symbol: `λ̄_${axis},θ`, meaning: `relative slenderness about ${axis} at temperature`, unit: '' });
const share = (axis: string) => ({ symbol: `n_${axis}`, meaning: `axial force over the buckling resistance about ${axis}: N_fi/(χ_${axis},fi·A·k_y,θ·f_y/γ_M,fi)`, unit: '' });

/** β_M of Figure 4.2: end moments in the ratio ψ, a distributed load, a point load. */
export const equivalentMoment = { endMoments: (ratio: number): number => 1.8 - 0.7 * ratio, distributed: 1.3, point: 1.4 } as const;

export const muYFormula = defineFormula<{ beta: number; slenderness: number }>({
  label: 'Factor for bending about y', source: source('factors of (4.21)'), expression: 'min((2·β_M,y − 5)·λ̄_y,θ + 0.44·β_M,y + 0.29 ; 0.8)',
  result: { symbol: 'μ_y', meaning: 'factor', unit: '' }, symbols: { beta, slenderness: slenderness('y') },
  evaluate: (i) => Math.min((2 * i.beta - 5) * i.slenderness + 0.44 * i.beta + 0.29, 0.8),
});
export const muZFormula = defineFormula<{ beta: number; slenderness: number }>({
  label: 'Factor for bending about z', source: source('factors of (4.21)'), expression: 'min((1.2·β_M,z − 3)·λ̄_z,θ + 0.71·β_M,z − 0.29 ; 0.8)',
  result: { symbol: 'μ_z', meaning: 'factor', unit: '' }, symbols: { beta, slenderness: slenderness('z') },
  evaluate: (i) => Math.min((1.2 * i.beta - 3) * i.slenderness + 0.71 * i.beta - 0.29, 0.8),
});
export const muLtFormula = defineFormula<{ beta: number; slenderness: number }>({
  label: 'Factor for lateral-torsional buckling', source: source('factors of (4.21)'), expression: 'min(0.15·λ̄_z,θ·β_M,LT − 0.15 ; 0.9)',
  result: { symbol: 'μ_LT', meaning: 'factor', unit: '' }, symbols: { beta, slenderness: slenderness('z') },
  evaluate: (i) => Math.min(0.15 * i.slenderness * i.beta - 0.15, 0.9),
});

/** k_y and k_z, at most 3. */
export const amplificationFormula = defineFormula<{ mu: number; axialShare: number }>({
  label: 'Interaction factor', source: source('factors of (4.21)'), expression: 'min(1 − μ·n ; 3)',
  result: { symbol: 'k', meaning: 'interaction factor', unit: '' },
  symbols: { mu: { symbol: 'μ', meaning: 'factor', unit: '' }, axialShare: share('i') },
  evaluate: (i) => Math.min(1 - i.mu * i.axialShare, 3),
});
/** k_LT, at most 1. */
export const lateralAmplificationFormula = defineFormula<{ mu: number; axialShare: number }>({
  label: 'Interaction factor for lateral-torsional buckling', source: source('factors of (4.21)'), expression: 'min(1 − μ_LT·n_z ; 1)',
  result: { symbol: 'k_LT', meaning: 'interaction factor', unit: '' },
  symbols: { mu: { symbol: 'μ_LT', meaning: 'factor', unit: '' }, axialShare: share('z') },
  evaluate: (i) => Math.min(1 - i.mu * i.axialShare, 1),
});

/** The expression by class, as the working names it. */
export const interactionClause = (plastic: boolean, lateral: boolean): string => {
  const letter = plastic ? (lateral ? 'b' : 'a') : (lateral ? 'd' : 'c');
  return `EN 1993-1-2:2005 4.2.3.5 (4.21${letter}) (memory)`;
};

/** Left-hand side of (4.21a) in class 1 and 2, of (4.21c) in class 3; and, with χ_z, k_LT and M_b, of (4.21b) and (4.21d). */
export const interactionFormula = defineFormula<{ axialShare: number; factorY: number; shareY: number; factorZ: number; shareZ: number }>({
  label: 'Axial force with bending', source: source('(4.21a) to (4.21d)'), expression: 'n + k_y·m_y + k_z·m_z ≤ 1',
  result: { symbol: 'U', meaning: 'share of the resistance that is used', unit: '' },
  symbols: {
    axialShare: { symbol: 'n', meaning: 'axial force over the buckling resistance', unit: '' },
    factorY: { symbol: 'k_y', meaning: 'k_y, or k_LT beside lateral-torsional buckling', unit: '' },
    shareY: { symbol: 'm_y', meaning: 'moment about y over its resistance, or over the resistance to lateral-torsional buckling', unit: '' },
    factorZ: { symbol: 'k_z', meaning: 'interaction factor about z', unit: '' },
    shareZ: { symbol: 'm_z', meaning: 'moment about z over its resistance', unit: '' },
  },
  evaluate: (i) => i.axialShare + i.factorY * i.shareY + i.factorZ * i.shareZ,
});
