import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { message } from '@mantlet/common';
import type { CriticalTemperatureBasis, MemberInput } from '@mantlet/common';
import { In } from 'typeorm';
import type { EntityManager } from 'typeorm';
import type { ProjectScope } from '../../shared/access.js';
import { lockProject } from '../../shared/project-lock.js';
import { conflict, unprocessable } from '../../shared/refusal.js';
import { AssessmentService } from '../assessment/assessment.service.js';
import { AuditService, changesBetween } from '../audit/audit.service.js';
import type { Change, Recorded } from '../audit/audit.service.js';
import { Section } from '../sections/section.entity.js';
import { SectionsService } from '../sections/sections.service.js';
import { Zone } from '../zones/zone.entity.js';
import { Member } from './member.entity.js';

/** A member as it is to stand; whoever sets how its critical temperature comes about is named by the scope. */
export type NewMember = MemberInput & { basis?: CriticalTemperatureBasis };
export interface MemberChange {
  before: Member;
  set: Partial<MemberInput> & { basis?: CriticalTemperatureBasis };
}
interface Audited extends Omit<MemberInput, 'zoneId' | 'sectionId'> {
  zone: string;
  section: string;
  basis: CriticalTemperatureBasis;
}
const auditedFields = [
  'mark', 'zone', 'section', 'memberType', 'grade', 'lengthMm', 'quantity', 'exposure', 'protectionForm', 'coatBackConnections', 'coatBackGirthMm',
  'deductionM2', 'onSite', 'note', 'basis',
] as const;
type Columns = Partial<MemberInput> & Pick<Member, 'basis'>;

/** The one way members are written: checked against the project, traced, and their zones assessed anew, all in the caller's transaction. */
@Injectable()
export class MemberWriterService {
  constructor(
    private readonly sections: SectionsService,
    private readonly audit: AuditService,
    private readonly assessment: AssessmentService,
  ) {}

  /** Before anything is read that is to be written: one writer at a time per project. */
  lock(manager: EntityManager, projectId: string): Promise<void> {
    return lockProject(manager, projectId);
  }

  /** @throws Refusal where zone or section are not of the project, or the mark is taken */
  async check(manager: EntityManager, projectId: string, set: Partial<MemberInput>, exceptId: string | null): Promise<void> {
    if (set.zoneId !== undefined && !(await manager.existsBy(Zone, { id: set.zoneId, projectId }))) {
      throw unprocessable(message('member.zone-unknown', {}), [{ path: 'zoneId', message: 'is not a zone of the project' }]);
    }
    if (set.sectionId !== undefined && !(await this.sections.findFor(manager, projectId, set.sectionId))) {
      throw unprocessable(message('member.section-unknown', {}), [{ path: 'sectionId', message: 'is not a section of the catalogue or the project' }]);
    }
    if (set.mark === undefined) return;
    const holder = await manager.findOne(Member, { where: { projectId, mark: set.mark }, relations: { zone: { level: true } } });
    if (holder && holder.id !== exceptId) {
      throw conflict(message('member.mark-taken', { mark: set.mark, zone: holder.zone.code, level: holder.zone.level.code }));
    }
  }

  /** Adds members, all with the given action in the trail; their zones are assessed by `settle`. @returns their ids in the order given */
  async insert(manager: EntityManager, scope: ProjectScope, members: readonly NewMember[], action: string): Promise<string[]> {
    const now = new Date();
    const rows = members.map((member) => ({ ...member, id: randomUUID(), basis: member.basis ?? { way: 'none' as const } }));
    for (let at = 0; at < rows.length; at += 2000) {
      const columns = rows.slice(at, at + 2000).map((row) => columnsOf(row, row.basis.way === 'none' ? { by: null, at: null } : { by: scope.actor.id, at: now }));
      await manager.query(insertStatement, [JSON.stringify(columns), scope.projectId]);
    }
    const names = await this.names(manager, rows);
    await this.audit.record(manager, ...rows.map((row) => recorded(scope, action, row.id, row.mark, changesBetween<Audited>({}, audited(row, names), auditedFields))));
    return rows.map((row) => row.id);
  }

