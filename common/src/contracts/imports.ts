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

export const importRowStates = ['new', 'changed', 'unchanged', 'wrong'] as const;
export type ImportRowState = (typeof importRowStates)[number];
export const importPreviewQuerySchema = z.object({
  state: z.enum(importRowStates).optional(),
  page: z.coerce.number().int().min(1).default(1),
  pageSize: z.coerce.number().int().min(1).max(500).default(100),
});
