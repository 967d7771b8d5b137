import type { SectionProperties, SectionShape } from '@mantlet/common';
import { defineFormula } from '../../formula.js';

const standard = 'EN 1993-1-1:2005';

/** Share of the web, and of the flanges, in the area: at most one half. */
function shares(shape: SectionShape, areaMm2: number): { web: number; flange: number } | null {
  const part = (outside: number) => Math.min((areaMm2 - outside) / areaMm2, 0.5);
  switch (shape.kind) {
    case 'i': return { web: part(2 * shape.bMm * shape.tfMm), flange: 0.5 };
    case 'rectangular-hollow': return { web: part(2 * shape.bMm * shape.tMm), flange: part(2 * shape.hMm * shape.tMm) };
    case 'box': return { web: part(2 * shape.bMm * shape.tfMm), flange: part(2 * shape.hMm * shape.twMm) };
    default: return null;
  }
}

/** How much of the plastic moment is left beside the axial force, about y and about z: 6.2.9.1(5) and (6). 0 where the force takes all. */
export function reducedMoments(shape: SectionShape, properties: SectionProperties, n: number): { y: number; z: number } {
  if (n >= 1) return { y: 0, z: 0 };
  if (shape.kind === 'circular-hollow') return { y: 1 - n ** 1.7, z: 1 - n ** 1.7 };
  const own = shares(shape, properties.areaMm2);
  // a shape without a published reduction: linear, which no section falls below
  if (!own) return { y: 1 - n, z: 1 - n };
  const y = Math.min((1 - n) / (1 - 0.5 * own.web), 1);
  if (shape.kind !== 'i') return { y, z: Math.min((1 - n) / (1 - 0.5 * own.flange), 1) };
  return { y, z: n <= own.web ? 1 : 1 - ((n - own.web) / (1 - own.web)) ** 2 };
}

/** Exponents of 6.2.9.1(6). */
export function biaxialExponents(shape: SectionShape, n: number): { alpha: number; beta: number } {
  if (shape.kind === 'i') return { alpha: 2, beta: Math.max(5 * n, 1) };
  if (shape.kind === 'circular-hollow') return { alpha: 2, beta: 2 };
  if (shape.kind !== 'rectangular-hollow' && shape.kind !== 'box') return { alpha: 1, beta: 1 };
  const hollow = 1.13 * n * n >= 1 ? 6 : Math.min(1.66 / (1 - 1.13 * n * n), 6);
  return { alpha: hollow, beta: hollow };
}

const n = { symbol: 'n', meaning: 'axial force over A·k_y,θ·f_y/γ_M,fi', unit: '' };
const my = { symbol: 'm_y', meaning: 'moment about y over W_y·k_y,θ·f_y/γ_M,fi', unit: '' };
const mz = { symbol: 'm_z', meaning: 'moment about z over W_z·k_y,θ·f_y/γ_M,fi', unit: '' };
const result = { symbol: 'U', meaning: 'share of the resistance that is used', unit: '' };

/** Class 1 and 2. Infinity where the axial force alone takes all. */
export const plasticCrossSectionFormula = defineFormula<{ my: number; mz: number; leftY: number; leftZ: number; alpha: number; beta: number }>({
  label: 'Cross-section under axial force and bending, class 1 and 2',
  source: { standard, clause: '6.2.9.1(5), (6)', note: 'with the resistances at temperature; exponents of 1 where only one axis is bent' },
  expression: '(m_y/ρ_y)^α + (m_z/ρ_z)^β',
  result,
  symbols: {
    my, mz,
    leftY: { symbol: 'ρ_y', meaning: 'M_N,y,Rd/M_pl,y,Rd beside the axial force', unit: '' },
    leftZ: { symbol: 'ρ_z', meaning: 'M_N,z,Rd/M_pl,z,Rd beside the axial force', unit: '' },
    alpha: { symbol: 'α', meaning: 'exponent', unit: '' },
    beta: { symbol: 'β', meaning: 'exponent', unit: '' },
  },
  evaluate: (i) => (i.leftY <= 0 || i.leftZ <= 0 ? Infinity : (i.my / i.leftY) ** i.alpha + (i.mz / i.leftZ) ** i.beta),
});

export const elasticCrossSectionFormula = defineFormula<{ n: number; my: number; mz: number }>({
  label: 'Cross-section under axial force and bending, class 3',
  source: { standard, clause: '6.2.9.2', note: 'with the resistances at temperature' },
  expression: 'n + m_y + m_z',
  result,
  symbols: { n, my, mz },
  evaluate: (i) => i.n + i.my + i.mz,
});
