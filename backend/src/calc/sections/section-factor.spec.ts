import type { Exposure, SectionShape } from '@mantlet/common';
import { sentence } from '@mantlet/common';
import type { SectionFactor } from '../types.js';
import { profileGroup } from './profile-group.js';
import { sectionProperties } from './properties.js';
import { sectionFactor } from './section-factor.js';

const i = (hMm: number, bMm: number, twMm: number, tfMm: number, rootRadiusMm: number): SectionShape => ({ kind: 'i', hMm, bMm, twMm, tfMm, rootRadiusMm });
const ipe300 = i(300, 150, 7.1, 10.7, 15);
const he300b = i(300, 300, 11, 19, 27);
const tube: SectionShape = { kind: 'circular-hollow', dMm: 168.3, tMm: 6.3 };
const shs: SectionShape = { kind: 'rectangular-hollow', hMm: 150, bMm: 150, tMm: 6.3, outerRadiusMm: 9.45, innerRadiusMm: 6.3 };
const angle: SectionShape = { kind: 'angle', hMm: 150, bMm: 90, tMm: 10, rootRadiusMm: 12, toeRadiusMm: 6 };
const channel: SectionShape = { kind: 'channel', hMm: 200, bMm: 90, twMm: 7, tfMm: 14, rootRadiusMm: 12, toeRadiusMm: 0, flangeSlope: 0 };
const exposure = (arrangement: Exposure['arrangement'], faces?: Exposure['faces']): Exposure => ({ arrangement, reason: '', ...(faces && { faces }) });

function factor(shape: SectionShape, arrangement: Exposure['arrangement'], form: 'profile' | 'boxed' = 'profile', faces?: Exposure['faces']): SectionFactor {
  const result = sectionFactor(shape, sectionProperties(shape), exposure(arrangement, faces), form);
  if (!result.ok) throw new Error(sentence(result.reason));
  return result.value;
}

describe('section factors', () => {
  /** Geometry of EN 1993-1-2 Tables 4.2 and 4.3; values as printed in European section tables, 1/m. */
  it.each([
    ['IPE 300', ipe300, [216, 188, 167, 139]],
    ['IPE 400', i(400, 180, 8.6, 13.5, 21), [174, 152, 137, 116]],
    ['HE 300 B', he300b, [116, 96, 80, 60]],
    ['HE 200 A', i(190, 200, 6.5, 10, 18), [211, 174, 145, 108]],
  ])('of %s, profile and box, four and three sides', (_name, shape, printed) => {
    const found = (['profile', 'boxed'] as const).flatMap((form) =>
      (['four-sides', 'three-sides'] as const).map((sides) => Math.round(factor(shape, sides, form).sectionFactorPerM)));
    expect(found).toEqual(printed);
  });

  it('of UB 533x210x82, published as 176.3 from a girth of 1851 mm and the rounded area of 105 cm²', () => {
    const shape = i(528.3, 208.8, 9.6, 13.2, 12.7);
    const printedArea = { ...sectionProperties(shape), areaMm2: 10_500 };
    const found = (['profile', 'boxed'] as const).flatMap((form) => (['four-sides', 'three-sides'] as const).map((sides) => {
      const f = sectionFactor(shape, printedArea, exposure(sides), form);
      return f.ok ? f.value.sectionFactorPerM : NaN;
    }));
    expect(found.map(Math.round)).toEqual([176, 156, 140, 121]);
    expect(found[0]).toBeCloseTo(176.3, 1);
    expect(factor(shape, 'four-sides').heatedPerimeterMm).toBeCloseTo(1851, 0);
    // from the unrounded area, 104.7 cm²
    expect(factor(shape, 'four-sides').sectionFactorPerM).toBeCloseTo(176.8, 1);
  });

  /** Surface per length in m²/m: EN 10210-2, EN 10365, EN 10056-1 section tables (memory). */
  it.each([
    ['SHS 100x100x5', { kind: 'rectangular-hollow', hMm: 100, bMm: 100, tMm: 5, outerRadiusMm: 7.5, innerRadiusMm: 5 } as const, 0.387],
    ['SHS 150x150x6.3', shs, 0.584],
    ['RHS 200x100x8', { kind: 'rectangular-hollow', hMm: 200, bMm: 100, tMm: 8, outerRadiusMm: 12, innerRadiusMm: 8 } as const, 0.579],
    ['CHS 168.3x6.3', tube, 0.529],
    ['IPE 300', ipe300, 1.16],
    ['HE 300 B', he300b, 1.732],
    ['L 100x100x10', { kind: 'angle', hMm: 100, bMm: 100, tMm: 10, rootRadiusMm: 12, toeRadiusMm: 6 } as const, 0.39],
    ['UPN 200', { kind: 'channel', hMm: 200, bMm: 75, twMm: 8.5, tfMm: 11.5, rootRadiusMm: 11.5, toeRadiusMm: 6, flangeSlope: 0.08 } as const, 0.661],
  ])('heats the whole surface of %s on four sides', (_name, shape, printedM2) => {
    expect(Math.abs(factor(shape, 'four-sides').heatedPerimeterMm / 1000 - printedM2)).toBeLessThan(0.0011);
  });

  it('follows the printed expression for I sections: 2h + 4b − 2t_w − (8 − 2π)r, less b on three sides', () => {
    const whole = 2 * 300 + 4 * 150 - 2 * 7.1 - (8 - 2 * Math.PI) * 15;
    expect(factor(ipe300, 'four-sides').heatedPerimeterMm).toBeCloseTo(whole, 9);
    expect(factor(ipe300, 'three-sides').heatedPerimeterMm).toBeCloseTo(whole - 150, 9);
  });
});

