import { useId, useState } from 'react';
import type { KeyboardEvent, PointerEvent, ReactNode } from 'react';
import { boxesAlong, placeLabels } from './label-layout.js';
import type { Box, LabelWish, Place } from './label-layout.js';
import { linePath, linearScale, valueAt } from './chart-scale.js';
import type { Points, Scale } from './chart-scale.js';
import { useElementWidth } from './use-element-width.js';
import './charts.css';

export interface Axis {
  to: number;
  ticks: readonly number[];
  /** what is measured, with its unit: "steel temperature, °C" */
  label: string;
}
export interface Series {
  name: string;
  points: Points;
  /** classes of the line: d-ink, d-thin, d-dashed, d-protected */
  className: string;
  /** classes of its name on the drawing */
  textClassName?: string;
  /** x at which its name best stands */
  labelAt: number;
  side?: 'above' | 'below';
}
export interface ChartLabel extends LabelWish { className?: string; weight?: number }
export interface ChartFrame { x: Scale; y: Scale; plot: Box }

interface LineChartProps {
  /** the drawing in words */
  label: string;
  xAxis: Axis;
  yAxis: Axis;
  series: readonly Series[];
  /** what an arrow key moves the cursor by */
  step: number;
  /** values at the cursor, in words: "At 45 min: fire 902 °C, bare 815 °C" */
  sayAt: (x: number, values: (number | null)[]) => string;
  /** how a value of an axis is written in the table of values */
  unitX: string;
  unitY: string;
  decimals?: number;
  /** lines and marks of limits, below the series */
  marks?: (frame: ChartFrame) => ReactNode;
  /** names of those marks */
  markLabels?: (frame: ChartFrame) => { wishes: ChartLabel[]; lines: Box[] };
}

const margin = { left: 48, right: 14, top: 24, bottom: 42 };

function seriesWish(series: Series, { x, y }: ChartFrame): ChartLabel | null {
  const value = valueAt(series.points, series.labelAt);
  if (value === null) return null;
  const [px, py] = [x(series.labelAt), y(value)];
  const above: Place[] = [{ x: px, y: py - 8, anchor: 'start' }, { x: px, y: py - 8, anchor: 'end' }];
  const below: Place[] = [{ x: px + 6, y: py + 16, anchor: 'start' }, { x: px - 6, y: py + 16, anchor: 'end' }];
  return { text: series.name, fontSize: 12, className: series.textClassName ?? 'd-sub', places: series.side === 'below' ? [...below, ...above] : [...above, ...below] };
}

/** The same subscripts as in the page's text, inside a drawing. */
function SvgSymbol({ text, size }: { text: string; size: number }) {
  const found = /^(.*?)_(\S+)(.*)$/.exec(text);
  if (!found) return text;
  return <>{found[1]}<tspan dy={size * 0.24} fontSize={size * 0.74}>{found[2]}</tspan><tspan dy={-size * 0.24}>{found[3]}</tspan></>;
}

function Axes({ frame, xAxis, yAxis }: { frame: ChartFrame; xAxis: Axis; yAxis: Axis }) {
  const { x, y, plot } = frame;
  const [right, bottom] = [plot.x + plot.width, plot.y + plot.height];
  return (
    <g aria-hidden="true">
      {xAxis.ticks.map((t) => t > 0 && <line key={t} className="d-grid" x1={x(t)} x2={x(t)} y1={plot.y} y2={bottom} />)}
      {yAxis.ticks.map((t) => t > 0 && <line key={t} className="d-grid" x1={plot.x} x2={right} y1={y(t)} y2={y(t)} />)}
      <path className="d-axis" d={`M${plot.x} ${plot.y}V${bottom}H${right}`} />
      {xAxis.ticks.map((t) => <text key={t} className="d-sub" x={x(t)} y={bottom + 16} fontSize="11.5" textAnchor="middle">{t}</text>)}
      {yAxis.ticks.map((t) => <text key={t} className="d-sub" x={plot.x - 7} y={y(t) + 4} fontSize="11.5" textAnchor="end">{t}</text>)}
      <text className="d-sub" x={plot.x} y={plot.y - 10} fontSize="11.5">{yAxis.label}</text>
      <text className="d-sub" x={right} y={bottom + 34} fontSize="11.5" textAnchor="end">{xAxis.label}</text>
    </g>
  );
}

/** Moves a cursor over the chart by pointer or by arrow keys. */
function useCursor(frame: ChartFrame, to: number, step: number) {
  const [at, setAt] = useState<number | null>(null);
  const put = (value: number) => setAt(Math.min(to, Math.max(0, Math.round(value / step) * step)));
  const moves: Record<string, (now: number) => number> = {
    ArrowRight: (n) => n + step, ArrowUp: (n) => n + step, ArrowLeft: (n) => n - step, ArrowDown: (n) => n - step,
    PageUp: (n) => n + 10 * step, PageDown: (n) => n - 10 * step, Home: () => 0, End: () => to,
  };
  return {
    at,
    handlers: {
      onPointerMove: (event: PointerEvent<SVGElement>) => {
        const svg = event.currentTarget.ownerSVGElement as SVGSVGElement;
        const rect = svg.getBoundingClientRect();
        put(frame.x.invert(((event.clientX - rect.left) / rect.width) * svg.viewBox.baseVal.width));
      },
      onPointerLeave: () => setAt(null),
      onBlur: () => setAt(null),
      onKeyDown: (event: KeyboardEvent) => {
        if (event.key === 'Escape') return setAt(null);
        const move = moves[event.key];
        if (!move || event.altKey || event.ctrlKey || event.metaKey) return;
        event.preventDefault();
        put(move(at ?? Math.round(to / 2 / step) * step));
      },
    },
  };
}

