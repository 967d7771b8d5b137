import { defineFormula } from '../../formula.js';
import { STEEL_DENSITY_KG_PER_M3, steelSpecificHeat } from './clause-3-4-1-thermal-properties.js';

/** 4.2.5.2(3) */
export const GREATEST_PROTECTED_STEP_S = 30;

interface ProtectedStepInput {
  conductivityWPerMK: number;
  sectionFactorPerM: number;
  thicknessM: number;
  heatRatio: number;
  gasC: number;
  steelC: number;
  gasRiseK: number;
  stepS: number;
}

export const heatRatioFormula = defineFormula<{ specificHeatJPerKgK: number; densityKgPerM3: number; thicknessM: number; sectionFactorPerM: number; steelC: number }>({
  label: 'Heat stored in the protection relative to the steel',
  source: { standard: 'EN 1993-1-2:2005', clause: '4.2.5.2 (4.27), φ' },
  expression: 'c_p·ρ_p·d_p·(A_p/V)/(c_a·ρ_a)',
  result: { symbol: 'φ', meaning: 'ratio of heat capacities', unit: '' },
  symbols: {
    specificHeatJPerKgK: { symbol: 'c_p', meaning: 'specific heat of the protection', unit: 'J/kgK' },
    densityKgPerM3: { symbol: 'ρ_p', meaning: 'density of the protection', unit: 'kg/m³' },
    thicknessM: { symbol: 'd_p', meaning: 'thickness of the protection', unit: 'm' },
    sectionFactorPerM: { symbol: 'A_p/V', meaning: 'section factor of the protected member', unit: '1/m' },
    steelC: { symbol: 'θ_a', meaning: 'steel temperature, for c_a; ρ_a is 7850 kg/m³', unit: '°C' },
  },
  evaluate: (i) =>
    (i.specificHeatJPerKgK * i.densityKgPerM3 * i.thicknessM * i.sectionFactorPerM) / (steelSpecificHeat(i.steelC) * STEEL_DENSITY_KG_PER_M3),
});

/** One step of (4.27): the rise of a protected steel temperature, K. */
export const protectedStepFormula = defineFormula<ProtectedStepInput>({
  label: 'Rise of the steel temperature in one step, protected',
  source: { standard: 'EN 1993-1-2:2005', clause: '4.2.5.2 (4.27)', note: 'Δθ_a,t ≥ 0 where Δθ_g,t > 0; Δt not above 30 s' },
  expression: 'λ_p·(A_p/V)·(θ_g − θ_a)/(d_p·c_a·ρ_a·(1 + φ/3))·Δt − (e^(φ/10) − 1)·Δθ_g,t',
  result: { symbol: 'Δθ_a,t', meaning: 'rise of the steel temperature', unit: 'K' },
  symbols: {
    conductivityWPerMK: { symbol: 'λ_p', meaning: 'thermal conductivity of the protection', unit: 'W/mK' },
    sectionFactorPerM: { symbol: 'A_p/V', meaning: 'section factor of the protected member', unit: '1/m' },
    thicknessM: { symbol: 'd_p', meaning: 'thickness of the protection', unit: 'm' },
    heatRatio: { symbol: 'φ', meaning: 'ratio of heat capacities', unit: '' },
    gasC: { symbol: 'θ_g', meaning: 'gas temperature', unit: '°C' },
    steelC: { symbol: 'θ_a', meaning: 'steel temperature, also for c_a; ρ_a is 7850 kg/m³', unit: '°C' },
    gasRiseK: { symbol: 'Δθ_g,t', meaning: 'rise of the gas temperature in the step', unit: 'K' },
    stepS: { symbol: 'Δt', meaning: 'time step', unit: 's' },
  },
  evaluate: (i) => {
    const flow = (i.conductivityWPerMK * i.sectionFactorPerM * (i.gasC - i.steelC) * i.stepS) /
      (i.thicknessM * steelSpecificHeat(i.steelC) * STEEL_DENSITY_KG_PER_M3 * (1 + i.heatRatio / 3));
    const rise = flow - Math.expm1(i.heatRatio / 10) * i.gasRiseK;
    return i.gasRiseK > 0 && rise < 0 ? 0 : rise;
  },
});

/** Time for which moisture in the protection holds the steel at 100 °C, min. */
export const moistureDwellFormula = defineFormula<{ moisturePercent: number; densityKgPerM3: number; thicknessM: number; conductivityWPerMK: number }>({
  label: 'Delay at 100 °C from moisture in the protection',
  source: { standard: 'ENV 1993-1-2:1995', clause: '4.2.5.2(5) with the delay of ECCS practice', memory: true },
  expression: 'p·ρ_p·d_p²/(5·λ_p)',
  result: { symbol: 't_v', meaning: 'time spent at 100 °C', unit: 'min' },
  symbols: {
    moisturePercent: { symbol: 'p', meaning: 'moisture content by mass', unit: '%' },
    densityKgPerM3: { symbol: 'ρ_p', meaning: 'density of the protection', unit: 'kg/m³' },
    thicknessM: { symbol: 'd_p', meaning: 'thickness of the protection', unit: 'm' },
    conductivityWPerMK: { symbol: 'λ_p', meaning: 'thermal conductivity of the protection', unit: 'W/mK' },
  },
  evaluate: (i) => (i.moisturePercent * i.densityKgPerM3 * i.thicknessM ** 2) / (5 * i.conductivityWPerMK),
});
