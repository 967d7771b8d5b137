import type { INestApplicationContext } from '@nestjs/common';
import { DataSource } from 'typeorm';
import { RevisionsService } from '../../features/revisions/revisions.service.js';
import { makeLevelsAndZones, makeProducts, makeProject, changeZones, setProtection, setTakeoff } from './demo-building.js';
import { readAccounts, readProducts, readScenario } from './demo-data.js';
import type { Scenario } from './demo-data.js';
import { importSchedule, setBases, signWarnings, takeOut } from './demo-members.js';
import { makePeople, makeTeam } from './demo-people.js';
import type { DemoPeople } from './demo-people.js';

interface Demo {
  app: INestApplicationContext;
  scenario: Scenario;
  people: DemoPeople;
  projectId: string;
}
const LOCK = 72002;

/**
 * Loads the demo scenario through the services that people use, so that results, revisions, PDF and audit trail are genuine.
 * Each step leaves alone what stands already: a load that was cut off is finished by the next, and a finished one is left as it is.
 * The draft revision is made last and marks the end. @returns what was done, in a sentence
 */
export async function loadDemo(app: INestApplicationContext): Promise<string> {
  const lock = app.get(DataSource).createQueryRunner();
  try {
    // of two that load at once the second waits, and finds it done
    await lock.query('SELECT pg_advisory_lock($1)', [LOCK]);
    return await load(app);
  } finally {
    await lock.query('SELECT pg_advisory_unlock($1)', [LOCK]);
    await lock.release();
  }
}

async function load(app: INestApplicationContext): Promise<string> {
  const scenario = await readScenario();
  const people = await makePeople(app, scenario, await readAccounts());
  const projectId = await makeProject(app, scenario, people);
  const demo = { app, scenario, people, projectId };
  const { number, name } = scenario.project;
  if (await codesOf(demo).then((codes) => codes.includes(scenario.draft.revision.code))) {
    // whoever the demo has gained since; whoever was taken off the team stays off
    await makeTeam(app, scenario, people, projectId, people.newcomers);
    return `The demo scenario ${number} ${name} is loaded already.`;
  }
  if (!(await isIssued(demo))) {
    await build(demo);
    await issue(demo);
  }
  await draft(demo);
  const [{ members } = { members: 0 }] = await app.get(DataSource).query<{ members: number }[]>('SELECT count(*)::int AS members FROM members WHERE project_id = $1', [projectId]);
  return `Loaded the demo scenario ${number} ${name}: ${members} members in ${scenario.zones.length} zones, revision ${scenario.issued.code} issued and ${scenario.draft.revision.code} in draft.`;
}

const revisionsOf = ({ app, people, projectId }: Demo) => app.get(RevisionsService, { strict: false }).list(people.as('specifier', projectId));
const codesOf = async (demo: Demo): Promise<string[]> => (await revisionsOf(demo)).map((revision) => revision.code);
const isIssued = async (demo: Demo): Promise<boolean> => (await revisionsOf(demo)).some((revision) => revision.state === 'issued');

async function build({ app, scenario, people, projectId }: Demo): Promise<void> {
  await makeTeam(app, scenario, people, projectId);
  await setTakeoff(app, scenario, people, projectId);
  await makeProducts(app, await readProducts(), people);
  await makeLevelsAndZones(app, scenario, people, projectId);
  await setProtection(app, scenario, people, projectId);
  await importSchedule(app, people.as('specifier', projectId), scenario.schedule.members);
  await setBases(app, people.as('structuralEngineer', projectId), scenario.schedule.structural);
  await signWarnings(app, people.as('fireEngineer', projectId), scenario.signatures);
}

/** Prepared by one specifier, checked and issued by the other. */
async function issue(demo: Demo): Promise<void> {
  const { app, scenario, people, projectId } = demo;
  const revisions = app.get(RevisionsService, { strict: false });
  const specifier = people.as('specifier', projectId);
  const checker = people.as('checker', projectId);
  const { id, state } = (await revisionsOf(demo)).find((one) => one.code === scenario.issued.code) ?? (await revisions.create(specifier, scenario.issued));
  if (state === 'draft') await revisions.prepare(specifier, id);
  if (state === 'draft' || state === 'prepared') await revisions.check(checker, id);
  await revisions.issue(checker, id);
}

/** What happened since: a longer period, a re-issued schedule with a few rows that need somebody, and the next revision begun. */
async function draft({ app, scenario, people, projectId }: Demo): Promise<void> {
  const specifier = people.as('specifier', projectId);
  const { revision, schedule } = scenario.draft;
  await changeZones(app, scenario, people, projectId);
  await importSchedule(app, specifier, schedule.members);
  await takeOut(app, specifier, scenario.draft['taken out']);
  await setBases(app, people.as('structuralEngineer', projectId), schedule.structural);
  await app.get(RevisionsService, { strict: false }).create(specifier, revision);
}
