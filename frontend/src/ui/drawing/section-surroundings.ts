import type { Exposure, FaceName } from '@mantlet/common';
import { faceNames } from '@mantlet/common';
import type { Box } from './label-layout.js';

/** What stands against the section and keeps the fire off, as rectangles in px round the section's enclosing box. */
export interface Surrounding extends Box { label: string | null }

const strip = 22;
/** The faces of the enclosing box that fire reaches. */
export function exposedFaces(exposure: Exposure): FaceName[] {
  switch (exposure.arrangement) {
    case 'four-sides': return [...faceNames];
    case 'three-sides': case 'three-sides-web-filled': return ['bottom', 'left', 'right'];
    case 'slab-edge-one-side': return ['bottom'];
    case 'slab-edge-two-sides': return ['bottom', exposure.faces?.includes('left') ? 'left' : 'right'];
    case 'given-faces': return exposure.faces ?? [];
  }
}

/** section: its enclosing box in px; reach: how far a slab runs on to the left and right. */
export function surroundings(exposure: Exposure, section: Box, reach: number): Surrounding[] {
  const exposed = new Set(exposedFaces(exposure));
  const { x, y, width, height } = section;
  const above: Surrounding = { x: x - reach, y: y - strip, width: width + 2 * reach, height: strip, label: 'slab' };
  const beside = (side: 'left' | 'right', label: string | null): Surrounding =>
    ({ x: side === 'left' ? x - reach : x + width, y, width: reach, height, label });
  switch (exposure.arrangement) {
    case 'four-sides': return [];
    case 'three-sides': return [above];
    case 'three-sides-web-filled': return [above, { ...section, label: null }];
    case 'slab-edge-one-side': return [above, beside('left', null), beside('right', null)];
    case 'slab-edge-two-sides': return [above, beside(exposed.has('left') ? 'right' : 'left', null)];
    case 'given-faces': return faceNames.filter((face) => !exposed.has(face)).map((face) => coveredFace(face, section));
  }
}

function coveredFace(face: FaceName, { x, y, width, height }: Box): Surrounding {
  const thin = 12;
  switch (face) {
    case 'top': return { x, y: y - thin, width, height: thin, label: 'covered' };
    case 'bottom': return { x, y: y + height, width, height: thin, label: null };
    case 'left': return { x: x - thin, y, width: thin, height, label: null };
    case 'right': return { x: x + width, y, width: thin, height, label: null };
  }
}
