import { HttpStatus } from '@nestjs/common';
import { message, sentence } from '@mantlet/common';
import type { NestExpressApplication } from '@nestjs/platform-express';
import { SwaggerModule } from '@nestjs/swagger';
import type { NextFunction, Response } from 'express';
import type { ScopedRequest } from '../access.js';
import { openApiDocument } from './document.js';

const PATH = 'api/docs';

/**
 * The document of the API at /api/docs, to read and to try with one's own session, and as JSON beside it. It holds no data, but
 * who cannot use the API need not know its shape: for whoever is signed in. After the sessions, before the routes.
 */
export function serveDocs(app: NestExpressApplication): void {
  app.use(`/${PATH}`, (request: ScopedRequest, response: Response, next: NextFunction) => {
    if (request.user) return next();
    const reason = message('account.signed-out', {});
    response.status(HttpStatus.UNAUTHORIZED).json({ message: sentence(reason), code: reason.code });
  });
  SwaggerModule.setup(PATH, app, () => openApiDocument(app), {
    jsonDocumentUrl: `${PATH}/openapi.json`,
    raw: ['json'],
    customSiteTitle: 'Mantlet: API',
    // the bare layout: no bar with somebody else's mark
    swaggerOptions: { layout: 'BaseLayout', deepLinking: true, displayOperationId: false },
  });
}
