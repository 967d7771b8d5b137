import { importFieldNames, fahrenheitToCelsius, message } from '@mantlet/common';
import type { CriticalTemperatureBasis, Exposure, ImportField, ImportMapping, MemberInput, Message } from '@mantlet/common';
import { readLength } from './lengths.js';
import { readNumber, read, refuse } from './numbers.js';
import type { DecimalSign, Reading } from './numbers.js';
import { readLevel, readZone } from './read-place.js';
import type { KnownLevel, KnownPlaces } from './read-place.js';
import { readExposure, readGrade, readMemberType, readProtectionForm } from './words.js';

/** What rows are read against. */
export interface RowContext {
  mapping: ImportMapping;
  places: KnownPlaces;
  section: (text: string) => { id: string; designation: string } | null;
  suggestSections: (text: string) => string[];
  /** the decimal sign that the file's own numbers prove */
  decimalSign: DecimalSign;
}

export interface RowProblem {
  field: ImportField;
  reason: Message;
}
/** What a row says, as far as it says it; what it leaves out stays open. */
export interface RowDraft extends Partial<Pick<MemberInput, 'zoneId' | 'memberType' | 'sectionId' | 'grade' | 'lengthMm' | 'quantity' | 'protectionForm' | 'note'>> {
  exposure?: Pick<Exposure, 'arrangement' | 'faces'>;
  basis?: CriticalTemperatureBasis;
}
export interface ReadRow {
  row: number;
  mark: string;
  /** the cells as they stand in the file */
  values: Partial<Record<ImportField, string>>;
  draft: RowDraft;
  problems: RowProblem[];
}

export function readRow(row: number, cells: readonly string[], context: RowContext): ReadRow {
  const values: ReadRow['values'] = {};
  for (const [field, column] of Object.entries(context.mapping.columns) as [ImportField, number][]) {
    const text = cells[column] ?? '';
    if (text) values[field] = text;
  }
  const problems: RowProblem[] = [];
  const draft: RowDraft = {};
  /** keeps the value, or the reason against it */
  const take = <T>(field: ImportField, reading: Reading<T> | null | undefined, keep: (value: T) => void): void => {
    if (!reading) return;
    if (reading.ok) keep(reading.value);
    else problems.push({ field, reason: reading.reason });
  };
  const each = <T>(field: ImportField, reader: (text: string, name: string) => Reading<T>, keep: (value: T) => void): void => {
    const text = values[field];
    if (text !== undefined) take(field, reader(text, importFieldNames[field]), keep);
  };
  take('mark', readMark(values.mark ?? ''), () => undefined);
  readPlace(values, context.places, take, draft);
  each('memberType', readMemberType, (v) => { draft.memberType = v; });
  each('section', (text) => readSection(text, context), (v) => { draft.sectionId = v; });
  each('grade', readGrade, (v) => { draft.grade = v; });
  each('length', (text, name) => readLength(text, name, context.mapping.lengthUnit, context.decimalSign), (v) => { draft.lengthMm = v; });
  each('quantity', (text, name) => readQuantity(text, name, context.decimalSign), (v) => { draft.quantity = v; });
  each('exposure', readExposure, (v) => { draft.exposure = v; });
  each('protectionForm', readProtectionForm, (v) => { draft.protectionForm = v; });
  each('note', (text, name) => limited(text, name, 2000), (v) => { draft.note = v; });
  readBasis(values, context, take, draft);
  return { row, mark: values.mark ?? '', values, draft, problems };
}

type Take = <T>(field: ImportField, reading: Reading<T> | null | undefined, keep: (value: T) => void) => void;

function readMark(text: string): Reading<string> {
  return text ? limited(text, importFieldNames.mark, 60) : refuse(message('import.row-needed', { field: importFieldNames.mark }));
}

function limited(text: string, field: string, limit: number): Reading<string> {
  return text.length > limit ? refuse(message('import.row-too-long', { field, limit })) : read(text);
}

