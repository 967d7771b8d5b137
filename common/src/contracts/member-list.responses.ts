import { z } from 'zod';
import { criticalTemperatureWays, memberTypes, steelGrades } from './actions.js';
import { verdictKinds } from './assessment.js';
import { exposureArrangements, protectionForms } from './fire.js';
import { memberViewInputSchema } from './member-list.js';
import { idSchema, pageSchema, thicknessUnits, versionSchema } from './primitives.js';
import { sectionFamilies } from './sections.js';

const measure = z.number().nullable();
export const memberRowDtoSchema = z.object({
  id: idSchema, mark: z.string(), version: versionSchema,
  levelCode: z.string(), zoneId: idSchema, zoneCode: z.string(), periodMin: z.number(),
  memberType: z.enum(memberTypes), sectionId: idSchema, section: z.string(), family: z.enum(sectionFamilies), grade: z.enum(steelGrades),
  lengthMm: z.number(), quantity: z.number(), exposure: z.enum(exposureArrangements), protectionForm: z.enum(protectionForms), note: z.string(),
  way: z.enum(criticalTemperatureWays), verdict: z.enum(verdictKinds).nullable(),
  sectionFactorPerM: measure, criticalTemperatureC: measure, utilisation: measure, assumed: z.boolean(),
  requiredThickness: measure, appliedThickness: measure, thicknessUnit: z.enum(thicknessUnits).nullable(),
  productName: z.string().nullable(), areaM2: measure, open: z.boolean(),
  /** the result as a sentence */
  sentence: z.string(),
});
export type MemberRowDto = z.infer<typeof memberRowDtoSchema>;

export const memberPageDtoSchema = pageSchema(memberRowDtoSchema).extend({
  /** the whole project, whatever the filter */
  project: z.object({ members: z.number(), open: z.number() }),
});
export type MemberPageDto = z.infer<typeof memberPageDtoSchema>;

/** What the members of a project have, to choose a filter from: each value with how many have it. */
const valueSchema = z.object({ value: z.string(), label: z.string(), members: z.number() });
export const memberValuesDtoSchema = z.object({
  levelIds: z.array(valueSchema), zoneIds: z.array(valueSchema), memberTypes: z.array(valueSchema), families: z.array(valueSchema), sectionIds: z.array(valueSchema),
  grades: z.array(valueSchema), exposures: z.array(valueSchema), protectionForms: z.array(valueSchema), periods: z.array(valueSchema), productIds: z.array(valueSchema),
  verdicts: z.array(valueSchema), ways: z.array(valueSchema),
});
export type MemberValuesDto = z.infer<typeof memberValuesDtoSchema>;
export type MemberValue = z.infer<typeof valueSchema>;

export const memberViewDtoSchema = memberViewInputSchema.extend({ id: idSchema });
export type MemberViewDto = z.infer<typeof memberViewDtoSchema>;

export const foundSummaryDtoSchema = z.object({
  count: z.number(), stamp: z.string(),
  /** the first few marks */
  marks: z.array(z.string()),
  acceptable: z.object({ assumed: z.number(), 'high-temperature': z.number(), bare: z.number() }),
});
export type FoundSummaryDto = z.infer<typeof foundSummaryDtoSchema>;

/** How many were chosen, and how many of them a change would make other than they are. */
export const previewAnswerDtoSchema = z.object({ chosen: z.number(), changes: z.number() });
export type PreviewAnswerDto = z.infer<typeof previewAnswerDtoSchema>;
