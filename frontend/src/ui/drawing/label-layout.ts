import type { Points, Scale } from './chart-scale.js';
import { valueAt } from './chart-scale.js';

export interface Box { x: number; y: number; width: number; height: number }
export type Anchor = 'start' | 'middle' | 'end';
export interface Place { x: number; /** baseline */ y: number; anchor: Anchor }
export interface LabelWish {
  text: string;
  fontSize: number;
  /** where it would best stand, then the next best */
  places: readonly Place[];
}

/** Width of a text as drawn, by the mean advance of the page's face; a little generous. */
export const textWidth = (text: string, fontSize: number): number => text.length * fontSize * 0.56;

export function labelBox(text: string, fontSize: number, place: Place): Box {
  const width = textWidth(text, fontSize);
  const shift = place.anchor === 'start' ? 0 : place.anchor === 'middle' ? width / 2 : width;
  return { x: place.x - shift, y: place.y - fontSize * 0.82, width, height: fontSize * 1.1 };
}

export const overlap = (a: Box, b: Box): boolean =>
  a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height;

const inside = (box: Box, bounds: Box): boolean =>
  box.x >= bounds.x - 1e-6 && box.y >= bounds.y - 1e-6 && box.x + box.width <= bounds.x + bounds.width + 1e-6 && box.y + box.height <= bounds.y + bounds.height + 1e-6;

/** How far a label moves to keep off a line. */
const nearPx = 30;
/** The place asked for and, where that is taken, others ever further above and below it. */
function* candidates(wish: LabelWish, reach: number): Generator<Place> {
  yield* wish.places;
  for (let away = 1; away * 6 <= reach; away += 1) {
    for (const place of wish.places) {
      yield { ...place, y: place.y - away * 6 };
      yield { ...place, y: place.y + away * 6 };
    }
  }
}

/**
 * Places every label inside the bounds so that none covers another. Lines are avoided where there is room near by:
 * better across a line, which the label's halo parts, than far from what it names. A label that fits nowhere is null, and the legend in words still names its line.
 */
export function placeLabels(wishes: readonly LabelWish[], bounds: Box, lines: readonly Box[] = []): (Place | null)[] {
  const taken: Box[] = [];
  return wishes.map((wish) => {
    const free = (others: readonly Box[], reach: number) => {
      for (const place of candidates(wish, reach)) {
        const box = labelBox(wish.text, wish.fontSize, place);
        if (inside(box, bounds) && !others.some((other) => overlap(box, other))) return place;
      }
      return null;
    };
    const place = free([...taken, ...lines], nearPx) ?? free(taken, bounds.height);
    if (place) taken.push(labelBox(wish.text, wish.fontSize, place));
    return place;
  });
}

/** Small boxes along a line, for labels to keep off. */
export function boxesAlong(points: Points, x: Scale, y: Scale, everyPx = 6): Box[] {
  const boxes: Box[] = [];
  const [from, to] = x.range;
  for (let px = from; px <= to; px += everyPx) {
    const value = valueAt(points, x.invert(px));
    if (value === null) continue;
    const next = valueAt(points, x.invert(px + everyPx)) ?? value;
    const [top, bottom] = [Math.min(y(value), y(next)), Math.max(y(value), y(next))];
    boxes.push({ x: px - 1, y: top - 2, width: everyPx + 2, height: bottom - top + 4 });
  }
  return boxes;
}
