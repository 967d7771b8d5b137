import { Module } from '@nestjs/common';
import { TypeOrmModule } from '@nestjs/typeorm';
import { AuditModule } from '../audit/audit.module.js';
import { PasswordService } from './password.service.js';
import { User } from './user.entity.js';
import { UsersController } from './users.controller.js';
import { UsersService } from './users.service.js';

@Module({ imports: [TypeOrmModule.forFeature([User]), AuditModule], controllers: [UsersController], providers: [UsersService, PasswordService], exports: [UsersService, PasswordService] })
export class UsersModule {}
