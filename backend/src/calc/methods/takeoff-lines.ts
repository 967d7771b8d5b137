import { Decimal, message, roundDecimal, roundMoney, sumDecimals, thicknessUnit } from '@mantlet/common';
import type { Message, QuantityLineDto } from '@mantlet/common';
import { memberAreas } from './takeoff-area.js';
import { coatsNeeded, spreadingRate, wetFilmThickness } from './takeoff-formulas.js';
import type { TakeoffMember, TakeoffOptions, TakeoffProduct } from './takeoff-types.js';

/** Members of one printed line, with their product. */
export interface LineGroup {
  product: TakeoffProduct;
  members: TakeoffMember[];
}

export function groupLines(members: readonly TakeoffMember[], products: ReadonlyMap<string, TakeoffProduct>): LineGroup[] {
  const groups = new Map<string, LineGroup>();
  for (const m of members) {
    const product = products.get(m.productId);
    if (!product) throw new RangeError(`Member ${m.mark} has a product that is not among those given`);
    const profile = m.group.startsWith('hollow') ? 'hollow' : 'open';
    const key = [m.levelId, m.zoneId, m.productId, m.thickness, m.layers?.join('+') ?? '', m.memberType, profile, m.onSite].join('|');
    const group = groups.get(key);
    if (group) group.members.push(m);
    else groups.set(key, { product, members: [m] });
  }
  return [...groups.values()];
}

const fixed = (value: Decimal, places: number): string => value.toFixed(places);

export interface LineAmounts {
  netM2: Decimal;
  /** in place, m³ */
  volumeM3: Decimal;
  /** to buy: with loss; sprays, m³ */
  practicalM3: Decimal;
  litres: Decimal | null;
  kg: Decimal | null;
  missing: Message[];
}

/** Material of one line from its printed net area, so that a reader can redo it from the print. */
export function lineAmounts(product: TakeoffProduct, thickness: number, netM2: Decimal): LineAmounts {
  const { kind, supply } = product;
  const missing: Message[] = [];
  const lacking = (what: string): null => {
    missing.push(message('product.supply-missing', { product: product.name, what }));
    return null;
  };
  const volume = netM2.times(thickness).div(kind === 'coating' ? 1e6 : 1e3);
  const practical = volume.div(new Decimal(1).minus(supply.lossFraction));
  let litres: Decimal | null = null;
  let kg: Decimal | null = null;
  if (kind === 'coating') {
    litres = supply.volumeSolidsPercent === null
      ? lacking('volume solids')
      : roundDecimal(practical.times(1000).div(supply.volumeSolidsPercent).times(100), 2);
    if (supply.densityKgPerL === null) lacking('density');
    else if (litres) kg = roundDecimal(litres.times(supply.densityKgPerL), 2);
  }
  if (kind === 'spray') {
    if (supply.bagKg === null || supply.bagYieldM3 === null) lacking('bag mass and yield');
    else kg = roundDecimal(practical.div(supply.bagYieldM3).times(supply.bagKg), 2);
  }
  return { netM2, volumeM3: roundDecimal(volume, 4), practicalM3: roundDecimal(practical, 4), litres, kg, missing };
}

/** Money of a line. Priced per litre, m² of sheet or m³ with loss, and per m² applied; null with a reason where a rate is missing. */
export function lineCosts(product: TakeoffProduct, amounts: LineAmounts, sheetM2: Decimal | null, places: number) {
  const missing: Message[] = [];
  const { kind, supply } = product;
  const bought = kind === 'coating' ? amounts.litres : kind === 'board' ? sheetM2 : amounts.practicalM3;
  const cost = (quantity: Decimal | null, rate: string | null, what: string): Decimal | null => {
    if (rate === null) missing.push(message('product.supply-missing', { product: product.name, what }));
    return rate === null || quantity === null ? null : roundMoney(quantity.times(rate), places);
  };
  const material = cost(bought, supply.materialRate, 'material rate');
  const labour = cost(amounts.netM2, supply.labourRate, 'labour rate');
  return { material, labour, both: material && labour ? material.plus(labour) : null, missing };
}

function coatingFacts(product: TakeoffProduct, thickness: number): Pick<QuantityLineDto, 'wetFilmUm' | 'coats' | 'spreadingRateM2PerL'> {
  const { volumeSolidsPercent: volume, maxDftPerCoatUm: perCoat } = product.supply;
  if (product.kind !== 'coating') return { wetFilmUm: null, coats: null, spreadingRateM2PerL: null };
  return {
    wetFilmUm: volume === null ? null : String(Math.ceil(wetFilmThickness.evaluate({ dryFilmUm: thickness, volumeSolidsPercent: volume }) - 1e-9)),
    coats: perCoat === null ? null : coatsNeeded.evaluate({ dryFilmUm: thickness, greatestPerCoatUm: perCoat }),
    spreadingRateM2PerL: volume === null ? null : roundDecimal(spreadingRate.evaluate({ dryFilmUm: thickness, volumeSolidsPercent: volume }), 3).toFixed(3),
  };
}

export interface LineSheets {
  /** stock sheet that falls to the line, waste included; null: not a board, or not determined */
  sheetM2: Decimal | null;
  missing: Message[];
}

export function lineOf(group: LineGroup, sheets: LineSheets, options: TakeoffOptions): QuantityLineDto {
  const { product, members } = group;
  const first = members[0] as TakeoffMember;
  const areas = members.map((m) => memberAreas(m, options.deductions));
  const printed = (pick: (a: (typeof areas)[number]) => number): Decimal => roundDecimal(sumDecimals(areas.map(pick)), 2);
  const gross = printed((a) => a.grossM2);
  const lap = printed((a) => a.endLapM2);
  const opening = printed((a) => a.openingM2);
  const coatBack = printed((a) => a.coatBackM2);
  // from the printed figures, so that the columns add up across as well as down
  const net = Decimal.max(gross.minus(lap).minus(opening).plus(coatBack), 0);
  const amounts = lineAmounts(product, first.thickness, net);
  const costs = lineCosts(product, amounts, sheets.sheetM2, options.moneyPlaces);
  const money = (d: Decimal | null): string | null => d && fixed(d, options.moneyPlaces);
  return {
    levelId: first.levelId, zoneId: first.zoneId, productId: product.id, kind: product.kind,
    thickness: first.thickness, thicknessUnit: thicknessUnit[product.kind], layers: first.layers ? [...first.layers] : null,
    memberType: first.memberType, profile: first.group.startsWith('hollow') ? 'hollow' : 'open', onSite: first.onSite,
    memberIds: members.map((m) => m.id), marks: members.length,
    pieces: members.reduce((sum, m) => sum + m.quantity, 0),
    lengthM: fixed(roundDecimal(sumDecimals(members.map((m) => (m.lengthMm * m.quantity) / 1000)), 2), 2),
    grossM2: fixed(gross, 2), endLapM2: fixed(lap, 2), openingM2: fixed(opening, 2), coatBackM2: fixed(coatBack, 2), netM2: fixed(net, 2),
    volumeM3: fixed(amounts.volumeM3, 4),
    litres: amounts.litres && fixed(amounts.litres, 2),
    kg: amounts.kg && fixed(amounts.kg, 2),
    sheetM2: sheets.sheetM2 && fixed(sheets.sheetM2, 2),
    ...coatingFacts(product, first.thickness),
    materialCost: money(costs.material), labourCost: money(costs.labour), cost: money(costs.both),
    missing: [...amounts.missing, ...sheets.missing, ...costs.missing],
  };
}
