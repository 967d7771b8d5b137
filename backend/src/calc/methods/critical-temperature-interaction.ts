import type { MemberDesign, MomentShape } from '@mantlet/common';
import { explain } from '../formula.js';
import type { Formula, WorkingStep } from '../formula.js';
import {
  biaxialExponents, elasticCrossSectionFormula, plasticCrossSectionFormula, reducedMoments,
} from '../standards/en-1993-1-1/clause-6-2-9-bending-and-axial.js';
import { bucklingShare } from '../standards/en-1993-1-2/clause-4-2-3-2-compression.js';
import {
  amplificationFormula, equivalentMoment, interactionClause, interactionFormula, lateralAmplificationFormula, muLtFormula, muYFormula, muZFormula,
} from '../standards/en-1993-1-2/clause-4-2-3-5-beam-columns.js';
import { STRENGTH_ENDS_C, kE, kY, table31Rows } from '../standards/en-1993-1-2/table-3-1.js';
import type { CriticalTemperatureCase } from '../types.js';
import { shearLoss, shearReductionFormula } from '../standards/en-1993-1-2/clause-4-2-3-3-bending.js';
import { beamDiagram, greatestMoment } from './beam-analysis/beam-diagram.js';
import { shearedModulus, tableStep } from './critical-temperature-limit-states.js';
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

/** The share that is used when every effect is raised by one factor, at one temperature. */
type Share = (temperatureC: number, factor: number) => number;

/** How many times the effects are carried together; `greatest` is a factor at which the share is above 1. */
function timesCarried(shareAt: (factor: number) => number, greatest: number): number {
  let low = 0;
  let high = greatest;
  for (let i = 0; i < 40; i += 1) {
    const middle = (low + high) / 2;
    if (shareAt(middle) <= 1) low = middle;
    else high = middle;
  }
  return low;
}

