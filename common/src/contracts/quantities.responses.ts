import { z } from 'zod';
import { memberTypes } from './actions.js';
import { messageSchema } from './messages.responses.js';
import { idSchema, thicknessUnits } from './primitives.js';
import { productKinds } from './products.js';
import { profileClasses } from './quantities.js';
import type { quantityAmountKeys } from './quantities.js';

/**
 * Printed quantities. Decimal strings with a fixed count of places (m² 2, m³ 4, L and kg 2, money the currency's), so that sums of
 * printed lines are exact. null: does not apply to this kind of product, or not determined, which `missing` then explains.
 */
export const quantityAmountsSchema = z.object({
  /** coated girth × length × number; boards: outer box girth */
  grossM2: z.string(),
  endLapM2: z.string(),
  openingM2: z.string(),
  coatBackM2: z.string(),
  /** gross − end laps − openings + coat-back */
  netM2: z.string(),
  /** material in place: dry film, board or spray */
  volumeM3: z.string(),
  litres: z.string().nullable(),
  /** coatings and sprays, by density or bag */
  kg: z.string().nullable(),
  /** boards: stock sheet used, cutting waste included */
  sheetM2: z.string().nullable(),
  materialCost: z.string().nullable(),
  labourCost: z.string().nullable(),
  /** both together; null unless all that applies is priced */
  cost: z.string().nullable(),
} satisfies Record<(typeof quantityAmountKeys)[number], z.ZodType>);
export type QuantityAmounts = z.infer<typeof quantityAmountsSchema>;

/** The smallest printed cell: members that share level, zone, product, thickness, type, profile class and place of application. */
export const quantityLineDtoSchema = quantityAmountsSchema.extend({
  levelId: idSchema,
  zoneId: idSchema,
  productId: idSchema,
  kind: z.enum(productKinds),
  thickness: z.number(),
  thicknessUnit: z.enum(thicknessUnits),
  layers: z.array(z.number()).nullable(),
  memberType: z.enum(memberTypes),
  profile: z.enum(profileClasses),
  onSite: z.boolean(),
  memberIds: z.array(idSchema),
  marks: z.number(),
  pieces: z.number(),
  lengthM: z.string(),
  /** coatings: all coats together */
  wetFilmUm: z.string().nullable(),
  coats: z.number().nullable(),
  spreadingRateM2PerL: z.string().nullable(),
  missing: z.array(messageSchema),
});
export type QuantityLineDto = z.infer<typeof quantityLineDtoSchema>;

export const quantityTotalsSchema = quantityAmountsSchema.extend({
  lines: z.number(),
  pieces: z.number(),
  /** why an amount is null although it applies; each sentence once */
  missing: z.array(messageSchema),
});
export type QuantityTotals = z.infer<typeof quantityTotalsSchema>;

export const quantitySplitDtoSchema = z.object({
  rows: z.array(z.object({ key: z.string(), totals: quantityTotalsSchema })),
  columns: z.array(z.object({ key: z.string(), totals: quantityTotalsSchema })),
  cells: z.array(z.object({ row: z.string(), column: z.string(), totals: quantityTotalsSchema })),
  total: quantityTotalsSchema,
});
export type QuantitySplitDto = z.infer<typeof quantitySplitDtoSchema>;

/** Sheets cut alike: strips across the width, pieces along each strip. */
export const cuttingPatternDtoSchema = z.object({
  sheets: z.number(),
  strips: z.array(z.object({ widthMm: z.number(), pieces: z.array(z.object({ lengthMm: z.number(), widthMm: z.number() })) })),
});
export type CuttingPatternDto = z.infer<typeof cuttingPatternDtoSchema>;
export const cuttingPlanDtoSchema = z.object({
  thicknessMm: z.number(),
  sheetLengthMm: z.number(),
  sheetWidthMm: z.number(),
  kerfMm: z.number(),
  sheets: z.number(),
  /** no plan can do with fewer */
  leastSheets: z.number(),
  usedM2: z.number(),
  sheetM2: z.number(),
  wasteFraction: z.number(),
  patterns: z.array(cuttingPatternDtoSchema),
});
export type CuttingPlanDto = z.infer<typeof cuttingPlanDtoSchema>;

/** What to order for one product and delivery; whole containers, sheets or bags, rounded up once. */
export const purchaseDtoSchema = z.object({
  productId: idSchema,
  /** null: the whole project */
  levelId: idSchema.nullable(),
  kind: z.enum(productKinds),
  litres: z.string().nullable(),
  containers: z.number().nullable(),
  containerL: z.number().nullable(),
  bags: z.number().nullable(),
  bagKg: z.number().nullable(),
  boards: z.array(cuttingPlanDtoSchema),
  missing: z.array(messageSchema),
});
export type PurchaseDto = z.infer<typeof purchaseDtoSchema>;

export const quantitiesDtoSchema = z.object({
  currency: z.string(),
  lines: z.array(quantityLineDtoSchema),
  split: quantitySplitDtoSchema,
  purchases: z.array(purchaseDtoSchema),
  markUpPercent: z.string(),
  /** null where the cost is */
  markUp: z.string().nullable(),
  totalWithMarkUp: z.string().nullable(),
  /** members being recalculated: nothing of them is counted here yet */
  unassessed: z.number(),
  /** names of the ids that occur */
  names: z.record(z.string(), z.string()),
});
export type QuantitiesDto = z.infer<typeof quantitiesDtoSchema>;
