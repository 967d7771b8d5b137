import { Body, Controller, Get, Patch, Post, Put } from '@nestjs/common';
import {
  buildingDtoSchema, designBasisUpdateSchema, projectCreateSchema, projectDtoSchema, projectListItemDtoSchema, projectUpdateSchema,
  takeoffSettingsUpdateSchema,
} from '@mantlet/common';
import type { BuildingDto, DesignBasisUpdate, ProjectCreate, ProjectDto, ProjectListItemDto, ProjectUpdate, TakeoffSettingsUpdate } from '@mantlet/common';
import { z } from 'zod';
import { AnyRole, CurrentActor, DesignTeam, Roles, Scope, SignedIn } from '../../shared/access.js';
import type { Actor, ProjectScope } from '../../shared/access.js';
import { Returns } from '../../shared/openapi/returns.js';
import { BuildingService } from './building.service.js';
import { ProjectOverviewService } from './project-overview.service.js';
import { ProjectsService } from './projects.service.js';

@Controller('projects')
export class ProjectsController {
  constructor(
    private readonly projects: ProjectsService,
    private readonly overview: ProjectOverviewService,
    private readonly buildings: BuildingService,
  ) {}

  /** Those the caller is on the team of. */
  @Get()
  @SignedIn()
  @Returns(z.array(projectListItemDtoSchema), 'The projects the caller is on the team of, with what waits on them; areas in m².')
  list(@CurrentActor() actor: Actor): Promise<ProjectListItemDto[]> {
    return this.overview.list(actor);
  }

  @Post()
  @SignedIn()
  @Returns(projectDtoSchema, 'Starts a project; the caller takes the roles they name.')
  async create(@CurrentActor() actor: Actor, @Body({ schema: projectCreateSchema }) input: ProjectCreate): Promise<ProjectDto> {
    return this.overview.get(await this.projects.create(actor, input));
  }

  @Get(':projectId')
  @AnyRole()
  @Returns(projectDtoSchema, 'A project: its particulars, settings, revision and counts.')
  get(@Scope() scope: ProjectScope): Promise<ProjectDto> {
    return this.overview.get(scope);
  }

  @Patch(':projectId')
  @Roles('fire-engineer', 'specifier')
  @Returns(projectDtoSchema, 'Changes number, name, place, currency and note.')
  async update(@Scope() scope: ProjectScope, @Body({ schema: projectUpdateSchema }) input: ProjectUpdate): Promise<ProjectDto> {
    await this.projects.update(scope, input);
    return this.overview.get(scope);
  }

  /** Every factor of the design basis; all members are assessed anew. */
  @Put(':projectId/design-basis')
  @Roles('fire-engineer')
  @Returns(projectDtoSchema, 'Sets every factor of the design basis; all members are assessed anew. Temperatures in °C.')
  async setDesignBasis(@Scope() scope: ProjectScope, @Body({ schema: designBasisUpdateSchema }) input: DesignBasisUpdate): Promise<ProjectDto> {
    await this.projects.setDesignBasis(scope, input);
    return this.overview.get(scope);
  }

  /** Reading rules and deductions (all members are assessed anew), mark-up, prices, distribution list. */
  @Put(':projectId/takeoff-settings')
  @Roles('specifier')
  @Returns(projectDtoSchema, 'Sets reading rules, deductions (mm, m²), mark-up (percent), prices and distribution list.')
  async setTakeoffSettings(@Scope() scope: ProjectScope, @Body({ schema: takeoffSettingsUpdateSchema }) input: TakeoffSettingsUpdate): Promise<ProjectDto> {
    await this.projects.setTakeoffSettings(scope, input);
    return this.overview.get(scope);
  }

  @Get(':projectId/building')
  @DesignTeam()
  @Returns(buildingDtoSchema, 'The building by level and zone, with what is open, in the order of who must act; areas in m².')
  building(@Scope() scope: ProjectScope): Promise<BuildingDto> {
    return this.buildings.get(scope.projectId);
  }
}
