import * as contracts from '@mantlet/common';
import { z } from 'zod';

type JsonSchema = Record<string, unknown>;
export interface ConvertedSchema {
  schema: JsonSchema;
  components: Record<string, JsonSchema>;
}

/** `zoneDtoSchema` is ZoneDto in the document, as its type is in the code. */
const nameOf = (exported: string): string => `${exported[0]!.toUpperCase()}${exported.slice(1).replace(/Schema$/, '')}`;
const isAnswer = (name: string): boolean => /(Dto|^Message)$/.test(name);
/** a query is spread over its parameters */
const isQuery = (name: string): boolean => name.endsWith('Query');
const hasParts = (schema: unknown): schema is z.ZodType =>
  schema instanceof z.ZodObject || schema instanceof z.ZodUnion || schema instanceof z.ZodDiscriminatedUnion;

/**
 * Two lists of names, since a contract with defaults reads differently on its way in (may be left out) and out (is always there):
 * what is sent bears the names of inputs, what comes back those of answers.
 */
function namesOf(direction: 'input' | 'output'): z.core.$ZodRegistry<{ id: string }> {
  const names = z.registry<{ id: string }>();
  for (const [exported, schema] of Object.entries(contracts)) {
    if (!exported.endsWith('Schema') || !hasParts(schema)) continue;
    const id = nameOf(exported);
    if (isAnswer(id) === (direction === 'output') && !isQuery(id) && !names.has(schema)) names.add(schema, { id });
  }
  return names;
}
const names = { input: namesOf('input'), output: namesOf('output') };

/** A contract as JSON Schema 2020-12, the dialect of OpenAPI 3.1; what has a name becomes a component of the document. */
export function toJsonSchema(schema: unknown, direction: 'input' | 'output'): ConvertedSchema | undefined {
  if (!(schema instanceof z.ZodType)) return undefined;
  const { $schema: _dialect, $defs, ...root } = z.toJSONSchema(schema, { io: direction, metadata: names[direction], unrepresentable: 'any', target: 'draft-2020-12' }) as JsonSchema & {
    $schema?: string; $defs?: Record<string, JsonSchema>;
  };
  const components = Object.fromEntries(Object.entries($defs ?? {}).map(([name, definition]) => [name, tidied(definition)]));
  const id = names[direction].get(schema)?.id;
  if (!id) return { schema: tidied(root), components };
  return { schema: { $ref: `#/components/schemas/${id}` }, components: { [id]: tidied(root), ...components } };
}

/** Components know themselves by their key; references lead to the document's components. */
function tidied(value: JsonSchema): JsonSchema {
  const text = JSON.stringify(value, (key, part: unknown) => (key === 'id' && typeof part === 'string' ? undefined : part));
  return JSON.parse(text.replaceAll('"#/$defs/', '"#/components/schemas/')) as JsonSchema;
}
