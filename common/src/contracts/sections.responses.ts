import { z } from 'zod';
import { idSchema } from './primitives.js';
import { sectionFamilies, sectionShapeSchema } from './sections.js';

/** y is the strong axis, z the weak one, as in EN 1993-1-1. For angles y and z are the axes parallel to the legs. */
export const sectionPropertiesSchema = z.object({
  areaMm2: z.number(),
  massKgPerM: z.number(),
  /** full outer perimeter: every steel surface */
  perimeterMm: z.number(),
  iyMm4: z.number(),
  izMm4: z.number(),
  welYMm3: z.number(),
  welZMm3: z.number(),
  wplYMm3: z.number(),
  wplZMm3: z.number(),
  /** null where the shape's constant is not computed here */
  itMm4: z.number().nullable(),
  iwMm6: z.number().nullable(),
  /** shear area for a shear force parallel to the web (EN 1993-1-1 6.2.6) */
  shearAreaZMm2: z.number(),
});
export type SectionProperties = z.infer<typeof sectionPropertiesSchema>;

export const sectionDtoSchema = z.object({
  id: idSchema,
  projectId: idSchema.nullable(),
  family: z.enum(sectionFamilies),
  designation: z.string(),
  otherNames: z.array(z.string()),
  standard: z.string(),
  shape: sectionShapeSchema,
  properties: sectionPropertiesSchema,
});
export type SectionDto = z.infer<typeof sectionDtoSchema>;

const point = z.tuple([z.number(), z.number()]);
/** One stretch of the outline, in mm, x to the right and y upwards, origin at the middle of the bounding box. */
export const outlineSegmentSchema = z.object({
  from: point,
  to: point,
  /** present for an arc; positive sweeps anticlockwise from `from` to `to` */
  arc: z.object({ centre: point, radiusMm: z.number(), anticlockwise: z.boolean() }).optional(),
  lengthMm: z.number(),
  /** receives fire */
  heated: z.boolean(),
  /** carries coating or spray */
  coated: z.boolean(),
});
export type OutlineSegment = z.infer<typeof outlineSegmentSchema>;
/** What the drawing shows and what the section factor sums: one source for both. */
export const sectionOutlineSchema = z.object({
  /** closed loops: the outer one first, inner ones (hollow) after, never heated */
  loops: z.array(z.array(outlineSegmentSchema)),
  /** the enclosing box when protection is boxed, else null */
  box: z.array(outlineSegmentSchema).nullable(),
  widthMm: z.number(),
  heightMm: z.number(),
});
export type SectionOutline = z.infer<typeof sectionOutlineSchema>;
