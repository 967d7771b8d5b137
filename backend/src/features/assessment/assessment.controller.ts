import { Controller, HttpCode, Post } from '@nestjs/common';
import { DesignTeam, Scope } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { AssessmentService } from './assessment.service.js';

@Controller('projects/:projectId')
export class AssessmentController {
  constructor(private readonly assessment: AssessmentService) {}

  /** Assesses every member of the project anew; says how many there are and how many came out differently. */
  @Post('recalculate')
  @HttpCode(200)
  @DesignTeam()
  recalculate(@Scope() scope: ProjectScope): Promise<{ members: number; changed: number }> {
    return this.assessment.recalculate(scope.projectId);
  }
}
