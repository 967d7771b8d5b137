import { defineFormula } from '../../formula.js';

/** One variable action after its ψ; favourable ones are left out by EN 1990 6.1(2) and Table A1.1. */
export const accidentalCombinationFormula = defineFormula<{ permanent: number; leading: number; accompanying: number }>({
  label: 'Effect of actions in fire',
  source: { standard: 'EN 1990:2002', clause: '6.4.3.3 (6.11b) with EN 1991-1-2 4.3.1', note: 'a variable action that acts favourably is left out' },
  expression: 'G_k + ψ_fi·Q_k,1 + Σψ_2,i·Q_k,i',
  result: { symbol: 'E_fi,d', meaning: 'design effect in fire', unit: 'kN or kNm' },
  symbols: {
    permanent: { symbol: 'G_k', meaning: 'effect of permanent actions', unit: 'kN or kNm' },
    leading: { symbol: 'ψ_fi·Q_k,1', meaning: 'effect of the leading variable action', unit: 'kN or kNm' },
    accompanying: { symbol: 'Σψ_2,i·Q_k,i', meaning: 'effect of the accompanying variable actions', unit: 'kN or kNm' },
  },
  evaluate: (i) => i.permanent + i.leading + i.accompanying,
});
