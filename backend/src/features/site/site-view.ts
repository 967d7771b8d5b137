import { Decimal, exposureNames, formatFilmThickness, formatThickness, sumDecimals } from '@mantlet/common';
import type {
  PurchaseDto, QuantityLineDto, ScheduleSnapshot, SiteBareDto, SiteItemDto, SiteLevelDto, SiteMaterialDto, SiteZoneDto, SnapshotMember, SnapshotZone,
} from '@mantlet/common';

const none: Omit<SiteMaterialDto, 'productName' | 'kind' | 'areaM2'> = {
  thickness: null, litres: null, containers: null, kg: null, sheets: null, sheetSize: null, wastePercent: null, sheetM2: null, volumeM3: null, bags: null, money: null,
};

/** A sum of printed amounts; null where any is missing. */
function sumOrNull(values: readonly (string | null)[], places: number): string | null {
  return values.some((v) => v === null) ? null : sumDecimals(values as string[]).toFixed(places);
}

/** What some lines need, product by product; boards by thickness, because they are fetched from the stack by it. Whole packages are another matter: `purchased`. */
function materialsOf(lines: readonly QuantityLineDto[], names: ReadonlyMap<string, string>, prices: boolean): SiteMaterialDto[] {
  const groups = new Map<string, QuantityLineDto[]>();
  for (const line of lines) {
    const key = line.kind === 'board' ? `${line.productId}|${line.thickness}|${line.layers?.join('+') ?? ''}` : line.productId;
    const group = groups.get(key);
    if (group) group.push(line);
    else groups.set(key, [line]);
  }
  return [...groups.values()].flatMap((own): SiteMaterialDto[] => {
    const [line] = own;
    if (!line) return [];
    const { kind } = line;
    return [{
      ...none, productName: names.get(line.productId) ?? '', kind, areaM2: sumDecimals(own.map((l) => l.netM2)).toFixed(2),
      thickness: kind === 'board' ? boardThickness(line) : null,
      litres: kind === 'coating' ? sumOrNull(own.map((l) => l.litres), 2) : null,
      kg: kind === 'board' ? null : sumOrNull(own.map((l) => l.kg), 2),
      sheetM2: kind === 'board' ? sumOrNull(own.map((l) => l.sheetM2), 2) : null,
      volumeM3: sumDecimals(own.map((l) => l.volumeM3)).toFixed(4),
      money: prices ? sumOrNull(own.map((l) => l.cost), 2) : null,
    }];
  });
}

const boardThickness = ({ thickness, layers }: Pick<QuantityLineDto, 'thickness' | 'layers'>): string =>
  formatThickness(thickness, 'mm') + (layers && layers.length > 1 ? ` (${layers.join(' + ')})` : '');

/** What to buy of a product, for the whole job or for the floor that `lines` are of: whole containers, sheets and bags. */
function purchased(purchase: PurchaseDto, all: readonly QuantityLineDto[], names: ReadonlyMap<string, string>, prices: boolean): SiteMaterialDto[] {
  const lines = all.filter((line) => line.productId === purchase.productId && (purchase.levelId === null || line.levelId === purchase.levelId));
  const whole: SiteMaterialDto = {
    ...none, productName: names.get(purchase.productId) ?? '', kind: purchase.kind, areaM2: sumDecimals(lines.map((l) => l.netM2)).toFixed(2),
    volumeM3: sumDecimals(lines.map((l) => l.volumeM3)).toFixed(4), litres: purchase.litres, containers: purchase.containers, bags: purchase.bags,
    kg: purchase.kind === 'board' ? null : sumOrNull(lines.map((l) => l.kg), 2), money: prices ? sumOrNull(lines.map((l) => l.cost), 2) : null,
  };
  if (purchase.boards.length === 0) return [whole];
  return purchase.boards.map((plan, i) => ({
    ...whole, thickness: formatThickness(plan.thicknessMm, 'mm'), sheets: plan.sheets, sheetSize: `${plan.sheetLengthMm} × ${plan.sheetWidthMm} mm`,
    wastePercent: (plan.wasteFraction * 100).toFixed(1), areaM2: plan.usedM2.toFixed(2), sheetM2: plan.sheetM2.toFixed(2),
    volumeM3: ((plan.usedM2 * plan.thicknessMm) / 1000).toFixed(4),
    // the cost is the product's, whatever thicknesses it is bought in: said once
    money: i === 0 ? whole.money : null,
  }));
}

