import { formatNumber as formatPlain } from '@mantlet/common';

/** A number with exactly these decimals, as everywhere in the product; text that holds a number is read as one. What is null is a dash. */
export function formatNumber(value: number | string | null | undefined, decimals = 0): string {
  return formatPlain(typeof value === 'string' ? Number(value) : value, decimals).replace('-', '\u2212');
}

/** A level mark as drawings write it: metres with three decimals and a sign. */
export const formatLevel = (elevationM: number): string =>
  elevationM === 0 ? '±0.000' : `${elevationM < 0 ? '\u2212' : '+'}${Math.abs(elevationM).toFixed(3)}`;

const date = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric' });
const dateTime = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric', hour: '2-digit', minute: '2-digit' });
const asDate = (iso: string | null | undefined) => {
  const parsed = iso ? new Date(iso) : null;
  return parsed && !Number.isNaN(parsed.getTime()) ? parsed : null;
};
export const formatDate = (iso: string | null | undefined): string => { const d = asDate(iso); return d ? date.format(d) : '–'; };
export const formatDateTime = (iso: string | null | undefined): string => { const d = asDate(iso); return d ? dateTime.format(d) : '–'; };

/** Keeps a number and its unit on one line: 550 °C, 0.62 mm. */
export const keepUnits = (text: string): string => text.replace(/(\d) (?=(°C|µm|mm|m²|m³|kNm?|L|kg|min)(?![\p{L}\d]))/gu, '$1\u00a0');

/** 1 member, 2 members. */
export const count = (n: number, one: string, many = `${one}s`): string => `${formatNumber(n)} ${n === 1 ? one : many}`;

const words = ['No', 'One', 'Two', 'Three', 'Four', 'Five', 'Six', 'Seven', 'Eight', 'Nine', 'Ten', 'Eleven', 'Twelve'];
/** Begins a sentence: Seven members, 13 members. */
export const countWord = (n: number): string => words[n] ?? formatNumber(n);

/** a, b and c */
export function joinWords(parts: readonly string[]): string {
  if (parts.length < 2) return parts[0] ?? '';
  return `${parts.slice(0, -1).join(', ')} and ${parts[parts.length - 1]}`;
}
