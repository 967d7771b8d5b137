import { Decimal, productSupplySchema, quantityAmountKeys, sentence, splitKeys, sumDecimals } from '@mantlet/common';
import type { QuantityTotals, SectionOutline, SplitKey } from '@mantlet/common';
import fc from 'fast-check';
import { sectionOutline } from '../sections/index.js';
import { boxOf, girthGrowth, memberAreas, splitQuantities, takeoff, withMarkUp } from './takeoff.js';
import type { TakeoffMember, TakeoffOptions, TakeoffProduct } from './takeoff.js';
import { coatsNeeded, practicalLitres, spreadingRate, wetFilmThickness } from './takeoff-formulas.js';

const coating: TakeoffProduct = {
  id: 'c', name: 'Invented coating', kind: 'coating',
  supply: productSupplySchema.parse({ volumeSolidsPercent: 70, maxDftPerCoatUm: 500, densityKgPerL: 1.3, containerL: 25, lossFraction: 0.2, materialRate: '9.35', labourRate: '14.20' }),
};
const board: TakeoffProduct = {
  id: 'b', name: 'Invented board', kind: 'board',
  supply: productSupplySchema.parse({ sheetLengthMm: 2500, sheetWidthMm: 1200, materialRate: '31.15', labourRate: '42' }),
};
const spray: TakeoffProduct = {
  id: 's', name: 'Invented spray', kind: 'spray',
  supply: productSupplySchema.parse({ bagKg: 20, bagYieldM3: 0.055, lossFraction: 0.1, materialRate: '410', labourRate: '11.5' }),
};
const options: TakeoffOptions = { deductions: { endLapMm: 0, openingThresholdM2: 0.1, coatBackMm: 500 }, delivery: 'project', kerfMm: 3, moneyPlaces: 2 };
const member: TakeoffMember = {
  id: 'm', mark: 'B1', levelId: 'L1', zoneId: 'Z1', productId: 'c', memberType: 'beam', group: 'open', onSite: true, quantity: 10, lengthMm: 10_000,
  coatedGirthMm: 1000, box: null, thickness: 600, layers: null, coatBackConnections: 0, coatBackGirthMm: 0, deductionM2: 0,
};
const box = { widthMm: 200, heightMm: 300, top: false, bottom: true, left: true, right: true };
const boarded: TakeoffMember = { ...member, productId: 'b', coatedGirthMm: 800, box, thickness: 20, layers: [20], quantity: 3, lengthMm: 6000 };

describe('coating arithmetic', () => {
  // 600 µm at 70 % volume solids: 1.167 m²/L; 100 m² with 20 % loss: 107.14 L. Common practice of the coating trade; computed twice over.
  it('spreads 10·VS/DFT', () => expect(spreadingRate.evaluate({ volumeSolidsPercent: 70, dryFilmUm: 600 })).toBeCloseTo(1.167, 3));
  it('needs A·DFT/(10·VS)/(1 − loss)', () => expect(practicalLitres.evaluate({ areaM2: 100, dryFilmUm: 600, volumeSolidsPercent: 70, lossFraction: 0.2 })).toBeCloseTo(107.14, 2));
  it('goes on wet as DFT·100/VS', () => expect(wetFilmThickness.evaluate({ dryFilmUm: 600, volumeSolidsPercent: 70 })).toBeCloseTo(857.14, 2));
  it('takes as many coats as the greatest film asks', () => {
    expect([499, 500, 501, 1500].map((dryFilmUm) => coatsNeeded.evaluate({ dryFilmUm, greatestPerCoatUm: 500 }))).toEqual([1, 1, 2, 3]);
  });
});

