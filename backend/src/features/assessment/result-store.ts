import type { EntityManager } from 'typeorm';
import { canonicalJson } from '../../shared/canonical-json.js';
import type { MemberOutcome, ZoneOutcome } from './zone-outcome.js';

/** property and column of what is stored of a member, with the column's type */
const columns = [
  ['inputsHash', 'inputs_hash', 'text'], ['verdict', 'verdict', 'text'], ['reason', 'reason', 'jsonb'],
  ['heatedPerimeterMm', 'heated_perimeter_mm', 'double precision'], ['sectionFactorPerM', 'section_factor_per_m', 'double precision'],
  ['coatedGirthMm', 'coated_girth_mm', 'double precision'], ['criticalTemperatureC', 'critical_temperature_c', 'double precision'],
  ['bareCriticalTemperatureC', 'bare_critical_temperature_c', 'double precision'], ['way', 'way', 'text'], ['method', 'method', 'text'],
  ['governing', 'governing', 'text'], ['utilisation', 'utilisation', 'double precision'], ['assumed', 'assumed', 'boolean'],
  ['bareMinutes', 'bare_minutes', 'double precision'], ['bareTemperatureC', 'bare_temperature_c', 'double precision'],
  ['requiredThickness', 'required_thickness', 'double precision'], ['appliedThickness', 'applied_thickness', 'double precision'],
  ['thicknessUnit', 'thickness_unit', 'text'], ['layers', 'layers', 'double precision[]'], ['productId', 'product_id', 'uuid'],
  ['evidenceReading', 'evidence_reading', 'text'], ['areaM2', 'area_m2', 'double precision'], ['open', 'open', 'boolean'],
] as const satisfies readonly (readonly [keyof MemberOutcome, string, string])[];

const outcomeColumns = columns.filter(([property]) => property !== 'inputsHash');

function equal(a: unknown, b: unknown): boolean {
  if (a === b) return true;
  return typeof a === 'object' && typeof b === 'object' && a !== null && b !== null && canonicalJson(a) === canonicalJson(b);
}

const selected = columns.map(([property, column]) => `r.${column} AS "${property}"`).join(', ');
/** how many rows go into one statement */
const CHUNK = 5000;

/** Stored results by member, of these zones, with the same properties as an outcome. */
export async function storedOutcomes(manager: EntityManager, zoneIds: string[]): Promise<Map<string, MemberOutcome>> {
  const rows = await manager.query<MemberOutcome[]>(
    `SELECT r.member_id AS "memberId", ${selected} FROM member_results r JOIN members m ON m.id = r.member_id WHERE m.zone_id = ANY($1)`, [zoneIds]);
  return new Map(rows.map((row) => [row.memberId, row]));
}

/** Writes the results that differ from what is stored; the number of members whose outcome, not only its inputs, is another than before. */
export async function storeOutcomes(manager: EntityManager, zoneIds: string[], outcomes: readonly MemberOutcome[]): Promise<number> {
  const stored = await storedOutcomes(manager, zoneIds);
  let changed = 0;
  const different = outcomes.filter((outcome) => {
    const before = stored.get(outcome.memberId);
    const same = before !== undefined && outcomeColumns.every(([property]) => equal(before[property], outcome[property]));
    if (!same) changed += 1;
    return !same || before.inputsHash !== outcome.inputsHash;
  });
  for (let at = 0; at < different.length; at += CHUNK) await upsert(manager, different.slice(at, at + CHUNK));
  return changed;
}

async function upsert(manager: EntityManager, outcomes: readonly MemberOutcome[]): Promise<void> {
  const names = columns.map(([, column]) => column);
  const rows = outcomes.map((outcome) => ({ member_id: outcome.memberId, ...Object.fromEntries(columns.map(([property, column]) => [column, outcome[property]])) }));
  await manager.query(
    `INSERT INTO member_results (member_id, assessed_at, ${names.join(', ')})
     SELECT r.member_id, now(), ${names.map((name) => `r.${name}`).join(', ')}
     FROM json_to_recordset($1::json) AS r(member_id uuid, ${columns.map(([, column, type]) => `${column} ${type}`).join(', ')})
     ORDER BY r.member_id
     ON CONFLICT (member_id) DO UPDATE SET assessed_at = now(), ${names.map((name) => `${name} = excluded.${name}`).join(', ')}`,
    [JSON.stringify(rows)]);
}

export async function storeZones(manager: EntityManager, zones: readonly ZoneOutcome[]): Promise<void> {
  await manager.query(
    `INSERT INTO zone_results (zone_id, inputs_hash, assessed_at, members, settled, open, protected_area_m2, targets)
     SELECT "zoneId", "inputsHash", now(), members, settled, open, "protectedAreaM2", targets
     FROM json_to_recordset($1::json) AS r("zoneId" uuid, "inputsHash" text, members integer, settled integer, open integer, "protectedAreaM2" double precision, targets jsonb)
     ON CONFLICT (zone_id) DO UPDATE SET inputs_hash = excluded.inputs_hash, assessed_at = now(), members = excluded.members,
       settled = excluded.settled, open = excluded.open, protected_area_m2 = excluded.protected_area_m2, targets = excluded.targets`,
    [JSON.stringify(zones)]);
}

/**
 * Takes the results of these zones (all where null) away: they would be older than their inputs.
 * @returns how many members of the project are without a result now
 */
export async function withdrawResults(manager: EntityManager, projectId: string, zoneIds: string[] | null): Promise<number> {
  const ofZones = 'SELECT id FROM zones WHERE project_id = $1 AND ($2::uuid[] IS NULL OR id = ANY($2))';
  await manager.query(`DELETE FROM member_results r USING members m WHERE m.id = r.member_id AND m.zone_id IN (${ofZones})`, [projectId, zoneIds]);
  await manager.query(`DELETE FROM zone_results WHERE zone_id IN (${ofZones})`, [projectId, zoneIds]);
  return unassessed(manager, projectId);
}

/** Members of a project that have no result: a worker is at them, or will be. */
export async function unassessed(manager: EntityManager, projectId: string): Promise<number> {
  const [row] = await manager.query<{ n: number }[]>(
    'SELECT count(*)::int AS n FROM members m LEFT JOIN member_results r ON r.member_id = m.id WHERE m.project_id = $1 AND r.member_id IS NULL', [projectId]);
  return row?.n ?? 0;
}
