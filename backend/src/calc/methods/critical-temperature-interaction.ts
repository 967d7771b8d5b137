import type { MemberDesign, MomentShape } from '@mantlet/common';
import { explain } from '../formula.js';
import type { WorkingStep } from '../formula.js';
import {
  biaxialExponents, elasticCrossSectionFormula, plasticCrossSectionFormula, reducedMoments,
} from '../standards/en-1993-1-1/clause-6-2-9-bending-and-axial.js';
import { bucklingShare } from '../standards/en-1993-1-2/clause-4-2-3-2-compression.js';
import {
  amplificationFormula, equivalentMoment, interactionFormula, lateralAmplificationFormula, muLtFormula, muYFormula, muZFormula,
} from '../standards/en-1993-1-2/clause-4-2-3-5-beam-columns.js';
import { STRENGTH_ENDS_C, kE, kY, table31Rows } from '../standards/en-1993-1-2/table-3-1.js';
import type { CriticalTemperatureCase } from '../types.js';
import { tableStep } from './critical-temperature-limit-states.js';
import type { LimitState, Material } from './critical-temperature-limit-states.js';
import type { FireDemand } from './fire-demand.js';

/** Highest temperature at which what is used stays within what is there; U rises with temperature. */
function temperatureOfShare(shareAt: (temperatureC: number) => number): number {
  const above = table31Rows.findIndex(([temperatureC]) => !(shareAt(temperatureC) <= 1));
  if (above < 0) return STRENGTH_ENDS_C;
  if (above === 0) return table31Rows[0]![0];
  let low = table31Rows[above - 1]![0];
  let high = table31Rows[above]![0];
  for (let i = 0; i < 44; i += 1) {
    const middle = (low + high) / 2;
    if (shareAt(middle) <= 1) low = middle;
    else high = middle;
  }
  return low;
}

/** A check of several effects together: 1 on the one side, how many times the share goes into 1 on the other. */
function together(name: LimitState['name'], clause: string, shareAt: (temperatureC: number) => number, explainAt: LimitState['explainAt']): LimitState {
  return {
    name, clause, unit: '', effect: 1,
    resistance: (t) => { const share = shareAt(t); return share > 0 ? 1 / share : 0; },
    temperature: () => temperatureOfShare(shareAt),
    explainAt,
  };
}

export interface InteractionInput {
  /** moduli by class */
  modulusYMm3: number;
  modulusZMm3: number;
  plastic: boolean;
  /** λ̄ at 20 °C */
  slendernessY: number;
  slendernessZ: number;
  /** λ̄_LT at 20 °C; null where the member cannot buckle sideways */
  slendernessLt: number | null;
}

/** Axial force over A·k_y·f_y, moments over W·k_y·f_y. */
function sharesAt(c: CriticalTemperatureCase, input: Pick<InteractionInput, 'modulusYMm3' | 'modulusZMm3'>, { effect }: FireDemand, { fy, gamma }: Material, temperatureC: number) {
  const strength = (kY(temperatureC) * fy) / gamma;
  const axial = Math.max(effect.compressionN, effect.tensionN);
  return {
    n: axial / (c.properties.areaMm2 * strength), my: effect.momentYNmm / (input.modulusYMm3 * strength), mz: effect.momentZNmm / (input.modulusZMm3 * strength),
  };
}

/** EN 1993-1-1 6.2.9 with the strength at temperature: any place of the member, ends included. */
export function crossSection(c: CriticalTemperatureCase, input: Pick<InteractionInput, 'modulusYMm3' | 'modulusZMm3' | 'plastic'>, demand: FireDemand, material: Material): LimitState {
  const stepAt = (t: number) => {
    const { n, my, mz } = sharesAt(c, input, demand, material, t);
    if (!input.plastic) return explain(elasticCrossSectionFormula, { n, my, mz });
    const left = reducedMoments(c.shape, c.properties, n);
    const exponents = my > 0 && mz > 0 ? biaxialExponents(c.shape, n) : { alpha: 1, beta: 1 };
    return explain(plasticCrossSectionFormula, { my, mz, leftY: left.y, leftZ: left.z, ...exponents });
  };
  return together('cross-section', input.plastic ? '4.2.3.3 with EN 1993-1-1 6.2.9.1' : '4.2.3.4 with EN 1993-1-1 6.2.9.2', (t) => (kY(t) > 0 ? stepAt(t).value : Infinity), (t, steps) => {
    steps.push(tableStep('k_y,θ', t, kY(t)));
    if (kY(t) > 0) steps.push(stepAt(t).step);
  });
}

