import { z } from 'zod';
import { messageSchema } from './messages.responses.js';
import { evidenceRangeSchema } from './evidence-range.js';
import { idSchema } from './primitives.js';
import { evidenceForms, productInputSchema, thicknessTableSchema } from './products.js';

export const productDtoSchema = productInputSchema.extend({
  id: idSchema,
  projectId: idSchema.nullable(),
  version: z.number(),
  expired: z.boolean(),
  /** name, size and digest of the uploaded evidence file, if any */
  evidenceFile: z.object({ name: z.string(), bytes: z.number(), sha256: z.string() }).nullable(),
});
export type ProductDto = z.infer<typeof productDtoSchema>;
export const productSummaryDtoSchema = productDtoSchema.omit({ evidence: true }).extend({ form: z.enum(evidenceForms), range: evidenceRangeSchema, usedByZones: z.number() });
export type ProductSummaryDto = z.infer<typeof productSummaryDtoSchema>;
/** messages: what keeps the table from being used as it stands; empty where nothing does */
export const readTableDtoSchema = z.object({ table: thicknessTableSchema, messages: z.array(messageSchema) });
export type ReadTableDto = z.infer<typeof readTableDtoSchema>;
