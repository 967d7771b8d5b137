import fc from 'fast-check';
import type { Exposure, OutlineSegment, SectionShape } from '@mantlet/common';
import { exposureArrangements, faceNames } from '@mantlet/common';
import { sectionOutline } from './outline.js';
import { sectionProperties } from './properties.js';
import { sectionFactor } from './section-factor.js';

/** Dimensions by ratio, so that every shape that comes out can be made. */
const ratio = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const size = fc.double({ min: 40, max: 1200, noNaN: true });
const shapes: fc.Arbitrary<SectionShape> = fc.oneof(
  fc.tuple(size, ratio(0.3, 1.1), ratio(0.02, 0.1), ratio(0.02, 0.15), ratio(0, 0.1)).map(([h, b, w, f, r]): SectionShape =>
    ({ kind: 'i', hMm: h, bMm: h * b, twMm: h * b * w, tfMm: h * f, rootRadiusMm: h * b * r })),
  fc.tuple(size, ratio(0.3, 1), ratio(0.3, 1), ratio(0.02, 0.1), ratio(0.02, 0.2)).map(([h, b, c, w, f]): SectionShape =>
    ({ kind: 'i-unequal', hMm: h, twMm: h * 0.2 * w, topWidthMm: h * b, topThicknessMm: h * f, bottomWidthMm: h * c, bottomThicknessMm: h * f * 0.7, rootRadiusMm: 0 })),
  fc.tuple(size, ratio(0.3, 0.5), ratio(0, 1), ratio(0, 0.08)).map(([h, b, r, slope]): SectionShape =>
    ({ kind: 'channel', hMm: h, bMm: h * b, twMm: h * 0.04, tfMm: h * 0.06, rootRadiusMm: h * 0.06 * r, toeRadiusMm: h * 0.02 * r, flangeSlope: slope })),
  fc.tuple(size, ratio(0.4, 1.5), ratio(0, 0.1)).map(([h, b, r]): SectionShape =>
    ({ kind: 'tee', hMm: h, bMm: h * b, twMm: h * b * 0.05, tfMm: h * 0.08, rootRadiusMm: h * Math.min(b, 1) * r })),
  fc.tuple(size, ratio(0.5, 1), ratio(0.06, 0.12), ratio(0, 1.2)).map(([h, b, t, r]): SectionShape =>
    ({ kind: 'angle', hMm: h, bMm: h * b, tMm: h * b * t, rootRadiusMm: h * b * t * r, toeRadiusMm: h * b * t * r * 0.5 })),
  fc.tuple(size, ratio(0.4, 1), ratio(0.02, 0.1)).map(([h, b, t]): SectionShape =>
    ({ kind: 'rectangular-hollow', hMm: h, bMm: h * b, tMm: h * b * t, outerRadiusMm: 1.5 * h * b * t, innerRadiusMm: h * b * t })),
  fc.tuple(size, ratio(0.01, 0.3)).map(([d, t]): SectionShape => ({ kind: 'circular-hollow', dMm: d, tMm: d * t })),
  fc.tuple(size, ratio(0.4, 1), ratio(0.4, 0.9)).map(([h, b, c]): SectionShape =>
    ({ kind: 'box', hMm: h, bMm: h * b, twMm: h * b * 0.05, tfMm: h * 0.05, clearWidthMm: h * b * c })),
  fc.tuple(size, ratio(0.05, 0.5)).map(([h, t]): SectionShape => ({ kind: 'flat', hMm: h, tMm: h * t })),
  size.map((d): SectionShape => ({ kind: 'round', dMm: d })),
);
const exposures: fc.Arbitrary<Exposure> = fc.record({
  arrangement: fc.constantFrom(...exposureArrangements),
  faces: fc.subarray([...faceNames], { minLength: 1 }),
  reason: fc.constant(''),
});
const all: Exposure = { arrangement: 'four-sides', reason: '' };

/** Points along a segment, so that an arc becomes a fine polygon. */
function points(s: OutlineSegment): [number, number][] {
  if (!s.arc) return [s.from];
  const [cx, cy] = s.arc.centre;
  const start = Math.atan2(s.from[1] - cy, s.from[0] - cx);
  let sweep = Math.atan2(s.to[1] - cy, s.to[0] - cx) - start;
  if (s.arc.anticlockwise && sweep <= 0) sweep += 2 * Math.PI;
  if (!s.arc.anticlockwise && sweep >= 0) sweep -= 2 * Math.PI;
  const radius = s.arc.radiusMm;
  return Array.from({ length: 64 }, (_, i) => [cx + radius * Math.cos(start + (sweep * i) / 64), cy + radius * Math.sin(start + (sweep * i) / 64)]);
}
function polygonArea(loop: OutlineSegment[]): number {
  const p = loop.flatMap(points);
  return p.reduce((sum, [x, y], i) => sum + x * p[(i + 1) % p.length]![1] - p[(i + 1) % p.length]![0] * y, 0) / 2;
}
const total = (segments: OutlineSegment[], keep: (s: OutlineSegment) => boolean = () => true) =>
  segments.filter(keep).reduce((sum, s) => sum + s.lengthMm, 0);

