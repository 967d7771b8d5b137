import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { sha256 } from '../src/shared/canonical-json.js';
import type { Agent } from './support/app.js';
import { TestApp } from './support/app.js';
import { addMembers, makeScheduleProject, recompute } from './support/schedule-project.js';
import type { MemberSpec, ScheduleProject } from './support/schedule-project.js';

/** poppler-utils and qpdf read the file as others would. */
const run = (program: string, ...args: string[]): string => execFileSync(program, args, { encoding: 'utf8' });

jest.setTimeout(60_000);
describe('the schedule as PDF', () => {
  let app: TestApp;
  let p: ScheduleProject;
  let folder: string;
  let id: string;
  beforeAll(async () => {
    folder = mkdtempSync(path.join(tmpdir(), 'schedule-pdf-'));
    app = await TestApp.start();
    p = await makeScheduleProject(app);
    const many = Array.from({ length: 60 }, (_, i): MemberSpec => ({
      mark: `B0-${String(i + 100)}`, zone: 'Z01', type: 'beam', section: i % 2 ? 'IPE 300' : 'HE 300 B', basis: { way: 'declared', temperatureC: 550 + (i % 5) * 20, reference: 'Calculation T-13, invented' },
    }));
    await addMembers(app, p.project, p.zones, many);
    await recompute(app, p.project.id);
    id = (await p.team.specifier.post(p.url('revisions')).send({ code: 'P01', purpose: 'For construction' }).expect(201)).body.id;
  });
  afterAll(async () => {
    rmSync(folder, { recursive: true, force: true });
    await app.stop();
  });

  const fetchPdf = async (by: Agent, query = ''): Promise<{ file: string; text: string; headers: Record<string, string>; content: Buffer }> => {
    const answer = await by.get(p.url(`revisions/${id}/pdf${query}`)).buffer(true).parse(((response: NodeJS.ReadableStream, done: (e: null, b: Buffer) => void) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => chunks.push(chunk)).on('end', () => done(null, Buffer.concat(chunks)));
    }) as never).expect(200);
    const file = path.join(folder, `${sha256(answer.body).slice(0, 8)}.pdf`);
    writeFileSync(file, answer.body);
    return { file, text: run('pdftotext', '-layout', file, '-'), headers: answer.headers as Record<string, string>, content: answer.body };
  };

  it('is a marked preview for the design team while in draft', async () => {
    const { text } = await fetchPdf(p.team['fire-engineer']);
    expect(text).toContain('It is not issued: do not build from it.');
    const pages = text.split('\f').filter((page) => page.trim());
    for (const page of pages) expect(page).toMatch(/Revision P01\s+·\s+Draft, not issued/);
    await p.team.contractor.get(p.url(`revisions/${id}/pdf`)).expect(404);
  });

  describe('issued', () => {
    let pdf: Awaited<ReturnType<typeof fetchPdf>>;
    beforeAll(async () => {
      await p.team.specifier.post(p.url(`revisions/${id}/prepare`)).expect(200);
      await p.checker.post(p.url(`revisions/${id}/check`)).expect(200);
      await p.checker.post(p.url(`revisions/${id}/issue`)).expect(200);
      pdf = await fetchPdf(p.team.contractor, '?download=1');
    });

    it('is a sound file with every font embedded, on A4', () => {
      expect(run('qpdf', '--check', pdf.file)).toMatch(/No syntax or stream encoding errors found/);
      const fonts = run('pdffonts', pdf.file).trim().split('\n').slice(2);
      expect(fonts.length).toBeGreaterThanOrEqual(2);
      for (const font of fonts) expect(font).toMatch(/IBMPlexSans.*\byes yes\b/);
      expect(run('pdfinfo', pdf.file)).toMatch(/841\.89 x 595\.28 pts \(A4\)/);
    });

    it('comes with its digest and a file name', () => {
      expect(pdf.headers['etag']).toBe(`"${sha256(pdf.content)}"`);
      expect(pdf.headers['x-content-sha256']).toBe(sha256(pdf.content));
      expect(pdf.headers['content-disposition']).toMatch(/^attachment; filename="T-\d+-protection-schedule-P01\.pdf"$/);
      expect(pdf.headers['content-type']).toBe('application/pdf');
    });

    it('is rendered once: asked for again it is the same to the byte', async () => {
      expect((await fetchPdf(p.team.reader)).content.equals(pdf.content)).toBe(true);
    });

    it.each([
      ['its title block', /Fire protection schedule of structural steel[\s\S]*T-\d+[\s\S]*P01[\s\S]*Issued[\s\S]*For construction/],
      ['who signed', /Prepared\s+The specifier\s+\d{4}-\d\d-\d\d[\s\S]*Checked\s+Checking specifier[\s\S]*Issued\s+Checking specifier/],
      ['the answer', /68 members: 67 to be protected over [\d,.]+ m², 1 may stay bare\./],
      ['the basis of design', /Basis of design[\s\S]*EN 1993-1-2:2005[\s\S]*Second signature above\s+650 °C/],
      ['zones with periods', /Z01 Hall\s+R 60\s+Standard fire/],
      ['targets', /Z02 Offices\s+Testcoat\s+R 30/],
      ['evidence, and that it is invented', /Testcoat \(invented for demonstration\)[\s\S]*Report Testcoat-1[\s\S]*2099-12-31/],
      ['a member with A/V, temperature and thickness', /B0-001\s+Beam[\s\S]{0,400}188\s+584 °C/],
      ['provenance', /From utilisation in/],
      ['a verdict as a sentence', /Needs \d\.\d+ mm of/],
      ['bare members', /May stay bare/],
      ['quantities by floor', /Quantities by floor[\s\S]*L0 Ground\s+Testboard[\s\S]*Total/],
      ['what to apply where', /Z01 Hall\s+Testcoat\s+Beam\s+on site\s+DFT \d+ µm\s+\d+ µm\s+\d/],
      ['what to buy', /To buy, rounded up once[\s\S]*\d+ × 20 L/],
      ['cautions', /do not replace it[\s\S]*authority having jurisdiction govern[\s\S]*fire strategy[\s\S]*certifies a product/],
    ])('says %s', (_, pattern) => expect(pdf.text).toMatch(pattern));

    it('numbers its pages, repeats table heads and the running title', () => {
      const pages = pdf.text.split('\f').filter((page) => page.trim());
      expect(pages.length).toBeGreaterThan(4);
      pages.forEach((page, i) => {
        expect(page).toContain(`page ${i + 1} of ${pages.length}`);
        expect(page).toMatch(/Fire protection schedule\s+Revision P01\s+·\s+Issued/);
      });
      const schedulePages = pages.filter((page) => /B0-1\d\d/.test(page) && /Needs/.test(page));
      expect(schedulePages.length).toBeGreaterThan(1);
      for (const page of schedulePages) expect(page).toMatch(/Mark\s+Type\s+Section, grade/);
    });

    it('holds no sign that the font lacks', () => {
      expect(pdf.text).not.toMatch(/[\uFFFD\u2300\u207B]/);
    });
  });
});
