import { z } from 'zod';
import type { Role } from './accounts.js';
import { emailSchema, roles } from './accounts.js';
import { codeSchema, idSchema, nameSchema, noteSchema, numberSchema, versionSchema } from './primitives.js';
import { designBasisSchema } from './actions.js';
import { projectSettingsSchema } from './settings.js';
import type { ProjectSettings, TargetPolicy } from './settings.js';
import type { FireCurve } from './fire.js';
import type { RevisionState } from './revisions.js';

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
export const membershipRolesSchema = membershipInputSchema.pick({ roles: true });
export type MembershipRoles = z.infer<typeof membershipRolesSchema>;
export interface MembershipDto { userId: string; name: string; email: string; roles: Role[] }

export interface ProjectListItemDto {
  id: string; number: string; name: string; place: string; roles: Role[];
  revision: { code: string; state: RevisionState } | null;
  /** null where the reader may see issued work only and nothing is issued */
  members: number | null;
  protectedAreaM2: number | null;
  open: number | null;
  /** open items that wait on a role the reader holds, and a revision that waits for their check or issue */
  waitsOnMe: number;
}
export interface ProjectDto {
  id: string; number: string; name: string; place: string; currency: string; note: string; version: number;
  roles: Role[];
  /** null for those who see issued work only */
  settings: ProjectSettings | null;
  /** the open revision, else the issued one; for those who see issued work only, the issued one */
  revision: { id: string; code: string; state: RevisionState } | null;
  issuedRevision: { id: string; code: string } | null;
  /** of work in progress; for those who see issued work only, of the issued revision, in which nothing is open */
  counts: { levels: number; zones: number; members: number; products: number; open: number };
}

/** Something that keeps the schedule from being prepared, or deserves a look; says who must act and where. */
export interface OpenItemDto {
  role: Role;
  kind: 'blocker' | 'warning';
  /** code of the reason, for grouping */
  code: string;
  title: string;
  zoneId: string | null;
  zoneLabel: string | null;
  memberIds: string[];
  count: number;
  page: 'members' | 'member' | 'zones' | 'products' | 'schedule' | 'team';
}

export interface BuildingZoneDto {
  id: string; code: string; name: string; periodMin: number; curve: FireCurve['kind'];
  protectedAreaM2: number; members: number; settled: number; open: number; issuedMembers: number;
}
export interface BuildingLevelDto { id: string; code: string; name: string; elevationM: number; heightM: number; zones: BuildingZoneDto[] }
export interface BuildingDto {
  members: number; settled: number; open: number;
  levels: BuildingLevelDto[];
  openItems: OpenItemDto[];
  protection: { label: string; kind: 'coating' | 'board' | 'spray' | 'bare' | 'open'; members: number; areaM2: number | null; net: string | null }[];
}

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
export interface LevelDto extends LevelInput { id: string; version: number }

export const auditQuerySchema = z.object({
  entity: z.string().max(40).optional(),
  entityId: idSchema.optional(),
  search: z.string().trim().max(200).optional(),
  page: z.coerce.number().int().min(1).default(1),
  pageSize: z.coerce.number().int().min(1).max(200).default(50),
});
export type AuditQuery = z.infer<typeof auditQuerySchema>;
export interface AuditEntryDto {
  id: string; at: string; userName: string; action: string; entity: string; entityId: string | null; label: string;
  changes: { field: string; old: unknown; new: unknown }[];
  why: string | null;
}
export type { TargetPolicy };
