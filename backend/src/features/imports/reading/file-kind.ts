/** What an uploaded file really is, by its first bytes; names and declared types prove nothing. */
export type FileKind = { kind: 'zip' } | { kind: 'text' } | { kind: 'empty' } | { kind: 'other'; name: string };

const signatures: { bytes: number[]; name: string }[] = [
  { bytes: [0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1], name: 'an old XLS workbook or one with a password' },
  { bytes: [0x25, 0x50, 0x44, 0x46], name: 'a PDF' },
  { bytes: [0x89, 0x50, 0x4e, 0x47], name: 'a picture' },
  { bytes: [0xff, 0xd8, 0xff], name: 'a picture' },
  { bytes: [0x47, 0x49, 0x46, 0x38], name: 'a picture' },
  { bytes: [0x1f, 0x8b], name: 'a compressed archive' },
  { bytes: [0x37, 0x7a, 0xbc, 0xaf], name: 'a compressed archive' },
  { bytes: [0x52, 0x61, 0x72, 0x21], name: 'a compressed archive' },
  { bytes: [0x7b, 0x5c, 0x72, 0x74, 0x66], name: 'a rich-text document' },
  { bytes: [0x41, 0x43, 0x31, 0x30], name: 'a drawing' },
  { bytes: [0x7f, 0x45, 0x4c, 0x46], name: 'a program' },
  { bytes: [0x4d, 0x5a, 0x90, 0x00], name: 'a program' },
];

export function fileKind(content: Buffer): FileKind {
  if (!content.length) return { kind: 'empty' };
  const startsWith = (bytes: number[]): boolean => bytes.every((byte, i) => content[i] === byte);
  // PK with a local header, or with the end record alone (an archive without entries)
  if (startsWith([0x50, 0x4b, 0x03, 0x04]) || startsWith([0x50, 0x4b, 0x05, 0x06])) return { kind: 'zip' };
  const known = signatures.find((signature) => startsWith(signature.bytes));
  if (known) return { kind: 'other', name: known.name };
  const opening = content.subarray(0, 200).toString('latin1').replace(/^\xef\xbb\xbf/, '').trimStart().toLowerCase();
  if (/^<(\?xml|!doctype|html|table|workbook)/.test(opening)) return { kind: 'other', name: 'an XML or HTML page' };
  if (opening.startsWith('iso-10303-21')) return { kind: 'other', name: 'a building model' };
  return { kind: 'text' };
}
