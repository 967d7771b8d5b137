import { z } from 'zod';
import { importFields, importMappingSchema, importRowStates } from './imports.js';
import { idSchema } from './primitives.js';

export const importSheetDtoSchema = z.object({
  name: z.string(),
  /** up to the last one with content */
  rows: z.number(),
  /** 1-based, as understood */
  headerRow: z.number(),
  headers: z.array(z.string()),
  /** what this sheet's headers were taken to mean */
  columns: importMappingSchema.shape.columns,
  /** the first 20 rows as they stand, titles and headers included: [0] is row 1 */
  firstRows: z.array(z.array(z.string())),
});
export type ImportSheetDto = z.infer<typeof importSheetDtoSchema>;
export const importDtoSchema = z.object({
  id: idSchema,
  fileName: z.string(),
  state: z.enum(['mapping', 'previewed', 'confirmed', 'abandoned']),
  createdAt: z.string(),
  sheets: z.array(importSheetDtoSchema),
  mapping: importMappingSchema,
  /** what was understood of the headers, and what was not */
  notes: z.array(z.string()),
});
export type ImportDto = z.infer<typeof importDtoSchema>;
export const importRowDtoSchema = z.object({
  row: z.number(),
  state: z.enum(importRowStates),
  mark: z.string(),
  values: z.partialRecord(z.enum(importFields), z.string()),
  problems: z.array(z.object({ column: z.string(), sentence: z.string() })),
  changes: z.array(z.object({ field: z.enum(importFields), old: z.string(), new: z.string() })),
});
export type ImportRowDto = z.infer<typeof importRowDtoSchema>;
export const importPreviewDtoSchema = z.object({
  /** what was skipped or ignored, in sentences */
  notes: z.array(z.string()),
  counts: z.record(z.enum(importRowStates), z.number()),
  rows: z.array(importRowDtoSchema),
  total: z.number(),
  page: z.number(),
  pageSize: z.number(),
});
export type ImportPreviewDto = z.infer<typeof importPreviewDtoSchema>;
export const importResultDtoSchema = z.object({ added: z.number(), changed: z.number(), unchanged: z.number(), leftOut: z.number() });
export type ImportResultDto = z.infer<typeof importResultDtoSchema>;
