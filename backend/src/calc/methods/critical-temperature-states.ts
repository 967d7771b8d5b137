import { message } from '@mantlet/common';
import type { MemberDesign } from '@mantlet/common';
import type { WorkingStep } from '../formula.js';
import { combinedSectionClass, explainedClass, sectionClass } from '../standards/en-1993-1-2/clause-4-2-2-classification.js';
import type { SectionClass } from '../standards/en-1993-1-1/table-5-2.js';
import type { CriticalTemperatureCase, Determined } from '../types.js';
import type { BeamDiagram } from './beam-analysis/beam-diagram.js';
import { isIndeterminate } from './beam-analysis/beam-types.js';
import { beamColumn, crossSection } from './critical-temperature-interaction.js';
import { lateralBuckling } from './critical-temperature-lateral.js';
import { bending, compression, shear, tension } from './critical-temperature-limit-states.js';
import type { CompressionState, LimitState, Material } from './critical-temperature-limit-states.js';
import { cannotTwist, refusal } from './critical-temperature-scope.js';
import { explainDemand, fireDemands } from './fire-demand.js';
import type { FireDemand } from './fire-demand.js';

type Working = WorkingStep[] | null;

/** The limit states of one combination of actions in fire. */
export interface LoadedMember {
  states: LimitState[];
  class4: boolean;
}

/** How far the member is from failing under one combination: first by its use cold, then by its temperature. */
function severity({ states }: LoadedMember): { cold: number; temperatureC: number } {
  const cold = Math.max(...states.map((state) => state.effect / state.resistance(20, false)));
  return { cold, temperatureC: cold > 1 ? 20 : Math.min(...states.map((state) => state.temperature(false))) };
}

const isWorse = (a: ReturnType<typeof severity>, b: ReturnType<typeof severity>): boolean => (a.cold > 1 || b.cold > 1 ? a.cold > b.cold : a.temperatureC < b.temperatureC);

/** The limit states under the combination that governs, or why they are not calculated. */
export function governingStates(c: CriticalTemperatureCase, design: MemberDesign, working: Working): Determined<LoadedMember> {
  const demands = fireDemands(design.actions, c.design, working);
  const acting = demands.filter(({ effect }) => Object.values(effect).some((value: number) => value > 0));
  if (!acting.length) return { ok: false, reason: message('assessment.no-actions', {}) };
  if (acting.length === 1) return statesOf(c, design, acting[0]!, working);
  let governing: { demand: FireDemand; severity: ReturnType<typeof severity> } | null = null;
  for (const demand of acting) {
    const loaded = statesOf(c, design, demand, null);
    if (!loaded.ok) return loaded;
    const own = severity(loaded.value);
    if (!governing || isWorse(own, governing.severity)) governing = { demand, severity: own };
  }
  return statesOf(c, design, governing!.demand, working);
}

function classFor(c: CriticalTemperatureCase, { effect }: FireDemand, working: Working): Determined<SectionClass | null> {
  const { compressionN, momentYNmm, momentZNmm } = effect;
  const bent = momentYNmm > 0 || momentZNmm > 0;
  if (!bent && compressionN === 0) return { ok: true, value: null };
  const fy = c.steel.yieldStrengthMPa;
  let found = sectionClass(c.shape, bent ? 'bending' : 'compression', fy);
  let words = bent ? 'bending' : 'compression';
  if (bent && compressionN > 0) {
    found = combinedSectionClass(c.shape, compressionN, c.properties.areaMm2, fy);
    words = 'bending with compression';
  }
  // bent about z, the walls that are webs about y lie wholly in compression; the web of an I lies at the neutral axis instead
  if (momentZNmm > 0 && c.shape.kind !== 'i') {
    found = sectionClass(c.shape, 'compression', fy);
    words = 'bending about z, classed as in compression';
  }
  if (found.ok) working?.push(...explainedClass(fy, found.value, words));
  return found;
}

