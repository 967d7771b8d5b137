import type { z } from 'zod';
import { memberStructuralSchema } from '@mantlet/common';
import type { ActionCategory, Actions, BeamLoadInput, BeamSupport, CriticalTemperatureBasis, CriticalTemperatureWay, Effects, MemberDesign, MemberStructural } from '@mantlet/common';

/**
 * All five ways side by side, so that trying another way loses nothing that was typed in the first.
 * The contract's schema keeps the fields of the chosen way and drops the rest.
 */
export interface StructuralValues {
  basis: {
    way: CriticalTemperatureWay;
    temperatureC: number | null;
    mu0: number | null;
    utilisation: number | null;
    etaFi: number | null;
    mayBuckle: boolean;
    reference: string;
    design: Omit<MemberDesign, 'actions'> & { actions: ActionsValues };
  };
}
export type VariableEffects = Effects & { category: ActionCategory };
type Nullable<T> = T extends unknown ? { [K in keyof T]: T[K] extends number ? number | null : T[K] } : never;
/** numbers are empty until they are typed */
export type BeamLoadValues = Nullable<BeamLoadInput>;
export interface ActionsValues {
  given: Actions['given']; permanent: Effects; leading: VariableEffects | null; accompanying: VariableEffects[]; effect: Effects;
  supports: BeamSupport; spanMm: number | null; loads: BeamLoadValues[]; lateralSupportsMm: (number | null)[]; axialInFireKn: number;
}

export type StructuralOut = Omit<MemberStructural, 'version'>;
export const structuralFormSchema = memberStructuralSchema.omit({ version: true }) as unknown as z.ZodType<StructuralOut, StructuralValues>;
export const noEffects: Effects = { axialKn: 0, momentYKnm: 0, momentZKnm: 0, shearZKn: 0 };

/** The load that a new line begins with. */
export const newLoad = (kind: BeamLoadInput['kind']): BeamLoadValues =>
  kind === 'point' ? { kind, action: 'permanent', atMm: null, forceKn: null } : { kind, action: 'permanent', fromMm: 0, toMm: null, startKnPerM: null, endKnPerM: null };

function actionsValues(actions: Actions | null): ActionsValues {
  const blank: ActionsValues = {
    given: 'characteristic', permanent: noEffects, leading: null, accompanying: [], effect: noEffects,
    supports: 'simple', spanMm: null, loads: [newLoad('distributed')], lateralSupportsMm: [], axialInFireKn: 0,
  };
  return { ...blank, ...actions };
}

export function structuralValues(basis: CriticalTemperatureBasis): StructuralValues {
  const design = basis.way === 'calculated' ? basis.design : null;
  return {
    basis: {
      temperatureC: null, mu0: null, utilisation: null, etaFi: null, mayBuckle: false, reference: '', ...basis,
      design: {
        bucklingLengthYMm: null, bucklingLengthZMm: null, bucklingRule: 'given', lateralRestraint: null, lateralSpacingMm: null, momentShapeY: { kind: 'end-moments', ratio: 1 }, momentShapeZ: { kind: 'end-moments', ratio: 1 },
        loadHeight: 'top-flange', continuousBeam: false, composite: false, webOpenings: false,
        ...design, actions: actionsValues(design?.actions ?? null),
      },
    },
  };
}
