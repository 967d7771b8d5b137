import { z } from 'zod';
import { criticalTemperatureBasisSchema, memberTypes, steelGrades } from './actions.js';
import { exposureSchema, protectionForms } from './fire.js';
import { isOneChoice, memberChoiceShape, mostChosen, notOneChoice } from './member-choice.js';
import { codeSchema, idSchema, nonNegativeSchema, noteSchema, positiveSchema, versionSchema } from './primitives.js';

/** What the specifier decides of a member. */
export const memberInputSchema = z.object({
  zoneId: idSchema,
  mark: codeSchema,
  memberType: z.enum(memberTypes),
  sectionId: idSchema,
  grade: z.enum(steelGrades),
  // 7.5 or 12 typed for metres is a slip, not a member
  lengthMm: positiveSchema.min(50, 'is less than 50 mm; lengths are in mm').max(100_000, 'is more than 100 m'),
  quantity: z.number({ error: 'must be a whole number' }).int('must be a whole number').min(1, 'must be at least 1').max(10_000, 'must be at most 10000'),
  exposure: exposureSchema,
  protectionForm: z.enum(protectionForms),
  /** connections of secondary, unprotected steel onto this member, for coat-back */
  coatBackConnections: z.number().int().min(0).max(1000).default(0),
  coatBackGirthMm: nonNegativeSchema.max(10_000).default(0),
  /** openings and connection faces not to be protected, whole member, m² */
  deductionM2: nonNegativeSchema.max(10_000).default(0),
  onSite: z.boolean().default(true),
  note: noteSchema.default(''),
});
export type MemberInput = z.infer<typeof memberInputSchema>;
export const memberUpdateSchema = memberInputSchema.extend({ version: versionSchema });
export type MemberUpdate = z.infer<typeof memberUpdateSchema>;

/** What the structural engineer decides of a member. */
export const memberStructuralSchema = z.object({ basis: criticalTemperatureBasisSchema, version: versionSchema });
export type MemberStructural = z.infer<typeof memberStructuralSchema>;

const bulkSetSchema = memberInputSchema.pick({ zoneId: true, memberType: true, grade: true, exposure: true, protectionForm: true, sectionId: true })
  // onSite without its default: what is not sent must stay as it is
  .extend({ onSite: z.boolean() }).partial()
  .refine((s) => Object.keys(s).length > 0, 'choose at least one field to set');
export const bulkMemberSchema = z.object({ ...memberChoiceShape, set: bulkSetSchema }).refine(isOneChoice, notOneChoice);
export type BulkMember = z.infer<typeof bulkMemberSchema>;
/** How the critical temperature of many comes about; actions are each member's own and are set one by one. */
export const bulkStructuralSchema = z.object({
  ...memberChoiceShape,
  basis: criticalTemperatureBasisSchema.refine(({ way }) => way !== 'calculated', 'actions are set member by member'),
}).refine(isOneChoice, notOneChoice);
export type BulkStructural = z.infer<typeof bulkStructuralSchema>;
export const memberDeleteQuerySchema = z.object({ version: z.coerce.number().int().min(1) });

/** A signed acceptance, by the fire engineer; it holds only while the accepted value stands. */
export const acceptanceKinds = ['assumed', 'high-temperature', 'bare'] as const;
const memberIdsSchema = z.array(idSchema).min(1).max(mostChosen);
export const acceptanceFormSchema = z.object({ kind: z.enum(acceptanceKinds), reason: z.string().trim().min(3, 'say why').max(1000) });
/** Of all that a filter finds, those are signed for which there is something to accept. */
export const acceptanceSchema = acceptanceFormSchema.extend({ memberIds: memberIdsSchema.optional(), found: memberChoiceShape.found })
  .refine((v) => (v.memberIds === undefined) !== (v.found === undefined), { ...notOneChoice, path: ['memberIds'] });
export type Acceptance = z.infer<typeof acceptanceSchema>;
export const acceptanceWithdrawalSchema = z.object({ memberIds: memberIdsSchema, kind: z.enum(acceptanceKinds) });
export type AcceptanceWithdrawal = z.infer<typeof acceptanceWithdrawalSchema>;
