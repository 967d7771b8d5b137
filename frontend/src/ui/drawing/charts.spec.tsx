import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { firstReach, linearScale, linePath, minuteTicks, niceTicks, valueAt } from './chart-scale.js';
import { boxesAlong, labelBox, overlap, placeLabels } from './label-layout.js';
import type { LabelWish } from './label-layout.js';
import { SteelReading } from './steel-reading.js';
import { layoutReading, loadLabels, ticksBeside, timeLabels } from './steel-reading-layout.js';
import type { SteelReadingData } from './steel-reading-layout.js';
import { crossing, curveInWords, readingInWords } from './steel-reading-words.js';

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

// invented figures, of the course that curves of this kind take
const resistance: [number, number][] = [[20, 522], [400, 522], [600, 300], [800, 60], [1200, 0]];
const load = { curves: [{ name: 'bending resistance', points: resistance, className: 'd-ink' }], effect: 330, effectText: ['effect in fire', '330.0 kNm'] as const, axis: 'bending moment, kNm', format: (v: number | null) => (v === null ? 'no value' : `${v.toFixed(1)} kNm`) };
const data: SteelReadingData = {
  load, fire: [[0, 20], [30, 840], [60, 945]], bare: [[0, 20], [60, 900]], protected: null, periodMin: 60, fireName: 'Standard fire', criticalC: 572.9, criticalText: 'θ_cr 572 °C', bareLimitC: 572.9,
};
const withProtection: SteelReadingData = { ...data, protected: [[0, 20], [60, 620]] };

describe('resistance and heating over one temperature axis', () => {
  it('puts both drawings on the same scale side by side, and below one another where they would be narrow', () => {
    const wide = layoutReading(data, 1000);
    expect(wide.load?.y(572.9)).toBe(wide.time.y(572.9));
    expect(wide.load!.plot.x + wide.load!.plot.width).toBeLessThan(wide.time.plot.x);
    const narrow = layoutReading(data, 340);
    expect(narrow.time.plot.y).toBeGreaterThan(narrow.load!.plot.y + narrow.load!.plot.height);
    expect(narrow.load!.y(0) - narrow.load!.y(500)).toBeCloseTo(narrow.time.y(0) - narrow.time.y(500), 9);
  });
  it('leaves out the left drawing where nothing was compared with a load', () => {
    const { load: none, time, width } = layoutReading({ ...data, load: null }, 900);
    expect(none).toBeNull();
    expect(time.plot.width).toBeGreaterThan(width * 0.85);
  });
  it('holds an effect above the resistance within the drawing', () => {
    const pane = layoutReading({ ...data, load: { ...load, effect: 700 }, criticalC: null }, 1000).load!;
    expect(pane.x(700)).toBeLessThanOrEqual(pane.plot.x + pane.plot.width);
  });
  it('keeps the figures of the axis apart from that of the critical temperature', () => {
    const { time, temperatures } = layoutReading(data, 1000);
    for (const criticalC of [20, 399, 572.9, 601, 1195]) for (const t of ticksBeside(temperatures, time.y, criticalC)) expect(Math.abs(time.y(t) - time.y(criticalC))).toBeGreaterThanOrEqual(15);
  });
  const cases: SteelReadingData[] = [100, 355, 500, 572.9, 700, 940, 1150].flatMap((criticalC) => [15, 60, 120, 240].flatMap((periodMin) => [data, withProtection, { ...data, load: null }, { ...data, load: { ...load, effect: 700 } }]
    .map((base) => ({ ...base, criticalC, bareLimitC: criticalC, periodMin, fire: [...base.fire, [periodMin * 1.25 + 61, 1049] as const] }))));
  it.each([300, 358, 520, 640, 930, 1500])('at %d px no name covers another or leaves its drawing, whatever the temperature and the period', (width) => {
    for (const one of cases) {
      const layout = layoutReading(one, width);
      const panes = [{ pane: layout.time, placed: timeLabels(one, layout.time) }, ...(layout.load && one.load ? [{ pane: layout.load, placed: loadLabels(one.load, layout.load, one) }] : [])];
      for (const { pane: { plot }, placed } of panes) {
        const boxes = placed.map(({ label, place }) => labelBox(label.text, label.fontSize, place));
        for (const [i, a] of boxes.entries()) {
          expect(a.x).toBeGreaterThanOrEqual(plot.x);
          expect(a.x + a.width).toBeLessThanOrEqual(plot.x + plot.width);
          for (const b of boxes.slice(i + 1)) expect(overlap(a, b)).toBe(false);
        }
        // what the drawing is read for is always named
        expect(placed.map(({ label }) => label.text)).toContain(plot === layout.time.plot ? `R ${one.periodMin}` : one.load?.effectText[1]);
      }
    }
  });
});

describe('what the drawing says', () => {
  it('finds where a falling resistance meets its effect', () => {
    expect(crossing(resistance, 330)).toBeCloseTo(400 + (200 * (522 - 330)) / 222);
    expect(crossing(resistance, 600)).toBeNull();
    expect(curveInWords(load.curves[0]!, 600, load.format)).toContain('above the resistance from the start');
  });
  it('says in words what is drawn, and that a temperature is not determined', () => {
    expect(readingInWords(data)).toBe('Bending resistance against steel temperature: 522.0 kNm cold; the effect in fire is 330.0 kNm. They meet at 572 °C. Standard fire against time. At 60 min the fire is at 945 °C, bare steel at 900 °C. Bare steel reaches its critical temperature of 572 °C after 37 min.');
    expect(readingInWords({ ...data, criticalC: null, bareLimitC: null })).toContain('not determined');
  });
  it('gives its values to the keyboard: minutes on the right, a temperature across both', async () => {
    render(<SteelReading data={withProtection} />);
    const [temperature, minutes] = screen.getAllByRole('slider') as [HTMLElement, HTMLElement];
    minutes.focus();
    await userEvent.keyboard('{End}{ArrowLeft}');
    expect(minutes).toHaveAttribute('aria-valuenow', '59');
    expect(minutes.getAttribute('aria-valuetext')).toBe('At 59 min: fire 942 °C, bare steel 885 °C and protected steel 610 °C');
    temperature.focus();
    await userEvent.keyboard('{Home}{PageUp}{PageUp}{PageUp}{PageUp}');
    expect(temperature.getAttribute('aria-valuetext')).toBe('At 400 °C: bending resistance 522.0 kNm against 330.0 kNm; bare steel is there after 25 min and protected steel is there after 38 min');
    await userEvent.keyboard('{Escape}');
    expect(temperature.getAttribute('aria-valuetext')).toBe('no value read yet');
  });
  it('has its values as a table too', () => {
    render(<SteelReading data={data} />);
    const [loads, minutes] = screen.getAllByRole('table', { hidden: true });
    expect(loads).toHaveTextContent('400522.0 kNm');
    expect(minutes).toHaveTextContent('60945900');
  });
});
