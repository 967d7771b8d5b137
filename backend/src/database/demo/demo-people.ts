import type { INestApplicationContext } from '@nestjs/common';
import type { Role } from '@mantlet/common';
import type { Actor, ProjectScope } from '../../shared/access.js';
import { MembershipsService } from '../../features/memberships/memberships.service.js';
import { UsersService } from '../../features/users/users.service.js';
import type { DemoAccount, Scenario } from './demo-data.js';

export type TeamKey = keyof Scenario['team'];
const rolesOfTeam: Record<TeamKey, Role[]> = {
  fireEngineer: ['fire-engineer'], structuralEngineer: ['structural-engineer'], specifier: ['specifier'], checker: ['specifier'],
  contractor: ['contractor'], inspector: ['inspector'], reader: ['reader'],
};

export interface DemoPeople {
  administrator: Actor;
  /** e-mail addresses whose accounts this load made */
  newcomers: ReadonlySet<string>;
  /** each as they act on the project */
  as: (key: TeamKey, projectId: string) => ProjectScope;
}

/** Makes the accounts that are missing: the administrator first, as on any new installation. */
export async function makePeople(app: INestApplicationContext, scenario: Scenario, accounts: readonly DemoAccount[]): Promise<DemoPeople> {
  const users = app.get(UsersService, { strict: false });
  const standing = await users.list();
  const strangers = standing.filter((user) => !accounts.some((account) => account.email === user.email));
  if (strangers.length) throw new Error(`The demo is loaded into an installation of its own; this one has accounts that are not the demo's, such as ${strangers[0]?.email}.`);
  const first = accountOf(accounts, scenario.administrator);
  if (await users.isEmpty()) await users.setUp({ name: first.name, email: first.email, password: first.password });
  const all = await users.list();
  const office = all.find((user) => user.email === scenario.administrator);
  if (!office) throw new Error(`The demo's administrator ${scenario.administrator} has no account.`);
  const administrator: Actor = office;
  const missing = accounts.filter(({ email }) => !all.some((user) => user.email === email));
  for (const { name, email, password } of missing) await users.create({ name, email, password }, administrator);
  const actors = new Map<string, Actor>((await users.list()).map(({ id, name, email, administrator: holds }) => [email, { id, name, email, administrator: holds }]));
  const as = (key: TeamKey, projectId: string): ProjectScope => {
    const actor = actors.get(scenario.team[key]);
    if (!actor) throw new Error(`${scenario.team[key]} is on the demo's team and has no account.`);
    return { projectId, roles: rolesOfTeam[key], actor };
  };
  return { administrator, newcomers: new Set(missing.map(({ email }) => email)), as };
}

/** The fire engineer, who began the project, brings in the others: all of them, or those alone whom `wanted` names. */
export async function makeTeam(app: INestApplicationContext, scenario: Scenario, people: DemoPeople, projectId: string, wanted?: ReadonlySet<string>): Promise<void> {
  const memberships = app.get(MembershipsService, { strict: false });
  const there = new Set((await memberships.list(projectId)).map((one) => one.email));
  for (const [key, email] of Object.entries(scenario.team) as [TeamKey, string][]) {
    if (!there.has(email) && (wanted?.has(email) ?? true)) await memberships.add(people.as('fireEngineer', projectId), { email, roles: rolesOfTeam[key] }, { tell: false });
  }
}

function accountOf(accounts: readonly DemoAccount[], email: string): DemoAccount {
  const account = accounts.find((one) => one.email === email);
  if (!account) throw new Error(`seeds/demo/accounts.json has no account for ${email}.`);
  return account;
}
