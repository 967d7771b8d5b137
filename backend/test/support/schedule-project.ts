import { memberInputSchema, productSupplySchema } from '@mantlet/common';
import type { Agent } from './app.js';
import type {
  CriticalTemperatureBasis, Evidence, MemberType, ProductKind, ProductSupply, Role, SectionShape, TargetPolicy, ThicknessTable,
} from '@mantlet/common';
import { sectionProperties } from '../../src/calc/index.js';
import { AssessmentService } from '../../src/features/assessment/assessment.service.js';
import { Level } from '../../src/features/levels/level.entity.js';
import { Member } from '../../src/features/members/member.entity.js';
import { Product } from '../../src/features/products/product.entity.js';
import type { Project } from '../../src/features/projects/project.entity.js';
import { Section } from '../../src/features/sections/section.entity.js';
import type { User } from '../../src/features/users/user.entity.js';
import { ZoneSystem } from '../../src/features/zones/zone-system.entity.js';
import { Zone } from '../../src/features/zones/zone.entity.js';
import type { TestApp } from './app.js';

/** Dimensions of EN 10365 and EN 10210-2; the building, its loads and every product are invented for the test. */
export const shapes = {
  'IPE 300': { kind: 'i', hMm: 300, bMm: 150, twMm: 7.1, tfMm: 10.7, rootRadiusMm: 15 },
  'HE 300 B': { kind: 'i', hMm: 300, bMm: 300, twMm: 11, tfMm: 19, rootRadiusMm: 27 },
  'SHS 150x150x6.3': { kind: 'rectangular-hollow', hMm: 150, bMm: 150, tMm: 6.3, outerRadiusMm: 9.45, innerRadiusMm: 6.3 },
} as const satisfies Record<string, SectionShape>;
export type SectionName = keyof typeof shapes;

const temperaturesC = [450, 500, 550, 600, 650, 700];
const sectionFactorsPerM = [50, 100, 150, 200, 250, 300];
/** Invented figures that rise with A/V and period and fall with temperature. */
function inventedTable(orientation: 'beam' | 'column', periodMin: ThicknessTable['periodMin']): ThicknessTable {
  const thickness = sectionFactorsPerM.map((factor) => temperaturesC.map((t) => Math.round(periodMin * (2 + factor / 25) * (1.8 - t / 700))));
  return { shape: 'open', orientation, periodMin, temperaturesC, sectionFactorsPerM, thickness };
}

export const inventedProducts: { name: string; kind: ProductKind; evidence: Evidence; supply: Partial<ProductSupply> }[] = [
  {
    name: 'Testcoat', kind: 'coating',
    evidence: { form: 'table', tables: [inventedTable('beam', 30), inventedTable('beam', 60), inventedTable('column', 60)] },
    supply: { volumeSolidsPercent: 70, maxDftPerCoatUm: 500, densityKgPerL: 1.3, containerL: 20, lossFraction: 0.2, materialRate: '9.50', labourRate: '14.25' },
  },
  {
    name: 'Testboard', kind: 'board',
    evidence: {
      form: 'thermal',
      properties: {
        conductivityWPerMK: 0.2, densityKgPerM3: 800, specificHeatJPerKgK: 1700, moisturePercent: 3, minThicknessMm: 12, maxThicknessMm: 60,
        minSectionFactorPerM: 30, maxSectionFactorPerM: 350, maxTemperatureC: 750, maxPeriodMin: 180, stockThicknessesMm: [12, 15, 20, 25, 30], maxLayers: 2, thicknessStepMm: 1,
      },
    },
    supply: { sheetLengthMm: 2500, sheetWidthMm: 1200, materialRate: '22.00', labourRate: '31.00' },
  },
  {
    name: 'Testspray', kind: 'spray',
    evidence: {
      form: 'thermal',
      properties: {
        conductivityWPerMK: 0.12, densityKgPerM3: 350, specificHeatJPerKgK: 1200, moisturePercent: 0, minThicknessMm: 10, maxThicknessMm: 60,
        minSectionFactorPerM: 30, maxSectionFactorPerM: 350, maxTemperatureC: 750, maxPeriodMin: 180, stockThicknessesMm: [], maxLayers: 1, thicknessStepMm: 1,
      },
    },
    supply: { bagKg: 20, bagYieldM3: 0.055, lossFraction: 0.1, materialRate: '410.00', labourRate: '18.00' },
  },
];

export interface MemberSpec {
  mark: string; zone: string; type: MemberType; section: SectionName; basis: CriticalTemperatureBasis;
  lengthMm?: number; quantity?: number; boxed?: boolean; exposure?: 'four-sides' | 'three-sides'; onSite?: boolean;
}
const declared = (temperatureC: number): CriticalTemperatureBasis => ({ way: 'declared', temperatureC, reference: 'Calculation T-12, invented' });

