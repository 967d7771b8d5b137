import { Controller, HttpCode, Post } from '@nestjs/common';
import { recalculationDtoSchema } from '@mantlet/common';
import type { RecalculationDto } from '@mantlet/common';
import { DesignTeam, Scope } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { Returns } from '../../shared/openapi/returns.js';
import { AssessmentService } from './assessment.service.js';

@Controller('projects/:projectId')
export class AssessmentController {
  constructor(private readonly assessment: AssessmentService) {}

  /** Assesses every member of the project anew; says how many there are and how many came out differently, or that a worker does it. */
  @Post('recalculate')
  @HttpCode(200)
  @DesignTeam()
  @Returns(recalculationDtoSchema, 'Assesses every member anew; says how many there are and how many came out differently, or that a worker does it.')
  recalculate(@Scope() scope: ProjectScope): Promise<RecalculationDto> {
    return this.assessment.recalculate(scope.projectId);
  }
}
