import { Injectable } from '@nestjs/common';
import { message } from '@mantlet/common';
import type { LevelDto, LevelInput, LevelUpdate } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource } from 'typeorm';
import type { EntityManager } from 'typeorm';
import type { ProjectScope } from '../../shared/access.js';
import { lockProject } from '../../shared/project-lock.js';
import { conflict, notFound } from '../../shared/refusal.js';
import { AuditService, changesBetween } from '../audit/audit.service.js';
import { Zone } from '../zones/zone.entity.js';
import { Level } from './level.entity.js';

const fields = ['code', 'name', 'elevationM', 'heightM'] as const;

/** The floors of the building. */
@Injectable()
export class LevelsService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly audit: AuditService,
  ) {}

  /** From the lowest up. */
  async list(projectId: string): Promise<LevelDto[]> {
    const levels = await this.dataSource.manager.find(Level, { where: { projectId }, order: { elevationM: 'ASC', code: 'ASC' } });
    return levels.map(toLevelDto);
  }

  async create(scope: ProjectScope, input: LevelInput): Promise<LevelDto> {
    return this.dataSource.transaction(async (manager) => {
      await lockProject(manager, scope.projectId);
      await this.requireFreeCode(manager, scope.projectId, input.code, null);
      const level = await manager.save(manager.create(Level, { ...input, projectId: scope.projectId }));
      await this.record(manager, scope, 'level made', level, changesBetween<LevelInput>({}, input, fields));
      return toLevelDto(level);
    });
  }

  async update(scope: ProjectScope, levelId: string, { version, ...input }: LevelUpdate): Promise<LevelDto> {
    return this.dataSource.transaction(async (manager) => {
      const level = await this.lock(manager, scope.projectId, levelId);
      await this.audit.requireVersion(manager, 'level', level, version, () => toLevelDto(level));
      const changes = changesBetween<LevelInput>(level, input, fields);
      if (!changes.length) return toLevelDto(level);
      await this.requireFreeCode(manager, scope.projectId, input.code, levelId);
      await manager.save(Object.assign(level, input));
      await this.record(manager, scope, 'level changed', level, changes);
      return toLevelDto(level);
    });
  }

  /** Only a level without zones. */
  async remove(scope: ProjectScope, levelId: string): Promise<void> {
    await this.dataSource.transaction(async (manager) => {
      const level = await this.lock(manager, scope.projectId, levelId);
      const zones = await manager.find(Zone, { where: { levelId }, select: { code: true }, order: { code: 'ASC' } });
      if (zones.length) throw conflict(message('level.has-zones', { level: level.code, zones: inWords(zones.map((zone) => zone.code)) }));
      await manager.delete(Level, levelId);
      await this.record(manager, scope, 'level deleted', level);
    });
  }

  /** With no other writer on the project until the end. */
  private async lock(manager: EntityManager, projectId: string, levelId: string): Promise<Level> {
    await lockProject(manager, projectId);
    const level = await manager.findOneBy(Level, { id: levelId, projectId });
    if (!level) throw notFound('level of this project');
    return level;
  }

  private async requireFreeCode(manager: EntityManager, projectId: string, code: string, exceptId: string | null): Promise<void> {
    const holder = await manager.findOneBy(Level, { projectId, code });
    if (holder && holder.id !== exceptId) throw conflict(message('shared.exists', { what: 'level', name: code }));
  }

  private record(manager: EntityManager, { projectId, actor }: ProjectScope, action: string, level: Level, changes = changesBetween<Level>({}, {}, [])): Promise<void> {
    return this.audit.record(manager, { projectId, actor, action, entity: 'level', entityId: level.id, label: `${level.code} ${level.name}`, changes });
  }
}

/** "zone A", "zones A, B and 4 others" */
function inWords(codes: string[]): string {
  const shown = codes.slice(0, 3).join(', ');
  const rest = codes.length - 3;
  return `${codes.length === 1 ? 'zone' : 'zones'} ${shown}${rest > 0 ? ` and ${rest} ${rest === 1 ? 'other' : 'others'}` : ''}`;
}

function toLevelDto({ id, code, name, elevationM, heightM, version }: Level): LevelDto {
  return { id, code, name, elevationM, heightM, version };
}
