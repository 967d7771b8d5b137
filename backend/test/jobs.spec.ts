import { spawn, spawnSync } from 'node:child_process';
import { randomUUID } from 'node:crypto';
import { join } from 'node:path';
import { message, sentence } from '@mantlet/common';
import type { BuildingDto, JobDto, MemberRowDto, MemberSheetDto, Page, ProjectListItemDto, QuantitiesDto, ReadinessDto, ZoneDto } from '@mantlet/common';
import { MemberResult } from '../src/features/assessment/member-result.entity.js';
import { RecalculationService } from '../src/features/assessment/recalculation.service.js';
import { Job } from '../src/features/jobs/job.entity.js';
import { addToQueue } from '../src/features/jobs/jobs.service.js';
import { startWorker } from '../src/worker/worker.js';
import type { RunningWorker } from '../src/worker/worker.js';
import { TestApp } from './support/app.js';
import { Listener, baseOf, cookieOf, until } from './support/listen.js';
import { makeScheduleProject } from './support/schedule-project.js';
import type { ScheduleProject } from './support/schedule-project.js';

const root = join(__dirname, '..', '..');

describe('large changes', () => {
  let app: TestApp;
  let url: string;
  let worker: RunningWorker | null = null;
  const inPlace = (members: number): void => { process.env['MANTLET_RECALCULATE_IN_PLACE_MAX'] = String(members); };

  beforeAll(async () => {
    app = await TestApp.start();
    url = String((app.dataSource.options as { url?: string }).url);
  });
  beforeEach(() => inPlace(5000));
  afterEach(async () => {
    await worker?.stop();
    worker = null;
    await app.dataSource.query('DELETE FROM jobs');
    await app.dataSource.query(`SELECT graphile_worker.complete_jobs(array_agg(id)) FROM graphile_worker.jobs`);
  });
  afterAll(async () => {
    delete process.env['MANTLET_RECALCULATE_IN_PLACE_MAX'];
    await app.stop();
  });

  const read = async <T>(p: ScheduleProject, path: string): Promise<T> => (await p.team.specifier.get(p.url(path)).expect(200)).body as T;
  const jobs = (p: ScheduleProject): Promise<JobDto[]> => read(p, 'jobs');
  const results = async (p: ScheduleProject): Promise<Record<string, unknown>> => {
    const rows = await app.dataSource.query<Record<string, unknown>[]>(
      'SELECT m.mark, r.* FROM member_results r JOIN members m ON m.id = r.member_id WHERE m.project_id = $1', [p.project.id]);
    return Object.fromEntries(rows.map(({ mark, assessed_at: _, ...row }) => [String(mark), row]));
  };
  /** One hour more than the fire engineer gave: an ordinary edit of a zone. */
  const setPeriod = async (p: ScheduleProject, code: 'Z01' | 'Z02', periodMin: number) => {
    const zone = (await read<ZoneDto[]>(p, 'zones')).find((one) => one.code === code) as ZoneDto;
    const { levelId, name, curve, reference, version } = zone;
    return p.team['fire-engineer'].patch(p.url(`zones/${zone.id}`)).send({ levelId, code, name, periodMin, curve, reference, version });
  };
  const recalculate = (p: ScheduleProject) => p.team.specifier.post(p.url('recalculate')).expect(200);
  const allDone = (p: ScheduleProject) => until('the work is done', async () => (await jobs(p)).length === 0);

  it('are worked out at once up to the limit, and left to a worker beyond it', async () => {
    const p = await makeScheduleProject(app);
    inPlace(4);
    // zone Z02 has four members, the project eight
    expect((await setPeriod(p, 'Z02', 60)).status).toBe(200);
    expect(await jobs(p)).toEqual([]);
    expect((await recalculate(p)).body).toEqual({ members: 8, changed: 0, queued: true });
    expect(await jobs(p)).toMatchObject([{ kind: 'recalculation', state: 'waiting', total: 8, done: 0, withoutWorker: true, error: null, secondsLeft: null }]);
  });

  it('show no old number anywhere while they are under way', async () => {
    const p = await makeScheduleProject(app);
    const before = await read<QuantitiesDto>(p, 'quantities');
    expect(before.unassessed).toBe(0);
    inPlace(3);
    const changed = await setPeriod(p, 'Z01', 30);
    expect(changed.body).toMatchObject({ periodMin: 30, members: 4, settled: 0, open: 4, unassessed: 4, protectedAreaM2: 0, targets: [] });

    const rows = (await read<Page<MemberRowDto>>(p, 'members?pageSize=50')).items;
    for (const row of rows.filter((one) => one.zoneCode === 'Z01')) {
      expect(row).toMatchObject({ verdict: null, appliedThickness: null, criticalTemperatureC: null, areaM2: null, open: true, sentence: 'Not determined: being recalculated' });
    }
    expect(rows.filter((one) => one.verdict !== null)).toHaveLength(4);
    const sheet = await read<MemberSheetDto>(p, `members/${p.members.get('B0-001')?.id ?? ''}`);
    expect(sheet).toMatchObject({ sentence: 'Not determined: being recalculated', areaM2: null, result: { appliedThickness: null } });
    const building = await read<BuildingDto>(p, 'building');
    expect(building).toMatchObject({ members: 8, settled: 4, unassessed: 4 });
    expect(building.protection).toContainEqual({ label: 'Being recalculated', kind: 'open', members: 4, areaM2: null, net: null });
    expect(building.protection.every((line) => line.net === null)).toBe(true);
    const quantities = await read<QuantitiesDto>(p, 'quantities');
    expect(quantities.unassessed).toBe(4);
    expect(quantities.lines.map((line) => line.zoneId)).not.toContain(p.zones.Z01.id);
    const refused = sentence(message('job.recalculating', { members: 4 }));
    for (const file of ['quantities/lines.csv', 'quantities.xlsx']) {
      expect(((await p.team.specifier.get(p.url(file)).expect(409)).body as { message: string }).message).toBe(refused);
    }
    const [listed] = (await p.team.specifier.get('/api/projects').expect(200)).body as ProjectListItemDto[];
    expect(listed).toMatchObject({ protectedAreaM2: null, open: 4, waitsOnMe: 0 });

    // nothing is prepared or signed on what is not there
    const readiness = await read<ReadinessDto>(p, 'readiness');
    expect(readiness).toMatchObject({ ready: false, current: false, blockers: [{ code: 'recalculating', title: '4 results are being recalculated; wait until this is done' }] });
    const { body: revision } = await p.team.specifier.post(p.url('revisions')).send({ code: 'P1', purpose: 'For tender' }).expect(201);
    const prepared = await p.team.specifier.post(p.url(`revisions/${(revision as { id: string }).id}/prepare`));
    expect(prepared.status).toBe(422);
    expect((prepared.body as { message: string }).message).toContain('4 results are being recalculated');
    const accepted = await p.team['fire-engineer'].post(p.url('acceptances')).send({ memberIds: [p.members.get('B0-001')?.id], kind: 'high-temperature', reason: 'Lightly loaded, as calculated (invented)' });
    expect(accepted.status).toBe(409);

    worker = await startWorker(app.app, url);
    await allDone(p);
    expect(await read<ReadinessDto>(p, 'readiness')).toMatchObject({ current: true });
    expect((await read<QuantitiesDto>(p, 'quantities')).unassessed).toBe(0);
    await p.team.specifier.get(p.url('quantities/lines.csv')).expect(200);
  });

  it('come to the very results that working them out at once would give, and tell open pages how far they are', async () => {
    const [atOnce, byWorker] = [await makeScheduleProject(app), await makeScheduleProject(app)];
    await setPeriod(atOnce, 'Z01', 30);
    const designer = await app.makeUser('Listening designer');
    await app.join(byWorker.project, designer, 'structural-engineer');
    const reader = await app.makeUser('Listening reader');
    await app.join(byWorker.project, reader, 'reader');
    const base = await baseOf(app.app);
    const [heard, overheard] = [await Listener.open(base, byWorker.project.id, await cookieOf(app, designer)), await Listener.open(base, byWorker.project.id, await cookieOf(app, reader))];
    inPlace(1);
    await setPeriod(byWorker, 'Z01', 30);
    worker = await startWorker(app.app, url);
    await allDone(byWorker);
    const comparable = (all: Record<string, unknown>) =>
      Object.fromEntries(Object.entries(all).map(([mark, row]) => {
        const { member_id: _m, inputs_hash: _h, product_id: _p, ...rest } = row as Record<string, unknown>;
        return [mark, rest];
      }));
    expect(comparable(await results(byWorker))).toEqual(comparable(await results(atOnce)));
    await until('the end is told', () => heard.changes.filter((change) => change.topics.includes('jobs')).length >= 3);
    expect(heard.changes.some((change) => change.topics.includes('results'))).toBe(true);
    expect(overheard.changes).toEqual([]);
    heard.stop();
    overheard.stop();
  });

  it('take up what is changed meanwhile, as one job', async () => {
    const p = await makeScheduleProject(app);
    inPlace(1);
    await setPeriod(p, 'Z01', 30);
    await setPeriod(p, 'Z02', 60);
    await setPeriod(p, 'Z01', 60);
    expect(await jobs(p)).toMatchObject([{ total: 8, done: 0, state: 'waiting' }]);
    const [queue] = await app.dataSource.query<{ n: number }[]>(`SELECT count(*)::int AS n FROM graphile_worker.jobs WHERE key = 'recalculation ' || $1`, [p.project.id]);
    expect(queue?.n).toBe(1);
    // one zone is done, then its period changes again while the other waits
    const service = app.app.get(RecalculationService, { strict: false });
    expect(await service.run(p.project.id, () => true)).toBe(false);
    expect(await jobs(p)).toMatchObject([{ total: 8, done: 4, state: 'running' }]);
    await setPeriod(p, 'Z01', 30);
    expect(await jobs(p)).toMatchObject([{ total: 12, done: 4, state: 'running' }]);
    worker = await startWorker(app.app, url);
    await allDone(p);
    expect(await read<ReadinessDto>(p, 'readiness')).toMatchObject({ current: true });
  });

  it('that fail say so, and can be tried again by whoever sees work in progress', async () => {
    const p = await makeScheduleProject(app);
    inPlace(1);
    await recalculate(p);
    const [waiting] = await jobs(p);
    await p.team.specifier.post(p.url(`jobs/${waiting?.id ?? ''}/retry`)).expect(409);
    // a fault in one zone, for as long as this stands
    const service = app.app.get(RecalculationService, { strict: false });
    const broken = jest.spyOn(service, 'run').mockRejectedValue(new Error('the disk is full'));
    worker = await startWorker(app.app, url);
    const failed = await until('it is given up', async () => (await jobs(p)).find((job) => job.state === 'failed'), 60_000);
    expect(broken).toHaveBeenCalledTimes(3);
    expect(failed.error).toBe(sentence(message('job.failed', { done: 0, total: 8 })));
    expect(failed.withoutWorker).toBe(false);
    expect((await read<ReadinessDto>(p, 'readiness')).blockers[0]?.title).toMatch(/older than the inputs; recalculate/);
    broken.mockRestore();
    for (const role of ['contractor', 'inspector', 'reader'] as const) await p.team[role].post(p.url(`jobs/${failed.id}/retry`)).expect(403);
    expect((await p.team['fire-engineer'].post(p.url(`jobs/${failed.id}/retry`)).expect(200)).body).toMatchObject([{ state: 'waiting', error: null }]);
    await allDone(p);
    expect(Object.keys(await results(p))).toHaveLength(8);
  });

  it('whose worker is killed are taken up by another, and nothing is done twice or left out', async () => {
    const built = spawnSync(process.execPath, [join(root, 'node_modules/typescript/bin/tsc'), '-b', 'common', 'backend'], { cwd: root, encoding: 'utf8' });
    expect(built.stdout).toBe('');
    const p = await makeScheduleProject(app);
    const expected = await results(p);
    inPlace(1);
    await recalculate(p);
    // the project is held, so that the worker stands in the middle of its work when it is killed
    const hold = app.dataSource.createQueryRunner();
    await hold.startTransaction();
    await hold.query('SELECT pg_advisory_xact_lock(hashtextextended($1, 0))', [`project ${p.project.id}`]);
    const child = spawn(process.execPath, [join(root, 'backend/dist/worker/main.js')], { env: { ...process.env, MANTLET_DATABASE_URL: url }, stdio: 'inherit' });
    try {
      await until('the worker has the job', async () => (await app.dataSource.query<unknown[]>('SELECT 1 FROM graphile_worker.jobs WHERE locked_by IS NOT NULL')).length > 0, 30_000);
      expect((await jobs(p))[0]?.withoutWorker).toBe(false);
    } finally {
      child.kill('SIGKILL');
      await hold.rollbackTransaction();
      await hold.release();
    }
    await until('its absence is seen', async () => (await jobs(p))[0]?.withoutWorker);
    worker = await startWorker(app.app, url);
    await allDone(p);
    expect(await results(p)).toEqual(expected);
    expect(await app.dataSource.manager.countBy(Job, { projectId: p.project.id, state: 'done' })).toBe(1);
    expect(await app.dataSource.manager.count(MemberResult, { where: { member: { projectId: p.project.id } } })).toBe(8);
  });

  it('of a project that is gone end without harm, and the next job is done', async () => {
    const p = await makeScheduleProject(app);
    inPlace(1);
    // nothing of ours deletes a project, whose trail cannot be deleted either; somebody at the database may find a way
    const gone = randomUUID();
    await addToQueue(app.dataSource.manager, gone, 'recalculation');
    await recalculate(p);
    worker = await startWorker(app.app, url);
    await allDone(p);
    await until('both have left the queue', async () => (await app.dataSource.query<unknown[]>('SELECT 1 FROM graphile_worker.jobs')).length === 0);
    expect(Object.keys(await results(p))).toHaveLength(8);
    expect(await app.dataSource.manager.countBy(Job, { projectId: gone })).toBe(0);
    await p.team.specifier.get(`/api/projects/${gone}/jobs`).expect(404);
  });

  it('are neither seen nor tried again from another project', async () => {
    const [mine, theirs] = [await makeScheduleProject(app), await makeScheduleProject(app)];
    inPlace(1);
    await recalculate(theirs);
    await app.dataSource.query(`UPDATE jobs SET state = 'failed' WHERE project_id = $1`, [theirs.project.id]);
    const [failed] = await jobs(theirs);
    expect(await jobs(mine)).toEqual([]);
    await mine.team.specifier.post(mine.url(`jobs/${failed?.id ?? ''}/retry`)).expect(404);
    await mine.team.specifier.post(theirs.url(`jobs/${failed?.id ?? ''}/retry`)).expect(404);
    expect(await jobs(theirs)).toMatchObject([{ state: 'failed' }]);
  });

  it('and the changes of people beside them never wait for each other in a circle', async () => {
    const p = await makeScheduleProject(app);
    inPlace(1);
    worker = await startWorker(app.app, url);
    const before = await app.dataSource.query<{ n: string }[]>('SELECT deadlocks AS n FROM pg_stat_database WHERE datname = current_database()');
    const statuses: number[] = [];
    const note = (status: number): void => void statuses.push(status);
    for (let round = 0; round < 6; round += 1) {
      await Promise.all([
        setPeriod(p, 'Z01', round % 2 ? 30 : 60).then((answer) => note(answer.status)),
        setPeriod(p, 'Z02', round % 2 ? 90 : 60).then((answer) => note(answer.status)),
        p.team.specifier.post(p.url('recalculate')).then((answer) => note(answer.status)),
        p.team['structural-engineer'].post(p.url('recalculate')).then((answer) => note(answer.status)),
        jobs(p).then(async ([job]) => { if (job) note((await p.team.specifier.post(p.url(`jobs/${job.id}/retry`))).status); }),
      ]);
    }
    // 409: another edit of the zone came first, or a job that has not failed
    expect(statuses.filter((status) => status !== 200 && status !== 409)).toEqual([]);
    await allDone(p);
    expect(await read<ReadinessDto>(p, 'readiness')).toMatchObject({ current: true });
    expect(await app.dataSource.query('SELECT deadlocks AS n FROM pg_stat_database WHERE datname = current_database()')).toEqual(before);
  });

  it('are the design team’s to see', async () => {
    const p = await makeScheduleProject(app);
    for (const role of ['contractor', 'inspector', 'reader'] as const) await p.team[role].get(p.url('jobs')).expect(403);
    await p.team.specifier.post(p.url('jobs/nonsense/retry')).expect(400);
    await p.team.specifier.post(p.url('jobs/00000000-0000-4000-8000-000000000000/retry')).expect(404);
  });
});
