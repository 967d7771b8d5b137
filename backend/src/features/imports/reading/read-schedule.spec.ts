import { readFile } from 'node:fs/promises';
import path from 'node:path';
import ExcelJS from 'exceljs';
import fc from 'fast-check';
import { makeZip } from '../../../../test/files/zip.js';
import { Refusal } from '../../../shared/refusal.js';
import { readSchedule } from './read-schedule.js';

const files = path.resolve(__dirname, '../../../../test/files');
const sheetsOf = async (content: Buffer | string): Promise<{ name: string; rows: string[][] }[]> => (await readSchedule('schedule.csv', Buffer.from(content))).sheets;
const rowsOf = async (content: Buffer | string): Promise<string[][]> => (await sheetsOf(content))[0]!.rows;
/** the sentence of a refusal; anything else that is thrown fails the test */
const refusal = async (content: Buffer | string, name = 'schedule.xlsx'): Promise<string> => {
  try {
    await readSchedule(name, Buffer.from(content));
  } catch (error) {
    if (!(error instanceof Refusal)) throw error;
    return (error.getResponse() as { message: string }).message;
  }
  throw new Error('was read');
};
const workbook = async (fill: (book: ExcelJS.Workbook) => void): Promise<Buffer> => {
  const book = new ExcelJS.Workbook();
  fill(book);
  return Buffer.from(await book.xlsx.writeBuffer());
};

describe('schedules as CSV', () => {
  it.each([[','], [';'], ['\t'], ['|']])('find the separator %j', async (separator) => {
    const text = [['Mark', 'Section', 'Length'], ['B1', 'IPE 300', '6'], ['B2', 'IPE 300', '7']].map((r) => r.join(separator)).join('\r\n');
    expect(await rowsOf(text)).toEqual([['Mark', 'Section', 'Length'], ['B1', 'IPE 300', '6'], ['B2', 'IPE 300', '7']]);
  });

  it('find it although decimal commas or texts hold another', async () => {
    expect(await rowsOf('Mark;Length;Note\nB1;6,5;a, b, c\nB2;7,5;d')).toEqual([['Mark', 'Length', 'Note'], ['B1', '6,5', 'a, b, c'], ['B2', '7,5', 'd']]);
    expect(await rowsOf('sep=;\nMark;Length\nB1;6,5')).toEqual([['sep='], ['Mark', 'Length'], ['B1', '6,5']]);
  });

  it('keep rows by their number, quoted line breaks and quotes included', async () => {
    expect(await rowsOf('Title\n\nMark,Note\n"B ""1""","two\nlines"\n')).toEqual([['Title'], [], ['Mark', 'Note'], ['B "1"', 'two lines']]);
    expect(await rowsOf('Mark,Length\nB1,12\'-6"\nB2,3\'-0"')).toEqual([['Mark', 'Length'], ['B1', '12\'-6"'], ['B2', '3\'-0"']]);
  });

  it('are read in UTF-8, UTF-16 and Windows-1252, the last with a note to check', async () => {
    const text = 'Länge;Stück\n6,5;3\n';
    const expected = [['Länge', 'Stück'], ['6,5', '3']];
    expect(await rowsOf(text)).toEqual(expected);
    expect(await rowsOf(`\ufeff${text}`)).toEqual(expected);
    expect(await rowsOf(Buffer.from(`\ufeff${text}`, 'utf16le'))).toEqual(expected);
    expect(await rowsOf(Buffer.from(text, 'utf16le'))).toEqual(expected);
    expect(await rowsOf(Buffer.from(`\ufeff${text}`, 'utf16le').swap16())).toEqual(expected);
    const western = await readSchedule('s.csv', Buffer.from(text, 'latin1'));
    expect(western.sheets[0]!.rows).toEqual(expected);
    expect(western.notes).toEqual(['The file is not UTF-8 and was read as Windows-1252. Check letters with accents.']);
  });

  it('say where a quotation mark is open', async () => {
    expect(await refusal('Mark,Note\nB1,"open\nB2,x', 'a.csv')).toMatch(/^a\.csv, line \d+: a quotation mark is opened and not closed/);
  });
});

