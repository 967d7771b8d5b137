import { Injectable } from '@nestjs/common';
import type { IssuedBuildingDto, ProjectSettings, SiteDto } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource } from 'typeorm';
import { isDesigner } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { RevisionsService } from '../revisions/revisions.service.js';
import { issuedBuildingOf } from './issued-building.js';
import { siteOf } from './site-view.js';

/** What to apply where, for those who build: the issued revision and nothing else. */
@Injectable()
export class SiteService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly revisions: RevisionsService,
  ) {}

  async view(scope: ProjectScope): Promise<SiteDto> {
    const issued = await this.revisions.issued(scope.projectId);
    // whether prices are given away is decided now, not when the schedule was frozen
    const [project] = await this.dataSource.manager.query<{ settings: ProjectSettings }[]>('SELECT settings FROM projects WHERE id = $1', [scope.projectId]);
    const prices = isDesigner(scope) || project?.settings.contractorSeesPrices === true;
    if (!issued) return { project: null, revision: null, levels: [], purchase: [], prices };
    const { revision, snapshot } = issued;
    const { number, name, place, currency } = snapshot.project;
    return {
      project: { number, name, place, currency },
      revision: { id: revision.id, code: revision.code, issuedAt: revision.issuedAt?.toISOString() ?? '', pdfSha256: revision.pdfSha256 ?? '', pdfAvailable: revision.pdfSha256 !== null },
      ...siteOf(snapshot, prices), prices,
    };
  }

  async building(projectId: string): Promise<IssuedBuildingDto> {
    const issued = await this.revisions.issued(projectId);
    if (!issued) return { revision: null, members: 0, protectedMembers: 0, bareMembers: 0, protectedAreaM2: 0, levels: [] };
    const { revision, snapshot } = issued;
    return { revision: { id: revision.id, code: revision.code, issuedAt: revision.issuedAt?.toISOString() ?? '' }, ...issuedBuildingOf(snapshot) };
  }
}
