import type { Exposure, SectionOutline } from '@mantlet/common';
import { formatNumber } from '../../lib/format.js';
import { labelBox, textWidth } from './label-layout.js';
import type { Box } from './label-layout.js';
import { placeSection } from './section-path.js';
import type { SectionPlace } from './section-path.js';

export interface SectionLayout { width: number; height: number; place: SectionPlace; /** the enclosing box, px */ section: Box; /** how far a slab runs on to either side */ reach: number; /** thickness of the protection, px */ cover: number }

/** A section to scale in the width there is, with room for what stands against it and for its dimensions. */
export function layoutSection({ widthMm, heightMm }: Pick<SectionOutline, 'widthMm' | 'heightMm'>, exposure: Exposure | undefined, width: number, maxHeight: number, coverMm = 0): SectionLayout {
  const surrounded = exposure !== undefined && exposure.arrangement !== 'four-sides';
  const top = surrounded ? 44 : 10;
  const [side, right, bottom] = [surrounded ? 48 : 16, 58, 40];
  const scale = Math.min((width - side - right) / (widthMm + 2 * coverMm), (maxHeight - top - bottom) / (heightMm + 2 * coverMm));
  const cover = coverMm * scale;
  // a slab lies on the steel itself
  const y = top + (surrounded ? 0 : cover);
  const size = { width: widthMm * scale, height: heightMm * scale };
  const x = side + (width - side - right - size.width) / 2;
  return {
    width, height: y + size.height + cover + bottom, section: { x, y, ...size }, reach: Math.min(x - 4, Math.max(34, size.width * 0.3) + cover), cover,
    place: placeSection(scale, x + size.width / 2, y + size.height / 2),
  };
}

export const mm = (value: number): string => (Number.isInteger(value) ? formatNumber(value) : formatNumber(value, 1));

export interface Dimension { from: [number, number]; to: [number, number]; text: string; /** the middle of the figure along the line */ middle: number; /** where the figure stands */ box: Box }
/** Height at the right, width below: where their lines run and their figures stand. */
export function sectionDimensions({ widthMm, heightMm }: Pick<SectionOutline, 'widthMm' | 'heightMm'>, { section, width, cover }: SectionLayout, surrounded: boolean): { height: Dimension; width: Dimension } {
  const x = Math.min(section.x + section.width + cover + (surrounded ? 24 : 18), width - 26);
  const y = section.y + section.height + cover + 18;
  const [tall, wide] = [mm(heightMm), mm(widthMm)];
  const length = textWidth(tall, 12);
  // beside a section flatter than its figure, the figure keeps below what stands on it
  const middle = section.y + Math.max(section.height, length) / 2;
  return {
    height: { from: [x, section.y], to: [x, section.y + section.height], text: tall, middle, box: { x: x + 4, y: middle - length / 2, width: 14, height: length } },
    width: { from: [section.x, y], to: [section.x + section.width, y], text: wide, middle: section.x + section.width / 2, box: labelBox(wide, 12, { x: section.x + section.width / 2, y: y + 15, anchor: 'middle' }) },
  };
}
