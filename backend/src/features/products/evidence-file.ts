import { message } from '@mantlet/common';
import { unprocessable } from '../../shared/refusal.js';
import { uploadedName } from '../../shared/uploaded-name.js';
import { decodeText, fileKind, inspectZip } from '../imports/file-reading.service.js';

export const evidenceFileBytes = 10 * 1024 * 1024;
/** for FileInterceptor: one file, in memory, and a handful of short fields beside it */
export const uploadLimits = { limits: { fileSize: evidenceFileBytes, files: 1, fields: 20, fieldSize: 10_000, parts: 25 } };

const contentTypes = {
  pdf: 'application/pdf',
  csv: 'text/csv',
  xlsx: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
} as const;
type EvidenceKind = keyof typeof contentTypes;

export interface Upload {
  name: string;
  content: Buffer;
}

/** @throws Refusal where no file came */
export function requireUpload(file: Express.Multer.File | undefined): Upload {
  if (!file) throw unprocessable(message('product.no-file', {}), [{ path: 'file', message: 'is needed' }]);
  return { name: uploadedName(file, 'evidence'), content: file.buffer };
}

/** The file's name with the ending of what it really is, by its content. @throws Refusal where it is no PDF, CSV or XLSX */
export async function evidenceFileName({ name, content }: Upload): Promise<string> {
  const kind = await kindOf(name, content);
  return name.toLowerCase().endsWith(`.${kind}`) ? name : `${name}.${kind}`;
}

async function kindOf(name: string, content: Buffer): Promise<EvidenceKind> {
  const refuse = (kind: string): never => {
    throw unprocessable(message('product.evidence-file-kind', { file: name, kind }), [{ path: 'file', message: `is ${kind}` }]);
  };
  if (content.subarray(0, 5).toString('latin1') === '%PDF-') return 'pdf';
  const kind = fileKind(content);
  if (kind.kind === 'empty') return refuse('empty');
  if (kind.kind === 'other') return refuse(kind.name);
  if (kind.kind === 'text') return decodeText(content) ? 'csv' : refuse('a binary file');
  return (await inspectZip(name, content)).includes('xl/workbook.xml') ? 'xlsx' : refuse('a ZIP archive');
}

export function contentTypeOf(fileName: string): string {
  return contentTypes[fileName.toLowerCase().replace(/^.*\./, '') as EvidenceKind] ?? 'application/octet-stream';
}
