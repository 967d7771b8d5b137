import { Module } from '@nestjs/common';
import { AssessmentService } from './assessment.service.js';
import { OpenItemsService } from './open-items.service.js';

@Module({ providers: [AssessmentService, OpenItemsService], exports: [AssessmentService, OpenItemsService] })
export class AssessmentModule {}
