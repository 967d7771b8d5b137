import type { ZoneDto } from '@mantlet/common';
import { memberTypes } from '@mantlet/common';
import type { EntityManager } from 'typeorm';
import { In } from 'typeorm';
import { ZoneResult } from '../assessment/zone-result.entity.js';
import { emptyTally, tallyZones } from './zone-tally.js';
import type { Tally } from './zone-tally.js';
import { Zone } from './zone.entity.js';

const byCode = new Intl.Collator('en', { numeric: true });

/** The zones of a project, or one of them, with systems, counts and targets; by level from the lowest up, then by code. */
export async function loadZoneDtos(manager: EntityManager, projectId: string, zoneId?: string): Promise<ZoneDto[]> {
  const zones = await manager.find(Zone, {
    where: { projectId, ...(zoneId ? { id: zoneId } : {}) },
    relations: { level: true, systems: { product: true } },
    // without the products' evidence, which is large
    select: { level: { id: true, elevationM: true, code: true }, systems: { zoneId: true, memberType: true, productId: true, product: { id: true, name: true, kind: true } } },
  });
  const results = await manager.findBy(ZoneResult, { zoneId: In(zones.map((zone) => zone.id)) });
  const tallies = new Map((await tallyZones(manager, [projectId])).map((tally) => [tally.zoneId, tally]));
  const targets = new Map(results.map((result) => [result.zoneId, result.targets]));
  return zones
    .sort((a, b) => a.level.elevationM - b.level.elevationM || byCode.compare(a.level.code, b.level.code) || byCode.compare(a.code, b.code))
    .map((zone) => toZoneDto(zone, tallies.get(zone.id) ?? emptyTally, targets.get(zone.id) ?? []));
}

function toZoneDto(zone: Zone, { members, settled, open, protectedAreaM2, unassessed }: Tally, targets: ZoneDto['targets']): ZoneDto {
  const { id, levelId, code, name, periodMin, curve, reference, targetPolicy, version } = zone;
  return {
    id, levelId, code, name, periodMin, curve, reference, environment: zone.environment as ZoneDto['environment'], targetPolicy, version,
    systems: [...zone.systems]
      .sort((a, b) => memberTypes.indexOf(a.memberType) - memberTypes.indexOf(b.memberType))
      .map(({ memberType, productId, product }) => ({ memberType, productId, productName: product.name, productKind: product.kind })),
    members, settled, open, protectedAreaM2, unassessed, targets,
  };
}
