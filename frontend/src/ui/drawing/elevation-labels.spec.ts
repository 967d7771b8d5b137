import { describe, expect, it } from 'vitest';
import { layoutElevation } from './building-elevation-layout.js';
import type { ElevationLevel } from './building-elevation-layout.js';
import { boxesOf, labelZone } from './elevation-labels.js';
import type { ZoneWords } from './elevation-labels.js';
import { overlap } from './label-layout.js';
import type { Box } from './label-layout.js';

/** The same numbers on every run (a linear congruential generator). */
function numbers(seed: number) {
  let state = seed;
  const next = () => { state = (Math.imul(state, 1664525) + 1013904223) >>> 0; return state / 2 ** 32; };
  return { between: (from: number, to: number) => from + next() * (to - from), whole: (from: number, to: number) => Math.floor(from + next() * (to - from + 1)) };
}
const inside = (inner: Box, outer: Box) =>
  inner.x >= outer.x - 0.01 && inner.y >= outer.y - 0.01 && inner.x + inner.width <= outer.x + outer.width + 0.01 && inner.y + inner.height <= outer.y + outer.height + 0.01;

const clash = (boxes: readonly Box[]) => boxes.flatMap((a, i) => boxes.slice(i + 1).filter((b) => overlap(a, b)).map((b) => ({ a, b })));
/** What is wrong with the labels of a zone: those that leave it, and those that cover another. */
function faults(box: Box, words: ZoneWords, rails: number): unknown[] {
  const own = boxesOf(labelZone(box, words, rails));
  const free = { ...box, height: box.height - rails };
  return [...own.filter((a) => !inside(a, free)), ...clash(own)].map((fault) => ({ fault, box: { x: box.x, y: box.y, width: box.width, height: box.height }, words }));
}
const words = (keynotes: number[] = [], name = 'Foyer and mezzanine'): ZoneWords => ({ strong: 'R 120', code: 'Z03', name, aside: '12 345 m²', keynotes });

describe('the words on a zone', () => {
  it('never cover one another nor leave the zone, whatever its size and however much is open', () => {
    const random = numbers(20_261_201);
    const found: unknown[] = [];
    for (let i = 0; i < 4000; i++) {
      const box = { x: random.between(0, 900), y: random.between(0, 900), width: random.between(12, 700), height: random.between(6, 260) };
      const keynotes = Array.from({ length: random.whole(0, 14) }, (_, n) => n + random.whole(1, 120));
      found.push(...faults(box, words(keynotes, 'Name of any length at all, long or short'.slice(0, random.whole(1, 40))), random.between(0, 12)));
    }
    expect(found).toEqual([]);
  });
  it('never cover one another over whole buildings, from one level to thirty', () => {
    const random = numbers(7);
    const found: unknown[] = [];
    for (let i = 0; i < 60; i++) {
      let at = -random.between(0, 12);
      const levels = Array.from({ length: random.whole(1, 30) }, (_, n): ElevationLevel => {
        const heightM = random.between(0.6, 14);
        const level = { id: `l${n}`, code: `L${n}`, name: 'Level', elevationM: at, heightM, zones: Array.from({ length: random.whole(0, 9) }, (_z, k) => ({ id: `${n}-${k}`, code: `Z${n}${k}`, name: 'Zone', periodMin: 60, protectedAreaM2: random.whole(0, 3) ? random.between(0, 2000) : 0, members: 10, settled: 7, open: 3, issuedMembers: 0 })) };
        at += heightM;
        return level;
      });
      const { boxes } = layoutElevation(levels, random.between(300, 2200));
      const said = words([1, 22, 333].slice(0, random.whole(0, 3)));
      found.push(...boxes.flatMap((box) => faults(box, said, 9)), ...clash(boxes.flatMap((box) => boxesOf(labelZone(box, said, 9)))));
    }
    expect(found).toEqual([]);
  });
  it('says everything where there is room, and in what order it gives way', () => {
    const text = (box: Omit<Box, 'x' | 'y'>, keynotes: number[] = []) => {
      const { texts, balloons } = labelZone({ x: 0, y: 0, ...box }, words(keynotes), 9);
      return [...texts.map((t) => t.text), ...balloons.map((b) => `(${b.number})`)];
    };
    expect(text({ width: 400, height: 80 }, [4, 5])).toEqual(['R 120', 'Z03 Foyer and mezzanine', '12 345 m²', '(4)', '(5)']);
    expect(text({ width: 62, height: 80 })).toEqual(['R 120', 'Z03']);
    // too low for two lines: the number of what is open before the area, the code in place of the area
    expect(text({ width: 400, height: 30 }, [4])).toEqual(['R 120', '(4)']);
    expect(text({ width: 400, height: 30 })).toEqual(['R 120', 'Z03']);
    expect(text({ width: 400, height: 12 }, [4])).toEqual([]);
    // more open than fits is counted
    expect(text({ width: 120, height: 80 }, [1, 2, 3, 4, 5, 6, 7])).toContain('+4');
  });
});
