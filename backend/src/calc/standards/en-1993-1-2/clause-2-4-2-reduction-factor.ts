import { defineFormula } from '../../formula.js';

interface ReductionInput {
  permanent: number;
  variable: number;
  psiFi: number;
  gammaG: number;
  gammaQ: number;
}
export const reductionFactorFormula = defineFormula<ReductionInput>({
  label: 'Reduction factor for the load level in fire',
  source: { standard: 'EN 1993-1-2:2005', clause: '2.4.2 (2.5)' },
  expression: '(G_k + ψ_fi·Q_k,1)/(γ_G·G_k + γ_Q,1·Q_k,1)',
  result: { symbol: 'η_fi', meaning: 'reduction factor', unit: '' },
  symbols: {
    permanent: { symbol: 'G_k', meaning: 'permanent action', unit: 'kN' },
    variable: { symbol: 'Q_k,1', meaning: 'leading variable action', unit: 'kN' },
    psiFi: { symbol: 'ψ_fi', meaning: 'combination factor in fire', unit: '' },
    gammaG: { symbol: 'γ_G', meaning: 'partial factor of permanent actions', unit: '' },
    gammaQ: { symbol: 'γ_Q,1', meaning: 'partial factor of the leading variable action', unit: '' },
  },
  evaluate: (i) => (i.permanent + i.psiFi * i.variable) / (i.gammaG * i.permanent + i.gammaQ * i.variable),
});

export const utilisationFromAmbientFormula = defineFormula<{ etaFi: number; ambientUtilisation: number; gammaMFi: number }>({
  label: 'Degree of utilisation from the cold design',
  source: { standard: 'EN 1993-1-2:2005', clause: '4.2.4 (4.24) with 2.4.2 (2.4)', note: 'γ_M0 = 1.0' },
  expression: 'η_fi·(E_d/R_d)·γ_M,fi/γ_M0',
  result: { symbol: 'μ0', meaning: 'degree of utilisation', unit: '' },
  symbols: {
    etaFi: { symbol: 'η_fi', meaning: 'reduction factor for the load level in fire', unit: '' },
    ambientUtilisation: { symbol: 'E_d/R_d', meaning: 'utilisation at normal temperature', unit: '' },
    gammaMFi: { symbol: 'γ_M,fi', meaning: 'partial factor in fire', unit: '' },
  },
  evaluate: (i) => i.etaFi * i.ambientUtilisation * i.gammaMFi,
});
