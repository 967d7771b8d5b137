import { createHash, randomBytes, randomInt } from 'node:crypto';
import { setTimeout as wait } from 'node:timers/promises';
import { HttpStatus, Injectable } from '@nestjs/common';
import { message } from '@mantlet/common';
import type { AccountLink, AccountLinkDto, AccountLinkUse, LinkPurpose } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource, IsNull, MoreThan } from 'typeorm';
import type { EntityManager } from 'typeorm';
import { Refusal } from '../../shared/refusal.js';
import { AuditService } from '../audit/audit.service.js';
import { MailService } from '../mail/mail.service.js';
import { AccountLinkRecord } from './account-link.entity.js';
import { PasswordService } from './password.service.js';
import { User } from './user.entity.js';
import { endSessionsOf, passwordStamp, toActor } from './user-records.js';
import type { Authenticated } from './user-records.js';

export const INVITATION_DAYS = 7;
export const RESET_MINUTES = 60;
/** a stranger who asks on and on fills nobody's mailbox */
const OPEN_RESETS = 5;
const lifetimeMs: Record<LinkPurpose, number> = { invitation: INVITATION_DAYS * 24 * 60 * 60_000, 'password-reset': RESET_MINUTES * 60_000 };
const pages: Record<LinkPurpose, string> = { invitation: '/accept-invitation', 'password-reset': '/reset-password' };

const digest = (token: string): string => createHash('sha256').update(token).digest('hex');
const ended = (purpose: LinkPurpose): Refusal => new Refusal(HttpStatus.GONE, message('account.link-ended', { purpose }));

/** Links that open an account once: made, looked at, used. */
@Injectable()
export class AccountLinksService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly passwords: PasswordService,
    private readonly audit: AuditService,
    private readonly mail: MailService,
  ) {}

  /** @returns its address; the token is in the fragment, which browsers send to nobody and servers log nowhere */
  async make(manager: EntityManager, userId: string, purpose: LinkPurpose): Promise<string> {
    const token = randomBytes(32).toString('base64url');
    await manager.insert(AccountLinkRecord, { userId, purpose, tokenHash: digest(token), expiresAt: new Date(Date.now() + lifetimeMs[purpose]) });
    return this.mail.link(`${pages[purpose]}#${token}`);
  }

  /** Those that were mailed before and not used lead nowhere from then on. */
  async endAll(manager: EntityManager, userId: string): Promise<void> {
    await manager.delete(AccountLinkRecord, { userId, usedAt: IsNull() });
  }

  /** Whose link it is, for the page it opens. */
  async lookUp({ purpose, token }: AccountLink): Promise<AccountLinkDto> {
    const { user, expiresAt } = await this.open(purpose, token);
    return { purpose, name: user.name, email: user.email, expiresAt: expiresAt.toISOString() };
  }

  /** Sets the password and closes every other way in that stood open before. Of two who use a link at once, one succeeds. */
  async use({ purpose, token, password }: AccountLinkUse): Promise<Authenticated> {
    const { userId } = await this.open(purpose, token);
    const passwordHash = await this.passwords.hash(password);
    return this.dataSource.transaction(async (manager) => {
      // the account before its links, as everywhere, so that nobody who does the same at the same time waits for us
      const user = await manager.findOne(User, { where: { id: userId }, lock: { mode: 'pessimistic_write' } });
      if (!user || user.disabled) throw ended(purpose);
      const taken = await manager.update(AccountLinkRecord, { tokenHash: digest(token), purpose, usedAt: IsNull(), expiresAt: MoreThan(new Date()) }, { usedAt: new Date() });
      if (!taken.affected) throw ended(purpose);
      await manager.update(User, userId, { passwordHash, lastSignedInAt: new Date() });
      await this.endAll(manager, userId);
      await endSessionsOf(manager, userId);
      const actor = toActor(user);
      const action = purpose === 'invitation' ? 'invitation accepted' : 'password chosen by a mailed link';
      await this.audit.record(manager, { projectId: null, actor, action, entity: 'user', entityId: userId, label: user.email });
      return { actor, stamp: passwordStamp(passwordHash) };
    });
  }

  /** Answers nothing and takes its time apart from the answer, so that nobody learns who has an account. */
  askForReset(email: string): void {
    this.mail.inBackground(this.sendReset(email));
  }

  private async sendReset(email: string): Promise<void> {
    // what there is to do for an account would else slow down the answer, or the next one, by a little that can be measured
    await wait(randomInt(20, 200));
    const send = await this.dataSource.transaction(async (manager) => {
      const user = await manager.createQueryBuilder(User, 'u').setLock('pessimistic_write').where('u.email = :email AND NOT u.disabled AND u.passwordHash IS NOT NULL', { email }).getOne();
      if (!user) return null;
      const open = await manager.countBy(AccountLinkRecord, { userId: user.id, purpose: 'password-reset', usedAt: IsNull(), expiresAt: MoreThan(new Date()) });
      if (open >= OPEN_RESETS) return null;
      const link = await this.make(manager, user.id, 'password-reset');
      await this.audit.record(manager, { projectId: null, actor: { id: null, name: 'Somebody at the sign-in page' }, action: 'another password asked for', entity: 'user', entityId: user.id, label: user.email });
      return this.mail.prepare(manager, 'password-reset', user, { name: user.name, link, minutes: RESET_MINUTES });
    });
    send?.();
  }

  /** One sentence for a link that expired, was used, was replaced, or never was. */
  private async open(purpose: LinkPurpose, token: string): Promise<AccountLinkRecord> {
    const found = await this.dataSource.manager.findOne(AccountLinkRecord, {
      where: { tokenHash: digest(token), purpose, usedAt: IsNull(), expiresAt: MoreThan(new Date()) }, relations: { user: true },
    });
    if (!found || found.user.disabled) throw ended(purpose);
    return found;
  }
}
