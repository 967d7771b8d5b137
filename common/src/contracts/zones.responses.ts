import { z } from 'zod';
import { memberTypes } from './actions.js';
import { fireCurveSchema } from './fire.js';
import { idSchema, thicknessUnits } from './primitives.js';
import { productKinds } from './products.js';
import { targetPolicies, targetPolicySchema } from './settings.js';
import { environments } from './zones.js';

export const policyMaterialDtoSchema = z.object({
  policy: z.enum(targetPolicies),
  /** distinct applied thicknesses, rising */
  thicknesses: z.array(z.number()),
  /** litres of coating (practical), m² of board sheet (every layer counts), m³ of spray */
  material: z.number().nullable(),
  materialUnit: z.enum(['L', 'm²', 'm³']),
  /** protected area under the policy, m²: board girths grow with thickness */
  areaM2: z.number().optional(),
  /** material in place, thickness × area, m³: what the bands keep least */
  volumeM3: z.number().optional(),
});
export type PolicyMaterialDto = z.infer<typeof policyMaterialDtoSchema>;
/** The target protection level of one zone and system. */
export const zoneTargetDtoSchema = z.object({
  productId: idSchema,
  productName: z.string(),
  productKind: z.enum(productKinds),
  thicknessUnit: z.enum(thicknessUnits),
  members: z.number(),
  areaM2: z.number(),
  governing: z.object({ memberId: idSchema, mark: z.string(), requiredThickness: z.number() }).nullable(),
  lowestCriticalTemperatureC: z.number().nullable(),
  highestSectionFactorPerM: z.number().nullable(),
  policies: z.array(policyMaterialDtoSchema),
});
export type ZoneTargetDto = z.infer<typeof zoneTargetDtoSchema>;
export const zoneDtoSchema = z.object({
  id: idSchema, levelId: idSchema, code: z.string(), name: z.string(), periodMin: z.number(), curve: fireCurveSchema,
  reference: z.string(), environment: z.enum(environments), targetPolicy: targetPolicySchema, version: z.number(),
  systems: z.array(z.object({ memberType: z.enum(memberTypes), productId: idSchema, productName: z.string(), productKind: z.enum(productKinds) })),
  members: z.number(), settled: z.number(), open: z.number(), protectedAreaM2: z.number(),
  /** members being recalculated: open until then, and nothing of them is in the area or the targets */
  unassessed: z.number(),
  targets: z.array(zoneTargetDtoSchema),
});
export type ZoneDto = z.infer<typeof zoneDtoSchema>;
