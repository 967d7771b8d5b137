import { Body, Controller, Delete, Get, HttpCode, Param, Patch, Post } from '@nestjs/common';
import { levelInputSchema, levelUpdateSchema } from '@mantlet/common';
import type { LevelDto, LevelInput, LevelUpdate } from '@mantlet/common';
import { DesignTeam, Roles, Scope } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { idParam } from '../../shared/validation.js';
import { LevelsService } from './levels.service.js';

@Controller('projects/:projectId/levels')
export class LevelsController {
  constructor(private readonly levels: LevelsService) {}

  @Get()
  @DesignTeam()
  list(@Scope() scope: ProjectScope): Promise<LevelDto[]> {
    return this.levels.list(scope.projectId);
  }

  @Post()
  @Roles('fire-engineer')
  create(@Scope() scope: ProjectScope, @Body({ schema: levelInputSchema }) input: LevelInput): Promise<LevelDto> {
    return this.levels.create(scope, input);
  }

  @Patch(':levelId')
  @Roles('fire-engineer')
  update(@Scope() scope: ProjectScope, @Param('levelId', idParam) levelId: string, @Body({ schema: levelUpdateSchema }) input: LevelUpdate): Promise<LevelDto> {
    return this.levels.update(scope, levelId, input);
  }

  @Delete(':levelId')
  @HttpCode(204)
  @Roles('fire-engineer')
  remove(@Scope() scope: ProjectScope, @Param('levelId', idParam) levelId: string): Promise<void> {
    return this.levels.remove(scope, levelId);
  }
}
