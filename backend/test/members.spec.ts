import type { MemberDto, MemberInput, MemberRowDto, MemberSheetDto, Page } from '@mantlet/common';
import { AuditEntry } from '../src/features/audit/audit-entry.entity.js';
import { Member } from '../src/features/members/member.entity.js';
import type { Project } from '../src/features/projects/project.entity.js';
import type { Section } from '../src/features/sections/section.entity.js';
import { ZoneSystem } from '../src/features/zones/zone-system.entity.js';
import type { Zone } from '../src/features/zones/zone.entity.js';
import { TestApp } from './support/app.js';
import { build } from './support/building.js';
import { inventedCoating } from './support/products.js';

describe('members', () => {
  let app: TestApp;
  let project: Project;
  let zone: Zone;
  let otherZone: Zone;
  let section: Section;
  let team: Awaited<ReturnType<TestApp['team']>>;
  const at = (path = ''): string => `/api/projects/${project.id}/members${path}`;
  const input = (more: Partial<MemberInput> = {}): MemberInput => ({
    zoneId: zone.id, mark: 'B1', memberType: 'beam', sectionId: section.id, grade: 'S355', lengthMm: 6000, quantity: 2,
    exposure: { arrangement: 'three-sides', reason: '' }, protectionForm: 'profile', coatBackConnections: 0, coatBackGirthMm: 0, deductionM2: 0,
    onSite: true, note: '', ...more,
  });
  const make = async (more: Partial<MemberInput> = {}): Promise<MemberDto> => (await team.specifier.post(at()).send(input(more)).expect(201)).body as MemberDto;
  const declare = async (member: MemberDto, temperatureC: number): Promise<MemberDto> =>
    (await team['structural-engineer'].put(at(`/${member.id}/structural`))
      .send({ basis: { way: 'declared', temperatureC, reference: 'Calculation 12' }, version: member.version }).expect(200)).body as MemberDto;
  const seen = ({ id, version }: { id: string; version: number }): { id: string; version: number } => ({ id, version });
  const list = async (query: Record<string, string> = {}): Promise<Page<MemberRowDto>> => (await team.specifier.get(at()).query(query).expect(200)).body as Page<MemberRowDto>;
  const sheet = async (id: string): Promise<MemberSheetDto> => (await team['fire-engineer'].get(at(`/${id}`)).expect(200)).body as MemberSheetDto;
  /** an invented coating for beams of the zone */
  const coat = async (): Promise<void> => {
    const product = await team.specifier.post(`/api/projects/${project.id}/products`).send(inventedCoating()).expect(201);
    await app.dataSource.manager.insert(ZoneSystem, { zoneId: zone.id, memberType: 'beam', productId: product.body.id as string });
  };

  beforeAll(async () => {
    app = await TestApp.start();
  });
  afterAll(() => app.stop());
  beforeEach(async () => {
    project = await app.makeProject();
    team = await app.team(project);
    const level = await build.level(app, project, '00');
    zone = await build.zone(app, level, 'Z1');
    otherZone = await build.zone(app, level, 'Z2', 90);
    section = await build.section(app, project);
  });

  it('are made by the specifier and stay not determined until the structural engineer speaks', async () => {
    const made = await make();
    expect(made).toMatchObject({ mark: 'B1', version: 1, basis: { way: 'none' }, basisSetBy: null, acceptances: [] });
    const [row] = (await list()).items;
    expect(row).toMatchObject({ id: made.id, mark: 'B1', zoneCode: 'Z1', levelCode: '00', section: 'PG', way: 'none', verdict: 'not-determined', open: true, criticalTemperatureC: null });
    expect(row?.sentence).toBe('Not determined: no critical temperature, utilisation or actions given');
    const trail = await app.dataSource.manager.findOneByOrFail(AuditEntry, { entityId: made.id });
    expect(trail).toMatchObject({ action: 'member made', label: 'B1' });
    expect(trail.changes).toEqual(expect.arrayContaining([{ field: 'zone', old: null, new: 'Z1' }, { field: 'section', old: null, new: 'PG' }]));
  });

  it('come in the order in which people count', async () => {
    for (const mark of ['B10', 'B2', 'B1', 'A3', 'B2a']) await make({ mark });
    expect((await list()).items.map((row) => row.mark)).toEqual(['A3', 'B1', 'B2', 'B2a', 'B10']);
    const b2 = (await list({ search: 'B2' })).items[0]!;
    const { previousId, nextId } = await sheet(b2.id);
    const neighbours = await Promise.all([previousId, nextId].map(async (id) => (await sheet(id!)).member.mark));
    expect(neighbours).toEqual(['B1', 'B2a']);
  });

  it('have neighbours in the list as it is filtered and sorted, and none outside it', async () => {
    for (const mark of ['B10', 'B2', 'B1', 'A3', 'B2a']) await make({ mark });
    const items = (await list()).items;
    const id = (mark: string) => items.find((row) => row.mark === mark)!.id;
    const around = async (mark: string, query: Record<string, string>) => {
      const { body } = await team.specifier.get(`/api/projects/${project.id}/members/${id(mark)}/neighbours`).query(query).expect(200);
      return [body.previousId, body.nextId].map((found) => items.find((row) => row.id === found)?.mark ?? null);
    };
    expect(await around('B2', {})).toEqual(['B1', 'B2a']);
    expect(await around('B2', { direction: 'desc' })).toEqual(['B2a', 'B1']);
    expect(await around('B2a', { search: 'B2' })).toEqual(['B2', null]);
    expect(await around('A3', { search: 'B2' })).toEqual([null, null]);
    expect(await around('B10', { page: '7', pageSize: '1' })).toEqual(['B2a', null]);
  });

  it("keep each role to its own part", async () => {
    const made = await make();
    const basis = { way: 'declared', temperatureC: 560, reference: 'Calculation 12' };
    for (const role of ['fire-engineer', 'structural-engineer', 'contractor', 'inspector', 'reader'] as const) {
      await team[role].post(at()).send(input({ mark: 'X' })).expect(403);
      await team[role].patch(at(`/${made.id}`)).send({ ...input(), version: 1 }).expect(403);
      await team[role].delete(at(`/${made.id}?version=1`)).expect(403);
      await team[role].post(at('/bulk')).send({ members: [made], set: { grade: 'S275' } }).expect(403);
    }
    for (const role of ['fire-engineer', 'specifier', 'contractor'] as const) {
      await team[role].put(at(`/${made.id}/structural`)).send({ basis, version: 1 }).expect(403);
    }
    // a basis slipped into the specifier's form is not read
    const slipped = await team.specifier.patch(at(`/${made.id}`)).send({ ...input({ note: 'n' }), basis, version: 1 }).expect(200);
    expect(slipped.body).toMatchObject({ note: 'n', basis: { way: 'none' }, version: 2 });
    const set = await team['structural-engineer'].put(at(`/${made.id}/structural`)).send({ basis, sectionId: otherZone.id, version: 2 }).expect(200);
    expect(set.body).toMatchObject({ basis, sectionId: section.id, basisSetBy: 'The structural-engineer', version: 3 });
    expect(set.body.basisSetAt).toMatch(/^\d{4}-/);
    await team.contractor.get(at()).expect(403);
    await team.reader.get(at(`/${made.id}`)).expect(403);
  });

  it('say what they need once a temperature and a system are set', async () => {
    await coat();
    const member = await declare(await make(), 550);
    const [row] = (await list()).items;
    // A/V from outside the program: plate girder 300 × 150 × 8/12, three sides: (2·300 + 3·150 − 2·8)/(2·150·12 + 276·8) = 1034 mm / 5808 mm² = 178.03 1/m
    expect(row?.sectionFactorPerM).toBeCloseTo(1_034_000 / 5808, 6);
    expect(row).toMatchObject({ verdict: 'protected', productName: 'Test coating', thicknessUnit: 'µm', open: false, way: 'declared' });
    expect(row?.sentence).toMatch(/^Needs 0\.\d+ mm of Test coating$/);
    const shown = await sheet(member.id);
    expect(shown.sentence).toBe(row?.sentence);
    expect(shown).toMatchObject({ productName: 'Test coating', zone: { code: 'Z1', periodMin: 60, curve: 'standard' }, level: { code: '00' }, section: { designation: 'PG' } });
    expect(shown.working.length).toBeGreaterThan(0);
    expect(shown.outline?.loops.length).toBeGreaterThan(0);
    expect(shown.charts?.periodMin).toBe(60);
    expect(shown.history.map((entry) => entry.action)).toEqual(['critical temperature set', 'member made']);
  });

  it('lead from one to the next by mark, within the project', async () => {
    const a = await make({ mark: 'A' });
    const b = await make({ mark: 'B' });
    const c = await make({ mark: 'C' });
    expect(await sheet(b.id)).toMatchObject({ previousId: a.id, nextId: c.id });
    expect(await sheet(a.id)).toMatchObject({ previousId: null, nextId: b.id });
    expect(await sheet(c.id)).toMatchObject({ previousId: b.id, nextId: null });
  });

  it('refuse a mark that is taken, naming where, and leave everything as it was', async () => {
    await make();
    const again = await team.specifier.post(at()).send(input({ zoneId: otherZone.id })).expect(409);
    expect(again.body).toMatchObject({ code: 'member.mark-taken', message: 'Mark B1 is taken by a member in zone Z1 on level 00. Give this one another mark, or open that one.' });
    const second = await make({ mark: 'B2' });
    await team.specifier.patch(at(`/${second.id}`)).send({ ...input(), version: 1 }).expect(409);
    expect(await app.dataSource.manager.countBy(Member, { projectId: project.id })).toBe(2);
  });

  it('refuse zones and sections of another project without saying whether they exist', async () => {
    const foreign = await app.makeProject();
    const foreignLevel = await build.level(app, foreign, '09');
    const foreignZone = await build.zone(app, foreignLevel, 'F1');
    const foreignSection = await build.section(app, foreign);
    const zoneAnswer = await team.specifier.post(at()).send(input({ zoneId: foreignZone.id })).expect(422);
    expect(zoneAnswer.body.message).toBe('This zone is not one of the project. Choose a zone from the list.');
    await team.specifier.post(at()).send(input({ sectionId: foreignSection.id })).expect(422);
    const foreignMember = await build.beam(app, foreignZone, foreignSection, 'F');
    await team.specifier.get(at(`/${foreignMember.id}`)).expect(404);
    const bulk = await team.specifier.post(at('/bulk')).send({ members: [foreignMember].map(seen), set: { grade: 'S275' } }).expect(409);
    expect(bulk.body.code).toBe('member.some-unknown');
    await team.specifier.post(at('/delete')).send({ members: [foreignMember].map(seen) }).expect(409);
    expect(await app.dataSource.manager.existsBy(Member, { id: foreignMember.id, grade: 'S355' })).toBe(true);
  });

  it('refuse an edit of a version that no longer stands, and show the one that does', async () => {
    const made = await make();
    await team.specifier.patch(at(`/${made.id}`)).send({ ...input({ lengthMm: 7000 }), version: 1 }).expect(200);
    const stale = await team.specifier.patch(at(`/${made.id}`)).send({ ...input({ lengthMm: 8000 }), version: 1 }).expect(409);
    expect(stale.body).toMatchObject({ code: 'shared.stale', current: { lengthMm: 7000, version: 2, designation: expect.any(String) }, by: expect.any(String), at: expect.any(String) });
    await team['structural-engineer'].put(at(`/${made.id}/structural`)).send({ basis: { way: 'assumed' }, version: 1 }).expect(409);
    await team.specifier.delete(at(`/${made.id}?version=1`)).expect(409);
    // the same content again is no change and raises no version
    const same = await team.specifier.patch(at(`/${made.id}`)).send({ ...input({ lengthMm: 7000 }), version: 2 }).expect(200);
    expect(same.body.version).toBe(2);
    await team.specifier.delete(at(`/${made.id}?version=2`)).expect(204);
    expect((await list()).total).toBe(0);
  });

  it('say in words which field is wrong', async () => {
    const answer = await team.specifier.post(at()).send({ ...input(), lengthMm: -5, quantity: 1.5, exposure: { arrangement: 'given-faces' }, mark: ' ' }).expect(400);
    expect(answer.body.issues).toEqual(expect.arrayContaining([
      { path: 'lengthMm', message: 'must be above 0' }, { path: 'quantity', message: 'must be a whole number' },
      { path: 'exposure.faces', message: 'name at least one face that sees fire' }, { path: 'mark', message: 'is needed' },
    ]));
    for (const bad of ['a\u0000b', 'x'.repeat(61)]) expect((await team.specifier.post(at()).send(input({ mark: bad }))).status).toBeLessThan(500);
    const half = await team.specifier.post(at()).send(input({ exposure: { arrangement: 'four-sides', reason: 'half \ud800 pair' } }));
    expect(half.status).toBeLessThan(500);
  });

  it('change together, all or none, and once for the zones they touch', async () => {
    const made = [await make({ mark: 'B1', onSite: false }), await make({ mark: 'B2', onSite: false }), await make({ mark: 'B3', onSite: false })];
    const members = made.map(seen);
    const gone = { id: '00000000-0000-4000-8000-000000000000', version: 1 };
    await team.specifier.post(at('/bulk')).send({ members: [...members, gone], set: { grade: 'S275' } }).expect(409);
    expect((await list()).items.every((row) => row.grade === 'S355')).toBe(true);
    const set = { grade: 'S275', zoneId: otherZone.id, exposure: { arrangement: 'four-sides', faces: ['top'], reason: 'free' } };
    expect((await team.specifier.post(at('/bulk/preview')).send({ members, set }).expect(200)).body).toEqual({ chosen: 3, changes: 3 });
    expect((await list()).items.every((row) => row.grade === 'S355' && row.version === 1)).toBe(true);
    const changed = await team.specifier.post(at('/bulk')).send({ members, set }).expect(200);
    // nothing is given of their temperatures: the verdict stays, though not for the same heated faces
    expect(changed.body).toMatchObject({ changed: 3 });
    expect((await list()).items).toEqual(made.map((m) => expect.objectContaining({ id: m.id, grade: 'S275', zoneCode: 'Z2', exposure: 'four-sides', version: 2 })));
    // what was not set stays
    expect(await app.dataSource.manager.countBy(Member, { projectId: project.id, onSite: false })).toBe(3);
    // seen at a version that no longer stands: all are left as they are, and named
    const moved = await team.specifier.post(at('/bulk')).send({ members: [{ ...members[0], version: 2 }, members[1], members[2]], set: { grade: 'S460' } }).expect(409);
    expect(moved.body).toMatchObject({ code: 'member.moved', message: 'B2, B3 were changed by somebody since you chose them. Nothing was changed; look at them again and repeat.' });
    await team.specifier.post(at('/delete')).send({ members }).expect(409);
    expect((await list()).items.every((row) => row.grade === 'S275')).toBe(true);
    const again = members.map((member) => ({ ...member, version: 2 }));
    expect((await team.specifier.post(at('/bulk')).send({ members: again, set: { grade: 'S275' } }).expect(200)).body).toEqual({ changed: 0, results: 0 });
    expect((await team.specifier.post(at('/bulk/preview')).send({ members: again, set: { grade: 'S275' } }).expect(200)).body).toEqual({ chosen: 3, changes: 0 });
    await team.specifier.post(at('/bulk')).send({ members: again, set: {} }).expect(400);
    await team.specifier.post(at('/bulk')).send({ set: { grade: 'S275' } }).expect(400);
    await team.specifier.post(at('/delete')).send({}).expect(400);
    expect((await team.specifier.post(at('/delete')).send({ members: again.slice(0, 2) }).expect(200)).body).toEqual({ deleted: 2 });
    expect((await list()).items.map((row) => row.mark)).toEqual(['B3']);
  });

  it('are filtered, searched, sorted and paged by the server, ties always in one order', async () => {
    await coat();
    for (const [mark, lengthMm, zoneId, memberType] of [['C', 3000, zone.id, 'beam'], ['A', 3000, otherZone.id, 'column'], ['D', 9000, zone.id, 'beam'], ['B', 3000, zone.id, 'beam']] as const) {
      await make({ mark, lengthMm, zoneId, memberType, note: mark === 'D' ? 'over the 100% hall' : '' });
    }
    const marks = async (query: Record<string, string>): Promise<string[]> => (await list(query)).items.map((row) => row.mark);
    expect(await marks({ sort: 'length' })).toEqual(['A', 'B', 'C', 'D']);
    expect(await marks({ sort: 'length', direction: 'desc' })).toEqual(['D', 'A', 'B', 'C']);
    expect(await marks({ zoneIds: zone.id })).toEqual(['B', 'C', 'D']);
    expect(await marks({ zoneIds: `${zone.id},${otherZone.id}`, memberTypes: 'column' })).toEqual(['A']);
    expect(await marks({ search: '100%' })).toEqual(['D']);
    expect(await marks({ search: 'p g' })).toEqual(['A', 'B', 'C', 'D']);
    expect(await marks({ search: 'a_' })).toEqual([]);
    expect(await marks({ verdicts: 'protected' })).toEqual([]);
    expect(await marks({ open: 'true' })).toEqual(['A', 'B', 'C', 'D']);
    const second = await list({ page: '2', pageSize: '3' });
    expect(second).toMatchObject({ total: 4, page: 2, pageSize: 3, items: [{ mark: 'D' }] });
    for (const sort of ['mark', 'level', 'zone', 'type', 'section', 'sectionFactor', 'criticalTemperature', 'thickness', 'verdict', 'quantity', 'length']) {
      expect((await list({ sort, direction: 'desc' })).items).toHaveLength(4);
    }
    await team.specifier.get(at()).query({ zoneIds: 'x' }).expect(400);
    await team.specifier.get(at()).query({ sort: 'mark; drop' }).expect(400);
    expect(await marks({ productIds: zone.id })).toEqual([]);
  });

  describe('acceptances', () => {
    const accept = (agent: keyof typeof team, memberIds: string[], kind: string, reason = 'Seen and agreed'): ReturnType<ReturnType<TestApp['anonymous']>['post']> =>
      team[agent].post(`/api/projects/${project.id}/acceptances`).send({ memberIds, kind, reason });

    it('are the fire engineer’s, for what there is to accept, all or none', async () => {
      const assumed = await make({ mark: 'B1' });
      const none = await make({ mark: 'B2' });
      await team['structural-engineer'].put(at(`/${assumed.id}/structural`)).send({ basis: { way: 'assumed' }, version: 1 }).expect(200);
      await accept('specifier', [assumed.id], 'assumed').expect(403);
      await accept('structural-engineer', [assumed.id], 'assumed').expect(403);
      const refused = await accept('fire-engineer', [assumed.id, none.id], 'assumed').expect(422);
      expect(refused.body.message).toBe('Nothing was accepted: B2 does not rest on an assumed temperature.');
      expect((await sheet(assumed.id)).member.acceptances).toEqual([]);
      await accept('fire-engineer', [assumed.id], 'assumed', '').expect(400);
      expect((await accept('fire-engineer', [assumed.id], 'bare').expect(422)).body.message).toMatch(/B1 is not found to withstand the fire bare/);
      expect((await accept('fire-engineer', [assumed.id], 'high-temperature').expect(422)).body.message).toMatch(/B1 has no critical temperature above 650 °C/);
    });

    it('hold while the accepted value stands, fall when it changes, and can be taken back', async () => {
      await coat();
      const made = await make();
      const assumed = (await team['structural-engineer'].put(at(`/${made.id}/structural`)).send({ basis: { way: 'assumed' }, version: 1 }).expect(200)).body as MemberDto;
      expect((await list()).items[0]).toMatchObject({ assumed: true, open: true, criticalTemperatureC: 620 });
      expect((await accept('fire-engineer', [made.id], 'assumed').expect(200)).body).toEqual({ accepted: 1 });
      expect((await list()).items[0]).toMatchObject({ assumed: false, open: false });
      const [acceptance] = (await sheet(made.id)).member.acceptances;
      expect(acceptance).toMatchObject({ kind: 'assumed', valueC: 620, reason: 'Seen and agreed', by: 'The fire-engineer', stillHolds: true });
      // as a column another temperature is assumed: the signature was not given for that one
      await team.specifier.patch(at(`/${made.id}`)).send({ ...input({ memberType: 'column' }), version: assumed.version }).expect(200);
      expect((await sheet(made.id)).member.acceptances[0]).toMatchObject({ valueC: 620, stillHolds: false });
      expect((await list()).items[0]).toMatchObject({ assumed: true });
      const withdrawn = await team['fire-engineer'].delete(`/api/projects/${project.id}/acceptances`).send({ memberIds: [made.id], kind: 'assumed' }).expect(200);
      expect(withdrawn.body).toEqual({ withdrawn: 1 });
      expect((await sheet(made.id)).member.acceptances).toEqual([]);
      expect((await sheet(made.id)).history.map((entry) => entry.action)).toEqual(expect.arrayContaining(['assumed temperature accepted', 'assumed temperature no longer accepted']));
    });

    it('cover a temperature above the second signature', async () => {
      const member = await declare(await make(), 700);
      await accept('fire-engineer', [member.id], 'high-temperature').expect(200);
      expect((await sheet(member.id)).member.acceptances[0]).toMatchObject({ kind: 'high-temperature', valueC: 700, stillHolds: true });
      await declare({ ...member }, 710);
      expect((await sheet(member.id)).member.acceptances[0]).toMatchObject({ valueC: 700, stillHolds: false });
    });
  });

  it('do not wait for each other for ever when many write at once', async () => {
    const answers = await Promise.all(Array.from({ length: 12 }, (_, i) => team.specifier.post(at()).send(input({ mark: `B${i % 10}`, zoneId: i % 2 ? zone.id : otherZone.id }))));
    expect(answers.map((a) => a.status).sort()).toEqual([...Array.from({ length: 10 }, () => 201), 409, 409]);
  });
});
