import { Controller, Delete, Get, HttpCode, Param, Req } from '@nestjs/common';
import { ownSessionDtoSchema, sessionIdSchema } from '@mantlet/common';
import type { OwnSessionDto } from '@mantlet/common';
import { z } from 'zod';
import { CurrentActor, SignedIn } from '../../shared/access.js';
import type { Actor, ScopedRequest } from '../../shared/access.js';
import { Returns, ReturnsNothing } from '../../shared/openapi/returns.js';
import { OwnSessionsService } from './own-sessions.service.js';

/** Where somebody is signed in, and the end of it. */
@Controller('sessions')
export class OwnSessionsController {
  constructor(private readonly sessions: OwnSessionsService) {}

  @Get()
  @SignedIn()
  @Returns(z.array(ownSessionDtoSchema), 'Where the caller is signed in.')
  list(@CurrentActor() actor: Actor, @Req() request: ScopedRequest): Promise<OwnSessionDto[]> {
    return this.sessions.list(actor, request.sessionID);
  }

  @Delete()
  @HttpCode(204)
  @SignedIn()
  @ReturnsNothing('Ends all sessions of the caller but the one that asks.')
  endOthers(@CurrentActor() actor: Actor, @Req() request: ScopedRequest): Promise<void> {
    return this.sessions.endOthers(actor, request.sessionID);
  }

  @Delete(':sessionId')
  @HttpCode(204)
  @SignedIn()
  @ReturnsNothing('Ends one session of the caller.')
  end(@Param('sessionId', { schema: sessionIdSchema }) sessionId: string, @CurrentActor() actor: Actor): Promise<void> {
    return this.sessions.end(actor, sessionId);
  }
}
