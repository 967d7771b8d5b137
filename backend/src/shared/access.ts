import { SetMetadata, createParamDecorator } from '@nestjs/common';
import type { CustomDecorator, ExecutionContext } from '@nestjs/common';
import { designRoles } from '@mantlet/common';
import type { Role } from '@mantlet/common';
import type { Request } from 'express';

/** Who may call a route. A route without a rule is refused, and fails the tests. */
export type AccessRule =
  | { kind: 'public' }
  | { kind: 'signed-in' }
  | { kind: 'administrator' }
  /** on the project named by :projectId; any of the roles, or any role at all where null */
  | { kind: 'project'; roles: readonly Role[] | null };

export const ACCESS_RULE = 'mantlet:access';
const rule = (value: AccessRule): CustomDecorator => SetMetadata(ACCESS_RULE, value);

export const Public = (): CustomDecorator => rule({ kind: 'public' });
export const SignedIn = (): CustomDecorator => rule({ kind: 'signed-in' });
export const AdministratorOnly = (): CustomDecorator => rule({ kind: 'administrator' });
export const AnyRole = (): CustomDecorator => rule({ kind: 'project', roles: null });
export const Roles = (...roles: Role[]): CustomDecorator => rule({ kind: 'project', roles });
/** those who see work in progress */
export const DesignTeam = (): CustomDecorator => rule({ kind: 'project', roles: designRoles });

export interface Actor {
  id: string;
  name: string;
  email: string;
  administrator: boolean;
}
/** The project a request is about, and what its sender may do there. */
export interface ProjectScope {
  projectId: string;
  roles: Role[];
  actor: Actor;
}
export const isDesigner = ({ roles }: Pick<ProjectScope, 'roles'>): boolean => roles.some((role) => (designRoles as readonly Role[]).includes(role));

export type ScopedRequest = Request & { user?: Actor; projectScope?: ProjectScope };

export const CurrentActor = createParamDecorator((_: unknown, context: ExecutionContext): Actor => {
  const { user } = context.switchToHttp().getRequest<ScopedRequest>();
  if (!user) throw new Error('CurrentActor on a route that does not ask for a signed-in person');
  return user;
});
export const Scope = createParamDecorator((_: unknown, context: ExecutionContext): ProjectScope => {
  const { projectScope } = context.switchToHttp().getRequest<ScopedRequest>();
  if (!projectScope) throw new Error('Scope on a route without a project rule');
  return projectScope;
});
