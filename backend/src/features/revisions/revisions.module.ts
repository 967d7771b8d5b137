import { Module } from '@nestjs/common';
import { AssessmentModule } from '../assessment/assessment.module.js';
import { AuditModule } from '../audit/audit.module.js';
import { QuantitiesModule } from '../quantities/quantities.module.js';
import { RevisionsController } from './revisions.controller.js';
import { RevisionsService } from './revisions.service.js';
import { SchedulePdfService } from './schedule-pdf.service.js';
import { SnapshotService } from './snapshot.service.js';

@Module({
  imports: [AssessmentModule, QuantitiesModule, AuditModule],
  controllers: [RevisionsController],
  providers: [RevisionsService, SnapshotService, SchedulePdfService],
  exports: [RevisionsService],
})
export class RevisionsModule {}
