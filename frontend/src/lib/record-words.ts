import { exposureNames, fireCurveNames, formatLimitTemperature, memberTypeNames, productKindNames, roleNames, wayNames } from '@mantlet/common';
import type { AuditEntryDto } from '@mantlet/common';
import { formatNumber } from './format.js';

export type Change = AuditEntryDto['changes'][number];

/** Words for the codes that are stored; text that is no such code stands as it is. */
const codeWords: Record<string, string> = {
  ...memberTypeNames, ...wayNames, ...exposureNames, ...fireCurveNames, ...productKindNames, ...roleNames,
  profile: 'following the profile', own: 'each its own', bands: 'bands', one: 'one for all',
};
/** Fields whose stored name does not say what they hold. What is accepted of a member is always its critical temperature. */
const fieldWords: Record<string, string> = {
  email: 'e-mail', mu0: 'utilisation μ0', etaFi: 'ηfi', gammaG: 'γG', gammaQ: 'γQ', gammaMFi: 'γM,fi', psiFi: 'ψ in fire', way: 'basis of the critical temperature',
  bare: 'critical temperature', 'high-temperature': 'critical temperature', assumed: 'critical temperature',
  pdfSha256: 'SHA-256 of the PDF', snapshotSha256: 'SHA-256 of the snapshot',
};
const limits = new Set(['bare', 'high-temperature', 'assumed']);
const endings: [RegExp, string][] = [
  [/MjPerM2$/, 'MJ/m²'], [/PerM$/, '1/m'], [/Knm$/, 'kNm'], [/Kn$/, 'kN'], [/Mm$/, 'mm'], [/Um$/, 'µm'], [/M2$/, 'm²'], [/M3$/, 'm³'],
  [/(?<=[a-z])Min$/, 'min'], [/Percent$/, '%'], [/(?<=emperature|bove|elow)C$/, '°C'], [/(?<=[a-z])M$/, 'm'], [/(?<=[a-z])L$/, 'L'],
];
const lastOf = (field: string) => field.slice(field.lastIndexOf('.') + 1);
const endingOf = (field: string) => endings.find(([pattern]) => pattern.test(field));

/** "bucklingLengthYMm" → "buckling length y"; the unit goes with the value. */
export function fieldName(field: string): string {
  return field.split('.').map((part) => {
    const ending = part === lastOf(field) ? endingOf(part) : undefined;
    const bare = ending ? part.replace(ending[0], '') : part;
    return fieldWords[part] ?? bare.replace(/([a-z\d])([A-Z])/g, '$1 $2').replaceAll('-', ' ').trim().toLowerCase();
  }).join(' ');
}

/** At most three decimals: what arithmetic leaves behind the value someone gave says nothing. */
function numberInWords(value: number): string {
  const rounded = Number(value.toFixed(Math.abs(value) < 0.01 ? 6 : 3));
  return formatNumber(rounded, Math.min(6, (/\.(\d+)$/.exec(String(rounded))?.[1] ?? '').length));
}

const longest = 160;
const cut = (text: string, most = longest) => (text.length > most ? `${text.slice(0, most - 1)}…` : text);
export const isNothing = (value: unknown): boolean => value === null || value === undefined || value === '' || (Array.isArray(value) && value.length === 0);

/** A stored value as people read it, with the unit its field's name spells. Limits of temperature are cut, never rounded up. */
export function valueInWords(field: string, value: unknown, most = longest): string {
  if (isNothing(value) || value === null) return 'nothing';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'number') {
    if (limits.has(field)) return formatLimitTemperature(value);
    const unit = endingOf(lastOf(field))?.[1];
    return unit ? `${numberInWords(value)}\u00a0${unit}` : numberInWords(value);
  }
  if (Array.isArray(value)) return cut(value.map((v) => valueInWords(field, v, most)).join(', '), most);
  if (typeof value === 'object') return cut(Object.entries(value).filter(([, v]) => !isNothing(v)).map(([k, v]) => `${fieldName(k)} ${valueInWords(k, v, most)}`).join('; '), most);
  const text = String(value);
  if (/^[\da-f]{64}$/.test(text)) return `${text.slice(0, 12)}…`;
  return cut(codeWords[text] ?? text, most);
}

const isRecord = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null && !Array.isArray(value);
const isIdentifier = (value: unknown) => typeof value === 'string' && /^[\da-f]{8}(-[\da-f]{4}){3}-[\da-f]{12}$/.test(value);

/** A change of a whole record as changes of the parts that differ: one a part. Identifiers that only the database reads are left out. */
export function partsOfChange(change: Change): Change[] {
  const { old, new: next, field } = change;
  if (isIdentifier(old) || isIdentifier(next)) return [];
  if (!isRecord(old) && !isRecord(next)) return isNothing(old) && isNothing(next) ? [] : [change];
  const [before, after] = [isRecord(old) ? old : {}, isRecord(next) ? next : {}];
  return [...new Set([...Object.keys(before), ...Object.keys(after)])]
    .filter((part) => JSON.stringify(before[part] ?? null) !== JSON.stringify(after[part] ?? null))
    .flatMap((part) => partsOfChange({ field: field === 'basis' ? part : `${field}.${part}`, old: before[part] ?? null, new: after[part] ?? null }));
}
