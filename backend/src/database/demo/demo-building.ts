import type { INestApplicationContext } from '@nestjs/common';
import type { MemberType } from '@mantlet/common';
import { DataSource } from 'typeorm';
import { LevelsService } from '../../features/levels/levels.service.js';
import { ProductFilesService } from '../../features/products/product-files.service.js';
import { ProductsService } from '../../features/products/products.service.js';
import { Project } from '../../features/projects/project.entity.js';
import { ProjectsService } from '../../features/projects/projects.service.js';
import { ZonesService } from '../../features/zones/zones.service.js';
import type { DemoProduct, Scenario } from './demo-data.js';
import type { DemoPeople } from './demo-people.js';

/** The project, begun by its fire engineer; its id. */
export async function makeProject(app: INestApplicationContext, scenario: Scenario, people: DemoPeople): Promise<string> {
  const { manager } = app.get(DataSource);
  const standing = await manager.findOneBy(Project, { number: scenario.project.number });
  if (standing) return standing.id;
  const { actor, roles } = people.as('fireEngineer', '');
  const { projectId } = await app.get(ProjectsService, { strict: false }).create(actor, { ...scenario.project, roles });
  return projectId;
}

export async function setTakeoff(app: INestApplicationContext, scenario: Scenario, people: DemoPeople, projectId: string): Promise<void> {
  const { version } = await app.get(DataSource).manager.findOneByOrFail(Project, { id: projectId });
  await app.get(ProjectsService, { strict: false }).setTakeoffSettings(people.as('specifier', projectId), { ...scenario.takeoff, version });
}

/** The shared library, kept by the administrator. */
export async function makeProducts(app: INestApplicationContext, products: readonly DemoProduct[], people: DemoPeople): Promise<void> {
  const service = app.get(ProductsService, { strict: false });
  const files = app.get(ProductFilesService, { strict: false });
  const owner = { projectId: null, actor: people.administrator };
  for (const { input, evidenceFile } of products) {
    const standing = (await service.list(null)).find((product) => product.name === input.name);
    const { id, evidenceFile: kept } = standing ?? (await service.create(owner, input));
    if (!evidenceFile || kept) continue;
    const upload = { originalname: evidenceFile.name, buffer: evidenceFile.content, size: evidenceFile.content.length } as Express.Multer.File;
    await files.store(owner, id, upload);
  }
}

export async function makeLevelsAndZones(app: INestApplicationContext, scenario: Scenario, people: DemoPeople, projectId: string): Promise<void> {
  const levels = app.get(LevelsService, { strict: false });
  const zones = app.get(ZonesService, { strict: false });
  const scope = people.as('fireEngineer', projectId);
  const levelIds = new Map((await levels.list(projectId)).map((level) => [level.code, level.id]));
  for (const level of scenario.levels) {
    if (!levelIds.has(level.code)) levelIds.set(level.code, (await levels.create(scope, level)).id);
  }
  const there = new Set((await zones.list(projectId)).map((zone) => zone.code));
  for (const { level, code, name, periodMin } of scenario.zones) {
    if (there.has(code)) continue;
    await zones.create(scope, { levelId: levelIds.get(level) ?? '', code, name, periodMin, curve: { kind: 'standard' }, reference: scenario.zoneReference });
  }
}

/** The specifier's part of each zone. */
export async function setProtection(app: INestApplicationContext, scenario: Scenario, people: DemoPeople, projectId: string): Promise<void> {
  const zones = app.get(ZonesService, { strict: false });
  const products = await app.get(ProductsService, { strict: false }).list(projectId);
  const idOf = (name: string): string => {
    const product = products.find((one) => one.name === name);
    if (!product) throw new Error(`seeds/demo/project.json names the product ${name}, which products.json does not have.`);
    return product.id;
  };
  const standing = await zones.list(projectId);
  for (const { code, environment, policy, systems } of scenario.zones) {
    const zone = standing.find((one) => one.code === code);
    const chosen = scenario.systems[systems];
    if (!zone || !chosen) throw new Error(`seeds/demo/project.json: zone ${code} has no systems called ${systems}.`);
    const bySystem = (Object.entries(chosen) as [MemberType, string][]).map(([memberType, name]) => ({ memberType, productId: idOf(name) }));
    await zones.setProtection(people.as('specifier', projectId), zone.id, { environment, targetPolicy: policy, systems: bySystem, version: zone.version });
  }
}

/** What the fire engineer changes after the issue. */
export async function changeZones(app: INestApplicationContext, scenario: Scenario, people: DemoPeople, projectId: string): Promise<void> {
  const zones = app.get(ZonesService, { strict: false });
  for (const { code, periodMin, reference } of scenario.draft.zones) {
    const zone = (await zones.list(projectId)).find((one) => one.code === code);
    if (!zone) throw new Error(`seeds/demo/project.json changes zone ${code}, which it does not have.`);
    const { levelId, name, curve, version } = zone;
    await zones.update(people.as('fireEngineer', projectId), zone.id, { levelId, code, name, curve, periodMin, reference, version });
  }
}
