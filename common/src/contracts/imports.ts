import { z } from 'zod';
import { idSchema } from './primitives.js';
import { memberTypes, steelGrades } from './actions.js';
import { exposureArrangements, protectionForms } from './fire.js';

/** What a column of a member schedule may hold. The last ones need the structural engineer's role. */
export const importFields = [
  'mark', 'level', 'zone', 'memberType', 'section', 'grade', 'length', 'quantity', 'exposure', 'protectionForm', 'note',
  'criticalTemperature', 'utilisation', 'reference',
] as const;
export type ImportField = (typeof importFields)[number];
export const structuralImportFields = ['criticalTemperature', 'utilisation', 'reference'] as const satisfies readonly ImportField[];
export const importFieldNames: Record<ImportField, string> = {
  mark: 'Mark', level: 'Level', zone: 'Zone', memberType: 'Type', section: 'Section', grade: 'Steel grade', length: 'Length',
  quantity: 'Number off', exposure: 'Exposure', protectionForm: 'Protection form', note: 'Note',
  criticalTemperature: 'Critical temperature', utilisation: 'Utilisation in fire', reference: 'Reference',
};
export const importLengthUnits = ['mm', 'm', 'cm', 'ft', 'ft-in', 'in'] as const;

export const importMappingSchema = z.object({
  sheet: z.string().max(200),
  /** 1-based row of the headers */
  headerRow: z.number().int().min(1).max(1000),
  /** field → 0-based column; a field left out is not read */
  columns: z.partialRecord(z.enum(importFields), z.number().int().min(0).max(1000)),
  lengthUnit: z.enum(importLengthUnits).default('mm'),
  temperatureUnit: z.enum(['C', 'F']).default('C'),
  /** for new members, where the file has no column or an empty cell; a member already there keeps what it has */
  defaults: z.object({
    zoneId: idSchema.nullable().default(null),
    memberType: z.enum(memberTypes).nullable().default(null),
    grade: z.enum(steelGrades).nullable().default(null),
    exposure: z.enum(exposureArrangements).nullable().default(null),
    protectionForm: z.enum(protectionForms).nullable().default(null),
  }),
});
export type ImportMapping = z.infer<typeof importMappingSchema>;
export const importConfirmSchema = z.object({ leaveOutWrongRows: z.boolean().default(false) });
export type ImportConfirm = z.infer<typeof importConfirmSchema>;

export interface ImportSheetDto {
  name: string;
  /** up to the last one with content */
  rows: number;
  /** 1-based, as understood */
  headerRow: number;
  headers: string[];
  /** what this sheet's headers were taken to mean */
  columns: ImportMapping['columns'];
  /** the first 20 rows as they stand, titles and headers included: [0] is row 1 */
  firstRows: string[][];
}
export interface ImportDto {
  id: string; fileName: string; state: 'mapping' | 'previewed' | 'confirmed' | 'abandoned'; createdAt: string;
  sheets: ImportSheetDto[];
  mapping: ImportMapping;
  /** what was understood of the headers, and what was not */
  notes: string[];
}
export type ImportRowState = 'new' | 'changed' | 'unchanged' | 'wrong';
export interface ImportRowDto {
  row: number;
  state: ImportRowState;
  mark: string;
  values: Partial<Record<ImportField, string>>;
  problems: { column: string; sentence: string }[];
  changes: { field: ImportField; old: string; new: string }[];
}
export interface ImportPreviewDto {
  /** what was skipped or ignored, in sentences */
  notes: string[];
  counts: Record<ImportRowState, number>;
  rows: ImportRowDto[];
  total: number; page: number; pageSize: number;
}
export const importPreviewQuerySchema = z.object({
  state: z.enum(['new', 'changed', 'unchanged', 'wrong']).optional(),
  page: z.coerce.number().int().min(1).default(1),
  pageSize: z.coerce.number().int().min(1).max(500).default(100),
});
export interface ImportResultDto { added: number; changed: number; unchanged: number; leftOut: number }
