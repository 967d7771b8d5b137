import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import path from 'node:path';
import pdfMake from 'pdfmake';
import { schedulePdfDefinition } from './definition.js';
import type { SchedulePdfInput } from './types.js';
import { sfntOfWoff } from './woff.js';

/** IBM Plex Sans as woff: the complete cut has ≤ ≥ → and Greek, which subsets lack; woff2 is not read by the PDF library. */
const fontFolder = path.join(path.dirname(createRequire(import.meta.url).resolve('@ibm/plex-sans/package.json')), 'fonts/complete/woff');
const cuts = { normal: 'Regular', bold: 'SemiBold', italics: 'Italic', bolditalics: 'SemiBoldItalic' };

/** the part of pdfmake that its types leave out: files it reads instead of the disk */
type WithFiles = typeof pdfMake & { virtualfs: { writeFileSync: (name: string, content: Buffer) => void } };
let prepared = false;

/** Once: fonts into memory, and neither disk nor network for anything else. */
function prepare(): void {
  if (prepared) return;
  for (const cut of Object.values(cuts)) {
    (pdfMake as WithFiles).virtualfs.writeFileSync(`${cut}.ttf`, sfntOfWoff(readFileSync(path.join(fontFolder, `IBMPlexSans-${cut}.woff`))));
  }
  pdfMake.setUrlAccessPolicy(() => false);
  pdfMake.setLocalAccessPolicy(() => false);
  prepared = true;
}

/** Renders the schedule from its input alone. It is as long as the schedule: thousands of members take seconds. */
export async function renderSchedulePdf(input: SchedulePdfInput): Promise<Buffer> {
  prepare();
  // the library changes what it is given, fonts included
  pdfMake.setFonts({ IBMPlexSans: Object.fromEntries(Object.entries(cuts).map(([style, cut]) => [style, `${cut}.ttf`])) });
  return Buffer.from(await pdfMake.createPdf(schedulePdfDefinition(input)).getBuffer());
}