  /** Writes what differs, raising the version of each member that does. @returns how many did */
  async update(manager: EntityManager, scope: ProjectScope, changes: readonly MemberChange[], action: string, why: string | null = null): Promise<number> {
    const names = await this.names(manager, changes.flatMap(({ before, set }) => [before, { ...before, ...set }]));
    const changed = changes.flatMap(({ before, set }) => {
      const after = { ...before, ...set };
      const differences = changesBetween<Audited>(audited(before, names), audited(after, names), auditedFields);
      return differences.length ? [{ before, after, setsBasis: differences.some((d) => d.field === 'basis'), differences }] : [];
    });
    for (let at = 0; at < changed.length; at += 2000) {
      const rows = changed.slice(at, at + 2000).map(({ after, before, setsBasis }) => columnsOf(after, setsBasis ? { by: scope.actor.id, at: new Date() } : { by: before.basisSetById, at: before.basisSetAt }));
      await manager.query(updateStatement, [JSON.stringify(rows), scope.projectId]);
    }
    await this.audit.record(manager, ...changed.map((c) => ({ ...recorded(scope, action, c.before.id, c.after.mark, c.differences), why })));
    return changed.length;
  }

  /** How many of these would be other than they are. */
  countChanges(changes: readonly MemberChange[]): number {
    return changes.filter(({ before, set }) => changesBetween<Columns>(before, { ...before, ...set }, Object.keys(set) as (keyof Columns)[]).length > 0).length;
  }

  /** Results of the zones that were touched. @returns how many results are other than before */
  async settle(manager: EntityManager, projectId: string, zoneIds: Iterable<string>): Promise<number> {
    const touched = [...new Set(zoneIds)];
    if (!touched.length) return 0;
    return (await this.assessment.recompute(manager, projectId, touched)).changed;
  }

  /** Names that the trail shows in place of ids. */
  private async names(manager: EntityManager, members: readonly { zoneId: string; sectionId: string }[]): Promise<Map<string, string>> {
    const ids = (pick: (m: { zoneId: string; sectionId: string }) => string): string[] => [...new Set(members.map(pick))];
    const zones = await manager.find(Zone, { where: { id: In(ids((m) => m.zoneId)) }, select: { id: true, code: true } });
    const sections = await manager.find(Section, { where: { id: In(ids((m) => m.sectionId)) }, select: { id: true, designation: true } });
    return new Map([...zones.map((z) => [z.id, z.code] as const), ...sections.map((s) => [s.id, s.designation] as const)]);
  }
}

function audited(member: Columns, names: ReadonlyMap<string, string>): Audited {
  return { ...member, zone: names.get(member.zoneId ?? '') ?? '', section: names.get(member.sectionId ?? '') ?? '' } as unknown as Audited;
}

function recorded(scope: ProjectScope, action: string, entityId: string, label: string, changes: Change[]): Recorded {
  return { projectId: scope.projectId, actor: scope.actor, action, entity: 'member', entityId, label, changes };
}

function columnsOf(member: MemberInput & { id: string; basis: CriticalTemperatureBasis }, set: { by: string | null; at: Date | null }): Record<string, unknown> {
  return {
    id: member.id, mark: member.mark, zone_id: member.zoneId, section_id: member.sectionId, member_type: member.memberType, grade: member.grade,
    length_mm: member.lengthMm, quantity: member.quantity, exposure: member.exposure, protection_form: member.protectionForm,
    coat_back_connections: member.coatBackConnections, coat_back_girth_mm: member.coatBackGirthMm, deduction_m2: member.deductionM2,
    on_site: member.onSite, note: member.note, basis: member.basis, basis_set_by_id: set.by, basis_set_at: set.at,
  };
}

const columnTypes: Record<string, string> = {
  mark: 'text', zone_id: 'uuid', section_id: 'uuid', member_type: 'text', grade: 'text', length_mm: 'float8', quantity: 'int', exposure: 'jsonb',
  protection_form: 'text', coat_back_connections: 'int', coat_back_girth_mm: 'float8', deduction_m2: 'float8', on_site: 'bool', note: 'text',
  basis: 'jsonb', basis_set_by_id: 'uuid', basis_set_at: 'timestamptz',
};
const columnNames = Object.keys(columnTypes);
const recordset = `jsonb_to_recordset($1::jsonb) AS r(id uuid, ${Object.entries(columnTypes).map(([c, t]) => `${c} ${t}`).join(', ')})`;
/** thousands of rows in one statement: an imported schedule or a bulk edit is one */
const insertStatement = `INSERT INTO members (id, project_id, version, ${columnNames.join(', ')}) SELECT r.id, $2::uuid, 1, ${columnNames.map((c) => `r.${c}`).join(', ')} FROM ${recordset}`;
const updateStatement = `UPDATE members m SET ${columnNames.map((c) => `${c} = r.${c}`).join(', ')}, version = m.version + 1 FROM ${recordset}
  WHERE m.id = r.id AND m.project_id = $2`;
