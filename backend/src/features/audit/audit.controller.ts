import { Controller, Get, Query } from '@nestjs/common';
import { auditQuerySchema } from '@mantlet/common';
import type { AuditEntryDto, AuditQuery, Page } from '@mantlet/common';
import { DesignTeam, Scope } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { AuditService } from './audit.service.js';

@Controller('projects/:projectId/audit')
export class AuditController {
  constructor(private readonly audit: AuditService) {}

  /** Newest first. */
  @Get()
  @DesignTeam()
  list(@Scope() scope: ProjectScope, @Query({ schema: auditQuerySchema }) query: AuditQuery): Promise<Page<AuditEntryDto>> {
    return this.audit.list(scope.projectId, query);
  }
}