/** Everything settled: nothing stands in the way of preparing. */
export const settledMembers: MemberSpec[] = [
  { mark: 'B0-001', zone: 'Z01', type: 'beam', section: 'IPE 300', basis: { way: 'utilisation', mu0: 0.5, reference: 'Calculation T-12, invented' }, lengthMm: 6000, quantity: 4 },
  { mark: 'B0-002', zone: 'Z01', type: 'beam', section: 'HE 300 B', basis: declared(600), lengthMm: 7200, quantity: 2 },
  { mark: 'C0-001', zone: 'Z01', type: 'column', section: 'HE 300 B', basis: declared(540), lengthMm: 3600, quantity: 6, boxed: true, exposure: 'four-sides' },
  { mark: 'C0-002', zone: 'Z01', type: 'column', section: 'IPE 300', basis: declared(500), lengthMm: 3600, quantity: 2, boxed: true, exposure: 'four-sides' },
  { mark: 'B1-001', zone: 'Z02', type: 'beam', section: 'IPE 300', basis: declared(550), lengthMm: 6000, quantity: 10 },
  { mark: 'B1-002', zone: 'Z02', type: 'beam', section: 'HE 300 B', basis: declared(620), lengthMm: 6000, quantity: 3, onSite: false },
  { mark: 'B1-003', zone: 'Z02', type: 'beam', section: 'HE 300 B', basis: declared(800), lengthMm: 6000, quantity: 1 },
  { mark: 'R1-001', zone: 'Z02', type: 'bracing', section: 'SHS 150x150x6.3', basis: declared(560), lengthMm: 4500, quantity: 8, exposure: 'four-sides' },
];

export interface ScheduleProject {
  project: Project;
  zones: Record<'Z01' | 'Z02', Zone>;
  products: Record<string, Product>;
  members: Map<string, Member>;
  team: Record<Role, Agent>;
  /** a second specifier, who may check what the first prepared */
  checker: Agent;
  users: { checker: User };
  url: (path: string) => string;
}

/** A small building: two levels, a zone on each, three invented products, and a signed-in person for every role. */
export async function makeScheduleProject(app: TestApp, options: { members?: MemberSpec[]; policies?: Partial<Record<'Z01' | 'Z02', TargetPolicy>>; expiresOn?: string } = {}): Promise<ScheduleProject> {
  const { manager } = app.dataSource;
  const project = await app.makeProject();
  const level = (code: string, name: string, elevationM: number) => manager.save(manager.create(Level, { projectId: project.id, code, name, elevationM, heightM: 4 }));
  const [ground, first] = [await level('L0', 'Ground', 0), await level('L1', 'First', 4)];
  const zone = (levelId: string, code: 'Z01' | 'Z02', name: string, periodMin: number) => manager.save(manager.create(Zone, {
    projectId: project.id, levelId, code, name, periodMin, curve: { kind: 'standard' }, environment: 'C1', targetPolicy: options.policies?.[code] ?? { policy: 'own' }, reference: 'Strategy S-1, invented',
  }));
  const zones = { Z01: await zone(ground.id, 'Z01', 'Hall', 60), Z02: await zone(first.id, 'Z02', 'Offices', 30) };
  const products: Record<string, Product> = {};
  for (const { name, kind, evidence, supply } of inventedProducts) {
    products[name] = await manager.save(manager.create(Product, {
      projectId: project.id, name, maker: 'Nobody, for tests', kind, invented: true, evidenceReference: `Report ${name}-1`, evidenceEdition: '1', evidenceExpiresOn: options.expiresOn ?? '2099-12-31',
      evidenceStandard: 'EN 13381 form', curves: ['standard'], environments: [], evidence, supply: productSupplySchema.parse(supply), note: '',
    }));
  }
  const id = (name: string): string => (products[name] as Product).id;
  for (const { id: zoneId } of Object.values(zones)) {
    await manager.save(ZoneSystem, [
      { zoneId, memberType: 'beam', productId: id('Testcoat') }, { zoneId, memberType: 'column', productId: id('Testboard') }, { zoneId, memberType: 'bracing', productId: id('Testspray') },
    ]);
  }
  const members = await addMembers(app, project, zones, options.members ?? settledMembers);
  await recompute(app, project.id);
  const team = await app.team(project);
  const checker = await app.makeUser('Checking specifier');
  await app.join(project, checker, 'specifier');
  return { project, zones, products, members, team, checker: await app.signIn(checker), users: { checker }, url: (path) => `/api/projects/${project.id}/${path}` };
}

export async function addMembers(app: TestApp, project: Project, zones: ScheduleProject['zones'], specs: readonly MemberSpec[]): Promise<Map<string, Member>> {
  const { manager } = app.dataSource;
  const made = new Map<string, Member>();
  for (const spec of specs) {
    const designation = spec.section;
    const section = (await manager.findOneBy(Section, { projectId: project.id, designation })) ?? (await manager.save(manager.create(Section, {
      projectId: project.id, family: 'CUSTOM', designation, designationKey: designation, shape: shapes[designation], properties: sectionProperties(shapes[designation]),
    })));
    const { zone, type, basis } = spec;
    const input = memberInputSchema.parse({
      zoneId: zones[zone as 'Z01' | 'Z02'].id, mark: spec.mark, memberType: type, sectionId: section.id, grade: 'S355', lengthMm: spec.lengthMm ?? 6000, quantity: spec.quantity ?? 1,
      exposure: { arrangement: spec.exposure ?? 'three-sides' }, protectionForm: spec.boxed ? 'boxed' : 'profile', onSite: spec.onSite ?? true,
    });
    made.set(spec.mark, await manager.save(manager.create(Member, { projectId: project.id, ...input, basis })));
  }
  return made;
}

export function recompute(app: TestApp, projectId: string): Promise<{ members: number; changed: number }> {
  return app.dataSource.transaction((manager) => app.app.get(AssessmentService, { strict: false }).recompute(manager, projectId, null));
}
