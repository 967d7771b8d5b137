import { z } from 'zod';
import { codeSchema, idSchema, nameSchema, versionSchema } from './primitives.js';
import { fireCurveSchema, periodSchema } from './fire.js';
import { memberTypes } from './actions.js';
import { targetPolicySchema } from './settings.js';

export const environments = ['C1', 'C2', 'C3', 'C4', 'C5', 'CX'] as const;

/** What the fire engineer decides of a zone. */
export const zoneInputSchema = z.object({
  levelId: idSchema,
  code: codeSchema,
  name: nameSchema,
  periodMin: periodSchema,
  curve: fireCurveSchema,
  reference: z.string().trim().max(500).default(''),
});
export type ZoneInput = z.infer<typeof zoneInputSchema>;
export const zoneUpdateSchema = zoneInputSchema.extend({ version: versionSchema });
export type ZoneUpdate = z.infer<typeof zoneUpdateSchema>;

/** What the specifier decides of a zone: environment (ISO 12944-2), target policy and a system by member type. */
export const zoneProtectionSchema = z.object({
  environment: z.enum(environments),
  targetPolicy: targetPolicySchema,
  systems: z.array(z.object({ memberType: z.enum(memberTypes), productId: idSchema.nullable() })).max(memberTypes.length),
  version: versionSchema,
});
export type ZoneProtection = z.infer<typeof zoneProtectionSchema>;
