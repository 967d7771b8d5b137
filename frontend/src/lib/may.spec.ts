import { readFileSync } from 'node:fs';
import path from 'node:path';
import { designRoles } from '@mantlet/common';
import { describe, expect, it } from 'vitest';
import { may, rights, rolesFor, rolesInWords, whyNot } from './may.js';
import type { Right } from './may.js';

describe('rights', () => {
  it('gives each decision to the role that decides it', () => {
    expect(may(['fire-engineer'], 'edit-zones')).toBe(true);
    expect(may(['structural-engineer', 'specifier'], 'edit-zones')).toBe(false);
    expect(may(['structural-engineer'], 'edit-structural')).toBe(true);
    expect(may(['fire-engineer', 'specifier'], 'edit-structural')).toBe(false);
    expect(may(['specifier'], 'edit-protection')).toBe(true);
  });
  it('shows work in progress to no contractor, inspector or reader', () => {
    expect(may(['contractor', 'inspector', 'reader'], 'see-design')).toBe(false);
    expect(may([], 'see-design')).toBe(false);
    expect(may(['reader', 'specifier'], 'see-design')).toBe(true);
  });
  it('says who may', () => {
    expect(whyNot('edit-levels')).toBe('Only the fire engineer may change levels.');
    expect(whyNot('edit-team')).toBe('Only the fire engineer or the specifier may change the team.');
    expect(rolesInWords(['specifier', 'fire-engineer'])).toBe('Specifier and fire engineer');
  });
});

/** The server's own list of routes and who may call them, which the server's tests hold it to. Read as text: the client imports nothing of the server. */
const table = [...readFileSync(path.resolve(import.meta.dirname, '../../../backend/test/access.table.ts'), 'utf8').matchAll(/'(GET|POST|PUT|PATCH|DELETE) \/api\/projects\/:projectId([^']*)': '([^']+)'/g)]
  .map(([, method = '', route = '', rule = '']) => ({ method, route, rule, roles: rule === 'design team' ? [...designRoles] : rule.split(', ') }));
/** the routes that each right stands for, by what they begin with */
const routesOf: Record<Right, RegExp> = {
  'see-design': /^GET \/(building|audit|levels|zones|sections|products|members(?!hips)|quantities|readiness)|^POST \/(recalculate|jobs|members\/found)|^\w+ \/member-views/,
  'edit-project': /^PATCH $/, 'edit-team': /^(?!GET)\w+ \/memberships/, 'edit-levels': /^(?!GET)\w+ \/levels/,
  'edit-zones': /^(?!GET)\w+ \/zones(?!.*protection)/, 'edit-protection': /^PUT \/zones\/.*protection/, 'edit-design-basis': /^PUT \/design-basis/,
  'edit-takeoff': /^PUT \/takeoff-settings/, 'accept-temperatures': /^(?!GET)\w+ \/acceptances/, 'edit-members': /^(?!GET)\w+ \/members(?!hips|.*structural|\/found)/,
  'edit-structural': /^(PUT|POST) \/members\/.*structural/, 'import-members': /^\w+ \/imports/, 'edit-sections': /^(?!GET)\w+ \/sections/,
  'edit-products': /^(?!GET)\w+ \/products/, 'edit-revisions': /^(?!GET)\w+ \/revisions/,
};
const named = ({ method, route }: { method: string; route: string }) => `${method} ${route}`;

describe('rights against the server’s list', () => {
  it('reads the list', () => expect(table.length).toBeGreaterThan(50));
  it.each(Object.keys(rights) as Right[])('%s is held by just those whom its routes admit', (right) => {
    const routes = table.filter((r) => routesOf[right].test(named(r)));
    expect(routes.length).toBeGreaterThan(0);
    for (const route of routes) expect({ route: named(route), roles: [...route.roles].sort() }).toEqual({ route: named(route), roles: [...rolesFor(right)].sort() });
  });
  it('no route that writes as a role by name is left without a right', () => {
    const writing = table.filter((r) => r.method !== 'GET' && r.rule !== 'team');
    expect(writing.filter((r) => !Object.values(routesOf).some((pattern) => pattern.test(named(r)))).map(named)).toEqual([]);
  });
});
