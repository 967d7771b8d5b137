import { Module } from '@nestjs/common';
import { TypeOrmModule } from '@nestjs/typeorm';
import { AuditModule } from '../audit/audit.module.js';
import { Level } from './level.entity.js';
import { LevelsController } from './levels.controller.js';
import { LevelsService } from './levels.service.js';

@Module({ imports: [TypeOrmModule.forFeature([Level]), AuditModule], controllers: [LevelsController], providers: [LevelsService], exports: [LevelsService] })
export class LevelsModule {}
