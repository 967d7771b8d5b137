import type { SectionShape } from '@mantlet/common';
import { sentence } from '@mantlet/common';
import { determineSectionProperties, sectionProperties } from './properties.js';
import { shapeFault } from './shape-fault.js';

const ipe300: SectionShape = { kind: 'i', hMm: 300, bMm: 150, twMm: 7.1, tfMm: 10.7, rootRadiusMm: 15 };

describe('sectionProperties', () => {
  it('meets the closed forms of a circle and a rectangle (any textbook of mechanics)', () => {
    const round = sectionProperties({ kind: 'round', dMm: 60 });
    expect(round.areaMm2).toBeCloseTo((Math.PI * 60 ** 2) / 4, 8);
    expect(round.iyMm4 / ((Math.PI * 60 ** 4) / 64)).toBeCloseTo(1, 9);
    expect(round.izMm4 / round.iyMm4).toBeCloseTo(1, 9);
    expect(round.wplYMm3 / (60 ** 3 / 6)).toBeCloseTo(1, 9);
    expect(round.itMm4! / ((Math.PI * 60 ** 4) / 32)).toBeCloseTo(1, 9);
    const flat = sectionProperties({ kind: 'flat', hMm: 200, tMm: 12 });
    expect(flat.welYMm3).toBeCloseTo((12 * 200 ** 2) / 6, 8);
    expect(flat.wplZMm3).toBeCloseTo((200 * 12 ** 2) / 4, 8);
    expect(flat.perimeterMm).toBeCloseTo(424, 10);
  });

  it('counts each fillet as r²(1 − π/4)', () => {
    const p = sectionProperties(ipe300);
    expect(p.areaMm2).toBeCloseTo(2 * 150 * 10.7 + (300 - 2 * 10.7) * 7.1 + (4 - Math.PI) * 15 ** 2, 8);
    expect(p.massKgPerM).toBeCloseTo(p.areaMm2 * 0.00785, 10);
  });

  /** Torsion of a rectangle, k in k·a·b³: Timoshenko and Goodier, Theory of Elasticity, art. 109 (memory). */
  it.each([[1, 0.1406], [1.5, 0.196], [2, 0.229], [3, 0.263], [5, 0.291], [10, 0.312]])('torsion of a flat of sides 1 : %s', (ratio, k) => {
    const p = sectionProperties({ kind: 'flat', hMm: 10 * ratio, tMm: 10 });
    expect(p.itMm4! / (10 * ratio * 10 ** 3)).toBeCloseTo(k, 3);
  });

  it('treats equal flanges of an unequal I as those of an I, and a box without overhang as a sharp hollow section', () => {
    const unequal = sectionProperties({ kind: 'i-unequal', hMm: 300, twMm: 7.1, topWidthMm: 150, topThicknessMm: 10.7, bottomWidthMm: 150, bottomThicknessMm: 10.7, rootRadiusMm: 15 });
    const equal = sectionProperties(ipe300);
    for (const key of ['areaMm2', 'iyMm4', 'izMm4', 'welYMm3', 'wplYMm3', 'itMm4', 'perimeterMm', 'shearAreaZMm2'] as const) {
      expect(unequal[key]! / equal[key]!).toBeCloseTo(1, 9);
    }
    const box = sectionProperties({ kind: 'box', hMm: 400, bMm: 300, twMm: 12, tfMm: 12, clearWidthMm: 276 });
    const hollow = sectionProperties({ kind: 'rectangular-hollow', hMm: 400, bMm: 300, tMm: 12, outerRadiusMm: 0, innerRadiusMm: 0 });
    for (const key of ['areaMm2', 'iyMm4', 'izMm4', 'wplYMm3', 'wplZMm3', 'perimeterMm'] as const) expect(box[key] / hollow[key]).toBeCloseTo(1, 9);
  });

  it('works a plate girder with unequal flanges and a box with overhangs by parts (parallel axis theorem)', () => {
    const p = sectionProperties({ kind: 'i-unequal', hMm: 1000, twMm: 10, topWidthMm: 300, topThicknessMm: 20, bottomWidthMm: 400, bottomThicknessMm: 30, rootRadiusMm: 0 });
    const parts = [[300, 20, 990], [10, 950, 505], [400, 30, 15]] as const;
    const area = parts.reduce((sum, [b, h]) => sum + b * h, 0);
    const centroid = parts.reduce((sum, [b, h, y]) => sum + b * h * y, 0) / area;
    const inertia = parts.reduce((sum, [b, h, y]) => sum + (b * h ** 3) / 12 + b * h * (y - centroid) ** 2, 0);
    expect(p.areaMm2).toBeCloseTo(area, 6);
    expect(p.iyMm4 / inertia).toBeCloseTo(1, 10);
    expect(p.welYMm3 / (inertia / Math.max(centroid, 1000 - centroid))).toBeCloseTo(1, 10);
    // equal-area axis: 27 500/2 = 12 000 of the bottom flange + 1 750 of the web, 175 mm above the flange
    const plastic = 12000 * 190 + 1750 * 87.5 + 7750 * 387.5 + 6000 * 785;
    expect(p.wplYMm3 / plastic).toBeCloseTo(1, 9);
    const box = sectionProperties({ kind: 'box', hMm: 500, bMm: 400, twMm: 10, tfMm: 20, clearWidthMm: 300 });
    expect(box.iyMm4 / ((400 * 500 ** 3 - 380 * 460 ** 3) / 12)).toBeCloseTo(1, 9);
  });

  /** A_vz in cm², EN 1993-1-1 6.2.6(3), as printed in European section tables (memory). */
  it.each([
    ['IPE 300', ipe300, 25.7],
    ['HE 200 A', { kind: 'i', hMm: 190, bMm: 200, twMm: 6.5, tfMm: 10, rootRadiusMm: 18 } as const, 18.1],
    ['HE 300 B', { kind: 'i', hMm: 300, bMm: 300, twMm: 11, tfMm: 19, rootRadiusMm: 27 } as const, 47.4],
  ])('shear area of %s', (_name, shape, printedCm2) => {
    expect(Math.abs(sectionProperties(shape).shearAreaZMm2 / 100 - printedCm2)).toBeLessThan(0.06);
  });

  it('computes no torsion or warping constant of a tapered channel, and no warping constant of a hollow section', () => {
    const upn = sectionProperties({ kind: 'channel', hMm: 200, bMm: 75, twMm: 8.5, tfMm: 11.5, rootRadiusMm: 11.5, toeRadiusMm: 6, flangeSlope: 0.08 });
    expect([upn.itMm4, upn.iwMm6]).toEqual([null, null]);
    expect(sectionProperties({ kind: 'circular-hollow', dMm: 168.3, tMm: 6.3 }).iwMm6).toBeNull();
  });

  it('remembers by dimensions, whichever order the fields come in', () => {
    expect(sectionProperties({ ...ipe300 })).toBe(sectionProperties(ipe300));
    const otherOrder = sectionProperties({ rootRadiusMm: 15, tfMm: 10.7, twMm: 7.1, bMm: 150, hMm: 300, kind: 'i' });
    expect(otherOrder).toEqual(sectionProperties(ipe300));
  });
});

