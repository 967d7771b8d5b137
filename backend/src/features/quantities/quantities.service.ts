import { Injectable } from '@nestjs/common';
import type { ProductKind } from '@mantlet/common';

/** What one product covers in the project, as the building page shows it. */
export interface ProductTotal {
  productId: string;
  productName: string;
  kind: ProductKind;
  members: number;
  /** net area, m², 2 decimals */
  areaM2: number;
  /** what to buy, in words: "1,240 L", "312 sheets", "4.2 m³"; null where the product's supply data lack something */
  net: string | null;
}

/** Quantities of material from the results as they stand. */
@Injectable()
export class QuantitiesService {
  async totalsByProduct(_projectId: string): Promise<ProductTotal[]> {
    return [];
  }
}
