import { randomBytes } from 'node:crypto';
import { HttpStatus } from '@nestjs/common';
import { message, sentence } from '@mantlet/common';
import type { NestExpressApplication } from '@nestjs/platform-express';
import type { NextFunction, Request, Response } from 'express';
import helmet from 'helmet';

/** Shown inside the schedule's own page; every other answer may stand in no frame at all. */
const framed = /^\/api\/projects\/[^/]+\/revisions\/[^/]+\/pdf$/;

/** The library that shows the API's documentation writes styles into its page, without a nonce. */
const documentation = /^\/api\/docs(\/|$)/;

/** Headers of every answer. A page's own style elements carry the nonce of its answer; nothing inline is let through without. */
export function useSecurityHeaders(app: NestExpressApplication, { secure }: { secure: boolean }): void {
  app.use((_request: Request, response: Response, next: NextFunction) => {
    response.locals['nonce'] = randomBytes(16).toString('base64');
    next();
  });
  const headers = ({ ancestors = "'none'", style = nonced }: { ancestors?: "'none'" | "'self'"; style?: typeof nonced | "'unsafe-inline'" } = {}) =>
    helmet({
      contentSecurityPolicy: {
        useDefaults: false,
        directives: {
          defaultSrc: ["'none'"],
          scriptSrc: ["'self'"],
          styleSrc: ["'self'", style],
          imgSrc: ["'self'", 'data:'],
          fontSrc: ["'self'"],
          connectSrc: ["'self'"],
          frameSrc: ["'self'"],
          manifestSrc: ["'self'"],
          objectSrc: ["'none'"],
          baseUri: ["'none'"],
          formAction: ["'self'"],
          frameAncestors: [ancestors],
          ...(secure ? { upgradeInsecureRequests: [] } : {}),
        },
      },
      xFrameOptions: { action: ancestors === "'none'" ? 'deny' : 'sameorigin' },
      referrerPolicy: { policy: 'no-referrer' },
      strictTransportSecurity: secure,
    });
  const [usual, inOwnPage, documents] = [headers(), headers({ ancestors: "'self'" }), headers({ style: "'unsafe-inline'" })];
  app.use((request: Request, response: Response, next: NextFunction) => {
    const chosen = framed.test(request.path) ? inOwnPage : documentation.test(request.path) ? documents : usual;
    chosen(request, response, next);
  });
  // what the API says is somebody's: it stays in no cache, unless the route knows better
  app.use('/api', (_request: Request, response: Response, next: NextFunction) => {
    response.setHeader('Cache-Control', 'no-store');
    next();
  });
}

const nonced = (_request: unknown, response: unknown): string => `'nonce-${nonceOf(response as Response)}'`;
export const nonceOf = (response: Response): string => String(response.locals['nonce']);

const safeMethods = new Set(['GET', 'HEAD', 'OPTIONS']);
/**
 * A browser says where a request comes from; a write from another site, or from another page of the same site's name, is refused.
 * SameSite cookies are the first line, this is the second. Programs that are no browser say nothing, and bring no cookies unasked.
 */
export function sameOriginOnly(request: Request, response: Response, next: NextFunction): void {
  const origin = request.headers.origin;
  // one that cannot be read ("null", from a sandboxed page) is foreign as well
  const foreignOrigin = origin !== undefined && (!URL.canParse(origin) || new URL(origin).host !== request.headers.host);
  const from = request.headers['sec-fetch-site'];
  const foreignSite = from !== undefined && from !== 'same-origin' && from !== 'none';
  if (safeMethods.has(request.method) || (!foreignOrigin && !foreignSite)) return next();
  const reason = message('shared.forbidden', { who: 'pages of this installation', what: 'send changes to it' });
  response.status(HttpStatus.FORBIDDEN).json({ message: sentence(reason), code: reason.code });
}
