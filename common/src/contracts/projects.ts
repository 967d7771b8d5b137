import { z } from 'zod';
import { emailSchema, roles } from './accounts.js';
import { codeSchema, idSchema, nameSchema, noteSchema, numberSchema, versionSchema } from './primitives.js';
import { designBasisSchema } from './actions.js';
import { projectSettingsSchema } from './settings.js';

export const projectInputSchema = z.object({
  number: codeSchema,
  name: nameSchema,
  place: z.string().trim().max(200).default(''),
  currency: z.enum(['EUR', 'GBP', 'USD', 'CAD', 'CHF', 'SEK', 'NOK', 'DKK', 'PLN', 'AUD']).default('EUR'),
  note: noteSchema.default(''),
});
export type ProjectInput = z.infer<typeof projectInputSchema>;
/** Whoever starts a project says which roles they take on it. */
export const projectCreateSchema = projectInputSchema.extend({ roles: z.array(z.enum(roles)).min(1, 'Choose at least one role.') });
export type ProjectCreate = z.infer<typeof projectCreateSchema>;
export const projectUpdateSchema = projectInputSchema.extend({ version: versionSchema });
export type ProjectUpdate = z.infer<typeof projectUpdateSchema>;

/** The fire engineer's part of the settings. */
export const designBasisUpdateSchema = z.object({ designBasis: designBasisSchema, version: versionSchema });
export type DesignBasisUpdate = z.infer<typeof designBasisUpdateSchema>;
/** The specifier's part of the settings. */
export const takeoffSettingsUpdateSchema = projectSettingsSchema.omit({ designBasis: true }).required().extend({ version: versionSchema });
export type TakeoffSettingsUpdate = z.infer<typeof takeoffSettingsUpdateSchema>;

export const membershipInputSchema = z.object({ email: emailSchema, roles: z.array(z.enum(roles)).min(1, 'give at least one role') });
export type MembershipInput = z.infer<typeof membershipInputSchema>;
/** was: what the form showed when it was opened; refused where that no longer stands. */
export const membershipRolesSchema = membershipInputSchema.pick({ roles: true }).extend({ was: membershipInputSchema.pick({ roles: true }).optional() });
export type MembershipRoles = z.infer<typeof membershipRolesSchema>;

export const levelInputSchema = z.object({
  code: codeSchema,
  name: nameSchema,
  /** top of structural floor, metres above the project's datum */
  elevationM: numberSchema.min(-200).max(1000),
  heightM: numberSchema.positive('must be above 0').max(100),
});
export type LevelInput = z.infer<typeof levelInputSchema>;
export const levelUpdateSchema = levelInputSchema.extend({ version: versionSchema });
export type LevelUpdate = z.infer<typeof levelUpdateSchema>;

export const auditQuerySchema = z.object({
  entity: z.string().max(40).optional(),
  entityId: idSchema.optional(),
  userId: idSchema.optional(),
  /** entries at or after this instant */
  from: z.iso.datetime({ error: 'is not a date and time' }).optional(),
  /** entries before this instant */
  before: z.iso.datetime({ error: 'is not a date and time' }).optional(),
  search: z.string().trim().max(200).optional(),
  page: z.coerce.number().int().min(1).default(1),
  pageSize: z.coerce.number().int().min(1).max(200).default(50),
});
export type AuditQuery = z.infer<typeof auditQuerySchema>;
