import { message } from '@mantlet/common';
import type { LoadHeight, MemberDesign, MomentShape, SectionShape } from '@mantlet/common';
import { explain } from '../formula.js';
import type { WorkingStep } from '../formula.js';
import { SHEAR_MODULUS_MPA, criticalMomentFormula, heldAxisCriticalMomentFormula, lateralSlendernessFormula } from '../standards/en-1993-1-1/clause-6-3-2-2-critical-moment.js';
import type { CriticalMomentInput } from '../standards/en-1993-1-1/clause-6-3-2-2-critical-moment.js';
import { ELASTIC_MODULUS_MPA, bucklingShare } from '../standards/en-1993-1-2/clause-4-2-3-2-compression.js';
import { lateralBucklingResistanceFormula, lateralReductionFormula, lateralSlendernessInFireFormula } from '../standards/en-1993-1-2/clause-4-2-3-3-lateral-torsional.js';
import { kE, kY } from '../standards/en-1993-1-2/table-3-1.js';
import type { CriticalTemperatureCase, Determined } from '../types.js';
import { greatestMoment } from './beam-analysis/beam-diagram.js';
import type { BeamDiagram } from './beam-analysis/beam-diagram.js';
import { factorOf, lateralEnergy, uniformCriticalMoment } from './beam-analysis/lateral-buckling.js';
import type { LateralEnergy, LateralLength, LateralLoad, LateralStiffness } from './beam-analysis/lateral-buckling.js';
import { bucklingTemperature, tableStep } from './critical-temperature-limit-states.js';
import type { LimitState, Material } from './critical-temperature-limit-states.js';
import type { FireDemand } from './fire-demand.js';

/** A length between two lateral supports with what it must carry. */
interface Segment {
  fromMm: number;
  toMm: number;
  momentNmm: number;
  length: LateralLength;
}

export interface LateralState extends LimitState {
  /** λ̄_LT at 20 °C, for the interaction with axial force */
  slenderness: number;
}

const heightOf = (shape: SectionShape): number => ('hMm' in shape ? shape.hMm : 0);
const loadHeightMm = (height: LoadHeight, shape: SectionShape): number => ({ 'top-flange': 0.5, 'shear-centre': 0, 'bottom-flange': -0.5 })[height] * heightOf(shape);

/** Doubly symmetric sections only: the energy of others holds further terms. */
const hasExpression = (shape: SectionShape): boolean => ['i', 'rectangular-hollow', 'box'].includes(shape.kind);

/** Unit diagrams of the shapes that may be said instead of loads. */
function segmentOfShape(shape: MomentShape, lengthMm: number, momentNmm: number, heightMm: number): Segment {
  const l = lengthMm;
  const base = { lengthMm: l, kinksMm: [], loads: [], loadHeightMm: 0, ends: 'held' as const, heldHeightMm: null };
  const lengths: Record<MomentShape['kind'], LateralLength> = {
    'end-moments': { ...base, momentAt: (x) => momentNmm * (1 + (((shape.kind === 'end-moments' ? shape.ratio : 1) - 1) * x) / l) },
    distributed: {
      ...base, momentAt: (x) => (4 * momentNmm * x * (l - x)) / (l * l), loadHeightMm: heightMm,
      loads: [{ fromMm: 0, toMm: l, intensityAt: () => (8 * momentNmm) / (l * l) }],
    },
    point: {
      ...base, momentAt: (x) => (2 * momentNmm * Math.min(x, l - x)) / l, kinksMm: [l / 2], loadHeightMm: heightMm,
      loads: [{ atMm: l / 2, forceN: (4 * momentNmm) / l }],
    },
  };
  return { fromMm: 0, toMm: l, momentNmm, length: lengths[shape.kind] };
}

function loadsWithin(loads: NonNullable<FireDemand['beam']>['loads'], fromMm: number, toMm: number, tipFree: boolean): LateralLoad[] {
  return loads.flatMap((load): LateralLoad[] => {
    if (load.kind === 'point') {
      // at a support it is held; at a free tip it is not
      const within = load.atMm > fromMm && (load.atMm < toMm || (tipFree && load.atMm === toMm));
      return within ? [{ atMm: load.atMm - fromMm, forceN: load.forceN }] : [];
    }
    if (load.toMm <= fromMm || load.fromMm >= toMm) return [];
    const rise = (load.endNPerMm - load.startNPerMm) / (load.toMm - load.fromMm);
    return [{ fromMm: load.fromMm - fromMm, toMm: load.toMm - fromMm, intensityAt: (x) => load.startNPerMm + rise * (x + fromMm - load.fromMm) }];
  });
}

