import type { ProductKind } from './products.js';
import type { MemberType } from './actions.js';

/** What to apply, where: from the issued revision only. */
export interface SiteItemDto {
  mark: string; section: string; memberType: MemberType; quantity: number; lengthMm: number; faces: string;
  productName: string; kind: ProductKind; thickness: string; wetThickness: string | null; coats: number | null; layers: string | null;
  areaM2: string; litres: string | null;
}
export interface SiteMaterialDto {
  /** boards are bought by thickness, one entry each; null for coatings and sprays */
  thickness: string | null;
  productName: string; kind: ProductKind; areaM2: string;
  litres: string | null; containers: number | null; kg: string | null; sheets: number | null; sheetSize: string | null; wastePercent: string | null;
  /** stock sheet used, cutting waste included */
  sheetM2: string | null;
  volumeM3: string | null; bags: number | null;
  /** null unless prices are given to the contractor */
  money: string | null;
}
export interface SiteBareDto { mark: string; section: string; memberType: MemberType; quantity: number }
export interface SiteZoneDto { id: string; code: string; name: string; periodMin: number; items: SiteItemDto[]; bare: SiteBareDto[]; materials: SiteMaterialDto[] }
export interface SiteLevelDto { id: string; code: string; name: string; elevationM: number; zones: SiteZoneDto[]; materials: SiteMaterialDto[];
  /** whole containers, bags and sheets if this floor is delivered by itself; empty where the frozen record does not say */
  purchase: SiteMaterialDto[];
}
export interface SiteDto {
  project: { number: string; name: string; place: string; currency: string } | null;
  revision: { id: string; code: string; issuedAt: string; pdfSha256: string; pdfAvailable: boolean } | null;
  levels: SiteLevelDto[];
  /** bought once for the whole job: containers and sheets rounded up once per product */
  purchase: SiteMaterialDto[];
  /** whether prices are shown to whoever asks */
  prices: boolean;
}
