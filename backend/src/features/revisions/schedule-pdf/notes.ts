import { roleNames } from '@mantlet/common';
import type { OpenItemDto, ScheduleSnapshot } from '@mantlet/common';
import type { Content } from 'pdfmake/interfaces.js';
import { heading, paragraph, schedule } from './layout.js';

const cautions = [
  'These results support design by licensed engineers and do not replace it.',
  'Local codes and the authority having jurisdiction govern.',
  'The fire resistance period of each zone comes from the project\'s fire strategy; it is not judged here.',
  'A product\'s own current evidence governs its thickness, its range and how it is applied; read it before work begins. Nothing here certifies a product.',
  'A value outside a product\'s evidence is not extrapolated. What could not be determined is said so and has no number.',
  'Sections, lengths and exposure must agree with what is built. Report any difference before applying protection.',
  'Primer and topcoat must be compatible with the system; film thicknesses given are of the fire protection alone, without them.',
  'Not covered unless a temperature was declared by hand: web openings and corrugated webs, cold-formed steel, cast or wrought iron, stainless steel and aluminium, concrete-filled sections, composite members.',
];

/** On the title sheet, where it is read first. */
export const cautionsList: Content = { ol: cautions.map((text) => ({ text, style: 'paragraph' })) };

const itemTable = (title: string, items: readonly OpenItemDto[]): Content => schedule([
  { head: 'Zone', width: 140, value: (i) => i.zoneLabel ?? '–' },
  { head: 'What', width: '*', value: (i) => i.title },
  { head: 'To be settled by', width: 110, value: (i) => roleNames[i.role] },
], items, { title });

/** What stands open or unsigned, and what the signs mean. */
export function notesSection({ blockers, warnings }: ScheduleSnapshot): Content[] {
  return [
    {
      unbreakable: true,
      stack: [
        heading('6  Notes'),
        paragraph('A/V section factor · θ_cr critical temperature · R fire resistance period in minutes · DFT dry film thickness · WFT wet film thickness · environments by ISO 12944-2 · dates by ISO 8601, UTC.'),
      ],
    },
    ...(blockers.length > 0 ? [itemTable('Not settled: the schedule cannot be issued with these', blockers)] : []),
    ...(warnings.length > 0 ? [itemTable('Noted when the schedule was frozen', warnings)] : []),
  ];
}
