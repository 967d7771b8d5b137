import { designRoles, roles } from '@mantlet/common';
import { z } from 'zod';
import type { AccessRule } from '../../src/shared/access.js';

export { routesOf } from '../../src/shared/openapi/routes.js';
export type { FoundRoute } from '../../src/shared/openapi/routes.js';

/** The rule in a word or two, as the table of routes writes it. */
export function ruleInWords(rule: AccessRule): string {
  if (rule.kind !== 'project') return rule.kind;
  if (rule.roles === null) return 'team';
  const words = [...rule.roles].sort().join(', ');
  return words === [...designRoles].sort().join(', ') ? 'design team' : words;
}

/** The other way round. */
export function ruleFromWords(words: string): AccessRule {
  if (words === 'public' || words === 'signed-in' || words === 'administrator') return { kind: words };
  if (words === 'team') return { kind: 'project', roles: null };
  if (words === 'design team') return { kind: 'project', roles: designRoles };
  return { kind: 'project', roles: words.split(', ').map((word) => z.enum(roles).parse(word)) };
}
