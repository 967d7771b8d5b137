import type { BuildingDto, ProjectDto, ProjectListItemDto } from '@mantlet/common';
import { defaultDesignBasis, defaultProjectSettings } from '@mantlet/common';
import { MemberResult } from '../src/features/assessment/member-result.entity.js';
import { ZoneSystem } from '../src/features/zones/zone-system.entity.js';
import { TestApp } from './support/app.js';
import type { Agent } from './support/app.js';
import { build } from './support/building.js';
import { inventedCoating } from './support/products.js';

const snapshotOf = (zoneIds: string[]): string => JSON.stringify({ levels: [{}], zones: [{}, {}], products: [{}, {}, {}], members: zoneIds.map((zoneId) => ({ zoneId })) });

describe('projects', () => {
  let app: TestApp;
  beforeAll(async () => {
    app = await TestApp.start();
  });
  afterAll(() => app.stop());

  const { designBasis: _basis, ...takeoff } = defaultProjectSettings;
  /** an issued revision with what the schedule feature would have frozen */
  const issue = (projectId: string, zoneIds: string[]): Promise<unknown> =>
    app.dataSource.query(
      `INSERT INTO revisions (project_id, code, state, snapshot, snapshot_sha256, pdf_sha256, issued_at, members, protected_area_m2)
       VALUES ($1, 'P01', 'issued', $2, 'x', 'y', now(), $3, 12.5)`,
      [projectId, snapshotOf(zoneIds), zoneIds.length],
    );

  describe('starting one', () => {
    let agent: Agent;
    beforeAll(async () => {
      agent = await app.signIn(await app.makeUser('Starter'));
    });

    it('puts whoever starts it on its team, with the default basis of design', async () => {
      const made = await agent.post('/api/projects').send({ number: 'LIB-1', name: 'Library', place: 'Somewhere', roles: ['specifier', 'fire-engineer'] }).expect(201);
      expect(made.body).toMatchObject({
        number: 'LIB-1', currency: 'EUR', version: 1, roles: ['fire-engineer', 'specifier'], settings: { designBasis: { gammaG: 1.35 } },
        revision: null, issuedRevision: null, counts: { levels: 0, zones: 0, members: 0, open: 0 },
      });
      // what waits: the schedule has no members yet
      const listed = await agent.get('/api/projects').expect(200);
      expect(listed.body).toEqual([expect.objectContaining({ number: 'LIB-1', roles: ['fire-engineer', 'specifier'], revision: null, members: 0, open: 0, waitsOnMe: 1 })]);
      const others = await (await app.signIn(await app.makeUser('Other'))).get('/api/projects').expect(200);
      expect(others.body).toEqual([]);
    });

    it('needs a free number and a role that can bring in the team', async () => {
      const input = { number: 'LIB-2', name: 'Library', roles: ['specifier'] };
      await agent.post('/api/projects').send(input).expect(201);
      const twice = await agent.post('/api/projects').send(input).expect(409);
      expect(twice.body.message).toBe('There already is a project with the number "LIB-2".');
      const alone = await agent.post('/api/projects').send({ ...input, number: 'LIB-3', roles: ['reader'] }).expect(422);
      expect(alone.body.code).toBe('project.take-a-leading-role');
      // nothing of the refused one is left
      expect((await agent.get('/api/projects')).body.map((project: ProjectListItemDto) => project.number)).toEqual(['LIB-1', 'LIB-2']);
      const bad = await agent.post('/api/projects').send({ number: '', name: 'x', currency: 'XXX', roles: [] }).expect(400);
      expect((bad.body.issues as { path: string }[]).map((issue) => issue.path).sort()).toEqual(['currency', 'number', 'roles']);
    });
  });

  describe('settings', () => {
    it('come in two parts, each with its keeper', async () => {
      const project = await app.makeProject();
      const team = await app.team(project);
      const at = (path: string): string => `/api/projects/${project.id}${path}`;
      const basis = { designBasis: { ...defaultDesignBasis, psiFi: 'psi2', etaFi: 0.7 }, version: 1 };
      for (const role of ['structural-engineer', 'specifier', 'contractor', 'inspector', 'reader'] as const) await team[role].put(at('/design-basis')).send(basis).expect(403);
      const set = await team['fire-engineer'].put(at('/design-basis')).send(basis).expect(200);
      expect(set.body).toMatchObject({ version: 2, settings: { designBasis: { psiFi: 'psi2', etaFi: 0.7 } } });

      const settings = { ...takeoff, markUpPercent: '7.5', contractorSeesPrices: true, version: 2 };
      for (const role of ['fire-engineer', 'structural-engineer', 'contractor', 'inspector', 'reader'] as const) await team[role].put(at('/takeoff-settings')).send(settings).expect(403);
      const takenOff = await team.specifier.put(at('/takeoff-settings')).send(settings).expect(200);
      // the other part stays
      expect(takenOff.body).toMatchObject({ version: 3, settings: { markUpPercent: '7.5', designBasis: { etaFi: 0.7 } } });
      const stale = await team.specifier.put(at('/takeoff-settings')).send(settings).expect(409);
      expect(stale.body).toMatchObject({ code: 'shared.stale', current: { version: 3 } });

      const trail = await team.specifier.get(at('/audit')).query({ entity: 'project' }).expect(200);
      expect(trail.body.items).toMatchObject([
        { action: 'takeoff settings changed', changes: [{ field: 'contractorSeesPrices', old: false, new: true }, { field: 'markUpPercent', old: '0', new: '7.5' }] },
        { action: 'design basis changed', changes: [{ field: 'psiFi', old: 'psi1', new: 'psi2' }, { field: 'etaFi', old: 0.65, new: 0.7 }] },
      ]);
    });

    it('are refused in words where a factor is missing or impossible', async () => {
      const project = await app.makeProject();
      const team = await app.team(project);
      const { wind: _wind, ...psi } = defaultDesignBasis.psi;
      const bad = await team['fire-engineer'].put(`/api/projects/${project.id}/design-basis`).send({ designBasis: { ...defaultDesignBasis, psi, gammaG: -1 }, version: 1 }).expect(400);
      expect((bad.body.issues as { path: string }[]).map((issue) => issue.path)).toEqual(expect.arrayContaining(['designBasis.psi.wind', 'designBasis.gammaG']));
      const money = await team.specifier.put(`/api/projects/${project.id}/takeoff-settings`).send({ ...takeoff, markUpPercent: 'much', distribution: ['x'], version: 1 }).expect(400);
      expect((money.body.issues as { path: string }[]).map((issue) => issue.path)).toEqual(['markUpPercent', 'distribution.0']);
      const kept = await team.specifier.get(`/api/projects/${project.id}`).expect(200);
      expect(kept.body).toMatchObject({ version: 1, settings: defaultProjectSettings });
    });

    it('assess every member anew where they enter results', async () => {
      const project = await app.makeProject();
      const team = await app.team(project);
      const zone = await build.zone(app, await build.level(app, project, '00'), 'Z1');
      const beam = await build.beam(app, zone, await build.section(app, project), 'B1');
      await app.dataSource.query(`UPDATE members SET basis = '{"way": "assumed"}' WHERE id = $1`, [beam.id]);
      const temperature = async (): Promise<number | null> => (await app.dataSource.manager.findOneByOrFail(MemberResult, { memberId: beam.id })).criticalTemperatureC;
      const assumed = (beamC: number, version: number): object =>
        ({ designBasis: { ...defaultDesignBasis, assumedTemperatureC: { ...defaultDesignBasis.assumedTemperatureC, beam: beamC } }, version });
      await team['fire-engineer'].put(`/api/projects/${project.id}/design-basis`).send(assumed(600, 1)).expect(200);
      expect(await temperature()).toBe(600);
      await team['fire-engineer'].put(`/api/projects/${project.id}/design-basis`).send(assumed(580, 2)).expect(200);
      expect(await temperature()).toBe(580);
    });
  });

  describe('the title', () => {
    it('is changed by fire engineer and specifier, one at a time', async () => {
      const project = await app.makeProject();
      const other = await app.makeProject();
      const team = await app.team(project);
      const at = `/api/projects/${project.id}`;
      const input = { number: project.number, name: 'New name', place: 'Elsewhere', currency: 'GBP', note: '', version: 1 };
      for (const role of ['structural-engineer', 'contractor', 'inspector', 'reader'] as const) await team[role].patch(at).send(input).expect(403);
      const changed = await team.specifier.patch(at).send(input).expect(200);
      expect(changed.body).toMatchObject({ name: 'New name', currency: 'GBP', version: 2 });
      await team['fire-engineer'].patch(at).send(input).expect(409);
      const taken = await team['fire-engineer'].patch(at).send({ ...input, number: other.number, version: 2 }).expect(409);
      expect(taken.body.code).toBe('shared.exists');
      await team['fire-engineer'].patch(`/api/projects/${other.id}`).send({ ...input, version: 1 }).expect(404);
    });
  });

  describe('what people see', () => {
    let team: Awaited<ReturnType<TestApp['team']>>;
    let projectId: string;
    let zoneId: string;
    beforeAll(async () => {
      const project = await app.makeProject();
      projectId = project.id;
      team = await app.team(project);
      const level = await build.level(app, project, '00');
      await build.level(app, project, '01', 4);
      const zone = await build.zone(app, level, 'Z1');
      zoneId = zone.id;
      const bareZone = await build.zone(app, level, 'Z2');
      const product = await team.specifier.post(`/api/projects/${projectId}/products`).send(inventedCoating()).expect(201);
      await app.dataSource.manager.insert(ZoneSystem, { zoneId, memberType: 'beam', productId: product.body.id as string });
      const section = await build.section(app, project);
      await build.beam(app, zone, section, 'B1');
      await build.beam(app, zone, section, 'B2');
      await build.beam(app, bareZone, section, 'B3');
      await team.specifier.post(`/api/projects/${projectId}/recalculate`).expect((response) => expect([200, 201]).toContain(response.status));
    });
    const listed = async (agent: Agent): Promise<ProjectListItemDto> => (await agent.get('/api/projects').expect(200)).body[0] as ProjectListItemDto;
    const opened = async (agent: Agent): Promise<ProjectDto> => (await agent.get(`/api/projects/${projectId}`).expect(200)).body as ProjectDto;

    it('before anything is issued: the design team the work, the others nothing of it', async () => {
      expect(await listed(team.specifier)).toMatchObject({ members: 3, open: 1, waitsOnMe: 1, revision: null });
      expect(await listed(team['structural-engineer'])).toMatchObject({ members: 3, open: 1, waitsOnMe: 0 });
      expect((await listed(team.specifier)).protectedAreaM2).toBeGreaterThan(0);
      for (const role of ['contractor', 'inspector', 'reader'] as const) {
        expect(await listed(team[role])).toMatchObject({ revision: null, members: null, protectedAreaM2: null, open: null, waitsOnMe: 0 });
        expect(await opened(team[role])).toMatchObject({ settings: null, revision: null, issuedRevision: null, counts: { levels: 0, zones: 0, members: 0, products: 0, open: 0 } });
        await team[role].get(`/api/projects/${projectId}/building`).expect(403);
      }
      expect(await opened(team['fire-engineer'])).toMatchObject({ roles: ['fire-engineer'], counts: { levels: 2, zones: 2, members: 3, products: 1, open: 1 } });
    });

    it('the building with its levels, zones, what is open and what protects it', async () => {
      const { body } = await team['fire-engineer'].get(`/api/projects/${projectId}/building`).expect(200);
      const building = body as BuildingDto;
      expect(building).toMatchObject({ members: 3, settled: 2, open: 1 });
      expect(building.levels.map((level) => [level.code, level.zones.map((zone) => zone.code)])).toEqual([['00', ['Z1', 'Z2']], ['01', []]]);
      expect(building.levels[0]?.zones[0]).toMatchObject({ periodMin: 60, curve: 'standard', members: 2, settled: 2, open: 0, issuedMembers: 0 });
      expect(building.openItems.some((item) => item.kind === 'blocker' && item.role === 'specifier' && item.zoneId !== null)).toBe(true);
      // no member is counted twice or left out
      expect(building.protection.reduce((sum, line) => sum + line.members, 0)).toBe(3);
      expect(building.protection.map((line) => line.kind)).toEqual(['coating', 'open']);
    });

    it('once issued: the others see what was issued, not what came after', async () => {
      await issue(projectId, [zoneId, zoneId]);
      await app.dataSource.query(`INSERT INTO revisions (project_id, code, state) VALUES ($1, 'P02', 'draft')`, [projectId]);
      expect(await listed(team.contractor)).toMatchObject({ revision: { code: 'P01', state: 'issued' }, members: 2, protectedAreaM2: 12.5, open: null, waitsOnMe: 0 });
      expect(await opened(team.reader)).toMatchObject({ revision: { code: 'P01' }, issuedRevision: { code: 'P01' }, settings: null, counts: { levels: 1, zones: 2, members: 2, products: 3, open: 0 } });
      expect(await listed(team.specifier)).toMatchObject({ revision: { code: 'P02', state: 'draft' }, members: 3 });
      expect(await opened(team.specifier)).toMatchObject({ revision: { code: 'P02' }, issuedRevision: { code: 'P01' } });
      const building = (await team.specifier.get(`/api/projects/${projectId}/building`).expect(200)).body as BuildingDto;
      expect(building.levels[0]?.zones.map((zone) => zone.issuedMembers)).toEqual([2, 0]);
    });
  });
});
