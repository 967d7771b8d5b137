import { message } from '@mantlet/common';
import type { Exposure, SectionShape } from '@mantlet/common';
import type { Determined } from '../types.js';
import { allFaces, faceBits } from './contour.js';
import type { ContourSegment } from './contour.js';

/** What of a section the fire sees. */
export interface ExposureView {
  /** exposed faces of the enclosing box, as bits */
  faces: number;
  /** the space between the flanges is filled */
  filled: boolean;
}

const { bottom, left, right } = faceBits;
const names: Record<SectionShape['kind'], string> = {
  i: 'an I section', 'i-unequal': 'an I section', channel: 'a channel', tee: 'a tee', angle: 'an angle',
  'rectangular-hollow': 'a hollow section', 'circular-hollow': 'a hollow section', box: 'a box section', flat: 'a flat', round: 'a round bar',
};
const withTwoFlanges = new Set<SectionShape['kind']>(['i', 'i-unequal', 'channel']);

/**
 * The faces that an arrangement exposes. "In the slab, bottom and one side" takes the side named in `faces`, else the
 * right one, which for a channel is its open and so less favourable side.
 */
export function exposureView(shape: SectionShape, exposure: Exposure): Determined<ExposureView> {
  switch (exposure.arrangement) {
    case 'four-sides': return seen(allFaces);
    case 'three-sides': return seen(bottom | left | right);
    case 'three-sides-web-filled':
      return withTwoFlanges.has(shape.kind)
        ? { ok: true, value: { faces: bottom | left | right, filled: true } }
        : { ok: false, reason: message('section.web-filled', { section: names[shape.kind] }) };
    case 'slab-edge-one-side': return seen(bottom);
    case 'slab-edge-two-sides': return seen(bottom | (exposure.faces?.includes('left') ? left : right));
    case 'given-faces': {
      const faces = (exposure.faces ?? []).reduce((sum, face) => sum | faceBits[face], 0);
      return faces === 0 ? { ok: false, reason: message('section.no-face', {}) } : seen(faces);
    }
  }
}

function seen(faces: number): Determined<ExposureView> {
  return { ok: true, value: { faces, filled: false } };
}

/** A stretch is heated when fire reaches it through an exposed face and no filling covers it. */
export function isHeated(segment: ContourSegment, view: ExposureView): boolean {
  return reaches(segment.faces, segment.recess, view);
}

/** `isHeated` of a stretch known by its faces and whether it lies in a recess. */
export function reaches(faces: number, recess: boolean, view: ExposureView): boolean {
  return (faces & view.faces) !== 0 && !(view.filled && recess);
}
