import type { EntityManager } from 'typeorm';

/** Members as counted in the schedule: one mark each. Settled: with a result that nothing keeps open. */
export interface Tally {
  members: number;
  settled: number;
  open: number;
  protectedAreaM2: number;
  /** without a result: being recalculated */
  unassessed: number;
}
export const emptyTally: Tally = { members: 0, settled: 0, open: 0, protectedAreaM2: 0, unassessed: 0 };

/** One row a zone that has members, for each of the projects. */
export async function tallyZones(manager: EntityManager, projectIds: readonly string[]): Promise<(Tally & { projectId: string; zoneId: string })[]> {
  const rows: { projectId: string; zoneId: string; members: string; settled: string; unassessed: string; area: number | null }[] = await manager.query(
    `SELECT m.project_id AS "projectId", m.zone_id AS "zoneId", count(*) AS members,
            count(*) FILTER (WHERE NOT r.open) AS settled, count(*) FILTER (WHERE r.member_id IS NULL) AS unassessed, sum(r.area_m2) AS area
       FROM members m LEFT JOIN member_results r ON r.member_id = m.id
      WHERE m.project_id = ANY($1) GROUP BY m.project_id, m.zone_id`,
    [projectIds],
  );
  return rows.map(({ projectId, zoneId, members, settled, unassessed, area }) => ({
    projectId, zoneId, members: Number(members), settled: Number(settled), open: Number(members) - Number(settled), protectedAreaM2: area ?? 0,
    unassessed: Number(unassessed),
  }));
}

export function sumTallies(tallies: readonly Tally[]): Tally {
  return tallies.reduce<Tally>(
    (sum, one) => ({
      members: sum.members + one.members, settled: sum.settled + one.settled, open: sum.open + one.open,
      protectedAreaM2: sum.protectedAreaM2 + one.protectedAreaM2, unassessed: sum.unassessed + one.unassessed,
    }),
    emptyTally,
  );
}
