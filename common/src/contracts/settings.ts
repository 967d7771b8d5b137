import { z } from 'zod';
import { decimalSchema, nonNegativeSchema } from './primitives.js';
import { defaultDesignBasis, designBasisSchema } from './actions.js';

/** How thickness tables are read between their rows and columns. */
export const readingRulesSchema = z.object({
  sectionFactor: z.enum(['linear', 'next-row-up']).default('linear'),
  temperature: z.enum(['next-below', 'linear']).default('next-below'),
});
export type ReadingRules = z.infer<typeof readingRulesSchema>;

export const deductionSchema = z.object({
  /** share of net area taken off at each member end for connections, as a length in mm per end */
  endLapMm: nonNegativeSchema.max(2000).default(0),
  /** openings and gaps smaller than this are not deducted */
  openingThresholdM2: nonNegativeSchema.default(0.1),
  coatBackMm: nonNegativeSchema.max(5000).default(500),
});
export type Deductions = z.infer<typeof deductionSchema>;

export const projectSettingsSchema = z.object({
  designBasis: designBasisSchema.default(defaultDesignBasis),
  readingRules: readingRulesSchema.default({ sectionFactor: 'linear', temperature: 'next-below' }),
  deductions: deductionSchema.default({ endLapMm: 0, openingThresholdM2: 0.1, coatBackMm: 500 }),
  /** prices are shown to the contractor only if this is on */
  contractorSeesPrices: z.boolean().default(false),
  /** overheads and the like on top of the printed lines, in percent */
  markUpPercent: decimalSchema.default('0'),
  distribution: z.array(z.email()).max(100).default([]),
});
export type ProjectSettings = z.infer<typeof projectSettingsSchema>;
export const defaultProjectSettings: ProjectSettings = projectSettingsSchema.parse({});

export const targetPolicySchema = z.discriminatedUnion('policy', [
  z.object({ policy: z.literal('own') }),
  z.object({ policy: z.literal('bands'), bands: z.number().int().min(1).max(12) }),
  z.object({ policy: z.literal('one') }),
]);
export type TargetPolicy = z.infer<typeof targetPolicySchema>;
export const targetPolicies = ['own', 'bands', 'one'] as const satisfies readonly TargetPolicy['policy'][];
export const thicknessUnit = { coating: 'µm', board: 'mm', spray: 'mm' } as const;
