import type { FoundSummaryDto, MemberInput, MemberPageDto, MemberRowDto, MemberSortKey, MemberValuesDto } from '@mantlet/common';
import { memberSortKeys } from '@mantlet/common';
import type { Project } from '../src/features/projects/project.entity.js';
import { Member } from '../src/features/members/member.entity.js';
import { ZoneSystem } from '../src/features/zones/zone-system.entity.js';
import { TestApp } from './support/app.js';
import { build } from './support/building.js';
import { inventedCoating } from './support/products.js';

const hostile = ['100%', 'a_b', 'c\\d', "O'Neil", '🔥', 'حديد', '"quoted"', '%%', '\\', '; DROP TABLE members'];

/** Every filter against the plain list, filtered here: what the database finds must be what anyone would pick by hand. */
describe('the list of members', () => {
  let app: TestApp;
  let project: Project;
  let team: Awaited<ReturnType<TestApp['team']>>;
  let all: MemberRowDto[];
  let zones: { id: string; levelId: string }[];
  const at = (path = ''): string => `/api/projects/${project.id}/members${path}`;
  const ask = async (query: Record<string, string>): Promise<MemberPageDto> => (await team.specifier.get(at()).query({ pageSize: '500', ...query }).expect(200)).body as MemberPageDto;
  const marks = (rows: MemberRowDto[]): string[] => rows.map((row) => row.mark);
  const some = <T>(values: T[]): T[] => [...new Set(values)].slice(0, 2);

  beforeAll(async () => {
    app = await TestApp.start();
    project = await app.makeProject();
    team = await app.team(project);
    const levels = [await build.level(app, project, '10', 36), await build.level(app, project, 'B1', -4), await build.level(app, project, '2', 8)];
    zones = await Promise.all(levels.flatMap((level, i) => [30, 90].map((period) => build.zone(app, level, `Z${i}${period}`, period))));
    const section = await build.section(app, project);
    const product = await team.specifier.post(`/api/projects/${project.id}/products`).send(inventedCoating()).expect(201);
    for (const zone of zones.slice(0, 4)) await app.dataSource.manager.insert(ZoneSystem, { zoneId: zone.id, memberType: 'beam', productId: product.body.id as string });
    const bases = [{ way: 'declared', temperatureC: 550, reference: 'C1' }, { way: 'declared', temperatureC: 700, reference: 'C2' }, { way: 'assumed' }, { way: 'none' }, { way: 'utilisation', mu0: 0.6, reference: 'C3' }];
    for (let i = 0; i < 36; i += 1) {
      const input: MemberInput = {
        zoneId: zones[i % zones.length]!.id, mark: `B${i * 7 % 36}${i % 5 === 0 ? 'a' : ''}`, memberType: i % 4 === 3 ? 'column' : 'beam', sectionId: section.id, grade: i % 3 ? 'S355' : 'S275',
        lengthMm: 2000 + 500 * (i % 7), quantity: 1 + (i % 3), exposure: { arrangement: i % 2 ? 'three-sides' : 'four-sides', reason: '' }, protectionForm: i % 6 === 5 ? 'boxed' : 'profile',
        coatBackConnections: 0, coatBackGirthMm: 0, deductionM2: 0, onSite: true, note: hostile[i] ?? '',
      };
      const made = await team.specifier.post(at()).send(input).expect(201);
      await team['structural-engineer'].put(at(`/${made.body.id}/structural`)).send({ basis: bases[i % bases.length], version: 1 }).expect(200);
    }
    const assumed = (await ask({ assumed: 'true' })).items;
    await team['fire-engineer'].post(`/api/projects/${project.id}/acceptances`).send({ memberIds: [assumed[0]!.id], kind: 'assumed', reason: 'Seen' }).expect(200);
    all = (await ask({})).items;
    // a foreign project with the same marks: nothing of it may ever be found
    const foreign = await app.makeProject();
    const foreignZone = await build.zone(app, await build.level(app, foreign, '00'), 'F1');
    for (const mark of ['B1', 'B2']) await build.beam(app, foreignZone, await build.section(app, foreign), mark);
  });
  afterAll(() => app.stop());

  it('has variety enough to be told apart', () => {
    expect(all).toHaveLength(36);
    expect(new Set(all.map((r) => r.verdict)).size).toBeGreaterThan(1);
    expect(all.some((r) => r.requiredThickness !== null) && all.some((r) => r.assumed) && all.some((r) => !r.open)).toBe(true);
  });

  it.each([
    ['zoneIds', (r: MemberRowDto) => r.zoneId], ['memberTypes', (r: MemberRowDto) => r.memberType], ['families', (r: MemberRowDto) => r.family],
    ['sectionIds', (r: MemberRowDto) => r.sectionId], ['grades', (r: MemberRowDto) => r.grade], ['exposures', (r: MemberRowDto) => r.exposure],
    ['protectionForms', (r: MemberRowDto) => r.protectionForm], ['periods', (r: MemberRowDto) => String(r.periodMin)], ['ways', (r: MemberRowDto) => r.way],
    ['verdicts', (r: MemberRowDto) => r.verdict ?? ''], ['memberIds', (r: MemberRowDto) => r.id],
  ] as const)('is narrowed by %s as by hand', async (key, of) => {
    const values = some(all.map(of).filter(Boolean));
    for (const chosen of [values, values.slice(0, 1)]) {
      expect(marks((await ask({ [key]: chosen.join(',') })).items)).toEqual(marks(all.filter((r) => chosen.includes(of(r)))));
    }
  });

  it.each([
    ['sectionFactor', (r: MemberRowDto) => r.sectionFactorPerM], ['criticalTemperature', (r: MemberRowDto) => r.criticalTemperatureC], ['utilisation', (r: MemberRowDto) => r.utilisation],
    ['length', (r: MemberRowDto) => r.lengthMm / 1000], ['thickness', (r: MemberRowDto) => (r.requiredThickness === null ? null : r.requiredThickness * (r.thicknessUnit === 'µm' ? 0.001 : 1))],
  ] as const)('is narrowed by a range of %s, above the lower limit and up to the upper', async (key, of) => {
    const values = all.map(of).filter((v) => v !== null).sort((a, b) => a - b);
    const limits = values.length ? [values[0]!, values[Math.floor(values.length / 2)]!, values.at(-1)!] : [0, 1, 2];
    for (const above of limits) for (const upTo of limits) {
      const expected = all.filter((r) => { const v = of(r); return v !== null && v > above && v <= upTo; });
      expect(marks((await ask({ [`${key}Above`]: String(above), [`${key}UpTo`]: String(upTo) })).items)).toEqual(marks(expected));
    }
  });

  it('is narrowed by level, product, what is open, assumed and accepted', async () => {
    const level = zones[2]!.levelId;
    const there = new Set(zones.filter((z) => z.levelId === level).map((z) => z.id));
    expect(marks((await ask({ levelIds: level })).items)).toEqual(marks(all.filter((r) => there.has(r.zoneId))));
    const values = (await team.specifier.get(at('/values')).expect(200)).body as MemberValuesDto;
    expect(marks((await ask({ productIds: values.productIds[0]!.value })).items)).toEqual(marks(all.filter((r) => r.productName === 'Test coating')));
    for (const flag of ['open', 'assumed'] as const) for (const value of [true, false]) {
      expect(marks((await ask({ [flag]: String(value) })).items)).toEqual(marks(all.filter((r) => r[flag] === value)));
    }
    const accepted = (await ask({ accepted: 'true' })).items;
    expect(accepted).toHaveLength(1);
    expect(accepted[0]).toMatchObject({ way: 'assumed', assumed: false });
    expect((await ask({ accepted: 'false' })).total).toBe(35);
    expect((await ask({ open: 'true', memberTypes: 'beam', grades: 'S355' })).items).toEqual(all.filter((r) => r.open && r.memberType === 'beam' && r.grade === 'S355'));
  });

  it('takes a search literally, whatever is typed', async () => {
    const notes = (r: MemberRowDto) => `${r.mark}\n${r.note}\n${r.section}`.toLowerCase();
    for (const text of [...hostile, 'b1', 'p g', 'x'.repeat(100), '\u202eb1', "' OR 1=1 --", '*', '(', '[a-z]']) {
      const found = await ask({ search: text });
      const expected = all.filter((r) => notes(r).includes(text.toLowerCase()) || r.section.toLowerCase().replaceAll(' ', '').includes(text.toLowerCase().replaceAll(' ', '')));
      expect([text, marks(found.items)]).toEqual([text, marks(expected)]);
    }
    await team.specifier.get(at()).query({ search: 'x'.repeat(101) }).expect(400);
    expect((await team.specifier.get(at()).query({ search: 'a\u0000b' })).status).toBeLessThan(500);
  });

  it.each(memberSortKeys)('is sorted by %s, both ways, what is not determined last, ties by mark', async (sort: MemberSortKey) => {
    const by: Partial<Record<MemberSortKey, (r: MemberRowDto) => number | null>> = {
      length: (r) => r.lengthMm, quantity: (r) => r.quantity, sectionFactor: (r) => r.sectionFactorPerM, criticalTemperature: (r) => r.criticalTemperatureC,
      thickness: (r) => r.requiredThickness, applied: (r) => r.appliedThickness, area: (r) => r.areaM2, period: (r) => r.periodMin, utilisation: (r) => r.utilisation,
      level: (r) => ({ 10: 36, B1: -4, 2: 8 })[r.levelCode] ?? null,
    };
    const order = new Map(all.map((r, i) => [r.id, i]));
    for (const direction of ['asc', 'desc'] as const) {
      const rows = (await ask({ sort, direction })).items;
      expect(new Set(rows.map((r) => r.id)).size).toBe(all.length);
      const of = by[sort];
      if (!of) continue;
      const sign = direction === 'asc' ? 1 : -1;
      const expected = [...all].sort((a, b) => {
        const [x, y] = [of(a), of(b)];
        if (x === null || y === null) return (x === null ? 1 : 0) - (y === null ? 1 : 0) || order.get(a.id)! - order.get(b.id)!;
        return sign * (x - y) || order.get(a.id)! - order.get(b.id)!;
      });
      expect(marks(rows)).toEqual(marks(expected));
    }
  });

  it('comes in windows that join without a gap or a repeat, in any order', async () => {
    for (const sort of ['mark', 'verdict', 'criticalTemperature', 'grade']) {
      const windows = await Promise.all([1, 2, 3, 4].map((page) => ask({ sort, page: String(page), pageSize: '10' })));
      expect(windows.map((w) => w.total)).toEqual([36, 36, 36, 36]);
      expect(new Set(windows.flatMap((w) => marks(w.items))).size).toBe(36);
    }
    const beyond = await ask({ page: '900', pageSize: '100' });
    expect(beyond).toMatchObject({ items: [], total: 36, project: { members: 36, open: all.filter((r) => r.open).length } });
    for (const bad of [{ page: '0' }, { pageSize: '0' }, { pageSize: '501' }, { page: 'x' }, { sort: 'mark; drop' }, { direction: 'up' }, { sectionFactorAbove: 'much' }, { lengthUpTo: '1e99' }, { grades: 'S999' }, { periods: '1.5' }, { zoneIds: 'x' }, { open: 'perhaps' }, { sectionFactorAbove: '' }]) {
      expect([bad, (await team.specifier.get(at()).query(bad)).status]).toEqual([bad, 400]);
    }
  });

  it('tells which values there are to choose from, counted', async () => {
    const values = (await team.specifier.get(at('/values')).expect(200)).body as MemberValuesDto;
    for (const [key, of] of [['grades', (r: MemberRowDto) => r.grade], ['zoneIds', (r: MemberRowDto) => r.zoneId], ['verdicts', (r: MemberRowDto) => r.verdict], ['periods', (r: MemberRowDto) => String(r.periodMin)], ['ways', (r: MemberRowDto) => r.way]] as const) {
      for (const { value, members } of values[key]) expect(members).toBe(all.filter((r) => of(r) === value).length);
      expect(values[key].reduce((sum, v) => sum + v.members, 0)).toBe(all.length);
    }
    expect(values.levelIds.map((v) => v.label)).toEqual(['B1 Level B1', '2 Level 2', '10 Level 10']);
    await team.contractor.get(at('/values')).expect(403);
  });

  it('keeps the members of another project out, by any id', async () => {
    const foreign = await app.dataSource.manager.findOneByOrFail(Member, { mark: 'B2', projectId: (await app.dataSource.manager.findOneByOrFail(Member, { sectionId: all[0]!.sectionId })).projectId });
    expect(foreign.projectId).toBe(project.id);
    const [other] = await app.dataSource.query<{ id: string; zone_id: string; section_id: string }[]>('SELECT id, zone_id, section_id FROM members WHERE project_id <> $1 LIMIT 1', [project.id]);
    for (const query of [{ memberIds: other!.id }, { zoneIds: other!.zone_id }, { sectionIds: other!.section_id }] as Record<string, string>[]) expect((await ask(query)).total).toBe(0);
  });

  describe('chosen as a whole', () => {
    const find = async (filter: object, except: string[] = []): Promise<FoundSummaryDto> => (await team.specifier.post(at('/found')).send({ filter, except }).expect(200)).body as FoundSummaryDto;

    it('is told how many, under a stamp, and what of it may be accepted', async () => {
      const whole = await find({});
      expect(whole).toMatchObject({ count: 36, acceptable: { assumed: all.filter((r) => r.assumed).length, bare: all.filter((r) => r.verdict === 'bare').length, 'high-temperature': all.filter((r) => (r.criticalTemperatureC ?? 0) > 650).length } });
      expect(await find({})).toEqual(whole);
      expect((await find({}, [all[0]!.id])).count).toBe(35);
      expect(await find({ search: 'nobody is called this' })).toMatchObject({ count: 0, stamp: '', marks: [] });
      await team.contractor.post(at('/found')).send({ filter: {} }).expect(403);
    });

    it('changes as a whole, or not at all where it has moved', async () => {
      const filter = { grades: ['S275'], memberTypes: ['beam'] };
      const expected = all.filter((r) => r.grade === 'S275' && r.memberType === 'beam');
      const { count, stamp } = await find(filter, [expected[0]!.id]);
      expect(count).toBe(expected.length - 1);
      const found = { filter, except: [expected[0]!.id], count, stamp };
      const refused = await team.specifier.post(at('/bulk')).send({ found: { ...found, count: count + 1 }, set: { grade: 'S460' } }).expect(409);
      expect(refused.body).toMatchObject({ code: 'member.found-moved', message: `${count + 1} members were found when you looked, ${count} are now. Nothing was changed; look at the list again and repeat.` });
      expect((await team.specifier.post(at('/bulk/preview')).send({ found, set: { grade: 'S460' } }).expect(200)).body).toEqual({ chosen: count, changes: count });
      expect((await team.specifier.post(at('/bulk')).send({ found, set: { grade: 'S460' } }).expect(200)).body).toMatchObject({ changed: count });
      expect((await ask({ grades: 'S460' })).total).toBe(count);
      // the same again: nothing is S275 any more but the one left out
      await team.specifier.post(at('/bulk')).send({ found, set: { grade: 'S355' } }).expect(409);
      await team.specifier.post(at('/delete')).send({ found }).expect(409);
    });

    it('is set by the structural engineer, and accepted by the fire engineer, each alone', async () => {
      const filter = { ways: ['none'] };
      const none = await find(filter);
      const body = { found: { filter, count: none.count, stamp: none.stamp }, basis: { way: 'assumed' } };
      for (const role of ['specifier', 'fire-engineer', 'contractor'] as const) await team[role].post(at('/structural')).send(body).expect(403);
      await team['structural-engineer'].post(at('/structural')).send({ ...body, basis: { way: 'declared', temperatureC: 550 } }).expect(400);
      expect((await team['structural-engineer'].post(at('/structural')).send(body).expect(200)).body).toMatchObject({ changed: none.count, results: none.count });
      expect((await ask(filter as never)).total).toBe(0);
      const [row] = (await ask({ assumed: 'true' })).items;
      expect((await team.specifier.get(at(`/${row!.id}`)).expect(200)).body.member.basisSetBy).toBe('The structural-engineer');
      const everything = await find({});
      const sign = (found: object) => team['fire-engineer'].post(`/api/projects/${project.id}/acceptances`).send({ found, kind: 'assumed', reason: 'Seen together' });
      await sign({ filter: {}, count: everything.count, stamp: 'another' }).expect(409);
      expect((await sign({ filter: {}, count: everything.count, stamp: everything.stamp }).expect(200)).body.accepted).toBeGreaterThanOrEqual(none.count);
      expect((await find({})).acceptable.assumed).toBe(0);
    });
  });
});
