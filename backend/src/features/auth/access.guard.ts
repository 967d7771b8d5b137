import { HttpStatus, Injectable } from '@nestjs/common';
import type { CanActivate, ExecutionContext } from '@nestjs/common';
import { message, roleNames } from '@mantlet/common';
import type { Role } from '@mantlet/common';
import { Reflector } from '@nestjs/core';
import { z } from 'zod';
import { ACCESS_RULE } from '../../shared/access.js';
import type { AccessRule, ScopedRequest } from '../../shared/access.js';
import { Refusal, notFound } from '../../shared/refusal.js';
import { MembershipsService } from '../memberships/memberships.service.js';

/** Holds every route to its stated rule. */
@Injectable()
export class AccessGuard implements CanActivate {
  constructor(
    private readonly reflector: Reflector,
    private readonly memberships: MembershipsService,
  ) {}

  async canActivate(context: ExecutionContext): Promise<boolean> {
    const rule = this.reflector.getAllAndOverride<AccessRule | undefined>(ACCESS_RULE, [context.getHandler(), context.getClass()]);
    const request = context.switchToHttp().getRequest<ScopedRequest>();
    if (!rule) throw new Error(`${context.getClass().name}.${context.getHandler().name} states no access rule`);
    if (rule.kind === 'public') return true;
    const actor = request.user;
    if (!actor) throw new Refusal(HttpStatus.UNAUTHORIZED, message('account.signed-out', {}));
    if (rule.kind === 'signed-in') return true;
    if (rule.kind === 'administrator') {
      if (!actor.administrator) throw new Refusal(HttpStatus.FORBIDDEN, message('shared.forbidden', { who: 'the administrator', what: 'do this' }));
      return true;
    }
    const projectId = request.params['projectId'];
    // one answer for "does not exist" and "not yours", so that nothing can be learnt by guessing
    const roles = z.uuid().safeParse(projectId).success ? await this.memberships.rolesOf(String(projectId), actor.id) : [];
    if (!roles.length) throw notFound('project');
    if (rule.roles && !rule.roles.some((role) => roles.includes(role))) {
      throw new Refusal(HttpStatus.FORBIDDEN, message('shared.forbidden', { who: inWords(rule.roles), what: 'do this' }));
    }
    request.projectScope = { projectId: String(projectId), roles, actor };
    return true;
  }
}

/** "the fire engineer, the structural engineer or the specifier" */
function inWords(roles: readonly Role[]): string {
  const names = roles.map((role) => `the ${roleNames[role].toLowerCase()}`);
  return [names.slice(0, -1).join(', '), ...names.slice(-1)].filter(Boolean).join(' or ');
}
