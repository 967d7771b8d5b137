import type { OutlineSegment } from '@mantlet/common';
import { round } from './chart-scale.js';

/**
 * Outlines come in millimetres with y upwards; a drawing has y downwards. A place takes a point in mm to one in px.
 * It must scale both axes alike, or arcs would not stay arcs.
 */
export interface SectionPlace { pxPerMm: number; at: (point: readonly [number, number]) => [number, number] }

export function placeSection(pxPerMm: number, originX: number, originY: number): SectionPlace {
  return { pxPerMm, at: ([x, y]) => [round(originX + x * pxPerMm), round(originY - y * pxPerMm)] };
}

const full = Math.PI * 2;
/** The angle an arc sweeps, 0 to 2π; an arc that ends where it begins is a whole circle. */
export function sweptAngle({ from, to, arc }: OutlineSegment): number {
  if (!arc) return 0;
  const start = Math.atan2(from[1] - arc.centre[1], from[0] - arc.centre[0]);
  const end = Math.atan2(to[1] - arc.centre[1], to[0] - arc.centre[0]);
  const anticlockwise = (((end - start) % full) + full) % full;
  const swept = arc.anticlockwise ? anticlockwise : full - anticlockwise;
  return swept < 1e-9 || swept > full - 1e-9 ? full : swept;
}

/** The SVG command that draws one stretch from where the pen stands. Mirrored in y, what ran anticlockwise still looks so. */
function command(segment: OutlineSegment, place: SectionPlace): string {
  const [x, y] = place.at(segment.to);
  const { arc } = segment;
  if (!arc) return `L${x} ${y}`;
  const r = round(arc.radiusMm * place.pxPerMm);
  const sweepFlag = arc.anticlockwise ? 0 : 1;
  const swept = sweptAngle(segment);
  if (swept === full) {
    const [halfX, halfY] = place.at([2 * arc.centre[0] - segment.from[0], 2 * arc.centre[1] - segment.from[1]]);
    return `A${r} ${r} 0 0 ${sweepFlag} ${halfX} ${halfY}A${r} ${r} 0 0 ${sweepFlag} ${x} ${y}`;
  }
  return `A${r} ${r} 0 ${swept > Math.PI + 1e-9 ? 1 : 0} ${sweepFlag} ${x} ${y}`;
}

export function runPath(run: readonly OutlineSegment[], place: SectionPlace): string {
  const [first] = run;
  if (!first) return '';
  const [x, y] = place.at(first.from);
  return `M${x} ${y}${run.map((segment) => command(segment, place)).join('')}`;
}

export const loopPath = (loop: readonly OutlineSegment[], place: SectionPlace): string => (loop.length > 0 ? `${runPath(loop, place)}Z` : '');

/** The unbroken stretches of a loop that are marked; one that passes the loop's seam is one stretch. */
export function stretches(loop: readonly OutlineSegment[], marked: (segment: OutlineSegment) => boolean): { segments: OutlineSegment[]; closed: boolean }[] {
  if (loop.length > 0 && loop.every(marked)) return [{ segments: [...loop], closed: true }];
  const found: OutlineSegment[][] = [];
  let open: OutlineSegment[] | null = null;
  for (const segment of loop) {
    if (!marked(segment)) { open = null; continue; }
    if (!open) found.push((open = []));
    open.push(segment);
  }
  const [first] = found;
  const last = found[found.length - 1];
  if (first && last && first !== last && loop[0] === first[0] && loop[loop.length - 1] === last[last.length - 1]) {
    found.pop();
    found[0] = [...last, ...first];
  }
  return found.map((segments) => ({ segments, closed: false }));
}

/** Sum of the marked lengths, mm. */
export const markedLength = (loops: readonly (readonly OutlineSegment[])[], marked: (segment: OutlineSegment) => boolean): number =>
  loops.flat().filter(marked).reduce((sum, segment) => sum + segment.lengthMm, 0);
