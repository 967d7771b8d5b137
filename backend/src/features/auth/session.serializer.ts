import { Injectable } from '@nestjs/common';
import { PassportSerializer } from '@nestjs/passport';
import type { Actor } from '../../shared/access.js';
import { UsersService } from '../users/users.service.js';

/** The session holds the account's id only; who that is, is asked anew at each request. */
@Injectable()
export class SessionSerializer extends PassportSerializer {
  constructor(private readonly users: UsersService) {
    super();
  }

  override serializeUser(user: Actor, done: (error: unknown, id?: string) => void): void {
    done(null, user.id);
  }

  override deserializeUser(id: string, done: (error: unknown, user?: Actor | false) => void): void {
    this.users.findActor(id).then((actor) => done(null, actor ?? false), done);
  }
}
