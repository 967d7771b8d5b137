import { Body, Controller, Delete, Get, HttpCode, Param, Post, Put } from '@nestjs/common';
import { membershipDtoSchema, membershipInputSchema, membershipRolesSchema } from '@mantlet/common';
import type { MembershipDto, MembershipInput, MembershipRoles } from '@mantlet/common';
import { z } from 'zod';
import { AnyRole, Roles, Scope } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { Returns, ReturnsNothing } from '../../shared/openapi/returns.js';
import { idParam } from '../../shared/validation.js';
import { MembershipsService } from './memberships.service.js';

@Controller('projects/:projectId/memberships')
export class MembershipsController {
  constructor(private readonly memberships: MembershipsService) {}

  @Get()
  @AnyRole()
  @Returns(z.array(membershipDtoSchema), 'The people on the project and their roles.')
  list(@Scope() scope: ProjectScope): Promise<MembershipDto[]> {
    return this.memberships.list(scope.projectId);
  }

  @Post()
  @Roles('fire-engineer', 'specifier')
  @Returns(membershipDtoSchema, 'Takes somebody with an account onto the project.')
  add(@Scope() scope: ProjectScope, @Body({ schema: membershipInputSchema }) input: MembershipInput): Promise<MembershipDto> {
    return this.memberships.add(scope, input);
  }

  @Put(':userId')
  @Roles('fire-engineer', 'specifier')
  @Returns(membershipDtoSchema, 'Sets the roles of somebody on the project.')
  setRoles(@Scope() scope: ProjectScope, @Param('userId', idParam) userId: string, @Body({ schema: membershipRolesSchema }) input: MembershipRoles): Promise<MembershipDto> {
    return this.memberships.setRoles(scope, userId, input);
  }

  @Delete(':userId')
  @HttpCode(204)
  @Roles('fire-engineer', 'specifier')
  @ReturnsNothing('Takes somebody off the project.')
  remove(@Scope() scope: ProjectScope, @Param('userId', idParam) userId: string): Promise<void> {
    return this.memberships.remove(scope, userId);
  }
}
