import { Controller, Get, Query } from '@nestjs/common';
import { auditEntryDtoSchema, auditQuerySchema, pageSchema } from '@mantlet/common';
import type { AuditEntryDto, AuditQuery, Page } from '@mantlet/common';
import { DesignTeam, Scope } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { Returns } from '../../shared/openapi/returns.js';
import { AuditService } from './audit.service.js';

@Controller('projects/:projectId/audit')
export class AuditController {
  constructor(private readonly audit: AuditService) {}

  /** Newest first. */
  @Get()
  @DesignTeam()
  @Returns(pageSchema(auditEntryDtoSchema), 'The audit trail, newest first: who, when, old, new, why.')
  list(@Scope() scope: ProjectScope, @Query({ schema: auditQuerySchema }) query: AuditQuery): Promise<Page<AuditEntryDto>> {
    return this.audit.list(scope.projectId, query);
  }
}
