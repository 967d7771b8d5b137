import { z } from 'zod';
import { nonNegativeSchema, numberSchema, positiveSchema } from './primitives.js';

/** Imposed-load categories of EN 1990 Table A1.1, and the climatic actions. */
export const actionCategories = ['A', 'B', 'C', 'D', 'E', 'F', 'G', 'H', 'snow-below-1000', 'snow-above-1000', 'wind'] as const;
export type ActionCategory = (typeof actionCategories)[number];
export const actionCategoryNames: Record<ActionCategory, string> = {
  A: 'A domestic', B: 'B office', C: 'C congregation', D: 'D shopping', E: 'E storage', F: 'F traffic to 30 kN',
  G: 'G traffic above 30 kN', H: 'H roof', 'snow-below-1000': 'Snow, to 1000 m', 'snow-above-1000': 'Snow, above 1000 m', wind: 'Wind',
};

const force = numberSchema.min(-1e6).max(1e6);
/** Characteristic effects of one action on the member. Compression positive. */
export const effectsSchema = z.object({
  axialKn: force.default(0),
  momentYKnm: force.default(0),
  shearZKn: force.default(0),
});
export type Effects = z.infer<typeof effectsSchema>;
export const variableEffectsSchema = effectsSchema.extend({ category: z.enum(actionCategories) });

/** Either the characteristic actions, combined by EN 1990 6.4.3.3 with the project's ψ, or the fire effect itself. */
export const actionsSchema = z.discriminatedUnion('given', [
  z.object({
    given: z.literal('characteristic'),
    permanent: effectsSchema,
    leading: variableEffectsSchema.nullable(),
    accompanying: z.array(variableEffectsSchema).max(10).default([]),
  }),
  z.object({ given: z.literal('fire-effect'), effect: effectsSchema }),
]);
export type Actions = z.infer<typeof actionsSchema>;

/** Braced-storey buckling lengths of EN 1993-1-2 4.2.3.2(5) count only when the engineer confirms that they apply. */
export const bucklingRules = ['given', 'braced-intermediate', 'braced-top'] as const;
export const memberDesignSchema = z.object({
  actions: actionsSchema,
  /** system length between restraints, per axis, in mm */
  bucklingLengthYMm: positiveSchema.max(100_000).nullable().default(null),
  bucklingLengthZMm: positiveSchema.max(100_000).nullable().default(null),
  bucklingRule: z.enum(bucklingRules).default('given'),
  lateralRestraint: z.enum(['continuous', 'at-points']).default('continuous'),
  /** over the supports of a statically indeterminate beam: κ2 = 0.85 */
  continuousBeam: z.boolean().default(false),
  /** net area at holes is not needed in fire where filled with bolts (4.2.3.1(2)); acts as a reminder only */
  composite: z.boolean().default(false),
  webOpenings: z.boolean().default(false),
});
export type MemberDesign = z.infer<typeof memberDesignSchema>;

const temperature = z.number({ error: 'must be a temperature in °C' }).min(100, 'is below 100 °C').max(1200, 'is above 1200 °C');
const reference = z.string().trim().min(1, 'say where the value comes from').max(500);
/** of a beam: lateral-torsional or shear buckling may govern. Absent: held against both. Columns and bracing always count as able to buckle. */
const mayBuckle = z.boolean().optional();
/** The five ways a critical temperature may enter. Each is stored with who, when and its reference. */
export const criticalTemperatureBasisSchema = z.discriminatedUnion('way', [
  z.object({ way: z.literal('declared'), temperatureC: temperature, reference }),
  /** degree of utilisation μ0 = E_fi,d / R_fi,d,0 */
  z.object({ way: z.literal('utilisation'), mu0: positiveSchema.max(10), mayBuckle, reference }),
  /** ambient utilisation E_d / R_d, times η_fi (the project's unless given here) */
  z.object({ way: z.literal('ambient-utilisation'), utilisation: positiveSchema.max(10), etaFi: positiveSchema.max(1).nullable().default(null), mayBuckle, reference }),
  z.object({ way: z.literal('calculated'), design: memberDesignSchema, reference }),
  /** the project's default for the member's type: assumed until accepted */
  z.object({ way: z.literal('assumed') }),
  z.object({ way: z.literal('none') }),
]);
export type CriticalTemperatureBasis = z.infer<typeof criticalTemperatureBasisSchema>;
export const criticalTemperatureWays = ['declared', 'utilisation', 'ambient-utilisation', 'calculated', 'assumed', 'none'] as const satisfies readonly CriticalTemperatureBasis['way'][];
export type CriticalTemperatureWay = CriticalTemperatureBasis['way'];

