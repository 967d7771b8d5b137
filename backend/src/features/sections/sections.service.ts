import { Injectable } from '@nestjs/common';
import { message } from '@mantlet/common';
import type { CustomSection, Page, SectionDto, SectionQuery } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource, In, IsNull } from 'typeorm';
import type { EntityManager, FindOptionsWhere } from 'typeorm';
import { determineSectionProperties, normaliseDesignation, shapeFault } from '../../calc/index.js';
import type { ProjectScope } from '../../shared/access.js';
import { lockProject } from '../../shared/project-lock.js';
import { conflict, notFound, unprocessable } from '../../shared/refusal.js';
import { AuditService } from '../audit/audit.service.js';
import { Member } from '../members/member.entity.js';
import { makeResolver } from './section-resolver.js';
import type { SectionResolver } from './section-resolver.js';
import { searchSections } from './section-search.js';
import { Section } from './section.entity.js';

export type { SectionResolver } from './section-resolver.js';

/** The catalogue's sections and those that a project made for itself. */
@Injectable()
export class SectionsService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly audit: AuditService,
  ) {}

  /** The catalogue alone where there is no project; else with the project's own first. */
  async list(projectId: string | null, query: SectionQuery): Promise<Page<SectionDto>> {
    const scopes = visibleTo(projectId).map((where) => ({ ...where, ...(query.family ? { family: query.family } : {}), ...(query.id ? { id: query.id } : {}) }));
    const names = await this.dataSource.manager.find(Section, {
      where: scopes, select: { id: true, projectId: true, family: true, designation: true, designationKey: true, otherNames: true },
    });
    const found = searchSections(names, query.search);
    const ids = found.slice((query.page - 1) * query.pageSize, query.page * query.pageSize).map((section) => section.id);
    const sections = await this.dataSource.manager.findBy(Section, { id: In(ids) });
    const byId = new Map(sections.map((section) => [section.id, section]));
    return {
      items: ids.flatMap((id) => byId.get(id) ?? []).map(toSectionDto),
      total: found.length, page: query.page, pageSize: query.pageSize,
    };
  }

  /** A section that the project may use: of the catalogue or its own; null where there is none. */
  findFor(manager: EntityManager, projectId: string, sectionId: string): Promise<Section | null> {
    return manager.findOne(Section, { where: visibleTo(projectId).map((where) => ({ ...where, id: sectionId })) });
  }

  /** Reads every name once; for schedules of many rows. Names of the project's own sections are understood too. */
  async resolver(projectId: string, manager: EntityManager = this.dataSource.manager): Promise<SectionResolver> {
    return makeResolver(await manager.find(Section, { where: visibleTo(projectId), order: { designation: 'ASC' } }));
  }

  /** A section the catalogue does not hold. Everything but its dimensions is computed; refused in words where they make no section. */
  async create(scope: ProjectScope, input: CustomSection): Promise<SectionDto> {
    const properties = propertiesOf(input);
    const designationKey = normaliseDesignation(input.designation);
    if (!designationKey) {
      throw unprocessable(message('section.no-name', { name: input.designation }), [{ path: 'designation', message: 'needs letters or numbers' }]);
    }
    return this.dataSource.transaction(async (manager) => {
      await lockProject(manager, scope.projectId);
      const known = await manager.findOne(Section, { where: visibleTo(scope.projectId).map((where) => ({ ...where, designationKey })) });
      if (known) throw conflict(message('shared.exists', { what: known.projectId ? 'section' : 'catalogue section', name: known.designation }));
      const section = await manager.save(
        manager.create(Section, {
          projectId: scope.projectId, family: 'CUSTOM', designation: input.designation, designationKey,
          otherNames: [], standard: 'Made for this project', shape: input.shape, properties,
        }),
      );
      await this.audit.record(manager, {
        projectId: scope.projectId, actor: scope.actor, action: 'section made', entity: 'section', entityId: section.id, label: section.designation,
        changes: [{ field: 'shape', old: null, new: section.shape }],
      });
      return toSectionDto(section);
    });
  }

  async remove(scope: ProjectScope, sectionId: string): Promise<void> {
    await this.dataSource.transaction(async (manager) => {
      await lockProject(manager, scope.projectId);
      const section = await manager.findOneBy(Section, { id: sectionId, projectId: scope.projectId });
      if (!section) throw notFound('section of this project');
      const users = await manager.countBy(Member, { sectionId });
      if (users) throw conflict(message('shared.in-use', { what: 'section', by: users === 1 ? '1 member' : `${users} members` }));
      await manager.delete(Section, sectionId);
      await this.audit.record(manager, {
        projectId: scope.projectId, actor: scope.actor, action: 'section deleted', entity: 'section', entityId: sectionId, label: section.designation,
        changes: [{ field: 'shape', old: section.shape, new: null }],
      });
    });
  }
}

function visibleTo(projectId: string | null): FindOptionsWhere<Section>[] {
  return projectId === null ? [{ projectId: IsNull() }] : [{ projectId: IsNull() }, { projectId }];
}

function propertiesOf(input: CustomSection): Section['properties'] {
  const fault = shapeFault(input.shape);
  const properties = fault ? { ok: false as const, reason: fault } : determineSectionProperties(input.shape);
  if (!properties.ok) throw unprocessable(properties.reason);
  return properties.value;
}

export function toSectionDto(section: Section): SectionDto {
  const { id, projectId, family, designation, otherNames, standard, shape, properties } = section;
  return { id, projectId, family, designation, otherNames, standard, shape, properties };
}
