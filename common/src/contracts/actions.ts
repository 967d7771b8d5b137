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
  /** about the weak axis */
  momentZKnm: force.default(0),
  shearZKn: force.default(0),
});
export type Effects = z.infer<typeof effectsSchema>;
export const variableEffectsSchema = effectsSchema.extend({ category: z.enum(actionCategories) });

/** A beam described by its supports and loads; the moment diagram is worked out from it. A cantilever is built in at x = 0. */
export const beamSupports = ['simple', 'propped', 'fixed', 'cantilever'] as const;
export type BeamSupport = (typeof beamSupports)[number];
export const beamSupportNames: Record<BeamSupport, string> = {
  simple: 'Simply supported', propped: 'Built in at the left, simply supported at the right', fixed: 'Built in at both ends', cantilever: 'Cantilever, built in at the left',
};
const place = nonNegativeSchema.max(100_000, 'is more than 100 m');
const loadAction = z.enum(['permanent', ...actionCategories]);
/** Characteristic loads, downward positive, at places measured from the left support. */
export const beamLoadSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('point'), action: loadAction, atMm: place, forceKn: force }),
  z.object({ kind: z.literal('distributed'), action: loadAction, fromMm: place, toMm: place, startKnPerM: force, endKnPerM: force }),
]);
export type BeamLoadInput = z.infer<typeof beamLoadSchema>;

export const describedBeamSchema = z.object({
  given: z.literal('loads'),
  supports: z.enum(beamSupports),
  spanMm: positiveSchema.min(100, 'is less than 100 mm; spans are in mm').max(100_000, 'is more than 100 m'),
  loads: z.array(beamLoadSchema).min(1, 'name at least one load').max(50, 'more than 50 loads'),
  /** between the supports, which hold the beam sideways and against twist themselves; a cantilever's tip only where named here */
  lateralSupportsMm: z.array(place).max(50, 'more than 50 lateral supports').default([]),
  /** axial force in fire beside the loads, already combined; compression positive */
  axialInFireKn: force.default(0),
}).superRefine((beam, context) => {
  const outside = (path: (string | number)[], value: number) => {
    if (value > beam.spanMm) context.addIssue({ code: 'custom', path, message: `is beyond the span of ${beam.spanMm} mm` });
  };
  beam.loads.forEach((load, i) => {
    if (load.kind === 'point') return outside(['loads', i, 'atMm'], load.atMm);
    outside(['loads', i, 'toMm'], load.toMm);
    if (load.toMm <= load.fromMm) context.addIssue({ code: 'custom', path: ['loads', i, 'toMm'], message: 'must lie beyond where the load begins' });
  });
  beam.lateralSupportsMm.forEach((at, i) => outside(['lateralSupportsMm', i], at));
  const categories = new Set(beam.loads.map((load) => load.action));
  categories.delete('permanent');
  if (categories.size > 4) context.addIssue({ code: 'custom', path: ['loads'], message: 'at most four categories of variable action on one beam' });
});
export type DescribedBeam = z.infer<typeof describedBeamSchema>;

/**
 * The characteristic effects, combined by EN 1990 6.4.3.3 with the project's ψ; the fire effect itself; or the beam with its loads,
 * from which moments and shears are worked out.
 */
export const actionsSchema = z.discriminatedUnion('given', [
  z.object({
    given: z.literal('characteristic'),
    permanent: effectsSchema,
    leading: variableEffectsSchema.nullable(),
    accompanying: z.array(variableEffectsSchema).max(10).default([]),
  }),
  z.object({ given: z.literal('fire-effect'), effect: effectsSchema }),
  describedBeamSchema,
]);
export type Actions = z.infer<typeof actionsSchema>;

/** The shape of the moment diagram between restraints, where only effects are given. Ratio: the smaller end moment over the greater, negative in double curvature. */
export const momentShapeSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('end-moments'), ratio: numberSchema.min(-1).max(1) }),
  z.object({ kind: z.literal('distributed') }),
  z.object({ kind: z.literal('point') }),
]);
export type MomentShape = z.infer<typeof momentShapeSchema>;
export const momentShapeNames: Record<MomentShape['kind'], string> = {
  'end-moments': 'By end moments', distributed: 'Distributed load', point: 'Force at mid-span',
};
/** where loads take hold: above the shear centre they help the beam to buckle */
export const loadHeights = ['top-flange', 'shear-centre', 'bottom-flange'] as const;
export type LoadHeight = (typeof loadHeights)[number];
export const loadHeightNames: Record<LoadHeight, string> = { 'top-flange': 'Top flange', 'shear-centre': 'Shear centre', 'bottom-flange': 'Bottom flange' };

/** Braced-storey buckling lengths of EN 1993-1-2 4.2.3.2(5) count only when the engineer confirms that they apply. */
export const bucklingRules = ['given', 'braced-intermediate', 'braced-top'] as const;
export const memberDesignSchema = z.object({
  actions: actionsSchema,
  /** system length between restraints, per axis, in mm */
  bucklingLengthYMm: positiveSchema.max(100_000).nullable().default(null),
  bucklingLengthZMm: positiveSchema.max(100_000).nullable().default(null),
  bucklingRule: z.enum(bucklingRules).default('given'),
  /**
   * How a bent member is held sideways: along its length or at points; null where it is not said. Of a described beam it is the top flange
   * that is held along its length, so that a hogging moment is checked all the same; of effects alone, the compression flange.
   */
  lateralRestraint: z.enum(['continuous', 'at-points']).nullable().default(null),
  /** distance between the points that hold the compression flange, where the loads are not described, in mm */
  lateralSpacingMm: positiveSchema.max(100_000).nullable().default(null),
  /** uniform unless said otherwise, which is the safe side */
  momentShapeY: momentShapeSchema.default({ kind: 'end-moments', ratio: 1 }),
  momentShapeZ: momentShapeSchema.default({ kind: 'end-moments', ratio: 1 }),
  /** the top flange unless said otherwise, which is the safe side for loads that act downward; no help is counted from upward ones there */
  loadHeight: z.enum(loadHeights).default('top-flange'),
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
