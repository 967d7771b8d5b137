import { Body, Controller, Delete, Get, HttpCode, Param, Patch, Post, Put } from '@nestjs/common';
import { zoneDtoSchema, zoneInputSchema, zoneProtectionSchema, zoneUpdateSchema } from '@mantlet/common';
import type { ZoneDto, ZoneInput, ZoneProtection, ZoneUpdate } from '@mantlet/common';
import { z } from 'zod';
import { DesignTeam, Roles, Scope } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { Returns, ReturnsNothing } from '../../shared/openapi/returns.js';
import { idParam } from '../../shared/validation.js';
import { ZonesService } from './zones.service.js';

@Controller('projects/:projectId/zones')
export class ZonesController {
  constructor(private readonly zones: ZonesService) {}

  @Get()
  @DesignTeam()
  @Returns(z.array(zoneDtoSchema), 'Zones with their periods (minutes), systems and target protection levels.')
  list(@Scope() scope: ProjectScope): Promise<ZoneDto[]> {
    return this.zones.list(scope.projectId);
  }

  @Get(':zoneId')
  @DesignTeam()
  @Returns(zoneDtoSchema, 'One zone.')
  get(@Scope() scope: ProjectScope, @Param('zoneId', idParam) zoneId: string): Promise<ZoneDto> {
    return this.zones.get(scope.projectId, zoneId);
  }

  @Post()
  @Roles('fire-engineer')
  @Returns(zoneDtoSchema, 'Adds a zone with its period (minutes) and fire curve.')
  create(@Scope() scope: ProjectScope, @Body({ schema: zoneInputSchema }) input: ZoneInput): Promise<ZoneDto> {
    return this.zones.create(scope, input);
  }

  @Patch(':zoneId')
  @Roles('fire-engineer')
  @Returns(zoneDtoSchema, 'Changes level, code, name, period (minutes), fire curve and reference of a zone.')
  update(@Scope() scope: ProjectScope, @Param('zoneId', idParam) zoneId: string, @Body({ schema: zoneUpdateSchema }) input: ZoneUpdate): Promise<ZoneDto> {
    return this.zones.update(scope, zoneId, input);
  }

  /** The systems given replace those that stand; a member type left out has none. */
  @Put(':zoneId/protection')
  @Roles('specifier')
  @Returns(zoneDtoSchema, 'Sets environment, target policy and the systems of a zone; a member type left out has none.')
  setProtection(@Scope() scope: ProjectScope, @Param('zoneId', idParam) zoneId: string, @Body({ schema: zoneProtectionSchema }) input: ZoneProtection): Promise<ZoneDto> {
    return this.zones.setProtection(scope, zoneId, input);
  }

  @Delete(':zoneId')
  @HttpCode(204)
  @Roles('fire-engineer')
  @ReturnsNothing('Removes a zone that holds no member.')
  remove(@Scope() scope: ProjectScope, @Param('zoneId', idParam) zoneId: string): Promise<void> {
    return this.zones.remove(scope, zoneId);
  }
}
