import { Module } from '@nestjs/common';
import { AssessmentModule } from '../assessment/assessment.module.js';
import { AuditModule } from '../audit/audit.module.js';
import { SectionsModule } from '../sections/sections.module.js';
import { AcceptancesService } from './acceptances.service.js';
import { MemberListService } from './member-list.service.js';
import { MemberSheetService } from './member-sheet.service.js';
import { MemberWriterService } from './member-writer.service.js';
import { AcceptancesController, MembersController } from './members.controller.js';
import { MembersService } from './members.service.js';

@Module({
  imports: [AssessmentModule, AuditModule, SectionsModule],
  controllers: [MembersController, AcceptancesController],
  providers: [MembersService, MemberListService, MemberSheetService, MemberWriterService, AcceptancesService],
  exports: [MembersService, MemberWriterService],
})
export class MembersModule {}
