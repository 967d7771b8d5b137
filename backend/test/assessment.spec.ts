import { designRoles, memberDesignSchema } from '@mantlet/common';
import type { MemberResultDto, OpenItemDto, ProjectListItemDto } from '@mantlet/common';
import { AssessmentService } from '../src/features/assessment/assessment.service.js';
import { MemberResult } from '../src/features/assessment/member-result.entity.js';
import { ZoneResult } from '../src/features/assessment/zone-result.entity.js';
import { MemberAcceptance } from '../src/features/members/member-acceptance.entity.js';
import { Member } from '../src/features/members/member.entity.js';
import { TestApp } from './support/app.js';
import { makeScheduleProject, recompute, settledMembers } from './support/schedule-project.js';
import type { MemberSpec, ScheduleProject } from './support/schedule-project.js';

const effect = (momentYKnm: number): MemberSpec['basis'] => ({
  way: 'calculated', reference: 'invented',
  design: memberDesignSchema.parse({ actions: { given: 'fire-effect', effect: { axialKn: 0, momentYKnm, shearZKn: 0 } }, lateralRestraint: 'continuous' }),
});

/** Blockers that wait on each role: as the list of projects counts them, and as the project lists them. */
async function expectSameCounts(p: ScheduleProject): Promise<void> {
  const { blockers } = (await p.team.specifier.get(p.url('readiness')).expect(200)).body as { blockers: OpenItemDto[] };
  expect(blockers.length).toBeGreaterThan(0);
  for (const role of designRoles) {
    const [listed] = (await p.team[role].get('/api/projects').expect(200)).body as ProjectListItemDto[];
    expect({ role, waitsOnMe: listed?.waitsOnMe }).toEqual({ role, waitsOnMe: blockers.filter((item) => item.role === role).length });
  }
}
const isCurrent = async (p: ScheduleProject): Promise<boolean> => ((await p.team.specifier.get(p.url('readiness')).expect(200)).body as { current: boolean }).current;

