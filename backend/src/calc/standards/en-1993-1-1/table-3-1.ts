import { message } from '@mantlet/common';
import type { SteelGrade } from '@mantlet/common';
import type { Source } from '../../formula.js';
import type { Determined } from '../../types.js';

export const yieldStrengthSource: Source = {
  standard: 'EN 1993-1-1:2005', clause: 'Table 3.1',
  note: 'S235 to S460 of EN 10025-2 to -4 and EN 10210-1; some national annexes read the finer steps of the product standard instead',
};
export const americanGradesSource: Source = { standard: 'ASTM A36, A992, A500 grade C', clause: 'tensile requirements', memory: true };

/** f_y in MPa to 40 mm, and above 40 to 80 mm */
const table: Partial<Record<SteelGrade, readonly [number, number]>> = {
  S235: [235, 215], S275: [275, 255], S355: [355, 335], S420: [420, 390], S460: [460, 430],
};
const american: Partial<Record<SteelGrade, number>> = { A36: 250, A992: 345, A500C: 345 };
export const GREATEST_THICKNESS_MM = 80;

/** f_y in MPa at 20 °C for the thickest part of the section. Not determined for an unknown grade or above 80 mm. */
export function yieldStrength(grade: string, thicknessMm: number): Determined<number> {
  const fixed = american[grade as SteelGrade];
  if (fixed !== undefined) return { ok: true, value: fixed };
  const row = table[grade as SteelGrade];
  if (!row) return { ok: false, reason: message('assessment.unknown-grade', { grade }) };
  if (thicknessMm > GREATEST_THICKNESS_MM) {
    return { ok: false, reason: message('assessment.too-thick-for-grade', { grade, thicknessMm, limitMm: GREATEST_THICKNESS_MM }) };
  }
  return { ok: true, value: thicknessMm <= 40 ? row[0] : row[1] };
}
