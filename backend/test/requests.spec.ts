import { lockProject } from '../src/shared/project-lock.js';
import { TestApp } from './support/app.js';
import type { Agent } from './support/app.js';
import { makeScheduleProject } from './support/schedule-project.js';
import type { ScheduleProject } from './support/schedule-project.js';

describe('requests', () => {
  let app: TestApp;
  let p: ScheduleProject;
  let specifier: Agent;
  beforeAll(async () => {
    app = await TestApp.start();
    p = await makeScheduleProject(app);
    specifier = p.team.specifier;
  });
  afterAll(() => app.stop());

  const UNREADABLE = 'The request could not be read: its address or its content is malformed. Nothing was changed; reload the page and try again.';
  const NO_UPLOAD = 'The upload could not be read. Nothing was changed; choose one file, with an ordinary name, and send it again.';
  const part = (headers: string): string => `--B\r\n${headers}\r\n\r\nMark\r\n--B--\r\n`;

  it.each([
    ['cut-off JSON', 'application/json', '{"mark":', 400, UNREADABLE],
    ['JSON that is no object', 'application/json', 'null', 400, UNREADABLE],
    ['an unknown character set', 'application/json; charset=none', '{}', 415, UNREADABLE],
    ['JSON beyond the limit', 'application/json', JSON.stringify({ note: 'x'.repeat(5_000_000) }), 413, 'The input is larger than is accepted here. Nothing was changed; send less at once.'],
    ['a form without its boundary', 'multipart/form-data', 'x', 400, NO_UPLOAD],
    ['a form that is cut off', 'multipart/form-data; boundary=B', '--B\r\nContent-Disposition: form-data; name="file"; filename="a.csv"\r\n\r\nMark', 400, NO_UPLOAD],
    ['a file name with a zero byte', 'multipart/form-data; boundary=B', part('Content-Disposition: form-data; name="file"; filename="a\0b.csv"'), 400, NO_UPLOAD],
    ['a part without headers', 'multipart/form-data; boundary=B', part('Content-Disposition'), 400, NO_UPLOAD],
    ['a file in another field', 'multipart/form-data; boundary=B', part('Content-Disposition: form-data; name="other"; filename="a.csv"'), 400, NO_UPLOAD],
  ])('with %s are refused in words of ours', async (_, type, content, status, sentence) => {
    const answer = await specifier.post(p.url(type.startsWith('multipart') ? 'imports' : 'members')).set('Content-Type', type).send(content);
    expect({ status: answer.status, message: (answer.body as { message: string }).message }).toEqual({ status, message: sentence });
  });

  it('with fields of the wrong kind are told field by field', async () => {
    const { body } = await specifier.post(p.url('members')).send({ mark: 7, zoneId: 'Z01', memberType: 'girder', quantity: '2' }).expect(400);
    expect((body as { issues: unknown }).issues).toEqual(expect.arrayContaining([
      { path: 'mark', message: 'must be text' }, { path: 'zoneId', message: 'is not an identifier' }, { path: 'sectionId', message: 'is needed' },
      { path: 'memberType', message: 'must be one of beam, secondary-beam, column, bracing, tie' },
    ]));
  });

  it.each([
    ['a zone', 'fire-engineer', (zone: string) => ['patch', `zones/${zone}`, { code: 'Z01', name: 'Hall', periodMin: 90, curve: { kind: 'standard' }, version: 1 }]],
    ['a level', 'fire-engineer', (_: string, level: string) => ['patch', `levels/${level}`, { code: 'L0', name: 'Ground floor', elevationM: 0, heightM: 4, version: 1 }]],
    ['protection', 'specifier', (zone: string) => ['put', `zones/${zone}/protection`, { environment: 'C2', targetPolicy: { policy: 'one' }, systems: [], version: 1 }]],
    ['a section', 'specifier', () => ['post', 'sections', { designation: 'PG 800', shape: { kind: 'i', hMm: 800, bMm: 300, twMm: 12, tfMm: 25, rootRadiusMm: 0 } }]],
    ['the project', 'specifier', () => ['patch', '', { number: 'T-900', name: 'Other', place: '', currency: 'EUR', note: '', version: 1 }]],
  ] as const)('that change %s wait their turn with no row held, so that no two wait for each other', async (_, role, request) => {
    const own = await makeScheduleProject(app);
    const { id: zoneId, levelId } = own.zones.Z01;
    const [method, path, sent] = request(zoneId, levelId) as ['patch' | 'put' | 'post', string, Record<string, unknown>];
    const writer = app.dataSource.createQueryRunner();
    await writer.startTransaction();
    try {
      await lockProject(writer.manager, own.project.id);
      const waiting = own.team[role][method](own.url(path).replace(/\/$/, '')).send(path.startsWith('zones') && !path.endsWith('protection') ? { ...sent, levelId } : sent).then((answer) => answer);
      await untilSomebodyWaits(app);
      for (const table of ['zones', 'levels', 'sections', 'members']) await writer.query(`SELECT id FROM ${table} WHERE project_id = $1 FOR UPDATE NOWAIT`, [own.project.id]);
      await writer.query('SELECT id FROM projects WHERE id = $1 FOR UPDATE NOWAIT', [own.project.id]);
      await writer.commitTransaction();
      expect([200, 201]).toContain((await waiting).status);
    } finally {
      if (writer.isTransactionActive) await writer.rollbackTransaction();
      await writer.release();
    }
  });
});

async function untilSomebodyWaits(app: TestApp): Promise<void> {
  const WAITING = `SELECT 1 FROM pg_locks WHERE locktype = 'advisory' AND NOT granted AND database = (SELECT oid FROM pg_database WHERE datname = current_database())`;
  for (let tries = 0; tries < 400; tries += 1) {
    if ((await app.dataSource.query<unknown[]>(WAITING)).length) return;
    await new Promise((resume) => setTimeout(resume, 25));
  }
  throw new Error('nobody waits for the project');
}
