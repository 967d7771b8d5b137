import { z } from 'zod';

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

export const quantityAmountKeys = [
  'grossM2', 'endLapM2', 'openingM2', 'coatBackM2', 'netM2', 'volumeM3', 'litres', 'kg', 'sheetM2', 'materialCost', 'labourCost', 'cost',
] as const;
