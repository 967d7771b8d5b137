import { z } from 'zod';
import { codeSchema, idSchema, nameSchema, versionSchema } from './primitives.js';
import { fireCurveSchema, periodSchema } from './fire.js';
import { memberTypes } from './actions.js';
import type { MemberType } from './actions.js';
import { targetPolicySchema } from './settings.js';
import type { TargetPolicy } from './settings.js';
import type { ProductKind } from './products.js';

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

export interface PolicyMaterialDto {
  policy: TargetPolicy['policy'];
  /** distinct applied thicknesses, rising */
  thicknesses: number[];
  /** litres of coating (practical), m² of board sheet (every layer counts), m³ of spray */
  material: number | null;
  materialUnit: 'L' | 'm²' | 'm³';
  /** protected area under the policy, m²: board girths grow with thickness */
  areaM2?: number;
  /** material in place, thickness × area, m³: what the bands keep least */
  volumeM3?: number;
}
/** The target protection level of one zone and system. */
export interface ZoneTargetDto {
  productId: string;
  productName: string;
  productKind: ProductKind;
  thicknessUnit: 'µm' | 'mm';
  members: number;
  areaM2: number;
  governing: { memberId: string; mark: string; requiredThickness: number } | null;
  lowestCriticalTemperatureC: number | null;
  highestSectionFactorPerM: number | null;
  policies: PolicyMaterialDto[];
}
export interface ZoneDto {
  id: string; levelId: string; code: string; name: string; periodMin: number; curve: z.infer<typeof fireCurveSchema>;
  reference: string; environment: (typeof environments)[number]; targetPolicy: TargetPolicy; version: number;
  systems: { memberType: MemberType; productId: string; productName: string; productKind: ProductKind }[];
  members: number; settled: number; open: number; protectedAreaM2: number;
  targets: ZoneTargetDto[];
}
