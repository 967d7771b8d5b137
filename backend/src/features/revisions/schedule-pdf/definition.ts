import { revisionStateNames } from '@mantlet/common';
import type { Content, TDocumentDefinitions } from 'pdfmake/interfaces.js';
import { basisOfDesign } from './basis-of-design.js';
import { PAGE_MARGIN_PT, styles } from './layout.js';
import { memberSchedule } from './member-schedule.js';
import { notesSection } from './notes.js';
import { quantitiesSection } from './quantities-section.js';
import { titleSheet } from './title-sheet.js';
import type { SchedulePdfInput } from './types.js';
import { systemsSection, zonesSection } from './zones-and-systems.js';

const rule = (width: number): Content => ({ canvas: [{ type: 'line', x1: 0, y1: 0, x2: width, y2: 0, lineWidth: 0.5 }], margin: [0, 2, 0, 0] });

const isIssued = ({ signatures }: SchedulePdfInput): boolean => signatures.state === 'issued' || signatures.state === 'superseded';

function runningHead(input: SchedulePdfInput, width: number): Content {
  const { project, revision } = input.snapshot;
  const state = revisionStateNames[input.signatures.state] + (isIssued(input) ? '' : ', not issued');
  return {
    margin: [PAGE_MARGIN_PT, 18, PAGE_MARGIN_PT, 0],
    stack: [{
      columns: [
        { text: `${project.number}  ${project.name}`, style: 'running', bold: true },
        { text: 'Fire protection schedule', style: 'running', alignment: 'center' },
        { text: `Revision ${revision.code}  ·  ${state}`, style: 'running', bold: true, alignment: 'right' },
      ],
    }, rule(width)],
  };
}

function runningFoot(page: number, pages: number): Content {
  return {
    margin: [PAGE_MARGIN_PT, 8, PAGE_MARGIN_PT, 0],
    columns: [
      { text: 'Supports, and does not replace, design by licensed engineers. Product evidence and local codes govern.', style: 'running' },
      { text: `page ${page} of ${pages}`, style: 'running', alignment: 'right', width: 80 },
    ],
  };
}

/** The whole document as pdfmake reads it: a pure function of the snapshot and its signatures. A4 landscape, black on white. */
export function schedulePdfDefinition(input: SchedulePdfInput): TDocumentDefinitions {
  const { snapshot, signatures } = input;
  const { project, revision } = snapshot;
  return {
    pageSize: 'A4',
    pageOrientation: 'landscape',
    pageMargins: [PAGE_MARGIN_PT, 44, PAGE_MARGIN_PT, 34],
    info: { title: `${project.number} fire protection schedule, revision ${revision.code}`, subject: project.name, creator: 'Mantlet', producer: 'Mantlet' },
    language: 'en-GB',
    defaultStyle: { font: 'IBMPlexSans', fontSize: 8.5, lineHeight: 1.1 },
    styles,
    ...(isIssued(input) ? {} : { watermark: { text: `${revisionStateNames[signatures.state].toUpperCase()}, NOT ISSUED`, color: '#000000', opacity: 0.08, bold: true, fontSize: 60 } }),
    header: (_page, _pages, size) => runningHead(input, size.width - 2 * PAGE_MARGIN_PT),
    footer: (page, pages) => runningFoot(page, pages),
    content: [
      ...titleSheet(input), ...basisOfDesign(snapshot), ...zonesSection(snapshot), ...systemsSection(snapshot), ...memberSchedule(snapshot),
      ...quantitiesSection(snapshot), ...notesSection(snapshot),
    ],
  };
}
