import { sentence, sumDecimals } from '@mantlet/common';
import type { ProductKind, QuantityAmounts, QuantityLineDto, QuantityTotals } from '@mantlet/common';

/** What a cell of the matrix can show. Places are those the server prints, so that cells add up by eye; volume is cut to what a drawing of a building can say, and its figures stand in full in the CSV. */
export const measureKeys = ['area', 'litres', 'kg', 'sheets', 'volume', 'cost'] as const;
export type MeasureKey = (typeof measureKeys)[number];
interface Measure { name: string; unit: string; field: keyof QuantityAmounts; places: number; /** of what it does not apply to */ none: string }

export const measures: Record<MeasureKey, Measure> = {
  area: { name: 'Area', unit: 'm²', field: 'netM2', places: 2, none: 'nothing to protect' },
  litres: { name: 'Coating', unit: 'L', field: 'litres', places: 2, none: 'no coating' },
  kg: { name: 'Mass', unit: 'kg', field: 'kg', places: 2, none: 'no coating or spray' },
  sheets: { name: 'Board sheet', unit: 'm²', field: 'sheetM2', places: 2, none: 'no board' },
  volume: { name: 'Volume in place', unit: 'm³', field: 'volumeM3', places: 2, none: 'nothing to protect' },
  cost: { name: 'Cost', unit: '', field: 'cost', places: 2, none: 'not priced' },
};
export const unitOf = (key: MeasureKey, currency: string): string => (key === 'cost' ? currency : measures[key].unit);
export const labelOf = (key: MeasureKey, currency: string): string => `${measures[key].name}, ${unitOf(key, currency)}`;

/** Why a cell has no number: what is missing, or that the measure does not apply there. */
export function reasonFor(totals: QuantityTotals | undefined, key: MeasureKey): string {
  if (!totals) return 'nothing here';
  return totals.missing.length > 0 ? totals.missing.map(sentence).join(' ') : measures[key].none;
}

const appliesTo: Record<MeasureKey, readonly ProductKind[]> = {
  area: ['coating', 'board', 'spray'], litres: ['coating'], kg: ['coating', 'spray'], sheets: ['board'], volume: ['coating', 'board', 'spray'], cost: ['coating', 'board', 'spray'],
};

/** A measure by zone, summed over the printed lines it applies to; null where it applies to none, or where one of them lacks it. */
export function byZone(lines: readonly QuantityLineDto[], key: MeasureKey): Map<string, string | null> {
  const { field, places } = measures[key];
  const zones = new Map<string, (string | null)[]>();
  for (const line of lines) {
    const values = zones.get(line.zoneId) ?? [];
    zones.set(line.zoneId, values);
    if (appliesTo[key].includes(line.kind)) values.push(line[field]);
  }
  return new Map([...zones].map(([zoneId, values]) => {
    const given = values.filter((v) => v !== null);
    return [zoneId, given.length === 0 || given.length < values.length ? null : sumDecimals(given).toFixed(places)];
  }));
}
