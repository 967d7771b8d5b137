import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { formulasMarkdown, validationMarkdown } from './print-docs.js';

const docs = join(__dirname, '../../../../docs');

describe('generated documents', () => {
  it.each([['formulas.md', formulasMarkdown], ['validation.md', validationMarkdown]] as const)('docs/%s is what the code prints (else run node backend/scripts/docs.mjs)', (file, print) => {
    expect(readFileSync(join(docs, file), 'utf8')).toBe(print());
  });
  it('leaves nothing undefined', () => {
    for (const text of [formulasMarkdown(), validationMarkdown()]) expect(text).not.toMatch(/undefined|NaN|\[object/);
  });
});
