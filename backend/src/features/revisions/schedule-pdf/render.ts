import { createRequire } from 'node:module';
import path from 'node:path';
import pdfMake from 'pdfmake';
import { schedulePdfDefinition } from './definition.js';
import type { SchedulePdfInput } from './types.js';

/** IBM Plex Sans as woff: the complete cut has ≤ ≥ → and Greek, which subsets lack; woff2 is not read by the PDF library. */
const fontFolder = path.join(path.dirname(createRequire(import.meta.url).resolve('@ibm/plex-sans/package.json')), 'fonts/complete/woff');
const font = (cut: string): string => path.join(fontFolder, `IBMPlexSans-${cut}.woff`);
const fonts = { IBMPlexSans: { normal: font('Regular'), bold: font('SemiBold'), italics: font('Italic'), bolditalics: font('SemiBoldItalic') } };

/** Renders the schedule. Reads the four font files and nothing else, neither from disk nor from the network. */
export async function renderSchedulePdf(input: SchedulePdfInput): Promise<Buffer> {
  pdfMake.setFonts(fonts);
  pdfMake.setUrlAccessPolicy(() => false);
  pdfMake.setLocalAccessPolicy((file) => Object.values(fonts.IBMPlexSans).includes(file));
  return Buffer.from(await pdfMake.createPdf(schedulePdfDefinition(input)).getBuffer());
}