describe('a printed line', () => {
  it('shows 100 m² of 600 µm: litres, containers, film, coats, mass, money', () => {
    const { lines, purchases } = takeoff([member], [coating], options);
    expect(lines).toHaveLength(1);
    expect(lines[0]).toMatchObject({
      grossM2: '100.00', netM2: '100.00', volumeM3: '0.0600', litres: '107.14', kg: '139.28', wetFilmUm: '858', coats: 2, spreadingRateM2PerL: '1.167',
      // 107.14 × 9.35 = 1001.759; 100 × 14.20
      materialCost: '1001.76', labourCost: '1420.00', cost: '2421.76', sheetM2: null, lengthM: '100.00', pieces: 10, marks: 1, missing: [],
    });
    expect(purchases[0]).toMatchObject({ litres: '107.14', containers: 5, containerL: 25 });
  });

  it('shows gross, end laps, openings and coat-back, each by itself', () => {
    const areas = memberAreas({ ...member, quantity: 2, coatBackConnections: 3, coatBackGirthMm: 600, deductionM2: 0.4 }, { endLapMm: 100, openingThresholdM2: 0.1, coatBackMm: 450 });
    // 2 × (10.0 − 2 × 0.1 × 1.0 − 0.4 + 3 × 0.45 × 0.6)
    expect(areas.grossM2).toBeCloseTo(20, 10);
    expect(areas.endLapM2).toBeCloseTo(0.4, 10);
    expect(areas.openingM2).toBeCloseTo(0.8, 10);
    expect(areas.coatBackM2).toBeCloseTo(1.62, 10);
    expect(areas.netM2).toBeCloseTo(20.42, 10);
  });

  it('leaves small openings in, never deducts more than there is, and takes the own girth where none is given', () => {
    expect(memberAreas({ ...member, deductionM2: 0.09 }, options.deductions).openingM2).toBe(0);
    expect(memberAreas({ ...member, deductionM2: 99 }, options.deductions).netM2).toBe(0);
    expect(memberAreas({ ...member, coatBackConnections: 1 }, options.deductions).coatBackM2).toBeCloseTo(10 * 0.5, 10);
  });

  it('counts bags of spray with loss', () => {
    const { lines, purchases } = takeoff([{ ...member, productId: 's', thickness: 25 }], [spray], options);
    // 100 m² × 25 mm = 2.5 m³; ÷ 0.9 = 2.7778 m³; ÷ 0.055 = 50.5 bags
    expect(lines[0]).toMatchObject({ volumeM3: '2.5000', kg: '1010.10', materialCost: '1138.90' });
    expect(purchases[0]).toMatchObject({ bags: 51, bagKg: 20 });
  });

  it('measures boards by the outer girth and buys whole sheets', () => {
    const { lines, purchases } = takeoff([boarded], [board], options);
    // three sides: 800 + 4 × 20 mm of girth × 6 m × 3
    expect(lines[0]?.netM2).toBe('15.84');
    const plan = purchases[0]?.boards[0];
    expect(plan?.sheets).toBeGreaterThanOrEqual(plan?.leastSheets ?? Infinity);
    expect(lines[0]?.sheetM2).toBe(((plan?.sheets ?? 0) * 3).toFixed(2));
    expect(lines[0]?.materialCost).toBe(new Decimal(lines[0]?.sheetM2 ?? 0).times('31.15').toFixed(2));
  });

  it('rounds containers up once a delivery, not once a line or member', () => {
    const members = [1, 2, 3].map((n) => ({ ...member, id: `m${n}`, levelId: `L${n}`, quantity: 1, lengthMm: 1000 }));
    expect(takeoff(members, [coating], options).purchases.map((p) => p.containers)).toEqual([1]);
    expect(takeoff(members, [coating], { ...options, delivery: 'level' }).purchases.map((p) => p.containers)).toEqual([1, 1, 1]);
  });

  it('says what a product lacks instead of counting nothing', () => {
    const bare: TakeoffProduct = { ...coating, supply: productSupplySchema.parse({}) };
    const { lines, purchases } = takeoff([member], [bare], options);
    expect(lines[0]).toMatchObject({ netM2: '100.00', litres: null, kg: null, cost: null });
    expect(lines[0]?.missing.map(sentence)).toContain('Not determined: Invented coating has no volume solids.');
    expect(purchases[0]).toMatchObject({ litres: null, containers: null });
    const total = splitQuantities(lines, 'level', 'zone').total;
    expect(total).toMatchObject({ litres: null, cost: null, netM2: '100.00' });
    const unboxed = takeoff([{ ...boarded, box: null }], [board], options);
    expect(unboxed.lines[0]?.sheetM2).toBeNull();
    expect(unboxed.purchases[0]?.missing.map(sentence)[0]).toMatch(/B1 has no box sides/);
  });

  it('adds a mark-up to the printed total', () => {
    expect(withMarkUp('2421.76', '12.5', 2)).toEqual({ markUp: '302.72', total: '2724.48' });
    expect(withMarkUp(null, '12.5', 2)).toEqual({ markUp: null, total: null });
  });
});

describe('the box of a drawing', () => {
  it.each<[Parameters<typeof sectionOutline>[1]['arrangement'], number]>([['four-sides', 8], ['three-sides', 4]])('grows by the corners that are covered: %s', (arrangement, growth) => {
    const outline: SectionOutline = sectionOutline({ kind: 'i', hMm: 300, bMm: 150, twMm: 7.1, tfMm: 10.7, rootRadiusMm: 15 }, { arrangement, reason: '' }, 'boxed');
    const found = boxOf(outline);
    expect(found).toMatchObject({ widthMm: 150, heightMm: 300, bottom: true, left: true, right: true, top: arrangement === 'four-sides' });
    expect(girthGrowth(found)).toBe(growth);
  });
  it('has none where protection follows the profile', () => {
    expect(boxOf(sectionOutline({ kind: 'round', dMm: 50 }, { arrangement: 'four-sides', reason: '' }, 'profile'))).toBeNull();
    expect(girthGrowth(null)).toBe(0);
  });
});