/** The greatest moment that can buckle a length: any where it is free, a hogging one where its top flange is held along it. */
function greatestOf(diagram: BeamDiagram, fromMm: number, toMm: number, topHeld: boolean): number {
  if (!topHeld) return Math.abs(greatestMoment(diagram, fromMm, toMm).momentNmm);
  return Math.max(0, ...[fromMm, ...diagram.pointsMm.filter((x) => x > fromMm && x < toMm), toMm].map((x) => -diagram.momentAt(x)));
}

function segmentsOfBeam(beam: NonNullable<FireDemand['beam']>, heightMm: number, topHeldMm: number | null): Determined<Segment[]> {
  const { described, diagram, loads } = beam;
  const span = described.spanMm;
  const supports = described.lateralSupportsMm.filter((x) => x > 0 && x <= span);
  const tipFree = described.supports === 'cantilever' && !supports.includes(span);
  if (tipFree && supports.length && topHeldMm === null) return { ok: false, reason: message('assessment.cantilever-tip', {}) };
  // with a free tip, supports along a cantilever whose top flange is held are left out: the safe side
  const places = [...new Set([0, ...(tipFree ? [] : supports), span])].sort((a, b) => a - b);
  return {
    ok: true,
    value: places.slice(1).map((toMm, i) => {
      const fromMm = places[i]!;
      return {
        fromMm, toMm, momentNmm: greatestOf(diagram, fromMm, toMm, topHeldMm !== null),
        length: {
          lengthMm: toMm - fromMm, momentAt: (x: number) => diagram.momentAt(x + fromMm), loadHeightMm: heightMm, heldHeightMm: topHeldMm,
          ends: tipFree ? 'free-at-right' as const : 'held' as const,
          kinksMm: diagram.pointsMm.map((x) => x - fromMm), loads: loadsWithin(loads, fromMm, toMm, tipFree),
        },
      };
    }),
  };
}

function segmentsOf(c: CriticalTemperatureCase, design: MemberDesign, demand: FireDemand): Determined<Segment[]> {
  const heightMm = loadHeightMm(design.loadHeight, c.shape);
  const topHeldMm = design.lateralRestraint === 'continuous' ? heightOf(c.shape) / 2 : null;
  if (demand.beam) return segmentsOfBeam(demand.beam, heightMm, topHeldMm);
  if (design.lateralSpacingMm === null) return { ok: false, reason: message('assessment.no-lateral-spacing', {}) };
  return { ok: true, value: [segmentOfShape(design.momentShapeY, design.lateralSpacingMm, demand.effect.momentYNmm, heightMm)] };
}

/** The numbers of the general expression that give what the energy method found: C1 without the loads' height, then C2. */
function expressionOf(energy: LateralEnergy, { length, momentNmm }: Segment, criticalMomentNmm: number, stiffness: LateralStiffness): CriticalMomentInput {
  const { lengthMm } = length;
  // without loads on the length, the height of loads elsewhere says nothing
  const height = energy.lifting.some((one) => one !== 0) ? length.loadHeightMm : 0;
  const c1 = (factorOf(energy, false) * momentNmm) / uniformCriticalMoment(lengthMm, stiffness);
  const bending = stiffness.modulusMPa * stiffness.izMm4;
  const inner = stiffness.iwMm6 / stiffness.izMm4 + (lengthMm ** 2 * stiffness.shearModulusMPa * stiffness.itMm4) / (Math.PI ** 2 * bending);
  const scaled = (criticalMomentNmm * lengthMm ** 2) / (c1 * Math.PI ** 2 * bending);
  const c2 = height === 0 ? 0 : (inner - scaled ** 2) / (2 * scaled) / height;
  return { ...stiffness, c1, c2, lengthMm, loadHeightMm: height };
}

