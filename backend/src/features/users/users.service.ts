import { HttpStatus, Injectable } from '@nestjs/common';
import { message, sentence } from '@mantlet/common';
import type { MailFailure, MailTemplate, PasswordChange, SetUp, UserDto, UserUpdate } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource, IsNull, Not } from 'typeorm';
import type { EntityManager, SelectQueryBuilder } from 'typeorm';
import type { Actor } from '../../shared/access.js';
import { Refusal, conflict, notFound } from '../../shared/refusal.js';
import { AuditService, changesBetween } from '../audit/audit.service.js';
import { MailService } from '../mail/mail.service.js';
import { AccountLinksService } from './account-links.service.js';
import { PasswordService } from './password.service.js';
import { endSessionsOf, passwordStamp, toActor } from './user-records.js';
import type { Authenticated } from './user-records.js';
import { User } from './user.entity.js';

/** Accounts: who may sign in, and the administrator's say over them. */
@Injectable()
export class UsersService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly passwords: PasswordService,
    private readonly links: AccountLinksService,
    private readonly audit: AuditService,
    private readonly mail: MailService,
  ) {}

  async isEmpty(): Promise<boolean> {
    return !(await this.dataSource.manager.exists(User));
  }

  /** The account if e-mail and password belong together and it is in use, else null. */
  async authenticate(email: string, password: string): Promise<Authenticated | null> {
    const users = this.dataSource.getRepository(User);
    const user = await users.createQueryBuilder('u').addSelect('u.passwordHash').where('u.email = :email', { email }).getOne();
    const matches = await this.passwords.verify(user?.passwordHash ?? null, password);
    if (!user?.passwordHash || !matches || user.disabled) return null;
    await users.update(user.id, { lastSignedInAt: new Date() });
    return { actor: toActor(user), stamp: passwordStamp(user.passwordHash) };
  }

  /** Whose session it is, unless the account was closed or has got another password than the one that opened it. */
  async findActor(id: string, stamp: string | undefined): Promise<Actor | null> {
    const user = await withPassword(this.dataSource.manager, id).getOne();
    const stands = user?.passwordHash && !user.disabled && passwordStamp(user.passwordHash) === stamp;
    return stands ? toActor(user) : null;
  }

  async list(): Promise<UserDto[]> {
    return (await this.rows()).map(toUserDto);
  }

  async find(id: string): Promise<UserDto> {
    const [row] = await this.rows(id);
    if (!row) throw notFound('account');
    return toUserDto(row);
  }

  /** Only while nobody has an account; two who try at once cannot both succeed. */
  async setUp(input: SetUp): Promise<Authenticated> {
    return this.dataSource.transaction(async (manager) => {
      await manager.query('LOCK TABLE users IN EXCLUSIVE MODE');
      if (await manager.exists(User)) throw conflict(message('account.set-up-already', {}));
      const user = await this.insert(manager, { ...input, administrator: true }, { id: null, name: 'First visitor' });
      // whoever makes the first account is signed in with it
      await manager.update(User, user.id, { lastSignedInAt: new Date() });
      return { actor: toActor(user), stamp: passwordStamp(user.passwordHash ?? '') };
    });
  }

  /** An account that has its password already, as those of the demonstration do; people are invited instead. */
  async create(input: SetUp, by: Actor): Promise<void> {
    await this.dataSource.transaction((manager) => this.insert(manager, { ...input, administrator: false }, by));
  }

  private async insert(manager: EntityManager, input: SetUp & { administrator: boolean }, by: Actor | { id: null; name: string }): Promise<User> {
    if (await manager.existsBy(User, { email: input.email })) throw conflict(message('shared.exists', { what: 'account', name: input.email }));
    const { password, ...rest } = input;
    const user = await manager.save(manager.create(User, { ...rest, passwordHash: await this.passwords.hash(password) }));
    await this.audit.record(manager, { projectId: null, actor: by, action: 'account made', entity: 'user', entityId: user.id, label: user.email });
    return user;
  }

  async update(id: string, input: UserUpdate, by: Actor): Promise<UserDto> {
    await this.dataSource.transaction(async (manager) => {
      // held to the end, so that two administrators cannot put each other out of office at once; who is only invited keeps no office yet
      const inOffice = await manager.find(User, { where: { administrator: true, disabled: false, passwordHash: Not(IsNull()) }, order: { id: 'ASC' }, lock: { mode: 'pessimistic_write' } });
      const user = await manager.findOneBy(User, { id });
      if (!user) throw notFound('account');
      const losesOffice = inOffice.some((one) => one.id === id) && (!input.administrator || input.disabled);
      if (losesOffice && inOffice.length === 1) {
        throw conflict(message('shared.in-use', { what: 'account', by: 'the installation as its only administrator' }));
      }
      const changes = changesBetween<UserUpdate>(user, input, ['name', 'administrator', 'disabled']);
      Object.assign(user, input);
      await manager.save(user);
      if (input.disabled) {
        await endSessionsOf(manager, id);
        await this.links.endAll(manager, id);
      }
      await this.audit.record(manager, { projectId: null, actor: by, action: 'account changed', entity: 'user', entityId: id, label: user.email, changes });
    });
    return this.find(id);
  }

  /** Ends the person's other sessions and any link that is under way. */
  async changePassword(actor: Actor, input: PasswordChange, sessionId: string): Promise<void> {
    const proved = await this.authenticate(actor.email, input.current);
    if (!proved) throw notPresent();
    const passwordHash = await this.passwords.hash(input.next);
    const send = await this.dataSource.transaction(async (manager) => {
      const user = await withPassword(manager, actor.id).setLock('pessimistic_write').getOne();
      // by a mailed link, say, while this was under way: whoever knew the old password does not undo that
      if (!user?.passwordHash || passwordStamp(user.passwordHash) !== proved.stamp) throw notPresent();
      await manager.update(User, actor.id, { passwordHash });
      await endSessionsOf(manager, actor.id, sessionId);
      await manager.query(`UPDATE "session" SET sess = jsonb_set(sess::jsonb, '{opened,stamp}', to_jsonb($2::text)) WHERE sid = $1`, [sessionId, passwordStamp(passwordHash)]);
      await this.links.endAll(manager, actor.id);
      await this.audit.record(manager, { projectId: null, actor, action: 'password changed', entity: 'user', entityId: actor.id, label: actor.email });
      return this.mail.prepare(manager, 'password-changed', actor, { name: actor.name, link: this.mail.link('/forgotten-password') });
    });
    send();
  }

  private rows(id: string | null = null): Promise<UserRow[]> {
    return this.dataSource.query<UserRow[]>(`
      SELECT u.id, u.name, u.email, u.administrator, u.disabled, u.password_hash IS NULL AS invited, u.last_signed_in_at,
        (SELECT max(l.expires_at) FROM account_links l WHERE l.user_id = u.id AND l.purpose = 'invitation' AND l.used_at IS NULL) AS invitation_expires_at,
        m.template, CASE WHEN m.sent_at IS NULL THEN COALESCE(m.failure, CASE WHEN m.created_at < now() - interval '10 minutes' THEN 'stopped' END) END AS failure
      FROM users u
      LEFT JOIN LATERAL (SELECT * FROM mails WHERE user_id = u.id ORDER BY created_at DESC, id LIMIT 1) m ON true
      WHERE $1::uuid IS NULL OR u.id = $1
      ORDER BY u.name, u.email`, [id]);
  }
}

const notPresent = (): Refusal =>
  new Refusal(HttpStatus.UNPROCESSABLE_ENTITY, message('account.sign-in-failed', {}), { issues: [{ path: 'current', message: 'This is not your present password.' }] });

const withPassword = (manager: EntityManager, id: string): SelectQueryBuilder<User> =>
  manager.createQueryBuilder(User, 'u').addSelect('u.passwordHash').where('u.id = :id', { id });

interface UserRow extends Actor {
  disabled: boolean;
  invited: boolean;
  last_signed_in_at: Date | null;
  invitation_expires_at: Date | null;
  template: MailTemplate | null;
  failure: MailFailure | null;
}

function toUserDto(row: UserRow): UserDto {
  const { id, name, email, administrator, template, failure } = row;
  return {
    id, name, email, administrator,
    state: row.disabled ? 'disabled' : row.invited ? 'invited' : 'active',
    lastSignedInAt: row.last_signed_in_at?.toISOString() ?? null,
    invitationExpiresAt: row.invited ? (row.invitation_expires_at?.toISOString() ?? null) : null,
    mailFailure: template && failure ? sentence(message('mail.not-sent', { what: template, reason: failure })) : null,
  };
}
