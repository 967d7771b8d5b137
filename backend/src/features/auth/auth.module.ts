import { Module } from '@nestjs/common';
import { APP_GUARD } from '@nestjs/core';
import { PassportModule } from '@nestjs/passport';
import { ThrottlerModule } from '@nestjs/throttler';
import { AuditModule } from '../audit/audit.module.js';
import { MembershipsModule } from '../memberships/memberships.module.js';
import { UsersModule } from '../users/users.module.js';
import { AccessGuard } from './access.guard.js';
import { AccountLinksController } from './account-links.controller.js';
import { accountThrottlers } from './account-throttler.guard.js';
import { AuthController } from './auth.controller.js';
import { LocalStrategy } from './local.strategy.js';
import { OwnSessionsController } from './own-sessions.controller.js';
import { OwnSessionsService } from './own-sessions.service.js';
import { SessionSerializer } from './session.serializer.js';

@Module({
  imports: [AuditModule, UsersModule, MembershipsModule, PassportModule.register({ session: true }), ThrottlerModule.forRoot({ throttlers: accountThrottlers, setHeaders: false })],
  controllers: [AuthController, AccountLinksController, OwnSessionsController],
  providers: [LocalStrategy, SessionSerializer, OwnSessionsService, { provide: APP_GUARD, useClass: AccessGuard }],
})
export class AuthModule {}