/** β_M of a diagram that is said by its shape. */
function betaOf(shape: MomentShape): number {
  return shape.kind === 'end-moments' ? equivalentMoment.endMoments(shape.ratio) : equivalentMoment[shape.kind];
}

/** β_M,y of a described beam: its loads between its end moments (Figure 4.2, last line), with the lesser β of a distributed load. */
function betaOfBeam({ diagram }: NonNullable<FireDemand['beam']>): number {
  const l = diagram.spanMm;
  const [a, b] = [diagram.momentAt(0), diagram.momentAt(l)];
  const [small, large] = Math.abs(a) < Math.abs(b) ? [a, b] : [b, a];
  const byEnds = equivalentMoment.endMoments(large === 0 ? 1 : small / large);
  const values = diagram.pointsMm.map((x) => diagram.momentAt(x));
  const [top, bottom] = [Math.max(...values, 0), Math.min(...values, 0)];
  const byLoads = Math.max(...diagram.pointsMm.map((x) => Math.abs(diagram.momentAt(x) - (a + ((b - a) * x) / l))));
  const swing = top - bottom;
  return swing === 0 ? byEnds : byEnds + (byLoads / swing) * (equivalentMoment.distributed - byEnds);
}

/** EN 1993-1-2 4.2.3.5: compression with bending, both expressions. */
export function beamColumn(c: CriticalTemperatureCase, design: MemberDesign, input: InteractionInput, demand: FireDemand, material: Material): LimitState {
  const imperfection = 0.65 * Math.sqrt(235 / material.fy);
  const betaY = demand.beam ? betaOfBeam(demand.beam) : betaOf(design.momentShapeY);
  const betaZ = betaOf(design.momentShapeZ);
  // a described beam's segment: as under uniform moment, which gives the greatest k_LT
  const betaLt = demand.beam ? equivalentMoment.endMoments(1) : betaY;
  const at = (t: number, steps: WorkingStep[] | null): number => {
    const ky = kY(t);
    if (ky <= 0) return Infinity;
    const growth = Math.sqrt(ky / kE(t));
    const chi = (slenderness: number) => bucklingShare(t, slenderness, imperfection) / ky;
    const { n, my, mz } = sharesAt(c, input, demand, material, t);
    const ny = n / chi(input.slendernessY);
    const nz = n / chi(input.slendernessZ);
    const muY = explain(muYFormula, { beta: betaY, slenderness: input.slendernessY * growth });
    const muZ = explain(muZFormula, { beta: betaZ, slenderness: input.slendernessZ * growth });
    const factorY = explain(amplificationFormula, { mu: muY.value, axialShare: ny });
    const factorZ = explain(amplificationFormula, { mu: muZ.value, axialShare: nz });
    const first = explain(interactionFormula, { axialShare: Math.max(ny, nz), factorY: factorY.value, shareY: my, factorZ: factorZ.value, shareZ: mz });
    steps?.push(tableStep('k_y,θ', t, ky), tableStep('k_E,θ', t, kE(t)));
    if (my > 0) steps?.push(muY.step, { ...factorY.step, what: 'Interaction factor about y' });
    if (mz > 0) steps?.push(muZ.step, { ...factorZ.step, what: 'Interaction factor about z' });
    steps?.push({ ...first.step, what: 'Axial force with bending, buckling about either axis' });
    if (input.slendernessLt === null) return first.value;
    const muLt = explain(muLtFormula, { beta: betaLt, slenderness: input.slendernessZ * growth });
    const factorLt = explain(lateralAmplificationFormula, { mu: muLt.value, axialShare: nz });
    const second = explain(interactionFormula, { axialShare: nz, factorY: factorLt.value, shareY: my / chi(input.slendernessLt), factorZ: factorZ.value, shareZ: mz });
    steps?.push(muLt.step, factorLt.step, { ...second.step, what: 'Axial force with bending, lateral-torsional buckling' });
    return Math.max(first.value, second.value);
  };
  return together('axial force with bending', '4.2.3.5', (t) => at(t, null), (t, steps) => { at(t, steps); });
}
