import { Body, Controller, Delete, Get, HttpCode, Param, Post, Query } from '@nestjs/common';
import { customSectionSchema, pageSchema, sectionDtoSchema, sectionQuerySchema } from '@mantlet/common';
import type { CustomSection, Page, SectionDto, SectionQuery } from '@mantlet/common';
import { DesignTeam, Roles, Scope, SignedIn } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { Returns, ReturnsNothing } from '../../shared/openapi/returns.js';
import { idParam } from '../../shared/validation.js';
import { SectionsService } from './sections.service.js';

@Controller('sections')
export class CatalogueController {
  constructor(private readonly sections: SectionsService) {}

  /** The catalogue, in the order of the standards' tables. */
  @Get()
  @SignedIn()
  @Returns(pageSchema(sectionDtoSchema), 'The catalogue, in the order of the standards’ tables; dimensions in mm.')
  list(@Query({ schema: sectionQuerySchema }) query: SectionQuery): Promise<Page<SectionDto>> {
    return this.sections.list(null, query);
  }
}

@Controller('projects/:projectId/sections')
export class SectionsController {
  constructor(private readonly sections: SectionsService) {}

  /** The project's own sections and the catalogue. */
  @Get()
  @DesignTeam()
  @Returns(pageSchema(sectionDtoSchema), 'The catalogue and the project’s own sections; dimensions in mm.')
  list(@Scope() scope: ProjectScope, @Query({ schema: sectionQuerySchema }) query: SectionQuery): Promise<Page<SectionDto>> {
    return this.sections.list(scope.projectId, query);
  }

  @Post()
  @Roles('specifier', 'structural-engineer')
  @Returns(sectionDtoSchema, 'Adds a section of the project’s own, by its dimensions in mm.')
  create(@Scope() scope: ProjectScope, @Body({ schema: customSectionSchema }) input: CustomSection): Promise<SectionDto> {
    return this.sections.create(scope, input);
  }

  /** Only one that no member uses. */
  @Delete(':sectionId')
  @HttpCode(204)
  @Roles('specifier', 'structural-engineer')
  @ReturnsNothing('Removes a section of the project’s own that no member uses.')
  remove(@Scope() scope: ProjectScope, @Param('sectionId', idParam) sectionId: string): Promise<void> {
    return this.sections.remove(scope, sectionId);
  }
}
