import { readFile } from 'node:fs/promises';
import path from 'node:path';
import type { ImportDto, ImportMapping, ImportPreviewDto, MemberDto } from '@mantlet/common';
import ExcelJS from 'exceljs';
import fc from 'fast-check';
import { AuditEntry } from '../src/features/audit/audit-entry.entity.js';
import { MemberImport } from '../src/features/imports/member-import.entity.js';
import { Member } from '../src/features/members/member.entity.js';
import type { Project } from '../src/features/projects/project.entity.js';
import type { Zone } from '../src/features/zones/zone.entity.js';
import { makeZip } from './files/zip.js';
import type { Agent } from './support/app.js';
import { TestApp } from './support/app.js';
import { build } from './support/building.js';

type Rows = (string | number)[][];
const headers = ['Mark', 'Level', 'Zone', 'Type', 'Section', 'Grade', 'Length (mm)', 'No. off', 'Exposure'];
const right: Rows = [
  ['B1', '00', 'Z1', 'Beam', 'UB 254x146x31', 'S355', 6500, 2, '3 sides'],
  ['B2', '00', 'Z1', 'Beam', '254 x 146 x 31 UB', 'S355', 6500, 1, '3 sides'],
  ['C1', '00', 'Z2', 'Column', 'HEB300', 'S275', 4000, 1, '4 sides'],
];
const csv = (rows: Rows): string => rows.map((row) => row.map((cell) => (/[",\n]/.test(String(cell)) ? `"${String(cell).replace(/"/g, '""')}"` : String(cell))).join(',')).join('\r\n');
const xlsx = async (rows: Rows): Promise<Buffer> => {
  const book = new ExcelJS.Workbook();
  book.addWorksheet('Schedule').addRows(rows);
  return Buffer.from(await book.xlsx.writeBuffer());
};

describe('imports', () => {
  let app: TestApp;
  let project: Project;
  let zone: Zone;
  let team: Awaited<ReturnType<TestApp['team']>>;
  const at = (path_ = ''): string => `/api/projects/${project.id}/imports${path_}`;
  const send = (content: Buffer | string, name = 'schedule.csv', agent: Agent = team.specifier): ReturnType<Agent['post']> =>
    agent.post(at()).attach('file', Buffer.from(content), name);
  const upload = async (content: Buffer | string, name = 'schedule.csv', agent: Agent = team.specifier): Promise<ImportDto> => (await send(content, name, agent).expect(201)).body as ImportDto;
  const preview = async (made: ImportDto, mapping: Partial<ImportMapping> = {}, agent: Agent = team.specifier): Promise<ImportPreviewDto> =>
    (await agent.put(at(`/${made.id}/mapping`)).send({ ...made.mapping, ...mapping }).expect(200)).body as ImportPreviewDto;
  const confirm = (made: ImportDto, body: object = {}, agent: Agent = team.specifier): ReturnType<Agent['post']> => agent.post(at(`/${made.id}/confirm`)).send(body);
  const members = (): Promise<Member[]> => app.dataSource.manager.find(Member, { where: { projectId: project.id }, order: { mark: 'ASC' } });
  /** what a bad import must leave: the members as they were, to the last column */
  const unchanged = async (act: () => Promise<unknown>): Promise<void> => {
    const before = JSON.stringify(await members());
    await act();
    expect(JSON.stringify(await members())).toBe(before);
  };
  const importRows = async (rows: Rows): Promise<void> => {
    const made = await upload(csv([headers, ...rows]));
    await preview(made);
    await confirm(made).expect(200);
  };

  beforeAll(async () => {
    app = await TestApp.start({ catalogue: true });
  }, 60_000);
  afterAll(() => app.stop());
  beforeEach(async () => {
    project = await app.makeProject();
    team = await app.team(project);
    const level = await build.level(app, project, '00');
    zone = await build.zone(app, level, 'Z1');
    await build.zone(app, level, 'Z2', 90);
  });

  it.each([['CSV', 'schedule.csv'], ['XLSX', 'schedule.xlsx']])('bring a schedule as %s in, after a preview, all at once', async (kind, name) => {
    const rows = [['Steel schedule, invented'], [], headers, ...right, ['Total', '', '', '', '', '', 17000]] as Rows;
    const made = await upload(kind === 'CSV' ? csv(rows) : await xlsx(rows), name);
    expect(made).toMatchObject({
      fileName: name, state: 'mapping', notes: [],
      mapping: { headerRow: 3, columns: { mark: 0, level: 1, zone: 2, memberType: 3, section: 4, grade: 5, length: 6, quantity: 7, exposure: 8 }, lengthUnit: 'mm' },
    });
    const shown = await preview(made);
    expect(shown).toMatchObject({ counts: { new: 3, changed: 0, unchanged: 0, wrong: 0 }, total: 3, notes: ['Row 7 looks like a total and was not read.'] });
    expect(shown.rows[0]).toMatchObject({ row: 4, state: 'new', mark: 'B1', problems: [], values: { section: 'UB 254x146x31' } });
    expect(await members()).toHaveLength(0);
    expect((await confirm(made).expect(200)).body).toEqual({ added: 3, changed: 0, unchanged: 0, leftOut: 0 });
    const [b1, b2, c1] = await members();
    expect(b1).toMatchObject({ mark: 'B1', memberType: 'beam', grade: 'S355', lengthMm: 6500, quantity: 2, exposure: { arrangement: 'three-sides' }, protectionForm: 'profile', basis: { way: 'none' }, version: 1 });
    expect(b2?.sectionId).toBe(b1?.sectionId);
    expect(c1).toMatchObject({ memberType: 'column', exposure: { arrangement: 'four-sides' } });
    // assessed in the same step
    const listed = await team.specifier.get(`/api/projects/${project.id}/members`).expect(200);
    expect(listed.body.items).toEqual(right.map((row) => expect.objectContaining({ mark: row[0], verdict: 'not-determined', sectionFactorPerM: expect.any(Number) })));
    const trail = await app.dataSource.manager.findBy(AuditEntry, { projectId: project.id });
    expect(trail.map((entry) => entry.action).sort()).toEqual(['member imported', 'member imported', 'member imported', 'schedule imported']);
    expect((await confirm(made).expect(409)).body.message).toBe('This import was confirmed already; its members are in the project.');
    expect((await team.specifier.get(at(`/${made.id}`)).expect(200)).body).toMatchObject({ state: 'confirmed', sheets: [] });
    expect((await app.dataSource.manager.createQueryBuilder(MemberImport, 'i').addSelect('i.cells').where({ id: made.id }).getOneOrFail()).cells).toBeNull();
  });

  it('understand a workbook that no spreadsheet program wrote', async () => {
    const made = await upload(await readFile(path.resolve(__dirname, 'files/hand-written.xlsx')), 'hand-written.xlsx');
    const shown = await preview(made, { defaults: { ...made.mapping.defaults, zoneId: zone.id } });
    expect(shown.counts).toEqual({ new: 2, changed: 0, unchanged: 0, wrong: 1 });
    expect(shown.rows.find((row) => row.state === 'wrong')).toMatchObject({ row: 6, problems: [{ column: 'Length (m), column E', sentence: "The cell's formula gives #REF!. Correct it in the schedule." }] });
    expect((await confirm(made, { leaveOutWrongRows: true }).expect(200)).body).toEqual({ added: 2, changed: 0, unchanged: 0, leftOut: 1 });
    expect((await members()).map((m) => [m.mark, m.lengthMm, m.quantity])).toEqual([['B1', 6125, 2], ['B2', 12_250, 1]]);
  });

  it('of the specifier alone, and each their own', async () => {
    for (const role of ['fire-engineer', 'structural-engineer', 'contractor', 'reader'] as const) await send(csv([headers, ...right]), 's.csv', team[role]).expect(403);
    const made = await upload(csv([headers, ...right]));
    const colleague = await app.makeUser('Second specifier');
    await app.join(project, colleague, 'specifier');
    const agent = await app.signIn(colleague);
    await agent.get(at(`/${made.id}`)).expect(404);
    await confirm(made, {}, agent).expect(404);
    const foreign = await app.makeProject();
    await app.join(foreign, colleague, 'specifier');
    await agent.get(`/api/projects/${foreign.id}/imports/${made.id}`).expect(404);
    expect((await team.specifier.get(at(`/${made.id}`)).expect(200)).body).toMatchObject({ id: made.id, mapping: made.mapping });
  });

  it('show what a mark that is there already would change, and leave alone what the file does not say', async () => {
    await importRows(right);
    await app.dataSource.manager.update(Member, { projectId: project.id, mark: 'B1' }, { deductionM2: 1.5, note: 'kept' });
    const made = await upload(csv([['Mark', 'Section', 'Length (m)'], ['B1', 'IPE 300', '6.5'], ['B2', '254x146UB31', '6.5'], ['C1', 'HE 300 B', '4.2']]));
    expect(made.notes.join()).toMatch(/No column was recognised for Zone, Type, Steel grade, Exposure/);
    const shown = await preview(made);
    expect(shown.counts).toEqual({ new: 0, changed: 2, unchanged: 1, wrong: 0 });
    expect(shown.rows.map((row) => row.changes)).toEqual([
      [{ field: 'section', old: 'UB 254 x 146 x 31', new: 'IPE 300' }].map((c) => ({ ...c, old: expect.stringContaining('254') })),
      [], [{ field: 'length', old: '4000 mm', new: '4200 mm' }],
    ]);
    expect((await confirm(made).expect(200)).body).toEqual({ added: 0, changed: 2, unchanged: 1, leftOut: 0 });
    const [b1, b2, c1] = await members();
    // version 2 came of the statement above
    expect(b1).toMatchObject({ deductionM2: 1.5, note: 'kept', grade: 'S355', lengthMm: 6500, version: 3 });
    expect(b2?.version).toBe(1);
    expect(c1).toMatchObject({ lengthMm: 4200, version: 2 });
    const trail = await app.dataSource.manager.findOneByOrFail(AuditEntry, { entityId: c1!.id, action: 'member changed by import' });
    expect(trail.changes).toEqual([{ field: 'lengthMm', old: 4000, new: 4200 }]);
  });

  it('read the structural engineer’s columns only from one who is', async () => {
    const rows: Rows = [[...headers, 'Critical temperature (°C)', 'Reference'], [...right[0]!, 550, 'Calculation 7']];
    const made = await upload(csv(rows));
    expect(made.notes).toContain("Critical temperature, Reference is not read: only the structural engineer may set how a member's critical temperature comes about.".replace(' is not', ' are not'));
    // asked for all the same
    const forced = await preview(made, { columns: { ...made.mapping.columns, criticalTemperature: 9, reference: 10 } });
    expect(forced.notes[0]).toMatch(/Critical temperature, Reference are not read/);
    await confirm(made).expect(200);
    expect((await members())[0]).toMatchObject({ basis: { way: 'none' }, basisSetById: null });

    const both = await app.makeUser('Both');
    await app.join(project, both, 'specifier', 'structural-engineer');
    const agent = await app.signIn(both);
    const again = await upload(csv(rows), 's.csv', agent);
    const shown = await preview(again, {}, agent);
    expect(shown.rows[0]?.changes).toEqual([{ field: 'criticalTemperature', old: 'Not given', new: 'Declared 550 °C (Calculation 7)' }]);
    await confirm(again, {}, agent).expect(200);
    const [member] = await members();
    expect(member).toMatchObject({ basis: { way: 'declared', temperatureC: 550, reference: 'Calculation 7' }, basisSetById: both.id });
    expect(member?.basisSetAt).toBeInstanceOf(Date);
  });

  it('write nothing where another changed the project after the preview, until the new preview was seen', async () => {
    await importRows(right);
    const made = await upload(csv([headers, ['B1', '00', 'Z1', 'Beam', 'UB 254x146x31', 'S355', 7000, 2, '3 sides']]));
    await preview(made);
    const [b1] = await members();
    const { body } = await team.specifier.get(`/api/projects/${project.id}/members/${b1!.id}`).expect(200);
    const { id: _i, basis: _b, basisSetBy: _y, basisSetAt: _t, acceptances: _a, ...member } = body.member as MemberDto;
    await team.specifier.patch(`/api/projects/${project.id}/members/${b1!.id}`).send({ ...member, lengthMm: 6800 }).expect(200);
    await unchanged(async () => expect((await confirm(made).expect(409)).body.message).toMatch(/^Nothing was written: the project was changed after this preview/));
    const shown = (await team.specifier.get(at(`/${made.id}/preview`)).expect(200)).body as ImportPreviewDto;
    expect(shown.rows[0]?.changes).toEqual([{ field: 'length', old: '6800 mm', new: '7000 mm' }]);
    await confirm(made).expect(200);
    expect((await members())[0]?.lengthMm).toBe(7000);
  });

  it('are confirmed once, though two ask at the same time', async () => {
    const made = await upload(csv([headers, ...right]));
    await preview(made);
    const answers = await Promise.all([confirm(made), confirm(made), confirm(made)]);
    expect(answers.map((a) => a.status).sort()).toEqual([200, 409, 409]);
    expect(await members()).toHaveLength(3);
  });

  it('can be given up, and then are over', async () => {
    const made = await upload(csv([headers, ...right]));
    expect((await confirm(made).expect(409)).body.message).toBe('Confirm which column holds what first; then the rows can be checked.');
    await team.specifier.get(at(`/${made.id}/preview`)).expect(409);
    await preview(made);
    await team.specifier.delete(at(`/${made.id}`)).expect(204);
    expect((await confirm(made).expect(409)).body.message).toBe('This import was given up. Upload the file again.');
    expect((await team.specifier.get(at(`/${made.id}`)).expect(200)).body).toMatchObject({ state: 'abandoned', sheets: [] });
    await team.specifier.put(at(`/${made.id}/mapping`)).send(made.mapping).expect(409);
    expect(await members()).toHaveLength(0);
  });

  it('page and filter the preview', async () => {
    const made = await upload(csv([headers, ...right, ['B9', '00', 'Z1', 'Beam', 'IPE 301', 'S355', 6500, 2, '3 sides']]));
    await preview(made);
    const wrong = (await team.specifier.get(at(`/${made.id}/preview`)).query({ state: 'wrong' }).expect(200)).body as ImportPreviewDto;
    expect(wrong).toMatchObject({ total: 1, counts: { new: 3, wrong: 1 }, rows: [{ row: 5, mark: 'B9' }] });
    expect((await team.specifier.get(at(`/${made.id}/preview`)).query({ page: 2, pageSize: 3 }).expect(200)).body).toMatchObject({ total: 4, page: 2, rows: [{ mark: 'B9' }] });
  });

  describe('of bad input get a sentence with row and column, and leave everything as it was', () => {
    beforeEach(() => importRows(right));

    it.each<[string, () => Promise<Buffer | string>, RegExp]>([
      ['a wrong file type', async () => '%PDF-1.7 …', /^bad\.csv is a PDF, not a CSV or XLSX file\. Save the schedule as CSV or XLSX and upload that\.$/],
      ['an old workbook', async () => Buffer.from('d0cf11e0a1b11ae1', 'hex'), /^bad\.csv is an old XLS workbook or one with a password/],
      ['a zip bomb', async () => makeZip([{ name: 'xl/workbook.xml', content: Buffer.alloc(101 * 1024 * 1024) }]), /^bad\.csv unpacks to more than 100 MB/],
      ['an empty file', async () => '', /^bad\.csv is empty\.$/],
      ['an empty sheet', () => xlsx([]), /^bad\.csv holds no rows\. Nothing to import\.$/],
    ])('%s', async (_name, content, expected) => {
      const bytes = await content();
      await unchanged(async () => expect((await send(bytes, 'bad.csv').expect(422)).body.message).toMatch(expected));
    });

    it('a 50 MB file', async () => {
      await unchanged(async () => {
        const answer = await send(Buffer.alloc(50 * 1024 * 1024, 'x'), 'big.csv').expect(413);
        expect(answer.body).toMatchObject({ code: 'import.too-large', message: 'The file is larger than 10 MB. Split the schedule, or save it without pictures.' });
      });
    });

    it('no file at all', async () => {
      expect((await team.specifier.post(at()).expect(422)).body.message).toBe('No file came with the request. Choose a CSV or XLSX file.');
      expect((await team.specifier.post(at()).field('file', 'text').expect(422)).body.code).toBe('import.no-file');
      expect((await team.specifier.post(at()).attach('other', Buffer.from('x'), 'x.csv')).status).toBe(400);
    });

    it('headers without rows', async () => {
      const made = await upload(csv([headers]));
      await unchanged(async () => {
        const answer = await team.specifier.put(at(`/${made.id}/mapping`)).send(made.mapping).expect(422);
        expect(answer.body.message).toBe('Sheet "schedule" has no rows below its headers in row 1. Nothing to import.');
      });
    });

    it('duplicate headers', async () => {
      const made = await upload(csv([['Mark', 'Section', 'Length (mm)', 'Length (mm)', 'Zone', 'Type', 'Grade', 'Exposure'], ['B7', 'IPE 300', 6000, 7000, 'Z1', 'beam', 'S355', '3']]));
      expect(made.notes).toContain('Row 1: columns C and D are both headed "Length (mm)". Choose which of them holds Length.');
      await unchanged(async () => {
        const answer = await team.specifier.put(at(`/${made.id}/mapping`)).send(made.mapping).expect(422);
        expect(answer.body).toMatchObject({ code: 'import.needed-for-new', message: 'Length: no column is chosen, and 1 row is a new member that needs it. Choose the column, or a value for new members below the rows.' });
      });
      expect((await preview(made, { columns: { ...made.mapping.columns, length: 3 } })).counts.new).toBe(1);
    });

    it('a missing column', async () => {
      const made = await upload(csv([['Mark', 'Section', 'Length (mm)'], ['B7', 'IPE 300', 6000], ['B1', 'IPE 300', 6000]]));
      await unchanged(async () => {
        const answer = await team.specifier.put(at(`/${made.id}/mapping`)).send(made.mapping).expect(422);
        expect(answer.body.message).toBe('Zone, Type, Steel grade, Exposure: no columns are chosen, and 1 row is a new member that needs them. Choose the column, or a value for new members below the rows.');
        expect(answer.body.issues[0]).toEqual({ path: 'columns.zone', message: 'is needed for new members' });
      });
      const defaults: ImportMapping['defaults'] = { zoneId: zone.id, memberType: 'beam', grade: 'S355', exposure: 'three-sides', protectionForm: 'boxed' };
      expect((await preview(made, { defaults })).counts).toMatchObject({ new: 1, changed: 1 });
      const noMark = { ...made.mapping, columns: { section: 1, length: 2 } };
      expect((await team.specifier.put(at(`/${made.id}/mapping`)).send(noMark).expect(422)).body.code).toBe('import.mark-needed');
    });

    it('a mapping that is not of this file', async () => {
      const made = await upload(csv([headers, ...right]));
      const put = async (more: object): Promise<string> => (await team.specifier.put(at(`/${made.id}/mapping`)).send({ ...made.mapping, ...more }).expect(422)).body.message as string;
      expect(await put({ sheet: 'Other' })).toBe('There is no sheet "Other". The file has "schedule".');
      expect(await put({ headerRow: 99 })).toBe('Row 99 cannot be the headers: the sheet ends at row 4.');
      expect(await put({ columns: { mark: 0, section: 50 } })).toBe('Section: the sheet has no column AY.');
      expect(await put({ columns: { mark: 0, section: 0 } })).toBe('Column A is chosen for Mark and for Section. Choose one of them.');
      const foreign = await build.zone(app, await build.level(app, await app.makeProject(), '00'), 'F');
      expect(await put({ defaults: { ...made.mapping.defaults, zoneId: foreign.id } })).toMatch(/not one of the project/);
    });

    it('text in number cells, negative lengths, unknown sections, zones and words, and one mark for two', async () => {
      const made = await upload(await xlsx([headers,
        ['B5', '00', 'Z1', 'Beam', 'UB 254x146x32', 'S355', 'six metres', 2, '3 sides'],
        ['B6', '00', 'Z1', 'Beam', 'IPE 300', 'S355', -6500, 1, '3 sides'],
        ['B7', '03', 'Z1', 'Strut', 'IPE 300', 'S999', 6500, 1, '5 sides'],
        ['B8', '00', 'Z1', 'Beam', 'IPE 300', 'S355', 6500, 1, '3 sides'],
        ['B8', '00', 'Z1', 'Beam', 'IPE 300', 'S355', 7500, 1, '3 sides'],
        ['B9', '00', 'Z1', 'Beam', 'IPE 300', 'S355', 6500, 1, '3 sides'],
      ]), 'bad.xlsx');
      const shown = await preview(made);
      expect(shown.counts).toEqual({ new: 1, changed: 0, unchanged: 0, wrong: 5 });
      const said = shown.rows.map((row) => [row.row, ...row.problems.map((p) => `${p.column}: ${p.sentence}`)]);
      expect(said).toEqual([
        [2, expect.stringMatching(/^Section, column E: There is no section "UB 254x146x32"\. Did you mean .*254.*146.*31/), 'Length (mm), column G: "six metres" is not a number. Length must be a number.'],
        [3, 'Length (mm), column G: Length must be above 0; it is -6500.'],
        [4, 'Level, column B: There is no level "03". The project has 00.', expect.stringMatching(/^Type, column D: "Strut" is not known/), expect.stringMatching(/^Grade, column F: "S999"/), expect.stringMatching(/^Exposure, column I: "5 sides"/)],
        [5, 'Mark, column A: Mark B8 also stands in row 6. A mark names one member; use "number off" for identical ones.'],
        [6, 'Mark, column A: Mark B8 also stands in row 5. A mark names one member; use "number off" for identical ones.'],
        [7],
      ]);
      await unchanged(async () => {
        const answer = await confirm(made).expect(422);
        expect(answer.body.message).toMatch(/^Nothing was written: 5 rows are wrong\. Row 2, Section, column E: There is no section "UB 254x146x32"/);
        expect(answer.body.issues).toHaveLength(9);
      });
      expect((await confirm(made, { leaveOutWrongRows: true }).expect(200)).body).toEqual({ added: 1, changed: 0, unchanged: 0, leftOut: 5 });
    });

    it('rows that are all wrong', async () => {
      const made = await upload(csv([headers, ['B5', '00', 'Z1', 'Beam', 'XYZ', 'S355', 6500, 2, '3 sides']]));
      await preview(made);
      await unchanged(async () => expect((await confirm(made, { leaveOutWrongRows: true }).expect(422)).body.message).toBe('Nothing was written: no row is right. Correct the file and upload it again.'));
    });

    it('arbitrary bytes and tables, which never make the server fail', async () => {
      const table = fc.array(fc.array(fc.oneof(fc.string({ unit: 'binary', maxLength: 12 }), fc.constantFrom(...headers, 'B1', 'Z1', 'IPE 300', '-1', '1e999', '=1+1', "12'-6\"", '\u0000')), { minLength: 1, maxLength: 8 }), { minLength: 1, maxLength: 6 });
      const content = fc.oneof(fc.uint8Array({ maxLength: 200 }).map((b) => Buffer.from(b)), table.map((rows) => Buffer.from(csv(rows))));
      await unchanged(() =>
        fc.assert(fc.asyncProperty(content, fc.string({ unit: 'binary', maxLength: 20 }), async (bytes, name) => {
          const sent = await send(bytes, `${name.replace(/[\r\n"\0]/g, '')}.csv`);
          // 400 where the name breaks the multipart form itself
          if (sent.status !== 201) return (sent.status === 422 || sent.status === 400) && typeof sent.body.message === 'string';
          const made = sent.body as ImportDto;
          const mapped = await team.specifier.put(at(`/${made.id}/mapping`)).send({ ...made.mapping, columns: { mark: 0, section: 1, length: 2, ...made.mapping.columns } });
          return mapped.status === 200 || mapped.status === 422;
        }), { numRuns: 60 }),
      );
    });
  });
});
