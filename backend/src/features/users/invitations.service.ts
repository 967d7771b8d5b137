import { Injectable } from '@nestjs/common';
import { message } from '@mantlet/common';
import type { InvitationInput } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource } from 'typeorm';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../../shared/access.js';
import { conflict, notFound } from '../../shared/refusal.js';
import { AuditService } from '../audit/audit.service.js';
import { MailService } from '../mail/mail.service.js';
import { AccountLinksService, INVITATION_DAYS } from './account-links.service.js';
import { User } from './user.entity.js';

/** The administrator's invitations: an account stands from the first, and opens once its person has chosen a password. */
@Injectable()
export class InvitationsService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly links: AccountLinksService,
    private readonly audit: AuditService,
    private readonly mail: MailService,
  ) {}

  async invite(input: InvitationInput, by: Actor): Promise<string> {
    return this.andSend(async (manager) => {
      if (await manager.existsBy(User, { email: input.email })) throw conflict(message('shared.exists', { what: 'account', name: input.email }));
      const user = await manager.save(manager.create(User, { ...input, passwordHash: null }));
      await this.record(manager, by, 'invited', user);
      return { user, by };
    });
  }

  /** With a new link; the old one is dead. */
  async sendAgain(userId: string, by: Actor): Promise<string> {
    return this.andSend(async (manager) => {
      const user = await this.lockInvited(manager, userId);
      await this.links.endAll(manager, userId);
      await this.record(manager, by, 'invitation sent again', user);
      return { user, by };
    });
  }

  /** The account was never used, so it goes; what was invited when stays in the audit trail. */
  async withdraw(userId: string, by: Actor): Promise<void> {
    await this.dataSource.transaction(async (manager) => {
      const user = await this.lockInvited(manager, userId);
      await this.record(manager, by, 'invitation withdrawn', user);
      await manager.delete(User, userId);
    });
  }

  private async andSend(work: (manager: EntityManager) => Promise<{ user: User; by: Actor }>): Promise<string> {
    const { id, send } = await this.dataSource.transaction(async (manager) => {
      const { user, by } = await work(manager);
      const link = await this.links.make(manager, user.id, 'invitation');
      return { id: user.id, send: await this.mail.prepare(manager, 'invitation', user, { name: user.name, invitedBy: by.name, link, days: INVITATION_DAYS }) };
    });
    send();
    return id;
  }

  private async lockInvited(manager: EntityManager, id: string): Promise<User> {
    const user = await manager.createQueryBuilder(User, 'u').addSelect('u.passwordHash').setLock('pessimistic_write').where('u.id = :id', { id }).getOne();
    if (!user) throw notFound('account');
    if (user.passwordHash !== null || user.disabled) throw conflict(message('account.invitation-over', { name: user.name }));
    return user;
  }

  private record(manager: EntityManager, actor: Actor, action: string, user: User): Promise<void> {
    return this.audit.record(manager, { projectId: null, actor, action, entity: 'user', entityId: user.id, label: user.email, changes: [{ field: 'administrator', old: null, new: user.administrator }] });
  }
}