describe('outline', () => {
  it('is closed, fills its box, and encloses the area and the perimeter of the properties', () => {
    fc.assert(fc.property(shapes, (shape) => {
      const properties = sectionProperties(shape);
      const outline = sectionOutline(shape, all, 'profile');
      for (const loop of outline.loops) {
        loop.forEach((s, i) => {
          const next = loop[(i + 1) % loop.length]!;
          expect(Math.hypot(next.from[0] - s.to[0], next.from[1] - s.to[1])).toBeLessThan(1e-6);
          if (s.arc) expect(Math.hypot(s.to[0] - s.arc.centre[0], s.to[1] - s.arc.centre[1])).toBeCloseTo(s.arc.radiusMm, 6);
        });
      }
      expect(outline.loops.reduce((sum, loop) => sum + polygonArea(loop), 0) / properties.areaMm2).toBeCloseTo(1, 2);
      expect(total(outline.loops[0]!) / properties.perimeterMm).toBeCloseTo(1, 9);
      const xs = outline.loops[0]!.flatMap(points).map(([x]) => x);
      expect(Math.max(...xs) - Math.min(...xs)).toBeCloseTo(outline.widthMm, 4);
    }), { numRuns: 150 });
  });

  it('sums to the heated perimeter and coated girth of the section factor, profile or boxed', () => {
    fc.assert(fc.property(shapes, exposures, fc.constantFrom('profile' as const, 'boxed' as const), (shape, exposure, form) => {
      const factor = sectionFactor(shape, sectionProperties(shape), exposure, form);
      if (!factor.ok) {
        expect(factor.reason.code).toBe('section.web-filled');
        expect(() => sectionOutline(shape, exposure, form)).toThrow();
        return;
      }
      const outline = sectionOutline(shape, exposure, form);
      const drawn = [...outline.loops.flat(), ...(outline.box ?? [])];
      expect(total(drawn, (s) => s.heated)).toBeCloseTo(factor.value.heatedPerimeterMm, 6);
      expect(total(drawn, (s) => s.coated)).toBeCloseTo(factor.value.coatedGirthMm, 6);
      expect(factor.value.heatedPerimeterMm).toBeGreaterThan(0);
      expect(outline.loops.slice(1).flat().some((s) => s.heated || s.coated)).toBe(false);
      expect(outline.box === null).toBe(form === 'profile');
    }), { numRuns: 300 });
  });

  it('heats no less when more faces see fire, and all of it when all do', () => {
    const heated = (shape: SectionShape, exposure: Exposure, form: 'profile' | 'boxed') => {
      const f = sectionFactor(shape, sectionProperties(shape), exposure, form);
      return f.ok ? f.value.heatedPerimeterMm : NaN;
    };
    const form = fc.constantFrom('profile' as const, 'boxed' as const);
    fc.assert(fc.property(shapes, fc.subarray([...faceNames], { minLength: 1 }), fc.constantFrom(...faceNames), form, (shape, faces, extra, how) => {
      const given = (f: typeof faces): Exposure => ({ arrangement: 'given-faces', faces: f, reason: '' });
      expect(heated(shape, given([...faces, extra]), how)).toBeGreaterThanOrEqual(heated(shape, given(faces), how) - 1e-9);
      expect(heated(shape, given([...faceNames]), how)).toBeCloseTo(heated(shape, all, how), 9);
      const three = heated(shape, { arrangement: 'three-sides', reason: '' }, how);
      const circle = shape.kind === 'round' || shape.kind === 'circular-hollow';
      if (circle && how === 'profile') expect(three).toBeCloseTo(heated(shape, all, how), 9);
      else expect(three).toBeLessThan(heated(shape, all, how));
    }), { numRuns: 200 });
  });
});

describe('properties of any shape', () => {
  it('order as mechanics demands: plastic above elastic, both inertias positive, shear area within the area', () => {
    fc.assert(fc.property(shapes, (shape) => {
      const p = sectionProperties(shape);
      expect(p.wplYMm3).toBeGreaterThan(p.welYMm3);
      expect(p.wplZMm3).toBeGreaterThan(p.welZMm3);
      expect(p.shearAreaZMm2).toBeLessThanOrEqual(p.areaMm2 * (1 + 1e-12));
      expect(p.shearAreaZMm2).toBeGreaterThan(0);
      // no closed or solid bar twists less than its polar moment allows
      if (p.itMm4 !== null) expect(p.itMm4).toBeLessThanOrEqual((p.iyMm4 + p.izMm4) * (1 + 1e-9));
    }), { numRuns: 150 });
  });

  it('scale with the size: area by the square, inertia by the fourth power', () => {
    fc.assert(fc.property(shapes, (shape) => {
      const doubled = Object.fromEntries(Object.entries(shape).map(([k, v]) => [k, k.endsWith('Mm') ? 2 * (v as number) : v])) as SectionShape;
      // a channel measures its flange elsewhere beyond 300 mm, so it does not scale across that depth
      if (shape.kind === 'channel' && shape.hMm <= 300 && 2 * shape.hMm > 300) return;
      const [one, two] = [sectionProperties(shape), sectionProperties(doubled)];
      expect(two.areaMm2 / one.areaMm2).toBeCloseTo(4, 8);
      expect(two.iyMm4 / one.iyMm4).toBeCloseTo(16, 7);
      expect(two.wplZMm3 / one.wplZMm3).toBeCloseTo(8, 6);
      if (one.itMm4 !== null) expect(two.itMm4! / one.itMm4).toBeCloseTo(16, 8);
      if (one.iwMm6 !== null) expect(two.iwMm6! / one.iwMm6).toBeCloseTo(64, 6);
    }), { numRuns: 100 });
  });
});
