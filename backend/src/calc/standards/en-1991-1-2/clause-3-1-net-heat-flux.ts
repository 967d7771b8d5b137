import { defineFormula } from '../../formula.js';

export const STEFAN_BOLTZMANN_W_PER_M2K4 = 5.67e-8;
/** ε_f, emissivity of the fire */
export const FIRE_EMISSIVITY = 1;

/** h_net,d in W/m² on steel at steelC in gas at gasC; the configuration factor Φ is 1. */
export function netHeatFlux(gasC: number, steelC: number, emissivity: number, convectionWPerM2K: number): number {
  const gas2 = (gasC + 273) * (gasC + 273);
  const steel2 = (steelC + 273) * (steelC + 273);
  return convectionWPerM2K * (gasC - steelC) + FIRE_EMISSIVITY * emissivity * STEFAN_BOLTZMANN_W_PER_M2K4 * (gas2 * gas2 - steel2 * steel2);
}

interface FluxInput {
  gasC: number;
  steelC: number;
  emissivity: number;
  convectionWPerM2K: number;
}

export const netHeatFluxFormula = defineFormula<FluxInput>({
  label: 'Net heat flux to the steel surface',
  source: { standard: 'EN 1991-1-2:2002', clause: '3.1 (3.1) to (3.3)', note: 'Φ = 1, ε_f = 1; the radiation temperature is the gas temperature' },
  expression: 'α_c·(θ_g − θ_m) + Φ·ε_m·ε_f·5.67·10⁻⁸·[(θ_g + 273)⁴ − (θ_m + 273)⁴]',
  result: { symbol: 'ḣ_net,d', meaning: 'design net heat flux', unit: 'W/m²' },
  symbols: {
    gasC: { symbol: 'θ_g', meaning: 'gas temperature', unit: '°C' },
    steelC: { symbol: 'θ_m', meaning: 'surface temperature of the member', unit: '°C' },
    emissivity: { symbol: 'ε_m', meaning: 'surface emissivity of the member', unit: '' },
    convectionWPerM2K: { symbol: 'α_c', meaning: 'coefficient of heat transfer by convection', unit: 'W/m²K' },
  },
  evaluate: (i) => netHeatFlux(i.gasC, i.steelC, i.emissivity, i.convectionWPerM2K),
});
