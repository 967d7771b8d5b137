import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { NestExpressApplication } from '@nestjs/platform-express';
import type { NextFunction, Request, Response } from 'express';
import { nonceOf } from './security.js';

/** As the client's build writes it. */
const NONCE_PLACE = 'MANTLET_NONCE';

/** Serves the built client; every address that is not the API's opens it, so that deep links work. */
export function serveClient(app: NestExpressApplication, dir: string): void {
  const template = readFileSync(join(dir, 'index.html'), 'utf8');
  app.useStaticAssets(dir, { index: false, maxAge: '1y', immutable: true, redirect: false });
  app.use((request: Request, response: Response, next: NextFunction) => {
    const page = request.method === 'GET' && !request.path.startsWith('/api') && request.accepts('html');
    if (!page) return next();
    // each answer has a nonce of its own, so that none may be kept
    response.setHeader('Cache-Control', 'no-store');
    response.type('html').send(template.replaceAll(NONCE_PLACE, nonceOf(response)));
  });
}
