import { isDeepStrictEqual } from 'node:util';
import { errorDtoSchema } from '@mantlet/common';
import type { INestApplication } from '@nestjs/common';
import type { z } from 'zod';
import { routesOf } from '../../src/shared/openapi/routes.js';
import type { FoundRoute } from '../../src/shared/openapi/routes.js';

/** What was answered over HTTP, as superagent tells it. */
export interface Answered {
  method: string;
  path: string;
  status: number;
  type: string;
  text: string | undefined;
  body: unknown;
}

/**
 * Holds every answer that a test gets to what the route says it answers: the right status, every key that is promised, of the kind
 * that is promised, and no key more, since what is not in the contract may be nobody's to see.
 */
export class AnswerCheck {
  readonly faults = new Set<string>();
  checked = 0;
  private readonly routes: { route: FoundRoute; fits: RegExp }[];

  constructor(app: INestApplication) {
    // those without parameters first: /members/bulk is not /members/:memberId
    const routes = routesOf(app).sort((a, b) => a.path.split(':').length - b.path.split(':').length);
    this.routes = routes.map((route) => ({ route, fits: new RegExp(`^${route.path.replace(/[.]/g, '\\.').replace(/:\w+/g, '[^/]+')}$`) }));
  }

  check(answered: Answered): void {
    this.checked += 1;
    const fault = this.faultOf(answered);
    if (fault) this.faults.add(`${answered.method} ${answered.path} answered ${answered.status}: ${fault}`.replace(/[0-9a-f]{8}-[0-9a-f-]{27}/g, ':id'));
  }

  private faultOf({ method, path, status, type, text, body }: Answered): string | null {
    if (status >= 400) return type === 'application/json' ? misfit(errorDtoSchema, body) : 'a refusal that is not JSON';
    const route = this.routes.find((one) => one.route.method === method.toLowerCase() && one.fits.test(path))?.route;
    if (!route) return path.startsWith('/api/docs') ? null : 'no route of ours';
    if (status !== route.status) return `not the ${route.status} that is stated`;
    if (!route.returned) return 'no statement of what it answers';
    const { schema, contentType } = route.returned;
    if (schema) return type === 'application/json' ? misfit(schema, body) : `${type} instead of JSON`;
    if (!contentType) return text ? 'something where nothing is stated' : null;
    // an evidence file comes as what it is
    return type === contentType || contentType === 'application/octet-stream' ? null : `${type} instead of ${contentType}`;
  }
}

/** What does not fit the schema, or is more than the schema says. */
export function misfit(schema: z.ZodType, body: unknown): string | null {
  const read = schema.safeParse(body);
  if (!read.success) return read.error.issues.slice(0, 3).map((issue) => `${issue.path.join('.')}: ${issue.message}`).join('; ');
  return difference(JSON.parse(JSON.stringify(read.data)), body, '');
}

function difference(read: unknown, sent: unknown, at: string): string | null {
  if (isDeepStrictEqual(read, sent)) return null;
  if (isObject(read) && isObject(sent)) {
    for (const key of new Set([...Object.keys(read), ...Object.keys(sent)])) {
      const where = `${at}.${key}`;
      if (!(key in read)) return `${where} is not in the contract`;
      if (!(key in sent)) return `${where} is missing`;
      const found = difference(read[key], sent[key], where);
      if (found) return found;
    }
    return null;
  }
  return `${at} reads otherwise than it was sent`;
}
const isObject = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null;
