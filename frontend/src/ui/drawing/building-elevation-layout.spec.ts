import { describe, expect, it } from 'vitest';
import { fitText, layoutElevation, widthsByArea } from './building-elevation-layout.js';
import type { ElevationLevel } from './building-elevation-layout.js';

const zone = (id: string, protectedAreaM2: number, members = 10, open = 0) =>
  ({ id, code: id, name: `Zone ${id}`, periodMin: 60, protectedAreaM2, members, settled: members - open, open, issuedMembers: 0 });
const level = (id: string, elevationM: number, heightM: number, zones: ElevationLevel['zones']): ElevationLevel =>
  ({ id, code: id, name: id, elevationM, heightM, zones });
const house = [
  level('B1', -4.5, 4.5, [zone('a', 640, 20, 5)]),
  level('L0', 0, 4.2, [zone('b', 390), zone('c', 160)]),
  level('L1', 4.2, 4.2, [zone('d', 5), zone('e', 900), zone('f', 45)]),
  level('L2', 8.4, 3, [zone('g', 120)]),
];

describe('widthsByArea', () => {
  it('follows the areas where every part is wide enough', () => {
    expect(widthsByArea([300, 100], 800)).toEqual([600, 200]);
  });
  it('keeps a least width and shares the rest by area', () => {
    const [small, middle, large] = widthsByArea([1, 100, 300], 662, 62);
    expect(small).toBe(62);
    expect(middle).toBeCloseTo(150);
    expect(large).toBeCloseTo(450);
  });
  it('shares equally what has no area, and what cannot fit its least width', () => {
    expect(widthsByArea([0, 0], 400)).toEqual([200, 200]);
    expect(widthsByArea([1, 2, 3, 4], 100, 62)).toEqual([25, 25, 25, 25]);
  });
  it('always fills the width exactly', () => {
    for (const areas of [[1, 5, 900, 3], [0, 10], [7], [1e6, 1e-6, 3]]) {
      expect(widthsByArea(areas, 640).reduce((a, b) => a + b, 0)).toBeCloseTo(640, 6);
    }
  });
});

describe('layoutElevation', () => {
  it.each([340, 760, 1200])('puts no zone over another and none outside the plot at %i px', (width) => {
    const { boxes, plotLeft, plotWidth } = layoutElevation(house, width);
    expect(boxes).toHaveLength(7);
    for (const [i, a] of boxes.entries()) {
      expect(a.x).toBeGreaterThanOrEqual(plotLeft - 1e-6);
      expect(a.x + a.width).toBeLessThanOrEqual(plotLeft + plotWidth + 1e-6);
      for (const b of boxes.slice(i + 1)) {
        const apart = a.x + a.width <= b.x + 1e-6 || b.x + b.width <= a.x + 1e-6 || a.y + a.height <= b.y + 1e-6 || b.y + b.height <= a.y + 1e-6;
        expect(apart, `${a.zone.id} and ${b.zone.id}`).toBe(true);
      }
    }
  });
  it('draws all heights to one scale, upwards', () => {
    const { boxes, pxPerM, groundY } = layoutElevation(house, 760);
    const box = (id: string) => boxes.find((b) => b.zone.id === id);
    expect(box('a')?.height).toBeCloseTo(4.5 * pxPerM);
    expect(box('g')?.height).toBeCloseTo(3 * pxPerM);
    expect(box('g')!.y).toBeLessThan(box('b')!.y);
    expect(groundY).toBeCloseTo(box('a')!.y);
  });
  it('draws a level of little area narrower, the others over the whole width', () => {
    const { boxes, plotWidth } = layoutElevation(house, 760);
    expect(boxes.find((b) => b.zone.id === 'g')!.width).toBeLessThan(plotWidth * 0.5);
    expect(boxes.find((b) => b.zone.id === 'a')!.width).toBeCloseTo(plotWidth);
  });
  it('shows the shares of members that are settled and open', () => {
    const a = layoutElevation(house, 760).boxes.find((b) => b.zone.id === 'a')!;
    expect(a.settledWidth / a.width).toBeCloseTo(0.75);
    expect(a.openWidth / a.width).toBeCloseTo(0.25);
  });
  it('puts two wings of one elevation side by side, and ends a storey at the next floor', () => {
    const { boxes } = layoutElevation([level('A', 0, 6, [zone('a', 10)]), level('B', 0, 4, [zone('b', 10)]), level('C', 4, 4, [zone('c', 10)])], 760);
    const [a, b, c] = boxes;
    expect(a!.y).toBe(b!.y);
    expect(a!.x + a!.width).toBeCloseTo(b!.x);
    expect(c!.y + c!.height).toBeCloseTo(a!.y);
  });
  it('keeps level marks apart and copes with no level at all', () => {
    const many = Array.from({ length: 30 }, (_, i) => level(`L${i}`, i * 0.5, 0.5, []));
    const labels = layoutElevation(many, 760).marks.map((m) => m.labelY);
    labels.slice(1).forEach((y, i) => expect(y - labels[i]!).toBeGreaterThanOrEqual(15));
    expect(layoutElevation([], 760)).toMatchObject({ boxes: [], marks: [], groundY: null });
  });
});

describe('fitText', () => {
  it('cuts with an ellipsis, or leaves out what would say nothing', () => {
    expect(fitText('Reading rooms', 400, 12)).toBe('Reading rooms');
    expect(fitText('Reading rooms', 60, 12)).toBe('Reading…');
    expect(fitText('Reading rooms', 10, 12)).toBe('');
  });
});
