import { Injectable } from '@nestjs/common';
import { memberTypeNames, message } from '@mantlet/common';
import type { ZoneDto, ZoneInput, ZoneProtection, ZoneUpdate } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource, In } from 'typeorm';
import type { EntityManager } from 'typeorm';
import type { ProjectScope } from '../../shared/access.js';
import { lockProject } from '../../shared/project-lock.js';
import { conflict, notFound, unprocessable } from '../../shared/refusal.js';
import { AssessmentService } from '../assessment/assessment.service.js';
import { AuditService, changesBetween } from '../audit/audit.service.js';
import type { Change } from '../audit/audit.service.js';
import { Level } from '../levels/level.entity.js';
import { Member } from '../members/member.entity.js';
import { Product } from '../products/product.entity.js';
import { tallyZones } from './zone-tally.js';
import type { Tally } from './zone-tally.js';
import { loadZoneDtos } from './zone-reading.js';
import { ZoneSystem } from './zone-system.entity.js';
import { Zone } from './zone.entity.js';

export { emptyTally, sumTallies } from './zone-tally.js';
export type { Tally } from './zone-tally.js';

const fields = ['levelId', 'code', 'name', 'periodMin', 'curve', 'reference'] as const;

/** Fire compartments: the fire engineer sets period and curve, the specifier environment, policy and systems. */
@Injectable()
export class ZonesService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly assessment: AssessmentService,
    private readonly audit: AuditService,
  ) {}

  /** By level from the lowest up, then by code. */
  list(projectId: string): Promise<ZoneDto[]> {
    return loadZoneDtos(this.dataSource.manager, projectId);
  }

  get(projectId: string, zoneId: string): Promise<ZoneDto> {
    return this.dto(this.dataSource.manager, projectId, zoneId);
  }

  /** Members, settled, open and protected area of each zone that has members. */
  tallies(projectIds: readonly string[]): Promise<(Tally & { projectId: string; zoneId: string })[]> {
    return tallyZones(this.dataSource.manager, projectIds);
  }

  async create(scope: ProjectScope, input: ZoneInput): Promise<ZoneDto> {
    return this.dataSource.transaction(async (manager) => {
      await lockProject(manager, scope.projectId);
      await this.requireLevel(manager, scope.projectId, input.levelId);
      await this.requireFreeCode(manager, scope.projectId, input.code, null);
      const zone = await manager.save(manager.create(Zone, { ...input, projectId: scope.projectId }));
      await this.record(manager, scope, 'zone made', zone, changesBetween<ZoneInput>({}, input, fields));
      await this.assessment.recompute(manager, scope.projectId, [zone.id]);
      return this.dto(manager, scope.projectId, zone.id);
    });
  }

  async update(scope: ProjectScope, zoneId: string, { version, ...input }: ZoneUpdate): Promise<ZoneDto> {
    return this.dataSource.transaction(async (manager) => {
      const zone = await this.lock(manager, scope.projectId, zoneId);
      await this.requireCurrent(manager, zone, version);
      await this.requireLevel(manager, scope.projectId, input.levelId);
      await this.requireFreeCode(manager, scope.projectId, input.code, zoneId);
      const changes = changesBetween<ZoneInput>(zone as Partial<ZoneInput>, input, fields);
      if (changes.length) {
        await manager.save(Object.assign(zone, input));
        await this.record(manager, scope, 'zone changed', zone, changes);
        await this.assessment.recompute(manager, scope.projectId, [zoneId]);
      }
      return this.dto(manager, scope.projectId, zoneId);
    });
  }

  /** Only a zone without members. */
  async remove(scope: ProjectScope, zoneId: string): Promise<void> {
    await this.dataSource.transaction(async (manager) => {
      const zone = await this.lock(manager, scope.projectId, zoneId);
      const members = await manager.countBy(Member, { zoneId });
      if (members) throw conflict(message('zone.has-members', { zone: zone.code, members }));
      await manager.delete(Zone, zoneId);
      await this.record(manager, scope, 'zone deleted', zone);
    });
  }

  async setProtection(scope: ProjectScope, zoneId: string, input: ZoneProtection): Promise<ZoneDto> {
    return this.dataSource.transaction(async (manager) => {
      // products before the project, as an edit of a product does: whoever comes second sees the other's change
      const products = await this.requireProducts(manager, scope.projectId, input);
      const zone = await this.lock(manager, scope.projectId, zoneId);
      await this.requireCurrent(manager, zone, input.version);
      const changes = await this.protectionChanges(manager, zone, input, products);
      if (changes.length) {
        // by statement rather than save(), so that the version rises where only the systems change
        await manager.update(Zone, zoneId, { environment: input.environment, targetPolicy: input.targetPolicy });
        await this.replaceSystems(manager, zoneId, input);
        await this.record(manager, scope, 'protection set', zone, changes);
        await this.assessment.recompute(manager, scope.projectId, [zoneId]);
      }
      return this.dto(manager, scope.projectId, zoneId);
    });
  }

  private async replaceSystems(manager: EntityManager, zoneId: string, input: ZoneProtection): Promise<void> {
    await manager.delete(ZoneSystem, { zoneId });
    const chosen = input.systems.flatMap(({ memberType, productId }) => (productId ? [{ zoneId, memberType, productId }] : []));
    if (chosen.length) await manager.insert(ZoneSystem, chosen);
  }

  /** Each product must be of the shared library or the project's own; an expired one may be chosen and is a blocker later. */
  private async requireProducts(manager: EntityManager, projectId: string, input: ZoneProtection): Promise<Map<string, Product>> {
    const types = new Set<string>();
    input.systems.forEach(({ memberType }, i) => {
      const reason = message('zone.system-twice', { memberType: memberTypeNames[memberType].toLowerCase() });
      if (types.has(memberType)) throw unprocessable(reason, [{ path: `systems.${i}.memberType`, message: 'occurs twice' }]);
      types.add(memberType);
    });
    const ids = [...new Set(input.systems.flatMap(({ productId }) => productId ?? []))].sort();
    const found = ids.length
      ? await manager.find(Product, {
          where: { id: In(ids) }, select: { id: true, name: true, projectId: true }, order: { id: 'ASC' }, lock: { mode: 'pessimistic_read' },
        })
      : [];
    const usable = new Map(found.filter((product) => product.projectId === null || product.projectId === projectId).map((product) => [product.id, product]));
    input.systems.forEach(({ memberType, productId }, i) => {
      if (productId === null || usable.has(productId)) return;
      const reason = message('zone.no-such-product', { memberType: memberTypeNames[memberType].toLowerCase() });
      throw unprocessable(reason, [{ path: `systems.${i}.productId`, message: 'is not a product of this project' }]);
    });
    return usable;
  }

  private async protectionChanges(manager: EntityManager, zone: Zone, input: ZoneProtection, products: Map<string, Product>): Promise<Change[]> {
    const standing = await manager.find(ZoneSystem, { where: { zoneId: zone.id }, relations: { product: true }, select: { zoneId: true, memberType: true, productId: true, product: { id: true, name: true } } });
    const before = new Map(standing.map((system) => [system.memberType, { id: system.productId, name: system.product.name }]));
    const after = new Map(input.systems.flatMap(({ memberType, productId }) => (productId ? [[memberType, { id: productId, name: products.get(productId)?.name ?? '' }]] : [])));
    const systems = [...new Set([...before.keys(), ...after.keys()])]
      .filter((memberType) => before.get(memberType)?.id !== after.get(memberType)?.id)
      .map((memberType) => ({ field: `system of ${memberType}`, old: before.get(memberType)?.name ?? null, new: after.get(memberType)?.name ?? null }));
    return [...changesBetween<Pick<Zone, 'environment' | 'targetPolicy'>>(zone, input, ['environment', 'targetPolicy']), ...systems];
  }

  /** With no other writer on the project until the end. */
  private async lock(manager: EntityManager, projectId: string, zoneId: string): Promise<Zone> {
    await lockProject(manager, projectId);
    const zone = await manager.findOneBy(Zone, { id: zoneId, projectId });
    if (!zone) throw notFound('zone of this project');
    return zone;
  }

  private requireCurrent(manager: EntityManager, zone: Zone, version: number): Promise<void> {
    return this.audit.requireVersion(manager, 'zone', zone, version, () => this.dto(manager, zone.projectId, zone.id));
  }

  private async requireLevel(manager: EntityManager, projectId: string, levelId: string): Promise<void> {
    if (await manager.existsBy(Level, { id: levelId, projectId })) return;
    throw unprocessable(message('zone.no-such-level', {}), [{ path: 'levelId', message: 'is not a level of this project' }]);
  }

  private async requireFreeCode(manager: EntityManager, projectId: string, code: string, exceptId: string | null): Promise<void> {
    const holder = await manager.findOneBy(Zone, { projectId, code });
    if (holder && holder.id !== exceptId) throw conflict(message('shared.exists', { what: 'zone', name: code }));
  }

  private async dto(manager: EntityManager, projectId: string, zoneId: string): Promise<ZoneDto> {
    const [zone] = await loadZoneDtos(manager, projectId, zoneId);
    if (!zone) throw notFound('zone of this project');
    return zone;
  }

  private record(manager: EntityManager, { projectId, actor }: ProjectScope, action: string, zone: Zone, changes: Change[] = []): Promise<void> {
    return this.audit.record(manager, { projectId, actor, action, entity: 'zone', entityId: zone.id, label: `${zone.code} ${zone.name}`, changes });
  }
}
