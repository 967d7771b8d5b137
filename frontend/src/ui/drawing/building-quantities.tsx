import { useId, useMemo } from 'react';
import { formatNumber } from '../../lib/format.js';
import { HatchPattern } from '../hatch.js';
import { layoutElevation } from './building-elevation-layout.js';
import type { ElevationLevel, ElevationZone } from './building-elevation-layout.js';
import { labelZone } from './elevation-labels.js';
import { Ground, LevelMarks, ScaleBar, Slabs, ZoneText } from './elevation-parts.js';
import { useElementWidth } from './use-element-width.js';

interface BuildingQuantitiesProps {
  levels: readonly ElevationLevel[];
  /** zone id → amount; a zone without one has nothing, or nothing determined */
  amounts: ReadonlyMap<string, number | null>;
  unit: string;
  decimals: number;
  /** what is drawn: "Coating" */
  what: string;
  label: string;
}
/** Five hatches: the closer the lines, the more. Distance between lines in px. */
const spacings = [16, 11, 7.5, 5, 3.2] as const;
const none: readonly number[] = [];

/** Class 0…4 in fifths of the top of the scale; null where there is none. */
export function hatchClass(amount: number | null | undefined, top: number): number | null {
  if (amount == null || !(amount > 0) || !(top > 0)) return null;
  return Math.min(spacings.length - 1, Math.max(0, Math.ceil((amount / top) * spacings.length - 1e-9) - 1));
}

/** The top of the scale: the least round number (five round steps) that reaches the greatest amount. */
export function scaleTop(greatest: number): number {
  if (!(greatest > 0)) return 0;
  const step = greatest / spacings.length;
  const power = 10 ** Math.floor(Math.log10(step));
  const round = [1, 2, 2.5, 5, 10].find((n) => n * power >= step - 1e-12) ?? 10;
  return round * power * spacings.length;
}

function ScaleKey({ id, top, unit, what }: { id: string; top: number; unit: string; what: string }) {
  const step = top / spacings.length;
  const places = step >= 1 && Number.isInteger(step) ? 0 : Math.max(0, Math.ceil(-Math.log10(step)) + (step >= 1 ? 1 : 0));
  return (
    <p className="mt-hatch-key">
      <span className="mt-sub">{what}, {unit}</span>
      {spacings.map((spacing, i) => (
        <span key={spacing} className="mt-key-line">
          <svg width="34" height="18" aria-hidden="true"><rect x="0.5" y="0.5" width="33" height="17" className="d-key-sheet" /><rect x="0.5" y="0.5" width="33" height="17" fill={`url(#${id}${i})`} stroke="var(--ink)" /></svg>
          {i === 0 ? `up to ${formatNumber(step, places)}` : `to ${formatNumber(step * (i + 1), places)}`}
        </span>
      ))}
      <span className="mt-key-line"><svg width="34" height="18" aria-hidden="true"><rect x="0.5" y="0.5" width="33" height="17" fill="none" stroke="var(--ink)" /></svg>none</span>
    </p>
  );
}

/** The building as an elevation, each zone hatched by how much of something it takes, with the figure on it and the scale of the hatches below. */
export function BuildingQuantities({ levels, amounts, unit, decimals, what, label }: BuildingQuantitiesProps) {
  const { ref, width } = useElementWidth<HTMLDivElement>(760);
  const layout = useMemo(() => layoutElevation(levels, width), [levels, width]);
  const id = useId();
  const top = scaleTop(Math.max(0, ...[...amounts.values()].filter((v) => v !== null)));
  const said = (zone: ElevationZone) => {
    const amount = amounts.get(zone.id);
    return amount == null ? `${zone.code} ${zone.name}: no ${what.toLowerCase()}` : `${zone.code} ${zone.name}: ${what.toLowerCase()} ${formatNumber(amount, decimals)} ${unit}`;
  };
  return (
    <div ref={ref} className="mt-elevation">
      <svg className="mt-drawing" viewBox={`0 0 ${layout.width} ${layout.height}`} role="img" aria-label={`${label} ${layout.boxes.map((b) => said(b.zone)).join('; ')}.`}>
        <defs>
          {spacings.map((spacing, i) => <HatchPattern key={spacing} id={`${id}${i}`} color="var(--ink-2)" spacing={spacing} opacity={0.75} />)}
          <HatchPattern id={`${id}ground`} color="var(--ink-3)" spacing={5} opacity={1} />
        </defs>
        <LevelMarks layout={layout} />
        {layout.boxes.map((box) => {
          const { zone, x, y, width: w, height: h } = box;
          const amount = amounts.get(zone.id) ?? null;
          const hatch = hatchClass(amount, top);
          const strong = amount === null ? '–' : `${formatNumber(amount, decimals)} ${unit}`;
          return (
            <g key={zone.id}>
              <title>{said(zone)}</title>
              <rect className="d-zone" x={x} y={y} width={w} height={h} strokeWidth="1.3" />
              {hatch !== null && <rect x={x} y={y} width={w} height={h} fill={`url(#${id}${hatch})`} />}
              <ZoneText labels={labelZone(box, { strong, code: zone.code, name: zone.name, aside: '', keynotes: none }, 3)} />
            </g>
          );
        })}
        <Slabs layout={layout} />
        <Ground layout={layout} hatch={`${id}ground`} />
        <ScaleBar layout={layout} />
      </svg>
      {top > 0 && <ScaleKey id={id} top={top} unit={unit} what={what} />}
    </div>
  );
}
