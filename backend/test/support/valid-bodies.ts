import { defaultProjectSettings } from '@mantlet/common';
import { inventedCoating } from './products.js';

/** Things that a path or a body may name. */
export interface Things {
  levelId: string; zoneId: string; memberId: string; sectionId: string; productId: string; revisionId: string; importId: string; userId: string; viewId: string; jobId: string;
}
const { designBasis, ...takeoff } = defaultProjectSettings;
const basis = { way: 'declared', temperatureC: 561, reference: 'Calculation 9, invented' };

/** The same of the routes outside projects, for an account whose password is this. */
export const validAccountBodies = (email: string, password: string): Record<string, () => object> => ({
  'POST /api/session': () => ({ email, password }),
  'POST /api/set-up': () => ({ name: 'First', email: 'first@example.test', password }),
  'PUT /api/session/password': () => ({ current: password, next: password }),
  'POST /api/password-resets': () => ({ email }),
  'POST /api/account-links/look-up': () => ({ purpose: 'invitation', token: 'x'.repeat(43) }),
  'POST /api/account-links/use': () => ({ purpose: 'invitation', token: 'x'.repeat(43), password }),
  'POST /api/users': () => ({ name: 'Ines Vited', email: 'invited@example.test', administrator: false }),
  'PATCH /api/users/:userId': () => ({ name: 'Another name', administrator: false, disabled: false }),
  'POST /api/products': () => inventedCoating({ name: 'Shared coating' }),
  'PUT /api/products/:productId': () => ({ ...inventedCoating({ name: 'Shared coating' }), version: 1 }),
});
const member = ({ zoneId, sectionId }: Things, mark = 'X-1') => ({
  zoneId, sectionId, mark, memberType: 'beam', grade: 'S275', lengthMm: 5100, quantity: 3, exposure: { arrangement: 'four-sides', reason: 'r' }, protectionForm: 'boxed',
});
const level = { code: 'LX', name: 'Another level', elevationM: 12, heightM: 3 };
const zone = ({ levelId }: Things) => ({ levelId, code: 'ZX', name: 'Another zone', periodMin: 90, curve: { kind: 'hydrocarbon' }, reference: 'r' });
const mapping = { sheet: 'members', headerRow: 1, columns: { mark: 0 }, defaults: {} };
const project = { number: 'T-777', name: 'Renamed', place: 'Elsewhere', currency: 'GBP', note: 'n' };
const shape = { kind: 'i', hMm: 400, bMm: 200, twMm: 9, tfMm: 14, rootRadiusMm: 0 };

/** A body that fits the contract of each route that takes one; `version` is the first one everywhere. */
export const validBodies: Record<string, (things: Things) => object> = {
  'POST /api/projects': () => ({ ...project, roles: ['specifier'] }),
  'PATCH /api/projects/:projectId': () => ({ ...project, version: 1 }),
  'PUT /api/projects/:projectId/design-basis': () => ({ designBasis: { ...designBasis, etaFi: 0.6 }, version: 1 }),
  'PUT /api/projects/:projectId/takeoff-settings': () => ({ ...takeoff, markUpPercent: '7', version: 1 }),
  'POST /api/projects/:projectId/memberships': () => ({ email: 'nobody@example.test', roles: ['reader'] }),
  'PUT /api/projects/:projectId/memberships/:userId': () => ({ roles: ['reader'] }),
  'POST /api/projects/:projectId/levels': () => level,
  'PATCH /api/projects/:projectId/levels/:levelId': () => ({ ...level, version: 1 }),
  'POST /api/projects/:projectId/zones': zone,
  'PATCH /api/projects/:projectId/zones/:zoneId': (things) => ({ ...zone(things), version: 1 }),
  'PUT /api/projects/:projectId/zones/:zoneId/protection': ({ productId }) => ({
    environment: 'C2', targetPolicy: { policy: 'one' }, systems: [{ memberType: 'beam', productId }], version: 1,
  }),
  'POST /api/projects/:projectId/sections': () => ({ designation: 'PG 400', shape }),
  'POST /api/projects/:projectId/products': () => inventedCoating({ name: 'Another coating' }),
  'PUT /api/projects/:projectId/products/:productId': () => ({ ...inventedCoating({ name: 'Another coating' }), version: 1 }),
  'POST /api/projects/:projectId/members': (things) => member(things),
  'PATCH /api/projects/:projectId/members/:memberId': (things) => ({ ...member(things), version: 1 }),
  'PUT /api/projects/:projectId/members/:memberId/structural': () => ({ basis, version: 1 }),
  'POST /api/projects/:projectId/members/bulk': ({ memberId }) => ({ members: [{ id: memberId, version: 1 }], set: { grade: 'S460' } }),
  'POST /api/projects/:projectId/members/bulk/preview': ({ memberId }) => ({ members: [{ id: memberId, version: 1 }], set: { grade: 'S460' } }),
  'POST /api/projects/:projectId/members/found': ({ memberId }) => ({ filter: { memberIds: [memberId], search: 'B', grades: ['S355'] }, except: [] }),
  'POST /api/projects/:projectId/members/structural': ({ memberId }) => ({ members: [{ id: memberId, version: 1 }], basis }),
  'POST /api/projects/:projectId/members/delete': ({ memberId }) => ({ members: [{ id: memberId, version: 1 }] }),
  'POST /api/projects/:projectId/member-views': () => ({ name: 'Mine', query: '' }),
  'PUT /api/projects/:projectId/member-views/:viewId': () => ({ name: 'Mine', query: '' }),
  'POST /api/projects/:projectId/acceptances': ({ memberId }) => ({ memberIds: [memberId], kind: 'assumed', reason: 'looked at' }),
  'DELETE /api/projects/:projectId/acceptances': ({ memberId }) => ({ memberIds: [memberId], kind: 'assumed' }),
  'PUT /api/projects/:projectId/imports/:importId/mapping': () => mapping,
  'POST /api/projects/:projectId/imports/:importId/confirm': () => ({ leaveOutWrongRows: true }),
  'POST /api/projects/:projectId/revisions': () => ({ code: 'P77', purpose: 'p' }),
  'PATCH /api/projects/:projectId/revisions/:revisionId': () => ({ code: 'P78', purpose: 'p' }),
  'POST /api/projects/:projectId/revisions/:revisionId/return': () => ({ comment: 'change this' }),
};
