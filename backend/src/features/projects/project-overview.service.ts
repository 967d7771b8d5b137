import { Injectable } from '@nestjs/common';
import type { ProjectDto, ProjectListItemDto, Role } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource, In, IsNull } from 'typeorm';
import type { Actor, ProjectScope } from '../../shared/access.js';
import { isDesigner } from '../../shared/access.js';
import { notFound } from '../../shared/refusal.js';
import { OpenItemsService } from '../assessment/open-items.service.js';
import { Level } from '../levels/level.entity.js';
import { MembershipsService } from '../memberships/memberships.service.js';
import { Product } from '../products/product.entity.js';
import { Revision } from '../revisions/revision.entity.js';
import { Zone } from '../zones/zone.entity.js';
import { ZonesService, emptyTally, sumTallies } from '../zones/zones.service.js';
import type { Tally } from '../zones/zones.service.js';
import { Project } from './project.entity.js';

type RevisionHead = Pick<Revision, 'id' | 'projectId' | 'code' | 'state' | 'preparedById' | 'members' | 'protectedAreaM2'>;
interface Revisions { open: RevisionHead | null; issued: RevisionHead | null }

/** What people see of a project before they open any of its pages; those without a design role see what is issued. */
@Injectable()
export class ProjectOverviewService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly memberships: MembershipsService,
    private readonly zones: ZonesService,
    private readonly openItems: OpenItemsService,
  ) {}

  /** The projects a person is on, by number, with what waits on them. */
  async list(actor: Actor): Promise<ProjectListItemDto[]> {
    const held = new Map((await this.memberships.ofUser(actor.id)).map(({ projectId, roles }) => [projectId, roles]));
    const ids = [...held.keys()];
    const projects = await this.dataSource.manager.find(Project, { where: { id: In(ids) }, select: { id: true, number: true, name: true, place: true } });
    const revisions = await this.revisionsOf(ids);
    const inDesign = ids.filter((id) => isDesigner({ roles: held.get(id) ?? [] }));
    const tallies = await this.talliesOf(inDesign);
    const waiting = await this.openItems.waiting(inDesign);
    const byNumber = new Intl.Collator('en', { numeric: true });
    return projects
      .sort((a, b) => byNumber.compare(a.number, b.number))
      .map((project) => {
        const roles = held.get(project.id) ?? [];
        const { open, issued } = revisions.get(project.id) ?? { open: null, issued: null };
        const head = { id: project.id, number: project.number, name: project.name, place: project.place, roles };
        if (!isDesigner({ roles })) {
          return { ...head, revision: shown(issued), members: issued?.members ?? null, protectedAreaM2: issued?.protectedAreaM2 ?? null, open: null, waitsOnMe: 0 };
        }
        const tally = tallies.get(project.id) ?? emptyTally;
        return {
          ...head, revision: shown(open ?? issued), members: tally.members, protectedAreaM2: tally.unassessed > 0 ? null : tally.protectedAreaM2, open: tally.open,
          waitsOnMe: waitsOn(roles, waiting.get(project.id)) + signatureOf(actor, roles, open),
        };
      });
  }

  async get(scope: ProjectScope): Promise<ProjectDto> {
    const project = await this.dataSource.manager.findOneBy(Project, { id: scope.projectId });
    if (!project) throw notFound('project');
    const { open, issued } = (await this.revisionsOf([project.id])).get(project.id) ?? { open: null, issued: null };
    const designs = isDesigner(scope);
    const current = designs ? (open ?? issued) : issued;
    const { id, number, name, place, currency, note, version } = project;
    return {
      id, number, name, place, currency, version, roles: scope.roles,
      // what the team writes for itself
      note: designs ? note : '',
      settings: designs ? project.settings : null,
      revision: current && { id: current.id, code: current.code, state: current.state },
      issuedRevision: issued && { id: issued.id, code: issued.code },
      counts: designs ? await this.countsOf(id) : await this.issuedCounts(issued),
    };
  }

  private async countsOf(projectId: string): Promise<ProjectDto['counts']> {
    const { manager } = this.dataSource;
    const tally = (await this.talliesOf([projectId])).get(projectId) ?? emptyTally;
    return {
      levels: await manager.countBy(Level, { projectId }),
      zones: await manager.countBy(Zone, { projectId }),
      products: await manager.count(Product, { where: [{ projectId }, { projectId: IsNull() }] }),
      members: tally.members, open: tally.open,
    };
  }

  /** What the issued revision froze; nothing of it is open. */
  private async issuedCounts(issued: RevisionHead | null): Promise<ProjectDto['counts']> {
    const rows: Omit<ProjectDto['counts'], 'members' | 'open'>[] = issued
      ? await this.dataSource.manager.query(
          `SELECT jsonb_array_length(s->'levels') AS levels, jsonb_array_length(s->'zones') AS zones, jsonb_array_length(s->'products') AS products
             FROM (SELECT snapshot::jsonb AS s FROM revisions WHERE id = $1) issued`,
          [issued.id],
        )
      : [];
    const { levels, zones, products } = rows[0] ?? { levels: 0, zones: 0, products: 0 };
    return { levels, zones, products, members: issued?.members ?? 0, open: 0 };
  }

  private async talliesOf(projectIds: string[]): Promise<Map<string, Tally>> {
    const byZone = await this.zones.tallies(projectIds);
    return new Map(projectIds.map((id) => [id, sumTallies(byZone.filter((tally) => tally.projectId === id))]));
  }

  private async revisionsOf(projectIds: string[]): Promise<Map<string, Revisions>> {
    const found: RevisionHead[] = await this.dataSource.manager.find(Revision, {
      where: { projectId: In(projectIds), state: In(['draft', 'prepared', 'checked', 'issued']) },
      select: { id: true, projectId: true, code: true, state: true, preparedById: true, members: true, protectedAreaM2: true },
    });
    return new Map(projectIds.map((id) => {
      const own = found.filter((revision) => revision.projectId === id);
      return [id, { open: own.find((revision) => revision.state !== 'issued') ?? null, issued: own.find((revision) => revision.state === 'issued') ?? null }];
    }));
  }
}

const shown = (revision: RevisionHead | null): ProjectListItemDto['revision'] => revision && { code: revision.code, state: revision.state };

const waitsOn = (roles: readonly Role[], waiting: ReadonlyMap<Role, number> | undefined): number =>
  roles.reduce((sum, role) => sum + (waiting?.get(role) ?? 0), 0);

/** 1 where the open revision waits for this person: to check what another prepared, or to issue what is checked. */
function signatureOf(actor: Actor, roles: readonly Role[], open: RevisionHead | null): number {
  if (!open || !roles.includes('specifier')) return 0;
  return open.state === 'checked' || (open.state === 'prepared' && open.preparedById !== actor.id) ? 1 : 0;
}
