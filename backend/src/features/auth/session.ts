import type { INestApplication } from '@nestjs/common';
import connectPgSimple from 'connect-pg-simple';
import session from 'express-session';
import passport from 'passport';
import pg from 'pg';

export const SESSION_COOKIE = 'mantlet.sid';
/** without a request in between */
export const SESSION_HOURS = 12;

/** Sessions live in PostgreSQL, so that any server process can answer and a restart signs nobody out. */
export function useSessions(app: INestApplication, options: { url: string; secret: string; secure: boolean }): { close: () => Promise<void> } {
  const pool = new pg.Pool({ connectionString: options.url, max: 4 });
  pool.on('error', () => undefined);
  const store = new (connectPgSimple(session))({ pool, tableName: 'session', pruneSessionInterval: 15 * 60 });
  app.use(
    session({
      store,
      name: SESSION_COOKIE,
      secret: options.secret,
      resave: false,
      saveUninitialized: false,
      rolling: true,
      cookie: { httpOnly: true, sameSite: 'lax', secure: options.secure, maxAge: SESSION_HOURS * 60 * 60 * 1000 },
    }),
  );
  app.use(passport.initialize());
  app.use(passport.session());
  return {
    close: async () => {
      store.close();
      await pool.end();
    },
  };
}
