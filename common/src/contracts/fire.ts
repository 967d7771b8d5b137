import { z } from 'zod';
import { nonNegativeSchema, positiveSchema } from './primitives.js';

/** The periods protection is assessed for, in minutes. */
export const ratingPeriods = [15, 20, 30, 45, 60, 75, 90, 120, 180, 240] as const;
export const periodSchema = z.literal([...ratingPeriods], { error: `must be one of ${ratingPeriods.join(', ')} minutes` });

export const nominalCurves = ['standard', 'external', 'hydrocarbon', 'slow-heating', 'astm-e119'] as const;
export type NominalCurve = (typeof nominalCurves)[number];
export const fireCurveSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('standard') }),
  z.object({ kind: z.literal('external') }),
  z.object({ kind: z.literal('hydrocarbon') }),
  z.object({ kind: z.literal('slow-heating') }),
  z.object({ kind: z.literal('astm-e119') }),
  /** EN 1991-1-2 Annex A: opening factor in m^0.5, b in J/m²s^0.5K, fire load on the total enclosure area in MJ/m². */
  z.object({
    kind: z.literal('parametric'),
    openingFactor: positiveSchema.min(0.02, 'is below 0.02').max(0.2, 'is above 0.2'),
    thermalAbsorptivity: positiveSchema.min(100, 'is below 100').max(2200, 'is above 2200'),
    fireLoadTotalMjPerM2: positiveSchema.min(50, 'is below 50').max(1000, 'is above 1000'),
    limitTimeMin: z.literal([15, 20, 25]),
  }),
]);
export type FireCurve = z.infer<typeof fireCurveSchema>;

export const fireCurveKinds = [...nominalCurves, 'parametric'] as const satisfies readonly FireCurve['kind'][];
export const fireCurveNames: Record<FireCurve['kind'], string> = {
  standard: 'Standard fire',
  external: 'External fire',
  hydrocarbon: 'Hydrocarbon fire',
  'slow-heating': 'Slow heating',
  'astm-e119': 'ASTM E119',
  parametric: 'Parametric fire',
};

/**
 * How the fire reaches a member.
 * - three-sides: the top face stands against a slab
 * - three-sides-web-filled: as before, with the space between the flanges filled, so that webs are shielded
 * - slab-edge-one-side / -two-sides: a beam within the slab's depth; the bottom face alone, or with one side
 * - given-faces: a column in a wall and the like; the user names the faces of the enclosing box that see fire
 */
export const exposureArrangements = [
  'four-sides', 'three-sides', 'three-sides-web-filled', 'slab-edge-one-side', 'slab-edge-two-sides', 'given-faces',
] as const;
export const faceNames = ['top', 'bottom', 'left', 'right'] as const;
export const exposureSchema = z
  .object({
    arrangement: z.enum(exposureArrangements),
    faces: z.array(z.enum(faceNames)).max(4).optional(),
    reason: z.string().trim().max(500).default(''),
  })
  .refine((e) => e.arrangement !== 'given-faces' || (e.faces?.length ?? 0) > 0, { path: ['faces'], error: 'name at least one face that sees fire' });
export type Exposure = z.infer<typeof exposureSchema>;
export type FaceName = (typeof faceNames)[number];

export const exposureNames: Record<Exposure['arrangement'], string> = {
  'four-sides': 'Four sides',
  'three-sides': 'Three sides, slab on top',
  'three-sides-web-filled': 'Three sides, web filled',
  'slab-edge-one-side': 'In the slab, bottom face exposed',
  'slab-edge-two-sides': 'In the slab, bottom and one side exposed',
  'given-faces': 'Faces as given',
};

/** Protection follows the profile, or encloses it as a box. */
export const protectionForms = ['profile', 'boxed'] as const;
export type ProtectionForm = (typeof protectionForms)[number];

export const curveSampleSchema = z.object({ minutes: nonNegativeSchema, temperatureC: z.number() });
export type CurveSample = z.infer<typeof curveSampleSchema>;
