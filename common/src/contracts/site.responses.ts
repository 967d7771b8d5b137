import { z } from 'zod';
import { memberTypes } from './actions.js';
import { idSchema } from './primitives.js';
import { productKinds } from './products.js';

/** What to apply, where: from the issued revision only. */
export const siteItemDtoSchema = z.object({
  mark: z.string(), section: z.string(), memberType: z.enum(memberTypes), quantity: z.number(), lengthMm: z.number(), faces: z.string(),
  productName: z.string(), kind: z.enum(productKinds), thickness: z.string(), wetThickness: z.string().nullable(), coats: z.number().nullable(), layers: z.string().nullable(),
  areaM2: z.string(), litres: z.string().nullable(),
});
export type SiteItemDto = z.infer<typeof siteItemDtoSchema>;
export const siteMaterialDtoSchema = z.object({
  /** boards are bought by thickness, one entry each; null for coatings and sprays */
  thickness: z.string().nullable(),
  productName: z.string(), kind: z.enum(productKinds), areaM2: z.string(),
  litres: z.string().nullable(), containers: z.number().nullable(), kg: z.string().nullable(),
  sheets: z.number().nullable(), sheetSize: z.string().nullable(), wastePercent: z.string().nullable(),
  /** stock sheet used, cutting waste included */
  sheetM2: z.string().nullable(),
  volumeM3: z.string().nullable(), bags: z.number().nullable(),
  /** null unless prices are given to the contractor */
  money: z.string().nullable(),
});
export type SiteMaterialDto = z.infer<typeof siteMaterialDtoSchema>;
export const siteBareDtoSchema = z.object({ mark: z.string(), section: z.string(), memberType: z.enum(memberTypes), quantity: z.number() });
export type SiteBareDto = z.infer<typeof siteBareDtoSchema>;
export const siteZoneDtoSchema = z.object({
  id: idSchema, code: z.string(), name: z.string(), periodMin: z.number(),
  items: z.array(siteItemDtoSchema), bare: z.array(siteBareDtoSchema), materials: z.array(siteMaterialDtoSchema),
});
export type SiteZoneDto = z.infer<typeof siteZoneDtoSchema>;
export const siteLevelDtoSchema = z.object({
  id: idSchema, code: z.string(), name: z.string(), elevationM: z.number(), zones: z.array(siteZoneDtoSchema), materials: z.array(siteMaterialDtoSchema),
  /** whole containers, bags and sheets if this floor is delivered by itself; empty where the frozen record does not say */
  purchase: z.array(siteMaterialDtoSchema),
});
export type SiteLevelDto = z.infer<typeof siteLevelDtoSchema>;
export const siteDtoSchema = z.object({
  project: z.object({ number: z.string(), name: z.string(), place: z.string(), currency: z.string() }).nullable(),
  revision: z.object({ id: idSchema, code: z.string(), issuedAt: z.string(), pdfSha256: z.string(), pdfAvailable: z.boolean() }).nullable(),
  levels: z.array(siteLevelDtoSchema),
  /** bought once for the whole job: containers and sheets rounded up once per product */
  purchase: z.array(siteMaterialDtoSchema),
  /** whether prices are shown to whoever asks */
  prices: z.boolean(),
});
export type SiteDto = z.infer<typeof siteDtoSchema>;
