import { Module } from '@nestjs/common';
import { AssessmentModule } from '../assessment/assessment.module.js';
import { AuditModule } from '../audit/audit.module.js';
import { SectionsModule } from '../sections/sections.module.js';
import { AcceptancesService } from './acceptances.service.js';
import { MemberChoiceService } from './member-choice.service.js';
import { MemberListService } from './member-list.service.js';
import { MemberSheetService } from './member-sheet.service.js';
import { MemberViewsController } from './member-views.controller.js';
import { MemberViewsService } from './member-views.service.js';
import { MemberWriterService } from './member-writer.service.js';
import { MembersBulkService } from './members-bulk.service.js';
import { AcceptancesController, MembersController } from './members.controller.js';
import { MembersService } from './members.service.js';

@Module({
  imports: [AssessmentModule, AuditModule, SectionsModule],
  controllers: [MembersController, AcceptancesController, MemberViewsController],
  providers: [
    MembersService, MembersBulkService, MemberListService, MemberChoiceService, MemberSheetService, MemberWriterService, MemberViewsService, AcceptancesService,
  ],
  exports: [MembersService, MemberWriterService],
})
export class MembersModule {}
