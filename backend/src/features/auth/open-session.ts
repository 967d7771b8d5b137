import type { Actor, ScopedRequest } from '../../shared/access.js';

declare module 'express-session' {
  interface SessionData {
    /** for its owner, who may want to end it from elsewhere */
    opened?: { at: string; userAgent: string };
  }
}

/** Signs somebody in: passport ends whatever session there was and begins one under a new identifier. */
export async function openSession(request: ScopedRequest, actor: Actor): Promise<void> {
  await new Promise<void>((done, fail) => request.logIn(actor, (error: unknown) => (error ? fail(error) : done())));
  request.session.opened = { at: new Date().toISOString(), userAgent: (request.headers['user-agent'] ?? '').slice(0, 400) };
}
