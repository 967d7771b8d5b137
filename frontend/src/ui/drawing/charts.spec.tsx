import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { firstReach, linearScale, linePath, minuteTicks, niceTicks, valueAt } from './chart-scale.js';
import { HeatingChart, heatingInWords } from './heating-chart.js';
import { boxesAlong, labelBox, overlap, placeLabels } from './label-layout.js';
import type { LabelWish } from './label-layout.js';
import { crossing, resistanceInWords } from './resistance-chart.js';

describe('scales', () => {
  it('runs both ways and turns values over for a y axis', () => {
    const y = linearScale([0, 1000], [300, 20]);
    expect(y(0)).toBe(300);
    expect(y(1000)).toBe(20);
    expect(y.invert(y(578))).toBeCloseTo(578);
  });
  it.each([[0, 522], [0, 0.37], [0, 1049], [0, 12_345], [0, 6.3]])('ticks from %d to %d are round, few and cover the values', (from, to) => {
    const ticks = niceTicks(from, to);
    expect(ticks.length).toBeGreaterThan(2);
    expect(ticks.length).toBeLessThanOrEqual(7);
    expect(ticks[0]).toBeLessThanOrEqual(from);
    expect(ticks[ticks.length - 1]).toBeGreaterThanOrEqual(to);
    const step = (ticks[1] as number) - (ticks[0] as number);
    expect(step / 10 ** Math.floor(Math.log10(step) + 1e-9)).toBeCloseTo([1, 2, 2.5, 5].reduce((best, s) => (Math.abs(step / 10 ** Math.floor(Math.log10(step) + 1e-9) - s) < 1e-6 ? s : best), NaN), 9);
  });
  it('counts minutes in steps of a clock', () => {
    expect(minuteTicks(120)).toEqual([0, 20, 40, 60, 80, 100, 120]);
    expect(minuteTicks(30)).toEqual([0, 5, 10, 15, 20, 25, 30]);
  });
  it('reads between points and says nothing outside them', () => {
    expect(valueAt([[0, 20], [10, 120]], 5)).toBe(70);
    expect(valueAt([[0, 20], [10, 120]], 11)).toBeNull();
    expect(firstReach([[0, 20], [10, 120]], 70)).toBe(5);
    expect(firstReach([[0, 20], [10, 120]], 130)).toBeNull();
  });
  it('writes a path through the points', () => {
    expect(linePath([[0, 0], [10, 5]], linearScale([0, 10], [0, 100]), linearScale([0, 10], [100, 0]))).toBe('M0 100L100 50');
  });
});

describe('placeLabels', () => {
  const bounds = { x: 0, y: 0, width: 300, height: 200 };
  const wish = (text: string, x = 100, y = 100): LabelWish => ({ text, fontSize: 12, places: [{ x, y, anchor: 'start' }] });
  it('puts no label over another, however many want one place', () => {
    const wishes = ['fire', 'bare', 'protected', 'θcr 578 °C', 'R 90'].map((t) => wish(t));
    const boxes = placeLabels(wishes, bounds).map((place, i) => { expect(place).not.toBeNull(); return labelBox(wishes[i]!.text, 12, place!); });
    for (const [i, a] of boxes.entries()) for (const b of boxes.slice(i + 1)) expect(overlap(a, b)).toBe(false);
  });
  it('keeps labels inside and off the lines where there is room', () => {
    const x = linearScale([0, 10], [0, 300]);
    const y = linearScale([0, 10], [200, 0]);
    const lines = boxesAlong([[0, 5], [10, 5]], x, y);
    const [other] = placeLabels([{ text: 'near it', fontSize: 12, places: [{ x: 290, y: 100, anchor: 'end' }] }], bounds, lines);
    const box = labelBox('near it', 12, other!);
    expect(lines.some((l) => overlap(l, box))).toBe(false);
    expect(box.x + box.width).toBeLessThanOrEqual(300);
    expect(placeLabels([wish('no room at the edge', 290, 100)], bounds, lines)).toEqual([null]);
  });
});

describe('what the drawings say', () => {
  const bending = { limitState: 'bending', unit: 'kNm' as const, effect: 330, points: [[20, 522], [400, 522], [600, 300]] as [number, number][] };
  it('finds where a falling resistance meets its effect', () => {
    expect(crossing(bending)).toBeCloseTo(400 + (200 * (522 - 330)) / 222);
    expect(crossing({ ...bending, effect: 600 })).toBeNull();
    expect(resistanceInWords({ ...bending, effect: 600 })).toContain('above the resistance from the start');
  });
  const charts = { fire: [[0, 20], [60, 945]] as [number, number][], bare: [[0, 20], [60, 900]] as [number, number][], protected: null, periodMin: 60 };
  it('says in words what is drawn, and that a temperature is not determined', () => {
    expect(heatingInWords({ charts, criticalC: null, fireName: 'Standard fire' })).toContain('not determined');
    expect(heatingInWords({ charts, criticalC: 460, fireName: 'Standard fire' })).toContain('after 30 min');
  });
  it('gives its values to the keyboard', async () => {
    render(<HeatingChart charts={charts} criticalC={460} fireName="Standard fire" />);
    const cursor = screen.getByRole('slider');
    cursor.focus();
    await userEvent.keyboard('{ArrowRight}');
    expect(cursor).toHaveAttribute('aria-valuenow', '31');
    expect(cursor.getAttribute('aria-valuetext')).toMatch(/^At 31 min: fire 498 °C and bare 475 °C$/);
    await userEvent.keyboard('{End}');
    expect(cursor).toHaveAttribute('aria-valuenow', '60');
  });
});