/** A check of several effects together: 1 on the one side, how many times they are carried on the other. */
function together(
  name: LimitState['name'], clause: string, shareAt: Share, greatestAt: (temperatureC: number) => number, explainAt: LimitState['explainAt'],
): LimitState {
  return {
    name, clause, unit: '', effect: 1,
    resistance: (t) => (kY(t) > 0 ? timesCarried((factor) => shareAt(t, factor), greatestAt(t)) : 0),
    temperature: () => temperatureOfShare((t) => (kY(t) > 0 ? shareAt(t, 1) : Infinity)),
    explainAt: (t, steps) => {
      steps.push(tableStep('k_y,θ', t, kY(t)));
      if (kY(t) > 0) explainAt(t, steps);
    },
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
function sharesAt(c: CriticalTemperatureCase, input: Pick<InteractionInput, 'modulusYMm3' | 'modulusZMm3'>, { effect }: FireDemand, { fy, gamma }: Material, temperatureC: number, factor: number) {
  const strength = (kY(temperatureC) * fy) / gamma / factor;
  const axial = Math.max(effect.compressionN, effect.tensionN);
  return {
    n: axial / (c.properties.areaMm2 * strength), my: effect.momentYNmm / (input.modulusYMm3 * strength), mz: effect.momentZNmm / (input.modulusZMm3 * strength),
  };
}

/**
 * EN 1993-1-1 6.2.9 with the strength at temperature: any place of the member, ends included. Beside high shear (6.2.10) what carries the
 * shear is worth 1 − ρ to the rest.
 */
export function crossSection(c: CriticalTemperatureCase, input: Pick<InteractionInput, 'modulusYMm3' | 'modulusZMm3' | 'plastic'>, demand: FireDemand, material: Material): LimitState {
  const { areaMm2, shearAreaZMm2 } = c.properties;
  const sheared = shearedModulus(c, input.modulusYMm3, input.plastic) / input.modulusYMm3;
  const shearCold = (shearAreaZMm2 * material.fy) / (Math.sqrt(3) * material.gamma);
  const at = (t: number, factor: number, steps: WorkingStep[] | null): number => {
    let { n, my, mz } = sharesAt(c, input, demand, material, t, factor);
    const shear = { shearN: factor * demand.effect.shearZN, shearResistanceN: kY(t) * shearCold };
    const rho = shearLoss(shear.shearN, shear.shearResistanceN);
    if (rho > 0) {
      steps?.push(explain(shearReductionFormula, shear).step);
      // the web of an I adds nothing to its bending about z
      const left = { n: 1 - (rho * shearAreaZMm2) / areaMm2, y: 1 - rho * sheared, z: c.shape.kind === 'i' ? 1 : 1 - rho };
      [n, my, mz] = [n / left.n, spent(my, left.y), spent(mz, left.z)];
    }
    if (!input.plastic) return run(elasticCrossSectionFormula, { n, my, mz }, steps);
    const left = reducedMoments(c.shape, c.properties, n);
    const exponents = my > 0 && mz > 0 ? biaxialExponents(c.shape, n) : { alpha: 1, beta: 1 };
    return run(plasticCrossSectionFormula, { my, mz, leftY: left.y, leftZ: left.z, ...exponents }, steps);
  };
  return together(
    'cross-section', input.plastic ? '4.2.3.3 with EN 1993-1-1 6.2.9.1' : '4.2.3.4 with EN 1993-1-1 6.2.9.2', (t, factor) => at(t, factor, null),
    // a moment or a force beyond its own resistance is too much whatever stands beside it
    (t) => { const { n, my, mz } = sharesAt(c, input, demand, material, t, 1); return 1.001 / Math.max(n, my, mz); },
    (t, steps) => { at(t, 1, steps); },
  );
}

/** A share of a resistance of which only a part is left. */
const spent = (share: number, left: number): number => (share === 0 ? 0 : share / Math.max(left, 0));

/** A formula's value, with its line of working where one is kept. */
function run<I extends object>(formula: Formula<I>, input: I, steps: WorkingStep[] | null, own: Partial<WorkingStep> = {}): number {
  if (!steps) return formula.evaluate(input);
  const { value, step } = explain(formula, input);
  steps.push({ ...step, ...own });
  return value;
}

/** β_M of a diagram that is said by its shape. */
function betaOf(shape: MomentShape): number {
  return shape.kind === 'end-moments' ? equivalentMoment.endMoments(shape.ratio) : equivalentMoment[shape.kind];
}

/**
 * β_M,y of a described beam: its loads between its end moments (Figure 4.2, last line), with the lesser β of a distributed load. The
 * figure is for members held at both ends; a cantilever counts as under uniform moment, which is the safe side.
 */
function betaOfBeam({ described, diagram, loads }: NonNullable<FireDemand['beam']>): number {
  if (described.supports === 'cantilever') return equivalentMoment.endMoments(1);
  const l = diagram.spanMm;
  const [a, b] = [diagram.momentAt(0), diagram.momentAt(l)];
  const [small, large] = Math.abs(a) < Math.abs(b) ? [a, b] : [b, a];
  const byEnds = equivalentMoment.endMoments(large === 0 ? 1 : small / large);
  const values = diagram.pointsMm.map((x) => diagram.momentAt(x));
  const swing = Math.max(...values, 0) - Math.min(...values, 0);
  // the loads' own moments, as if the ends were hinged
  const byLoads = Math.abs(greatestMoment(beamDiagram({ supports: 'simple', spanMm: l, loads })).momentNmm);
  return swing === 0 ? byEnds : byEnds + Math.min(byLoads / swing, 1) * (equivalentMoment.distributed - byEnds);
}

/** EN 1993-1-2 4.2.3.5: compression with bending, both expressions; the second only where the member may buckle sideways. */
export function beamColumn(c: CriticalTemperatureCase, design: MemberDesign, input: InteractionInput, demand: FireDemand, material: Material): LimitState {
  const imperfection = 0.65 * Math.sqrt(235 / material.fy);
  const beta = {
    y: demand.beam ? betaOfBeam(demand.beam) : betaOf(design.momentShapeY), z: betaOf(design.momentShapeZ),
    // a described beam's segment: as under uniform moment, which gives the greatest k_LT
    lt: demand.beam ? equivalentMoment.endMoments(1) : betaOf(design.momentShapeY),
  };
  const at = (t: number, factor: number, steps: WorkingStep[] | null): number => {
    const ky = kY(t);
    const ke = kE(t);
    const growth = Math.sqrt(ky / ke);
    const chi = (slenderness: number) => bucklingShare(t, slenderness, imperfection) / ky;
    const { n, my, mz } = sharesAt(c, input, demand, material, t, factor);
    const [ny, nz] = [n / chi(input.slendernessY), n / chi(input.slendernessZ)];
    steps?.push(tableStep('k_E,θ', t, ke));
    const about = (axis: 'y' | 'z', share: number, axialShare: number): number => {
      const own = share > 0 ? steps : null;
      const slenderness = growth * (axis === 'y' ? input.slendernessY : input.slendernessZ);
      const mu = run(axis === 'y' ? muYFormula : muZFormula, { beta: beta[axis], slenderness }, own);
      return run(amplificationFormula, { mu, axialShare }, own, { what: `Interaction factor about ${axis}`, equation: `k_${axis} = min(1 − μ_${axis}·n_${axis} ; 3)` });
    };
    const [factorY, factorZ] = [about('y', my, ny), about('z', mz, nz)];
    const first = run(interactionFormula, { axialShare: Math.max(ny, nz), factorY, shareY: my, factorZ, shareZ: mz }, steps, { what: 'Axial force with bending, buckling about either axis', source: interactionClause(input.plastic, false) });
    if (input.slendernessLt === null) return first;
    const mu = run(muLtFormula, { beta: beta.lt, slenderness: input.slendernessZ * growth }, steps);
    const factorLt = run(lateralAmplificationFormula, { mu, axialShare: nz }, steps);
    const shareLt = my / chi(input.slendernessLt);
    return Math.max(first, run(interactionFormula, { axialShare: nz, factorY: factorLt, shareY: shareLt, factorZ, shareZ: mz }, steps, { what: 'Axial force with bending, lateral-torsional buckling', source: interactionClause(input.plastic, true) }));
  };
  const greatestAt = (t: number): number => {
    const { n } = sharesAt(c, input, demand, material, t, 1);
    const slenderness = Math.max(input.slendernessY, input.slendernessZ);
    return (1.001 * bucklingShare(t, slenderness, imperfection)) / kY(t) / n;
  };
  return together('axial force with bending', '4.2.3.5', (t, factor) => at(t, factor, null), greatestAt, (t, steps) => { at(t, 1, steps); });
}