function criticalMomentStep(energy: LateralEnergy, segment: Segment, criticalMomentNmm: number, stiffness: LateralStiffness): WorkingStep {
  if (segment.length.heldHeightMm === null) return explain(criticalMomentFormula, expressionOf(energy, segment, criticalMomentNmm, stiffness)).step;
  const { momentNmm, length: { lengthMm, heldHeightMm } } = segment;
  return explain(heldAxisCriticalMomentFormula, { ...stiffness, factor: criticalMomentNmm / momentNmm, momentNmm, lengthMm, heldHeightMm }).step;
}

/** Null where the length cannot buckle. */
function stateOf(c: CriticalTemperatureCase, segment: Segment, stiffness: LateralStiffness, modulusMm3: number, { fy, gamma }: Material, several: boolean): LateralState | null {
  const energy = lateralEnergy(segment.length, stiffness);
  const criticalMomentNmm = factorOf(energy) * segment.momentNmm;
  if (criticalMomentNmm === Infinity) return null;
  const slendernessInput = { modulusMm3, yieldStrengthMPa: fy, criticalMomentNmm };
  const slenderness = lateralSlendernessFormula.evaluate(slendernessInput);
  const imperfection = 0.65 * Math.sqrt(235 / fy);
  const where = several ? `, between ${segment.fromMm} and ${segment.toMm} mm` : '';
  return {
    name: 'lateral-torsional buckling', clause: `4.2.3.3(4)${where}`, unit: 'kNm', effect: segment.momentNmm, slenderness,
    resistance: (t) => (modulusMm3 * fy * bucklingShare(t, slenderness, imperfection)) / gamma,
    temperature: () => bucklingTemperature((segment.momentNmm * gamma) / (modulusMm3 * fy), slenderness, imperfection),
    explainFirst: (steps) => steps.push(criticalMomentStep(energy, segment, criticalMomentNmm, stiffness), explain(lateralSlendernessFormula, slendernessInput).step),
    explainAt: (t, steps) => {
      const [ky, ke] = [kY(t), kE(t)];
      steps.push(tableStep('k_y,θ', t, ky), tableStep('k_E,θ', t, ke));
      if (ky <= 0) return;
      const inFire = explain(lateralSlendernessInFireFormula, { slenderness, ky, ke });
      const chi = explain(lateralReductionFormula, { slendernessInFire: inFire.value, yieldStrengthMPa: fy });
      steps.push(inFire.step, chi.step, explain(lateralBucklingResistanceFormula, { reduction: chi.value, modulusMm3, ky, yieldStrengthMPa: fy, gammaMFi: gamma }).step);
    },
  };
}

/**
 * Lateral-torsional buckling of each length between lateral supports, the length that fails first; null where none can buckle.
 * Resistance: EN 1993-1-2 4.2.3.3(4), (5). M_cr: see beam-analysis/lateral-buckling.ts.
 */
export function lateralBuckling(
  c: CriticalTemperatureCase, design: MemberDesign, demand: FireDemand, modulusMm3: number, material: Material,
): Determined<LateralState | null> {
  const { izMm4, itMm4, iwMm6 } = c.properties;
  if (!hasExpression(c.shape) || itMm4 === null) return { ok: false, reason: message('assessment.lateral-torsional', {}) };
  const stiffness = { modulusMPa: ELASTIC_MODULUS_MPA, shearModulusMPa: SHEAR_MODULUS_MPA, izMm4, itMm4, iwMm6: iwMm6 ?? 0 };
  const segments = segmentsOf(c, design, demand);
  if (!segments.ok) return segments;
  const bent = segments.value.filter((one) => one.momentNmm > 1e-9 * demand.effect.momentYNmm);
  const states = bent.flatMap((one) => stateOf(c, one, stiffness, modulusMm3, material, segments.value.length > 1) ?? []);
  const lost = (state: LateralState) => state.effect / state.resistance(20, false);
  return { ok: true, value: states.reduce<LateralState | null>((worst, state) => (!worst || firstOf(worst, state, lost) === state ? state : worst), null) };
}

/** Which of two fails first: the one further beyond its strength cold, else the one at the lower temperature. */
function firstOf(a: LateralState, b: LateralState, lost: (state: LateralState) => number): LateralState {
  if (Math.max(lost(a), lost(b)) > 1) return lost(b) > lost(a) ? b : a;
  return b.temperature(false) < a.temperature(false) ? b : a;
}
