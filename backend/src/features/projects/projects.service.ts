import { Injectable } from '@nestjs/common';
import { defaultProjectSettings, message } from '@mantlet/common';
import type { DesignBasis, DesignBasisUpdate, ProjectCreate, ProjectInput, ProjectSettings, ProjectUpdate, TakeoffSettingsUpdate } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource } from 'typeorm';
import type { EntityManager } from 'typeorm';
import type { Actor, ProjectScope } from '../../shared/access.js';
import { lockProject } from '../../shared/project-lock.js';
import { conflict, notFound } from '../../shared/refusal.js';
import { AssessmentService } from '../assessment/assessment.service.js';
import { AuditService, changesBetween } from '../audit/audit.service.js';
import type { Change } from '../audit/audit.service.js';
import { MembershipsService } from '../memberships/memberships.service.js';
import { Project } from './project.entity.js';

const titleFields = ['number', 'name', 'place', 'currency', 'note'] as const;
type TakeoffSettings = Omit<ProjectSettings, 'designBasis'>;
const takeoffFields = ['readingRules', 'deductions', 'contractorSeesPrices', 'markUpPercent', 'distribution'] as const;
/** what enters a result; prices and addresses do not */
const assessedFields: readonly string[] = ['readingRules', 'deductions'];

/** What a project is called, and the two parts of its settings: the fire engineer's and the specifier's. */
@Injectable()
export class ProjectsService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly memberships: MembershipsService,
    private readonly assessment: AssessmentService,
    private readonly audit: AuditService,
  ) {}

  /** Whoever starts a project is the first on its team. */
  async create(actor: Actor, { roles, ...input }: ProjectCreate): Promise<ProjectScope> {
    return this.dataSource.transaction(async (manager) => {
      await this.requireFreeNumber(manager, input.number, null);
      const project = await manager.save(manager.create(Project, { ...input, settings: defaultProjectSettings }));
      const scope: ProjectScope = { projectId: project.id, roles, actor };
      await this.record(manager, scope, 'project made', project, changesBetween<ProjectInput>({}, input, titleFields));
      return this.memberships.begin(manager, scope);
    });
  }

  async update(scope: ProjectScope, { version, ...input }: ProjectUpdate): Promise<void> {
    await this.change(scope, version, async (manager, project) => {
      await this.requireFreeNumber(manager, input.number, project.id);
      const changes = changesBetween<ProjectInput>(project as ProjectInput, input, titleFields);
      Object.assign(project, input);
      return { action: 'project changed', changes, assessed: false };
    });
  }

  async setDesignBasis(scope: ProjectScope, { version, designBasis }: DesignBasisUpdate): Promise<void> {
    await this.change(scope, version, (_, project) => {
      const before = project.settings.designBasis;
      const changes = changesBetween<DesignBasis>(before, designBasis, Object.keys(designBasis) as (keyof DesignBasis)[]);
      project.settings = { ...project.settings, designBasis };
      return { action: 'design basis changed', changes, assessed: changes.length > 0 };
    });
  }

  async setTakeoffSettings(scope: ProjectScope, { version, ...settings }: TakeoffSettingsUpdate): Promise<void> {
    await this.change(scope, version, (_, project) => {
      const changes = changesBetween<TakeoffSettings>(project.settings, settings, takeoffFields);
      project.settings = { ...project.settings, ...settings };
      return { action: 'takeoff settings changed', changes, assessed: changes.some((change) => assessedFields.includes(change.field)) };
    });
  }

  /** One edit of the project's row: refused where stale, traced, and followed by a new assessment where it enters results. */
  private async change(
    scope: ProjectScope, version: number,
    edit: (manager: EntityManager, project: Project) => Promise<Edit> | Edit,
  ): Promise<void> {
    await this.dataSource.transaction(async (manager) => {
      await lockProject(manager, scope.projectId);
      const project = await manager.findOneBy(Project, { id: scope.projectId });
      if (!project) throw notFound('project');
      const { settings, number, name, place, currency, note } = project;
      await this.audit.requireVersion(manager, 'project', project, version, () => ({ number, name, place, currency, note, settings, version: project.version }));
      const { action, changes, assessed } = await edit(manager, project);
      if (!changes.length) return;
      await manager.save(project);
      await this.record(manager, scope, action, project, changes);
      if (assessed) await this.assessment.recompute(manager, scope.projectId, null);
    });
  }

  private async requireFreeNumber(manager: EntityManager, number: string, exceptId: string | null): Promise<void> {
    const holder = await manager.findOne(Project, { where: { number }, select: { id: true } });
    if (holder && holder.id !== exceptId) throw conflict(message('shared.exists', { what: 'project with the number', name: number }));
  }

  private record(manager: EntityManager, { projectId, actor }: ProjectScope, action: string, project: Project, changes: Change[]): Promise<void> {
    return this.audit.record(manager, { projectId, actor, action, entity: 'project', entityId: projectId, label: `${project.number} ${project.name}`, changes });
  }
}

interface Edit {
  action: string;
  changes: Change[];
  assessed: boolean;
}