export const wayNames: Record<CriticalTemperatureWay, string> = {
  declared: 'Declared', utilisation: 'From utilisation in fire', 'ambient-utilisation': 'From utilisation cold',
  calculated: 'Calculated from actions', assumed: 'Assumed by member type', none: 'Not given',
};

export const memberTypes = ['beam', 'secondary-beam', 'column', 'bracing', 'tie'] as const;
export type MemberType = (typeof memberTypes)[number];
export const memberTypeNames: Record<MemberType, string> = {
  beam: 'Beam', 'secondary-beam': 'Secondary beam', column: 'Column', bracing: 'Bracing', tie: 'Tie or hanger',
};

/** Yield strength by EN 1993-1-1 Table 3.1 and product standards; a project may name its own grades. */
export const steelGrades = ['S235', 'S275', 'S355', 'S420', 'S460', 'A36', 'A992', 'A500C'] as const;
export type SteelGrade = (typeof steelGrades)[number];

const partial = nonNegativeSchema.max(3);
const psiSchema = z.object({ psi1: partial, psi2: partial });
/** Every factor of the design basis is a stored, visible setting of the project. */
export const designBasisSchema = z.object({
  standard: z.literal('EN').default('EN'),
  gammaG: partial.default(1.35),
  gammaQ: partial.default(1.5),
  gammaMFi: positiveSchema.max(2).default(1),
  /** ψ_fi of the leading variable action: ψ_1 or ψ_2 by national choice */
  psiFi: z.enum(['psi1', 'psi2']).default('psi1'),
  psi: z.record(z.enum(actionCategories), psiSchema),
  /** used where η_fi is not worked out (EN 1993-1-2 2.4.2) */
  etaFi: positiveSchema.max(1).default(0.65),
  /** how μ0 becomes a temperature: equation (4.22), or the inversion of k_y from Table 3.1 */
  utilisationMethod: z.enum(['equation-4.22', 'inversion-of-ky']).default('equation-4.22'),
  class4TemperatureC: temperature.default(350),
  assumedTemperatureC: z.record(z.enum(memberTypes), temperature),
  /** above this, a second signature is asked for */
  secondSignatureAboveC: temperature.default(650),
  emissivitySteel: positiveSchema.max(1).default(0.7),
  /** shadow effect for bare I sections (EN 1993-1-2 4.2.5.1) */
  shadowEffect: z.boolean().default(true),
});
export type DesignBasis = z.infer<typeof designBasisSchema>;

export const defaultDesignBasis: DesignBasis = designBasisSchema.parse({
  psi: {
    A: { psi1: 0.5, psi2: 0.3 }, B: { psi1: 0.5, psi2: 0.3 }, C: { psi1: 0.7, psi2: 0.6 }, D: { psi1: 0.7, psi2: 0.6 },
    E: { psi1: 0.9, psi2: 0.8 }, F: { psi1: 0.7, psi2: 0.6 }, G: { psi1: 0.5, psi2: 0.3 }, H: { psi1: 0, psi2: 0 },
    'snow-below-1000': { psi1: 0.2, psi2: 0 }, 'snow-above-1000': { psi1: 0.5, psi2: 0.2 }, wind: { psi1: 0.2, psi2: 0 },
  },
  // common practice: columns 550 °C, beams under a slab 620 °C
  assumedTemperatureC: { beam: 620, 'secondary-beam': 620, column: 550, bracing: 550, tie: 550 },
});
