import { Controller, Get, HttpCode, Param, Post } from '@nestjs/common';
import { jobDtoSchema } from '@mantlet/common';
import type { JobDto } from '@mantlet/common';
import { DesignTeam, Scope } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { Returns } from '../../shared/openapi/returns.js';
import { idParam } from '../../shared/validation.js';
import { JobsService } from './jobs.service.js';

@Controller('projects/:projectId/jobs')
export class JobsController {
  constructor(private readonly jobs: JobsService) {}

  /** What goes on in the background, and what failed. */
  @Get()
  @DesignTeam()
  @Returns(jobDtoSchema.array(), 'Work that goes on in the background, and what failed of it.')
  list(@Scope() scope: ProjectScope): Promise<JobDto[]> {
    return this.jobs.list(scope.projectId);
  }

  /** Puts a job that failed to the queue again. */
  @Post(':jobId/retry')
  @HttpCode(200)
  @DesignTeam()
  @Returns(jobDtoSchema.array(), 'Puts a job that failed to the queue again.')
  retry(@Scope() scope: ProjectScope, @Param('jobId', idParam) jobId: string): Promise<JobDto[]> {
    return this.jobs.retry(scope.projectId, jobId);
  }
}