describe('assessment', () => {
  let app: TestApp;
  beforeAll(async () => {
    app = await TestApp.start();
  });
  afterAll(() => app.stop());

  const resultOf = async (p: ScheduleProject, mark: string): Promise<MemberResult> =>
    app.dataSource.manager.findOneByOrFail(MemberResult, { memberId: p.members.get(mark)!.id });
  const titles = (items: OpenItemDto[]): string[] => items.map((item) => item.title);

  describe('of a settled project', () => {
    let p: ScheduleProject;
    beforeAll(async () => {
      p = await makeScheduleProject(app, { policies: { Z02: { policy: 'one' } } });
    });

    it('stores section factors as handbooks print them and the temperature of equation (4.22)', async () => {
      const beam = await resultOf(p, 'B0-001');
      // IPE 300, profile, three sides: 188 1/m (section tables for EN 10365 dimensions, by EN 1993-1-2 Table 4.2)
      expect(Math.round(beam.sectionFactorPerM!)).toBe(188);
      // EN 1993-1-2 (4.22), μ0 = 0.50: 585 °C in the standard's own table
      expect(Math.round(beam.criticalTemperatureC!)).toBe(585);
      // HE 300 B boxed on four sides: 80 1/m (section tables); on three sides, profile: 96 1/m
      expect(Math.round((await resultOf(p, 'C0-001')).sectionFactorPerM!)).toBe(80);
      expect(Math.round((await resultOf(p, 'B0-002')).sectionFactorPerM!)).toBe(96);
    });

    it('gives every member at least what it needs, and one thickness where the policy says so', async () => {
      const results = await app.dataSource.manager.find(MemberResult, { where: { verdict: 'protected' } });
      expect(results.length).toBe(7);
      for (const r of results) expect(r.appliedThickness!).toBeGreaterThanOrEqual(r.requiredThickness!);
      const [thin, thick] = [await resultOf(p, 'B1-002'), await resultOf(p, 'B1-001')];
      expect(thin.requiredThickness!).toBeLessThan(thick.requiredThickness!);
      expect(thin.appliedThickness).toBe(thick.requiredThickness);
    });

    it('keeps the zone target with the three policies side by side', async () => {
      const zone = await app.dataSource.manager.findOneByOrFail(ZoneResult, { zoneId: p.zones.Z02.id });
      expect(zone).toMatchObject({ members: 4, settled: 4, open: 0 });
      const coating = zone.targets.find((t) => t.productName === 'Testcoat')!;
      expect(coating.governing?.mark).toBe('B1-001');
      expect(coating.policies.map((policy) => policy.policy)).toEqual(['own', 'bands', 'one']);
      const own = coating.policies[0]!.material!;
      expect(coating.policies[2]!.material!).toBeGreaterThan(own);
      // litres to buy are the volume in place over the solids and what is left of the loss; the volume is what compares like with like
      for (const { areaM2, volumeM3 } of coating.policies) {
        expect(areaM2).toBeCloseTo(coating.areaM2, 9);
        expect(volumeM3).toBeGreaterThan(0);
      }
      expect(coating.policies[2]!.volumeM3! / coating.policies[0]!.volumeM3!).toBeCloseTo(coating.policies[2]!.material! / own, 9);
      // 10 IPE 300 of 6 m and 3 HE 300 B of 6 m, three sides: 1.16 − 0.15 and 1.73 − 0.30 m²/m (surface per metre of section tables)
      expect(coating.areaM2).toBeCloseTo(60 * (1.16 - 0.15) + 18 * (1.73 - 0.3), 0);
    });

    it('reports no change when nothing changed, and who may ask', async () => {
      expect((await p.team['structural-engineer'].post(p.url('recalculate')).expect(200)).body).toEqual({ members: 8, changed: 0, queued: false });
      await p.team.contractor.post(p.url('recalculate')).expect(403);
    });

    it('sees results that are older than their inputs, and refuses to go on with them', async () => {
      const { manager } = app.dataSource;
      expect(await isCurrent(p)).toBe(true);
      await manager.update(Member, p.members.get('B0-001')!.id, { quantity: 5 });
      const { body } = await p.team.specifier.get(p.url('readiness')).expect(200);
      expect(body).toMatchObject({ ready: false, current: false });
      expect(titles(body.blockers)).toEqual(['1 result is older than the inputs; recalculate']);
      expect((await p.team.specifier.post(p.url('recalculate')).expect(200)).body).toEqual({ members: 8, changed: 1, queued: false });
      expect(await isCurrent(p)).toBe(true);
    });

    it('sees that a member left its zone', async () => {
      const extra = await makeScheduleProject(app);
      await app.dataSource.manager.delete(Member, extra.members.get('B0-002')!.id);
      expect(await isCurrent(extra)).toBe(false);
    });

    it('explains a member with the same numbers as it stores', async () => {
      const assessment = app.app.get(AssessmentService, { strict: false });
      for (const mark of ['B0-001', 'C0-001', 'B1-003', 'R1-001']) {
        const stored = await resultOf(p, mark);
        const { result, working, charts, outline } = await assessment.explain(p.project.id, p.members.get(mark)!.id);
        const keys = Object.keys(result) as (keyof MemberResultDto)[];
        for (const key of keys) {
          const [a, b] = [result[key], stored[key as keyof MemberResult]];
          if (typeof a === 'number') expect(b).toBeCloseTo(a, 2);
          else expect([mark, key, b]).toEqual([mark, key, a]);
        }
        expect(working.length).toBeGreaterThan(0);
        expect(charts?.fire.length).toBeGreaterThan(2);
        expect(outline?.loops.length).toBeGreaterThan(0);
      }
      await expect(assessment.explain(p.project.id, '00000000-0000-4000-8000-000000000000')).rejects.toMatchObject({ status: 404 });
    });

    it('lets recalculations at the same moment wait for each other', async () => {
      const answers = await Promise.all(Array.from({ length: 4 }, () => p.team.specifier.post(p.url('recalculate'))));
      expect(answers.map((a) => a.status)).toEqual([200, 200, 200, 200]);
    });
  });

  describe('of a project with something open', () => {
    const open: MemberSpec[] = [
      ...settledMembers,
      { mark: 'B0-010', zone: 'Z01', type: 'beam', section: 'IPE 300', basis: { way: 'none' } },
      { mark: 'B0-011', zone: 'Z01', type: 'beam', section: 'IPE 300', basis: { way: 'none' } },
      { mark: 'B0-012', zone: 'Z01', type: 'beam', section: 'IPE 300', basis: effect(400) },
      { mark: 'B0-013', zone: 'Z01', type: 'beam', section: 'IPE 300', basis: { way: 'assumed' } },
      { mark: 'B0-014', zone: 'Z01', type: 'beam', section: 'IPE 300', basis: { way: 'declared', temperatureC: 400, reference: 'invented' } },
      { mark: 'T0-001', zone: 'Z01', type: 'tie', section: 'IPE 300', basis: { way: 'declared', temperatureC: 500, reference: 'invented' } },
    ];
    let p: ScheduleProject;
    let blockers: OpenItemDto[];
    let warnings: OpenItemDto[];
    beforeAll(async () => {
      p = await makeScheduleProject(app, { members: open });
      ({ blockers, warnings } = (await p.team.specifier.get(p.url('readiness')).expect(200)).body);
    });

    it('says each open matter as a sentence, with who must act and where', () => {
      const found = (title: RegExp): OpenItemDto => blockers.find((item) => title.test(item.title))!;
      expect(found(/^2 beams have neither actions nor a critical temperature$/)).toMatchObject({ role: 'structural-engineer', page: 'members', zoneLabel: 'Z01 Hall', count: 2 });
      // W_pl,y of IPE 300 is 628 cm³ (section tables): 628e3·355/1e6 = 223 kNm, less than the effect over κ1
      expect(found(/^1 beam fails cold: B0-012 at 1\.\d\d of its bending resistance$/)).toMatchObject({ role: 'structural-engineer', page: 'member' });
      expect(found(/^1 beam rests on an assumed temperature that nobody has accepted$/)).toMatchObject({ role: 'fire-engineer' });
      expect(found(/^B0-014: critical temperature 400 °C is below 450 °C, outside the assessment$/)).toMatchObject({ role: 'specifier' });
      expect(found(/^No system is set for tie or hanger members \(1\)$/)).toMatchObject({ role: 'specifier', page: 'zones' });
      expect(blockers).toHaveLength(5);
      expect(blockers.map((item) => item.role)).toEqual(['structural-engineer', 'structural-engineer', 'fire-engineer', 'specifier', 'specifier']);
    });

    it('counts for the list of projects, role by role, what the project itself lists', async () => {
      await expectSameCounts(p);
    });

    it('warns of what deserves a signature', () => {
      expect(titles(warnings)).toEqual(
        expect.arrayContaining(['1 beam has a critical temperature above 650 °C without a second signature', '1 beam may stay bare; no reason is signed yet']),
      );
    });

    it('takes an acceptance only for the value it was given for', async () => {
      const { manager } = app.dataSource;
      const memberId = p.members.get('B0-013')!.id;
      const [{ user_id: acceptedById }] = await manager.query(`SELECT user_id FROM memberships WHERE project_id = $1 AND 'fire-engineer' = ANY(roles)`, [p.project.id]);
      const sign = (valueC: number) => manager.save(MemberAcceptance, { memberId, kind: 'assumed' as const, valueC, reason: 'test', acceptedById, acceptedAt: new Date() });
      await sign(610);
      await recompute(app, p.project.id);
      expect(await resultOf(p, 'B0-013')).toMatchObject({ assumed: true, open: true });
      await sign(620);
      await recompute(app, p.project.id);
      expect(await resultOf(p, 'B0-013')).toMatchObject({ assumed: false, open: false, verdict: 'protected' });
    });

    it('stops at an assessment that has expired', async () => {
      const old = await makeScheduleProject(app, { expiresOn: '2020-01-31' });
      const { body } = await old.team.specifier.get(old.url('readiness')).expect(200);
      expect(titles(body.blockers)).toEqual(expect.arrayContaining(['The assessment of Testcoat expired on 2020-01-31; 4 members rest on it']));
      expect(await resultOf(old, 'B0-001')).toMatchObject({ verdict: 'protected', open: true });
      await expectSameCounts(old);
    });

    it('asks for members where there are none', async () => {
      const empty = await makeScheduleProject(app, { members: [] });
      const { body } = await empty.team.specifier.get(empty.url('readiness')).expect(200);
      expect(body).toMatchObject({ ready: false, current: true });
      expect(body.blockers[0].code).toBe('no-members');
      await expectSameCounts(empty);
    });
  });
});
