import type { Exposure, ProtectionForm, SectionProperties, SectionShape } from '@mantlet/common';
import type { Determined, SectionFactor } from '../types.js';
import { faceBits } from './contour.js';
import type { Contour } from './contour.js';
import { exposureView, reaches } from './exposure-view.js';
import type { ExposureView } from './exposure-view.js';
import { contourOf } from './shape-contour.js';

/**
 * A_m/V or A_p/V from dimensions: EN 1993-1-2:2005 Tables 4.2 (profile) and 4.3 (profile or boxed), and the shadow factor
 * of 4.2.5.1. The heated perimeter is the sum of the stretches that `sectionOutline` marks as heated, so the number and
 * the drawing cannot differ.
 *
 * Corners: hollow sections are measured round their real outer radius, and a rounded corner next to one exposed face is
 * heated whole. A circle under a slab touches it along a line, so its whole girth is heated. A box round a circle is the
 * circumscribing square. Boxed with the web filled counts as boxed on three sides.
 *
 * @returns lengths in mm, factors in 1/m, unrounded; not ok with a `section.*` reason where the exposure or the dimensions
 * make no sense. `properties` must be those of `shape`.
 */
export function sectionFactor(
  shape: SectionShape, properties: SectionProperties, exposure: Exposure, form: ProtectionForm,
): Determined<SectionFactor> {
  const contour = contourOf(shape);
  if (!contour.ok) return contour;
  const view = exposureView(shape, exposure);
  if (!view.ok) return view;
  const boxMm = heatedBox(contour.value, view.value);
  const profile = heatedProfile(contour.value, view.value);
  const heatedPerimeterMm = form === 'boxed' ? boxMm : profile.lengthMm;
  const ratio = form === 'profile' && castsShadow(shape) && profile.recess ? boxMm / profile.lengthMm : 1;
  return {
    ok: true,
    value: {
      heatedPerimeterMm,
      areaMm2: properties.areaMm2,
      sectionFactorPerM: (heatedPerimeterMm / properties.areaMm2) * 1000,
      boxSectionFactorPerM: (boxMm / properties.areaMm2) * 1000,
      coatedGirthMm: heatedPerimeterMm,
      shadowFactorNominal: Math.min(1, (isISection(shape) && ratio < 1 ? 0.9 : 1) * ratio),
      shadowFactorOther: Math.min(1, ratio),
    },
  };
}

function heatedProfile(contour: Contour, view: ExposureView): { lengthMm: number; recess: boolean } {
  let lengthMm = 0;
  let recess = false;
  const { lengthsMm, faces, recesses } = contour.girth;
  for (let i = 0; i < lengthsMm.length; i += 1) {
    const inRecess = recesses[i] === 1;
    if (!reaches(faces[i]!, inRecess, view)) continue;
    lengthMm += lengthsMm[i]!;
    recess ||= inRecess;
  }
  return { lengthMm, recess };
}

function heatedBox({ widthMm, heightMm }: Contour, { faces }: ExposureView): number {
  const { top, bottom, left, right } = faceBits;
  return (faces & top ? widthMm : 0) + (faces & bottom ? widthMm : 0) + (faces & left ? heightMm : 0) + (faces & right ? heightMm : 0);
}

/**
 * 4.2.5.1(2) and (3): convex shapes cast no shadow on themselves. Nor do stretches outside every recess: where only plane
 * faces are heated the factor stays 1, which is on the safe side of the clause's 0.9.
 */
function castsShadow(shape: SectionShape): boolean {
  switch (shape.kind) {
    case 'rectangular-hollow':
    case 'circular-hollow':
    case 'flat':
    case 'round': return false;
    default: return true;
  }
}

function isISection(shape: SectionShape): boolean {
  return shape.kind === 'i' || shape.kind === 'i-unequal';
}
