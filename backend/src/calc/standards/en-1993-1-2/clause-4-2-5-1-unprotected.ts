import { defineFormula } from '../../formula.js';
import { STEEL_DENSITY_KG_PER_M3, steelSpecificHeat } from './clause-3-4-1-thermal-properties.js';

/** 4.2.5.1(3): the section factor is not taken below this */
export const LEAST_SECTION_FACTOR_PER_M = 10;
/** 4.2.5.1(4) */
export const GREATEST_UNPROTECTED_STEP_S = 5;

interface UnprotectedStepInput {
  shadowFactor: number;
  sectionFactorPerM: number;
  netHeatFluxWPerM2: number;
  steelC: number;
  stepS: number;
}
/** One step of (4.25): the rise of an unprotected steel temperature, K. */
export const unprotectedStepFormula = defineFormula<UnprotectedStepInput>({
  label: 'Rise of the steel temperature in one step, unprotected',
  source: { standard: 'EN 1993-1-2:2005', clause: '4.2.5.1 (4.25)', note: 'A_m/V not below 10 1/m; Δt not above 5 s' },
  expression: 'k_sh·(A_m/V)/(c_a·ρ_a)·ḣ_net,d·Δt',
  result: { symbol: 'Δθ_a,t', meaning: 'rise of the steel temperature', unit: 'K' },
  symbols: {
    shadowFactor: { symbol: 'k_sh', meaning: 'correction factor for the shadow effect', unit: '' },
    sectionFactorPerM: { symbol: 'A_m/V', meaning: 'section factor', unit: '1/m' },
    netHeatFluxWPerM2: { symbol: 'ḣ_net,d', meaning: 'design net heat flux', unit: 'W/m²' },
    steelC: { symbol: 'θ_a', meaning: 'steel temperature, for c_a; ρ_a is 7850 kg/m³', unit: '°C' },
    stepS: { symbol: 'Δt', meaning: 'time step', unit: 's' },
  },
  evaluate: (i) =>
    (i.shadowFactor * Math.max(i.sectionFactorPerM, LEAST_SECTION_FACTOR_PER_M) * i.netHeatFluxWPerM2 * i.stepS) /
    (steelSpecificHeat(i.steelC) * STEEL_DENSITY_KG_PER_M3),
});
