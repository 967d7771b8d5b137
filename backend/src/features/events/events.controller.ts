import { Controller, Get, HttpStatus, Req, Res } from '@nestjs/common';
import { message } from '@mantlet/common';
import type { Request, Response } from 'express';
import { AnyRole, Scope } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { ReturnsFile } from '../../shared/openapi/returns.js';
import { Refusal } from '../../shared/refusal.js';
import { EventStreamsService } from './event-streams.service.js';

@Controller('projects/:projectId/events')
export class EventsController {
  constructor(private readonly streams: EventStreamsService) {}

  /** Changes of the project as they are committed, for as long as the page is open; those without a design role hear of issued work and the team. */
  @Get()
  @AnyRole()
  @ReturnsFile('text/event-stream', 'Changes of the project as they are committed, for as long as the stream is open; those without a design role hear of issued work and the team.')
  async follow(@Scope() scope: ProjectScope, @Req() request: Request, @Res() response: Response): Promise<void> {
    if (!request.headers.accept?.includes('text/event-stream')) throw new Refusal(HttpStatus.NOT_ACCEPTABLE, message('live.not-a-stream', {}));
    await this.streams.open({ projectId: scope.projectId, userId: scope.actor.id, sessionId: request.sessionID, roles: scope.roles }, response);
  }
}