const faces = ({ exposure }: SnapshotMember): string =>
  exposure.arrangement === 'given-faces' ? `Faces: ${(exposure.faces ?? []).join(', ')}` : exposureNames[exposure.arrangement];

function itemOf(m: SnapshotMember, line: QuantityLineDto, names: ReadonlyMap<string, string>): SiteItemDto {
  const areaM2 = m.areaM2 ?? 0;
  const share = line.litres !== null && Number(line.netM2) > 0 ? new Decimal(line.litres).times(areaM2).div(line.netM2).toFixed(2) : null;
  const coating = line.kind === 'coating';
  return {
    mark: m.mark, section: m.section, memberType: m.memberType, quantity: m.quantity, lengthMm: m.lengthMm, faces: faces(m),
    productName: names.get(line.productId) ?? '', kind: line.kind,
    thickness: coating ? formatFilmThickness(line.thickness) : boardThickness(line),
    wetThickness: coating && line.wetFilmUm !== null ? formatFilmThickness(Number(line.wetFilmUm)) : null,
    coats: line.coats, layers: line.kind === 'board' && line.layers ? line.layers.map((t) => `${t} mm`).join(' + ') : null,
    areaM2: areaM2.toFixed(2), litres: coating ? share : null,
  };
}

function zoneOf(zone: SnapshotZone, snapshot: ScheduleSnapshot, lineOf: ReadonlyMap<string, QuantityLineDto>, names: ReadonlyMap<string, string>, prices: boolean): SiteZoneDto {
  const members = snapshot.members.filter((m) => m.zoneId === zone.id);
  return {
    id: zone.id, code: zone.code, name: zone.name, periodMin: zone.periodMin,
    items: members.flatMap((m) => {
      const line = lineOf.get(m.id);
      return line ? [itemOf(m, line, names)] : [];
    }),
    bare: members.filter((m) => m.result?.verdict === 'bare').map(({ mark, section, memberType, quantity }): SiteBareDto => ({ mark, section, memberType, quantity })),
    materials: materialsOf(snapshot.quantities.lines.filter((line) => line.zoneId === zone.id), names, prices),
  };
}

/** A frozen schedule as the site reads it: from the ground up, zone by zone. Pure. */
export function siteOf(snapshot: ScheduleSnapshot, prices: boolean): { levels: SiteLevelDto[]; purchase: SiteMaterialDto[] } {
  const names = new Map(snapshot.products.map((p) => [p.id, p.name]));
  const { lines, purchases, purchasesByLevel = [] } = snapshot.quantities;
  const lineOf = new Map(lines.flatMap((line) => line.memberIds.map((id): [string, QuantityLineDto] => [id, line])));
  const levels = snapshot.levels.map(({ id, code, name, elevationM }): SiteLevelDto => ({
    id, code, name, elevationM,
    zones: snapshot.zones.filter((zone) => zone.levelId === id).map((zone) => zoneOf(zone, snapshot, lineOf, names, prices)),
    materials: materialsOf(lines.filter((line) => line.levelId === id), names, prices),
    // without prices: whole sheets for a floor cost more than its share of the job, which is what the lines are priced by
    purchase: purchasesByLevel.filter((p) => p.levelId === id).flatMap((p) => purchased(p, lines, names, false)),
  }));
  return { levels: levels.filter((level) => level.zones.length > 0), purchase: purchases.flatMap((p) => purchased(p, lines, names, prices)) };
}
