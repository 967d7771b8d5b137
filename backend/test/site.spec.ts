import { Decimal } from '@mantlet/common';
import type { IssuedBuildingDto, SiteDto } from '@mantlet/common';
import { Project } from '../src/features/projects/project.entity.js';
import { TestApp } from './support/app.js';
import { makeScheduleProject } from './support/schedule-project.js';
import type { ScheduleProject } from './support/schedule-project.js';

// rendering the PDF takes its time on a slow machine
jest.setTimeout(60_000);
describe('site', () => {
  let app: TestApp;
  let p: ScheduleProject;
  let site: SiteDto;
  beforeAll(async () => {
    app = await TestApp.start();
    p = await makeScheduleProject(app);
  });
  afterAll(() => app.stop());

  const view = async (role: 'contractor' | 'specifier' | 'reader' = 'contractor'): Promise<SiteDto> => (await p.team[role].get(p.url('site')).expect(200)).body;

  const building = async (role: 'contractor' | 'inspector' | 'reader' = 'contractor'): Promise<IssuedBuildingDto> => (await p.team[role].get(p.url('site/building')).expect(200)).body;

  it('is empty until a revision is issued', async () => {
    const { body: draft } = await p.team.specifier.post(p.url('revisions')).send({ code: 'P01' }).expect(201);
    await p.team.specifier.post(p.url(`revisions/${draft.id}/prepare`)).expect(200);
    expect(await view()).toMatchObject({ revision: null, levels: [], purchase: [] });
    expect(await building()).toEqual({ revision: null, members: 0, protectedMembers: 0, bareMembers: 0, protectedAreaM2: 0, levels: [] });
    await p.checker.post(p.url(`revisions/${draft.id}/check`)).expect(200);
    expect((await view('specifier')).revision).toBeNull();
    await p.checker.post(p.url(`revisions/${draft.id}/issue`)).expect(200);
    site = await view();
    expect(site.revision).toMatchObject({ id: draft.id, code: 'P01', pdfAvailable: true });
  });

  it('draws the building as issued for those who see nothing else, with totals that are those of its zones', async () => {
    const drawn = await building('inspector');
    expect(drawn.revision).toMatchObject({ code: 'P01' });
    expect(drawn.levels.map((l) => [l.code, l.zones.map((z) => z.code)])).toEqual([['L0', ['Z01']], ['L1', ['Z02']]]);
    const zones = drawn.levels.flatMap((l) => l.zones);
    for (const part of ['members', 'protectedMembers', 'bareMembers'] as const) expect(zones.reduce((sum, z) => sum + z[part], 0)).toBe(drawn[part]);
    expect(drawn.protectedMembers + drawn.bareMembers).toBe(drawn.members);
    // the same areas as the materials of the site page add up to
    const bought = site.levels.map((l) => l.materials.reduce((sum, m) => sum.plus(m.areaM2), new Decimal(0)).toNumber());
    expect(drawn.levels.map((l) => l.zones.reduce((sum, z) => sum + z.protectedAreaM2, 0))).toEqual(bought.map((area) => expect.closeTo(area, 6)));
  });

  it('keeps what is changed after the issue out of it', async () => {
    const before = await building('reader');
    await app.dataSource.query(`UPDATE zones SET period_min = 15 WHERE project_id = $1`, [p.project.id]);
    expect(await building('reader')).toEqual(before);
  });

  it('says floor by floor what to apply, how thick and how much', () => {
    expect(site.levels.map((l) => [l.code, l.zones.map((z) => z.code)])).toEqual([['L0', ['Z01']], ['L1', ['Z02']]]);
    const hall = site.levels[0]!.zones[0]!;
    expect(hall.items.map((i) => i.mark)).toEqual(['B0-001', 'B0-002', 'C0-001', 'C0-002']);
    const beam = hall.items[0]!;
    expect(beam).toMatchObject({ section: 'IPE 300', quantity: 4, faces: 'Three sides, slab on top', productName: 'Testcoat', kind: 'coating' });
    expect(beam.thickness).toMatch(/^[\d\u202f]+ µm$/);
    expect(beam.wetThickness).toMatch(/^[\d\u202f]+ µm$/);
    expect(beam.coats).toBeGreaterThan(0);
    expect(hall.items[2]!.thickness).toMatch(/^\d+ mm/);
    expect(site.levels[1]!.zones[0]!.bare).toEqual([{ mark: 'B1-003', section: 'HE 300 B', memberType: 'beam', quantity: 1 }]);
  });

  it('adds up: members to zones, zones to levels, levels to what is bought', () => {
    const sum = (values: (string | null)[]): Decimal => values.reduce((total, v) => total.plus(v ?? 0), new Decimal(0));
    for (const level of site.levels) {
      for (const kind of ['coating', 'board', 'spray'] as const) {
        const ofLevel = sum(level.materials.filter((m) => m.kind === kind).map((m) => m.areaM2));
        expect(sum(level.zones.flatMap((z) => z.materials.filter((m) => m.kind === kind).map((m) => m.areaM2))).toFixed(2)).toBe(ofLevel.toFixed(2));
        const items = sum(level.zones.flatMap((z) => z.items.filter((i) => i.kind === kind).map((i) => i.areaM2)));
        // members are printed to 0.01 m² each
        expect(items.minus(ofLevel).abs().toNumber()).toBeLessThanOrEqual(0.03);
      }
    }
    const litres = sum(site.levels.flatMap((l) => l.materials.map((m) => m.litres)));
    const coating = site.purchase.find((m) => m.kind === 'coating')!;
    expect(litres.toFixed(2)).toBe(coating.litres);
    expect(coating.containers).toBe(litres.div(20).ceil().toNumber());
    for (const level of site.levels) {
      const used = level.materials.find((m) => m.kind === 'coating');
      const brought = level.purchase.find((m) => m.kind === 'coating');
      expect(brought?.litres).toBe(used?.litres);
      expect(brought?.containers).toBe(used ? new Decimal(used.litres!).div(20).ceil().toNumber() : undefined);
    }
    const boards = (materials: SiteDto['purchase']): number => materials.reduce((total, m) => total + (m.sheets ?? 0), 0);
    expect(boards(site.purchase)).toBeGreaterThan(0);
    expect(site.levels.reduce((total, l) => total + boards(l.purchase), 0)).toBeGreaterThanOrEqual(boards(site.purchase));
    for (const board of site.purchase.filter((m) => m.kind === 'board')) expect(board.sheets).toBeGreaterThan(0);
    expect(site.purchase.find((m) => m.kind === 'spray')!.bags).toBeGreaterThan(0);
  });

  it('keeps prices from the contractor until they are given', async () => {
    const money = (s: SiteDto): (string | null)[] => [...s.purchase, ...s.levels.flatMap((l) => [...l.materials, ...l.zones.flatMap((z) => z.materials)])].map((m) => m.money);
    expect(site.prices).toBe(false);
    expect(money(site).every((m) => m === null)).toBe(true);
    expect(money(await view('specifier')).some((m) => m !== null)).toBe(true);
    const { manager } = app.dataSource;
    const project = await manager.findOneByOrFail(Project, { id: p.project.id });
    await manager.save(Object.assign(project, { settings: { ...project.settings, contractorSeesPrices: true } }));
    const given = await view();
    expect(given.prices).toBe(true);
    expect(money(given).some((m) => m !== null)).toBe(true);
  });

  it('is for the team alone', async () => {
    const outsider = await app.signIn(await app.makeUser('Outsider'));
    await outsider.get(p.url('site')).expect(404);
    await app.anonymous().get(p.url('site')).expect(401);
  });
});
