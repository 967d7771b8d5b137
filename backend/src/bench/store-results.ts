import { once } from 'node:events';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { MemberResultDto } from '@mantlet/common';
import type { Client } from 'pg';
import { from as copyFrom } from 'pg-copy-streams';

/** A table of the same columns, keys and indexes as the real one, without its foreign keys: that favours the database. */
const table = 'measured_results';

export async function createTable(client: Client): Promise<void> {
  await client.query(`DROP TABLE IF EXISTS ${table}`);
  await client.query(`CREATE TABLE ${table} (LIKE member_results INCLUDING ALL)`);
}

export async function dropTable(client: Client): Promise<void> {
  await client.query(`DROP TABLE IF EXISTS ${table}`);
}

const columns = [
  'member_id', 'inputs_hash', 'assessed_at', 'verdict', 'reason', 'heated_perimeter_mm', 'section_factor_per_m', 'coated_girth_mm',
  'critical_temperature_c', 'bare_critical_temperature_c', 'way', 'method', 'governing', 'utilisation', 'assumed', 'bare_minutes',
  'bare_temperature_c', 'required_thickness', 'applied_thickness', 'thickness_unit', 'layers', 'product_id', 'evidence_reading', 'area_m2', 'open',
];

function field(value: unknown): string {
  if (value === null || value === undefined) return '\\N';
  if (Array.isArray(value)) return `{${value.join(',')}}`;
  if (typeof value === 'object') return escaped(JSON.stringify(value));
  return typeof value === 'string' ? escaped(value) : String(value);
}

function escaped(text: string): string {
  return text.replace(/[\\\n\t\r]/g, (c) => ({ '\\': '\\\\', '\n': '\\n', '\t': '\\t', '\r': '\\r' })[c] as string);
}

/** COPY's text format, made ready before the clock runs: the database is measured, not the writing of text. */
export function copyText(results: readonly MemberResultDto[]): Buffer {
  const rows = results.map((r, i) => [
    `00000000-0000-4000-9000-${i.toString(16).padStart(12, '0')}`, i.toString(16).padStart(64, 'e'), '2026-01-01T00:00:00Z', r.verdict, r.reason,
    r.heatedPerimeterMm, r.sectionFactorPerM, r.coatedGirthMm, r.criticalTemperatureC, r.bareCriticalTemperatureC, r.way, r.method, r.governing,
    r.utilisation, r.assumed, r.bareMinutes, r.bareTemperatureC, r.requiredThickness, r.requiredThickness, r.thicknessUnit, r.layers, r.productId,
    r.evidenceReading, r.heatedPerimeterMm === null ? null : r.heatedPerimeterMm / 100, r.reason !== null,
  ].map(field).join('\t'));
  return Buffer.from(`${rows.join('\n')}\n`);
}

/** Milliseconds from the start of COPY into the empty table to the end of its transaction. */
export async function timeStoring(client: Client, text: Buffer): Promise<number> {
  await client.query(`TRUNCATE ${table}`);
  await client.query('CHECKPOINT').catch(() => undefined);
  const start = performance.now();
  const stream = client.query(copyFrom(`COPY ${table} (${columns.join(', ')}) FROM STDIN`));
  await pipeline(Readable.from([text]), stream);
  if (!stream.writableFinished) await once(stream, 'finish');
  return performance.now() - start;
}

export async function countStored(client: Client): Promise<number> {
  const { rows } = await client.query<{ count: string }>(`SELECT count(*) FROM ${table}`);
  return Number(rows[0]?.count ?? 0);
}
