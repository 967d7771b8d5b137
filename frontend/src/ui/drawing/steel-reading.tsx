import { useId, useMemo } from 'react';
import { firstReach, linePath, valueAt } from './chart-scale.js';
import type { Points } from './chart-scale.js';
import { useChartCursor } from './chart-cursor.js';
import { PlacedLabels, ValuesTable } from './chart-parts.js';
import { layoutReading, loadLabels, reachedAfter, ticksBeside, timeLabels, turned } from './steel-reading-layout.js';
import type { LoadSide, Pane, ReadingLayout, SteelReadingData } from './steel-reading-layout.js';
import { crossing, readingInWords, sayAtMinute, sayAtTemperature, timeSeries } from './steel-reading-words.js';
import { useElementWidth } from './use-element-width.js';
import './charts.css';

const right = ({ plot }: Pane) => plot.x + plot.width;
const foot = ({ plot }: Pane) => plot.y + plot.height;

function Grid({ pane, temperatures, label }: { pane: Pane; temperatures: readonly number[]; label: string }) {
  const { x, y, plot, ticks } = pane;
  return (
    <>
      {ticks.map((t) => t > 0 && <line key={t} className="d-grid" x1={x(t)} x2={x(t)} y1={plot.y} y2={foot(pane)} />)}
      {temperatures.map((t) => t > 0 && <line key={t} className="d-grid" x1={plot.x} x2={right(pane)} y1={y(t)} y2={y(t)} />)}
      <path className="d-axis" d={`M${plot.x} ${plot.y}V${foot(pane)}H${right(pane)}`} />
      {ticks.map((t) => <text key={t} className="d-sub" x={x(t)} y={foot(pane) + 17} fontSize="11.5" textAnchor="middle">{t}</text>)}
      <text className="d-sub" x={right(pane)} y={foot(pane) + 35} fontSize="11.5" textAnchor="end">{label}</text>
    </>
  );
}

/** The temperature axis: between the two drawings where they stand side by side, to the left of each where they do not. */
function TemperatureAxis({ pane, temperatures, criticalC, joined }: { pane: Pane; temperatures: readonly number[]; criticalC: number | null; joined: boolean }) {
  const { y, plot } = pane;
  const at = joined ? { x: plot.x - 31, anchor: 'middle' as const } : { x: plot.x - 9, anchor: 'end' as const };
  return (
    <>
      {ticksBeside(temperatures, y, criticalC).map((t) => <text key={t} className="d-sub" x={at.x} y={y(t) + 4} fontSize="11.5" textAnchor={at.anchor}>{t}</text>)}
      {criticalC !== null && <text className="d-attention" x={at.x} y={y(criticalC) + 4.5} fontSize="13.5" fontWeight="600" textAnchor={at.anchor}>{Math.floor(criticalC + 1e-6)}</text>}
      <text className="d-sub" x={joined ? at.x : 4} y={plot.y - 13} fontSize="11.5" textAnchor={joined ? 'middle' : 'start'}>steel temperature, °C</text>
    </>
  );
}

function LoadDrawing({ side, pane, data }: { side: LoadSide; pane: Pane; data: SteelReadingData }) {
  const { x, y } = pane;
  const { criticalC } = data;
  const meets = criticalC === null ? pane.plot.y : y(criticalC);
  const met = criticalC !== null && side.curves.some(({ points }) => crossing(points, side.effect) !== null);
  return (
    <g aria-hidden="true">
      <line className="d-effect" x1={x(side.effect)} x2={x(side.effect)} y1={foot(pane)} y2={meets} />
      {criticalC !== null && <line className="d-limit" x1={x(side.effect)} x2={right(pane)} y1={meets} y2={meets} />}
      {side.curves.map(({ name, points, className }) => <path key={name} className={`d-series ${className}`} d={linePath(turned(points), x, y)} />)}
      {met && <circle className="d-mark" cx={x(side.effect)} cy={meets} r="4.5" />}
      <PlacedLabels labels={loadLabels(side, pane, data)} />
    </g>
  );
}

function Reached({ pane, at, limitC }: { pane: Pane; at: number | null; limitC: number | null }) {
  if (at === null || limitC === null) return null;
  const [x, y] = [pane.x(at), pane.y(limitC)];
  return <><line className="d-drop" x1={x} x2={x} y1={y} y2={foot(pane)} /><circle className="d-mark" cx={x} cy={y} r="4.5" /></>;
}

function TimeDrawing({ pane, data }: { pane: Pane; data: SteelReadingData }) {
  const { x, y, plot } = pane;
  const clip = useId();
  const reached = reachedAfter(data);
  const line = (points: Points, className: string) => <path className={`d-series ${className}`} d={linePath(points, x, y)} />;
  return (
    <g aria-hidden="true">
      <defs><clipPath id={clip}><rect x={plot.x} y={plot.y - 2} width={plot.width + 2} height={plot.height + 4} /></clipPath></defs>
      <line className="d-axis" x1={x(data.periodMin)} x2={x(data.periodMin)} y1={plot.y} y2={foot(pane)} />
      {data.criticalC !== null && <line className="d-limit" x1={plot.x} x2={right(pane)} y1={y(data.criticalC)} y2={y(data.criticalC)} />}
      <g clipPath={`url(#${clip})`}>
        {line(data.fire, 'd-dashed')}
        {line(data.bare, 'd-thin')}
        {data.protected && line(data.protected, 'd-protected')}
      </g>
      <Reached pane={pane} at={reached.bare} limitC={data.bareLimitC} />
      <Reached pane={pane} at={reached.protected} limitC={data.criticalC} />
      <PlacedLabels labels={timeLabels(data, pane)} />
    </g>
  );
}

