const UNSTORABLE = /\0|\p{Surrogate}/u;

/**
 * Where in the input there is text that PostgreSQL cannot hold: a zero byte, or half of a character of two halves, which would be
 * written as another. Null where there is none.
 */
export function unstorable(value: unknown): string[] | null {
  if (typeof value === 'string') return UNSTORABLE.test(value) ? [] : null;
  if (value === null || typeof value !== 'object') return null;
  for (const [key, inner] of Object.entries(value)) {
    const found = unstorable(key) ?? unstorable(inner);
    if (found) return [key, ...found];
  }
  return null;
}
