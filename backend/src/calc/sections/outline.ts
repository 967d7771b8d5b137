import { sentence } from '@mantlet/common';
import type { Exposure, OutlineSegment, ProtectionForm, SectionOutline, SectionShape } from '@mantlet/common';
import type { Determined } from '../types.js';
import { corner, faceBits, roundedLoop } from './contour.js';
import type { Contour, ContourSegment } from './contour.js';
import { exposureView, isHeated } from './exposure-view.js';
import { contourOf } from './shape-contour.js';

/**
 * The drawing of a section under an exposure: mm, x right, y up, origin at the middle of the enclosing box.
 * Profile: heated stretches are coated, the rest is neither. Boxed: the steel's own outline is plain and the box, drawn
 * round the section at zero clearance (a circumscribing square for a circle), carries both marks on its exposed sides.
 */
export function determineSectionOutline(shape: SectionShape, exposure: Exposure, form: ProtectionForm): Determined<SectionOutline> {
  const contour = contourOf(shape);
  if (!contour.ok) return contour;
  const view = exposureView(shape, exposure);
  if (!view.ok) return view;
  const mark = (s: ContourSegment) => drawn(s, isHeated(s, view.value));
  const { loops, widthMm, heightMm } = contour.value;
  return {
    ok: true,
    value: {
      loops: loops.map((loop) => loop.map(form === 'profile' ? mark : (s) => drawn(s, false))),
      box: form === 'boxed' ? boxLoop(contour.value).map(mark) : null,
      widthMm,
      heightMm,
    },
  };
}

/** As determineSectionOutline, for cases already checked: throws a RangeError where there is nothing to draw. */
export function sectionOutline(shape: SectionShape, exposure: Exposure, form: ProtectionForm): SectionOutline {
  const result = determineSectionOutline(shape, exposure, form);
  if (!result.ok) throw new RangeError(sentence(result.reason));
  return result.value;
}

/** The enclosing box as a loop of four straight sides. */
export function boxLoop({ widthMm, heightMm }: Contour): ContourSegment[] {
  const [x, y] = [widthMm / 2, heightMm / 2];
  const { top, bottom, left, right } = faceBits;
  return roundedLoop([corner(-x, -y, bottom), corner(x, -y, right), corner(x, y, top), corner(-x, y, left)])!;
}

function drawn(s: ContourSegment, heated: boolean): OutlineSegment {
  return {
    from: s.from, to: s.to, lengthMm: s.lengthMm, heated, coated: heated,
    ...(s.arc && { arc: { centre: s.arc.centre, radiusMm: s.arc.radiusMm, anticlockwise: s.arc.sweepRad > 0 } }),
  };
}
