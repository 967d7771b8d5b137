import { randomUUID } from 'node:crypto';
import { roles } from '@mantlet/common';
import type { Role } from '@mantlet/common';
import type { AccessRule } from '../src/shared/access.js';
import { accessTable } from './access.table.js';
import { TestApp } from './support/app.js';
import type { Agent } from './support/app.js';
import { routesOf, ruleFromWords, ruleInWords } from './support/routes.js';
import type { FoundRoute } from './support/routes.js';

/** Somebody who calls, and what they hold on the project that the path names. */
interface Caller {
  who: string;
  agent: Agent;
  signedIn: boolean;
  administrator: boolean;
  held: Role | null;
}
type Outcome = 'allowed' | 'signed-out' | 'forbidden' | 'hidden';

/** What the rule says about the caller, worked out apart from the guard. */
function expected(rule: AccessRule, caller: Caller): Outcome {
  if (rule.kind === 'public') return 'allowed';
  if (!caller.signedIn) return 'signed-out';
  if (rule.kind === 'signed-in') return 'allowed';
  if (rule.kind === 'administrator') return caller.administrator ? 'allowed' : 'forbidden';
  if (!caller.held) return 'hidden';
  return rule.roles === null || rule.roles.includes(caller.held) ? 'allowed' : 'forbidden';
}

const HIDDEN = 'There is no such project, or it is not yours to see.';
/** What the server did about the caller; whatever else is wrong with an empty request comes after that. */
function observed(status: number, body: { message?: string; code?: string }): Outcome {
  if (status === 401) return 'signed-out';
  if (status === 403) return 'forbidden';
  if (status === 404 && body.message === HIDDEN) return 'hidden';
  return 'allowed';
}

describe('access', () => {
  let app: TestApp;
  let routes: FoundRoute[];
  let callers: Caller[];
  let projectId: string;
  const credentials = { email: '', password: 'a long test password' };

  beforeAll(async () => {
    app = await TestApp.start();
    routes = routesOf(app.app);
    const project = await app.makeProject();
    projectId = project.id;
    const own = await app.team(project);
    const elsewhere = await app.team(await app.makeProject());
    const administrator = await app.makeUser('Admin', { administrator: true });
    const outsider = await app.makeUser('Outsider');
    credentials.email = outsider.email;
    callers = [
      { who: 'nobody', agent: app.anonymous(), signedIn: false, administrator: false, held: null },
      { who: 'an outsider', agent: await app.signIn(outsider), signedIn: true, administrator: false, held: null },
      { who: 'the administrator', agent: await app.signIn(administrator), signedIn: true, administrator: true, held: null },
      ...roles.map((role) => ({ who: `the ${role}`, agent: own[role], signedIn: true, administrator: false, held: role })),
      ...roles.map((role) => ({ who: `the ${role} of another project`, agent: elsewhere[role], signedIn: true, administrator: false, held: null })),
    ];
  });
  afterAll(() => app.stop());

  it('knows every route, and every route states the rule that the table gives it', () => {
    const stated = Object.fromEntries(routes.map((route) => [`${route.method.toUpperCase()} ${route.path}`, route.rule ? ruleInWords(route.rule) : 'NO RULE']));
    expect(stated).toEqual(accessTable);
  });

  // the table drives: a route that the server lost fails here as one that it gained fails above
  it.each(Object.entries(accessTable))('%s is for %s: answered to them, refused to everybody else', async (key, words) => {
    const route = routes.find((one) => `${one.method.toUpperCase()} ${one.path}` === key);
    if (!route) throw new Error(`${key} is not a route of the server`);
    const rule = ruleFromWords(words);
    for (const caller of callers) {
      // signing out would end the caller's session for the routes after
      const agent = key === 'DELETE /api/session' && caller.signedIn ? await app.signIn(await app.makeUser('Leaving')) : caller.agent;
      const path = route.path.replace(':projectId', projectId).replace(/:[a-zA-Z]+/g, () => randomUUID());
      const body = key === 'POST /api/session' ? credentials : {};
      // a session of its own, so that signing in does not change who the caller is
      const sender = key === 'POST /api/session' ? app.anonymous() : agent;
      const answer = route.method === 'get' ? await sender.get(path) : await sender[route.method](path).send(body);
      const outcome = observed(answer.status, answer.body as { message?: string });
      expect({ who: caller.who, outcome }).toEqual({ who: caller.who, outcome: expected(rule, caller) });
      expect({ who: caller.who, faulty: answer.status >= 500 }).toEqual({ who: caller.who, faulty: false });
    }
  });

  it('hides a project that does not exist like one that is not yours', async () => {
    const outsider = callers[1]!.agent;
    const real = await outsider.get(`/api/projects/${projectId}`).expect(404);
    const none = await outsider.get(`/api/projects/${randomUUID()}`).expect(404);
    const nonsense = await outsider.get('/api/projects/not-an-id').expect(404);
    expect(none.body).toEqual(real.body);
    expect(nonsense.body).toEqual(real.body);
  });

  it('ends with the account: a disabled person is signed out at once', async () => {
    const user = await app.makeUser('Leaver');
    const agent = await app.signIn(user);
    await agent.get('/api/projects').expect(200);
    const administrator = callers[2]!.agent;
    await administrator.patch(`/api/users/${user.id}`).send({ name: user.name, administrator: false, disabled: true }).expect(200);
    await agent.get('/api/projects').expect(401);
  });
});
