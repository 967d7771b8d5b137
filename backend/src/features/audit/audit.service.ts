import { Injectable } from '@nestjs/common';
import type { AuditEntryDto, AuditQuery, Page } from '@mantlet/common';
import { InjectRepository } from '@nestjs/typeorm';
import type { EntityManager } from 'typeorm';
import { Repository } from 'typeorm';
import type { QueryDeepPartialEntity } from 'typeorm';
import type { Actor } from '../../shared/access.js';
import { canonicalJson } from '../../shared/canonical-json.js';
import { AuditEntry } from './audit-entry.entity.js';

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

@Injectable()
export class AuditService {
  constructor(@InjectRepository(AuditEntry) private readonly entries: Repository<AuditEntry>) {}

  /** Writes in the caller's transaction, so that a change and its trace stand or fall together. */
  async record(manager: EntityManager, ...recorded: Recorded[]): Promise<void> {
    const rows = recorded.map((entry) => ({
      projectId: entry.projectId, userId: entry.actor.id, userName: entry.actor.name, action: entry.action, entity: entry.entity,
      entityId: entry.entityId, label: entry.label, changes: entry.changes ?? [], why: entry.why ?? null,
    }));
    for (let at = 0; at < rows.length; at += 1000) await manager.insert(AuditEntry, rows.slice(at, at + 1000) as QueryDeepPartialEntity<AuditEntry>[]);
  }

  async list(projectId: string, query: AuditQuery): Promise<Page<AuditEntryDto>> {
    const found = this.entries.createQueryBuilder('e').where('e.projectId = :projectId', { projectId });
    if (query.entity) found.andWhere('e.entity = :entity', { entity: query.entity });
    if (query.entityId) found.andWhere('e.entityId = :entityId', { entityId: query.entityId });
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
