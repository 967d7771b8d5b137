import type { ScopedRequest } from '../../shared/access.js';
import type { Authenticated } from '../users/user-records.js';

declare module 'express-session' {
  interface SessionData {
    /** when and where, for its owner, who may want to end it from elsewhere; and by which password */
    opened?: { at: string; userAgent: string; stamp: string };
  }
}

/** Signs somebody in: passport ends whatever session there was and begins one under a new identifier. */
export async function openSession(request: ScopedRequest, { actor, stamp }: Authenticated): Promise<void> {
  await new Promise<void>((done, fail) => request.logIn(actor, (error: unknown) => (error ? fail(error) : done())));
  request.session.opened = { at: new Date().toISOString(), userAgent: (request.headers['user-agent'] ?? '').slice(0, 400), stamp };
}
