import fc from 'fast-check';
import { cuttingPlan, firstFitDecreasing } from './cutting-plan.js';
import type { BoardPiece } from './cutting-plan.js';
import { faceWidths, facePieces, memberPieces } from './takeoff-boards.js';

const sheet = { lengthMm: 2500, widthMm: 1200 };
const allRound = { widthMm: 200, heightMm: 400, top: true, bottom: true, left: true, right: true };

/** First-fit decreasing as textbooks give it: one item at a time into the first bin with room. */
function oneByOne(sizes: number[], capacity: number, kerf: number): number {
  const rest: number[] = [];
  for (const size of [...sizes].sort((a, b) => b - a)) {
    const bin = rest.findIndex((r) => r + 1e-6 >= size + kerf);
    if (bin >= 0) rest[bin] = (rest[bin] as number) - size - kerf;
    else rest.push(capacity - size);
  }
  return rest.length;
}

describe('first-fit decreasing', () => {
  // 6 of 5 and 6 of 4 and 6 of 1 into 10: five and five, four and four with one and one over
  it('fills bins as by hand', () => {
    const bins = firstFitDecreasing([{ sizeMm: 5, count: 6, content: 'a' }, { sizeMm: 4, count: 6, content: 'b' }, { sizeMm: 1, count: 6, content: 'c' }], 10, 0);
    expect(bins.reduce((n, b) => n + b.count, 0)).toBe(6);
  });

  it('gives the number of bins of the textbook method, item by item', () => {
    fc.assert(fc.property(
      fc.uniqueArray(fc.record({ sizeMm: fc.integer({ min: 1, max: 100 }), count: fc.integer({ min: 1, max: 30 }) }), { minLength: 1, maxLength: 12, selector: (i) => i.sizeMm }),
      fc.constantFrom(0, 3), (items, kerf) => {
        const bins = firstFitDecreasing(items.map((i) => ({ ...i, content: i.sizeMm })), 100, kerf);
        expect(bins.reduce((n, b) => n + b.count, 0)).toBe(oneByOne(items.flatMap((i) => Array.from({ length: i.count }, () => i.sizeMm)), 100, kerf));
        const placed = new Map<number, number>();
        for (const b of bins) for (const c of b.contents) placed.set(c.content, (placed.get(c.content) ?? 0) + c.count * b.count);
        for (const i of items) expect(placed.get(i.sizeMm)).toBe(i.count);
      }), { numRuns: 150 });
  });
});

describe('cutting plan', () => {
  it('cuts four strips of 300 from a sheet of 1200 without kerf, three with one', () => {
    const pieces = [{ widthMm: 300, lengthMm: 2500, count: 12 }];
    expect(cuttingPlan(pieces, 20, sheet, 0)).toMatchObject({ sheets: 3, leastSheets: 3, sheetM2: 9, wasteFraction: 0 });
    const sawn = cuttingPlan(pieces, 20, sheet, 3);
    expect(sawn).toMatchObject({ sheets: 4, leastSheets: 3 });
    expect(sawn.wasteFraction).toBeCloseTo(0.25, 10);
  });

  it('shares strips between pieces of one width', () => {
    // 1500 + 1000 makes a strip; two strips of 600 make a sheet
    const plan = cuttingPlan([{ widthMm: 600, lengthMm: 1500, count: 2 }, { widthMm: 600, lengthMm: 1000, count: 2 }], 20, sheet, 0);
    expect(plan).toMatchObject({ sheets: 1, leastSheets: 1 });
  });

  it('refuses a piece that no sheet holds', () => expect(() => cuttingPlan([{ widthMm: 1300, lengthMm: 100, count: 1 }], 20, sheet, 0)).toThrow(RangeError));

  it('has a place for every piece, fits every sheet, and shows its waste', () => {
    const piece: fc.Arbitrary<BoardPiece> = fc.record({ widthMm: fc.integer({ min: 20, max: 1200 }), lengthMm: fc.integer({ min: 20, max: 2500 }), count: fc.integer({ min: 1, max: 20 }) });
    fc.assert(fc.property(fc.uniqueArray(piece, { minLength: 1, maxLength: 15, selector: (p) => `${p.widthMm}x${p.lengthMm}` }), fc.constantFrom(0, 4), (pieces, kerf) => {
      const plan = cuttingPlan(pieces, 20, sheet, kerf);
      const cut = new Map<string, number>();
      for (const pattern of plan.patterns) {
        const across = pattern.strips.reduce((sum, s) => sum + s.widthMm + kerf, -kerf);
        expect(across).toBeLessThanOrEqual(sheet.widthMm + 1e-6);
        for (const strip of pattern.strips) {
          expect(strip.pieces.reduce((sum, p) => sum + p.lengthMm + kerf, -kerf)).toBeLessThanOrEqual(sheet.lengthMm + 1e-6);
          for (const p of strip.pieces) {
            expect(p.widthMm).toBe(strip.widthMm);
            cut.set(`${p.widthMm}x${p.lengthMm}`, (cut.get(`${p.widthMm}x${p.lengthMm}`) ?? 0) + pattern.sheets);
          }
        }
      }
      for (const p of pieces) expect(cut.get(`${p.widthMm}x${p.lengthMm}`)).toBe(p.count);
      expect(plan.sheets).toBeGreaterThanOrEqual(plan.leastSheets);
      expect(plan.usedM2 + plan.wasteFraction * plan.sheetM2).toBeCloseTo(plan.sheetM2, 8);
    }), { numRuns: 100 });
  });
});

describe('boards round a box', () => {
  it('laps top and bottom over the sides, layer over layer', () => {
    expect(faceWidths(allRound, 0, 20)).toEqual([240, 240, 400, 400]);
    // the second layer encloses the first: 200 + 2·20 + 2·15, 400 + 2·20
    expect(faceWidths(allRound, 20, 15)).toEqual([270, 270, 440, 440]);
    expect(faceWidths({ ...allRound, top: false }, 20, 15)).toEqual([270, 420, 420]);
  });

  it('covers each face whole: along, across, or in panels', () => {
    const area = (pieces: BoardPiece[]) => pieces.reduce((sum, p) => sum + p.widthMm * p.lengthMm * p.count, 0);
    for (const faceMm of [300, 1200, 1500, 2500, 2600, 5200]) {
      const pieces = facePieces(faceMm, 6100, sheet);
      expect(area(pieces)).toBeCloseTo(faceMm * 6100, 3);
      for (const p of pieces) expect(p.widthMm <= sheet.widthMm + 1e-6 && p.lengthMm <= sheet.lengthMm + 1e-6).toBe(true);
    }
  });

  it('counts the pieces of a member', () => {
    const list = memberPieces({ box: allRound, layers: [20], lengthMm: 5100, quantity: 3 }, 50, sheet);
    // two whole sheets' lengths on each face, 3 members
    expect(list.entries()).toEqual([[20, [{ widthMm: 240, lengthMm: 2500, count: 12 }, { widthMm: 400, lengthMm: 2500, count: 12 }]]]);
  });
});
