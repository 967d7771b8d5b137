import type { OpenAPIObject } from '@nestjs/swagger';
import { openApiDocument, openApiPath } from '../src/shared/openapi/document.js';
import { accessTable } from './access.table.js';
import { z } from 'zod';
import { AnswerCheck, misfit } from './support/answers.js';
import { TestApp } from './support/app.js';
import { clientCalls } from './support/client-calls.js';
import type { Shape } from './support/client-calls.js';
import { routesOf } from './support/routes.js';

interface Operation {
  operationId: string;
  summary: string;
  description: string;
  tags: string[];
  parameters: { name: string; in: string; required: boolean; schema: object }[];
  requestBody?: { content: Record<string, { schema: object }> };
  responses: Record<string, { description: string; content?: Record<string, { schema: object }> }>;
}
const verbs = ['get', 'post', 'put', 'patch', 'delete'] as const;

describe('the document of the API', () => {
  let app: TestApp;
  let document: OpenAPIObject;
  let operations: [string, Operation][];
  const operation = (key: string): Operation => {
    const found = operations.find(([one]) => one === key);
    if (!found) throw new Error(`no operation ${key}`);
    return found[1];
  };

  beforeAll(async () => {
    app = await TestApp.start();
    document = JSON.parse(JSON.stringify(openApiDocument(app.app))) as OpenAPIObject;
    operations = Object.entries(document.paths).flatMap(([path, item]) =>
      verbs.flatMap((verb): [string, Operation][] => (item[verb] ? [[`${verb.toUpperCase()} ${path}`, item[verb] as unknown as Operation]] : [])));
  });
  afterAll(() => app.stop());

  it('has an operation for every route that somebody may call, and for no other', () => {
    expect(operations.map(([key]) => key).sort()).toEqual(Object.keys(accessTable).map((key) => openApiPath(key)).sort());
  });

  it('says of every route in a sentence what it is for, who may call it and what it answers', () => {
    const silent = routesOf(app.app).filter((route) => !route.returned || !/^[A-Z].*\.$/.test(route.returned.summary)).map((route) => `${route.method} ${route.path}`);
    expect(silent).toEqual([]);
    for (const [key, { summary, description, tags }] of operations) {
      expect({ key, summary }).toEqual({ key, summary: expect.stringMatching(/\.$/) });
      expect({ key, description }).toEqual({ key, description: expect.stringMatching(/^For .+\.$/) });
      expect({ key, tags: tags.length }).toEqual({ key, tags: 1 });
    }
  });

  // OpenAPI Specification 3.1.0: 4.8.1 OpenAPI Object, 4.8.10 Operation Object, 4.8.12 Parameter Object, 4.8.17 Response Object
  it('is what OpenAPI 3.1 asks for', () => {
    expect(document).toMatchObject({ openapi: '3.1.0', info: { title: 'Mantlet', version: expect.any(String) as string } });
    const ids = operations.map(([, { operationId }]) => operationId);
    expect(new Set(ids).size).toBe(ids.length);
    for (const [key, { parameters, responses, requestBody }] of operations) {
      const inPath = parameters.filter((one) => one.in === 'path');
      expect({ key, names: inPath.map((one) => one.name).sort() }).toEqual({ key, names: [...key.matchAll(/\{(\w+)\}/g)].map((one) => one[1]).sort() });
      expect(inPath.every((one) => one.required)).toBe(true);
      expect(new Set(parameters.map((one) => `${one.in} ${one.name}`)).size).toBe(parameters.length);
      expect({ key, got: key.startsWith('GET') ? requestBody : undefined }).toEqual({ key, got: undefined });
      expect(Object.keys(responses).some((status) => /^2\d\d$/.test(status))).toBe(true);
      for (const response of Object.values(responses)) expect(response.description).not.toBe('');
    }
  });

  it('leads every reference somewhere, and has no component that nothing leads to', () => {
    const schemas = Object.keys(document.components?.schemas ?? {});
    const text = JSON.stringify(document);
    const referred = new Set([...text.matchAll(/"\$ref":"([^"]*)"/g)].map((found) => found[1]!));
    expect([...referred].filter((ref) => !schemas.includes(ref.replace('#/components/schemas/', '')))).toEqual([]);
    expect(schemas.filter((name) => !referred.has(`#/components/schemas/${name}`))).toEqual([]);
  });

  it('is made from the contracts: what is sent may be left out where it has a default, what comes back may not', () => {
    const schemas = document.components!.schemas as unknown as Record<string, { required: string[]; properties: Record<string, object>; additionalProperties?: boolean }>;
    expect(schemas['MemberInput']!.required).not.toContain('note');
    expect(schemas['MemberDto']!.required).toContain('note');
    expect(schemas['MemberDto']!.additionalProperties).toBe(false);
    expect(schemas['ZoneInput']!.properties['periodMin']).toEqual({ type: 'number', enum: [15, 20, 30, 45, 60, 75, 90, 120, 180, 240] });
    expect(operation('POST /api/projects/{projectId}/zones')).toMatchObject({
      description: 'For the fire engineer on the project.',
      requestBody: { content: { 'application/json': { schema: { $ref: '#/components/schemas/ZoneInput' } } } },
      responses: { 201: { content: { 'application/json': { schema: { $ref: '#/components/schemas/ZoneDto' } } } }, 403: {}, 409: {}, 422: {} },
    });
    expect(operation('GET /api/projects/{projectId}/members').parameters).toEqual(expect.arrayContaining([
      expect.objectContaining({ name: 'zoneIds', in: 'query', required: false, explode: false }), expect.objectContaining({ name: 'page', in: 'query' }),
    ]));
    expect(Object.keys(operation('POST /api/projects/{projectId}/imports').requestBody!.content)).toEqual(['multipart/form-data']);
    expect(Object.keys(operation('GET /api/projects/{projectId}/revisions/{revisionId}/pdf').responses[200]!.content!)).toEqual(['application/pdf']);
  });

  it('is for whoever is signed in, page, parts and JSON', async () => {
    for (const path of ['', '/openapi.json', '/swagger-ui-bundle.js', '/swagger-ui-init.js']) await app.anonymous().get(`/api/docs${path}`).expect(401);
    const agent = await app.signIn(await app.makeUser('Somebody'));
    const page = await agent.get('/api/docs').expect(200);
    // under the policy of the whole site: every script is a file
    expect(page.text).not.toMatch(/<script(?![^>]*\bsrc=)[^>]*>\s*\S/);
    const served = await agent.get('/api/docs/openapi.json').expect(200);
    expect(served.body).toEqual(document);
  });
});

/** How a test of the client's calls names what the document says. */
function nameOf(schema: Record<string, unknown> | undefined): string | null {
  if (!schema) return null;
  if (typeof schema['$ref'] === 'string') return schema['$ref'].replace('#/components/schemas/', '');
  const { type, items, properties } = schema as { type?: string; items?: Record<string, unknown>; properties?: Record<string, Record<string, unknown>> };
  if (type === 'array') return `${nameOf(items) ?? ''}[]`;
  const row = properties?.['items']?.['items'] as Record<string, unknown> | undefined;
  return row && properties?.['pageSize'] ? `Page<${nameOf(row) ?? ''}>` : null;
}

describe('the client', () => {
  let app: TestApp;
  let document: OpenAPIObject;
  beforeAll(async () => {
    app = await TestApp.start();
    document = openApiDocument(app.app);
  });
  afterAll(() => app.stop());

  const calls = clientCalls();
  const operationsOf = (method: string, path: string): Operation[] => {
    const parts = `/api${path}`.split('/');
    const fits = (template: string, open: boolean): boolean => {
      const wanted = template.split('/');
      return wanted.length === parts.length && wanted.every((part, i) => (part.startsWith('{') ? parts[i] === '{}' : part === parts[i] || (open && parts[i] === '{}')));
    };
    const found = (open: boolean): Operation[] => Object.entries(document.paths)
      .filter(([template, item]) => fits(template, open) && (item as Record<string, unknown>)[method])
      .map(([, item]) => (item as unknown as Record<string, Operation>)[method]!);
    const exact = found(false);
    // a word of the address may be filled in as well: prepare, check, issue
    return exact.length ? exact : found(true);
  };
  const keysOf = (schema: Record<string, unknown> | undefined): string[] => {
    const name = nameOf(schema);
    const resolved = name ? (document.components!.schemas![name] as Record<string, unknown> | undefined) : schema;
    return Object.keys((resolved?.['properties'] ?? {}) as object);
  };
  /** a name is one of those that the operations give; keys are all among theirs */
  const agrees = (shape: Shape | null, schemas: (Record<string, unknown> | undefined)[]): boolean => {
    if (shape === null) return true;
    if (typeof shape !== 'string') return schemas.every((schema) => shape.every((key) => keysOf(schema).includes(key)));
    return shape.split(' | ').some((name) => schemas.every((schema) => nameOf(schema) === name));
  };

  it('is read by this test: calls of every feature, most with a named answer', () => {
    expect(calls.length).toBeGreaterThan(45);
    expect(new Set(calls.map((call) => call.file)).size).toBeGreaterThanOrEqual(11);
    expect(calls.filter((call) => typeof call.answer === 'string').length).toBeGreaterThan(calls.length / 2);
    expect(calls).toContainEqual({ file: 'features/building/api/building.ts', method: 'get', paths: ['/projects/{}/building'], body: null, answer: 'BuildingDto' });
  });

  it.each(calls.map((call) => [`${call.method.toUpperCase()} ${call.paths.join(' or ')}`, call.file, call] as const))('%s in %s is an operation, of the contracts that the client takes it for', (_, __, call) => {
    for (const path of call.paths) {
      const operations = operationsOf(call.method, path);
      expect({ path, known: operations.length > 0 }).toEqual({ path, known: true });
      const bodies = operations.map((one) => one.requestBody?.content['application/json']?.schema as Record<string, unknown> | undefined);
      const answers = operations.map((one) => Object.entries(one.responses).find(([status]) => status.startsWith('2'))![1].content?.['application/json']?.schema as Record<string, unknown> | undefined);
      expect({ path, body: call.body, documented: bodies.map(nameOf), agrees: agrees(call.body, bodies) }).toMatchObject({ agrees: true });
      expect({ path, answer: call.answer, documented: answers.map(nameOf), agrees: agrees(call.answer, answers) }).toMatchObject({ agrees: true });
    }
  });
});

describe('the check of answers', () => {
  it('sees every answer that a test gets, and tells what does not fit', async () => {
    const app = await TestApp.start();
    await app.anonymous().get('/api/session').expect(200);
    await app.anonymous().get('/api/projects').expect(401);
    expect(app.answers.checked).toBe(2);
    const check = new AnswerCheck(app.app);
    const answered = { method: 'GET', path: '/api/session', status: 200, type: 'application/json', text: '' };
    check.check({ ...answered, body: { user: null, needsSetUp: true, caughtMail: false } });
    expect([...check.faults]).toEqual([]);
    check.check({ ...answered, body: { user: null, needsSetUp: true, caughtMail: false, sessions: 12 } });
    check.check({ ...answered, status: 201, body: {} });
    check.check({ ...answered, status: 404, body: { message: 'No.', code: 'x', stack: 'at …' } });
    expect([...check.faults]).toEqual([
      'GET /api/session answered 200: .sessions is not in the contract', 'GET /api/session answered 201: not the 200 that is stated', 'GET /api/session answered 404: .stack is not in the contract',
    ]);
    await app.stop();
  });

  const schema = z.object({ id: z.string(), part: z.object({ size: z.number() }).nullable() });
  it.each([
    ['fits', { id: 'a', part: { size: 1 } }, null],
    ['has a key too many', { id: 'a', part: { size: 1, secret: 'x' } }, '.part.secret is not in the contract'],
    ['lacks one', { part: null }, 'id: is needed'],
  ])('tells an answer that %s', (_, body, said) => expect(misfit(schema, body)).toBe(said));
});
