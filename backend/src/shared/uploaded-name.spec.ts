import { uploadedName } from './uploaded-name.js';

const named = (originalname: string): string => uploadedName({ originalname }, 'The file');

describe('names of uploaded files', () => {
  it.each([
    ['schedule.csv', 'schedule.csv'],
    // UTF-8 read as Latin-1, as the multipart reader does
    [Buffer.from('Träger–Liste.csv', 'utf8').toString('latin1'), 'Träger–Liste.csv'],
    // Latin-1 that is no UTF-8
    ['Tr\u00e4ger.csv', 'Träger.csv'],
    ['..\\..\\windows\\a.csv', 'a.csv'],
    ['/etc/passwd', 'passwd'],
    ['a\u0000\r\nb.csv', 'ab.csv'],
    ['folder/', 'The file'],
    ['', 'The file'],
  ])('%j is %s', (sent, shown) => expect(named(sent)).toBe(shown));

  it('keep their ending where they are long', () => {
    expect(named(`${'x'.repeat(300)}.csv`)).toMatch(/^x{146}\.csv$/);
  });
});
