import { lengthToMm, message } from '@mantlet/common';
import type { LengthUnit } from '@mantlet/common';
import { read, readNumber, refuse } from './numbers.js';
import type { DecimalSign, Reading } from './numbers.js';

export type ImportLengthUnit = 'mm' | 'm' | 'cm' | 'ft' | 'ft-in' | 'in';
const longestMm = 100_000;
/** shorter is a slip of units, as the contract of a member says too */
const shortestMm = 50;

const unitWords: Record<string, LengthUnit> = {
  mm: 'mm', cm: 'cm', m: 'm', metre: 'm', metres: 'm', meter: 'm', meters: 'm', in: 'in', inch: 'in', inches: 'in', '"': 'in', '″': 'in', '”': 'in',
  ft: 'ft', feet: 'ft', foot: 'ft', "'": 'ft', '′': 'ft', '’': 'ft',
};

/** A member's length in mm. A unit in the cell goes before the column's. Feet and inches as 12'-6", 12' 6 1/2", 12 ft 6 in. */
export function readLength(text: string, field: string, unit: ImportLengthUnit, sign: DecimalSign): Reading<number> {
  const feet = feetAndInches(text);
  if (feet !== null) return inRange(feet, field, text);
  const [, number = '', word = ''] = /^(.*?[\d.,])\s*([a-z"'″′”’]+)$/i.exec(text) ?? [null, text, ''];
  const own = unitWords[word.toLowerCase()];
  if (word && !own) return refuse(message('import.row-not-a-number', { text, field }));
  if (!own && unit === 'ft-in') return refuse(message('import.row-feet-inches', { text }));
  const used = own ?? (unit as LengthUnit);
  const value = readNumber(number, field, sign, (n) => lengthToMm(n, used) >= shortestMm && lengthToMm(n, used) <= longestMm);
  return value.ok ? inRange(lengthToMm(value.value, used), field, text) : value;
}

/** null where the text is not written in feet with inches, or in inches with a fraction */
function feetAndInches(text: string): number | null {
  const plain = text.trim().replace(/[′’]/g, "'").replace(/[″”]|''/g, '"').replace(/\s*(?:feet|foot|ft)\.?\s*/gi, "' ").replace(/\s*(?:inches|inch|in)\.?$/i, '"');
  const match = /^(-?)(?:(\d+)\s*'\s*-?\s*)?(?:(\d+(?:\.\d+)?)(?:[\s-]+(\d+)\/(\d+))?|(\d+)\/(\d+))\s*"$/.exec(plain);
  if (!match) return null;
  const [, minus, feet, inches, over, under, overAlone, underAlone] = match;
  if (feet === undefined && under === undefined && underAlone === undefined) return null;
  const fraction = (top: string | undefined, bottom: string | undefined): number => (top === undefined ? 0 : Number(top) / Number(bottom));
  const total = Number(feet ?? 0) * 12 + Number(inches ?? 0) + fraction(over, under) + fraction(overAlone, underAlone);
  return Number.isFinite(total) ? (minus ? -1 : 1) * total * 25.4 : null;
}

function inRange(lengthMm: number, field: string, text: string): Reading<number> {
  if (lengthMm <= 0) return refuse(message('import.row-not-above-zero', { field, text }));
  if (lengthMm < shortestMm || lengthMm > longestMm) return refuse(message('import.row-outside', { field, text, least: '50 mm', greatest: '100 m' }));
  // binary noise of the conversion, far below any tolerance of fabrication
  return read(Number(lengthMm.toFixed(6)));
}