describe('shapes that cannot be', () => {
  const cases: [string, SectionShape, string][] = [
    ['flanges thicker than the depth', { kind: 'i', hMm: 100, bMm: 100, twMm: 5, tfMm: 50, rootRadiusMm: 0 }, 'Twice the flange thickness is 100 mm'],
    ['a web wider than the flange', { kind: 'tee', hMm: 100, bMm: 10, twMm: 12, tfMm: 5, rootRadiusMm: 0 }, 'The web thickness is 12 mm'],
    ['walls that meet', { kind: 'circular-hollow', dMm: 20, tMm: 10 }, 'Twice the wall thickness is 20 mm'],
    ['a taper that ends the flange', { kind: 'channel', hMm: 200, bMm: 200, twMm: 8, tfMm: 8, rootRadiusMm: 0, toeRadiusMm: 0, flangeSlope: 0.2 }, 'The taper of the flange'],
    ['webs outside the flanges', { kind: 'box', hMm: 300, bMm: 200, twMm: 10, tfMm: 10, clearWidthMm: 190 }, 'The width over both webs is 210 mm'],
    ['fillets wider than the flange', { kind: 'i', hMm: 300, bMm: 50, twMm: 7, tfMm: 10, rootRadiusMm: 30 }, 'The root and corner radii are too large'],
    ['a corner worn through', { kind: 'rectangular-hollow', hMm: 100, bMm: 100, tMm: 4, outerRadiusMm: 20, innerRadiusMm: 0 }, 'The outer corner radius is 20 mm'],
    ['legs thicker than long', { kind: 'angle', hMm: 50, bMm: 8, tMm: 8, rootRadiusMm: 0, toeRadiusMm: 0 }, 'The thickness is 8 mm'],
  ];
  it.each(cases)('%s', (_what, shape, says) => {
    const result = determineSectionProperties(shape);
    expect(result.ok).toBe(false);
    expect(result.ok ? '' : sentence(result.reason)).toContain(says);
    expect(() => sectionProperties(shape)).toThrow(says);
  });

  it('lets sound shapes pass', () => {
    expect(shapeFault(ipe300)).toBeNull();
    expect(shapeFault({ kind: 'box', hMm: 300, bMm: 200, twMm: 10, tfMm: 10, clearWidthMm: 180 })).toBeNull();
  });
});
