import { describe, expect, it } from 'vitest';
import type { OutlineSegment, SectionShape } from '@mantlet/common';
import { loopPath, markedLength, placeSection, runPath, stretches, sweptAngle } from './section-path.js';
import { shapePreview } from './shape-preview.js';

const arc = (from: [number, number], to: [number, number], anticlockwise: boolean, radiusMm = 10, centre: [number, number] = [0, 0]): OutlineSegment =>
  ({ from, to, arc: { centre, radiusMm, anticlockwise }, lengthMm: 1, heated: false, coated: false });
const line = (from: [number, number], to: [number, number], heated = false): OutlineSegment =>
  ({ from, to, lengthMm: Math.hypot(to[0] - from[0], to[1] - from[1]), heated, coated: heated });
const place = placeSection(2, 100, 100);

describe('arcs', () => {
  it('sweeps by its direction, not by the shorter way', () => {
    expect(sweptAngle(arc([10, 0], [0, 10], true))).toBeCloseTo(Math.PI / 2);
    expect(sweptAngle(arc([10, 0], [0, 10], false))).toBeCloseTo((3 * Math.PI) / 2);
    expect(sweptAngle(arc([10, 0], [10, 0], true))).toBeCloseTo(2 * Math.PI);
  });
  it('turns over with the y axis: anticlockwise is SVG sweep 0, the long way round sets the large flag', () => {
    expect(runPath([arc([10, 0], [0, 10], true)], place)).toBe('M120 100A20 20 0 0 0 100 80');
    expect(runPath([arc([10, 0], [0, 10], false)], place)).toBe('M120 100A20 20 0 1 1 100 80');
  });
  it('draws a whole circle as two halves, since SVG draws none from a point to itself', () => {
    expect(loopPath([arc([10, 0], [10, 0], true)], place)).toBe('M120 100A20 20 0 0 0 80 100A20 20 0 0 0 120 100Z');
  });
});

describe('stretches', () => {
  const square = (marks: boolean[]) => [line([0, 0], [1, 0], marks[0]), line([1, 0], [1, 1], marks[1]), line([1, 1], [0, 1], marks[2]), line([0, 1], [0, 0], marks[3])];
  const heated = (s: OutlineSegment) => s.heated;
  it('joins a stretch over the seam of the loop', () => {
    const found = stretches(square([true, true, false, true]), heated);
    expect(found).toHaveLength(1);
    expect(found[0]?.segments.map((s) => s.from)).toEqual([[0, 1], [0, 0], [1, 0]]);
  });
  it('keeps apart what is apart, and closes what is whole', () => {
    expect(stretches(square([true, false, true, false]), heated)).toHaveLength(2);
    expect(stretches(square([true, true, true, true]), heated)).toMatchObject([{ closed: true }]);
    expect(stretches(square([false, false, false, false]), heated)).toEqual([]);
  });
  it('adds up the marked lengths only', () => {
    expect(markedLength([square([true, false, true, false])], heated)).toBe(2);
  });
});

describe('shapePreview', () => {
  const shapes: [string, SectionShape, number][] = [
    // outer perimeters by the formulas of the shapes: 2h + 4b - 2tw - (8 - 2π)r, less nothing; πd; 2(h + b) - (8 - 2π)r; rectangles
    ['I', { kind: 'i', hMm: 300, bMm: 150, twMm: 7.1, tfMm: 10.7, rootRadiusMm: 15 }, 2 * 300 + 4 * 150 - 2 * 7.1 - (8 - 2 * Math.PI) * 15],
    ['circular hollow', { kind: 'circular-hollow', dMm: 168.3, tMm: 6.3 }, Math.PI * 168.3],
    ['rectangular hollow', { kind: 'rectangular-hollow', hMm: 150, bMm: 100, tMm: 6.3, outerRadiusMm: 9.45, innerRadiusMm: 6.3 }, 2 * 250 - (8 - 2 * Math.PI) * 9.45],
    ['flat', { kind: 'flat', hMm: 200, tMm: 20 }, 440],
  ];
  const arcLength = (s: OutlineSegment) => (s.arc ? sweptAngle(s) * s.arc.radiusMm : s.lengthMm);
  it.each(shapes)('%s: the outer loop closes and is as long as the shape says', (_, shape, perimeter) => {
    const [outer] = shapePreview(shape)?.loops ?? [];
    expect(outer).toBeDefined();
    for (const [i, s] of (outer ?? []).entries()) {
      const next = outer?.[(i + 1) % outer.length];
      expect(s.to[0]).toBeCloseTo(next?.from[0] ?? NaN, 6);
      expect(s.to[1]).toBeCloseTo(next?.from[1] ?? NaN, 6);
    }
    expect((outer ?? []).reduce((sum, s) => sum + arcLength(s), 0)).toBeCloseTo(perimeter, 6);
  });
  it('draws nothing where a dimension is no number, and marks nothing as heated', () => {
    expect(shapePreview({ kind: 'flat', hMm: 0, tMm: 20 })).toBeNull();
    expect(shapePreview({ kind: 'i', hMm: 300, bMm: 150, twMm: Number.NaN, tfMm: 10, rootRadiusMm: 0 })).toBeNull();
    expect(shapePreview({ kind: 'round', dMm: 40 })?.loops.flat().some((s) => s.heated)).toBe(false);
  });
});
