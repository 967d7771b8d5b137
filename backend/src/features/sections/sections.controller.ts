import { Body, Controller, Delete, Get, HttpCode, Param, Post, Query } from '@nestjs/common';
import { customSectionSchema, sectionQuerySchema } from '@mantlet/common';
import type { CustomSection, Page, SectionDto, SectionQuery } from '@mantlet/common';
import { DesignTeam, Roles, Scope, SignedIn } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { idParam } from '../../shared/validation.js';
import { SectionsService } from './sections.service.js';

@Controller('sections')
export class CatalogueController {
  constructor(private readonly sections: SectionsService) {}

  /** The catalogue, in the order of the standards' tables. */
  @Get()
  @SignedIn()
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
  list(@Scope() scope: ProjectScope, @Query({ schema: sectionQuerySchema }) query: SectionQuery): Promise<Page<SectionDto>> {
    return this.sections.list(scope.projectId, query);
  }

  @Post()
  @Roles('specifier', 'structural-engineer')
  create(@Scope() scope: ProjectScope, @Body({ schema: customSectionSchema }) input: CustomSection): Promise<SectionDto> {
    return this.sections.create(scope, input);
  }

  /** Only one that no member uses. */
  @Delete(':sectionId')
  @HttpCode(204)
  @Roles('specifier', 'structural-engineer')
  remove(@Scope() scope: ProjectScope, @Param('sectionId', idParam) sectionId: string): Promise<void> {
    return this.sections.remove(scope, sectionId);
  }
}
