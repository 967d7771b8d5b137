import { useId, useMemo, useState } from 'react';
import type { KeyboardEvent } from 'react';
import { formatNumber } from '../../lib/format.js';
import { HatchPattern } from '../hatch.js';
import { layoutThicknessMap, stepCell, stepLabels, stepLines, thinLabels } from './thickness-map-layout.js';
import { round } from './chart-scale.js';
import type { MapCell, MapLayout, ThicknessMapData } from './thickness-map-layout.js';
import './charts.css';
import './thickness-map.css';
import { useElementWidth } from './use-element-width.js';

interface ThicknessMapProps {
  data: ThicknessMapData;
  unit: 'µm' | 'mm';
  /** the drawing's accessible name: which table this is */
  label: string;
}
/** room for a figure of four digits */
const figureRoom = { width: 36, height: 18 };
const figure = (value: number, unit: 'µm' | 'mm') => formatNumber(value, unit === 'mm' && !Number.isInteger(value) ? 1 : 0);

export function cellInWords({ sectionFactorsPerM, temperaturesC, thickness }: ThicknessMapData, row: number, column: number, unit: 'µm' | 'mm'): string {
  const value = thickness[row]?.[column] ?? null;
  const place = `A/V ${row === 0 ? 'up to' : `above ${sectionFactorsPerM[row - 1]} to`} ${sectionFactorsPerM[row]}, critical temperature from ${temperaturesC[column]} °C`;
  return value === null ? `${place}: outside the assessment` : `${place}: ${figure(value, unit)} ${unit}`;
}

function Axes({ layout, data }: { layout: MapLayout; data: ThicknessMapData }) {
  const { plot, x, y } = layout;
  const base = plot.y + plot.height;
  return (
    <g aria-hidden="true">
      {thinLabels(data.sectionFactorsPerM, x, 30).map((v) => (
        <g key={v}>
          <line className="d-aid" x1={x(v)} x2={x(v)} y1={base} y2={base + 5} />
          <text className="d-sub" x={x(v)} y={base + 18} fontSize="11.5" textAnchor="middle">{v}</text>
        </g>
      ))}
      {thinLabels(data.temperaturesC, y, 15).map((v) => (
        <g key={v}>
          <line className="d-aid" x1={plot.x - 5} x2={plot.x} y1={y(v)} y2={y(v)} />
          <text className="d-sub" x={plot.x - 8} y={y(v) + 4} fontSize="11.5" textAnchor="end">{v}</text>
        </g>
      ))}
      <path className="d-axis" d={`M${plot.x} ${plot.y}V${base}H${plot.x + plot.width}`} />
      <text className="d-sub" x={plot.x + plot.width} y={base + 34} fontSize="11.5" textAnchor="end">section factor A/V, m⁻¹</text>
      <text className="d-sub" x={4} y={plot.y - 8} fontSize="11.5">critical temperature, °C</text>
    </g>
  );
}

const Cells = ({ cells, unit, hatch, onPoint }: { cells: readonly MapCell[]; unit: 'µm' | 'mm'; hatch: string; onPoint: (cell: MapCell) => void }) => (
  <g aria-hidden="true">
    {cells.map((cell) => {
      const { row, column, value, share, ...box } = cell;
      return (
        <g key={`${row} ${column}`} onPointerEnter={() => onPoint(cell)}>
          <rect {...box} className="mt-map-cell" {...(value === null ? { style: { fill: `url(#${hatch})` } } : { fillOpacity: 0.06 + 0.42 * share })} />
          {value !== null && box.width >= figureRoom.width && box.height >= figureRoom.height && (
            <text x={box.x + box.width / 2} y={box.y + box.height / 2 + 4} fontSize="11.5" textAnchor="middle">{figure(value, unit)}</text>
          )}
        </g>
      );
    })}
  </g>
);

