import type { INestApplication } from '@nestjs/common';
import { errorDtoSchema, roleNames } from '@mantlet/common';
import { DocumentBuilder, SwaggerModule } from '@nestjs/swagger';
import type { OpenAPIObject } from '@nestjs/swagger';
import type { AccessRule } from '../access.js';
import { toJsonSchema } from './json-schemas.js';
import { routesOf } from './routes.js';
import type { FoundRoute } from './routes.js';

type JsonSchema = Record<string, unknown>;
type Content = Record<string, { schema: JsonSchema }>;
interface Parameter { name: string; in: string; required?: boolean; style?: string; explode?: boolean; schema: JsonSchema }
interface Operation {
  tags?: string[];
  summary?: string;
  description?: string;
  parameters?: Parameter[];
  requestBody?: { required: boolean; content: Content };
  security?: Record<string, string[]>[];
  responses: Record<string, { description: string; content?: Content }>;
}

const faults: Record<number, string> = {
  400: 'The input cannot be read or does not fit; `issues` names the fields.',
  401: 'Nobody is signed in.',
  403: 'Not for the caller’s roles, or sent from a page of another site.',
  404: 'There is no such thing, or it is not the caller’s to see.',
  409: 'It was changed meanwhile, is in use, or stands in a state that does not allow this; `current` is the version that stands.',
  413: 'Larger than what is taken.',
  422: 'Readable, but not possible; `issues` names the fields.',
  429: 'Too many tries; wait a minute.',
};

/** The routes as they stand, with the very contracts that hold what is sent and the tests hold what is answered to. */
export function openApiDocument(app: INestApplication): OpenAPIObject {
  const config = new DocumentBuilder()
    .setOpenAPIVersion('3.1.0')
    .setTitle('Mantlet')
    .setDescription('Passive fire protection of structural steel. Requests bear the session cookie of whoever signed in; every refusal is a sentence.')
    .setVersion('0.1.0')
    .addCookieAuth('mantlet.sid', { type: 'apiKey', in: 'cookie' }, 'session')
    .build();
  const document = SwaggerModule.createDocument(app, config, {
    standardSchemaConverter: (schema, { schemaType }) => toJsonSchema(schema, schemaType),
    operationIdFactory: (controller, method) => `${controller.replace(/Controller$/, '')}.${method}`,
  });
  const components = ((document.components ??= {}).schemas ??= {}) as Record<string, JsonSchema>;
  const refer = (schema: unknown): JsonSchema => {
    const converted = toJsonSchema(schema, 'output');
    Object.assign(components, converted?.components);
    return converted?.schema ?? {};
  };
  for (const route of routesOf(app)) {
    const operation = operationOf(document, route);
    if (operation) complete(operation, route, refer);
  }
  return document;
}

export const openApiPath = (path: string): string => path.replace(/:(\w+)/g, '{$1}');
const operationOf = (document: OpenAPIObject, route: FoundRoute): Operation | undefined =>
  (document.paths as Record<string, Record<string, Operation> | undefined>)[openApiPath(route.path)]?.[route.method];

/** What the framework cannot know: who may call, what comes back, which faults there are, and files. */
function complete(operation: Operation, route: FoundRoute, refer: (schema: unknown) => JsonSchema): void {
  operation.summary = route.returned?.summary ?? '';
  operation.description = route.rule ? `For ${whoMay(route.rule)}.` : '';
  const given = operation.parameters ?? [];
  const named = new Set(given.filter((one) => one.in === 'path').map((one) => one.name));
  const missing = [...route.path.matchAll(/:(\w+)/g)].map((found) => found[1]!).filter((name) => !named.has(name));
  operation.parameters = [...missing.map((name) => ({ name, in: 'path', required: true, schema: { type: 'string', format: 'uuid' } })), ...given];
  // lists travel comma-separated
  for (const one of given) if (one.in === 'query' && one.schema['type'] === 'array') Object.assign(one, { style: 'form', explode: false });
  if (route.rule?.kind !== 'public') operation.security = [{ session: [] }];
  if (route.uploads) operation.requestBody = multipart(operation.requestBody);
  operation.responses = { [route.status]: answerOf(route, refer) };
  for (const status of faultsOf(operation, route)) {
    operation.responses[status] = { description: faults[status]!, content: { 'application/json': { schema: refer(errorDtoSchema) } } };
  }
}

function answerOf({ returned }: FoundRoute, refer: (schema: unknown) => JsonSchema): Operation['responses'][string] {
  if (returned?.schema) return { description: 'Done.', content: { 'application/json': { schema: refer(returned.schema) } } };
  if (returned?.contentType) return { description: 'The content.', content: { [returned.contentType]: { schema: {} } } };
  return { description: 'Done; there is nothing to say.' };
}

function multipart(body: Operation['requestBody']): NonNullable<Operation['requestBody']> {
  const fields = Object.values(body?.content ?? {})[0]?.schema;
  const file = { type: 'object', properties: { file: { type: 'string', contentMediaType: 'application/octet-stream' } }, required: ['file'] };
  return { required: true, content: { 'multipart/form-data': { schema: fields ? { allOf: [fields, file] } : file } } };
}

function faultsOf(operation: Operation, { rule, method, throttled }: FoundRoute): number[] {
  const writes = method !== 'get';
  const takes = Boolean(operation.requestBody);
  const found = new Set<number>();
  if (takes || operation.parameters?.length) found.add(400);
  if (rule?.kind !== 'public' || throttled) found.add(401);
  if (writes || rule?.kind === 'administrator' || (rule?.kind === 'project' && rule.roles)) found.add(403);
  if (operation.parameters?.some((one) => one.in === 'path')) found.add(404);
  if (writes) for (const status of [409, 422]) found.add(status);
  if (takes) found.add(413);
  if (throttled) found.add(429);
  return [...found].sort((a, b) => a - b);
}

/** "the fire engineer or the specifier on the project" */
export function whoMay(rule: AccessRule): string {
  if (rule.kind === 'public') return 'anybody';
  if (rule.kind === 'signed-in') return 'whoever is signed in';
  if (rule.kind === 'administrator') return 'the administrator';
  if (!rule.roles) return 'whoever has a role on the project';
  const named = rule.roles.map((role) => `the ${roleNames[role].toLowerCase()}`);
  return `${[named.slice(0, -1).join(', '), ...named.slice(-1)].filter(Boolean).join(' or ')} on the project`;
}
