import { join } from 'node:path';
import type { NestExpressApplication } from '@nestjs/platform-express';
import type { NextFunction, Request, Response } from 'express';

/** Serves the built client; every address that is not the API's opens it, so that deep links work. */
export function serveClient(app: NestExpressApplication, dir: string): void {
  app.useStaticAssets(dir, { index: false, maxAge: '1y', immutable: true, redirect: false });
  app.use((request: Request, response: Response, next: NextFunction) => {
    const page = request.method === 'GET' && !request.path.startsWith('/api') && request.accepts('html');
    if (!page) return next();
    response.setHeader('Cache-Control', 'no-cache');
    response.sendFile(join(dir, 'index.html'));
  });
}