function readPlace(values: ReadRow['values'], places: KnownPlaces, take: Take, draft: RowDraft): void {
  let level: KnownLevel | null = null;
  if (values.level !== undefined) {
    const reading = readLevel(values.level, places);
    take('level', reading, (found) => { level = found; });
    if (!reading.ok) return;
  }
  take(values.zone === undefined ? 'level' : 'zone', readZone(values.zone ?? '', level, places), (zone) => { draft.zoneId = zone.id; });
}

function readSection(text: string, context: RowContext): Reading<string> {
  const section = context.section(text);
  return section ? read(section.id) : refuse(message('import.row-unknown-section', { text, suggestions: context.suggestSections(text) }));
}

function readQuantity(text: string, field: string, sign: DecimalSign): Reading<number> {
  const value = readNumber(text, field, sign, (n) => Number.isInteger(n) && n >= 1 && n <= 10_000);
  if (!value.ok) return value;
  if (!Number.isInteger(value.value)) return refuse(message('import.row-not-whole', { field, text }));
  return within(value.value, text, field, 1, 10_000);
}

function within(value: number, text: string, field: string, least: number, greatest: number, unit = ''): Reading<number> {
  if (value <= 0) return refuse(message('import.row-not-above-zero', { field, text }));
  const inside = value >= least && value <= greatest;
  return inside ? read(value) : refuse(message('import.row-outside', { field, text, least: `${least}${unit}`, greatest: `${greatest}${unit}` }));
}

/** The structural engineer's columns: a declared temperature or a utilisation, each with where it comes from. */
function readBasis(values: ReadRow['values'], context: RowContext, take: Take, draft: RowDraft): void {
  const { criticalTemperature, utilisation, reference } = values;
  if (criticalTemperature === undefined && utilisation === undefined) return;
  if (criticalTemperature !== undefined && utilisation !== undefined) return take('utilisation', refuse(message('import.row-two-temperatures', {})), () => undefined);
  if (reference === undefined) take('reference', refuse(message('import.row-no-reference', {})), () => undefined);
  else take('reference', limited(reference, importFieldNames.reference, 500), () => undefined);
  const source = reference ?? '';
  if (criticalTemperature !== undefined) {
    take('criticalTemperature', readTemperature(criticalTemperature, context), (temperatureC) => { draft.basis = { way: 'declared', temperatureC, reference: source }; });
  } else if (utilisation !== undefined) {
    take('utilisation', readUtilisation(utilisation, context.decimalSign), (mu0) => { draft.basis = { way: 'utilisation', mu0, reference: source }; });
  }
}

function readTemperature(text: string, context: RowContext): Reading<number> {
  const field = importFieldNames.criticalTemperature;
  const [, number = '', word = ''] = /^(.*?[\d.,])\s*(?:°|deg\.?)?\s*([CFK]?)$/i.exec(text) ?? ['', text, ''];
  if (/^k$/i.test(word)) return refuse(message('import.row-not-a-number', { text, field }));
  const fahrenheit = word ? word.toUpperCase() === 'F' : context.mapping.temperatureUnit === 'F';
  const toC = (n: number): number => (fahrenheit ? Number(fahrenheitToCelsius(n).toFixed(6)) : n);
  const value = readNumber(number, field, context.decimalSign, (n) => toC(n) >= 100 && toC(n) <= 1200);
  return value.ok ? within(toC(value.value), text, field, 100, 1200, ' °C') : value;
}

function readUtilisation(text: string, sign: DecimalSign): Reading<number> {
  const field = importFieldNames.utilisation;
  const percent = /^(.*\d)\s*%$/.exec(text);
  const value = readNumber(percent ? percent[1]! : text, field, sign, (n) => n > 0 && n <= (percent ? 1000 : 10));
  return value.ok ? within(percent ? Number((value.value / 100).toPrecision(12)) : value.value, text, field, 0, 10) : value;
}