type Cursor = ReturnType<typeof useChartCursor>;
/** The part of a drawing that pointer and keys read values from. */
function Touch({ pane, cursor, to, label, said }: { pane: Pane; cursor: Cursor; to: number; label: string; said: string | null }) {
  const { x, y, width, height } = pane.plot;
  return (
    <g className="mt-chart-touch" tabIndex={0} role="slider" aria-label={`${label}: read values with the arrow keys`} aria-valuemin={0} aria-valuemax={to} aria-valuenow={cursor.at ?? 0} aria-valuetext={said ?? 'no value read yet'} {...cursor.handlers}>
      <rect className="mt-chart-area" x={x} y={y} width={width} height={height} />
    </g>
  );
}

function MinuteCursor({ pane, data, at }: { pane: Pane; data: SteelReadingData; at: number }) {
  return (
    <g aria-hidden="true" pointerEvents="none">
      <line className="d-cursor" x1={pane.x(at)} x2={pane.x(at)} y1={pane.plot.y} y2={foot(pane)} />
      {timeSeries(data).map(([name, points]) => { const c = valueAt(points, at); return c !== null && c <= pane.y.domain[1] && <circle key={name} className="d-cursor-dot" cx={pane.x(at)} cy={pane.y(c)} r="4" />; })}
    </g>
  );
}

/** A temperature is read across both drawings at once. */
function TemperatureCursor({ layout: { load, time }, data, at }: { layout: ReadingLayout; data: SteelReadingData; at: number }) {
  const across = (pane: Pane) => <line className="d-cursor" x1={pane.plot.x} x2={right(pane)} y1={pane.y(at)} y2={pane.y(at)} />;
  return (
    <g aria-hidden="true" pointerEvents="none">
      {load && across(load)}
      {across(time)}
      {load && data.load?.curves.map(({ name, points }) => { const r = valueAt(points, at); return r !== null && <circle key={name} className="d-cursor-dot" cx={load.x(r)} cy={load.y(at)} r="4" />; })}
      {timeSeries(data).slice(1).map(([name, points]) => { const t = firstReach(points, at); return t !== null && <circle key={name} className="d-cursor-dot" cx={time.x(t)} cy={time.y(at)} r="4" />; })}
    </g>
  );
}

/** From load to temperature to minutes: resistance and heating over one temperature axis, read along the critical temperature. */
export function SteelReading({ data }: { data: SteelReadingData }) {
  const { ref, width } = useElementWidth<HTMLDivElement>(900);
  const layout = useMemo(() => layoutReading(data, width), [data, width]);
  const { load, time, temperatures, joined } = layout;
  const [hottest, last] = [temperatures.at(-1) ?? 1200, time.x.domain[1]];
  const minute = useChartCursor({ scale: time.x, axis: 'x', to: last, step: 1, start: data.periodMin });
  const temperature = useChartCursor({ scale: (load ?? time).y, axis: 'y', to: hottest, step: 10, start: data.criticalC ?? 500 });
  const saidMinute = minute.at === null ? null : sayAtMinute(data, minute.at);
  const saidTemperature = temperature.at === null ? null : sayAtTemperature(data, temperature.at);
  return (
    <figure className="mt-figure">
      <div ref={ref}>
        <svg className="mt-drawing mt-reading" viewBox={`0 0 ${layout.width} ${layout.height}`} role="group" aria-label={readingInWords(data)}>
          <g aria-hidden="true">
            {load && <Grid pane={load} temperatures={temperatures} label={data.load?.axis ?? ''} />}
            <Grid pane={time} temperatures={temperatures} label="minutes" />
            {load && !joined && <TemperatureAxis pane={load} temperatures={temperatures} criticalC={data.criticalC} joined={false} />}
            <TemperatureAxis pane={time} temperatures={temperatures} criticalC={data.criticalC} joined={joined} />
          </g>
          {load && data.load && <LoadDrawing side={data.load} pane={load} data={data} />}
          <TimeDrawing pane={time} data={data} />
          {temperature.at !== null && <TemperatureCursor layout={layout} data={data} at={temperature.at} />}
          {minute.at !== null && <MinuteCursor pane={time} data={data} at={minute.at} />}
          {load && <Touch pane={load} cursor={temperature} to={hottest} label="Steel temperature, °C" said={saidTemperature} />}
          <Touch pane={time} cursor={minute} to={last} label="Minutes" said={saidMinute} />
        </svg>
      </div>
      <p className="mt-readout" aria-hidden="true">{saidMinute ?? saidTemperature ?? 'Point at a drawing, or use the arrow keys on it, to read values.'}</p>
      <details className="mt-chart-values">
        <summary>Values as a table</summary>
        <div className="mt-chart-tables">
          {data.load && <ValuesTable caption={data.load.axis} unit="°C" at={temperatures} series={data.load.curves.map((c) => [c.name, c.points])} format={data.load.format} />}
          <ValuesTable caption="steel temperature, °C" unit="min" at={time.ticks} series={timeSeries(data)} format={(v) => v.toFixed(0)} />
        </div>
      </details>
    </figure>
  );
}
