import { formatNumber, revisionStateNames } from '@mantlet/common';
import type { SignatureDto } from '@mantlet/common';
import type { Content, TableCell } from 'pdfmake/interfaces.js';
import { blockLayout, breakable, day } from './layout.js';
import { cautionsList } from './notes.js';
import type { SchedulePdfInput } from './types.js';

const box = (label: string, value: string): TableCell => ({ stack: [{ text: label, style: 'label' }, { text: breakable(value || '–'), style: 'cell', margin: [0, 2, 0, 0] }] });

function signed(label: string, by: SignatureDto | null): TableCell[] {
  return [{ text: label, style: 'label' }, { text: breakable(by?.name ?? 'not yet'), style: 'cell' }, { text: by ? day(by.at) : '–', style: 'cell' }];
}

const members = (n: number): string => `${formatNumber(n)} ${n === 1 ? 'member' : 'members'}`;

/** The schedule in one sentence. */
export function answer({ snapshot }: SchedulePdfInput): string {
  const count = (verdict: string): number => snapshot.members.filter((m) => m.result?.verdict === verdict).length;
  const kept = count('protected');
  const bare = count('bare');
  const open = snapshot.members.length - kept - bare;
  const area = formatNumber(Number(snapshot.quantities.byLevelAndProduct.total.netM2), 1);
  return `${members(snapshot.members.length)}: ${formatNumber(kept)} to be protected over ${area} m², ${formatNumber(bare)} may stay bare`
    + `${open > 0 ? `, ${formatNumber(open)} not settled` : ''}.`;
}

/** Project, revision, state, and who signed. */
export function titleSheet(input: SchedulePdfInput): Content[] {
  const { snapshot, signatures, snapshotSha256 } = input;
  const { project, revision } = snapshot;
  const invented = snapshot.products.some((p) => p.invented);
  return [
    { text: 'Fire protection schedule of structural steel', style: 'title' },
    { text: `${project.name}${project.place ? `, ${project.place}` : ''}`, style: 'subtitle' },
    {
      layout: blockLayout,
      table: {
        widths: ['*', '*', '*', '*', '*'],
        body: [[
          box('Project number', project.number), box('Revision', revision.code), box('State', revisionStateNames[signatures.state]),
          box('Issued on', signatures.issued ? day(signatures.issued.at) : ''), box('Purpose', revision.purpose),
        ]],
      },
    },
    { text: answer(input), style: 'answer' },
    {
      layout: blockLayout, margin: [0, 0, 0, 8],
      table: {
        widths: [90, 200, 90],
        body: [
          [{ text: 'Sign-off', style: 'label' }, { text: 'Name', style: 'label' }, { text: 'Date (UTC)', style: 'label' }],
          signed('Prepared', signatures.prepared), signed('Checked', signatures.checked), signed('Issued', signatures.issued),
        ],
      },
    },
    ...(signatures.state === 'issued' || signatures.state === 'superseded' ? [] : [{
      text: `This copy shows revision ${revision.code} as ${revisionStateNames[signatures.state].toLowerCase()}. It is not issued: do not build from it.`, style: 'total', margin: [0, 0, 0, 6] as [number, number, number, number],
    }]),
    ...(invented ? [{ text: 'Products marked "invented for demonstration", and their data, do not exist. Nothing here may be built from.', style: 'total', margin: [0, 0, 0, 6] as [number, number, number, number] }] : []),
    { text: `Inputs and results as they stood on ${day(snapshot.takenAt)}, ${snapshot.takenAt.slice(11, 16)} UTC.${snapshotSha256 ? ` SHA-256 of the frozen record: ${snapshotSha256}` : ''}`, style: 'paragraph' },
    {
      columns: [
        { width: 230, toc: { title: { text: 'Contents', style: 'subheading' }, textMargin: [0, 0, 0, 1], numberStyle: 'cell', textStyle: 'cell' } },
        { width: '*', stack: [{ text: 'Cautions', style: 'subheading' }, cautionsList] },
      ],
      columnGap: 30, margin: [0, 8, 0, 0],
    },
  ];
}
