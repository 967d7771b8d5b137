import { thicknessTableSchema } from '@mantlet/common';
import type { ReadTable } from '@mantlet/common';
import fc from 'fast-check';
import { Refusal } from '../../shared/refusal.js';
import { readThicknessTable } from './read-thickness-table.js';

const options: ReadTable = { shape: 'open', orientation: 'beam', periodMin: 60, kind: 'coating' };
const read = (rows: string[][], more: Partial<ReadTable> = {}): ReturnType<typeof readThicknessTable> => readThicknessTable('t.csv', { name: 't', rows }, { ...options, ...more });

describe('reading a thickness table', () => {
  it('takes the first row with numbers for the temperatures, below any title', () => {
    const { table } = read([['Invented coating', '', ''], ['R 60', 'beams', ''], ['Hp/A', '350', '450'], ['60', '500', '400'], ['120', '800', '700']]);
    expect(table).toMatchObject({ temperaturesC: [350, 450], sectionFactorsPerM: [60, 120], thickness: [[500, 400], [800, 700]] });
  });

  it.each<[string, Partial<ReadTable>, number]>([
    ['mm for a coating', { kind: 'coating', fileUnit: 'mm' }, 620],
    ['µm for a coating', { kind: 'coating', fileUnit: 'µm' }, 0.62],
    ['µm for a spray', { kind: 'spray', fileUnit: 'µm' }, 0.00062],
    ["the evidence's own unit", {}, 0.62],
  ])('brings thicknesses to the unit of the evidence: %s', (_, more, thickness) => {
    expect(read([['', '550'], ['100', '0.62']], more).table.thickness).toEqual([[thickness]]);
  });

  it('refuses a gap between temperatures, and rows without a section factor, by their cells', () => {
    const fail = (rows: string[][]): unknown => {
      try {
        return read(rows);
      } catch (error) {
        return (error as Refusal).getResponse();
      }
    };
    expect(fail([['', '350', '', '550'], ['60', '5', '4', '3']])).toMatchObject({ message: 'Cell C1 is empty; it must hold a temperature between 100 and 1200 °C.' });
    expect(fail([['', '350'], ['', '5']])).toMatchObject({ issues: [{ path: 'A2' }] });
    expect(fail([['', ...Array.from({ length: 61 }, (_, i) => String(200 + i))], ['60', '5']])).toMatchObject({ code: 'product.table-too-large' });
  });

  it('either refuses in words or gives a table that the contract accepts, whatever the cells hold', () => {
    const cell = fc.oneof(fc.string({ maxLength: 8 }), fc.double({ noNaN: true }).map(String), fc.integer({ min: 1, max: 1300 }).map(String), fc.constantFrom('', '-', '1,5', '1.250', '350 °C', '1e-320', '#REF!'));
    const rows = fc.array(fc.array(cell, { maxLength: 5 }), { maxLength: 6 });
    let tables = 0;
    const holds = (given: string[][]): void => {
      try {
        expect(thicknessTableSchema.safeParse(read(given).table).success).toBe(true);
        tables += 1;
      } catch (error) {
        if (!(error instanceof Refusal)) throw error;
      }
    };
    fc.assert(fc.property(rows, holds), { numRuns: 300 });
    // mostly numbers, so that some tables get through
    const number = fc.integer({ min: 100, max: 900 }).map(String);
    fc.assert(fc.property(fc.array(fc.tuple(number, number, number), { minLength: 2, maxLength: 4 }), holds), { numRuns: 100 });
    expect(tables).toBeGreaterThan(50);
  });
});
