import type { SectionDto } from '@mantlet/common';
import { seedCatalogue } from '../src/database/seed-catalogue.js';
import type { Project } from '../src/features/projects/project.entity.js';
import { Section } from '../src/features/sections/section.entity.js';
import { SectionsService } from '../src/features/sections/sections.service.js';
import { TestApp } from './support/app.js';
import type { Agent } from './support/app.js';

describe('sections', () => {
  let app: TestApp;
  let project: Project;
  let team: Awaited<ReturnType<TestApp['team']>>;
  const at = (path = ''): string => `/api/projects/${project.id}/sections${path}`;
  beforeAll(async () => {
    app = await TestApp.start({ catalogue: true });
    project = await app.makeProject();
    team = await app.team(project);
  });
  afterAll(() => app.stop());

  describe('the catalogue', () => {
    it('holds the sections of the data files, and is written only where they changed', async () => {
      const count = await app.dataSource.manager.count(Section);
      expect(count).toBeGreaterThan(2900);
      expect(await seedCatalogue(app.dataSource)).toBe(0);
      const beam = await app.dataSource.manager.findOneByOrFail(Section, { designation: 'IPE 300' });
      await app.dataSource.manager.update(Section, beam.id, { standard: 'something else' });
      expect(await seedCatalogue(app.dataSource)).toBe(1);
      const again = await app.dataSource.manager.findOneByOrFail(Section, { designation: 'IPE 300' });
      // the same row: members that use it stay as they were
      expect(again).toEqual(beam);
      expect(await app.dataSource.manager.count(Section)).toBe(count);
    });

    // EN 10365:2017, IPE 300: 53.8 cm² and 8356 cm⁴ (memory)
    it('carries properties computed from the dimensions', async () => {
      const { body } = await team.reader.get('/api/sections').query({ search: 'IPE 300' }).expect(200);
      const found = (body.items as SectionDto[])[0];
      expect(found).toMatchObject({ designation: 'IPE 300', family: 'IPE', projectId: null, shape: { kind: 'i', hMm: 300, bMm: 150 } });
      expect((found?.properties.areaMm2 ?? 0) / 100).toBeCloseTo(53.8, 1);
      expect((found?.properties.iyMm4 ?? 0) / 1e4).toBeCloseTo(8356, 0);
    });

    it('is searched by usual spellings, paged, and in the order of the tables', async () => {
      const first = await team.reader.get('/api/sections').query({ search: '254 x 146', family: 'UB' }).expect(200);
      expect((first.body.items as SectionDto[]).map((s) => s.designation)).toEqual(['UB 254x146x31', 'UB 254x146x37', 'UB 254x146x43']);
      const hollow = await team.reader.get('/api/sections').query({ family: 'CHS', pageSize: 3, page: 2 }).expect(200);
      expect(hollow.body).toMatchObject({ page: 2, pageSize: 3 });
      expect(hollow.body.items).toHaveLength(3);
      expect(hollow.body.total).toBeGreaterThan(100);
      const none = await team.reader.get('/api/sections').query({ search: 'no such thing at all' }).expect(200);
      expect(none.body).toMatchObject({ items: [], total: 0 });
      await team.reader.get('/api/sections').query({ family: 'NOPE' }).expect(400);
    });

    it.each([
      ['UB 254x146x31', 'UB 254x146x31'], ['254 x 146 x 31 UB', 'UB 254x146x31'], ['IPE300', 'IPE 300'],
      ['HE 300 B', 'HEB 300'], ['HEB300', 'HEB 300'], ['SHS 150x150x6.3', 'SHS 150x150x6.3'], ['CHS 168.3*6.3', 'CHS 168.3x6.3'],
    ])('understands %s in a schedule', async (text, designation) => {
      const sections = await app.app.get(SectionsService).resolver(project.id);
      expect(sections.find(text)).toMatchObject({ designation });
    });

    it('suggests the nearest for a slip, and nothing for what names no section', async () => {
      const sections = await app.app.get(SectionsService).resolver(project.id);
      expect(sections.find('UB 254x146x32')).toBeNull();
      expect(sections.suggest('UB 254x146x32')[0]).toBe('UB 254x146x31');
      expect([sections.find('---'), sections.suggest('---')]).toEqual([null, []]);
    });
  });

  describe("a project's own", () => {
    const girder = { designation: 'PG 900', shape: { kind: 'i', hMm: 900, bMm: 300, twMm: 12, tfMm: 25, rootRadiusMm: 0 } };

    it('are made by the specifier or the structural engineer and seen by the design team of that project only', async () => {
      const made = await team['structural-engineer'].post(at()).send(girder).expect(201);
      // 2 · 300 · 25 + 850 · 12 mm², by hand
      expect(made.body).toMatchObject({ designation: 'PG 900', family: 'CUSTOM', projectId: project.id, properties: { areaMm2: 25_200 } });
      const listed = await team['fire-engineer'].get(at()).query({ search: 'pg900' }).expect(200);
      expect(listed.body.items[0].id).toBe(made.body.id);
      const catalogue = await team.reader.get('/api/sections').query({ search: 'PG 900' }).expect(200);
      expect(catalogue.body.total).toBe(0);

      const other = await app.makeProject();
      const stranger = (await app.team(other)).specifier;
      expect((await stranger.get(`/api/projects/${other.id}/sections`).query({ search: 'PG 900' })).body.total).toBe(0);
      await stranger.delete(`/api/projects/${other.id}/sections/${made.body.id as string}`).expect(404);
      const sections = app.app.get(SectionsService);
      expect((await sections.resolver(other.id)).find('PG 900')).toBeNull();
      expect((await sections.resolver(project.id)).find('pg-900')).toMatchObject({ id: made.body.id });
    });

    it('are refused to everybody else', async () => {
      for (const role of ['fire-engineer', 'contractor', 'inspector', 'reader'] as const) await team[role].post(at()).send(girder).expect(403);
    });

    it('do not take a name that stands for another section', async () => {
      const again = await team.specifier.post(at()).send({ ...girder, designation: 'pg-900' }).expect(409);
      expect(again.body.message).toBe('There already is a section "PG 900".');
      const catalogue = await team.specifier.post(at()).send({ ...girder, designation: 'ipe300' }).expect(409);
      expect(catalogue.body.message).toBe('There already is a catalogue section "IPE 300".');
      await team.specifier.post(at()).send({ ...girder, designation: '---' }).expect(422);
    });

    it.each<[string, object, RegExp]>([
      ['flanges that fill the height', { kind: 'i', hMm: 50, bMm: 300, twMm: 12, tfMm: 25, rootRadiusMm: 0 }, /^Twice the flange thickness is 50 mm/],
      ['a tube without a hole', { kind: 'circular-hollow', dMm: 100, tMm: 50 }, /^Twice the wall thickness is 100 mm/],
      ['a box wider than its flanges', { kind: 'box', hMm: 400, bMm: 300, twMm: 10, tfMm: 20, clearWidthMm: 300 }, /^The width over both webs is 320 mm/],
      ['a root radius that does not fit', { kind: 'i', hMm: 100, bMm: 50, twMm: 5, tfMm: 5, rootRadiusMm: 60 }, /radii are too large/],
    ])('are refused in words: %s', async (_, shape, sentence) => {
      const answer = await team.specifier.post(at()).send({ designation: 'X 1', shape }).expect(422);
      expect(answer.body.message).toMatch(sentence);
    });

    it('may be a box, a hollow section, a flat or a round', async () => {
      const shapes = [
        { kind: 'box', hMm: 400, bMm: 300, twMm: 10, tfMm: 20, clearWidthMm: 260 },
        { kind: 'rectangular-hollow', hMm: 200, bMm: 100, tMm: 7, outerRadiusMm: 10.5, innerRadiusMm: 7 },
        { kind: 'flat', hMm: 200, tMm: 20 }, { kind: 'round', dMm: 60 },
        { kind: 'i-unequal', hMm: 800, twMm: 12, topWidthMm: 250, topThicknessMm: 20, bottomWidthMm: 350, bottomThicknessMm: 30, rootRadiusMm: 0 },
      ];
      for (const [i, shape] of shapes.entries()) {
        const made = await team.specifier.post(at()).send({ designation: `MADE ${i}`, shape }).expect(201);
        expect(made.body.properties.areaMm2).toBeGreaterThan(0);
      }
    });

    it('are deleted while no member uses them', async () => {
      const made = await team.specifier.post(at()).send({ ...girder, designation: 'PG 1' }).expect(201);
      await team.specifier.delete(at(`/${made.body.id as string}`)).expect(204);
      await team.specifier.delete(at(`/${made.body.id as string}`)).expect(404);
      const catalogue = await app.dataSource.manager.findOneByOrFail(Section, { designation: 'IPE 300' });
      await team.specifier.delete(at(`/${catalogue.id}`)).expect(404);
      const trail = await team.specifier.get(`/api/projects/${project.id}/audit`).query({ entityId: made.body.id as string }).expect(200);
      expect((trail.body.items as { action: string }[]).map((entry) => entry.action)).toEqual(['section deleted', 'section made']);
    });

    it('need whole and positive dimensions', async () => {
      const bad = async (agent: Agent, shape: object): Promise<string[]> =>
        ((await agent.post(at()).send({ designation: 'Y', shape }).expect(400)).body.issues as { path: string }[]).map((issue) => issue.path);
      expect(await bad(team.specifier, { kind: 'round', dMm: -3 })).toEqual(['shape.dMm']);
      expect(await bad(team.specifier, { kind: 'round', dMm: '60' })).toEqual(['shape.dMm']);
      expect(await bad(team.specifier, { kind: 'star', dMm: 60 })).toEqual(['shape.kind']);
    });
  });
});