function statesOf(c: CriticalTemperatureCase, design: MemberDesign, demand: FireDemand, working: Working): Determined<LoadedMember> {
  const { effect } = demand;
  const reason = refusal(c, design, effect);
  if (reason) return { ok: false, reason };
  if (working) explainDemand(demand, working);
  const found = classFor(c, demand, working);
  if (!found.ok) return found;
  const material: Material = { fy: c.steel.yieldStrengthMPa, gamma: c.design.gammaMFi };
  const plastic = (found.value ?? 3) <= 2;
  const moduli = {
    modulusYMm3: plastic ? c.properties.wplYMm3 : c.properties.welYMm3, modulusZMm3: plastic ? c.properties.wplZMm3 : c.properties.welZMm3,
  };
  const states: LimitState[] = [];
  if (effect.tensionN > 0) states.push(tension(c, effect.tensionN, material));
  let column: CompressionState | null = null;
  if (effect.compressionN > 0 && design.bucklingLengthYMm !== null && design.bucklingLengthZMm !== null) {
    column = compression(c, design.bucklingRule, { y: design.bucklingLengthYMm, z: design.bucklingLengthZMm }, effect.compressionN, material, working);
    states.push(column);
  }
  if (effect.momentYNmm > 0) states.push(bendingOf(c, design, demand, found.value ?? 3, material));
  // a top flange that is held along its length leaves the bottom one free where the moment hogs
  const mayTwist = effect.momentYNmm > 0 && !cannotTwist(c) && (design.lateralRestraint === 'at-points' || (demand.beam !== null && hogs(demand.beam.diagram)));
  const lateral = mayTwist ? lateralBuckling(c, design, demand, moduli.modulusYMm3, material) : null;
  if (lateral && !lateral.ok) return lateral;
  if (lateral?.value) states.push(lateral.value);
  const axial = effect.compressionN > 0 || effect.tensionN > 0;
  if (effect.momentZNmm > 0 || (axial && effect.momentYNmm > 0)) states.push(crossSection(c, { ...moduli, plastic }, demand, material));
  if (column && (effect.momentYNmm > 0 || effect.momentZNmm > 0)) {
    const { slendernessY, slendernessZ } = column;
    states.push(beamColumn(c, design, { ...moduli, plastic, slendernessY, slendernessZ, slendernessLt: lateral?.value?.slenderness ?? null }, demand, material));
  }
  if (effect.shearZN > 0) states.push(shear(c, effect.shearZN, material));
  return { ok: true, value: { states, class4: found.value === 4 } };
}

/** Whether the moment compresses the bottom flange anywhere. */
function hogs({ pointsMm, momentAt }: BeamDiagram): boolean {
  const moments = pointsMm.map(momentAt);
  return Math.min(...moments) < -1e-9 * Math.max(...moments.map(Math.abs));
}

/** Bending of a described beam is checked place by place, each with its own shear; of effects alone, the greatest moment beside the greatest shear. */
function bendingOf(c: CriticalTemperatureCase, design: MemberDesign, { effect, beam }: FireDemand, sectionClassFound: SectionClass, material: Material): LimitState {
  if (!beam) return bending(c, design.continuousBeam, effect, sectionClassFound, material);
  const { supports } = beam.described;
  const builtIn = (xMm: number) => isIndeterminate(supports) && (xMm === 0 || (supports === 'fixed' && xMm === beam.diagram.spanMm));
  const states = placesOf(beam.diagram).map(({ xMm, momentNmm, shearN }) =>
    bending(c, builtIn(xMm), { ...effect, momentYNmm: Math.abs(momentNmm), shearZN: Math.abs(shearN) }, sectionClassFound, material));
  return states.filter((state) => state.effect > 0).reduce((worst, state) => {
    const [a, b] = [worst, state].map((one) => severity({ states: [one], class4: false })) as [ReturnType<typeof severity>, ReturnType<typeof severity>];
    return isWorse(b, a) ? state : worst;
  });
}

/** Where the diagram turns, and between, so that moment beside shear is not missed; both sides of a force. */
function placesOf(diagram: BeamDiagram): { xMm: number; momentNmm: number; shearN: number }[] {
  const { pointsMm, momentAt, shearAt, spanMm } = diagram;
  const eps = spanMm * 1e-9;
  const between = pointsMm.slice(1).flatMap((end, i) => [0.25, 0.5, 0.75].map((share) => pointsMm[i]! + share * (end - pointsMm[i]!)));
  return [...pointsMm, ...between].flatMap((xMm) => [Math.max(xMm - eps, 0), Math.min(xMm, spanMm - eps)].map((side) => ({ xMm, momentNmm: momentAt(xMm), shearN: shearAt(side) })));
}
