import { Module } from '@nestjs/common';
import { TypeOrmModule } from '@nestjs/typeorm';
import { AuditModule } from '../audit/audit.module.js';
import { AccountLinkRecord } from './account-link.entity.js';
import { AccountLinksService } from './account-links.service.js';
import { InvitationsService } from './invitations.service.js';
import { PasswordService } from './password.service.js';
import { User } from './user.entity.js';
import { UsersController } from './users.controller.js';
import { UsersService } from './users.service.js';

@Module({
  imports: [TypeOrmModule.forFeature([User, AccountLinkRecord]), AuditModule],
  controllers: [UsersController],
  providers: [UsersService, InvitationsService, AccountLinksService, PasswordService],
  exports: [UsersService, AccountLinksService, PasswordService],
})
export class UsersModule {}
