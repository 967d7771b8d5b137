import type { SectionProperties, SectionShape } from '@mantlet/common';
import { sentence } from '@mantlet/common';
import type { Determined } from '../types.js';
import type { Contour } from './contour.js';
import { perimeterMm } from './contour.js';
import { areaIntegral, axisProperties } from './moments.js';
import { rememberByShape } from './remember.js';
import { shearAreaZ } from './shear-area.js';
import { contourOf } from './shape-contour.js';
import { torsionConstant, warpingConstant } from './torsion.js';

/** EN 1993-1-1 3.2.6 and EN 1993-1-2 3.2.2: 7850 kg/m³. */
export const steelDensityKgPerM3 = 7850;

/** mm² of steel to kg per metre of length. */
export function massOfArea(areaMm2: number): number {
  return areaMm2 * steelDensityKgPerM3 * 1e-6;
}

/** Every property from the dimensions, mm-based, y the strong axis; or the sentence that says why there is no such section. */
export const determineSectionProperties = rememberByShape((shape): Determined<SectionProperties> => {
  const contour = contourOf(shape);
  return contour.ok ? { ok: true, value: propertiesOf(shape, contour.value) } : contour;
});

/** As determineSectionProperties, for shapes already checked: throws a RangeError where the dimensions make no section. */
export function sectionProperties(shape: SectionShape): SectionProperties {
  const result = determineSectionProperties(shape);
  if (!result.ok) throw new RangeError(sentence(result.reason));
  return result.value;
}

function propertiesOf(shape: SectionShape, { loops, widthMm, heightMm }: Contour): SectionProperties {
  const areaMm2 = areaIntegral(loops, 'y', () => 1);
  const y = axisProperties(loops, 'y', heightMm, symmetricAboutY(shape));
  const z = axisProperties(loops, 'z', widthMm, symmetricAboutZ(shape));
  return {
    areaMm2,
    massKgPerM: massOfArea(areaMm2),
    perimeterMm: perimeterMm(loops[0]!),
    iyMm4: y.inertiaMm4,
    izMm4: z.inertiaMm4,
    welYMm3: y.elasticModulusMm3,
    welZMm3: z.elasticModulusMm3,
    wplYMm3: y.plasticModulusMm3,
    wplZMm3: z.plasticModulusMm3,
    itMm4: torsionConstant(shape, y.inertiaMm4 + z.inertiaMm4),
    iwMm6: warpingConstant(shape, {
      areaMm2, iyMm4: y.inertiaMm4, izMm4: z.inertiaMm4, centroidFromBackMm: widthMm / 2 + z.centroidMm,
    }),
    shearAreaZMm2: shearAreaZ(shape, areaMm2),
  };
}

function symmetricAboutY(shape: SectionShape): boolean {
  return !['i-unequal', 'tee', 'angle'].includes(shape.kind);
}

function symmetricAboutZ(shape: SectionShape): boolean {
  return !['channel', 'angle'].includes(shape.kind);
}
