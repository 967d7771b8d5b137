import { message } from '@mantlet/common';
import { fromBuffer } from 'yauzl';
import type { Entry, ZipFile } from 'yauzl';
import { unprocessable } from '../../../shared/refusal.js';
import { fileLimits, megabytes } from './limits.js';

class Bomb extends Error {}

/**
 * Unpacks every entry once, counting bytes and keeping none, before any reader that trusts archives sees the file.
 * @returns the entries' names
 * @throws Refusal where the archive is damaged, or unpacks to more than a schedule can be
 */
export async function inspectZip(file: string, content: Buffer): Promise<string[]> {
  try {
    return await countEntries(content);
  } catch (error) {
    if (error instanceof Bomb) throw unprocessable(message('import.bomb', { file, limitMb: megabytes(fileLimits.unpackedBytes) }));
    throw unprocessable(message('import.damaged', { file }));
  }
}

async function countEntries(content: Buffer): Promise<string[]> {
  const zip = await open(content);
  const allowed = Math.min(fileLimits.unpackedBytes, Math.max(content.length, 10_000) * fileLimits.packRatio);
  if (zip.entryCount > fileLimits.zipEntries) throw new Bomb();
  const names: string[] = [];
  let bytes = 0;
  for await (const entry of entriesOf(zip)) {
    if (bytes + entry.uncompressedSize > allowed) throw new Bomb();
    names.push(entry.fileName);
    // the declared size may lie: count what really comes out
    for await (const chunk of await contentOf(zip, entry)) {
      bytes += (chunk as Buffer).length;
      if (bytes > allowed) throw new Bomb();
    }
  }
  return names;
}

function open(content: Buffer): Promise<ZipFile> {
  return new Promise((resolve, reject) => {
    fromBuffer(content, { lazyEntries: true, validateEntrySizes: true }, (error, zip) => (error ? reject(error) : resolve(zip)));
  });
}

async function* entriesOf(zip: ZipFile): AsyncGenerator<Entry> {
  for (;;) {
    const entry = await new Promise<Entry | null>((resolve, reject) => {
      const settle = (act: () => void): void => {
        zip.removeAllListeners();
        act();
      };
      zip.once('entry', (found: Entry) => settle(() => resolve(found)));
      zip.once('end', () => settle(() => resolve(null)));
      zip.once('error', (error: Error) => settle(() => reject(error)));
      zip.readEntry();
    });
    if (!entry) return;
    yield entry;
  }
}

function contentOf(zip: ZipFile, entry: Entry): Promise<NodeJS.ReadableStream> {
  return new Promise((resolve, reject) => {
    zip.openReadStream(entry, (error, stream) => (error ? reject(error) : resolve(stream)));
  });
}
