import { Controller, Get } from '@nestjs/common';
import { siteDtoSchema } from '@mantlet/common';
import type { SiteDto } from '@mantlet/common';
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
}
