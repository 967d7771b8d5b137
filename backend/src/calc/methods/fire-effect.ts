import type { Actions, DesignBasis, Effects } from '@mantlet/common';
import { explain } from '../formula.js';
import type { WorkingStep } from '../formula.js';
import { accidentalCombinationFormula } from '../standards/en-1990/clause-6-4-3-3-accidental.js';
import { reductionFactorFormula } from '../standards/en-1993-1-2/clause-2-4-2-reduction-factor.js';

/** Actions given as effects rather than as the loads of a described beam. */
export type EffectActions = Exclude<Actions, { given: 'loads' }>;

/** Design effects in fire, in N and N·mm, none below 0. Compression and tension may both occur in different combinations. */
export interface FireEffect {
  compressionN: number;
  tensionN: number;
  momentYNmm: number;
  momentZNmm: number;
  shearZN: number;
}

const names: Record<keyof Effects, { what: string; unit: string }> = {
  axialKn: { what: 'axial force', unit: 'kN' },
  momentYKnm: { what: 'bending moment about y', unit: 'kNm' },
  momentZKnm: { what: 'bending moment about z', unit: 'kNm' },
  shearZKn: { what: 'shear force', unit: 'kN' },
};

/** Largest and smallest value of one effect over the combinations with and without each variable action. */
function envelope(actions: Extract<Actions, { given: 'characteristic' }>, design: DesignBasis, key: keyof Effects, working: WorkingStep[] | null): [number, number] {
  const permanent = actions.permanent[key];
  const { leading } = actions;
  const first = leading ? design.psi[leading.category][design.psiFi] * leading[key] : 0;
  const others = actions.accompanying.map((a) => design.psi[a.category].psi2 * a[key]);
  const bound = (pick: (value: number) => number): number => {
    const input = { permanent, leading: pick(first), accompanying: others.reduce((sum, value) => sum + pick(value), 0) };
    return accidentalCombinationFormula.evaluate(input);
  };
  const greatest = bound((v) => Math.max(v, 0));
  const least = bound((v) => Math.min(v, 0));
  if (working && (greatest !== 0 || least !== 0)) {
    const pick = Math.abs(greatest) >= Math.abs(least) ? (v: number) => Math.max(v, 0) : (v: number) => Math.min(v, 0);
    const { step } = explain(accidentalCombinationFormula, {
      permanent, leading: pick(first), accompanying: others.reduce((sum, value) => sum + pick(value), 0),
    });
    const { what, unit } = names[key];
    working.push({ ...step, what: `${step.what}: ${what}`, unit, inputs: step.inputs.map((i) => ({ ...i, unit })) });
  }
  return [greatest, least];
}

/**
 * Combines characteristic effects for fire by EN 1990 6.4.3.3 with the project's ψ, or takes the effect as given.
 * A variable action that acts favourably is left out, per effect.
 */
export function fireEffect(actions: EffectActions, design: DesignBasis, working: WorkingStep[] | null = null): FireEffect {
  if (actions.given === 'fire-effect') {
    const { axialKn, momentYKnm, momentZKnm, shearZKn } = actions.effect;
    return { compressionN: Math.max(axialKn, 0) * 1e3, tensionN: Math.max(-axialKn, 0) * 1e3, momentYNmm: Math.abs(momentYKnm) * 1e6, momentZNmm: Math.abs(momentZKnm) * 1e6, shearZN: Math.abs(shearZKn) * 1e3 };
  }
  const [most, least] = envelope(actions, design, 'axialKn', working);
  const [momentMost, momentLeast] = envelope(actions, design, 'momentYKnm', working);
  const [momentZMost, momentZLeast] = envelope(actions, design, 'momentZKnm', working);
  const [shearMost, shearLeast] = envelope(actions, design, 'shearZKn', working);
  return {
    compressionN: Math.max(most, 0) * 1e3,
    tensionN: Math.max(-least, 0) * 1e3,
    momentYNmm: Math.max(Math.abs(momentMost), Math.abs(momentLeast)) * 1e6,
    momentZNmm: Math.max(Math.abs(momentZMost), Math.abs(momentZLeast)) * 1e6,
    shearZN: Math.max(Math.abs(shearMost), Math.abs(shearLeast)) * 1e3,
  };
}

/** η_fi from one permanent and one variable action, by the project's factors (EN 1993-1-2 2.4.2). */
export function reductionFactorEtaFi(permanent: number, variable: number, psiFi: number, design: DesignBasis): number {
  return reductionFactorFormula.evaluate({ permanent, variable, psiFi, gammaG: design.gammaG, gammaQ: design.gammaQ });
}
