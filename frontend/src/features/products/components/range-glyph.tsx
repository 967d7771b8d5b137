import type { EvidenceRange } from '@mantlet/common';
import '../../../ui/drawing/charts.css';
import { linearScale } from '../../../ui/drawing/chart-scale.js';

/** What the axes of a list's small maps reach: the same for every row. */
export interface RangeSpan { sectionFactorPerM: number; temperatureC: number }
export const spanOf = (ranges: readonly EvidenceRange[]): RangeSpan => ({
  sectionFactorPerM: Math.max(1, ...ranges.map((r) => r.sectionFactorPerM[1])), temperatureC: Math.max(1, ...ranges.map((r) => r.temperatureC[1])),
});

const size = { width: 74, height: 46 };
/** The assessed box in A/V (across) and temperature (upwards), from zero. The words beside it say the same, so it has none of its own. */
export function RangeGlyph({ range, span }: { range: EvidenceRange; span: RangeSpan }) {
  const x = linearScale([0, span.sectionFactorPerM], [1.5, size.width - 2]);
  const y = linearScale([0, span.temperatureC], [size.height - 1.5, 2]);
  const [left, right] = range.sectionFactorPerM.map(x) as [number, number];
  const [low, high] = [y(range.temperatureC[0] ?? 20), y(range.temperatureC[1])];
  return (
    <svg className="mt-drawing mt-range-glyph" viewBox={`0 0 ${size.width} ${size.height}`} width={size.width} height={size.height} aria-hidden="true" focusable="false">
      <rect className="mt-range-area" x={left} y={high} width={Math.max(1, right - left)} height={Math.max(1, low - high)} />
      <path className="d-axis" d={`M1 0V${size.height - 1}H${size.width}`} />
    </svg>
  );
}
