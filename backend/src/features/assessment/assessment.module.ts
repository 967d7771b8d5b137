import { Module } from '@nestjs/common';
import { AssessmentController } from './assessment.controller.js';
import { AssessmentService } from './assessment.service.js';
import { JobsModule } from '../jobs/jobs.module.js';
import { OpenItemsService } from './open-items.service.js';
import { ProjectInputsService } from './project-inputs.service.js';
import { RecalculationService } from './recalculation.service.js';

@Module({
  imports: [JobsModule],
  controllers: [AssessmentController],
  providers: [AssessmentService, OpenItemsService, ProjectInputsService, RecalculationService],
  exports: [AssessmentService, OpenItemsService, ProjectInputsService, RecalculationService],
})
export class AssessmentModule {}
