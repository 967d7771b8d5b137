import { z } from 'zod';
import { codeSchema, idSchema, nameSchema, nonNegativeSchema, numberSchema } from './primitives.js';

// thinner than any sheet, the properties lose their digits
const dim = numberSchema.min(0.1, 'is less than 0.1 mm').max(5000, 'is more than 5000 mm');
const radius = nonNegativeSchema.max(500, 'is more than 500 mm');

/** A cross-section by its dimensions in mm. Everything else (area, inertia, perimeter) is computed from these. */
export const sectionShapeSchema = z.discriminatedUnion('kind', [
  /** Rolled or welded doubly symmetric I or H; rootRadiusMm 0 for a plate girder (fillet welds are not counted). */
  z.object({ kind: z.literal('i'), hMm: dim, bMm: dim, twMm: dim, tfMm: dim, rootRadiusMm: radius }),
  /** Plate girder or asymmetric I with unequal flanges. */
  z.object({ kind: z.literal('i-unequal'), hMm: dim, twMm: dim, topWidthMm: dim, topThicknessMm: dim, bottomWidthMm: dim, bottomThicknessMm: dim, rootRadiusMm: radius }),
  /** flangeSlope is tan of the inner face (0 parallel flanges, 0.08 or 0.05 tapered); tfMm is at the standard's reference point. */
  z.object({ kind: z.literal('channel'), hMm: dim, bMm: dim, twMm: dim, tfMm: dim, rootRadiusMm: radius, toeRadiusMm: radius, flangeSlope: z.number().min(0).max(0.2) }),
  z.object({ kind: z.literal('tee'), hMm: dim, bMm: dim, twMm: dim, tfMm: dim, rootRadiusMm: radius }),
  /** hMm is the longer leg. */
  z.object({ kind: z.literal('angle'), hMm: dim, bMm: dim, tMm: dim, rootRadiusMm: radius, toeRadiusMm: radius }),
  z.object({ kind: z.literal('rectangular-hollow'), hMm: dim, bMm: dim, tMm: dim, outerRadiusMm: radius, innerRadiusMm: radius }),
  z.object({ kind: z.literal('circular-hollow'), dMm: dim, tMm: dim }),
  /** Welded box: flanges b × tf, two webs tw with clearWidthMm between them. */
  z.object({ kind: z.literal('box'), hMm: dim, bMm: dim, twMm: dim, tfMm: dim, clearWidthMm: dim }),
  z.object({ kind: z.literal('flat'), hMm: dim, tMm: dim }),
  z.object({ kind: z.literal('round'), dMm: dim }),
]);
export type SectionShape = z.infer<typeof sectionShapeSchema>;
export type SectionKind = SectionShape['kind'];

/** Groups that protection evidence distinguishes. */
export const profileGroups = ['open', 'hollow-rectangular', 'hollow-circular', 'solid'] as const;
export type ProfileGroup = (typeof profileGroups)[number];

export const sectionFamilies = [
  'IPE', 'HEAA', 'HEA', 'HEB', 'HEM', 'HEC', 'HE', 'HL', 'HD', 'HP', 'UB', 'UC', 'UBP', 'PFC', 'UPN', 'UPE',
  'CHS', 'SHS', 'RHS', 'L', 'TUB', 'TUC', 'W', 'HSS', 'HSS-R', 'CUSTOM',
] as const;
export type SectionFamily = (typeof sectionFamilies)[number];

export const customSectionSchema = z.object({ designation: codeSchema, shape: sectionShapeSchema });
export type CustomSection = z.infer<typeof customSectionSchema>;

export const sectionQuerySchema = z.object({
  search: nameSchema.optional(),
  /** the one with this id, if it may be seen */
  id: idSchema.optional(),
  family: z.enum(sectionFamilies).optional(),
  projectId: idSchema.optional(),
  page: z.coerce.number().int().min(1).default(1),
  pageSize: z.coerce.number().int().min(1).max(200).default(50),
});
export type SectionQuery = z.infer<typeof sectionQuerySchema>;
