import type { EntityManager } from 'typeorm';

/**
 * Lets one transaction at a time write to a project. Every transaction that writes to its levels, zones, systems, sections,
 * members, settings or revisions calls this before it locks or changes any row of them, so that two of them never wait for
 * each other; rows of products, which projects share, are locked before it. Released at the transaction's end.
 */
export async function lockProject(manager: EntityManager, projectId: string): Promise<void> {
  await manager.query('SELECT pg_advisory_xact_lock(hashtextextended($1, 0))', [`project ${projectId}`]);
}
