import type { SectionShape } from '@mantlet/common';
import { defineFormula } from '../../formula.js';
import type { Source } from '../../formula.js';

export const table61Source: Source = { standard: 'EN 1993-1-1:2005', clause: 'Tables 6.1 and 6.2', memory: true };

/** Imperfection factors of the buckling curves at normal temperature. */
export const imperfectionFactors = { a0: 0.13, a: 0.21, b: 0.34, c: 0.49, d: 0.76 } as const;
export type BucklingCurve = keyof typeof imperfectionFactors;

/**
 * The most favourable curve that Table 6.2 can give a shape, about either axis and for any way of making it. What the cold design
 * really used is this curve or a lower one.
 */
export function mostFavourableCurve(shape: SectionShape, yieldStrengthMPa: number): BucklingCurve {
  const high = yieldStrengthMPa >= 430; // S460, also where it is thicker than 40 mm
  switch (shape.kind) {
    case 'i':
      if (shape.rootRadiusMm === 0) return 'b';
      if (shape.hMm / shape.bMm > 1.2) return high ? 'a0' : 'a';
      return high ? 'a' : 'b';
    case 'rectangular-hollow':
    case 'circular-hollow':
    case 'i-unequal': return high ? 'a0' : 'a';
    default: return 'b';
  }
}

export const coldBucklingReductionFormula = defineFormula<{ slenderness: number; imperfection: number }>({
  label: 'Reduction for flexural buckling at normal temperature',
  source: { standard: 'EN 1993-1-1:2005', clause: '6.3.1.2 (6.49)' },
  expression: '1/(Φ + √(Φ² − λ̄²)) ≤ 1, Φ = ½·(1 + α·(λ̄ − 0.2) + λ̄²)',
  result: { symbol: 'χ', meaning: 'reduction factor', unit: '' },
  symbols: {
    slenderness: { symbol: 'λ̄', meaning: 'relative slenderness', unit: '' },
    imperfection: { symbol: 'α', meaning: 'imperfection factor of the buckling curve', unit: '' },
  },
  evaluate: ({ slenderness, imperfection }) => {
    if (slenderness <= 0.2) return 1;
    const phi = 0.5 * (1 + imperfection * (slenderness - 0.2) + slenderness * slenderness);
    return Math.min(1, 1 / (phi + Math.sqrt(phi * phi - slenderness * slenderness)));
  },
});
