import { createHash } from 'node:crypto';
import type { ProductDto, ProductInput, ProductSummaryDto, ReadTableDto } from '@mantlet/common';
import ExcelJS from 'exceljs';
import { MemberResult } from '../src/features/assessment/member-result.entity.js';
import type { Project } from '../src/features/projects/project.entity.js';
import { Product } from '../src/features/products/product.entity.js';
import { ZoneSystem } from '../src/features/zones/zone-system.entity.js';
import { TestApp } from './support/app.js';
import type { Agent } from './support/app.js';
import { build } from './support/building.js';
import { inventedCoating, inventedTable } from './support/products.js';

const pdf = Buffer.from('%PDF-1.7\nan invented report\n%%EOF\n');

describe('products', () => {
  let app: TestApp;
  let project: Project;
  let team: Awaited<ReturnType<TestApp['team']>>;
  let administrator: Agent;
  let counter = 0;
  const at = (path = ''): string => `/api/projects/${project.id}/products${path}`;
  const coating = (more: Partial<ProductInput> = {}): ProductInput => inventedCoating({ name: `Coating ${(counter += 1)}`, ...more });
  const make = async (agent: Agent, path: string, input: ProductInput): Promise<ProductDto> => (await agent.post(path).send(input).expect(201)).body as ProductDto;

  beforeAll(async () => {
    app = await TestApp.start();
    project = await app.makeProject();
    team = await app.team(project);
    administrator = await app.signIn(await app.makeUser('Admin', { administrator: true }));
  });
  afterAll(() => app.stop());

  describe('the shared library', () => {
    it("is the administrator's to keep and everybody's to read", async () => {
      const input = coating();
      for (const role of ['fire-engineer', 'specifier', 'reader'] as const) await team[role].post('/api/products').send(input).expect(403);
      await app.anonymous().get('/api/products').expect(401);
      const made = await make(administrator, '/api/products', input);
      expect(made).toMatchObject({ ...input, projectId: null, version: 1, expired: false, evidenceFile: null });
      const listed = (await team.reader.get('/api/products').expect(200)).body as ProductSummaryDto[];
      const summary = listed.find((product) => product.id === made.id);
      expect(summary).toMatchObject({ form: 'table', usedByZones: 0, name: input.name, invented: true });
      expect(summary).not.toHaveProperty('evidence');
      // what it costs is the administrator's to see, and the design team's on its project
      const unpriced = { ...made, supply: { ...made.supply, materialRate: null, labourRate: null } };
      expect(made.supply).toMatchObject({ materialRate: '12.50', labourRate: '20.00' });
      for (const role of ['contractor', 'reader'] as const) {
        expect((await team[role].get(`/api/products/${made.id}`).expect(200)).body).toEqual(unpriced);
        expect((await team[role].get('/api/products').expect(200)).text).not.toMatch(/Rate":"/);
      }
      expect((await administrator.get(`/api/products/${made.id}`).expect(200)).body).toEqual(made);
      expect((await team.specifier.get(at(`/${made.id}`)).expect(200)).body).toEqual(made);
      for (const role of ['fire-engineer', 'specifier'] as const) {
        await team[role].put(`/api/products/${made.id}`).send({ ...input, version: 1 }).expect(403);
        await team[role].delete(`/api/products/${made.id}`).expect(403);
      }
    });

    it('is not changed through a project', async () => {
      const shared = await make(administrator, '/api/products', coating());
      const refused = await team.specifier.put(at(`/${shared.id}`)).send({ ...coating(), version: 1 }).expect(403);
      expect(refused.body.message).toBe('Only the administrator may change a product of the shared library.');
      await team.specifier.delete(at(`/${shared.id}`)).expect(403);
      await team.specifier.put(at(`/${shared.id}/evidence-file`)).attach('file', pdf, 'x.pdf').expect(403);
      await team.specifier.put(`/api/products/${shared.id}/evidence-file`).attach('file', pdf, 'x.pdf').expect(403);
    });
  });

  describe("a project's own", () => {
    it('are kept by its specifier and seen by its design team only', async () => {
      const input = coating();
      for (const role of ['fire-engineer', 'structural-engineer', 'contractor', 'inspector', 'reader'] as const) await team[role].post(at()).send(input).expect(403);
      const made = await make(team.specifier, at(), input);
      expect(made.projectId).toBe(project.id);
      expect((await team['fire-engineer'].get(at()).expect(200)).body).toEqual(expect.arrayContaining([expect.objectContaining({ id: made.id })]));
      await team.contractor.get(at()).expect(403);
      // neither in the library nor from another project
      await administrator.get(`/api/products/${made.id}`).expect(404);
      await administrator.put(`/api/products/${made.id}`).send({ ...input, version: 1 }).expect(404);
      const other = await app.makeProject();
      const theirs = await app.team(other);
      await theirs.specifier.get(`/api/projects/${other.id}/products/${made.id}`).expect(404);
      await theirs.specifier.put(`/api/projects/${other.id}/products/${made.id}`).send({ ...input, version: 1 }).expect(404);
      await theirs.specifier.delete(`/api/projects/${other.id}/products/${made.id}`).expect(404);
      await theirs.specifier.put(`/api/projects/${other.id}/products/${made.id}/evidence-file`).attach('file', pdf, 'x.pdf').expect(404);
      await theirs.specifier.get(`/api/projects/${other.id}/products/${made.id}/evidence-file`).expect(404);
    });

    it('are edited one at a time, and the trail tells evidence by its digest', async () => {
      const input = coating();
      const made = await make(team.specifier, at(), input);
      const evidence = { form: 'table' as const, tables: [inventedTable(60, 'beam')] };
      const edit = { ...input, evidence, evidenceEdition: '2', version: 1 };
      const changed = await team.specifier.put(at(`/${made.id}`)).send(edit).expect(200);
      expect(changed.body).toMatchObject({ version: 2, evidenceEdition: '2', evidence });
      const stale = await team.specifier.put(at(`/${made.id}`)).send({ ...edit, note: 'mine' }).expect(409);
      expect(stale.body).toMatchObject({ code: 'shared.stale', current: { version: 2, note: '' } });
      const same = await team.specifier.put(at(`/${made.id}`)).send({ ...edit, version: 2 }).expect(200);
      expect(same.body.version).toBe(2);
      const trail = await team.specifier.get(`/api/projects/${project.id}/audit`).query({ entityId: made.id }).expect(200);
      expect(trail.body.items[0].changes).toEqual([
        { field: 'evidenceEdition', old: '1', new: '2' },
        { field: 'evidence', old: expect.stringMatching(/^6 thickness tables \(SHA-256 /), new: expect.stringMatching(/^1 thickness table \(SHA-256 /) },
      ]);
      const twice = await team.specifier.post(at()).send({ ...input, evidenceEdition: '2' }).expect(409);
      expect(twice.body.message).toBe(`There already is a product "${input.name}, 2".`);
    });

    it('that have expired say so', async () => {
      const made = await make(team.specifier, at(), coating({ evidenceExpiresOn: '2020-02-29' }));
      expect(made).toMatchObject({ expired: true, evidenceExpiresOn: '2020-02-29' });
    });

    it('are deleted only when no zone uses them', async () => {
      const made = await make(team.specifier, at(), coating());
      const zone = await build.zone(app, await build.level(app, project, 'D0'), 'D0');
      await app.dataSource.manager.insert(ZoneSystem, [{ zoneId: zone.id, memberType: 'beam', productId: made.id }, { zoneId: zone.id, memberType: 'column', productId: made.id }]);
      const refused = await team.specifier.delete(at(`/${made.id}`)).expect(409);
      expect(refused.body.message).toBe('This product is used by 1 zone; change that first.');
      const listed = (await team.specifier.get(at()).expect(200)).body as ProductSummaryDto[];
      expect(listed.find((product) => product.id === made.id)?.usedByZones).toBe(1);
      await app.dataSource.manager.delete(ZoneSystem, { zoneId: zone.id });
      await team.specifier.delete(at(`/${made.id}`)).expect(204);
      await team.specifier.get(at(`/${made.id}`)).expect(404);
    });
  });

  describe('evidence', () => {
    it('that cannot be right is refused with every fault in words', async () => {
      const table = inventedTable(60, 'beam');
      const falls = table.thickness.map((row, r) => (r === 2 ? row.map(() => 1) : row));
      const wrong = await team.specifier.post(at()).send(coating({ evidence: { form: 'table', tables: [{ ...table, thickness: falls }] } })).expect(422);
      expect(wrong.body.code).toBe('product.falls-with-section-factor');
      expect((wrong.body.issues as { path: string; message: string }[])).toHaveLength(4);
      expect(wrong.body.issues[0]).toEqual({ path: 'evidence', message: wrong.body.message });
      expect(wrong.body.message).toMatch(/^Table R 60, open.*, beam, 350 °C: thickness falls from \d+ at A\/V 120 to 1 at A\/V 180/);
      const shape = await team.specifier.post(at()).send(coating({ evidence: { form: 'table', tables: [{ ...table, temperaturesC: [350, 450] }] } })).expect(422);
      expect(shape.body.message).toMatch(/^Table R 60, open.*, beam: row 1 \(A\/V 60\) has 4 values for 2 temperatures/);
      const kept = await make(team.specifier, at(), coating());
      const edit = await team.specifier.put(at(`/${kept.id}`)).send({ ...coating(), evidence: { form: 'table', tables: [table, table] }, version: 1 }).expect(422);
      expect(edit.body.code).toBe('product.table-twice');
      expect((await team.specifier.get(at(`/${kept.id}`))).body).toEqual(kept);
    });

    it('is refused where its fields are wrong', async () => {
      const bad = async (more: object): Promise<string[]> =>
        ((await team.specifier.post(at()).send({ ...coating(), ...more }).expect(400)).body.issues as { path: string }[]).map((issue) => issue.path);
      expect(await bad({ evidenceExpiresOn: '2026-02-30' })).toEqual(['evidenceExpiresOn']);
      expect(await bad({ evidenceExpiresOn: '0000-01-01' })).toEqual(['evidenceExpiresOn']);
      expect(await bad({ evidenceExpiresOn: 'soon' })).toContain('evidenceExpiresOn');
      expect(await bad({ curves: [] })).toEqual(['curves']);
      expect(await bad({ evidence: { form: 'guess' } })).toEqual(['evidence.form']);
      expect(await bad({ kind: 'paint' })).toEqual(['kind']);
    });

    it('that changes assesses anew the members of every project that uses it, and each trail tells', async () => {
      const shared = await make(administrator, '/api/products', coating());
      const uses = await Promise.all([0, 1].map(async () => {
        const own = await app.makeProject();
        const zone = await build.zone(app, await build.level(app, own, '00'), 'Z1');
        const beam = await build.beam(app, zone, await build.section(app, own), 'B1');
        await app.dataSource.manager.insert(ZoneSystem, { zoneId: zone.id, memberType: 'beam', productId: shared.id });
        return { own, beam };
      }));
      const tables = [{ ...inventedTable(60, 'beam'), thickness: inventedTable(60, 'beam').thickness.map((row) => row.map(() => 777)) }];
      const { id: _id, projectId: _p, version, expired: _e, evidenceFile: _f, ...input } = shared;
      await administrator.put(`/api/products/${shared.id}`).send({ ...input, evidence: { form: 'table', tables }, version }).expect(200);
      for (const { own, beam } of uses) {
        expect(await app.dataSource.manager.findOneByOrFail(MemberResult, { memberId: beam.id })).toMatchObject({ verdict: 'protected', requiredThickness: 777, thicknessUnit: 'µm' });
        const trail = await (await app.team(own)).specifier.get(`/api/projects/${own.id}/audit`).expect(200);
        expect(trail.body.items[0]).toMatchObject({ action: 'shared product changed', userName: 'Admin', label: `${shared.name}, 1` });
      }
    });
  });

  describe('the evidence file', () => {
    it('is kept as it came, with its digest, and given back', async () => {
      const made = await make(team.specifier, at(), coating());
      const none = await team.specifier.get(at(`/${made.id}/evidence-file`)).expect(404);
      expect(none.body.code).toBe('product.no-evidence-file');
      const stored = await team.specifier.put(at(`/${made.id}/evidence-file`)).attach('file', pdf, 'Prüfbericht "1".pdf').expect(200);
      const digest = createHash('sha256').update(pdf).digest('hex');
      // the version stays, so that nobody's open form goes stale
      expect(stored.body).toMatchObject({ version: 1, evidenceFile: { bytes: pdf.length, sha256: digest } });
      expect(stored.body.evidenceFile.name).toContain('Prüfbericht');
      const back = await team['fire-engineer'].get(at(`/${made.id}/evidence-file`)).buffer(true).parse((response, done) => {
        const chunks: Buffer[] = [];
        response.on('data', (chunk: Buffer) => chunks.push(chunk));
        response.on('end', () => done(null, Buffer.concat(chunks)));
      }).expect(200);
      expect(createHash('sha256').update(back.body as Buffer).digest('hex')).toBe(digest);
      expect(back.headers['content-type']).toBe('application/pdf');
      expect(back.headers['content-disposition']).toMatch(/^attachment; filename="Pr_fbericht .*filename\*=UTF-8''Pr%C3%BCfbericht/);
      expect(await app.dataSource.manager.findOneOrFail(Product, { where: { id: made.id } })).not.toHaveProperty('evidenceFile');
      await team.contractor.get(at(`/${made.id}/evidence-file`)).expect(403);
    });

    it.each<[string, Buffer, RegExp]>([
      ['nothing', Buffer.alloc(0), /is empty/],
      ['a picture that calls itself a PDF', Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]), /is a picture\. Evidence is kept as PDF, CSV or XLSX/],
      ['a damaged archive', Buffer.from('PK\u0003\u0004 and then rubbish'), /could not be read/],
      ['binary data', Buffer.from([0, 1, 2, 3, 0, 0, 7, 8, 0, 1, 2, 3]), /is a binary file/],
    ])('is refused where it is %s', async (_, content, sentence) => {
      const made = await make(team.specifier, at(), coating());
      const refused = await team.specifier.put(at(`/${made.id}/evidence-file`)).attach('file', content, 'report.pdf').expect(422);
      expect(refused.body.message).toMatch(sentence);
      expect((await team.specifier.get(at(`/${made.id}`))).body.evidenceFile).toBeNull();
    });

    it('is refused where none came, or where it is beyond 10 MB', async () => {
      const made = await make(team.specifier, at(), coating());
      const none = await team.specifier.put(at(`/${made.id}/evidence-file`)).field('other', 'x').expect(422);
      expect(none.body.code).toBe('product.no-file');
      const large = await team.specifier.put(at(`/${made.id}/evidence-file`)).attach('file', Buffer.concat([pdf, Buffer.alloc(10 * 1024 * 1024)]), 'large.pdf').expect(413);
      expect(large.body.message).toBe('The file is larger than is accepted here. Nothing was changed; send less at once.');
      await team.specifier.put(at(`/${made.id}/evidence-file`)).attach('another', pdf, 'x.pdf').expect(400);
    });
  });

  describe('reading a table', () => {
    const read = (content: Buffer | string, fields: Record<string, string> = {}, name = 'table.csv'): ReturnType<Agent['post']> => {
      const request = team.specifier.post(at('/read-table')).attach('file', Buffer.from(content as string), name);
      for (const [key, value] of Object.entries({ shape: 'open', orientation: 'beam', periodMin: '60', ...fields })) void request.field(key, value);
      return request;
    };

    it('takes a CSV with units, decimal commas and dashes', async () => {
      const { body } = await read('A/V;350 °C;550 °C;\n60;1,25;0,8\n120;2,5;-\n\nNote: invented;;\n', { fileUnit: 'mm' }).expect(200);
      const { table, messages } = body as ReadTableDto;
      expect(table).toEqual({
        shape: 'open', orientation: 'beam', periodMin: 60, temperaturesC: [350, 550], sectionFactorsPerM: [60, 120], thickness: [[1250, 800], [2500, null]],
      });
      expect(messages).toEqual([{ code: 'product.table-row-left-out', params: { row: 5, text: 'Note: invented' } }]);
    });

    it('takes an XLSX, and makes a product that can be saved', async () => {
      const workbook = new ExcelJS.Workbook();
      const sheet = workbook.addWorksheet('R 60');
      sheet.addRows([['', 400, 500, 600], [100, 900, 700, 500], [200, 1400, 1100, { formula: 'B3*0.6', result: 840 }]]);
      const { body } = await read(Buffer.from(await workbook.xlsx.writeBuffer()), { orientation: 'column' }, 'table.xlsx').expect(200);
      expect(body).toMatchObject({ table: { orientation: 'column', temperaturesC: [400, 500, 600], thickness: [[900, 700, 500], [1400, 1100, 840]] }, messages: [] });
      await make(team.specifier, at(), coating({ evidence: { form: 'table', tables: [(body as ReadTableDto).table] } }));
    });

    it('says what keeps a table from being used, and still shows it', async () => {
      const { body } = await read('x,350,550\n60,500,600\n120,400,300\n').expect(200);
      expect((body as ReadTableDto).messages.map((m) => m.code)).toEqual(expect.arrayContaining(['product.rises-with-temperature', 'product.falls-with-section-factor']));
    });

    it('names every cell that cannot be read', async () => {
      const { body } = await read('x,350,55\n60,thick,600\nmany,-4,300\n').expect(422);
      expect((body.issues as { path: string }[]).map((issue) => issue.path).sort()).toEqual(['A3', 'B2', 'B3', 'C1']);
      expect(body.message).toBe('Cell C1: "55" is not a temperature between 100 and 1200 °C.');
    });

    it.each<[string, string, string]>([
      ['words alone', 'nothing here\nat all\n', 'product.table-no-temperatures'],
      ['no rows', 'A/V,350,450\n', 'product.table-no-rows'],
      ['nothing', '', 'import.empty-file'],
      ['a PDF', pdf.toString(), 'import.not-a-schedule'],
    ])('refuses %s in words', async (_, content, code) => {
      expect((await read(content).expect(422)).body.code).toBe(code);
    });

    it('is for the specifier of a project and, for the library, the administrator', async () => {
      const send = (agent: Agent, path: string): ReturnType<Agent['post']> =>
        agent.post(path).attach('file', Buffer.from('x,350\n60,500\n'), 't.csv').field('shape', 'open').field('orientation', 'beam').field('periodMin', '30');
      await send(team['fire-engineer'], at('/read-table')).expect(403);
      await send(team.specifier, '/api/products/read-table').expect(403);
      await send(administrator, '/api/products/read-table').expect(200);
      expect((await read('x,350\n60,500\n', { periodMin: '50' }).expect(400)).body.issues[0].path).toBe('periodMin');
    });
  });
});
