import type { AuditEntryDto } from '@mantlet/common';

const longest = 120;
const cut = (text: string) => (text.length > longest ? `${text.slice(0, longest - 1)}…` : text);

/** A stored value as people read it. Records are spelled out key by key. */
export function inWords(value: unknown): string {
  if (value === null || value === undefined || value === '') return 'nothing';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (Array.isArray(value)) return value.length ? cut(value.map(inWords).join(', ')) : 'nothing';
  if (typeof value === 'object') return cut(Object.entries(value).map(([k, v]) => `${fieldName(k)} ${inWords(v)}`).join(', '));
  return cut(String(value));
}

const units: [RegExp, string][] = [[/Mm$/, ' mm'], [/Min$/, ' min'], [/TemperatureC$|^temperatureC$/, ' °C'], [/M2$/, ' m²'], [/Percent$/, ' %']];
/** "bucklingLengthYMm" → "buckling length y, mm" */
export function fieldName(field: string): string {
  const unit = units.find(([pattern]) => pattern.test(field));
  const bare = unit ? field.replace(unit[0], unit[1] === ' °C' ? (field.startsWith('t') ? 'temperature' : 'Temperature') : '') : field;
  const words = bare.replace(/([a-z\d])([A-Z])/g, '$1 $2').replaceAll('-', ' ').replace(/\s+/g, ' ').trim().toLowerCase();
  return unit ? `${words},${unit[1]}` : words;
}

export const changeLines = (entry: AuditEntryDto) =>
  entry.changes.map((c) => ({ field: fieldName(c.field), old: inWords(c.old), new: inWords(c.new) }));
