import { Module } from '@nestjs/common';
import { TypeOrmModule } from '@nestjs/typeorm';
import { AssessmentModule } from '../assessment/assessment.module.js';
import { AuditModule } from '../audit/audit.module.js';
import { LevelsModule } from '../levels/levels.module.js';
import { MembershipsModule } from '../memberships/memberships.module.js';
import { QuantitiesModule } from '../quantities/quantities.module.js';
import { ZonesModule } from '../zones/zones.module.js';
import { BuildingService } from './building.service.js';
import { ProjectOverviewService } from './project-overview.service.js';
import { Project } from './project.entity.js';
import { ProjectsController } from './projects.controller.js';
import { ProjectsService } from './projects.service.js';

@Module({
  imports: [TypeOrmModule.forFeature([Project]), AssessmentModule, AuditModule, LevelsModule, MembershipsModule, QuantitiesModule, ZonesModule],
  controllers: [ProjectsController],
  providers: [ProjectsService, ProjectOverviewService, BuildingService],
})
export class ProjectsModule {}
