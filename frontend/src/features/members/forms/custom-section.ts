import type { SectionKind, SectionShape } from '@mantlet/common';

export const sectionKindNames: Record<SectionKind, string> = {
  i: 'I or H, equal flanges', 'i-unequal': 'I, unequal flanges', channel: 'Channel', tee: 'Tee', angle: 'Angle', 'rectangular-hollow': 'Rectangular hollow',
  'circular-hollow': 'Circular hollow', box: 'Welded box', flat: 'Flat', round: 'Round bar',
};

export interface DimensionField { name: string; label: string; help?: string; unit: 'mm' | '' }
const mm = (name: string, label: string, help?: string): DimensionField => ({ name, label, unit: 'mm', ...(help && { help }) });
const root = mm('rootRadiusMm', 'Root radius r', '0 for a welded section.');
const web = mm('twMm', 'Web t_w');
const flange = mm('tfMm', 'Flange t_f');

/** The dimensions each shape is made from, in the order they are measured. */
export const dimensionsOf: Record<SectionKind, readonly DimensionField[]> = {
  i: [mm('hMm', 'Depth h'), mm('bMm', 'Width b'), web, flange, root],
  'i-unequal': [mm('hMm', 'Depth h'), web, mm('topWidthMm', 'Top flange width'), mm('topThicknessMm', 'Top flange thickness'), mm('bottomWidthMm', 'Bottom flange width'), mm('bottomThicknessMm', 'Bottom flange thickness'), root],
  channel: [mm('hMm', 'Depth h'), mm('bMm', 'Width b'), web, flange, root, mm('toeRadiusMm', 'Toe radius'), { name: 'flangeSlope', label: 'Slope of the inner flange face', unit: '', help: '0 for parallel flanges, 0.08 or 0.05 for tapered ones.' }],
  tee: [mm('hMm', 'Depth h'), mm('bMm', 'Width b'), web, flange, root],
  angle: [mm('hMm', 'Longer leg h'), mm('bMm', 'Shorter leg b'), mm('tMm', 'Thickness t'), root, mm('toeRadiusMm', 'Toe radius')],
  'rectangular-hollow': [mm('hMm', 'Depth h'), mm('bMm', 'Width b'), mm('tMm', 'Wall t'), mm('outerRadiusMm', 'Outer corner radius'), mm('innerRadiusMm', 'Inner corner radius')],
  'circular-hollow': [mm('dMm', 'Diameter d'), mm('tMm', 'Wall t')],
  box: [mm('hMm', 'Depth h'), mm('bMm', 'Flange width b'), web, flange, mm('clearWidthMm', 'Clear width between the webs')],
  flat: [mm('hMm', 'Width h'), mm('tMm', 'Thickness t')],
  round: [mm('dMm', 'Diameter d')],
};

/** Dimensions that a section may well have none of. */
const zero = new Set(['rootRadiusMm', 'toeRadiusMm', 'outerRadiusMm', 'innerRadiusMm', 'flangeSlope']);

/** A shape of the kind with what is already typed kept where the kinds share a dimension. */
export function shapeOfKind(kind: SectionKind, typed: Readonly<Record<string, unknown>>): Record<string, unknown> {
  const dimensions = dimensionsOf[kind].map(({ name }) => [name, typed[name] ?? (zero.has(name) ? 0 : null)] as const);
  return { kind, ...Object.fromEntries(dimensions) };
}

/** The typed shape once every dimension of its kind is a number, else null. */
export function completeShape(typed: unknown): SectionShape | null {
  const shape = typed as ({ kind: SectionKind } & Record<string, unknown>) | null | undefined;
  if (!shape?.kind) return null;
  return dimensionsOf[shape.kind].every(({ name }) => typeof shape[name] === 'number') ? (shape as unknown as SectionShape) : null;
}
