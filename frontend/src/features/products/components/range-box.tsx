import '../../../ui/drawing/charts.css';
import { linearScale, niceTicks } from '../../../ui/drawing/chart-scale.js';

const frame = { width: 420, height: 250, left: 46, right: 16, top: 26, bottom: 40 };

/** The assessed range as a box in A/V and temperature, to scale from zero; an open lower limit reaches 20 °C. */
export function RangeBox({ sectionFactor: [fromFactor, toFactor], temperature: [fromC, toC], label }: { sectionFactor: readonly [number, number]; temperature: readonly [number | null, number]; label: string }) {
  const xTicks = niceTicks(0, toFactor * 1.12);
  const yTicks = niceTicks(0, toC * 1.12);
  const x = linearScale([0, xTicks.at(-1) ?? toFactor], [frame.left, frame.width - frame.right]);
  const y = linearScale([0, yTicks.at(-1) ?? toC], [frame.height - frame.bottom, frame.top]);
  const lowC = fromC ?? 20;
  const words = `${label}: A/V ${fromFactor} to ${toFactor}, ${fromC === null ? 'up to' : `${fromC} to`} ${toC} °C`;
  return (
    <svg className="mt-drawing mt-range-box" viewBox={`0 0 ${frame.width} ${frame.height}`} role="img" aria-label={words}>
      {xTicks.map((t) => <g key={t}><line className="d-grid" x1={x(t)} x2={x(t)} y1={frame.top} y2={y(0)} /><text className="d-sub" x={x(t)} y={y(0) + 16} fontSize="11.5" textAnchor="middle">{t}</text></g>)}
      {yTicks.map((t) => <g key={t}><line className="d-grid" x1={frame.left} x2={frame.width - frame.right} y1={y(t)} y2={y(t)} /><text className="d-sub" x={frame.left - 6} y={y(t) + 4} fontSize="11.5" textAnchor="end">{t}</text></g>)}
      <path className="d-axis" d={`M${frame.left} ${frame.top}V${y(0)}H${frame.width - frame.right}`} />
      <rect x={x(fromFactor)} y={y(toC)} width={x(toFactor) - x(fromFactor)} height={y(lowC) - y(toC)} className="mt-range-area" {...(fromC === null ? { strokeDasharray: '6 3' } : {})} />
      <text x={(x(fromFactor) + x(toFactor)) / 2} y={(y(toC) + y(lowC)) / 2} fontSize="13" fontWeight="600" textAnchor="middle">A/V {fromFactor} to {toFactor}</text>
      <text x={(x(fromFactor) + x(toFactor)) / 2} y={(y(toC) + y(lowC)) / 2 + 18} fontSize="13" textAnchor="middle">{fromC === null ? 'up to' : `${fromC} to`} {toC} °C</text>
      <text className="d-sub" x={frame.width - frame.right} y={frame.height - 6} fontSize="11.5" textAnchor="end">section factor A/V, m⁻¹</text>
      <text className="d-sub" x={4} y={frame.top - 9} fontSize="11.5">critical temperature, °C</text>
    </svg>
  );
}
