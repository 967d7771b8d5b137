import { actionCategoryNames, beamSupportNames, exposureNames, fireCurveNames, formatLimitTemperature, loadHeightNames, memberTypeNames, momentShapeNames, productKindNames, roleNames, wayNames } from '@mantlet/common';
import type { AuditEntryDto, BeamLoadInput } from '@mantlet/common';
import { formatNumber } from './format.js';

export type Change = AuditEntryDto['changes'][number];

/** Words for the codes that are stored; text that is no such code stands as it is. */
const codeWords: Record<string, string> = {
  ...memberTypeNames, ...wayNames, ...exposureNames, ...fireCurveNames, ...productKindNames, ...roleNames,
  profile: 'following the profile', own: 'each its own', bands: 'bands', one: 'one for all',
};
/** Codes that are words only in their own field: somebody's note may read "fixed". */
const codesOfField: Record<string, Record<string, string>> = {
  supports: beamSupportNames, loadHeight: loadHeightNames, category: actionCategoryNames, action: { permanent: 'Permanent', ...actionCategoryNames },
  given: { loads: 'Beam with its loads', characteristic: 'Characteristic actions', 'fire-effect': 'Effect in fire' },
  lateralRestraint: { continuous: 'Held along its length', 'at-points': 'Held at points only' },
  bucklingRule: { given: 'As given', 'braced-intermediate': 'Braced column, between storeys', 'braced-top': 'Braced column, top storey' },
  kind: { 'end-moments': momentShapeNames['end-moments'] },
};
/** Fields whose stored name does not say what they hold. What is accepted of a member is always its critical temperature. */
const fieldWords: Record<string, string> = {
  columns: '', email: 'e-mail', mu0: 'utilisation μ0', etaFi: 'ηfi', gammaG: 'γG', gammaQ: 'γQ', gammaMFi: 'γM,fi', psiFi: 'ψ in fire', way: 'basis of the critical temperature',
  bare: 'critical temperature', 'high-temperature': 'critical temperature', assumed: 'critical temperature',
  given: 'actions given as', leading: 'leading variable action', permanent: 'permanent action', effect: 'effect in fire', accompanying: 'accompanying variable actions',
  axialKn: 'axial force N', momentYKnm: 'moment My', momentZKnm: 'moment Mz', shearZKn: 'shear Vz', axialInFireKn: 'axial force in fire beside the loads',
  lateralSupportsMm: 'lateral supports between the ends', lateralSpacingMm: 'distance between lateral supports', momentShapeY: 'moment between lateral supports', loadHeight: 'loads act at the',
  bucklingLengthYMm: 'system length, axis y', bucklingLengthZMm: 'system length, axis z', bucklingRule: 'buckling length in fire', lateralRestraint: 'compression flange',
  mayBuckle: 'may buckle', continuousBeam: 'moment over a support of a continuous beam', composite: 'composite with the slab', webOpenings: 'web openings', utilisation: 'utilisation cold',
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
  // what everything of a calculated member stands under says nothing
  return field.split('.').filter((part, i, all) => i === all.length - 1 || (part !== 'design' && part !== 'actions')).map((part) => {
    const ending = part === lastOf(field) ? endingOf(part) : undefined;
    const bare = ending ? part.replace(ending[0], '') : part;
    return fieldWords[part] ?? bare.replace(/([a-z\d])([A-Z])/g, '$1 $2').replaceAll('-', ' ').trim().toLowerCase();
  }).filter(Boolean).join(' ');
}

/** At most three decimals: what arithmetic leaves behind the value someone gave says nothing. */
function numberInWords(value: number): string {
  const rounded = Number(value.toFixed(Math.abs(value) < 0.01 ? 6 : 3));
  return formatNumber(rounded, Math.min(6, (/\.(\d+)$/.exec(String(rounded))?.[1] ?? '').length));
}

const longest = 160;
const cut = (text: string, most = longest) => (text.length > most ? `${text.slice(0, most - 1)}…` : text);
export const isNothing = (value: unknown): boolean => value === null || value === undefined || value === '' || (Array.isArray(value) && value.length === 0);

const isLoad = (value: object): value is BeamLoadInput => 'action' in value && 'kind' in value && (value.kind === 'point' || value.kind === 'distributed');
/** "B office, 4 to 6 kN/m from 0 to 7 500 mm": a load of a beam in one breath; what is not typed yet is left open. */
function loadInWords(load: BeamLoadInput): string {
  const said = (value: number | null) => (value === null ? '…' : numberInWords(value));
  const action = codesOfField['action']?.[load.action] ?? load.action;
  if (load.kind === 'point') return `${action}, ${said(load.forceKn)}\u00a0kN at ${said(load.atMm)}\u00a0mm`;
  const ends = load.startKnPerM === load.endKnPerM ? said(load.startKnPerM) : `${said(load.startKnPerM)} to ${said(load.endKnPerM)}`;
  return `${action}, ${ends}\u00a0kN/m from ${said(load.fromMm)} to ${said(load.toMm)}\u00a0mm`;
}

/** A stored value as people read it, with the unit its field's name spells. Limits of temperature are cut, never rounded up. */
export function valueInWords(field: string, value: unknown, most = longest): string {
  if (isNothing(value) || value === null) return 'nothing';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'number') {
    if (limits.has(field)) return formatLimitTemperature(value);
    const unit = endingOf(lastOf(field))?.[1];
    return unit ? `${numberInWords(value)}\u00a0${unit}` : numberInWords(value);
  }
  if (Array.isArray(value)) return cut(value.map((v) => valueInWords(field, v, most)).join(value.some(isRecord) ? '; ' : ', '), most);
  if (typeof value === 'object' && isLoad(value)) return cut(loadInWords(value), most);
  if (typeof value === 'object') return cut(Object.entries(value).filter(([, v]) => !isNothing(v)).map(([k, v]) => `${fieldName(k)} ${valueInWords(k, v, most)}`).join('; '), most);
  const text = String(value);
  if (/^[\da-f]{64}$/.test(text)) return `${text.slice(0, 12)}…`;
  return cut(codesOfField[lastOf(field)]?.[text] ?? codeWords[text] ?? text, most);
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