describe('exposures', () => {
  it('web filled: the bottom face and the four flange tips', () => {
    const f = factor(ipe300, 'three-sides-web-filled');
    expect(f.heatedPerimeterMm).toBeCloseTo(150 + 4 * 10.7, 9);
    expect(f.coatedGirthMm).toBeCloseTo(f.heatedPerimeterMm, 9);
  });

  it('slab edge: the bottom face, or with one side', () => {
    expect(factor(ipe300, 'slab-edge-one-side').heatedPerimeterMm).toBeCloseTo(150, 9);
    const oneSide = factor(ipe300, 'slab-edge-two-sides').heatedPerimeterMm;
    const bothBays = factor(ipe300, 'three-sides').heatedPerimeterMm - 150;
    expect(oneSide).toBeCloseTo(150 + bothBays / 2, 9);
    expect(factor(channel, 'slab-edge-two-sides', 'profile', ['left']).heatedPerimeterMm).toBeCloseTo(90 + 200, 9);
    expect(factor(channel, 'slab-edge-two-sides').heatedPerimeterMm).toBeGreaterThan(90 + 200);
  });

  it('given faces: a column in a wall that shows one flange, and one that shows one bay', () => {
    expect(factor(he300b, 'given-faces', 'profile', ['bottom']).heatedPerimeterMm).toBeCloseTo(300, 9);
    const bay = factor(he300b, 'given-faces', 'profile', ['left']).heatedPerimeterMm;
    expect(bay).toBeCloseTo((factor(he300b, 'four-sides').heatedPerimeterMm - 600) / 2, 9);
  });

  it('a tube under a slab touches it along a line: its whole girth is heated; one face lights half of it', () => {
    expect(factor(tube, 'three-sides').heatedPerimeterMm).toBeCloseTo(Math.PI * 168.3, 9);
    expect(factor(tube, 'given-faces', 'profile', ['right']).heatedPerimeterMm).toBeCloseTo((Math.PI * 168.3) / 2, 9);
    expect(factor(tube, 'three-sides', 'boxed').heatedPerimeterMm).toBeCloseTo(3 * 168.3, 9);
  });

  it('a hollow section under a slab loses the flat of its top only, not the rounded corners', () => {
    expect(factor(shs, 'four-sides').heatedPerimeterMm - factor(shs, 'three-sides').heatedPerimeterMm).toBeCloseTo(150 - 2 * 9.45, 9);
  });

  it('an angle under a slab lies with a leg against it', () => {
    expect(factor(angle, 'four-sides').heatedPerimeterMm - factor(angle, 'three-sides').heatedPerimeterMm).toBeCloseTo(90, 9);
    expect(factor(angle, 'three-sides', 'boxed').heatedPerimeterMm).toBeCloseTo(2 * 150 + 90, 9);
  });

  it('refuses in words what makes no sense', () => {
    const refusal = (shape: SectionShape, e: Exposure) => {
      const result = sectionFactor(shape, sectionProperties(shape), e, 'profile');
      return result.ok ? 'allowed' : sentence(result.reason);
    };
    expect(refusal(tube, exposure('three-sides-web-filled'))).toBe('"Web filled" needs a space between two flanges, which a hollow section does not have. Choose another exposure.');
    expect(refusal(angle, exposure('three-sides-web-filled'))).toContain('an angle');
    expect(refusal(ipe300, exposure('given-faces', []))).toContain('No face of the section sees fire');
    const impossible: SectionShape = { kind: 'round', dMm: 50 };
    const broken = sectionFactor({ kind: 'circular-hollow', dMm: 20, tMm: 12 }, sectionProperties(impossible), exposure('four-sides'), 'boxed');
    expect(broken.ok ? '' : broken.reason.code).toBe('section.does-not-fit');
  });
});

