import { z } from 'zod';
import type { Message } from '../errors/message.js';
import type { MemberType } from './actions.js';
import type { ProductKind } from './products.js';

/** What quantities can be split by. `profile` is open against hollow, `application` on against off site. */
export const splitKeys = ['level', 'zone', 'product', 'thickness', 'member-type', 'profile', 'application'] as const;
export type SplitKey = (typeof splitKeys)[number];
export const splitKeyNames: Record<SplitKey, string> = {
  level: 'Level', zone: 'Zone', product: 'System', thickness: 'Thickness', 'member-type': 'Member type', profile: 'Open or hollow', application: 'On or off site',
};
export const profileClasses = ['open', 'hollow'] as const;
export type ProfileClass = (typeof profileClasses)[number];

/** delivery: whole containers, sheets and bags are counted for the whole project at once, or for each level by itself */
export const deliveryRules = ['project', 'level'] as const;
export const quantityQuerySchema = z
  .object({
    rows: z.enum(splitKeys).default('level'),
    columns: z.enum(splitKeys).default('product'),
    delivery: z.enum(deliveryRules).default('project'),
  })
  .refine((q) => q.rows !== q.columns, { path: ['columns'], error: 'must differ from the rows' });
export type QuantityQuery = z.infer<typeof quantityQuerySchema>;

/**
 * Printed quantities. Decimal strings with a fixed count of places (m² 2, m³ 4, L and kg 2, money the currency's), so that sums of
 * printed lines are exact. null: does not apply to this kind of product, or not determined, which `missing` then explains.
 */
export interface QuantityAmounts {
  /** coated girth × length × number; boards: outer box girth */
  grossM2: string;
  endLapM2: string;
  openingM2: string;
  coatBackM2: string;
  /** gross − end laps − openings + coat-back */
  netM2: string;
  /** material in place: dry film, board or spray */
  volumeM3: string;
  litres: string | null;
  /** coatings and sprays, by density or bag */
  kg: string | null;
  /** boards: stock sheet used, cutting waste included */
  sheetM2: string | null;
  materialCost: string | null;
  labourCost: string | null;
  /** both together; null unless all that applies is priced */
  cost: string | null;
}
export const quantityAmountKeys = [
  'grossM2', 'endLapM2', 'openingM2', 'coatBackM2', 'netM2', 'volumeM3', 'litres', 'kg', 'sheetM2', 'materialCost', 'labourCost', 'cost',
] as const satisfies readonly (keyof QuantityAmounts)[];

/** The smallest printed cell: members that share level, zone, product, thickness, type, profile class and place of application. */
export interface QuantityLineDto extends QuantityAmounts {
  levelId: string;
  zoneId: string;
  productId: string;
  kind: ProductKind;
  thickness: number;
  thicknessUnit: 'µm' | 'mm';
  layers: number[] | null;
  memberType: MemberType;
  profile: ProfileClass;
  onSite: boolean;
  memberIds: string[];
  marks: number;
  pieces: number;
  lengthM: string;
  /** coatings: all coats together */
  wetFilmUm: string | null;
  coats: number | null;
  spreadingRateM2PerL: string | null;
  missing: Message[];
}

export interface QuantityTotals extends QuantityAmounts {
  lines: number;
  pieces: number;
  /** why an amount is null although it applies; each sentence once */
  missing: Message[];
}

export interface QuantitySplitDto {
  rows: { key: string; totals: QuantityTotals }[];
  columns: { key: string; totals: QuantityTotals }[];
  cells: { row: string; column: string; totals: QuantityTotals }[];
  total: QuantityTotals;
}

export interface CuttingPlanDto {
  thicknessMm: number;
  sheetLengthMm: number;
  sheetWidthMm: number;
  kerfMm: number;
  sheets: number;
  /** no plan can do with fewer */
  leastSheets: number;
  usedM2: number;
  sheetM2: number;
  wasteFraction: number;
  patterns: CuttingPatternDto[];
}
/** Sheets cut alike: strips across the width, pieces along each strip. */
export interface CuttingPatternDto {
  sheets: number;
  strips: { widthMm: number; pieces: { lengthMm: number; widthMm: number }[] }[];
}

/** What to order for one product and delivery; whole containers, sheets or bags, rounded up once. */
export interface PurchaseDto {
  productId: string;
  /** null: the whole project */
  levelId: string | null;
  kind: ProductKind;
  litres: string | null;
  containers: number | null;
  containerL: number | null;
  bags: number | null;
  bagKg: number | null;
  boards: CuttingPlanDto[];
  missing: Message[];
}

export interface QuantitiesDto {
  currency: string;
  lines: QuantityLineDto[];
  split: QuantitySplitDto;
  purchases: PurchaseDto[];
  markUpPercent: string;
  /** null where the cost is */
  markUp: string | null;
  totalWithMarkUp: string | null;
  /** names of the ids that occur */
  names: Record<string, string>;
}
