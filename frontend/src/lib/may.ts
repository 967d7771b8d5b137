import { designRoles, message, roleNames, sentence } from '@mantlet/common';
import type { Role } from '@mantlet/common';
import { joinWords } from './format.js';

/** What may be done on a project, and by whom. The server decides; the client only avoids offering what it would refuse. */
export const rights = {
  'see-design': { roles: designRoles, what: 'see work in progress' },
  'edit-project': { roles: ['fire-engineer', 'specifier'], what: "change the project's title and place" },
  'edit-team': { roles: ['fire-engineer', 'specifier'], what: 'change the team' },
  'edit-levels': { roles: ['fire-engineer'], what: 'change levels' },
  'edit-zones': { roles: ['fire-engineer'], what: 'change zones and their periods' },
  'edit-design-basis': { roles: ['fire-engineer'], what: 'change the design basis' },
  'accept-temperatures': { roles: ['fire-engineer'], what: 'accept assumed or high critical temperatures' },
  'edit-takeoff': { roles: ['specifier'], what: 'change the takeoff settings' },
  'edit-protection': { roles: ['specifier'], what: 'choose environment, policy and systems' },
  'edit-members': { roles: ['specifier'], what: 'change members' },
  'import-members': { roles: ['specifier'], what: 'import members' },
  'edit-structural': { roles: ['structural-engineer'], what: "set a member's critical temperature" },
  'edit-sections': { roles: ['specifier', 'structural-engineer'], what: 'add sections of the project' },
  'edit-products': { roles: ['specifier'], what: "change the project's products" },
  'edit-revisions': { roles: ['specifier'], what: 'prepare, check and issue revisions' },
} as const satisfies Record<string, { roles: readonly Role[]; what: string }>;

export type Right = keyof typeof rights;

export const may = (held: readonly Role[], right: Right): boolean =>
  (rights[right].roles as readonly Role[]).some((role) => held.includes(role));

export const rolesFor = (right: Right): readonly Role[] => rights[right].roles;

/** "Specifier and fire engineer" */
export const rolesInWords = (held: readonly Role[]): string =>
  joinWords(held.map((role, i) => (i ? roleNames[role].toLowerCase() : roleNames[role])));

/** Why it is not offered: "Only the fire engineer may change levels." */
export const whyNot = (right: Right): string =>
  sentence(message('shared.forbidden', {
    who: joinWords(rights[right].roles.map((role) => `the ${roleNames[role].toLowerCase()}`)).replace(' and ', ' or '),
    what: rights[right].what,
  }));
