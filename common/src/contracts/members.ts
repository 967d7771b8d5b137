import { z } from 'zod';
import { verdictKinds } from './assessment.js';
import { criticalTemperatureBasisSchema, memberTypes, steelGrades } from './actions.js';
import { exposureSchema, protectionForms } from './fire.js';
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

export const bulkMemberSchema = z.object({
  memberIds: z.array(idSchema).min(1).max(5000),
  // onSite without its default: what is not sent must stay as it is
  set: memberInputSchema.pick({ zoneId: true, memberType: true, grade: true, exposure: true, protectionForm: true, sectionId: true }).extend({ onSite: z.boolean() }).partial()
    .refine((s) => Object.keys(s).length > 0, 'choose at least one field to set'),
});
export type BulkMember = z.infer<typeof bulkMemberSchema>;
export const memberDeleteQuerySchema = z.object({ version: z.coerce.number().int().min(1) });
export const memberIdsSchema = z.object({ memberIds: z.array(idSchema).min(1).max(5000) });

/** A signed acceptance, by the fire engineer; it holds only while the accepted value stands. */
export const acceptanceKinds = ['assumed', 'high-temperature', 'bare'] as const;
export const acceptanceSchema = z.object({
  memberIds: z.array(idSchema).min(1).max(5000),
  kind: z.enum(acceptanceKinds),
  reason: z.string().trim().min(3, 'say why').max(1000),
});
export type Acceptance = z.infer<typeof acceptanceSchema>;
export const acceptanceWithdrawalSchema = acceptanceSchema.omit({ reason: true });
export type AcceptanceWithdrawal = z.infer<typeof acceptanceWithdrawalSchema>;

export const memberSortKeys = ['mark', 'level', 'zone', 'type', 'section', 'sectionFactor', 'criticalTemperature', 'thickness', 'verdict', 'quantity', 'length'] as const;
const list = <T extends z.ZodType>(item: T) => z.preprocess((v) => (typeof v === 'string' ? v.split(',').filter(Boolean) : v), z.array(item)).optional();
export const memberQuerySchema = z.object({
  search: z.string().trim().max(100).optional(),
  zoneIds: list(idSchema),
  levelIds: list(idSchema),
  memberTypes: list(z.enum(memberTypes)),
  verdicts: list(z.enum(verdictKinds)),
  productIds: list(idSchema),
  memberIds: list(idSchema),
  /** only members with something open */
  open: z.enum(['true', 'false']).optional(),
  sort: z.enum(memberSortKeys).default('mark'),
  direction: z.enum(['asc', 'desc']).default('asc'),
  page: z.coerce.number().int().min(1).default(1),
  pageSize: z.coerce.number().int().min(1).max(500).default(100),
});
export type MemberQuery = z.infer<typeof memberQuerySchema>;
