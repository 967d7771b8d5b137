import { Module } from '@nestjs/common';
import { TypeOrmModule } from '@nestjs/typeorm';
import { AuditModule } from '../audit/audit.module.js';
import { Section } from './section.entity.js';
import { CatalogueController, SectionsController } from './sections.controller.js';
import { SectionsService } from './sections.service.js';

@Module({
  imports: [TypeOrmModule.forFeature([Section]), AuditModule],
  controllers: [CatalogueController, SectionsController],
  providers: [SectionsService],
  exports: [SectionsService],
})
export class SectionsModule {}
