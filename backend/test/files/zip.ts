import { crc32, deflateRawSync } from 'node:zlib';

export interface ZipPart {
  name: string;
  content: Buffer | string;
  /** states another size than the content has, as a hostile archive would */
  claimedBytes?: number;
}

/** A ZIP archive after the published layout (APPNOTE 4.3): local headers, central directory, end record. */
export function makeZip(parts: readonly ZipPart[]): Buffer {
  const locals: Buffer[] = [];
  const directory: Buffer[] = [];
  let offset = 0;
  for (const part of parts) {
    const content = Buffer.from(part.content);
    const packed = deflateRawSync(content);
    const name = Buffer.from(part.name);
    const common = Buffer.alloc(26);
    common.writeUInt16LE(20, 0);
    common.writeUInt16LE(8, 4);
    common.writeUInt32LE(crc32(content), 10);
    common.writeUInt32LE(packed.length, 14);
    common.writeUInt32LE(part.claimedBytes ?? content.length, 18);
    common.writeUInt16LE(name.length, 22);
    const local = Buffer.concat([Buffer.from('504b0304', 'hex'), common, name, packed]);
    const entry = Buffer.alloc(14);
    entry.writeUInt32LE(offset, 10);
    directory.push(Buffer.concat([Buffer.from('504b01021400', 'hex'), common, entry, name]));
    locals.push(local);
    offset += local.length;
  }
  const central = Buffer.concat(directory);
  const end = Buffer.alloc(18);
  end.writeUInt16LE(parts.length, 4);
  end.writeUInt16LE(parts.length, 6);
  end.writeUInt32LE(central.length, 8);
  end.writeUInt32LE(offset, 12);
  return Buffer.concat([...locals, central, Buffer.from('504b0506', 'hex'), end]);
}
