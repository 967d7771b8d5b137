import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import path from 'node:path';
import { sfntOfWoff } from './woff.js';

const folder = path.join(path.dirname(createRequire(__filename).resolve('@ibm/plex-sans/package.json')), 'fonts/complete/woff');

describe('unpacking a WOFF font', () => {
  const woff = readFileSync(path.join(folder, 'IBMPlexSans-Regular.woff'));

  it('gives a font whose tables have the checksums that its directory states (OpenType, table directory)', () => {
    const sfnt = sfntOfWoff(woff);
    const tables = sfnt.readUInt16BE(4);
    expect(tables).toBeGreaterThan(8);
    for (let i = 0; i < tables; i += 1) {
      const entry = 12 + i * 16;
      const [tag, stated, offset, length] = [sfnt.toString('latin1', entry, entry + 4), sfnt.readUInt32BE(entry + 4), sfnt.readUInt32BE(entry + 8), sfnt.readUInt32BE(entry + 12)];
      const table = Buffer.alloc((length + 3) & ~3);
      sfnt.copy(table, 0, offset, offset + length);
      // the checksum of head is taken with its own adjustment left out
      if (tag === 'head') table.writeUInt32BE(0, 8);
      let sum = 0;
      for (let at = 0; at < table.length; at += 4) sum = (sum + table.readUInt32BE(at)) >>> 0;
      expect([tag, sum]).toEqual([tag, stated]);
    }
  });

  it('refuses what is no WOFF', () => {
    expect(() => sfntOfWoff(Buffer.from('%PDF-1.7'))).toThrow(RangeError);
    const cut = Buffer.from(woff);
    cut.writeUInt32BE(100, 16);
    expect(() => sfntOfWoff(cut)).toThrow(RangeError);
  });
});
