import { Injectable } from '@nestjs/common';
import { message, roleNames, roles as allRoles } from '@mantlet/common';
import type { MembershipDto, MembershipInput, MembershipRoles, Role } from '@mantlet/common';
import { InjectDataSource, InjectRepository } from '@nestjs/typeorm';
import { DataSource, IsNull, Not, Repository } from 'typeorm';
import type { EntityManager } from 'typeorm';
import type { ProjectScope } from '../../shared/access.js';
import { conflict, notFound, unprocessable } from '../../shared/refusal.js';
import { AuditService } from '../audit/audit.service.js';
import { MailService } from '../mail/mail.service.js';
import { Project } from '../projects/project.entity.js';
import { User } from '../users/user.entity.js';
import { Membership } from './membership.entity.js';

/** Those who may change the team; one of them must always be on it. */
const leads: readonly Role[] = ['fire-engineer', 'specifier'];
const isLead = (held: readonly Role[]): boolean => held.some((role) => leads.includes(role));
/** each once, in the usual order */
const inOrder = (held: readonly Role[]): Role[] => allRoles.filter((role) => held.includes(role));

/** Who is on a project's team, with which roles. */
@Injectable()
export class MembershipsService {
  constructor(
    @InjectRepository(Membership) private readonly memberships: Repository<Membership>,
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly audit: AuditService,
    private readonly mail: MailService,
  ) {}

  async rolesOf(projectId: string, userId: string): Promise<Role[]> {
    const membership = await this.memberships.findOneBy({ projectId, userId });
    return membership?.roles ?? [];
  }

  /** The projects a person is on, with their roles there. */
  async ofUser(userId: string): Promise<{ projectId: string; roles: Role[] }[]> {
    return this.memberships.findBy({ userId });
  }

  /** By name. */
  async list(projectId: string): Promise<MembershipDto[]> {
    const team = await this.memberships.find({ where: { projectId }, relations: { user: true }, order: { user: { name: 'ASC', email: 'ASC' } } });
    return team.map(toMembershipDto);
  }

  /** In the transaction that makes the project. */
  async begin(manager: EntityManager, { projectId, actor, roles }: ProjectScope): Promise<ProjectScope> {
    if (!isLead(roles)) throw unprocessable(message('project.take-a-leading-role', {}), [{ path: 'roles', message: 'holds neither fire engineer nor specifier' }]);
    const membership = await manager.save(manager.create(Membership, { projectId, userId: actor.id, roles: inOrder(roles) }));
    await this.record(manager, { projectId, actor, roles }, 'joined the team', actor, [], membership.roles);
    return { projectId, actor, roles: membership.roles };
  }

  /** Brings somebody who has an account onto the team, and tells them by mail. */
  async add(scope: ProjectScope, input: MembershipInput, { tell } = { tell: true }): Promise<MembershipDto> {
    const { added, send } = await this.dataSource.transaction(async (manager) => {
      await this.lockTeam(manager, scope.projectId);
      // an invitation that waits to be accepted is no account yet, and whether there is one is the administrator's to know
      const user = await manager.findOneBy(User, { email: input.email, disabled: false, passwordHash: Not(IsNull()) });
      if (!user) throw unprocessable(message('team.no-account', { email: input.email }), [{ path: 'email', message: 'belongs to nobody with an account here' }]);
      if (await manager.existsBy(Membership, { projectId: scope.projectId, userId: user.id })) throw conflict(message('team.already-on', { name: user.name }));
      const membership = await manager.save(manager.create(Membership, { projectId: scope.projectId, userId: user.id, roles: inOrder(input.roles) }));
      await this.record(manager, scope, 'joined the team', user, [], membership.roles);
      return { added: toMembershipDto({ ...membership, user }), send: tell ? await this.notice(manager, scope, user, membership.roles) : null };
    });
    send?.();
    return added;
  }

  private async notice(manager: EntityManager, { projectId, actor }: ProjectScope, user: User, held: readonly Role[]): Promise<() => void> {
    const { number, name } = await manager.findOneOrFail(Project, { where: { id: projectId }, select: { id: true, number: true, name: true } });
    const roles = new Intl.ListFormat('en').format(held.map((role) => roleNames[role].toLowerCase()));
    return this.mail.prepare(manager, 'added-to-team', user, { name: user.name, addedBy: actor.name, project: `${number} ${name}`, roles, link: this.mail.link(`/projects/${projectId}`) });
  }

  async setRoles(scope: ProjectScope, userId: string, { roles, was }: MembershipRoles): Promise<MembershipDto> {
    return this.dataSource.transaction(async (manager) => {
      await this.lockTeam(manager, scope.projectId);
      const membership = await this.find(manager, scope.projectId, userId);
      if (was) await this.audit.requireUnchanged(manager, { projectId: scope.projectId, entity: 'membership', entityId: userId, what: 'team membership' }, { roles: inOrder(membership.roles) }, { roles: inOrder(was.roles) });
      const next = inOrder(roles);
      await this.requireLeadWithout(manager, scope.projectId, userId, next);
      const before = membership.roles;
      if (before.join() !== next.join()) {
        membership.roles = next;
        await manager.save(membership);
        await this.record(manager, scope, 'roles changed', membership.user, before, next);
      }
      return toMembershipDto(membership);
    });
  }

  async remove(scope: ProjectScope, userId: string): Promise<void> {
    await this.dataSource.transaction(async (manager) => {
      await this.lockTeam(manager, scope.projectId);
      const membership = await this.find(manager, scope.projectId, userId);
      await this.requireLeadWithout(manager, scope.projectId, userId, []);
      await manager.delete(Membership, { projectId: scope.projectId, userId });
      await this.record(manager, scope, 'left the team', membership.user, membership.roles, []);
    });
  }

  /** One change of a team at a time, so that two leads cannot remove each other at once. */
  private async lockTeam(manager: EntityManager, projectId: string): Promise<void> {
    await manager.findOne(Project, { where: { id: projectId }, select: { id: true }, lock: { mode: 'for_no_key_update' } });
  }

  private async find(manager: EntityManager, projectId: string, userId: string): Promise<Membership> {
    const membership = await manager.findOne(Membership, { where: { projectId, userId }, relations: { user: true } });
    if (!membership) throw notFound('person on this team');
    return membership;
  }

  private async requireLeadWithout(manager: EntityManager, projectId: string, userId: string, next: readonly Role[]): Promise<void> {
    const team = await manager.find(Membership, { where: { projectId }, relations: { user: true } });
    // an account that was disabled leads nobody
    const othersLead = team.some((one) => one.userId !== userId && !one.user.disabled && isLead(one.roles));
    if (!othersLead && !isLead(next)) throw conflict(message('team.needs-a-lead', {}));
  }

  private record(manager: EntityManager, { projectId, actor }: ProjectScope, action: string, person: { id: string; name: string }, before: readonly Role[], after: readonly Role[]): Promise<void> {
    return this.audit.record(manager, {
      projectId, actor, action, entity: 'membership', entityId: person.id, label: person.name, changes: [{ field: 'roles', old: before, new: after }],
    });
  }
}

function toMembershipDto({ userId, roles, user }: Pick<Membership, 'userId' | 'roles' | 'user'>): MembershipDto {
  return { userId, name: user.name, email: user.email, roles };
}
