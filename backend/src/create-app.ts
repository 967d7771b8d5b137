import { HttpStatus } from '@nestjs/common';
import { message, sentence } from '@mantlet/common';
import { NestFactory } from '@nestjs/core';
import type { NestExpressApplication } from '@nestjs/platform-express';
import type { NextFunction, Request, Response } from 'express';
import helmet from 'helmet';
import { AppModule } from './app.module.js';
import { useSessions } from './features/auth/session.js';
import { serveClient } from './client.js';
import { ErrorFilter } from './shared/error.filter.js';
import { serveDocs } from './shared/openapi/serve-docs.js';
import { validationPipe } from './shared/validation.js';

export interface AppOptions {
  databaseUrl: string;
  sessionSecret: string;
  secureCookies?: boolean;
  clientDir?: string | undefined;
  quiet?: boolean;
}

const safeMethods = new Set(['GET', 'HEAD', 'OPTIONS']);
/** A browser says where a request comes from; a write from another site is refused. SameSite cookies are the first line. */
function sameOriginOnly(request: Request, response: Response, next: NextFunction): void {
  const origin = request.headers.origin;
  // one that cannot be read ("null", from a sandboxed page) is foreign as well
  const foreign = origin !== undefined && (!URL.canParse(origin) || new URL(origin).host !== request.headers.host);
  if (safeMethods.has(request.method) || !foreign) return next();
  const reason = message('shared.forbidden', { who: 'pages of this installation', what: 'send changes to it' });
  response.status(HttpStatus.FORBIDDEN).json({ message: sentence(reason), code: reason.code });
}

/** The whole application, not yet listening. Closing it closes its database connections. */
export async function createApp(options: AppOptions): Promise<NestExpressApplication> {
  const app = await NestFactory.create<NestExpressApplication>(AppModule.forDatabase(options.databaseUrl), {
    logger: options.quiet ? ['fatal'] : ['warn', 'error', 'fatal'],
  });
  // secure cookies mean a TLS proxy in front: it says over which scheme and from which address a request came
  if (options.secureCookies) app.set('trust proxy', 1);
  app.use(
    helmet({
      contentSecurityPolicy: {
        directives: {
          defaultSrc: ["'self'"],
          // antd writes its computed styles into the page
          styleSrc: ["'self'", "'unsafe-inline'"],
          imgSrc: ["'self'", 'data:', 'blob:'],
          frameSrc: ["'self'", 'blob:'],
          objectSrc: ["'none'"],
          upgradeInsecureRequests: options.secureCookies ? [] : null,
        },
      },
      strictTransportSecurity: options.secureCookies ?? false,
    }),
  );
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
