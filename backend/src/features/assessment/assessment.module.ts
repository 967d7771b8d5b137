import { Module } from '@nestjs/common';
import { AssessmentService } from './assessment.service.js';

@Module({ providers: [AssessmentService], exports: [AssessmentService] })
export class AssessmentModule {}
