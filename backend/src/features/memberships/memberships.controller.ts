import { Body, Controller, Delete, Get, HttpCode, Param, Post, Put } from '@nestjs/common';
import { membershipInputSchema, membershipRolesSchema } from '@mantlet/common';
import type { MembershipDto, MembershipInput, MembershipRoles } from '@mantlet/common';
import { AnyRole, Roles, Scope } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { idParam } from '../../shared/validation.js';
import { MembershipsService } from './memberships.service.js';

@Controller('projects/:projectId/memberships')
export class MembershipsController {
  constructor(private readonly memberships: MembershipsService) {}

  @Get()
  @AnyRole()
  list(@Scope() scope: ProjectScope): Promise<MembershipDto[]> {
    return this.memberships.list(scope.projectId);
  }

  @Post()
  @Roles('fire-engineer', 'specifier')
  add(@Scope() scope: ProjectScope, @Body({ schema: membershipInputSchema }) input: MembershipInput): Promise<MembershipDto> {
    return this.memberships.add(scope, input);
  }

  @Put(':userId')
  @Roles('fire-engineer', 'specifier')
  setRoles(@Scope() scope: ProjectScope, @Param('userId', idParam) userId: string, @Body({ schema: membershipRolesSchema }) input: MembershipRoles): Promise<MembershipDto> {
    return this.memberships.setRoles(scope, userId, input);
  }

  @Delete(':userId')
  @HttpCode(204)
  @Roles('fire-engineer', 'specifier')
  remove(@Scope() scope: ProjectScope, @Param('userId', idParam) userId: string): Promise<void> {
    return this.memberships.remove(scope, userId);
  }
}
