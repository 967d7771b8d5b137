import type { IncomingMessage } from 'node:http';
import { Injectable } from '@nestjs/common';
import passport from 'passport';
import type { Actor, ScopedRequest } from '../../shared/access.js';
import { UsersService } from '../users/users.service.js';

/**
 * The session holds the account's id, and a sign of the password that opened it; who that is, is asked anew at each request.
 * So a sign-in that was under way while the password was changed opens nothing, whatever the order in which the two are written.
 */
@Injectable()
export class SessionSerializer {
  constructor(private readonly users: UsersService) {
    passport.serializeUser((user, done) => done(null, (user as Actor).id));
    // with the request, which the framework's own serializer does not hand on
    passport.deserializeUser<string, IncomingMessage>((request, id, done) => {
      this.users.findActor(id, (request as ScopedRequest).session.opened?.stamp).then((actor) => done(null, actor ?? false), done);
    });
  }
}
