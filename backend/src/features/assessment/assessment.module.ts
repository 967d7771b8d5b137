import { Module } from '@nestjs/common';
import { AssessmentController } from './assessment.controller.js';
import { AssessmentService } from './assessment.service.js';
import { OpenItemsService } from './open-items.service.js';
import { ProjectInputsService } from './project-inputs.service.js';

@Module({
  controllers: [AssessmentController],
  providers: [AssessmentService, OpenItemsService, ProjectInputsService],
  exports: [AssessmentService, OpenItemsService, ProjectInputsService],
})
export class AssessmentModule {}