describe('shadow factor, EN 1993-1-2 4.2.5.1', () => {
  it('is 0.9 of box over profile for an I section in a nominal fire, the plain ratio otherwise', () => {
    const f = factor(ipe300, 'four-sides');
    expect(f.shadowFactorOther).toBeCloseTo(f.boxSectionFactorPerM / f.sectionFactorPerM, 12);
    expect(f.shadowFactorNominal).toBeCloseTo(0.9 * f.shadowFactorOther, 12);
    // 167/216 from the printed table
    expect(f.shadowFactorOther).toBeCloseTo(167 / 216, 2);
  });

  it('is the plain ratio for channels in any fire, and 1 for convex shapes, whatever is heated', () => {
    const c = factor(channel, 'four-sides');
    expect(c.shadowFactorNominal).toBe(c.shadowFactorOther);
    expect(c.shadowFactorNominal).toBeLessThan(1);
    for (const shape of [tube, shs]) {
      expect([factor(shape, 'four-sides').shadowFactorNominal, factor(shape, 'three-sides').shadowFactorOther]).toEqual([1, 1]);
    }
    const plainBox: SectionShape = { kind: 'box', hMm: 400, bMm: 300, twMm: 10, tfMm: 20, clearWidthMm: 280 };
    expect(factor(plainBox, 'four-sides').shadowFactorNominal).toBe(1);
    expect(factor({ ...plainBox, clearWidthMm: 200 }, 'four-sides').shadowFactorNominal).toBeLessThan(1);
  });

  it('stays 1 where only plane faces are heated, and for a boxed section', () => {
    expect(factor(ipe300, 'three-sides-web-filled').shadowFactorNominal).toBe(1);
    expect(factor(ipe300, 'slab-edge-one-side').shadowFactorNominal).toBe(1);
    expect(factor(ipe300, 'four-sides', 'boxed').shadowFactorNominal).toBe(1);
  });
});

it('groups shapes as protection evidence does', () => {
  expect([ipe300, channel, angle, shs, tube, { kind: 'flat', hMm: 100, tMm: 10 } as const].map(profileGroup))
    .toEqual(['open', 'open', 'open', 'hollow-rectangular', 'hollow-circular', 'solid']);
});
