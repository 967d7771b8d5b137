import { describe, expect, it } from 'vitest';
import type { PurchaseDto, QuantityLineDto } from '@mantlet/common';
import { barLengths } from '../../ui/drawing/floor-bars.js';
import { hatchClass, scaleTop } from '../../ui/drawing/building-quantities.js';
import { orderLines } from './components/purchases.js';
import { byZone } from './measures.js';
import { readChoice, withSplit } from './pages/quantities-page.js';
import { inOrder, keyName, quantitiesHeading } from './quantity-words.js';

const line = (more: Partial<QuantityLineDto>): QuantityLineDto => ({
  levelId: 'L', zoneId: 'Z1', productId: 'P', kind: 'coating', thickness: 620, thicknessUnit: 'µm', layers: null, memberType: 'beam', profile: 'open', onSite: true, memberIds: [], marks: 1, pieces: 1, lengthM: '1',
  wetFilmUm: null, coats: null, spreadingRateM2PerL: null, missing: [], grossM2: '0', endLapM2: '0', openingM2: '0', coatBackM2: '0', netM2: '100.10', volumeM3: '0.0620', litres: '107.14', kg: '140.00', sheetM2: null,
  materialCost: null, labourCost: null, cost: null, ...more,
});
const board = line({ kind: 'board', productId: 'B', netM2: '20.00', litres: null, kg: null, sheetM2: '24.00', volumeM3: '0.4000' });
const purchase = (more: Partial<PurchaseDto>): PurchaseDto => ({ productId: 'P', levelId: null, kind: 'coating', litres: '107.14', containers: 6, containerL: 20, bags: null, bagKg: null, boards: [], missing: [], ...more });
const plan = { thicknessMm: 20, sheetLengthMm: 2500, sheetWidthMm: 1200, kerfMm: 4, sheets: 8, leastSheets: 7, usedM2: 20, sheetM2: 24, wasteFraction: 1 / 6, patterns: [] };
const noLitres = purchase({ litres: null, containers: null, missing: [{ code: 'product.supply-missing', params: { product: 'P', what: 'volume solids' } }] });

describe('the heading', () => {
  it('says what there is of each kind', () => {
    const boards = purchase({ productId: 'B', kind: 'board', litres: null, boards: [plan] });
    expect(quantitiesHeading({ lines: [line({}), board, line({ kind: 'spray', volumeM3: '21.3600' })], purchases: [purchase({}), boards] })).toBe('100 m² of coating, 108 L; 8 sheets of board; 21.4 m³ of spray');
  });
  it('leaves out litres it cannot justify, and says when there is nothing', () => {
    expect(quantitiesHeading({ lines: [line({})], purchases: [noLitres] })).toBe('100 m² of coating');
    expect(quantitiesHeading({ lines: [], purchases: [] })).toBe('Nothing to apply yet');
  });
});

describe('by zone', () => {
  const lines = [line({}), line({ netM2: '0.20', litres: '0.06' }), board, line({ zoneId: 'Z2', litres: null })];
  it('adds decimals exactly, over the lines the measure applies to', () => {
    expect(byZone(lines, 'area').get('Z1')).toBe('120.30');
    expect(byZone(lines, 'litres').get('Z1')).toBe('107.20');
  });
  it('has no number where one is missing, or none applies', () => {
    expect(byZone(lines, 'litres').get('Z2')).toBeNull();
    expect(byZone(lines, 'sheets').get('Z2')).toBeNull();
  });
  it('hatches closer for more, in fifths of the greatest', () => {
    expect([1, 20, 21, 99.9, 100].map((v) => hatchClass(v, 100))).toEqual([0, 0, 1, 4, 4]);
    expect([hatchClass(0, 100), hatchClass(null, 100), hatchClass(5, 0)]).toEqual([null, null, null]);
  });
});

describe('what to order', () => {
  it('counts packages, and gives a spray its volume', () => {
    const orders = orderLines({ names: { P: 'Coat', B: 'Board', S: 'Spray' }, lines: [line({ kind: 'spray', productId: 'S', volumeM3: '1.2500' })], purchases: [purchase({}), purchase({ productId: 'B', kind: 'board', litres: null, boards: [plan] }), purchase({ productId: 'S', kind: 'spray', litres: null, bags: 23, bagKg: 20 })] });
    expect(orders.map((o) => `${o.product}: ${o.what}, ${o.net.value} ${o.net.unit}`)).toEqual(['Coat: 6 containers, 107.14 L', 'Board: 8 sheets of 20 mm, 24.00 m²', 'Spray: 23 bags, 1.2500 m³']);
  });
  it('says why something cannot be ordered', () => expect(orderLines({ names: {}, lines: [], purchases: [noLitres] })[0]).toMatchObject({ what: '', reason: 'Not determined: P has no volume solids.' }));
});

describe('the split', () => {
  it('is read from the address, and nonsense is as nothing', () => {
    expect(readChoice(new URLSearchParams('rows=zone&columns=thickness&measure=litres'))).toEqual({ rows: 'zone', columns: 'thickness', delivery: 'project', measure: 'litres' });
    expect(readChoice(new URLSearchParams('rows=zone&columns=zone&measure=x'))).toEqual({ rows: 'level', columns: 'product', delivery: 'project', measure: 'area' });
  });
  it('swaps the two when one takes the other\'s key', () => {
    const choice = readChoice(new URLSearchParams());
    expect(withSplit(choice, 'rows', 'product')).toMatchObject({ rows: 'product', columns: 'level' });
    expect(withSplit(choice, 'rows', 'zone')).toMatchObject({ rows: 'zone', columns: 'product' });
  });
  it('names keys and sets thicknesses in order', () => {
    expect([keyName('level', 'L', { L: 'L1 First' }), keyName('member-type', 'tie', {}), keyName('application', 'off-site', {})]).toEqual(['L1 First', 'Tie or hanger', 'Off site']);
    expect(inOrder('thickness', ['25 mm', '1200 µm', '620 µm', '12 mm'])).toEqual(['620 µm', '1200 µm', '12 mm', '25 mm']);
  });
});

describe('the drawings of quantities', () => {
  it('take the least round scale of five steps that reaches the greatest amount', () => {
    expect([794, 1000, 1001, 0.37, 12, 0].map(scaleTop)).toEqual([1000, 1000, 1250, 0.5, 12.5, 0]);
  });
  it('leave every bar room for its figure, in proportion to the amounts', () => {
    const floors = [{ id: 'a', amount: 100 }, { id: 'b', amount: 50 }, { id: 'c', amount: null }].map((f) => ({ code: '', name: '', elevationM: 0, ...f }));
    expect([...barLengths(floors, 200, 42)]).toEqual([['a', 150], ['b', 75], ['c', 0]]);
    expect([...barLengths(floors, 20, 42).values()]).toEqual([0, 0, 0]);
  });
});
