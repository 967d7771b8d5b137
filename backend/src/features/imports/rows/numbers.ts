import { message } from '@mantlet/common';
import type { Message } from '@mantlet/common';

export type Reading<T> = { ok: true; value: T } | { ok: false; reason: Message };
export const read = <T>(value: T): Reading<T> => ({ ok: true, value });
export const refuse = (reason: Message): Reading<never> => ({ ok: false, reason });

/** Which sign a file uses before decimals, where its own numbers show it. */
export type DecimalSign = 'point' | 'comma' | null;

const numeric = /^[+-]?[\d.,]*\d[\d.,]*$/;
/** thin, hard and plain spaces and apostrophes between digits only group them */
const ungrouped = (text: string): string => text.replace(/(?<=\d)[\s'’](?=\d{3}(?!\d))/g, '').replace(/[−–]/g, '-').trim();

/**
 * The decimal sign that a file's numbers prove: a sign after which not exactly three digits follow, or the last of both.
 * 6,5 proves the comma; 6,500 proves nothing.
 */
export function provenDecimalSign(texts: Iterable<string>): DecimalSign {
  let proven: DecimalSign = null;
  for (const text of texts) {
    const sign = signOf(ungrouped(text).replace(/[^\d.,+-]+$/, ''));
    if (!sign) continue;
    if (proven && proven !== sign) return null;
    proven = sign;
  }
  return proven;
}

function signOf(text: string): DecimalSign {
  if (!numeric.test(text)) return null;
  const comma = text.lastIndexOf(',');
  const point = text.lastIndexOf('.');
  if (comma >= 0 && point >= 0) return comma > point ? 'comma' : 'point';
  const at = Math.max(comma, point);
  if (at < 0 || text.length - at - 1 === 3) return null;
  return comma >= 0 ? 'comma' : 'point';
}

/**
 * A number as a person wrote it. Where 6,500 may mean 6.5 as well as 6500 and the file proves neither, the one that
 * `possible` allows is taken, and if it allows both, none: a guessed length would go unseen.
 */
export function readNumber(text: string, field: string, sign: DecimalSign, possible: (value: number) => boolean = () => true): Reading<number> {
  const plain = ungrouped(text);
  if (/^#[A-Z/0!?]+/i.test(plain)) return refuse(message('import.row-formula-error', { text: plain }));
  const both = numeric.test(plain) ? valuesOf(plain, sign) : [];
  const finite = [...new Set(both)].filter(Number.isFinite);
  const likely = finite.length > 1 ? finite.filter(possible) : finite;
  if (likely.length === 1) return read(likely[0]!);
  if (finite.length > 1) return refuse(message('import.row-ambiguous-number', { text, one: String(finite[0]), other: String(finite[1]) }));
  return refuse(message('import.row-not-a-number', { text, field }));
}

/** every value the digits can stand for */
function valuesOf(text: string, sign: DecimalSign): number[] {
  const comma = text.includes(',');
  const point = text.includes('.');
  if (!comma && !point) return [Number(text)];
  const own = signOf(text) ?? sign;
  const asPoint = grouped(text, ',') ? Number(text.replace(/,/g, '')) : NaN;
  const asComma = grouped(text, '.') ? Number(text.replace(/\./g, '').replace(',', '.')) : NaN;
  if (own === 'point') return [asPoint];
  if (own === 'comma') return [asComma];
  return [asPoint, asComma];
}

/** the other sign may only stand between groups of three, which do not begin with 0 */
function grouped(text: string, sign: ',' | '.'): boolean {
  const decimal = sign === ',' ? '.' : ',';
  const [whole = '', ...rest] = text.split(decimal);
  if (rest.length > 1 || rest[0]?.includes(sign)) return false;
  return whole.includes(sign) ? new RegExp(`^[+-]?[1-9]\\d{0,2}(\\${sign}\\d{3})+$`).test(whole) : true;
}
