import { ThrottlerStorage } from '@nestjs/throttler';
import type { ThrottlerStorageService } from '@nestjs/throttler';
import { User } from '../../src/features/users/user.entity.js';
import { openApiDocument, openApiPath } from '../../src/shared/openapi/document.js';
import { accessTable } from '../access.table.js';
import { TestApp } from './app.js';
import { written } from './hostile.js';
import type { JsonSchema } from './hostile.js';
import { baseOf, cookieOf } from './listen.js';
import { inventedCoating } from './products.js';
import { furnish, pathIn } from './two-projects.js';
import { validAccountBodies, validBodies } from './valid-bodies.js';
import type { Things } from './valid-bodies.js';

export interface Operation {
  parameters: { name: string; in: string; schema: JsonSchema }[];
  requestBody?: { content: Record<string, { schema: JsonSchema }> };
}
export interface Sent { body?: BodyInit; type?: string; encoding?: string }
/** misfit: it does not fit what the route states */
export interface Answer { status: number; body: unknown; misfit?: boolean }

/** what was let through there is gone afterwards, so that all begins anew */
const destructive = /members\/delete$|confirm$/;
/** told apart in each try, so that it can be let through */
const unique = new Set(['code', 'mark', 'number', 'designation', 'name', 'email']);
/** for programmers, not for people */
const jargon = /undefined|\[object|\bnull\b|NaN|Unexpected|at position|Error:|Exception|JSON|zod|postgres|SQLSTATE|violates|node_modules|ECONN/i;

/** The routes that take a JSON body, and those that only do something. */
export const writing = Object.keys(accessTable).filter((key) => !key.startsWith('GET') && !/evidence-file|read-table|imports$/.test(key));

/** A server's fault, or a refusal that nobody understands. */
export function faultOf({ status, body, misfit }: Answer, said: unknown = ''): string | null {
  if (misfit) return `${status} does not fit what the route states`;
  if (status >= 500) return String(status);
  if (status < 400) return null;
  const { message } = body as { message: string };
  if (!/^[A-Z0-9“"].{8,}/s.test(message)) return `${status} without a sentence: ${message.slice(0, 80)}`;
  const ours = typeof said === 'string' && said !== '' ? message.replaceAll(said.trim(), '') : message;
  return jargon.test(ours) ? `${status} in the words of programmers: ${message.slice(0, 120)}` : null;
}

/** The whole server, spoken to as quickly as can be by somebody who may do everything in one project and in the installation. */
export class EveryRoute {
  letThrough = 0;
  things!: Things;
  bodies!: Record<string, (things: Things) => object>;
  private cookie = '';
  private projectId = '';
  private sharedProduct = '';
  private counter = 0;

  private constructor(
    readonly app: TestApp,
    private readonly base: string,
    readonly operations: Record<string, Operation>,
    readonly components: Record<string, JsonSchema>,
  ) {}

  static async start(): Promise<EveryRoute> {
    const app = await TestApp.start();
    const document = JSON.parse(JSON.stringify(openApiDocument(app.app))) as { paths: Record<string, Record<string, Operation>>; components: { schemas: Record<string, JsonSchema> } };
    const operations = Object.fromEntries(Object.keys(accessTable).map((key) => {
      const [verb, path] = key.split(' ') as [string, string];
      return [key, document.paths[openApiPath(path)]![verb.toLowerCase()]!];
    }));
    const routes = new EveryRoute(app, await baseOf(app.app), operations, document.components.schemas);
    await routes.begin();
    const made = await routes.send('POST', '/api/products', { body: JSON.stringify(inventedCoating({ name: 'The shared one' })), type: 'application/json' });
    routes.sharedProduct = (made.body as { id: string }).id;
    return routes;
  }

  /** A project of its own, and a person to whom things may be done. */
  async begin(): Promise<void> {
    const p = await furnish(this.app);
    const { manager } = this.app.dataSource;
    await manager.update(User, p.things.userId, { administrator: true });
    const everything = await manager.findOneByOrFail(User, { id: p.things.userId });
    const other = await this.app.makeUser('Somebody else');
    await this.app.join(p.project, other, 'reader');
    this.cookie = await cookieOf(this.app, everything);
    this.projectId = p.project.id;
    this.things = { ...p.things, userId: other.id };
    this.bodies = { ...validBodies, ...validAccountBodies(everything.email, 'a long test password') };
  }

  pathOf(key: string): string {
    const path = key.split(' ')[1]!;
    return pathIn(path, this.projectId, path.startsWith('/api/products') ? { ...this.things, productId: this.sharedProduct } : this.things);
  }

  async send(key: string, path: string, { body, type, encoding }: Sent = {}): Promise<Answer> {
    // nobody is slowed down here: what lies behind that is to be tried
    this.app.app.get<ThrottlerStorageService>(ThrottlerStorage, { strict: false }).storage.clear();
    const method = key.split(' ')[0]!;
    const headers = { cookie: this.cookie, ...(type ? { 'content-type': type } : {}), ...(encoding ? { 'content-encoding': encoding } : {}) };
    const answer = await fetch(`${this.base}${path}`, { method, headers, body: body ?? null, redirect: 'manual' });
    const contentType = (answer.headers.get('content-type') ?? '').split(';')[0]!;
    if (contentType === 'text/event-stream') {
      await answer.body?.cancel();
      return { status: answer.status, body: {} };
    }
    const text = await answer.text();
    const read: unknown = contentType === 'application/json' ? JSON.parse(text) : {};
    const known = this.app.answers.faults.size;
    this.app.answers.check({ method, path: path.split('?')[0]!, status: answer.status, type: contentType, text, body: read });
    return { status: answer.status, body: read, misfit: this.app.answers.faults.size > known };
  }
  sendJson(key: string, body: unknown): Promise<Answer> {
    return this.send(key, this.pathOf(key), { body: written(body), type: 'application/json' });
  }

  /** A body that nobody sent before. */
  fresh(key: string, body: object = this.bodies[key]!(this.things)): object {
    this.counter += 1;
    if (/session|reset/.test(key)) return body;
    const anew = (name: string, value: unknown): unknown => {
      if (!unique.has(name) || typeof value !== 'string') return value;
      return name === 'email' ? `n${this.counter}.${value}` : `${value.slice(0, 30)} ${this.counter}`;
    };
    return Object.fromEntries(Object.entries(body).map(([name, value]) => [name, anew(name, value)]));
  }

  /** What was let through must not stand in the way of the next try. */
  async again(key: string): Promise<void> {
    this.letThrough += 1;
    if (destructive.test(key)) return this.begin();
    const { dataSource } = this.app;
    for (const table of ['projects', 'zones', 'levels', 'members', 'products']) await dataSource.query(`UPDATE ${table} SET version = 1 WHERE version > 1`);
    if (key.endsWith('member-views')) await dataSource.query('DELETE FROM member_views WHERE id <> $1', [this.things.viewId]);
    if (key.endsWith(':projectId/members')) await dataSource.query(`DELETE FROM members WHERE project_id = $1 AND mark NOT LIKE '__-0%' AND id <> $2`, [this.projectId, this.things.memberId]);
  }
}