const memberArbitrary: fc.Arbitrary<TakeoffMember> = fc.record({
  level: fc.constantFrom('L1', 'L2', 'L3'), zone: fc.constantFrom('Z1', 'Z2'), product: fc.constantFrom(coating, board, spray),
  memberType: fc.constantFrom('beam', 'column', 'bracing' as const), group: fc.constantFrom('open', 'hollow-rectangular', 'hollow-circular' as const), onSite: fc.boolean(),
  quantity: fc.integer({ min: 1, max: 12 }), lengthMm: fc.double({ min: 300, max: 14_000, noNaN: true }), girth: fc.double({ min: 150, max: 2400, noNaN: true }),
  step: fc.integer({ min: 1, max: 4 }), connections: fc.integer({ min: 0, max: 4 }), deduction: fc.double({ min: 0, max: 0.5, noNaN: true }),
}).map((r) => ({
  id: 'x', mark: 'X', levelId: r.level, zoneId: r.zone, productId: r.product.id, memberType: r.memberType, group: r.group, onSite: r.onSite,
  quantity: r.quantity, lengthMm: r.lengthMm, coatedGirthMm: r.girth, box: r.product.kind === 'board' ? box : null,
  thickness: r.product.kind === 'coating' ? r.step * 317 : r.step * 10, layers: r.product.kind === 'board' ? [r.step * 10] : null,
  coatBackConnections: r.connections, coatBackGirthMm: 400, deductionM2: r.deduction,
}));

describe('splits', () => {
  const keys = fc.constantFrom(...splitKeys);
  const same = (a: QuantityTotals, parts: QuantityTotals[]) => {
    for (const key of quantityAmountKeys) {
      const applicable = parts.map((p) => p[key]).filter((v) => v !== null);
      expect(applicable.length > 0).toBe(a[key] !== null);
      if (a[key] !== null) expect(sumDecimals(applicable).equals(a[key])).toBe(true);
    }
    expect(parts.reduce((n, p) => n + p.pieces, 0)).toBe(a.pieces);
  };

  it('sum to the same total whichever way, down to the last digit', () => {
    fc.assert(fc.property(fc.array(memberArbitrary, { minLength: 1, maxLength: 40 }), keys, keys, fc.constantFrom('project', 'level' as const), (members, rows, columns, delivery) => {
      const { lines } = takeoff(members, [coating, board, spray], { ...options, delivery });
      const split = splitQuantities(lines, rows, columns as SplitKey);
      const other = splitQuantities(lines, columns, rows);
      expect(other.total).toEqual(split.total);
      same(split.total, split.rows.map((r) => r.totals));
      same(split.total, split.columns.map((c) => c.totals));
      same(split.total, split.cells.map((c) => c.totals));
      for (const row of split.rows) same(row.totals, split.cells.filter((c) => c.row === row.key).map((c) => c.totals));
      for (const key of quantityAmountKeys) {
        const printed = lines.map((l) => l[key]).filter((v) => v !== null);
        if (split.total[key] !== null && printed.length > 0) expect(sumDecimals(printed).equals(split.total[key])).toBe(true);
      }
    }), { numRuns: 60 });
  });

  it('prices boards with their waste: the shares of the lines are the sheets bought', () => {
    fc.assert(fc.property(fc.array(memberArbitrary, { minLength: 1, maxLength: 30 }), (members) => {
      const { lines, purchases } = takeoff(members, [coating, board, spray], options);
      const bought = purchases.flatMap((p) => p.boards).reduce((sum, b) => sum.plus(b.sheets * 3), new Decimal(0));
      expect(sumDecimals(lines.map((l) => l.sheetM2 ?? 0)).equals(bought)).toBe(true);
    }), { numRuns: 40 });
  });

  it('adds up across as well: gross − laps − openings + coat-back = net', () => {
    fc.assert(fc.property(fc.array(memberArbitrary, { minLength: 1, maxLength: 20 }), (members) => {
      for (const l of takeoff(members, [coating, board, spray], { ...options, deductions: { ...options.deductions, endLapMm: 20 } }).lines) {
        expect(new Decimal(l.grossM2).minus(l.endLapM2).minus(l.openingM2).plus(l.coatBackM2).equals(l.netM2)).toBe(true);
      }
    }), { numRuns: 40 });
  });
});
