import { randomUUID } from 'node:crypto';

/** What people, their clipboards and their enemies put into forms, by what the contract asks for there. */
export interface JsonSchema {
  $ref?: string; const?: unknown; enum?: unknown[]; default?: unknown; type?: string | string[]; format?: string; pattern?: string;
  anyOf?: JsonSchema[]; oneOf?: JsonSchema[]; allOf?: JsonSchema[]; properties?: Record<string, JsonSchema>; required?: string[];
  items?: JsonSchema; additionalProperties?: JsonSchema | boolean; minItems?: number;
  minLength?: number; maxLength?: number; minimum?: number; maximum?: number; exclusiveMinimum?: number; exclusiveMaximum?: number;
}
export type Path = (string | number)[];
/** One place in a body, and a body that is otherwise as it should be. */
export interface Field { path: Path; schema: JsonSchema; body: unknown }
type Components = Record<string, JsonSchema>;

/** Takes the place of a value where there is to be none. */
export const MISSING = Symbol('missing');
/** Beyond what a double holds: it can be written in JSON and read from it, but not be made by JSON.stringify. */
export const BEYOND = '\u0001beyond\u0001';
export const written = (body: unknown): string => JSON.stringify(body).replaceAll(JSON.stringify(BEYOND), '1e400');

export function withValue(body: unknown, [head, ...rest]: Path, value: unknown): unknown {
  if (head === undefined) return value;
  const copy = (Array.isArray(body) ? [...(body as unknown[])] : { ...(body as object) }) as Record<string | number, unknown>;
  if (rest.length || value !== MISSING) {
    // a key like __proto__ is to be a key
    Object.defineProperty(copy, head, { value: withValue(copy[head], rest, value), enumerable: true, configurable: true, writable: true });
  } else if (Array.isArray(copy)) copy.splice(Number(head), 1);
  else delete copy[head];
  return copy;
}

const resolve = (schema: JsonSchema, components: Components): JsonSchema =>
  schema.$ref ? resolve(components[schema.$ref.replace('#/components/schemas/', '')] ?? {}, components) : schema;
const variantsOf = (schema: JsonSchema): JsonSchema[] | undefined => schema.anyOf ?? schema.oneOf;

/** Every place in the body, those of every other form that a union takes included. */
export function fieldsOf(given: JsonSchema, body: unknown, components: Components): Field[] {
  const found: Field[] = [];
  const walk = (schemaOrRef: JsonSchema, value: unknown, path: Path, root: unknown): void => {
    const schema = resolve(schemaOrRef, components);
    const variants = variantsOf(schema);
    if (variants) {
      const fitting = variants.findIndex((one) => fits(resolve(one, components), value, components));
      variants.forEach((variant, i) => {
        const inner = i === fitting ? value : sample(variant, components);
        walk(variant, inner, path, i === fitting ? root : withValue(root, path, inner));
      });
      return;
    }
    for (const [name, property] of Object.entries(schema.properties ?? {})) {
      const at = [...path, name];
      const there = (value as Record<string, unknown> | undefined)?.[name];
      const inner = there ?? sample(property, components);
      const within = there === undefined ? withValue(root, at, inner) : root;
      found.push({ path: at, schema: property, body: root });
      walk(property, inner, at, within);
    }
    const [first] = Object.keys((value ?? {}) as object);
    if (!schema.properties && typeof schema.additionalProperties === 'object' && first !== undefined && !Array.isArray(value)) {
      found.push({ path: [...path, first], schema: schema.additionalProperties, body: root });
      walk(schema.additionalProperties, (value as Record<string, unknown>)[first], [...path, first], root);
    }
    if (schema.items) {
      const list = value as unknown[];
      const inner = list[0] ?? sample(schema.items, components);
      const within = list.length ? root : withValue(root, path, [inner]);
      found.push({ path: [...path, 0], schema: schema.items, body: within });
      walk(schema.items, inner, [...path, 0], within);
    }
  };
  walk(given, body, [], body);
  return found;
}

/** Whether a form of a union is the one that stands there, by its kind and its fixed words. */
function fits(schema: JsonSchema, value: unknown, components: Components): boolean {
  const variants = variantsOf(schema);
  if (variants) return variants.some((one) => fits(resolve(one, components), value, components));
  if ('const' in schema) return schema.const === value;
  if (schema.enum) return schema.enum.includes(value);
  if (schema.type === 'null' || value === null) return schema.type === 'null' && value === null;
  if (schema.type === 'array' || Array.isArray(value)) return schema.type === 'array' && Array.isArray(value);
  if (typeof value !== 'object') return schema.type === 'integer' ? typeof value === 'number' : schema.type === typeof value;
  return schema.type === 'object' && Object.entries(schema.properties ?? {}).every(([name, property]) => {
    const inner = resolve(property, components);
    return !('const' in inner) || inner.const === (value as Record<string, unknown>)[name];
  });
}

