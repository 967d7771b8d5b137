import { describe, expect, it } from 'vitest';
import { labelBox, overlap } from './label-layout.js';
import { layoutThicknessMap, stepCell, stepLabels, stepLines, thinLabels } from './thickness-map-layout.js';

// invented: no real product behaves like this
const data = { sectionFactorsPerM: [60, 100, 160], temperaturesC: [400, 500], thickness: [[300, 200], [400, 250], [600, null]] };

describe('layout of the thickness map', () => {
  const { cells, x, y, plot } = layoutThicknessMap(data, 600);
  it('draws a cell for every section factor and temperature', () => expect(cells).toHaveLength(6));
  it('ends each cell at its own section factor and begins it at its own temperature, to scale', () => {
    for (const cell of cells) {
      expect(cell.x + cell.width).toBeCloseTo(x(data.sectionFactorsPerM[cell.row] as number), 9);
      expect(cell.y + cell.height).toBeCloseTo(y(data.temperaturesC[cell.column] as number), 9);
    }
    const widthOf = (row: number) => cells.find((c) => c.row === row)?.width ?? 0;
    expect(widthOf(2) / widthOf(1)).toBeCloseTo(60 / 40, 9);
  });
  it('covers the plot without gap or overlap', () => {
    expect(cells.reduce((sum, c) => sum + c.width * c.height, 0)).toBeCloseTo(plot.width * plot.height, 6);
  });
  it('tints by the share of the greatest thickness, and keeps what is not assessed without a value', () => {
    expect(cells.find((c) => c.value === 600)?.share).toBe(1);
    expect(cells.find((c) => c.value === 300)?.share).toBe(0.5);
    expect(cells.find((c) => c.row === 2 && c.column === 1)).toMatchObject({ value: null, share: 0 });
  });
  it('draws a table of one row and one column', () => {
    const single = layoutThicknessMap({ sectionFactorsPerM: [80], temperaturesC: [550], thickness: [[12]] }, 300);
    expect(single.cells).toHaveLength(1);
    expect(single.cells[0]?.width).toBeGreaterThan(0);
    expect(single.cells[0]?.height).toBeGreaterThan(0);
  });
});

describe('reading cell by cell', () => {
  it('moves with the arrows: right to a greater A/V, up to a higher temperature, and stays on the map', () => {
    expect(stepCell({ row: 0, column: 0 }, 'ArrowRight', 3, 2)).toEqual({ row: 1, column: 0 });
    expect(stepCell({ row: 0, column: 0 }, 'ArrowUp', 3, 2)).toEqual({ row: 0, column: 1 });
    expect(stepCell({ row: 0, column: 0 }, 'ArrowLeft', 3, 2)).toEqual({ row: 0, column: 0 });
    expect(stepCell({ row: 1, column: 1 }, 'End', 3, 2)).toEqual({ row: 2, column: 1 });
    expect(stepCell({ row: 0, column: 0 }, 'a', 3, 2)).toBeNull();
  });
  it('leaves out labels that would touch', () => expect(thinLabels([0, 10, 20, 30], (v) => v * 2, 30)).toEqual([0, 20]));
});

describe('lines where the thickness passes a round figure', () => {
  it('part the cells below it from the others, and none from what is outside', () => {
    const layout = layoutThicknessMap(data, 600);
    const lines = stepLines(layout, data);
    expect(lines.map((l) => l.level)).toEqual([300, 400, 500, 600]);
    const at300 = lines[0]!.edges;
    // 200 | 250 above 300 | 400 | 600: below 300 lie both upper cells, to their right lies the one outside
    expect(at300).toHaveLength(2);
    for (const edge of at300) expect(edge.y1).toBe(edge.y2);
    expect(lines.find((l) => l.level === 500)?.edges).toEqual([{ x1: layout.x(100), x2: layout.x(100), y1: layout.y(500), y2: layout.y(400) }]);
  });
  it.each([280, 640, 1400])('carry figures that never cover one another, at %d px', (width) => {
    const factors = Array.from({ length: 120 }, (_, i) => 40 + i * 3);
    const temperatures = Array.from({ length: 40 }, (_, i) => 350 + i * 10);
    const fine = { sectionFactorsPerM: factors, temperaturesC: temperatures, thickness: factors.map((f, i) => temperatures.map((t, j) => (i + 3 * j < 30 ? null : 100 + f * 12 - t))) };
    const layout = layoutThicknessMap(fine, width);
    const labels = stepLabels(stepLines(layout, fine), layout, (level) => `${level} µm`);
    expect(labels.length).toBeGreaterThan(2);
    const boxes = labels.map((l) => labelBox(l.text, 11.5, l.place));
    for (const [i, a] of boxes.entries()) for (const b of boxes.slice(i + 1)) expect(overlap(a, b)).toBe(false);
  });
});
