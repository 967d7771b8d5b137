import { exposureNames, memberTypeNames, wayNames } from '@mantlet/common';
import type { MemberNarrowing, MemberValuesDto } from '@mantlet/common';
import { formatNumber } from '../../lib/format.js';
import type { MemberFilter } from './member-filter.js';
import { verdictNames } from './member-words.js';

export type ListKey = keyof MemberValuesDto;
export type RangeKey = 'sectionFactor' | 'criticalTemperature' | 'thickness' | 'utilisation' | 'length';
export type FlagKey = 'open' | 'assumed' | 'accepted';

/** One thing the list can be narrowed by: how it is called, and how what is chosen is said. */
export type FilterField =
  | { kind: 'list'; key: ListKey; label: string }
  | { kind: 'range'; key: RangeKey; label: string; unit: string }
  | { kind: 'flag'; key: FlagKey; label: string; yes: string; no: string };

export const filterFields: readonly FilterField[] = [
  { kind: 'list', key: 'levelIds', label: 'Level' },
  { kind: 'list', key: 'zoneIds', label: 'Zone' },
  { kind: 'list', key: 'memberTypes', label: 'Type' },
  { kind: 'list', key: 'families', label: 'Section family' },
  { kind: 'list', key: 'sectionIds', label: 'Section' },
  { kind: 'list', key: 'grades', label: 'Steel grade' },
  { kind: 'list', key: 'exposures', label: 'Exposure' },
  { kind: 'list', key: 'protectionForms', label: 'Protection form' },
  { kind: 'list', key: 'periods', label: 'Period' },
  { kind: 'list', key: 'productIds', label: 'Product' },
  { kind: 'list', key: 'verdicts', label: 'Result' },
  { kind: 'list', key: 'ways', label: 'How its temperature came about' },
  { kind: 'flag', key: 'open', label: 'Open', yes: 'Open', no: 'Nothing open' },
  { kind: 'flag', key: 'assumed', label: 'Assumed temperature', yes: 'Assumed, not accepted', no: 'Not resting on an assumption' },
  { kind: 'flag', key: 'accepted', label: 'Acceptance', yes: 'With an acceptance', no: 'Without an acceptance' },
  { kind: 'range', key: 'sectionFactor', label: 'A/V', unit: '1/m' },
  { kind: 'range', key: 'criticalTemperature', label: 'Critical temperature', unit: '°C' },
  { kind: 'range', key: 'thickness', label: 'Required thickness', unit: 'mm' },
  { kind: 'range', key: 'utilisation', label: 'Utilisation in fire', unit: '' },
  { kind: 'range', key: 'length', label: 'Length', unit: 'm' },
];

const plainNames: Partial<Record<ListKey, Record<string, string>>> = { memberTypes: memberTypeNames, exposures: exposureNames, verdicts: verdictNames, ways: wayNames, protectionForms: { profile: 'Follows the profile', boxed: 'Boxed' } };
const upper = { sectionFactor: 'sectionFactorUpTo', criticalTemperature: 'criticalTemperatureUpTo', thickness: 'thicknessUpTo', utilisation: 'utilisationUpTo', length: 'lengthUpTo' } as const;
const lower = { sectionFactor: 'sectionFactorAbove', criticalTemperature: 'criticalTemperatureAbove', thickness: 'thicknessAbove', utilisation: 'utilisationAbove', length: 'lengthAbove' } as const;
export const rangeKeys = (key: RangeKey) => ({ above: lower[key], upTo: upper[key] });

export const keysOf = (field: FilterField): (keyof MemberNarrowing)[] => (field.kind === 'range' ? [lower[field.key], upper[field.key]] : [field.key]);
export const without = (filter: MemberFilter, field: FilterField): MemberFilter => {
  const next: MemberFilter = { ...filter };
  for (const key of keysOf(field)) delete next[key];
  return next;
};
export const isSet = (filter: MemberFilter, field: FilterField): boolean => keysOf(field).some((key) => filter[key] !== undefined && (!Array.isArray(filter[key]) || (filter[key] as unknown[]).length > 0));

export function labelOf(key: ListKey, value: string, values: MemberValuesDto | undefined): string {
  const known = values?.[key].find((v) => v.value === value)?.label;
  const label = plainNames[key]?.[value] ?? known ?? (key.endsWith('Ids') ? 'one that is gone' : value);
  // a level's or zone's code is enough to know it by
  return key === 'zoneIds' || key === 'levelIds' ? label.split(' ')[0] ?? label : key === 'periods' && !known ? `${value} min` : label;
}

/** "Zone Z03 or Z04", "A/V above 200 1/m", "Open" */
export function chipWords(field: FilterField, filter: MemberFilter, values: MemberValuesDto | undefined): string {
  if (field.kind === 'flag') return filter[field.key] === 'true' ? field.yes : field.no;
  if (field.kind === 'list') {
    const names = ((filter[field.key] ?? []) as (string | number)[]).map((v) => labelOf(field.key, String(v), values));
    const said = names.length > 3 ? `${names.slice(0, 2).join(', ')} or ${names.length - 2} more` : names.join(' or ');
    return `${field.label} ${said}`;
  }
  const [above, upTo] = [filter[lower[field.key]], filter[upper[field.key]]];
  const number = (v: number) => formatNumber(v, Number.isInteger(v) ? 0 : 2);
  const parts = [above !== undefined && `above ${number(above)}`, upTo !== undefined && `up to ${number(upTo)}`].filter(Boolean).join(', ');
  return `${field.label} ${parts}${field.unit ? ` ${field.unit}` : ''}`;
}

export const chosenFields = (filter: MemberFilter): FilterField[] => filterFields.filter((field) => isSet(filter, field));
