import { fitText } from './building-elevation-layout.js';
import { textWidth } from './label-layout.js';
import type { Box } from './label-layout.js';

/** What is written on a zone, in the order in which it gives way where there is no room. */
export interface ZoneWords {
  /** "R 60", or an amount: what the drawing is about */
  strong: string;
  code: string;
  name: string;
  /** at the right of the first line */
  aside: string;
  /** numbers of the items of the list beside the drawing */
  keynotes: readonly number[];
}
export interface PlacedText { role: 'strong' | 'name' | 'aside' | 'more'; text: string; x: number; /** baseline */ y: number; size: number; anchor: 'start' | 'end' }
export interface Balloon { number: number; cx: number; cy: number; r: number }
export interface ZoneLabels { texts: PlacedText[]; balloons: Balloon[] }

export const balloonRadius = 9.5;
const balloonStep = balloonRadius * 2 + 4;
const lineHeight = 18;
const gap = 8;

/** As many balloons as fit a width; what is left over is counted in a "+2" after them. */
function balloonsIn(keynotes: readonly number[], width: number): { shown: number[]; more: string; width: number } {
  const all = keynotes.length * balloonStep;
  if (all <= width) return { shown: [...keynotes], more: '', width: all };
  for (let n = keynotes.length - 1; n > 0; n--) {
    const more = `+${keynotes.length - n}`;
    const taken = n * balloonStep + textWidth(more, 12);
    if (taken <= width) return { shown: keynotes.slice(0, n), more, width: taken };
  }
  return { shown: [], more: '', width: 0 };
}

/** A name broken between words where it does not fit one line and both parts fit theirs; null where it fits, or cannot. */
function twoLines(text: string, first: number, second: number): [string, string] | null {
  const fits = (part: string, width: number) => textWidth(part, 12.5) <= width;
  if (fits(text, first)) return null;
  const parts = text.split(' ');
  for (let n = parts.length - 1; n > 1; n -= 1) {
    const [above, below] = [parts.slice(0, n).join(' '), parts.slice(n).join(' ')];
    if (fits(above, first) && fits(below, second)) return [above, below];
  }
  return null;
}

/**
 * Writes on a zone what there is room for, never one thing over another nor over the edge: the strong words first, then the numbers of what is open
 * (on the second line, a line of their own or instead of the aside), then the name, cut if it must be, then the aside.
 */
export function labelZone(box: Box, words: ZoneWords, railHeight: number): ZoneLabels {
  const pad = box.width < 84 ? 5 : 11;
  const room = box.width - 2 * pad;
  const left = box.x + pad;
  const right = box.x + box.width - pad;
  const free = box.height - railHeight;
  const first = free < 42 ? 16 : 19;
  // a balloon reaches 5 px below its line
  const lines = Math.max(0, 1 + Math.floor((free - first - 5) / lineHeight));
  const labels: ZoneLabels = { texts: [], balloons: [] };
  const strongSize = 14.5;
  if (lines < 1) return labels;
  const base = (line: number) => box.y + first + (line - 1) * lineHeight;
  const strong = [words.strong, words.strong.replace(/ /g, '\u2009')].find((text) => textWidth(text, strongSize) <= room);
  const strongWidth = strong ? textWidth(strong, strongSize) : 0;
  if (strong) labels.texts.push({ role: 'strong', text: strong, x: left, y: base(1), size: strongSize, anchor: 'start' });

  // the numbers go where they fit best: at the right of the second line, on a third, or at the right of the first
  const place = (line: number, width: number, from: 'left' | 'right') => {
    const row = balloonsIn(words.keynotes, width);
    if (row.shown.length === 0) return 0;
    const start = from === 'right' ? right - row.width + 2 : left;
    row.shown.forEach((number, i) => labels.balloons.push({ number, cx: start + i * balloonStep + balloonRadius, cy: base(line) - 5, r: balloonRadius }));
    if (row.more) labels.texts.push({ role: 'more', text: row.more, x: start + row.shown.length * balloonStep, y: base(line), size: 12, anchor: 'start' });
    return row.width;
  };
  const codeWidth = textWidth(words.code, 12.5);
  let onFirst = 0;
  let onSecond = 0;
  if (words.keynotes.length > 0) {
    const wants = Math.min(words.keynotes.length, 2) * balloonStep;
    if (lines >= 3 && room < codeWidth + gap + wants + 60) place(3, room, 'left');
    else if (lines >= 2) onSecond = place(2, Math.max(0, room - codeWidth - gap), 'right');
    if (labels.balloons.length === 0) onFirst = place(1, Math.max(0, room - (strongWidth ? strongWidth + gap : 0)), 'right');
  }
  if (lines >= 2) {
    const beside = room - (onSecond ? onSecond + gap : 0);
    const full = `${words.code} ${words.name}`;
    const wrapped = lines >= 3 && labels.balloons.every(({ cy }) => cy < base(2)) ? twoLines(full, beside, room) : null;
    const named = wrapped ? wrapped[0] : fitText(full, beside / 1.04, 12.5);
    // a name of two letters says nothing: the code alone then
    const text = wrapped || named.length >= words.code.length + 5 || named === full ? named : codeWidth <= beside ? words.code : '';
    if (text) labels.texts.push({ role: 'name', text, x: left, y: base(2), size: 12.5, anchor: 'start' });
    if (wrapped) labels.texts.push({ role: 'name', text: wrapped[1], x: left, y: base(3) - 2, size: 12.5, anchor: 'start' });
  }
  const used = strongWidth + gap + (onFirst ? onFirst + gap : 0);
  // on a single line the code matters more than the aside
  const aside = lines === 1 && strongWidth > 0 ? `${words.code}` : words.aside;
  if (!onFirst && aside && textWidth(aside, 12.5) <= room - used) labels.texts.push({ role: 'aside', text: aside, x: right, y: base(1), size: 12.5, anchor: 'end' });
  return labels;
}

/** The boxes that the labels take, for checking that none covers another. */
export const boxesOf = ({ texts, balloons }: ZoneLabels): Box[] => [
  ...texts.map(({ text, x, y, size, anchor }) => {
    const width = textWidth(text, size);
    return { x: anchor === 'end' ? x - width : x, y: y - size * 0.8, width, height: size };
  }),
  ...balloons.map(({ cx, cy, r }) => ({ x: cx - r, y: cy - r, width: 2 * r, height: 2 * r })),
];
