import { z } from 'zod';
import { Body, Controller, Delete, Get, HttpCode, HttpStatus, Param, Post, Put } from '@nestjs/common';
import { memberViewDtoSchema, memberViewInputSchema } from '@mantlet/common';
import type { MemberViewDto, MemberViewInput } from '@mantlet/common';
import { DesignTeam, Scope } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { Returns, ReturnsNothing } from '../../shared/openapi/returns.js';
import { idParam } from '../../shared/validation.js';
import { MemberViewsService } from './member-views.service.js';

/** The lists a person keeps of a project's members: their own ones only. */
@Controller('projects/:projectId/member-views')
export class MemberViewsController {
  constructor(private readonly views: MemberViewsService) {}

  @Get()
  @DesignTeam()
  @Returns(z.array(memberViewDtoSchema), 'Your own kept lists of this project’s members, by name.')
  list(@Scope() scope: ProjectScope): Promise<MemberViewDto[]> {
    return this.views.list(scope);
  }

  @Post()
  @DesignTeam()
  @Returns(memberViewDtoSchema, 'Keeps a list under a name of your own.')
  create(@Scope() scope: ProjectScope, @Body({ schema: memberViewInputSchema }) input: MemberViewInput): Promise<MemberViewDto> {
    return this.views.create(scope, input);
  }

  @Put(':viewId')
  @DesignTeam()
  @Returns(memberViewDtoSchema, 'Another name, or another list under the name.')
  update(@Scope() scope: ProjectScope, @Param('viewId', idParam) viewId: string, @Body({ schema: memberViewInputSchema }) input: MemberViewInput): Promise<MemberViewDto> {
    return this.views.update(scope, viewId, input);
  }

  @Delete(':viewId')
  @HttpCode(HttpStatus.NO_CONTENT)
  @DesignTeam()
  @ReturnsNothing('The list is kept no more.')
  remove(@Scope() scope: ProjectScope, @Param('viewId', idParam) viewId: string): Promise<void> {
    return this.views.remove(scope, viewId);
  }
}
