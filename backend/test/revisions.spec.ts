import type { RevisionDto, RevisionDetailDto } from '@mantlet/common';
import { sha256 } from '../src/shared/canonical-json.js';
import { AuditEntry } from '../src/features/audit/audit-entry.entity.js';
import { Member } from '../src/features/members/member.entity.js';
import { Revision } from '../src/features/revisions/revision.entity.js';
import { SchedulePdfService } from '../src/features/revisions/schedule-pdf.service.js';
import type { Agent } from './support/app.js';
import { TestApp } from './support/app.js';
import { makeScheduleProject, recompute, settledMembers } from './support/schedule-project.js';
import type { ScheduleProject } from './support/schedule-project.js';

// rendering the PDF takes its time on a slow machine
jest.setTimeout(60_000);
describe('revisions', () => {
  let app: TestApp;
  beforeAll(async () => {
    app = await TestApp.start();
  });
  afterAll(() => app.stop());

  const start = async (p: ScheduleProject, code = 'P01'): Promise<RevisionDto> =>
    (await p.team.specifier.post(p.url('revisions')).send({ code, purpose: 'For construction' }).expect(201)).body;
  const step = (p: ScheduleProject, by: Agent, id: string, name: string, body: object = {}) => by.post(p.url(`revisions/${id}/${name}`)).send(body);
  const issueWhole = async (p: ScheduleProject, code: string): Promise<RevisionDto> => {
    const { id } = await start(p, code);
    await step(p, p.team.specifier, id, 'prepare').expect(200);
    await step(p, p.checker, id, 'check').expect(200);
    return (await step(p, p.team.specifier, id, 'issue').expect(200)).body;
  };
  const stored = async (id: string): Promise<{ snapshot: string; pdf: Buffer }> =>
    (await app.dataSource.query('SELECT snapshot, pdf FROM revisions WHERE id = $1', [id]))[0];

  it('go from draft to issued through two people, and each step is in the audit trail', async () => {
    const p = await makeScheduleProject(app);
    const draft = await start(p);
    expect(draft).toMatchObject({ code: 'P01', state: 'draft', prepared: null, snapshotSha256: null, members: null });
    const prepared: RevisionDto = (await step(p, p.team.specifier, draft.id, 'prepare').expect(200)).body;
    expect(prepared).toMatchObject({ state: 'prepared', members: 8, prepared: { name: 'The specifier' } });
    const own = (await step(p, p.team.specifier, draft.id, 'check').expect(409)).body;
    expect(own.message).toBe('You prepared revision P01 yourself; another specifier must check it.');
    const early = (await step(p, p.team.specifier, draft.id, 'issue').expect(409)).body;
    expect(early.code).toBe('schedule.not-checked');
    expect((await step(p, p.checker, draft.id, 'check').expect(200)).body).toMatchObject({ state: 'checked', checked: { name: 'Checking specifier' } });
    const issued: RevisionDto = (await step(p, p.team.specifier, draft.id, 'issue').expect(200)).body;
    const { snapshot, pdf } = await stored(draft.id);
    expect(issued).toMatchObject({ state: 'issued', snapshotSha256: sha256(snapshot), pdfSha256: sha256(pdf), pdfBytes: pdf.length });
    expect(pdf.subarray(0, 5).toString()).toBe('%PDF-');
    const trail = await app.dataSource.manager.find(AuditEntry, { where: { entityId: draft.id }, order: { id: 'ASC' } });
    expect(trail.map((e) => [e.action, e.userName])).toEqual([
      ['revision started', 'The specifier'], ['revision prepared', 'The specifier'], ['revision checked', 'Checking specifier'], ['revision issued', 'The specifier'],
    ]);
    expect((await p.team.reader.get(p.url(`revisions/${draft.id}/verify`)).expect(200)).body).toEqual({ pdfMatches: true, snapshotMatches: true });
  });

  it('are refused while something is open, with every blocker in words, and stay as they were', async () => {
    const p = await makeScheduleProject(app, { members: [...settledMembers, { mark: 'B0-010', zone: 'Z01', type: 'beam', section: 'IPE 300', basis: { way: 'none' } }] });
    const { id } = await start(p);
    const { body } = await step(p, p.team.specifier, id, 'prepare').expect(422);
    expect(body.message).toBe('The schedule cannot be prepared yet: 1 beam has neither actions nor a critical temperature. Settle these first.');
    expect(body.issues).toHaveLength(1);
    await app.dataSource.manager.delete(Member, p.members.get('B0-010')!.id);
    const stale = await step(p, p.team.specifier, id, 'prepare').expect(422);
    expect(stale.body.message).toMatch(/older than the inputs; recalculate/);
    expect((await p.team.specifier.get(p.url(`revisions/${id}`)).expect(200)).body).toMatchObject({ state: 'draft', summary: null });
    await p.team.specifier.post(p.url('recalculate')).expect(200);
    await step(p, p.team.specifier, id, 'prepare').expect(200);
  });

  it('freeze what they say: later changes belong to the next revision', async () => {
    const p = await makeScheduleProject(app);
    const { id } = await start(p);
    await step(p, p.team.specifier, id, 'prepare').expect(200);
    const before = await stored(id);
    await app.dataSource.manager.update(Member, p.members.get('B0-001')!.id, { quantity: 40 });
    await recompute(app, p.project.id);
    await step(p, p.checker, id, 'check').expect(200);
    const issued: RevisionDto = (await step(p, p.checker, id, 'issue').expect(200)).body;
    expect((await stored(id)).snapshot).toBe(before.snapshot);
    expect(JSON.parse(before.snapshot).members.find((m: { mark: string }) => m.mark === 'B0-001').quantity).toBe(4);
    const next = await issueWhole(p, 'P02');
    expect(next.protectedAreaM2!).toBeGreaterThan(issued.protectedAreaM2!);
    const list: RevisionDto[] = (await p.team.reader.get(p.url('revisions')).expect(200)).body;
    expect(list.map((r) => [r.code, r.state])).toEqual([['P02', 'issued'], ['P01', 'superseded']]);
  });

  it('come back to draft with a comment', async () => {
    const p = await makeScheduleProject(app);
    const { id } = await start(p);
    await step(p, p.checker, id, 'return', { comment: 'too early' }).expect(409);
    await step(p, p.team.specifier, id, 'prepare').expect(200);
    await step(p, p.checker, id, 'return', { comment: '' }).expect(400);
    const back = (await step(p, p.checker, id, 'return', { comment: 'Zone Z02 needs R 60' }).expect(200)).body;
    expect(back).toMatchObject({ state: 'draft', returnedComment: 'Zone Z02 needs R 60', prepared: null, snapshotSha256: null });
    const again = (await step(p, p.checker, id, 'prepare').expect(200)).body;
    expect(again).toMatchObject({ state: 'prepared', returnedComment: null, prepared: { name: 'Checking specifier' } });
    await step(p, p.team.specifier, id, 'check').expect(200);
  });

  it('are one at a time, with a code of their own, edited in draft only', async () => {
    const p = await makeScheduleProject(app);
    const { id } = await start(p);
    const second = (await p.team.specifier.post(p.url('revisions')).send({ code: 'P02' }).expect(409)).body;
    expect(second.message).toBe('Revision P01 is still draft. Issue it, or go on with it, before starting another.');
    expect((await p.team.specifier.patch(p.url(`revisions/${id}`)).send({ code: 'T01', purpose: 'For tender' }).expect(200)).body).toMatchObject({ code: 'T01', purpose: 'For tender' });
    const stale = await p.team.specifier.patch(p.url(`revisions/${id}`)).send({ code: 'T01', purpose: 'For comment', was: { code: 'P01', purpose: '' } }).expect(409);
    expect(stale.body).toMatchObject({ code: 'shared.stale', current: { code: 'T01', purpose: 'For tender' }, by: expect.any(String) });
    await step(p, p.team.specifier, id, 'prepare').expect(200);
    expect((await p.team.specifier.patch(p.url(`revisions/${id}`)).send({ code: 'X', purpose: '' }).expect(409)).body.code).toBe('schedule.not-draft');
    await step(p, p.checker, id, 'check').expect(200);
    await step(p, p.checker, id, 'issue').expect(200);
    expect((await p.team.specifier.post(p.url('revisions')).send({ code: 'T01' }).expect(409)).body.code).toBe('schedule.code-taken');
  });

  it('are issued once when two people issue at once', async () => {
    const p = await makeScheduleProject(app);
    const { id } = await start(p);
    await step(p, p.team.specifier, id, 'prepare').expect(200);
    await step(p, p.checker, id, 'check').expect(200);
    const answers = await Promise.all([step(p, p.team.specifier, id, 'issue'), step(p, p.checker, id, 'issue')]);
    expect(answers.map((a) => a.status).sort()).toEqual([200, 409]);
    expect(answers.find((a) => a.status === 409)!.body.message).toMatch(/^Revision P01 was issued by (The|Checking) specifier on \d{4}-\d\d-\d\d; nothing is left to do\.$/);
  });

  it('keep nobody from working while the PDF is rendered, and are not issued if they were returned meanwhile', async () => {
    const p = await makeScheduleProject(app);
    const { id } = await start(p);
    await step(p, p.team.specifier, id, 'prepare').expect(200);
    await step(p, p.checker, id, 'check').expect(200);
    const pdfs = app.app.get(SchedulePdfService, { strict: false });
    const render = pdfs.render.bind(pdfs);
    const during = jest.spyOn(pdfs, 'render').mockImplementationOnce(async (...schedule) => {
      await p.team.specifier.post(p.url('recalculate')).expect(200);
      await step(p, p.checker, id, 'return', { comment: 'Zone Z02 needs R 60' }).expect(200);
      await step(p, p.team.specifier, id, 'prepare').expect(200);
      await step(p, p.checker, id, 'check').expect(200);
      return render(...schedule);
    });
    const refused = (await step(p, p.team.specifier, id, 'issue').expect(409)).body;
    expect(during).toHaveBeenCalledTimes(1);
    during.mockRestore();
    expect(refused.code).toBe('shared.stale');
    expect(await app.dataSource.manager.findOneBy(Revision, { id })).toMatchObject({ state: 'checked', pdfSha256: null, issuedAt: null });
    await step(p, p.team.specifier, id, 'issue').expect(200);
  });

  it('cannot be changed in the database once issued', async () => {
    const p = await makeScheduleProject(app);
    const { id, pdfSha256 } = await issueWhole(p, 'P01');
    const attempts = [
      `UPDATE revisions SET purpose = 'other' WHERE id = $1`, `UPDATE revisions SET snapshot = '{}' WHERE id = $1`, `UPDATE revisions SET pdf = NULL WHERE id = $1`,
      `UPDATE revisions SET state = 'draft' WHERE id = $1`, `UPDATE revisions SET state = 'superseded', code = 'Z' WHERE id = $1`, 'DELETE FROM revisions WHERE id = $1',
    ];
    for (const attempt of attempts) await expect(app.dataSource.query(attempt, [id])).rejects.toThrow(/issued and cannot be changed/);
    expect(await app.dataSource.manager.findOneBy(Revision, { id })).toMatchObject({ state: 'issued', pdfSha256 });
  });

  it('are refused for checking and issuing where the snapshot was tampered with', async () => {
    const p = await makeScheduleProject(app);
    const { id } = await start(p);
    await step(p, p.team.specifier, id, 'prepare').expect(200);
    await app.dataSource.query(`UPDATE revisions SET snapshot = replace(snapshot, 'B0-001', 'B0-999') WHERE id = $1`, [id]);
    expect((await step(p, p.checker, id, 'check').expect(409)).body.code).toBe('schedule.snapshot-damaged');
    expect((await p.checker.get(p.url(`revisions/${id}/verify`)).expect(200)).body).toEqual({ pdfMatches: null, snapshotMatches: false });
  });

  it('show drafts to the design team only, and let specifiers alone move them', async () => {
    const p = await makeScheduleProject(app);
    const { id } = await start(p);
    for (const role of ['contractor', 'inspector', 'reader'] as const) {
      expect((await p.team[role].get(p.url('revisions')).expect(200)).body).toEqual([]);
      await p.team[role].get(p.url(`revisions/${id}`)).expect(404);
      await p.team[role].get(p.url(`revisions/${id}/pdf`)).expect(404);
      await p.team[role].get(p.url(`revisions/${id}/verify`)).expect(404);
      await p.team[role].get(p.url('readiness')).expect(403);
    }
    for (const role of ['fire-engineer', 'structural-engineer', 'contractor', 'inspector', 'reader'] as const) {
      await p.team[role].post(p.url('revisions')).send({ code: 'P02' }).expect(403);
      for (const name of ['prepare', 'check', 'return', 'issue']) await step(p, p.team[role], id, name, { comment: 'because' }).expect(403);
    }
    const other = await makeScheduleProject(app);
    await step(other, other.team.specifier, id, 'prepare').expect(404);
  });

  it('tell in short what is frozen in them', async () => {
    const p = await makeScheduleProject(app);
    const { id } = await issueWhole(p, 'P01');
    const detail: RevisionDetailDto = (await p.team.contractor.get(p.url(`revisions/${id}`)).expect(200)).body;
    expect(detail.summary).toMatchObject({ levels: 2, zones: 2, members: 8, pieces: 36, bareMembers: 1, protectedAreaM2: detail.protectedAreaM2 });
    expect(detail.summary!.products.map((x) => [x.name, x.invented, x.evidenceEdition])).toEqual(
      expect.arrayContaining([['Testcoat', true, '1'], ['Testboard', true, '1'], ['Testspray', true, '1']]),
    );
    const area = detail.summary!.products.reduce((sum, x) => sum + Number(x.areaM2), 0);
    expect(area).toBeCloseTo(detail.protectedAreaM2!, 6);
  });
});
