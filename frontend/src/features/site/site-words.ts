import { sumDecimals } from '@mantlet/common';
import type { Role, SiteDto, SiteItemDto, SiteLevelDto, SiteMaterialDto } from '@mantlet/common';
import { count, formatLevel, formatNumber } from '../../lib/format.js';

/** Members of a zone that get the same: one product at one thickness. */
export interface ApplyGroup { key: string; productName: string; how: string; areaM2: string; litres: string | null; items: SiteItemDto[] }

/** How thick, as the applicator reads it: "620 µm dry, 886 µm wet in 2 coats", "25 mm in layers of 12 mm + 13 mm". */
export function howThick(item: Pick<SiteItemDto, 'kind' | 'thickness' | 'wetThickness' | 'coats' | 'layers'>): string {
  if (item.kind !== 'coating') return item.layers && item.layers.includes('+') ? `${item.thickness.replace(/ \(.*\)$/, '')} in layers of ${item.layers}` : item.thickness;
  const wet = item.wetThickness === null ? '' : `, ${item.wetThickness} wet`;
  const coats = item.coats === null ? '' : ` in ${count(item.coats, 'coat')}`;
  return `${item.thickness} dry${wet}${coats}`;
}

/** In the order of the schedule: by product, then as the first of each thickness comes. */
export function groupItems(items: readonly SiteItemDto[]): ApplyGroup[] {
  const groups = new Map<string, SiteItemDto[]>();
  for (const item of items) {
    const key = `${item.productName}|${howThick(item)}`;
    const group = groups.get(key);
    if (group) group.push(item);
    else groups.set(key, [item]);
  }
  return [...groups].map(([key, own]): ApplyGroup => {
    const [first] = own as [SiteItemDto, ...SiteItemDto[]];
    const litres = own.map((i) => i.litres).filter((l) => l !== null);
    return {
      key, productName: first.productName, how: howThick(first), areaM2: sumDecimals(own.map((i) => i.areaM2)).toFixed(2),
      litres: litres.length > 0 && litres.length === own.length ? sumDecimals(litres).toFixed(2) : null, items: own,
    };
  }).sort((a, b) => a.productName.localeCompare(b.productName));
}

/** A material in words: "61.4 L, 80 kg", "12 sheets of 2500 × 1200 mm", "1.2 m³, 22 bags". */
export function materialWords(m: SiteMaterialDto): string {
  const parts = [
    m.litres !== null && `${formatNumber(m.litres, 1)} L`,
    m.containers !== null && count(m.containers, 'container'),
    m.sheets !== null && `${count(m.sheets, 'sheet')}${m.sheetSize ? ` of ${m.sheetSize}` : ''}`,
    m.sheets === null && m.sheetM2 !== null && `${formatNumber(m.sheetM2, 1)} m² of sheet`,
    m.kind === 'spray' && m.volumeM3 !== null && `${formatNumber(m.volumeM3, 2)} m³`,
    m.bags !== null && count(m.bags, 'bag'),
    m.kg !== null && `${formatNumber(m.kg)} kg`,
  ];
  return parts.filter((p) => typeof p === 'string').join(', ') || 'not determined';
}

/** Somebody who looks at the work and neither buys nor applies. */
export const onlyInspects = (held: readonly Role[]): boolean => held.includes('inspector') && !held.some((r) => r !== 'inspector' && r !== 'reader');

/** What an inspector goes to see. */
function inspectionHeading(code: string, levels: readonly SiteLevelDto[]): string {
  const zones = levels.flatMap((l) => l.zones);
  const pieces = zones.flatMap((z) => z.items).reduce((sum, i) => sum + i.quantity, 0);
  const bare = zones.flatMap((z) => z.bare).reduce((sum, b) => sum + b.quantity, 0);
  return `${code}: ${count(pieces, 'piece')} to be protected in ${count(zones.filter((z) => z.items.length > 0).length, 'zone')}${bare ? `, ${formatNumber(bare)} to stay bare` : ''}`;
}

/** The heading: what there is to apply in all, or to inspect. */
export function siteHeading(site: SiteDto, held: readonly Role[] = []): string {
  if (!site.revision) return 'Nothing has been issued yet';
  if (onlyInspects(held)) return inspectionHeading(site.revision.code, site.levels);
  const litres = site.purchase.filter((m) => m.kind === 'coating').map((m) => m.litres).filter((l) => l !== null);
  const sheets = site.purchase.reduce((sum, m) => sum + (m.sheets ?? 0), 0);
  const spray = site.purchase.filter((m) => m.kind === 'spray').map((m) => m.volumeM3).filter((v) => v !== null);
  const parts = [
    litres.length > 0 ? `${formatNumber(sumDecimals(litres).toFixed(0))} L of coating` : '',
    sheets > 0 ? `${count(sheets, 'sheet')} of board` : '',
    spray.length > 0 ? `${formatNumber(sumDecimals(spray).toFixed(1), 1)} m³ of spray` : '',
  ].filter(Boolean);
  return parts.length > 0 ? `${site.revision.code}: ${parts.join(', ')}` : `${site.revision.code}: nothing to apply`;
}

export const levelName = (level: Pick<SiteLevelDto, 'code' | 'name' | 'elevationM'>): string => `${level.code} ${level.name}, ${formatLevel(level.elevationM)} m`;
/** The floors to show: one by the address, or all. */
export const shownLevels = (levels: readonly SiteLevelDto[], asked: string | null): SiteLevelDto[] => {
  const one = levels.filter((l) => l.id === asked);
  return one.length > 0 ? one : [...levels];
};
