import { z } from 'zod';
import { criticalTemperatureBasisSchema } from './actions.js';
import { memberResultDtoSchema, workingStepDtoSchema } from './assessment.responses.js';
import { acceptanceKinds, memberInputSchema } from './members.js';
import { idSchema } from './primitives.js';
import { auditEntryDtoSchema } from './projects.responses.js';
import { sectionDtoSchema, sectionOutlineSchema } from './sections.responses.js';

export const acceptanceDtoSchema = z.object({
  kind: z.enum(acceptanceKinds), valueC: z.number().nullable(), reason: z.string(), by: z.string(), at: z.string(), stillHolds: z.boolean(),
});
export type AcceptanceDto = z.infer<typeof acceptanceDtoSchema>;

export const memberDtoSchema = memberInputSchema.extend({
  id: idSchema, version: z.number(),
  basis: criticalTemperatureBasisSchema, basisSetBy: z.string().nullable(), basisSetAt: z.string().nullable(),
  acceptances: z.array(acceptanceDtoSchema),
});
export type MemberDto = z.infer<typeof memberDtoSchema>;

const points = z.array(z.tuple([z.number(), z.number()]));
export interface ChartSeries { name: string; points: z.infer<typeof points> }
export const memberChartsDtoSchema = z.object({
  /** resistance against steel temperature, one series a limit state; effect in the same unit. Without unit: how many times the effects are carried, of an interaction */
  resistance: z.array(z.object({ limitState: z.string(), unit: z.enum(['kN', 'kNm', '']), effect: z.number(), points })),
  /** the degree of utilisation against steel temperature, by the relation the temperature was read from; null where it came about otherwise */
  utilisation: z.object({ value: z.number(), points }).nullable(),
  /** °C against minutes */
  fire: points,
  bare: points,
  /** null where the evidence holds no thermal properties: tables and regressions say thickness, not temperature */
  protected: points.nullable(),
  periodMin: z.number(),
});
export type MemberChartsDto = z.infer<typeof memberChartsDtoSchema>;
export const memberSheetDtoSchema = z.object({
  member: memberDtoSchema,
  section: sectionDtoSchema,
  zone: z.object({ id: idSchema, code: z.string(), name: z.string(), periodMin: z.number(), curve: z.string() }),
  level: z.object({ id: idSchema, code: z.string(), name: z.string() }),
  productName: z.string().nullable(),
  result: memberResultDtoSchema.nullable(),
  sentence: z.string(),
  areaM2: z.number().nullable(),
  /** what is stored of it rests on other inputs than there are now, or on an earlier edition of the calculation */
  outOfDate: z.boolean(),
  /** the last day of its product's assessment, where that has passed */
  evidenceExpiredOn: z.string().nullable(),
  outline: sectionOutlineSchema.nullable(),
  working: z.array(workingStepDtoSchema),
  charts: memberChartsDtoSchema.nullable(),
  history: z.array(auditEntryDtoSchema),
  previousId: idSchema.nullable(),
  nextId: idSchema.nullable(),
});
export type MemberSheetDto = z.infer<typeof memberSheetDtoSchema>;

/** How many members a change of several touched, and how many results moved with them. */
export const membersChangedDtoSchema = z.object({ changed: z.number(), results: z.number() });
export type MembersChangedDto = z.infer<typeof membersChangedDtoSchema>;
export const membersDeletedDtoSchema = z.object({ deleted: z.number() });
export type MembersDeletedDto = z.infer<typeof membersDeletedDtoSchema>;
export const membersAcceptedDtoSchema = z.object({ accepted: z.number() });
export type MembersAcceptedDto = z.infer<typeof membersAcceptedDtoSchema>;
export const acceptancesWithdrawnDtoSchema = z.object({ withdrawn: z.number() });
export type AcceptancesWithdrawnDto = z.infer<typeof acceptancesWithdrawnDtoSchema>;
/** Before and after a member in the list as it is filtered and sorted; null at its ends, and where the member is not in it. */
export const memberNeighboursDtoSchema = z.object({ previousId: idSchema.nullable(), nextId: idSchema.nullable() });
export type MemberNeighboursDto = z.infer<typeof memberNeighboursDtoSchema>;
