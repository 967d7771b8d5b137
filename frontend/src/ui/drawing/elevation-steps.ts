import type { ZoneBox } from './building-elevation-layout.js';

type Spot = Pick<ZoneBox, 'x' | 'y' | 'width' | 'height'> & { zone: { id: string } };
const middle = (b: Spot) => b.x + b.width / 2;

/** Where an arrow key leads from a zone: along the level, or to the zone most nearly above or below. Home and End go to the ends of the level. Null: nowhere. */
export function stepFrom(boxes: readonly Spot[], id: string, key: string): string | null {
  const from = boxes.find((b) => b.zone.id === id);
  if (!from) return boxes[0]?.zone.id ?? null;
  const level = boxes.filter((b) => Math.abs(b.y - from.y) < 0.5).sort((a, b) => a.x - b.x);
  const at = level.indexOf(from);
  if (key === 'ArrowLeft') return level[at - 1]?.zone.id ?? null;
  if (key === 'ArrowRight') return level[at + 1]?.zone.id ?? null;
  if (key === 'Home') return level[0]?.zone.id ?? null;
  if (key === 'End') return level.at(-1)?.zone.id ?? null;
  if (key !== 'ArrowUp' && key !== 'ArrowDown') return null;
  const beyond = boxes.filter((b) => (key === 'ArrowUp' ? b.y < from.y - 0.5 : b.y > from.y + 0.5));
  if (beyond.length === 0) return null;
  const ys = beyond.map((b) => b.y);
  const next = key === 'ArrowUp' ? Math.max(...ys) : Math.min(...ys);
  const nearest = beyond.filter((b) => Math.abs(b.y - next) < 0.5).sort((a, b) => Math.abs(middle(a) - middle(from)) - Math.abs(middle(b) - middle(from)));
  return nearest[0]?.zone.id ?? null;
}
