import { z } from 'zod';
import { roles } from './accounts.js';
import { fireCurveKinds } from './fire.js';
import { idSchema } from './primitives.js';
import { levelInputSchema } from './projects.js';
import { revisionStates } from './revisions.js';
import { projectSettingsSchema } from './settings.js';

export const membershipDtoSchema = z.object({ userId: idSchema, name: z.string(), email: z.string(), roles: z.array(z.enum(roles)) });
export type MembershipDto = z.infer<typeof membershipDtoSchema>;

export const projectListItemDtoSchema = z.object({
  id: idSchema, number: z.string(), name: z.string(), place: z.string(), roles: z.array(z.enum(roles)),
  revision: z.object({ code: z.string(), state: z.enum(revisionStates) }).nullable(),
  /** null where the reader may see issued work only and nothing is issued */
  members: z.number().nullable(),
  /** null as well while members are being recalculated */
  protectedAreaM2: z.number().nullable(),
  open: z.number().nullable(),
  /** open items that wait on a role the reader holds, and a revision that waits for their check or issue */
  waitsOnMe: z.number(),
});
export type ProjectListItemDto = z.infer<typeof projectListItemDtoSchema>;
export const projectDtoSchema = z.object({
  id: idSchema, number: z.string(), name: z.string(), place: z.string(), currency: z.string(), note: z.string(), version: z.number(),
  roles: z.array(z.enum(roles)),
  /** null for those who see issued work only */
  settings: projectSettingsSchema.nullable(),
  /** the open revision, else the issued one; for those who see issued work only, the issued one */
  revision: z.object({ id: idSchema, code: z.string(), state: z.enum(revisionStates) }).nullable(),
  issuedRevision: z.object({ id: idSchema, code: z.string() }).nullable(),
  /** of work in progress; for those who see issued work only, of the issued revision, in which nothing is open */
  counts: z.object({ levels: z.number(), zones: z.number(), members: z.number(), products: z.number(), open: z.number() }),
});
export type ProjectDto = z.infer<typeof projectDtoSchema>;

/** Something that keeps the schedule from being prepared, or deserves a look; says who must act and where. */
export const openItemDtoSchema = z.object({
  role: z.enum(roles),
  kind: z.enum(['blocker', 'warning']),
  /** code of the reason, for grouping */
  code: z.string(),
  title: z.string(),
  zoneId: idSchema.nullable(),
  zoneLabel: z.string().nullable(),
  memberIds: z.array(idSchema),
  count: z.number(),
  page: z.enum(['members', 'member', 'zones', 'products', 'schedule', 'team']),
});
export type OpenItemDto = z.infer<typeof openItemDtoSchema>;

export const buildingZoneDtoSchema = z.object({
  id: idSchema, code: z.string(), name: z.string(), periodMin: z.number(), curve: z.enum(fireCurveKinds),
  protectedAreaM2: z.number(), members: z.number(), settled: z.number(), open: z.number(), issuedMembers: z.number(),
  /** members being recalculated: open until then, and nothing of them is in the area */
  unassessed: z.number(),
});
export type BuildingZoneDto = z.infer<typeof buildingZoneDtoSchema>;
export const buildingLevelDtoSchema = z.object({
  id: idSchema, code: z.string(), name: z.string(), elevationM: z.number(), heightM: z.number(), zones: z.array(buildingZoneDtoSchema),
});
export type BuildingLevelDto = z.infer<typeof buildingLevelDtoSchema>;
export const buildingDtoSchema = z.object({
  members: z.number(), settled: z.number(), open: z.number(), unassessed: z.number(),
  levels: z.array(buildingLevelDtoSchema),
  openItems: z.array(openItemDtoSchema),
  protection: z.array(z.object({
    label: z.string(), kind: z.enum(['coating', 'board', 'spray', 'bare', 'open']), members: z.number(), areaM2: z.number().nullable(), net: z.string().nullable(),
  })),
});
export type BuildingDto = z.infer<typeof buildingDtoSchema>;

/** The building as an issued revision froze it, for everybody on the team: nothing of work in progress is in it. */
export const issuedZoneDtoSchema = z.object({
  id: idSchema, code: z.string(), name: z.string(), periodMin: z.number(), curve: z.enum(fireCurveKinds),
  protectedAreaM2: z.number(), members: z.number(), protectedMembers: z.number(), bareMembers: z.number(),
});
export type IssuedZoneDto = z.infer<typeof issuedZoneDtoSchema>;
export const issuedBuildingDtoSchema = z.object({
  revision: z.object({ id: idSchema, code: z.string(), issuedAt: z.string() }).nullable(),
  members: z.number(), protectedMembers: z.number(), bareMembers: z.number(), protectedAreaM2: z.number(),
  levels: z.array(buildingLevelDtoSchema.extend({ zones: z.array(issuedZoneDtoSchema) })),
});
export type IssuedBuildingDto = z.infer<typeof issuedBuildingDtoSchema>;

export const levelDtoSchema = levelInputSchema.extend({ id: idSchema, version: z.number() });
export type LevelDto = z.infer<typeof levelDtoSchema>;

export const auditEntryDtoSchema = z.object({
  id: z.string(), at: z.string(), userName: z.string(), action: z.string(), entity: z.string(), entityId: z.string().nullable(), label: z.string(),
  changes: z.array(z.object({ field: z.string(), old: z.unknown(), new: z.unknown() })),
  why: z.string().nullable(),
});
export type AuditEntryDto = z.infer<typeof auditEntryDtoSchema>;
