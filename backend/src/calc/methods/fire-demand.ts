import type { DescribedBeam, DesignBasis, MemberDesign } from '@mantlet/common';
import type { WorkingStep } from '../formula.js';
import { beamDiagram, greatestMoment, greatestShear } from './beam-analysis/beam-diagram.js';
import type { BeamDiagram } from './beam-analysis/beam-diagram.js';
import type { BeamLoad } from './beam-analysis/beam-types.js';
import { fireEffect } from './fire-effect.js';
import type { FireEffect } from './fire-effect.js';

type VariableAction = Exclude<DescribedBeam['loads'][number]['action'], 'permanent'>;

/** One combination of actions in fire: its effects and, of a described beam, the diagram they were read from. */
export interface FireDemand {
  effect: FireEffect;
  beam: { described: DescribedBeam; diagram: BeamDiagram; loads: BeamLoad[]; factors: [VariableAction, number][] } | null;
}

function subsets<T>(items: readonly T[]): T[][] {
  return items.reduce<T[][]>((all, item) => [...all, ...all.map((one) => [...one, item])], [[]]);
}

/** Which variable actions act, and by which ψ: every choice of those present, each in turn as the leading one (EN 1990 6.4.3.3). */
function combinations(categories: readonly VariableAction[], { psi, psiFi }: DesignBasis): [VariableAction, number][][] {
  return subsets(categories).flatMap((present) => {
    if (!present.length) return [[]];
    const leading = psiFi === 'psi2' ? present.slice(0, 1) : present;
    return leading.map((first) => present.map((one): [VariableAction, number] => [one, one === first ? psi[one][psiFi] : psi[one].psi2]));
  });
}

function combinedLoads(beam: DescribedBeam, factors: readonly [VariableAction, number][]): BeamLoad[] {
  const factorOf = (action: VariableAction | 'permanent') => (action === 'permanent' ? 1 : (factors.find(([one]) => one === action)?.[1] ?? 0));
  return beam.loads.flatMap((load): BeamLoad[] => {
    const factor = factorOf(load.action);
    if (factor === 0) return [];
    return load.kind === 'point'
      ? [{ kind: 'point', atMm: load.atMm, forceN: load.forceKn * 1e3 * factor }]
      // 1 kN/m is 1 N/mm
      : [{ kind: 'distributed', fromMm: load.fromMm, toMm: load.toMm, startNPerMm: load.startKnPerM * factor, endNPerMm: load.endKnPerM * factor }];
  });
}

function ofBeam(beam: DescribedBeam, factors: [VariableAction, number][]): FireDemand {
  const loads = combinedLoads(beam, factors);
  const diagram = beamDiagram({ supports: beam.supports, spanMm: beam.spanMm, loads });
  const axial = beam.axialInFireKn * 1e3;
  return {
    effect: {
      compressionN: Math.max(axial, 0), tensionN: Math.max(-axial, 0), momentZNmm: 0,
      momentYNmm: Math.abs(greatestMoment(diagram).momentNmm), shearZN: greatestShear(diagram),
    },
    beam: { described: beam, diagram, loads, factors },
  };
}

/** What the member must carry in fire: one combination from effects that are given, every one that counts from described loads. */
export function fireDemands(actions: MemberDesign['actions'], design: DesignBasis, working: WorkingStep[] | null): FireDemand[] {
  if (actions.given !== 'loads') return [{ effect: fireEffect(actions, design, working), beam: null }];
  const categories = [...new Set(actions.loads.map((load) => load.action))].filter((one): one is VariableAction => one !== 'permanent');
  return combinations(categories, design).map((factors) => ofBeam(actions, factors));
}

/** The lines of working that say how a described beam's moment and shear came about. */
export function explainDemand({ beam, effect }: FireDemand, working: WorkingStep[]): void {
  if (!beam) return;
  const { diagram, factors } = beam;
  const most = greatestMoment(diagram);
  working.push({
    what: 'Loads in fire', equation: factors.length ? 'ΣG_k + ψ_fi·Q_k,1 + Σψ_2·Q_k,i' : 'ΣG_k: no variable action makes it worse',
    inputs: factors.map(([category, psi]) => ({ symbol: `ψ (${category})`, value: psi, unit: '' })), value: null, unit: '', source: 'EN 1990:2002 6.4.3.3',
  }, {
    what: 'Greatest bending moment', equation: 'M(x) by equilibrium, and the fixed-end moments where built in',
    inputs: [{ symbol: 'L', value: diagram.spanMm, unit: 'mm' }, { symbol: 'x', value: most.atMm, unit: 'mm' }],
    value: most.momentNmm / 1e6, unit: 'kNm', source: 'elastic beam theory, EN 1993-1-1:2005 5.4.2', note: 'sagging positive',
  });
  if (effect.shearZN > 0) {
    working.push({ what: 'Greatest shear force', equation: 'V = dM/dx', inputs: [], value: effect.shearZN / 1e3, unit: 'kN', source: 'elastic beam theory, EN 1993-1-1:2005 5.4.2' });
  }
}