/** Where the thickness passes a round figure; the figure itself stands on the line where the cells hold none. */
function Steps({ layout, data, unit }: { layout: MapLayout; data: ThicknessMapData; unit: 'µm' | 'mm' }) {
  const lines = useMemo(() => stepLines(layout, data), [layout, data]);
  const figured = layout.cells.some((c) => c.value !== null && c.width >= figureRoom.width && c.height >= figureRoom.height);
  const labels = figured ? [] : stepLabels(lines, layout, (level) => `${figure(level, unit)} ${unit}`);
  return (
    <g aria-hidden="true" pointerEvents="none">
      {lines.map(({ level, edges }) => <path key={level} className="mt-map-step" d={edges.map((e) => `M${round(e.x1)} ${round(e.y1)}L${round(e.x2)} ${round(e.y2)}`).join('')} />)}
      {labels.map(({ level, text, place }) => <text key={level} className="d-label" x={place.x} y={place.y} fontSize="11.5" fontWeight="600" textAnchor={place.anchor}>{text}</text>)}
    </g>
  );
}

/** A thickness table drawn over A/V and temperature: the deeper the tint, the thicker. Pointer and arrow keys read a cell; the table below has all. */
export function ThicknessMap({ data, unit, label }: ThicknessMapProps) {
  const { ref, width } = useElementWidth<HTMLDivElement>(680);
  const layout = useMemo(() => layoutThicknessMap(data, width), [data, width]);
  const [at, setAt] = useState<{ row: number; column: number } | null>(null);
  const hatch = useId();
  const rows = data.sectionFactorsPerM.length;
  const columns = data.temperaturesC.length;
  const active = at && layout.cells.find((c) => c.row === at.row && c.column === at.column);
  const said = active ? cellInWords(data, active.row, active.column, unit) : null;
  const onKeyDown = (event: KeyboardEvent) => {
    const next = event.key === 'Escape' ? null : stepCell(at ?? { row: 0, column: 0 }, event.key, rows, columns);
    if (!next) return;
    event.preventDefault();
    setAt(at ? next : { row: 0, column: 0 });
  };
  return (
    <figure className="mt-map">
      <div ref={ref}>
        <svg
          className="mt-drawing" viewBox={`0 0 ${layout.width} ${layout.height}`} tabIndex={0} role="application" aria-roledescription="thickness map"
          aria-label={`${label}. Arrow keys move from cell to cell; the table below holds the same values.`} onKeyDown={onKeyDown} onFocus={() => setAt((was) => was ?? { row: 0, column: 0 })} onPointerLeave={() => setAt(null)}
        >
          <defs><HatchPattern id={hatch} color="var(--ink-3)" spacing={6} opacity={0.7} /></defs>
          <Cells cells={layout.cells} unit={unit} hatch={hatch} onPoint={setAt} />
          <Steps layout={layout} data={data} unit={unit} />
          <Axes layout={layout} data={data} />
          {active && <rect className="mt-map-active" x={active.x} y={active.y} width={active.width} height={active.height} pointerEvents="none" />}
        </svg>
      </div>
      <p className="mt-map-said" aria-live="polite">{said ?? `Thickness in ${unit}. Point at a cell, or use the arrow keys, to read it. The deeper the tint, the thicker; heavy lines mark round figures. Hatched: outside the assessment.`}</p>
      <MapTable data={data} unit={unit} label={label} />
    </figure>
  );
}

function MapTable({ data, unit, label }: ThicknessMapProps) {
  return (
    <details className="mt-map-table">
      <summary>The map as a table</summary>
      {/* scrolls sideways, so the keyboard must be able to reach it */}
      <div role="region" aria-label={`${label}, as a table`} tabIndex={0}>
        <table>
          <thead><tr><th scope="col">A/V, m⁻¹</th>{data.temperaturesC.map((t) => <th key={t} scope="col">{t} °C</th>)}</tr></thead>
          <tbody>
            {data.sectionFactorsPerM.map((factor, row) => (
              <tr key={factor}>
                <th scope="row">{factor}</th>
                {data.temperaturesC.map((t, column) => {
                  const value = data.thickness[row]?.[column] ?? null;
                  return <td key={t} title={cellInWords(data, row, column, unit)}>{value === null ? 'outside' : figure(value, unit)}</td>;
                })}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </details>
  );
}
