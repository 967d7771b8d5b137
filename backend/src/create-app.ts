import { NestFactory } from '@nestjs/core';
import type { NestExpressApplication } from '@nestjs/platform-express';
import { AppModule } from './app.module.js';
import { useSessions } from './features/auth/session.js';
import { serveClient } from './client.js';
import type { MailOptions } from './features/mail/mail-options.js';
import { sameOriginOnly, useSecurityHeaders } from './security.js';
import { ErrorFilter } from './shared/error.filter.js';
import { serveDocs } from './shared/openapi/serve-docs.js';
import { validationPipe } from './shared/validation.js';

export interface AppOptions {
  databaseUrl: string;
  sessionSecret: string;
  secureCookies?: boolean;
  clientDir?: string | undefined;
  quiet?: boolean;
  mail?: MailOptions;
  /** demonstration and development only */
  caughtMailDir?: string | undefined;
}

/** The whole application, not yet listening. Closing it closes its database connections. */
export async function createApp(options: AppOptions): Promise<NestExpressApplication> {
  if (options.secureCookies && options.caughtMailDir) {
    throw new Error('Caught mail is for demonstrations and development: whoever reads it can open any account. Unset MANTLET_CAUGHT_MAIL_DIR, or MANTLET_SECURE_COOKIES.');
  }
  const app = await NestFactory.create<NestExpressApplication>(AppModule.forDatabase(options.databaseUrl, { mail: options.mail, caughtMailDir: options.caughtMailDir }), {
    logger: options.quiet ? ['fatal'] : ['warn', 'error', 'fatal'],
  });
  // secure cookies mean a TLS proxy in front: it says over which scheme and from which address a request came
  if (options.secureCookies) app.set('trust proxy', 1);
  useSecurityHeaders(app, { secure: options.secureCookies ?? false });
  // before sessions, which the client's own files need not touch
  if (options.clientDir) serveClient(app, options.clientDir);
  app.use(sameOriginOnly);
  app.useBodyParser('json', { limit: '4mb' });
  const sessions = useSessions(app, { url: options.databaseUrl, secret: options.sessionSecret, secure: options.secureCookies ?? false });
  app.setGlobalPrefix('api');
  serveDocs(app);
  app.useGlobalPipes(validationPipe());
  app.useGlobalFilters(new ErrorFilter());
  const close = app.close.bind(app);
  app.close = async () => {
    await close();
    await sessions.close();
  };
  return app;
}