describe('files that are no schedule', () => {
  it.each<[string, Buffer | string, RegExp]>([
    ['nothing', '', /^schedule\.xlsx is empty\.$/],
    ['blank lines', '\n\n , ,\n', /holds no rows\. Nothing to import/],
    ['PDF', '%PDF-1.7\n...', /is a PDF, not a CSV or XLSX file\. Save the schedule as CSV or XLSX/],
    ['XLS', Buffer.from('d0cf11e0a1b11ae1000000', 'hex'), /an old XLS workbook or one with a password/],
    ['PNG', Buffer.from('89504e470d0a1a0a', 'hex'), /a picture/],
    ['HTML', '<html><table><tr><td>Mark', /an XML or HTML page/],
    ['IFC', 'ISO-10303-21;\nHEADER;', /a building model/],
    ['zero bytes', Buffer.from('Mark,Length\0\0\0B1,6'), /a binary file/],
    ['noise', Buffer.from(Array.from({ length: 300 }, (_, i) => (i * 7) % 32)), /a binary file/],
    ['ZIP', makeZip([{ name: 'letter.txt', content: 'x' }]), /a ZIP archive/],
    ['empty ZIP', makeZip([]), /a ZIP archive/],
    ['text document', makeZip([{ name: 'word/document.xml', content: '<w/>' }]), /a text document/],
    ['XLSB', makeZip([{ name: 'xl/workbook.bin', content: 'x' }]), /XLSB/],
    ['broken ZIP', makeZip([{ name: 'xl/workbook.xml', content: '<workbook/>' }]).subarray(0, 60), /damaged or protected/],
    ['XLSX without parts', makeZip([{ name: 'xl/workbook.xml', content: 'no xml <' }]), /damaged or protected|holds no rows/],
  ])('%s is refused in words', async (_name, content, expected) => {
    expect(await refusal(content)).toMatch(expected);
  });

  it('that unpack to more than a schedule holds are not opened', async () => {
    const zeros = Buffer.alloc(101 * 1024 * 1024);
    const bomb = makeZip([{ name: 'xl/workbook.xml', content: zeros }]);
    expect(bomb.length).toBeLessThan(200_000);
    expect(await refusal(bomb)).toMatch(/^schedule\.xlsx unpacks to more than 100 MB or holds far more than a schedule does, and was not opened\.$/);
    // one that lies about its size is found out while unpacking
    expect(await refusal(makeZip([{ name: 'xl/workbook.xml', content: zeros.subarray(0, 30 * 1024 * 1024), claimedBytes: 100 }]))).toMatch(/damaged|not opened/);
    expect(await refusal(makeZip(Array.from({ length: 2001 }, (_, i) => ({ name: `f${i}`, content: '' }))))).toMatch(/not opened/);
  });

  it('that show one long text in thousands of cells are not taken in', async () => {
    const long = 'x'.repeat(2000);
    const content = await workbook((book) => {
      const sheet = book.addWorksheet('One');
      for (let i = 0; i < 110; i += 1) sheet.addRow(Array.from({ length: 100 }, () => long));
    });
    expect(content.length).toBeLessThan(200_000);
    expect(await refusal(content)).toBe('schedule.xlsx holds more than 20000000 characters of text. Split the schedule.');
  });

  it('never end in anything but sheets or a sentence, whatever their bytes', async () => {
    const bytes = fc.oneof(fc.uint8Array({ maxLength: 300 }).map((b) => Buffer.from(b)), fc.string({ unit: 'binary', maxLength: 300 }).map((s) => Buffer.from(s)),
      fc.array(fc.array(fc.string({ maxLength: 8 }), { maxLength: 6 }), { maxLength: 8 }).map((rows) => Buffer.from(rows.map((r) => r.join(',')).join('\n'))));
    await fc.assert(fc.asyncProperty(bytes, async (content) => {
      try {
        const { sheets } = await readSchedule('any', content);
        return sheets.every((sheet) => sheet.rows.flat().every((cell) => !/[\p{Cc}\p{Surrogate}]/u.test(cell)));
      } catch (error) {
        return error instanceof Refusal && error.getStatus() === 422;
      }
    }), { numRuns: 300 });
  });

  it('nor do workbooks with bytes turned over', async () => {
    const whole = await readFile(path.join(files, 'hand-written.xlsx'));
    await fc.assert(fc.asyncProperty(fc.nat({ max: whole.length - 1 }), fc.nat({ max: 255 }), async (at, byte) => {
      const broken = Buffer.from(whole);
      broken[at] = byte;
      try {
        await readSchedule('any', broken);
        return true;
      } catch (error) {
        return error instanceof Refusal && error.getStatus() === 422;
      }
    }), { numRuns: 60 });
  });
});

describe('schedules as XLSX', () => {
  it('written by hand, with every kind of cell, are read by the sheet that is seen', async () => {
    const sheets = await sheetsOf(await readFile(path.join(files, 'hand-written.xlsx')));
    expect(sheets).toEqual([{
      name: 'Steel & levels',
      rows: [
        ['Steel schedule – invented'], [],
        ['Mark', 'Type', 'Section', 'Grade', 'Length (m)', 'No. off', 'Exposure', 'Remarks'],
        // 6.125 keeps a fourth decimal, so that it cannot be taken for 6125; 46357 is 1 December 2026
        ['B1', 'beam', 'IPE 300', 'S355', '6.1250', '2', 'three sides', '2026-12-01'],
        ['B2', 'beam', 'IPE 300', 'S355', '12.25', '1', '3'],
        ['B3', 'beam', 'IPE 300', 'S355', '#REF!', '1', '3'],
        ['Total', '', '', '', '18.3750'],
      ],
    }]);
  });

  it('hold formulas by their results, links by their words, and numbers without the noise of binary sums', async () => {
    const content = await workbook((book) => {
      book.addWorksheet('A').addRows([['Mark', 'x'], [{ text: 'B1', hyperlink: 'https://example.test' }, 0.1 + 0.2], [{ formula: '1+1', result: 2 }, true], [{ formula: '1/0', result: { error: '#DIV/0!' } }, { richText: [{ text: 'a' }, { text: 'b' }] }]]);
    });
    expect(await rowsOf(content)).toEqual([['Mark', 'x'], ['B1', '0.3'], ['2', 'TRUE'], ['#DIV/0!', 'ab']]);
  });

  it('without content are refused, and sheets without content passed over', async () => {
    expect(await refusal(await workbook((book) => book.addWorksheet('Empty')))).toBe('schedule.xlsx holds no rows. Nothing to import.');
    const two = await workbook((book) => { book.addWorksheet('Empty'); book.addWorksheet('Full').addRow(['Mark']); });
    expect((await sheetsOf(two)).map((s) => s.name)).toEqual(['Full']);
  });

  it('with content in a row far down are refused, saying where', async () => {
    const far = await workbook((book) => { const sheet = book.addWorksheet('S'); sheet.getCell('A1').value = 'Mark'; sheet.getCell('B90000').value = 'x'; });
    expect(await refusal(far)).toBe('schedule.xlsx, sheet "S": content in row 90000; at most 50000 rows are read. Split the schedule.');
  });
});
