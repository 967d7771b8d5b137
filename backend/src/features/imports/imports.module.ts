import { Module } from '@nestjs/common';
import { AuditModule } from '../audit/audit.module.js';
import { MembersModule } from '../members/members.module.js';
import { SectionsModule } from '../sections/sections.module.js';
import { ImportConfirmService } from './import-confirm.service.js';
import { ImportEvaluationService } from './import-evaluation.service.js';
import { ImportsController } from './imports.controller.js';
import { ImportsService } from './imports.service.js';

@Module({
  imports: [AuditModule, MembersModule, SectionsModule],
  controllers: [ImportsController],
  providers: [ImportsService, ImportConfirmService, ImportEvaluationService],
})
export class ImportsModule {}
