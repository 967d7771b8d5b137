import { Injectable } from '@nestjs/common';
import type {
  Acceptance, CriticalTemperatureBasis, Evidence, Exposure, FireCurve, MemberType, NominalCurve, ProductKind, ProductSupply, ProjectSettings,
  ProtectionForm, SectionProperties, SectionShape, SteelGrade, TargetPolicy,
} from '@mantlet/common';
import type { EntityManager } from 'typeorm';
import { notFound } from '../../shared/refusal.js';

export interface InputProject { id: string; number: string; name: string; place: string; currency: string; settings: ProjectSettings }
export interface InputLevel { id: string; code: string; name: string; elevationM: number; heightM: number }
export interface InputZone {
  id: string; levelId: string; code: string; name: string; periodMin: number; curve: FireCurve; reference: string; environment: string;
  targetPolicy: TargetPolicy; systems: Partial<Record<MemberType, string>>;
}
export interface InputSection { id: string; designation: string; shape: SectionShape; properties: SectionProperties }
export interface InputProduct {
  id: string; name: string; kind: ProductKind; evidence: Evidence; curves: NominalCurve[]; environments: string[]; expiresOn: string;
  /** its assessment ended before today, by UTC as everywhere */
  expired: boolean;
  supply: ProductSupply;
}
export interface InputAcceptance { kind: Acceptance['kind']; valueC: number | null }
export interface InputMember {
  id: string; mark: string; zoneId: string; memberType: MemberType; sectionId: string; grade: SteelGrade; lengthMm: number; quantity: number;
  exposure: Exposure; protectionForm: ProtectionForm; coatBackConnections: number; coatBackGirthMm: number; deductionM2: number; onSite: boolean;
  basis: CriticalTemperatureBasis; acceptances: InputAcceptance[];
}
/** Everything that enters the results of a project, or of some of its zones, and nothing else. */
export interface ProjectInputs {
  project: InputProject;
  levels: InputLevel[];
  zones: InputZone[];
  sections: Map<string, InputSection>;
  products: Map<string, InputProduct>;
  /** by mark */
  members: InputMember[];
}

const memberColumns = `m.id, m.mark, m.zone_id AS "zoneId", m.member_type AS "memberType", m.section_id AS "sectionId", m.grade,
  m.length_mm AS "lengthMm", m.quantity, m.exposure, m.protection_form AS "protectionForm", m.coat_back_connections AS "coatBackConnections",
  m.coat_back_girth_mm AS "coatBackGirthMm", m.deduction_m2 AS "deductionM2", m.on_site AS "onSite", m.basis`;

/** Reads what the assessment, the takeoff and the snapshot work from, with plain queries: only the columns they need. */
@Injectable()
export class ProjectInputsService {
  /** zoneIds null: the whole project. A zone that is not the project's is left out. */
  async load(manager: EntityManager, projectId: string, zoneIds: string[] | null): Promise<ProjectInputs> {
    const [project] = await manager.query<InputProject[]>('SELECT id, number, name, place, currency, settings FROM projects WHERE id = $1', [projectId]);
    if (!project) throw notFound('project');
    const levels = await manager.query<InputLevel[]>(
      `SELECT id, code, name, elevation_m AS "elevationM", height_m AS "heightM" FROM levels WHERE project_id = $1 ORDER BY elevation_m, code`, [projectId]);
    const zones = await this.zones(manager, projectId, zoneIds);
    const ids = zones.map((zone) => zone.id);
    const members = await manager.query<InputMember[]>(`SELECT ${memberColumns} FROM members m WHERE m.zone_id = ANY($1) ORDER BY m.mark, m.id`, [ids]);
    await this.addAcceptances(manager, ids, members);
    const sections = await manager.query<InputSection[]>(
      'SELECT id, designation, shape, properties FROM sections WHERE id IN (SELECT section_id FROM members WHERE zone_id = ANY($1))', [ids]);
    const products = await this.products(manager, ids);
    return {
      project, levels, zones, members,
      sections: new Map(sections.map((section) => [section.id, section])),
      products: new Map(products.map((product) => [product.id, product])),
    };
  }

  private async zones(manager: EntityManager, projectId: string, zoneIds: string[] | null): Promise<InputZone[]> {
    const zones = await manager.query<Omit<InputZone, 'systems'>[]>(
      `SELECT z.id, z.level_id AS "levelId", z.code, z.name, z.period_min AS "periodMin", z.curve, z.reference, z.environment, z.target_policy AS "targetPolicy"
       FROM zones z JOIN levels l ON l.id = z.level_id
       WHERE z.project_id = $1 AND ($2::uuid[] IS NULL OR z.id = ANY($2)) ORDER BY l.elevation_m, l.code, z.code`, [projectId, zoneIds]);
    const systems = await manager.query<{ zoneId: string; memberType: MemberType; productId: string }[]>(
      'SELECT zone_id AS "zoneId", member_type AS "memberType", product_id AS "productId" FROM zone_systems WHERE zone_id = ANY($1)', [zones.map((z) => z.id)]);
    const byZone = new Map(zones.map((zone) => [zone.id, { ...zone, systems: {} } as InputZone]));
    for (const { zoneId, memberType, productId } of systems) (byZone.get(zoneId) as InputZone).systems[memberType] = productId;
    return [...byZone.values()];
  }

  private async addAcceptances(manager: EntityManager, zoneIds: string[], members: InputMember[]): Promise<void> {
    const rows = await manager.query<(InputAcceptance & { memberId: string })[]>(
      `SELECT a.member_id AS "memberId", a.kind, a.value_c AS "valueC" FROM member_acceptances a JOIN members m ON m.id = a.member_id
       WHERE m.zone_id = ANY($1) ORDER BY a.kind`, [zoneIds]);
    const byMember = new Map<string, InputAcceptance[]>();
    for (const { memberId, ...acceptance } of rows) byMember.set(memberId, [...(byMember.get(memberId) ?? []), acceptance]);
    for (const member of members) member.acceptances = byMember.get(member.id) ?? [];
  }

  private products(manager: EntityManager, zoneIds: string[]): Promise<InputProduct[]> {
    return manager.query<InputProduct[]>(
      `SELECT id, name, kind, evidence, curves, environments, evidence_expires_on::text AS "expiresOn", evidence_expires_on < (now() AT TIME ZONE 'UTC')::date AS expired, supply
       FROM products WHERE id IN (SELECT product_id FROM zone_systems WHERE zone_id = ANY($1))`, [zoneIds]);
  }
}
