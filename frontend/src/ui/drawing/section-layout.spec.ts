import { readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import type { Exposure, SectionShape } from '@mantlet/common';
import { overlap } from './label-layout.js';
import type { Box } from './label-layout.js';
import { layoutSection, sectionDimensions } from './section-layout.js';
import { surroundings } from './section-surroundings.js';
import { shapePreview } from './shape-preview.js';

/** Every section of the catalogue as it is seeded, by the dimensions of its standard. */
const folder = join(import.meta.dirname, '../../../../seeds/sections');
function readShapes(file: string): [string, SectionShape][] {
  const [head = '', ...lines] = readFileSync(join(folder, file), 'utf8').trim().split('\n');
  const columns = head.split(',');
  return lines.map((line) => {
    // quoted names hold commas, and stand before the numbers: these are read from the end
    const cells = line.split(',').slice(-columns.length + 4).map(Number);
    const of = (name: string) => cells[columns.slice(4).indexOf(name)] as number;
    const [hMm, bMm, twMm, tfMm, tMm, rootRadiusMm] = ['h_mm', 'b_mm', 'tw_mm', 'tf_mm', 't_mm', 'root_radius_mm'].map(of) as [number, number, number, number, number, number];
    const shapes: Record<string, SectionShape> = {
      'i.csv': { kind: 'i', hMm, bMm, twMm, tfMm, rootRadiusMm }, 'tee.csv': { kind: 'tee', hMm, bMm, twMm, tfMm, rootRadiusMm },
      'channel.csv': { kind: 'channel', hMm, bMm, twMm, tfMm, rootRadiusMm, toeRadiusMm: of('toe_radius_mm'), flangeSlope: of('flange_slope') },
      'angle.csv': { kind: 'angle', hMm, bMm, tMm, rootRadiusMm, toeRadiusMm: of('toe_radius_mm') }, 'circular-hollow.csv': { kind: 'circular-hollow', dMm: of('d_mm'), tMm },
      'rectangular-hollow.csv': { kind: 'rectangular-hollow', hMm, bMm, tMm, outerRadiusMm: of('outer_radius_by_t') * tMm, innerRadiusMm: of('inner_radius_by_t') * tMm },
    };
    return [line.split(',')[1] as string, shapes[file] as SectionShape];
  });
}
/** and what projects draw up for themselves, slender and squat */
const own: [string, SectionShape][] = [
  ['plate girder', { kind: 'i', hMm: 1800, bMm: 400, twMm: 15, tfMm: 40, rootRadiusMm: 0 }],
  ['unequal flanges', { kind: 'i-unequal', hMm: 900, twMm: 12, topWidthMm: 200, topThicknessMm: 20, bottomWidthMm: 450, bottomThicknessMm: 35, rootRadiusMm: 0 }],
  ['welded box', { kind: 'box', hMm: 600, bMm: 400, twMm: 20, tfMm: 30, clearWidthMm: 320 }],
  ['upright flat', { kind: 'flat', hMm: 1000, tMm: 8 }], ['lying flat', { kind: 'flat', hMm: 20, tMm: 900 }], ['round bar', { kind: 'round', dMm: 40 }],
];
const exposures: (Exposure | undefined)[] = [
  undefined, { arrangement: 'four-sides', reason: '' }, { arrangement: 'three-sides', reason: '' }, { arrangement: 'slab-edge-one-side', reason: '' },
  { arrangement: 'slab-edge-two-sides', reason: '', faces: ['left', 'bottom'] }, { arrangement: 'given-faces', reason: '', faces: ['bottom'] },
];
const within = (inner: Box, width: number, height: number) =>
  inner.x >= -0.01 && inner.y >= -0.01 && inner.x + inner.width <= width + 0.01 && inner.y + inner.height <= height + 0.01;

describe.each([...readdirSync(folder).filter((f) => f.endsWith('.csv')).map((f) => [f, readShapes(f)] as const), ['sections of a project', own] as const])('%s', (_, shapes) => {
  it('is not empty', () => expect(shapes.length).toBeGreaterThan(5));
  it.each([[200, 0], [250, 0], [340, 0], [200, 45], [340, 45]])('at %d px with %d mm round it: every section is drawn within its box, its figures inside the drawing and clear of steel, slab and each other', (width, coverMm) => {
    const wrong: string[] = [];
    for (const [name, shape] of shapes) {
      const outline = shapePreview(shape);
      if (!outline) { wrong.push(`${name} is not drawn`); continue; }
      const reach = (axis: 0 | 1, size: number) => outline.loops.flat().every((s) => [s.from, s.to].every((p) => Math.abs(p[axis]) <= size / 2 + 1e-6));
      if (!reach(0, outline.widthMm) || !reach(1, outline.heightMm)) wrong.push(`${name} leaves its box`);
      for (const exposure of exposures) {
        const layout = layoutSection(outline, exposure, width, 330, coverMm);
        const surrounded = exposure !== undefined && exposure.arrangement !== 'four-sides';
        const { height: tall, width: wide } = sectionDimensions(outline, layout, surrounded);
        const where = `${name}, ${exposure?.arrangement ?? 'no exposure'}`;
        const { section, cover } = layout;
        const covered = { x: section.x - cover, y: section.y - (surrounded ? 0 : cover), width: section.width + 2 * cover, height: section.height + cover * (surrounded ? 1 : 2) };
        if (!within(covered, layout.width, layout.height)) wrong.push(`${where}: section`);
        for (const { box } of [tall, wide]) {
          if (!within(box, layout.width, layout.height)) wrong.push(`${where}: a figure leaves the drawing`);
          if (overlap(box, covered)) wrong.push(`${where}: a figure on the steel or its protection`);
        }
        if (overlap(tall.box, wide.box)) wrong.push(`${where}: figures cover each other`);
        if (exposure && surroundings(exposure, layout.section, layout.reach).some((part) => part.label !== null && overlap(part, tall.box))) wrong.push(`${where}: a figure on the slab`);
      }
    }
    expect(wrong).toEqual([]);
  });
});
