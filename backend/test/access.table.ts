/**
 * Every route of the server and who may call it, written down by hand so that a new route or another rule is a decision that
 * shows. Nobody · `public`; whoever is signed in · `signed-in`; `administrator`; any role on the project · `team`; fire engineer,
 * structural engineer and specifier · `design team`; or the roles by name.
 */
export const accessTable: Record<string, string> = {
  // accounts
  'GET /api/session': 'public',
  'POST /api/session': 'public',
  'DELETE /api/session': 'signed-in',
  'PUT /api/session/password': 'signed-in',
  'POST /api/set-up': 'public',
  'GET /api/users': 'administrator',
  'POST /api/users': 'administrator',
  'PATCH /api/users/:userId': 'administrator',

  // projects
  'GET /api/projects': 'signed-in',
  'POST /api/projects': 'signed-in',
  'GET /api/projects/:projectId': 'team',
  'PATCH /api/projects/:projectId': 'fire-engineer, specifier',
  'PUT /api/projects/:projectId/design-basis': 'fire-engineer',
  'PUT /api/projects/:projectId/takeoff-settings': 'specifier',
  'GET /api/projects/:projectId/events': 'team',
  'GET /api/projects/:projectId/jobs': 'design team',
  'POST /api/projects/:projectId/jobs/:jobId/retry': 'design team',
  'GET /api/projects/:projectId/building': 'design team',
  'GET /api/projects/:projectId/audit': 'design team',
  'GET /api/projects/:projectId/memberships': 'team',
  'POST /api/projects/:projectId/memberships': 'fire-engineer, specifier',
  'PUT /api/projects/:projectId/memberships/:userId': 'fire-engineer, specifier',
  'DELETE /api/projects/:projectId/memberships/:userId': 'fire-engineer, specifier',

  // levels and zones
  'GET /api/projects/:projectId/levels': 'design team',
  'POST /api/projects/:projectId/levels': 'fire-engineer',
  'PATCH /api/projects/:projectId/levels/:levelId': 'fire-engineer',
  'DELETE /api/projects/:projectId/levels/:levelId': 'fire-engineer',
  'GET /api/projects/:projectId/zones': 'design team',
  'GET /api/projects/:projectId/zones/:zoneId': 'design team',
  'POST /api/projects/:projectId/zones': 'fire-engineer',
  'PATCH /api/projects/:projectId/zones/:zoneId': 'fire-engineer',
  'PUT /api/projects/:projectId/zones/:zoneId/protection': 'specifier',
  'DELETE /api/projects/:projectId/zones/:zoneId': 'fire-engineer',

  // sections
  'GET /api/sections': 'signed-in',
  'GET /api/projects/:projectId/sections': 'design team',
  'POST /api/projects/:projectId/sections': 'specifier, structural-engineer',
  'DELETE /api/projects/:projectId/sections/:sectionId': 'specifier, structural-engineer',

  // products
  'GET /api/products': 'signed-in',
  'GET /api/products/:productId': 'signed-in',
  'POST /api/products': 'administrator',
  'PUT /api/products/:productId': 'administrator',
  'DELETE /api/products/:productId': 'administrator',
  'POST /api/products/read-table': 'administrator',
  'PUT /api/products/:productId/evidence-file': 'administrator',
  'GET /api/products/:productId/evidence-file': 'signed-in',
  'GET /api/projects/:projectId/products': 'design team',
  'GET /api/projects/:projectId/products/:productId': 'design team',
  'POST /api/projects/:projectId/products': 'specifier',
  'PUT /api/projects/:projectId/products/:productId': 'specifier',
  'DELETE /api/projects/:projectId/products/:productId': 'specifier',
  'POST /api/projects/:projectId/products/read-table': 'specifier',
  'PUT /api/projects/:projectId/products/:productId/evidence-file': 'specifier',
  'GET /api/projects/:projectId/products/:productId/evidence-file': 'design team',

  // members
  'GET /api/projects/:projectId/members': 'design team',
  'GET /api/projects/:projectId/members/:memberId': 'design team',
  'GET /api/projects/:projectId/members/:memberId/neighbours': 'design team',
  'POST /api/projects/:projectId/members': 'specifier',
  'PATCH /api/projects/:projectId/members/:memberId': 'specifier',
  'PUT /api/projects/:projectId/members/:memberId/structural': 'structural-engineer',
  'DELETE /api/projects/:projectId/members/:memberId': 'specifier',
  'POST /api/projects/:projectId/members/bulk': 'specifier',
  'POST /api/projects/:projectId/members/bulk/preview': 'specifier',
  'POST /api/projects/:projectId/members/structural': 'structural-engineer',
  'POST /api/projects/:projectId/members/delete': 'specifier',
  'GET /api/projects/:projectId/members/values': 'design team',
  'POST /api/projects/:projectId/members/found': 'design team',
  'GET /api/projects/:projectId/member-views': 'design team',
  'POST /api/projects/:projectId/member-views': 'design team',
  'PUT /api/projects/:projectId/member-views/:viewId': 'design team',
  'DELETE /api/projects/:projectId/member-views/:viewId': 'design team',
  'POST /api/projects/:projectId/acceptances': 'fire-engineer',
  'DELETE /api/projects/:projectId/acceptances': 'fire-engineer',

  // imports
  'POST /api/projects/:projectId/imports': 'specifier',
  'GET /api/projects/:projectId/imports/:importId': 'specifier',
  'PUT /api/projects/:projectId/imports/:importId/mapping': 'specifier',
  'GET /api/projects/:projectId/imports/:importId/preview': 'specifier',
  'POST /api/projects/:projectId/imports/:importId/confirm': 'specifier',
  'DELETE /api/projects/:projectId/imports/:importId': 'specifier',

  // assessment and quantities
  'POST /api/projects/:projectId/recalculate': 'design team',
  'GET /api/projects/:projectId/quantities': 'design team',
  'GET /api/projects/:projectId/quantities/lines.csv': 'design team',
  'GET /api/projects/:projectId/quantities.xlsx': 'design team',

  // schedule and site; those without a design role are shown issued and superseded revisions only
  'GET /api/projects/:projectId/readiness': 'design team',
  'GET /api/projects/:projectId/revisions': 'team',
  'GET /api/projects/:projectId/revisions/:revisionId': 'team',
  'GET /api/projects/:projectId/revisions/:revisionId/pdf': 'team',
  'GET /api/projects/:projectId/revisions/:revisionId/verify': 'team',
  'POST /api/projects/:projectId/revisions': 'specifier',
  'PATCH /api/projects/:projectId/revisions/:revisionId': 'specifier',
  'POST /api/projects/:projectId/revisions/:revisionId/prepare': 'specifier',
  'POST /api/projects/:projectId/revisions/:revisionId/check': 'specifier',
  'POST /api/projects/:projectId/revisions/:revisionId/return': 'specifier',
  'POST /api/projects/:projectId/revisions/:revisionId/issue': 'specifier',
  'GET /api/projects/:projectId/site': 'team',
  'GET /api/projects/:projectId/site/building': 'team',
};
