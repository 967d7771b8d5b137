import { Controller, Get } from '@nestjs/common';
import { issuedBuildingDtoSchema, siteDtoSchema } from '@mantlet/common';
import type { IssuedBuildingDto, SiteDto } from '@mantlet/common';
import { AnyRole, Scope } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { Returns } from '../../shared/openapi/returns.js';
import { SiteService } from './site.service.js';

@Controller('projects/:projectId/site')
export class SiteController {
  constructor(private readonly site: SiteService) {}

  /** What to apply where, by level and zone, from the issued revision; empty until one is issued. */
  @Get()
  @AnyRole()
  @Returns(siteDtoSchema, 'What to apply where, by level and zone, from the issued revision; empty until one is issued.')
  view(@Scope() scope: ProjectScope): Promise<SiteDto> {
    return this.site.view(scope);
  }

  /** The building as issued: its levels and zones with their periods and how much of each is protected. */
  @Get('building')
  @AnyRole()
  @Returns(issuedBuildingDtoSchema, 'The building of the issued revision, by level and zone; nothing of work in progress. Heights in m, areas in m².')
  building(@Scope() scope: ProjectScope): Promise<IssuedBuildingDto> {
    return this.site.building(scope.projectId);
  }
}