function frameOf(width: number, xAxis: Axis, yAxis: Axis): ChartFrame & { height: number } {
  const height = Math.round(Math.min(340, Math.max(250, width * 0.74)));
  const plot = { x: margin.left, y: margin.top, width: width - margin.left - margin.right, height: height - margin.top - margin.bottom };
  return { height, plot, x: linearScale([0, xAxis.to], [plot.x, plot.x + plot.width]), y: linearScale([0, yAxis.to], [plot.y + plot.height, plot.y]) };
}

/** Lines over one pair of axes, to scale, with a cursor that hover and arrow keys move and a table of the values below. */
export function LineChart(props: LineChartProps) {
  const { label, xAxis, yAxis, series, step, sayAt, marks, markLabels } = props;
  const { ref, width } = useElementWidth<HTMLDivElement>(400);
  const clip = useId();
  const frame = frameOf(width, xAxis, yAxis);
  const { x, y, plot, height } = frame;
  const cursor = useCursor(frame, xAxis.to, step);
  const valuesAt = (at: number) => series.map((s) => valueAt(s.points, at));
  const marked = markLabels?.(frame) ?? { wishes: [], lines: [] };
  const wishes: ChartLabel[] = [...marked.wishes, ...series.flatMap((s) => seriesWish(s, frame) ?? [])];
  const places = placeLabels(wishes, { x: plot.x + 3, y: plot.y, width: plot.width - 3, height: plot.height }, [...marked.lines, ...series.flatMap((s) => boxesAlong(s.points, x, y))]);
  const saidAt = cursor.at === null ? null : sayAt(cursor.at, valuesAt(cursor.at));
  return (
    <figure className="mt-figure" ref={ref}>
      <svg className="mt-drawing" viewBox={`0 0 ${width} ${height}`} role="group" aria-label={label}>
        <defs><clipPath id={clip}><rect x={plot.x} y={plot.y - 2} width={plot.width + 2} height={plot.height + 4} /></clipPath></defs>
        <Axes frame={frame} xAxis={xAxis} yAxis={yAxis} />
        <g aria-hidden="true">{marks?.(frame)}</g>
        <g clipPath={`url(#${clip})`} aria-hidden="true">
          {series.map((s) => <path key={s.name} className={`d-series ${s.className}`} d={linePath(s.points, x, y)} />)}
        </g>
        <g aria-hidden="true">
          {wishes.map((wish, i) => {
            const place = places[i];
            return place && <text key={wish.text + i} className={`d-label ${wish.className ?? ''}`} x={place.x} y={place.y} fontSize={wish.fontSize} fontWeight={wish.weight ?? 400} textAnchor={place.anchor}><SvgSymbol text={wish.text} size={wish.fontSize} /></text>;
          })}
        </g>
        <g
          className="mt-chart-touch" tabIndex={0} role="slider" aria-label={`${xAxis.label}: read values with the arrow keys`} aria-valuemin={0} aria-valuemax={xAxis.to}
          aria-valuenow={cursor.at ?? 0} aria-valuetext={saidAt ?? label} {...cursor.handlers}
        >
          <rect className="mt-chart-area" x={plot.x} y={plot.y} width={plot.width} height={plot.height} />
          {cursor.at !== null && (
            <g pointerEvents="none">
              <line className="d-cursor" x1={x(cursor.at)} x2={x(cursor.at)} y1={plot.y} y2={plot.y + plot.height} />
              {valuesAt(cursor.at).map((v, i) => v !== null && v <= yAxis.to && <circle key={series[i]?.name} className="d-cursor-dot" cx={x(cursor.at as number)} cy={y(v)} r="4" />)}
            </g>
          )}
        </g>
      </svg>
      <p className="mt-readout" aria-hidden="true">{saidAt ?? 'Point at the drawing, or use the arrow keys on it, to read values.'}</p>
      <ChartValues {...props} />
    </figure>
  );
}

/** The same lines as a table, at the ticks of the drawing. */
function ChartValues({ xAxis, series, unitX, unitY, decimals = 0 }: LineChartProps) {
  const rows = xAxis.ticks.map((t) => ({ t, values: series.map((s) => valueAt(s.points, t)) })).filter((row) => row.values.some((v) => v !== null));
  return (
    <details className="mt-chart-values">
      <summary>Values as a table</summary>
      <table>
        <thead><tr><th scope="col">{unitX}</th>{series.map((s) => <th key={s.name} scope="col">{s.name}, {unitY}</th>)}</tr></thead>
        <tbody>{rows.map(({ t, values }) => <tr key={t}><th scope="row">{t}</th>{values.map((v, i) => <td key={series[i]?.name}>{v === null ? '–' : v.toFixed(decimals)}</td>)}</tr>)}</tbody>
      </table>
    </details>
  );
}