/** Something that the contract takes, as far as it can be told from its shape. */
function sample(given: JsonSchema, components: Components): unknown {
  const schema = resolve(given, components);
  if ('const' in schema) return schema.const;
  if (schema.enum) return schema.enum[0];
  const variants = variantsOf(schema);
  if (variants) return sample(variants[0]!, components);
  if (schema.type === 'object') return Object.fromEntries((schema.required ?? []).map((name) => [name, sample(schema.properties?.[name] ?? {}, components)]));
  if (schema.type === 'array') return Array.from({ length: schema.minItems ?? 0 }, () => sample(schema.items ?? {}, components));
  if (schema.type === 'boolean') return true;
  if (schema.type === 'null') return null;
  if (schema.type === 'number' || schema.type === 'integer') return Math.min(Math.max(1, schema.minimum ?? 1, schema.exclusiveMinimum !== undefined ? schema.exclusiveMinimum + 1 : 1), schema.maximum ?? Infinity);
  if (schema.format === 'uuid') return randomUUID();
  if (schema.format === 'date-time') return '2030-01-01T00:00:00Z';
  if (schema.format === 'email') return 'somebody@example.test';
  return ['2030-01-01', '12.50', 'sample'].find((text) => !schema.pattern || new RegExp(schema.pattern).test(text)) ?? 'sample';
}

const nested = (depth: number): unknown => {
  let inner: unknown = 'x';
  for (let i = 0; i < depth; i += 1) inner = i % 2 ? [inner] : { a: inner };
  return inner;
};
/** Each short enough for a mark; several ills in one where all of them should be let through together. */
const texts: Record<string, string> = {
  nothing: '', blanks: ' \t ', 'blanks around it': '  B-7  ', 'markup, SQL, a formula and templates': `=1+1<script>x</script>'; DROP TABLE members;--{{7*7}}%s`,
  'emoji, right to left, marks, zero width': '🔥👩‍🚒\u202Eטרז\u202C Z\u0351\u036b\u0343A\u0334\u200b\u2060', 'line breaks': 'a\r\nb\u2028c', 'a name of objects': '__proto__',
  'half a character': '\ud83dx', 'a zero byte': 'a\0b',
};
const kinds: Record<string, unknown> = { null: null, 'a number': 7, 'a truth': true, 'an object': { toString: 'x', length: 3 }, 'a list of text': ['x'] };
const numbers: Record<string, unknown> = {
  zero: 0, minus: -1, 'a fraction': 0.30000000000000004, huge: 1e308, 'huge below': -1e308, tiny: 5e-324, 'beyond whole numbers': 2 ** 53 + 2, 'beyond 32 bit': 2 ** 31, beyond: BEYOND,
  'NaN as text': 'NaN', 'a number as text': '12', nothing: '',
};
const structures = { 'a deep nest': nested(400), text: 'x' };

export type Hostile = [said: string, value: unknown];
/** Worth trying at a place of this contract. */
export function hostileFor(given: JsonSchema, components: Components, standing: unknown): Hostile[] {
  const schema = resolve(given, components);
  const inner = variantsOf(schema)?.map((one) => resolve(one, components)) ?? [schema];
  const of = (...types: string[]): JsonSchema | undefined => inner.find((one) => types.includes(String(one.type)) && !one.enum && !('const' in one));
  const found: Record<string, unknown> = { missing: MISSING, ...kinds };
  const text = of('string');
  const number = of('number', 'integer');
  const array = of('array');
  if (text?.format === 'uuid') Object.assign(found, { text: 'x', nothing: '', 'an unknown id': randomUUID(), 'no id': '00000000-0000-0000-0000-000000000000', 'a zero byte': 'a\0b' });
  else if (text) {
    const max = text.maxLength ?? 2000;
    Object.assign(found, texts, { 'the longest': 'x'.repeat(max), 'too long': 'x'.repeat(max + 1), 'a megabyte': 'x'.repeat(1_000_000) });
  }
  if (number) Object.assign(found, numbers, number.maximum === undefined ? {} : { 'the greatest': number.maximum, 'above the greatest': number.maximum + 1 });
  if (array) Object.assign(found, structures, { 'an empty list': [], 'ten thousand': Array(10_000).fill((standing as unknown[] | null | undefined)?.[0] ?? sample(array.items ?? {}, components)), nulls: [null, null] });
  if (of('object')) Object.assign(found, structures);
  if (!text && !number) Object.assign(found, { text: 'nonsense', nothing: '', '1': 1, yes: 'true', 'a zero byte': 'a\0b' });
  return Object.entries(found);
}

/** The same in an address, already encoded: what does not decode, what comes twice, and what looks like more than text. */
export const hostileInAddress = (name: string): string[] => [
  ...['', '%00', '%ED%A0%80', 'x%00y', 'nonsense', '-1', '1.5', '1e308', '1e400', '2147483648', '%F0%9F%94%A5%E2%80%AE', '%25%27%3B--', ',,,', 'x'.repeat(5000)].map((value) => `${name}=${value}`),
  `${name}=${Array(600).fill('x').join(',')}`, `${name}=1&${name}=2`, `${name}[]=1`, `${name}[a]=1`, `${name}[__proto__]=1`, `${name}=%`,
];

/** Somewhere in the answer stands a field of this name with this value. */
export function holds(answer: unknown, name: string, value: unknown): boolean {
  if (Array.isArray(answer)) return answer.some((one) => holds(one, name, value));
  if (answer === null || typeof answer !== 'object') return false;
  return Object.entries(answer).some(([key, inner]) => (key === name && inner === value) || holds(inner, name, value));
}
export const isPlain = (value: unknown): boolean => value === null || typeof value !== 'object';
export const short = (value: unknown): string => (value === MISSING ? 'missing' : JSON.stringify(value).slice(0, 40));
