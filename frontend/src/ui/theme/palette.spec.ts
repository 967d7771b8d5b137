import { describe, expect, it } from 'vitest';
import { dark, light } from './palette.js';
import type { Palette } from './palette.js';

/** WCAG 2.2, relative luminance and contrast ratio, as the definitions give them. */
const channel = (c: number): number => (c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4);
function luminance(hex: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => channel(Number.parseInt(hex.slice(at, at + 2), 16) / 255));
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}
function contrast(a: string, b: string): number {
  const [lighter = 0, darker = 0] = [luminance(a), luminance(b)].sort((x, y) => y - x);
  return (lighter + 0.05) / (darker + 0.05);
}

type Token = keyof Palette;
/** Text on what it stands on: grounds of pages, panels, what the pointer is over, heads of groups, tints; and sheet on what is filled. */
const text: [Token, Token[]][] = [
  ['ink', ['paper', 'sheet', 'hover', 'line2', 'settledTint', 'attentionTint']],
  ['ink2', ['paper', 'sheet', 'hover', 'line2']],
  ['settled', ['paper', 'sheet', 'hover', 'settledTint']],
  ['attention', ['sheet', 'hover', 'attentionTint']],
  ['sheet', ['ink', 'ink2', 'settled', 'attention']],
];
/** What has to be seen to be used or understood: frames of fields, drawn steel, rails and hatches. */
const graphics: [Token, Token[]][] = [
  ['ink3', ['sheet']],
  ['ink2', ['paper', 'sheet', 'hover']],
  ['settled', ['paper', 'sheet', 'hover', 'settledTint']],
  ['attention', ['paper', 'sheet', 'hover', 'attentionTint']],
];
const pairs = (table: [Token, Token[]][]): [Token, Token][] => table.flatMap(([front, grounds]) => grounds.map((ground): [Token, Token] => [front, ground]));

describe('contrast is computed as WCAG 2.2 does', () => {
  // W3C, Understanding 1.4.3: black on white 21:1; #767676 is the lightest grey that reaches 4.5:1 on white (4.54), #777777 does not (4.48)
  it.each([['#000000', 21], ['#767676', 4.54], ['#777777', 4.48]])('%s on white is %d', (grey, expected) => {
    expect(contrast(grey, '#FFFFFF')).toBeCloseTo(expected, 2);
  });
});

describe.each([['light', light], ['dark', dark]] as const)('on the %s ground', (_ground, palette) => {
  it.each(pairs(text))('%s is read on %s: 4.5 or more', (front, ground) => {
    expect(contrast(palette[front], palette[ground])).toBeGreaterThanOrEqual(4.5);
  });
  it.each(pairs(graphics))('%s is seen on %s: 3 or more', (front, ground) => {
    expect(contrast(palette[front], palette[ground])).toBeGreaterThanOrEqual(3);
  });
});

describe('the styles', () => {
  const sheets = import.meta.glob<string>('../../**/*.css', { query: '?raw', import: 'default', eager: true });
  it('are read', () => { expect(Object.keys(sheets).length).toBeGreaterThan(10); });
  it.each(Object.entries(sheets))('%s gives no text the ink that is for drawing aids, nor that of lines', (_path, css) => {
    expect(css.match(/(?<![-\w])color:\s*var\(--(ink-3|line|line-2)\)/g)).toBeNull();
  });
});
