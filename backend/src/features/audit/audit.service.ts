import { Injectable } from '@nestjs/common';
import type { AuditEntryDto, AuditQuery, Page } from '@mantlet/common';
import { InjectRepository } from '@nestjs/typeorm';
import type { EntityManager } from 'typeorm';
import { Raw, Repository } from 'typeorm';
import type { Actor } from '../../shared/access.js';
import { canonicalJson } from '../../shared/canonical-json.js';
import { publish } from '../../shared/project-events.js';
import { stale } from '../../shared/refusal.js';
import type { Trace } from '../../shared/refusal.js';
import { AuditEntry } from './audit-entry.entity.js';
import { eventsOf } from './audit-events.js';

export interface Change {
  field: string;
  old: unknown;
  new: unknown;
}
export interface Recorded {
  projectId: string | null;
  actor: Actor | { id: null; name: string };
  action: string;
  entity: string;
  entityId: string | null;
  label: string;
  changes?: Change[];
  why?: string | null;
}

/** The fields that differ, compared by value: the order in which the database returns the keys of an object says nothing. */
export function changesBetween<T extends object>(before: Partial<T>, after: Partial<T>, fields: readonly (keyof T & string)[]): Change[] {
  return fields
    .filter((field) => canonicalJson(before[field]) !== canonicalJson(after[field]))
    .map((field) => ({ field, old: before[field] ?? null, new: after[field] ?? null }));
}

/** a schedule of thousands of rows leaves as many entries: one statement for thousands, in their order */
const insertStatement = `INSERT INTO audit_entries (project_id, user_id, user_name, action, entity, entity_id, label, changes, why)
  SELECT project_id, user_id, user_name, action, entity, entity_id, label, changes, why
  FROM ROWS FROM (jsonb_to_recordset($1::jsonb) AS (project_id uuid, user_id uuid, user_name text, action text, entity text, entity_id uuid, label text, changes jsonb, why text))
  WITH ORDINALITY AS r(project_id, user_id, user_name, action, entity, entity_id, label, changes, why, place) ORDER BY r.place`;

/** acts told of a thing that leave its version as it is, so that nobody's open form goes stale */
const besideVersion = '(accepted|evidence file stored)$';

@Injectable()
export class AuditService {
  constructor(@InjectRepository(AuditEntry) private readonly entries: Repository<AuditEntry>) {}

  /** Writes in the caller's transaction, so that a change and its trace stand or fall together; open pages learn of it when it is committed. */
  async record(manager: EntityManager, ...recorded: Recorded[]): Promise<void> {
    const rows = recorded.map((entry) => ({
      project_id: entry.projectId, user_id: entry.actor.id, user_name: entry.actor.name, action: entry.action, entity: entry.entity,
      entity_id: entry.entityId, label: entry.label, changes: entry.changes ?? [], why: entry.why ?? null,
    }));
    for (let at = 0; at < rows.length; at += 2000) await manager.query(insertStatement, [JSON.stringify(rows.slice(at, at + 2000))]);
    await publish(manager, eventsOf(recorded));
  }

  /** Refuses an edit of something that was saved by another meanwhile, and shows the version that stands, who saved it and when. */
  async requireVersion(manager: EntityManager, entity: string, standing: { id: string; version: number }, sent: number, show: () => unknown): Promise<void> {
    if (standing.version === sent) return;
    throw stale(entity, await show(), await this.lastChange(manager, entity, standing.id));
  }

  /** The same for what has no version of its own: the form says what it showed when it was opened. */
  async requireUnchanged(manager: EntityManager, of: { projectId: string; entity: string; entityId: string; what: string }, standing: object, was: object): Promise<void> {
    if (canonicalJson(standing) !== canonicalJson(was)) throw stale(of.what, standing, await this.lastChange(manager, of.entity, of.entityId, of.projectId));
  }

  /** Who last changed what an edit of this thing could overwrite. */
  async lastChange(manager: EntityManager, entity: string, entityId: string, projectId?: string): Promise<Trace | null> {
    const action = Raw((column) => `${column} !~ :besideVersion`, { besideVersion });
    const [entry] = await manager.find(AuditEntry, { where: { entity, entityId, action, ...(projectId && { projectId }) }, order: { id: 'DESC' }, take: 1 });
    return entry ? { by: entry.userName, at: entry.at.toISOString() } : null;
  }

  async list(projectId: string, query: AuditQuery): Promise<Page<AuditEntryDto>> {
    const found = this.entries.createQueryBuilder('e').where('e.projectId = :projectId', { projectId });
    if (query.entity) found.andWhere('e.entity = :entity', { entity: query.entity });
    if (query.entityId) found.andWhere('e.entityId = :entityId', { entityId: query.entityId });
    if (query.userId) found.andWhere('e.userId = :userId', { userId: query.userId });
    if (query.from) found.andWhere('e.at >= :from', { from: query.from });
    if (query.before) found.andWhere('e.at < :before', { before: query.before });
    if (query.search) {
      found.andWhere('(e.label ILIKE :like OR e.userName ILIKE :like OR e.action ILIKE :like)', { like: `%${query.search.replace(/[\\%_]/g, '\\$&')}%` });
    }
    const [rows, total] = await found
      .orderBy('e.id', 'DESC')
      .offset((query.page - 1) * query.pageSize)
      .limit(query.pageSize)
      .getManyAndCount();
    return { items: rows.map(toAuditEntryDto), total, page: query.page, pageSize: query.pageSize };
  }
}

export function toAuditEntryDto(entry: AuditEntry): AuditEntryDto {
  return {
    id: entry.id, at: entry.at.toISOString(), userName: entry.userName, action: entry.action, entity: entry.entity,
    entityId: entry.entityId, label: entry.label, changes: entry.changes, why: entry.why,
  };
}
