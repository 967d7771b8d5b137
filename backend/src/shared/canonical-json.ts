import { createHash } from 'node:crypto';

/**
 * JSON with sorted keys and no white space, so that equal content has equal text and so an equal digest. `undefined` is left out.
 * @throws TypeError for numbers that JSON cannot hold: a frozen record never silently turns NaN into null
 */
export function canonicalJson(value: unknown): string {
  if (value === null || value === undefined) return 'null';
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) throw new TypeError(`${value} cannot be written as JSON`);
    return JSON.stringify(value);
  }
  if (typeof value !== 'object') return JSON.stringify(value);
  if (value instanceof Date) return JSON.stringify(value.toISOString());
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`;
  const entries = Object.entries(value).filter(([, v]) => v !== undefined);
  entries.sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0));
  return `{${entries.map(([key, v]) => `${JSON.stringify(key)}:${canonicalJson(v)}`).join(',')}}`;
}

export const sha256 = (data: string | Uint8Array): string => createHash('sha256').update(data).digest('hex');
