import { HttpStatus, Injectable } from '@nestjs/common';
import type { ExecutionContext } from '@nestjs/common';
import { message } from '@mantlet/common';
import { AuthGuard } from '@nestjs/passport';
import type { ScopedRequest } from '../../shared/access.js';
import { Refusal } from '../../shared/refusal.js';
import type { Authenticated } from '../users/user-records.js';
import { openSession } from './open-session.js';

/** Checks e-mail and password, then signs in; passport gives the session a new identifier as it does. */
@Injectable()
export class LocalAuthGuard extends AuthGuard('local') {
  override async canActivate(context: ExecutionContext): Promise<boolean> {
    await super.canActivate(context);
    const request = context.switchToHttp().getRequest<ScopedRequest>();
    // as the strategy gave it; opening the session puts the person there
    await openSession(request, request.user as unknown as Authenticated);
    return true;
  }

  override handleRequest<T>(error: unknown, user: T): T {
    // a database that cannot be asked is not a wrong password
    if (error) throw error as Error;
    if (!user) throw new Refusal(HttpStatus.UNAUTHORIZED, message('account.sign-in-failed', {}));
    return user;
  }
}
