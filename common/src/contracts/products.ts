import { z } from 'zod';
import { dateSchema, decimalSchema, idSchema, nameSchema, noteSchema, nonNegativeSchema, positiveSchema, versionSchema } from './primitives.js';
import { nominalCurves, periodSchema } from './fire.js';

export const productKinds = ['coating', 'board', 'spray'] as const;
export type ProductKind = (typeof productKinds)[number];
export const productKindNames: Record<ProductKind, string> = { coating: 'Reactive coating', board: 'Board, boxed', spray: 'Spray, profile' };

export const evidenceShapes = ['open', 'hollow-rectangular', 'hollow-circular'] as const;
export const orientations = ['beam', 'column'] as const;
export type Orientation = (typeof orientations)[number];

/** Thickness unit of everything in the evidence: µm for coatings, mm for boards and sprays. */
const thickness = positiveSchema.max(100_000);

/**
 * One table of a report: rows are section factors (rising), columns design temperatures (rising).
 * A null cell is outside the assessment.
 */
export const thicknessTableSchema = z.object({
  shape: z.enum(evidenceShapes),
  orientation: z.enum(orientations),
  periodMin: periodSchema,
  temperaturesC: z.array(z.number().min(100).max(1200)).min(1).max(60),
  sectionFactorsPerM: z.array(positiveSchema.max(1000)).min(1).max(400),
  /** [section factor][temperature] */
  thickness: z.array(z.array(thickness.nullable())),
});
export type ThicknessTable = z.infer<typeof thicknessTableSchema>;

/** Coefficients a0 … a7 of the regression form, for one shape and orientation, with the range that was tested. */
export const regressionFitSchema = z.object({
  shape: z.enum(evidenceShapes),
  orientation: z.enum(orientations),
  coefficients: z.array(z.number()).length(8),
  minThickness: thickness,
  maxThickness: thickness,
  minSectionFactorPerM: positiveSchema,
  maxSectionFactorPerM: positiveSchema,
  minTemperatureC: z.number(),
  maxTemperatureC: z.number(),
  minPeriodMin: positiveSchema,
  maxPeriodMin: positiveSchema,
});
export type RegressionFit = z.infer<typeof regressionFitSchema>;

export const conductivitySchema = z.union([
  positiveSchema.max(10),
  /** W/mK by temperature of the material, rising */
  z.array(z.object({ temperatureC: z.number().min(0).max(1200), value: positiveSchema.max(10) })).min(2).max(40),
]);
/** Thermal properties from assessment, with the tested range of thickness, section factor and temperature. */
export const thermalPropertiesSchema = z.object({
  conductivityWPerMK: conductivitySchema,
  densityKgPerM3: positiveSchema.max(5000),
  specificHeatJPerKgK: positiveSchema.max(10_000),
  moisturePercent: nonNegativeSchema.max(50),
  minThicknessMm: positiveSchema.max(500),
  maxThicknessMm: positiveSchema.max(500),
  maxSectionFactorPerM: positiveSchema.max(1000),
  minSectionFactorPerM: positiveSchema.max(1000),
  maxTemperatureC: z.number().min(100).max(1200),
  maxPeriodMin: positiveSchema.max(480),
  /** boards: thicknesses that can be bought; empty for sprays, which round up to thicknessStepMm */
  stockThicknessesMm: z.array(positiveSchema.max(500)).max(40).default([]),
  maxLayers: z.number().int().min(1).max(4).default(1),
  thicknessStepMm: positiveSchema.max(50).default(1),
  /** the assessment states that the properties hold in natural fires, cooling included */
  coversNaturalFire: z.boolean().optional(),
});
export type ThermalProperties = z.infer<typeof thermalPropertiesSchema>;

export const evidenceSchema = z.discriminatedUnion('form', [
  z.object({ form: z.literal('table'), tables: z.array(thicknessTableSchema).min(1).max(200) }),
  z.object({ form: z.literal('regression'), fits: z.array(regressionFitSchema).min(1).max(12) }),
  z.object({ form: z.literal('thermal'), properties: thermalPropertiesSchema }),
]);
export type Evidence = z.infer<typeof evidenceSchema>;
export const evidenceForms = ['table', 'regression', 'thermal'] as const satisfies readonly Evidence['form'][];

/** What buying and applying needs. Money is a decimal string in the project's currency. */
export const productSupplySchema = z.object({
  /** coating: volume solids, %, greatest DFT per coat in µm, density kg/L, container L, loss 0…0.9 */
  volumeSolidsPercent: positiveSchema.max(100).nullable().default(null),
  maxDftPerCoatUm: positiveSchema.nullable().default(null),
  densityKgPerL: positiveSchema.max(5).nullable().default(null),
  containerL: positiveSchema.max(2000).nullable().default(null),
  lossFraction: nonNegativeSchema.max(0.9).default(0),
  /** board: sheet size */
  sheetLengthMm: positiveSchema.max(10_000).nullable().default(null),
  sheetWidthMm: positiveSchema.max(10_000).nullable().default(null),
  /** spray: bags and what one yields in place */
  bagKg: positiveSchema.nullable().default(null),
  bagYieldM3: positiveSchema.nullable().default(null),
  /** per litre of coating, m² of board sheet or m³ of spray; null where not priced */
  materialRate: decimalSchema.nullable().default(null),
  /** per m² applied */
  labourRate: decimalSchema.nullable().default(null),
});
export type ProductSupply = z.infer<typeof productSupplySchema>;

/** 2026-02-30 and the year 0 look like days and are none. */
function isCalendarDay(text: string): boolean {
  const day = new Date(`${text}T00:00:00Z`);
  return text >= '1900' && !Number.isNaN(day.getTime()) && day.toISOString().startsWith(text);
}

export const productInputSchema = z.object({
  name: nameSchema,
  maker: nameSchema,
  kind: z.enum(productKinds),
  /** made up for demonstration; shown wherever the product is */
  invented: z.boolean().default(false),
  evidenceReference: nameSchema,
  evidenceEdition: z.string().trim().min(1, 'is needed').max(60),
  evidenceExpiresOn: dateSchema.refine(isCalendarDay, 'is not a day of the calendar'),
  evidenceStandard: nameSchema,
  /** curves the assessment covers */
  curves: z.array(z.enum(nominalCurves)).min(1),
  environments: z.array(z.enum(['C1', 'C2', 'C3', 'C4', 'C5', 'CX'])).default([]),
  evidence: evidenceSchema,
  supply: productSupplySchema,
  note: noteSchema.default(''),
});
export type ProductInput = z.infer<typeof productInputSchema>;
export const productUpdateSchema = productInputSchema.extend({ version: versionSchema });
export type ProductUpdate = z.infer<typeof productUpdateSchema>;

export const productIdSchema = idSchema;

/** Sent with the file of one thickness table, as form fields: first row temperatures, first column section factors. */
export const readTableSchema = z.object({
  shape: z.enum(evidenceShapes),
  orientation: z.enum(orientations),
  periodMin: z.coerce.number().pipe(periodSchema),
  kind: z.enum(productKinds).default('coating'),
  /** unit of the file's thicknesses where it is not the evidence's own (µm for coatings, mm for boards and sprays) */
  fileUnit: z.enum(['µm', 'mm']).optional(),
});
export type ReadTable = z.infer<typeof readTableSchema>;
