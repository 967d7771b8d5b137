import { HttpStatus, Injectable } from '@nestjs/common';
import { message } from '@mantlet/common';
import type { PasswordChange, SetUp, UserDto, UserInput, UserUpdate } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource } from 'typeorm';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../../shared/access.js';
import { Refusal, conflict, notFound } from '../../shared/refusal.js';
import { AuditService, changesBetween } from '../audit/audit.service.js';
import { PasswordService } from './password.service.js';
import { User } from './user.entity.js';

/** Accounts: who may sign in, and the administrator's say over them. */
@Injectable()
export class UsersService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly passwords: PasswordService,
    private readonly audit: AuditService,
  ) {}

  async isEmpty(): Promise<boolean> {
    return !(await this.dataSource.manager.exists(User));
  }

  /** The account if e-mail and password belong together and it is in use, else null. */
  async authenticate(email: string, password: string): Promise<Actor | null> {
    const users = this.dataSource.getRepository(User);
    const user = await users.createQueryBuilder('u').addSelect('u.passwordHash').where('u.email = :email', { email }).getOne();
    const matches = await this.passwords.verify(user?.passwordHash ?? null, password);
    if (!user || !matches || user.disabled) return null;
    await users.update(user.id, { lastSignedInAt: new Date() });
    return toActor(user);
  }

  async findActor(id: string): Promise<Actor | null> {
    const user = await this.dataSource.manager.findOneBy(User, { id, disabled: false });
    return user ? toActor(user) : null;
  }

  async list(): Promise<UserDto[]> {
    const users = await this.dataSource.manager.find(User, { order: { name: 'ASC' } });
    return users.map(toUserDto);
  }

  /** Only while nobody has an account; two who try at once cannot both succeed. */
  async setUp(input: SetUp): Promise<Actor> {
    return this.dataSource.transaction(async (manager) => {
      await manager.query('LOCK TABLE users IN EXCLUSIVE MODE');
      if (await manager.exists(User)) throw conflict(message('account.set-up-already', {}));
      return toActor(await this.insert(manager, { ...input, administrator: true }, { id: null, name: 'First visitor' }));
    });
  }

  async create(input: UserInput, by: Actor): Promise<UserDto> {
    return this.dataSource.transaction(async (manager) => toUserDto(await this.insert(manager, input, by)));
  }

  private async insert(manager: EntityManager, input: UserInput, by: Actor | { id: null; name: string }): Promise<User> {
    if (await manager.existsBy(User, { email: input.email })) throw conflict(message('shared.exists', { what: 'account', name: input.email }));
    const { password, ...rest } = input;
    const user = await manager.save(manager.create(User, { ...rest, passwordHash: await this.passwords.hash(password) }));
    await this.audit.record(manager, { projectId: null, actor: by, action: 'account made', entity: 'user', entityId: user.id, label: user.email });
    return user;
  }

  async update(id: string, input: UserUpdate, by: Actor): Promise<UserDto> {
    return this.dataSource.transaction(async (manager) => {
      // held to the end, so that two administrators cannot put each other out of office at once
      const inOffice = await manager.find(User, { where: { administrator: true, disabled: false }, order: { id: 'ASC' }, lock: { mode: 'pessimistic_write' } });
      const user = await manager.findOneBy(User, { id });
      if (!user) throw notFound('account');
      const losesOffice = user.administrator && (!input.administrator || input.disabled);
      if (losesOffice && !inOffice.some((other) => other.id !== id)) {
        throw conflict(message('shared.in-use', { what: 'account', by: 'the installation as its only administrator' }));
      }
      const changes = changesBetween<UserUpdate>(user, input, ['name', 'administrator', 'disabled']);
      Object.assign(user, input);
      await manager.save(user);
      if (input.disabled) await manager.query(`DELETE FROM "session" WHERE sess->'passport'->>'user' = $1`, [id]);
      await this.audit.record(manager, { projectId: null, actor: by, action: 'account changed', entity: 'user', entityId: id, label: user.email, changes });
      return toUserDto(user);
    });
  }

  /** Ends the person's other sessions too. */
  async changePassword(actor: Actor, input: PasswordChange, sessionId: string): Promise<void> {
    if (!(await this.authenticate(actor.email, input.current))) {
      throw new Refusal(HttpStatus.UNPROCESSABLE_ENTITY, message('account.sign-in-failed', {}), { issues: [{ path: 'current', message: 'This is not your present password.' }] });
    }
    const passwordHash = await this.passwords.hash(input.next);
    await this.dataSource.transaction(async (manager) => {
      await manager.update(User, actor.id, { passwordHash });
      await manager.query(`DELETE FROM "session" WHERE sess->'passport'->>'user' = $1 AND sid <> $2`, [actor.id, sessionId]);
      await this.audit.record(manager, { projectId: null, actor, action: 'password changed', entity: 'user', entityId: actor.id, label: actor.email });
    });
  }
}

function toActor(user: User): Actor {
  return { id: user.id, name: user.name, email: user.email, administrator: user.administrator };
}
function toUserDto(user: User): UserDto {
  return { ...toActor(user), disabled: user.disabled, lastSignedInAt: user.lastSignedInAt?.toISOString() ?? null };
}
