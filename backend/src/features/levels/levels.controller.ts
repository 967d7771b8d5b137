import { Body, Controller, Delete, Get, HttpCode, Param, Patch, Post } from '@nestjs/common';
import { levelDtoSchema, levelInputSchema, levelUpdateSchema } from '@mantlet/common';
import type { LevelDto, LevelInput, LevelUpdate } from '@mantlet/common';
import { z } from 'zod';
import { DesignTeam, Roles, Scope } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { Returns, ReturnsNothing } from '../../shared/openapi/returns.js';
import { idParam } from '../../shared/validation.js';
import { LevelsService } from './levels.service.js';

@Controller('projects/:projectId/levels')
export class LevelsController {
  constructor(private readonly levels: LevelsService) {}

  @Get()
  @DesignTeam()
  @Returns(z.array(levelDtoSchema), 'The levels of the building, lowest first; elevations and heights in metres.')
  list(@Scope() scope: ProjectScope): Promise<LevelDto[]> {
    return this.levels.list(scope.projectId);
  }

  @Post()
  @Roles('fire-engineer')
  @Returns(levelDtoSchema, 'Adds a level.')
  create(@Scope() scope: ProjectScope, @Body({ schema: levelInputSchema }) input: LevelInput): Promise<LevelDto> {
    return this.levels.create(scope, input);
  }

  @Patch(':levelId')
  @Roles('fire-engineer')
  @Returns(levelDtoSchema, 'Changes a level; needs the version that was read.')
  update(@Scope() scope: ProjectScope, @Param('levelId', idParam) levelId: string, @Body({ schema: levelUpdateSchema }) input: LevelUpdate): Promise<LevelDto> {
    return this.levels.update(scope, levelId, input);
  }

  @Delete(':levelId')
  @HttpCode(204)
  @Roles('fire-engineer')
  @ReturnsNothing('Removes a level that holds no zone.')
  remove(@Scope() scope: ProjectScope, @Param('levelId', idParam) levelId: string): Promise<void> {
    return this.levels.remove(scope, levelId);
  }
}
