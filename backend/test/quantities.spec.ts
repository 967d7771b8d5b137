import { Decimal, splitKeys } from '@mantlet/common';
import type { QuantitiesDto, QuantityTotals } from '@mantlet/common';
import ExcelJS from 'exceljs';
import { plainText } from '../src/features/quantities/quantity-table.js';
import { ProjectInputsService } from '../src/features/assessment/project-inputs.service.js';
import { QuantitiesService } from '../src/features/quantities/quantities.service.js';
import { Zone } from '../src/features/zones/zone.entity.js';
import { TestApp } from './support/app.js';
import { makeScheduleProject } from './support/schedule-project.js';
import type { ScheduleProject } from './support/schedule-project.js';

describe('quantities', () => {
  let app: TestApp;
  let p: ScheduleProject;
  beforeAll(async () => {
    app = await TestApp.start();
    p = await makeScheduleProject(app);
  });
  afterAll(() => app.stop());

  const get = async (query = ''): Promise<QuantitiesDto> => (await p.team.specifier.get(p.url(`quantities${query}`)).expect(200)).body;
  const binary = (response: NodeJS.ReadableStream, done: (error: Error | null, body: Buffer) => void): void => {
    const chunks: Buffer[] = [];
    response.on('data', (chunk: Buffer) => chunks.push(chunk));
    response.on('end', () => done(null, Buffer.concat(chunks)));
  };

  const pairs = splitKeys.flatMap((rows) => splitKeys.filter((c) => c !== rows).map((columns): [string, string] => [rows, columns]));
  it.each(pairs)('has the same total split by %s and %s', async (rows, columns) => {
    const { split, lines } = await get(`?rows=${rows}&columns=${columns}`);
    const sum = (of: { [K in 'netM2' | 'cost' | 'volumeM3']: string | null }[], key: 'netM2' | 'cost' | 'volumeM3'): string =>
      of.reduce((total, t) => total.plus(t[key] ?? 0), new Decimal(0)).toFixed(4);
    const totals = (parts: { totals: QuantityTotals }[]): QuantityTotals[] => parts.map((part) => part.totals);
    for (const key of ['netM2', 'cost', 'volumeM3'] as const) {
      const whole = new Decimal(split.total[key]!).toFixed(4);
      expect([sum(lines, key), sum(totals(split.rows), key), sum(totals(split.columns), key), sum(totals(split.cells), key)]).toEqual([whole, whole, whole, whole]);
    }
    expect(lines).toHaveLength(split.total.lines);
  });

  it('counts litres, wet film and coats as the trade does', async () => {
    const { lines, purchases, names } = await get();
    const line = lines.find((l) => names[l.productId] === 'Testcoat')!;
    // litres = area·DFT/(10·VS)/(1 − loss), with 70 % solids and 20 % loss (common practice)
    expect(Number(line.litres)).toBeCloseTo((Number(line.netM2) * line.thickness) / 700 / 0.8, 1);
    expect(Number(line.wetFilmUm)).toBeCloseTo(line.thickness / 0.7, 0);
    const coating = purchases.find((x) => x.kind === 'coating')!;
    expect(coating.containers).toBe(Math.ceil(Number(coating.litres) / 20));
    const board = purchases.find((x) => x.kind === 'board')!;
    for (const plan of board.boards) expect(plan.sheets).toBeGreaterThanOrEqual(plan.leastSheets);
  });

  it('counts areas as section tables give the surface per metre', async () => {
    const { lines, names } = await get();
    const hall = lines.filter((l) => names[l.zoneId] === 'Z01 Hall' && names[l.productId] === 'Testcoat');
    const gross = hall.reduce((sum, l) => sum + Number(l.grossM2), 0);
    // IPE 300: 1.16 m²/m less its top flange; HE 300 B: 1.73 m²/m less its top flange
    expect(gross).toBeCloseTo(4 * 6 * (1.16 - 0.15) + 2 * 7.2 * (1.73 - 0.3), 0);
  });

  it('rounds whole containers once for the project, or for each level that takes its own delivery', async () => {
    const project = await get();
    const level = await get('?delivery=level');
    const containers = (q: QuantitiesDto): number => q.purchases.reduce((sum, x) => sum + (x.containers ?? 0), 0);
    expect(containers(level)).toBeGreaterThanOrEqual(containers(project));
    expect(level.purchases.filter((x) => x.kind === 'coating').map((x) => x.levelId)).toHaveLength(2);
    expect(level.split.total.netM2).toBe(project.split.total.netM2);
  });

  it('says what each product covers and what to buy', async () => {
    const inputs = await app.app.get(ProjectInputsService, { strict: false }).load(app.dataSource.manager, p.project.id, null);
    const totals = await app.app.get(QuantitiesService, { strict: false }).totalsByProduct(inputs);
    expect(totals.map((t) => [t.productName, t.members])).toEqual(expect.arrayContaining([['Testcoat', 4], ['Testboard', 2], ['Testspray', 1]]));
    // litres are ordered in whole numbers, never fewer than are needed
    const needed = Number((await get()).purchases.find((purchase) => purchase.kind === 'coating')?.litres);
    expect(needed).toBeGreaterThan(0);
    expect(totals.find((t) => t.kind === 'coating')?.net).toBe(`${Math.ceil(needed)} L`);
    expect(totals.find((t) => t.kind === 'board')?.net).toMatch(/^\d+ sheets$/);
    expect(totals.find((t) => t.kind === 'spray')?.net).toMatch(/^[\d.]+ m³$/);
  });

  it('writes CSV and XLSX in which no text is taken for a formula and numbers are numbers', async () => {
    await app.dataSource.manager.update(Zone, p.zones.Z01.id, { code: '=Z01', name: 'HYPERLINK("x")' });
    const csv = (await p.team.specifier.get(p.url('quantities/lines.csv')).expect(200)).text;
    const [head, ...rows] = csv.trim().split('\r\n');
    expect(head).toContain('Net m²');
    expect(rows.every((row) => !/(^|,)"?=/.test(row))).toBe(true);
    expect(csv).toContain(`"'=Z01 HYPERLINK(""x"")"`);
    const answer = await p.team.specifier.get(p.url('quantities.xlsx?rows=zone&columns=product')).buffer(true).parse(binary as never).expect(200);
    const book = new ExcelJS.Workbook();
    await book.xlsx.load(answer.body);
    const lines = book.getWorksheet('Lines')!;
    const column = (lines.getRow(1).values as string[]).indexOf('Net m²');
    const { split } = await get();
    const nets = Array.from({ length: lines.rowCount - 1 }, (_, i) => lines.getRow(i + 2).getCell(column).value);
    expect(nets.every((value) => typeof value === 'number')).toBe(true);
    expect((nets as number[]).reduce((a, b) => a + b, 0)).toBeCloseTo(Number(split.total.netM2), 6);
    book.eachSheet((sheet) => sheet.eachRow((row) => row.eachCell((cell) => expect(cell.type).not.toBe(ExcelJS.ValueType.Formula))));
  });

  it.each(['=1+1', '+1', '-1', '@x', '\t=1', '\r=1'])('puts an apostrophe before %j', (text) => expect(plainText(text)).toBe(`'${text}`));

  it('refuses equal rows and columns in words, and whoever is not of the design team', async () => {
    const { body } = await p.team.specifier.get(p.url('quantities?rows=zone&columns=zone')).expect(400);
    expect(body.message).toMatch(/columns: must differ from the rows/);
    await p.team.contractor.get(p.url('quantities')).expect(403);
    await p.team.reader.get(p.url('quantities/lines.csv')).expect(403);
    await p.team.inspector.get(p.url('quantities.xlsx')).expect(403);
  });
});
