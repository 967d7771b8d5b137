import { inflateSync } from 'node:zlib';

const WOFF_SIGNATURE = 0x774f4646;
const WOFF_HEADER = 44;
const WOFF_ENTRY = 20;
const SFNT_HEADER = 12;
const SFNT_ENTRY = 16;

/**
 * Unpacks a WOFF font to the plain font file within it, with the zlib of Node instead of one in JavaScript: rendering is several times
 * faster. Source: W3C, WOFF File Format 1.0, sections 3 to 5. Metadata and private data are left out.
 * @throws RangeError for anything that is no WOFF 1.0 file
 */
export function sfntOfWoff(woff: Buffer): Buffer {
  if (woff.length < WOFF_HEADER || woff.readUInt32BE(0) !== WOFF_SIGNATURE) throw new RangeError('This is not a WOFF 1.0 font.');
  const tables = woff.readUInt16BE(12);
  const sfnt = Buffer.alloc(woff.readUInt32BE(16));
  woff.copy(sfnt, 0, 4, 8);
  const power = Math.floor(Math.log2(tables));
  sfnt.writeUInt16BE(tables, 4);
  sfnt.writeUInt16BE(2 ** power * 16, 6);
  sfnt.writeUInt16BE(power, 8);
  sfnt.writeUInt16BE(tables * 16 - 2 ** power * 16, 10);
  let offset = SFNT_HEADER + tables * SFNT_ENTRY;
  for (let i = 0; i < tables; i += 1) {
    const from = WOFF_HEADER + i * WOFF_ENTRY;
    const [start, packed, length] = [woff.readUInt32BE(from + 4), woff.readUInt32BE(from + 8), woff.readUInt32BE(from + 12)];
    const stored = woff.subarray(start, start + packed);
    const table = packed < length ? inflateSync(stored) : stored;
    if (table.length !== length || offset + length > sfnt.length) throw new RangeError('The WOFF font is damaged.');
    const entry = SFNT_HEADER + i * SFNT_ENTRY;
    woff.copy(sfnt, entry, from, from + 4);
    sfnt.writeUInt32BE(woff.readUInt32BE(from + 16), entry + 4);
    sfnt.writeUInt32BE(offset, entry + 8);
    sfnt.writeUInt32BE(length, entry + 12);
    table.copy(sfnt, offset);
    // tables begin on four-byte boundaries
    offset += (length + 3) & ~3;
  }
  return sfnt;
}
