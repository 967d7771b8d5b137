import { Module } from '@nestjs/common';
import { TypeOrmModule } from '@nestjs/typeorm';
import { AuditEntry } from './audit-entry.entity.js';
import { AuditController } from './audit.controller.js';
import { AuditService } from './audit.service.js';

@Module({ imports: [TypeOrmModule.forFeature([AuditEntry])], controllers: [AuditController], providers: [AuditService], exports: [AuditService] })
export class AuditModule {}
