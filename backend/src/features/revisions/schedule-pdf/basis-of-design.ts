import { actionCategories, actionCategoryNames, formatNumber, memberTypeNames, memberTypes } from '@mantlet/common';
import type { ScheduleSnapshot } from '@mantlet/common';
import type { Content } from 'pdfmake/interfaces.js';
import { facts, heading, paragraph, schedule } from './layout.js';

const readingWords = {
  linear: 'linear between two rows', 'next-row-up': 'the next row up', 'next-below': 'the tabulated temperature at or below',
} as const;

/** Every factor the results rest on. */
export function basisOfDesign({ settings }: ScheduleSnapshot): Content[] {
  const { designBasis: b, readingRules, deductions } = settings;
  const category = (c: (typeof actionCategories)[number]) => ({ name: actionCategoryNames[c], ...(b.psi[c] ?? { psi1: 0, psi2: 0 }) });
  return [
    heading('1  Basis of design', { pageBreak: 'before' }),
    paragraph('Actions in fire by EN 1990 6.4.3.3 and EN 1991-1-2; resistance and critical temperature by EN 1993-1-2:2005; section factors from dimensions by EN 1993-1-2 Tables 4.2 and 4.3; thickness from each product\'s own assessed data.'),
    facts([
      ['Partial factor γ_M,fi', String(b.gammaMFi)],
      ['γ_G, γ_Q (for η_fi)', `${b.gammaG}, ${b.gammaQ}`],
      ['ψ_fi of the leading action', b.psiFi === 'psi1' ? 'ψ1' : 'ψ2'],
      ['η_fi where not worked out', String(b.etaFi)],
      ['Temperature from utilisation', b.utilisationMethod === 'equation-4.22' ? 'EN 1993-1-2 equation (4.22)' : 'inversion of k_y, Table 3.1'],
      ['Class 4 sections', `${b.class4TemperatureC} °C`],
      ['Second signature above', `${b.secondSignatureAboveC} °C`],
      ['Emissivity of steel', String(b.emissivitySteel)],
      ['Shadow effect on bare I sections', b.shadowEffect ? 'counted' : 'not counted'],
      ['Tables, section factor', readingWords[readingRules.sectionFactor]],
      ['Tables, temperature', readingRules.temperature === 'linear' ? 'linear between two columns' : readingWords[readingRules.temperature]],
      ['End lap, openings, coat-back', `${deductions.endLapMm} mm; deducted from ${deductions.openingThresholdM2} m²; ${deductions.coatBackMm} mm`],
    ]),
    {
      columns: [
        [schedule([
          { head: 'Category', width: '*', value: (r) => r.name },
          { head: 'ψ_1', width: 40, right: true, value: (r) => formatNumber(r.psi1, 2) },
          { head: 'ψ_2', width: 40, right: true, value: (r) => formatNumber(r.psi2, 2) },
        ], actionCategories.map(category), { title: 'Combination factors' })],
        [schedule([
          { head: 'Member type', width: '*', value: (r) => memberTypeNames[r] },
          { head: '°C', width: 40, right: true, value: (r) => String(b.assumedTemperatureC[r] ?? '–') },
        ], [...memberTypes], { title: 'Assumed critical temperatures, where one was accepted' })],
      ],
      columnGap: 24,
    },
  ];
}
