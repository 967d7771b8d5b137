import type { MemberType, Role, VerdictKind } from '@mantlet/common';
import type { EntityManager } from 'typeorm';
import { blockerOf } from './open-items.js';

interface Group { projectId: string; inWork: boolean; zoneId: string; memberType: MemberType; verdict: VerdictKind | null; code: string | null; assumed: boolean }

/**
 * How many blockers wait for each role, from the stored results alone, for a list of many projects: one item a finding and zone, as
 * openItems lists them. Results older than their inputs are not seen here: to see them, every input must be read.
 */
export async function waitingCounts(manager: EntityManager, projectIds: readonly string[]): Promise<Map<string, Map<Role, number>>> {
  const groups = await manager.query<Group[]>(
    `SELECT DISTINCT m.project_id AS "projectId", m.zone_id AS "zoneId", m.member_type AS "memberType", r.verdict, r.reason->>'code' AS code,
            coalesce(r.assumed, false) AS assumed, EXISTS (SELECT 1 FROM jobs j WHERE j.project_id = m.project_id AND j.state IN ('waiting', 'running')) AS "inWork"
       FROM members m LEFT JOIN member_results r ON r.member_id = m.id WHERE m.project_id = ANY($1)`, [projectIds]);
  const expired = await expiredProducts(manager, projectIds);
  return new Map(projectIds.map((id) => {
    const own = groups.filter((group) => group.projectId === id);
    return [id, countByRole([...findings(own), ...expired.filter((one) => one.projectId === id).map((): [string, Role] => ['expired', 'specifier'])])];
  }));
}

/** Each once, with who must act. */
function findings(groups: readonly Group[]): [string, Role][] {
  if (groups.length === 0) return [['no-members', 'specifier']];
  const found = new Map<string, Role>();
  for (const { zoneId, memberType, verdict, code, assumed, inWork } of groups) {
    const blocker = verdict && blockerOf({ memberType, verdict, assumed, reason: code === null ? null : { code } });
    // what a worker is at waits for nobody
    if (verdict === null && !inWork) found.set('stale', 'specifier');
    else if (blocker) found.set(`${blocker.code}|${zoneId}`, blocker.role);
  }
  return [...found];
}

function expiredProducts(manager: EntityManager, projectIds: readonly string[]): Promise<{ projectId: string }[]> {
  return manager.query(
    `SELECT DISTINCT m.project_id AS "projectId", p.id
       FROM members m JOIN member_results r ON r.member_id = m.id JOIN products p ON p.id = r.product_id
      WHERE m.project_id = ANY($1) AND r.verdict = 'protected' AND p.evidence_expires_on < (now() AT TIME ZONE 'UTC')::date`, [projectIds]);
}

function countByRole(found: readonly [string, Role][]): Map<Role, number> {
  const counts = new Map<Role, number>();
  for (const [, role] of found) counts.set(role, (counts.get(role) ?? 0) + 1);
  return counts;
}
