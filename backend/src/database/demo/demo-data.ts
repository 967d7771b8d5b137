import { readFile } from 'node:fs/promises';
import path from 'node:path';
import {
  acceptanceKinds, codeSchema, criticalTemperatureBasisSchema, emailSchema, evidenceSchema, levelInputSchema, memberTypes, productInputSchema, projectInputSchema,
  revisionInputSchema, setUpSchema, takeoffSettingsUpdateSchema, zoneInputSchema, zoneProtectionSchema,
} from '@mantlet/common';
import type { CriticalTemperatureBasis, MemberType, ProductInput, ThicknessTable } from '@mantlet/common';
import { parse } from 'csv-parse/sync';
import { z } from 'zod';

/** The same place seen from the sources and from the build: both lie three folders below the package. */
const folder = path.resolve(import.meta.dirname, '../../../../seeds/demo');

const accountSchema = setUpSchema.extend({ role: z.string() });
const scheduleSchema = z.object({ members: z.string(), structural: z.string() });
const systemsSchema = z.partialRecord(z.enum(memberTypes), z.string());
const scenarioSchema = z.object({
  project: projectInputSchema,
  administrator: emailSchema,
  team: z.object({
    fireEngineer: emailSchema, structuralEngineer: emailSchema, specifier: emailSchema, checker: emailSchema,
    contractor: emailSchema, inspector: emailSchema, reader: emailSchema,
  }),
  takeoff: takeoffSettingsUpdateSchema.omit({ version: true }),
  levels: z.array(levelInputSchema).min(1),
  zones: z.array(
    zoneInputSchema.pick({ code: true, name: true, periodMin: true }).extend({
      level: codeSchema, environment: zoneProtectionSchema.shape.environment, policy: zoneProtectionSchema.shape.targetPolicy, systems: z.string(),
    }),
  ).min(1),
  zoneReference: z.string(),
  systems: z.record(z.string(), systemsSchema),
  schedule: scheduleSchema,
  signatures: z.partialRecord(z.enum(acceptanceKinds), z.string()),
  issued: revisionInputSchema,
  draft: z.object({
    revision: revisionInputSchema,
    zones: z.array(zoneInputSchema.pick({ code: true, periodMin: true, reference: true })),
    schedule: scheduleSchema,
    'taken out': z.array(codeSchema),
  }),
});
export type Scenario = z.infer<typeof scenarioSchema>;
export type DemoSchedule = z.infer<typeof scheduleSchema>;
export type DemoAccount = z.infer<typeof accountSchema>;
export type DemoSystems = Partial<Record<MemberType, string>>;

export interface DemoFile { name: string; content: Buffer }
export interface DemoProduct { input: ProductInput; evidenceFile: DemoFile | null }

export const readAccounts = async (): Promise<DemoAccount[]> => z.array(accountSchema).parse(await readJson('accounts.json'));
export const readScenario = async (): Promise<Scenario> => scenarioSchema.parse(await readJson('project.json'));
export const readDemoFile = async (name: string): Promise<DemoFile> => ({ name, content: await readFile(path.join(folder, name)) });

async function readJson(name: string): Promise<unknown> {
  return JSON.parse(await readFile(path.join(folder, name), 'utf8'));
}

async function readRows(name: string): Promise<Record<string, string>[]> {
  return parse(await readFile(path.join(folder, name)), { columns: true, bom: true, skip_empty_lines: true });
}

const evidenceFileSchema = z.object({ form: z.literal('table'), file: z.string() });
const productFileSchema = z.array(productInputSchema.omit({ evidence: true }).extend({ evidence: z.union([evidenceFileSchema, evidenceSchema]) }));

/** Products as a person would enter them; thickness tables stand in a file of their own, which is kept as the evidence file too. */
export async function readProducts(): Promise<DemoProduct[]> {
  const products = productFileSchema.parse(await readJson('products.json'));
  return Promise.all(
    products.map(async ({ evidence, ...rest }) => {
      if (!('file' in evidence)) return { input: { ...rest, evidence }, evidenceFile: null };
      const tables = await readTables(evidence.file);
      return { input: productInputSchema.parse({ ...rest, evidence: { form: 'table', tables } }), evidenceFile: await readDemoFile(evidence.file) };
    }),
  );
}

/** A row for each section factor of each table; columns t350 … t750 hold µm, an empty one is outside the assessment. */
async function readTables(name: string): Promise<ThicknessTable[]> {
  const rows = await readRows(name);
  const columns = Object.keys(rows[0] ?? {}).filter((key) => /^t\d+$/.test(key));
  const tables = new Map<string, { shape: string | undefined; orientation: string | undefined; periodMin: number; temperaturesC: number[]; sectionFactorsPerM: number[]; thickness: (number | null)[][] }>();
  for (const row of rows) {
    const key = `${row['shape']}/${row['orientation']}/${row['period_min']}`;
    const table = tables.get(key) ?? {
      shape: row['shape'], orientation: row['orientation'], periodMin: Number(row['period_min']), temperaturesC: columns.map((column) => Number(column.slice(1))),
      sectionFactorsPerM: [], thickness: [],
    };
    table.sectionFactorsPerM.push(Number(row['section_factor_per_m']));
    table.thickness.push(columns.map((column) => (row[column] ? Number(row[column]) : null)));
    tables.set(key, table);
  }
  // the product's own schema settles whether shape and orientation are known
  return [...tables.values()] as ThicknessTable[];
}

/** How each member's critical temperature comes about, by mark. Forces in kN, moments in kNm, lengths in mm, temperatures in °C. */
export async function readBases(name: string): Promise<Map<string, CriticalTemperatureBasis>> {
  const rows = await readRows(name);
  return new Map(rows.map((row) => [row['mark'] ?? '', criticalTemperatureBasisSchema.parse(basisOf(row))]));
}

function basisOf(row: Record<string, string>): unknown {
  const { way, reference } = row;
  const number = (key: string): number | undefined => (row[key] ? Number(row[key]) : undefined);
  const effects = (prefix: string) => ({ axialKn: number(`${prefix}_axial_kn`), momentYKnm: number(`${prefix}_moment_knm`), shearZKn: number(`${prefix}_shear_kn`) });
  switch (way) {
    case 'declared': return { way, reference, temperatureC: number('temperature_c') };
    case 'utilisation': return { way, reference, mu0: number('mu0') };
    case 'ambient-utilisation': return { way, reference, utilisation: number('utilisation') };
    case 'calculated': {
      const actions = { given: 'characteristic', permanent: effects('permanent'), leading: { ...effects('variable'), category: row['category'] } };
      const lengths = { bucklingLengthYMm: number('buckling_length_y_mm'), bucklingLengthZMm: number('buckling_length_z_mm') };
      return { way, reference, design: { actions, ...lengths, bucklingRule: row['buckling_rule'] || undefined, lateralRestraint: number('permanent_moment_knm') ? 'continuous' : undefined } };
    }
    default: return { way };
  }
}
