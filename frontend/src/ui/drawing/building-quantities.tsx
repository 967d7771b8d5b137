import { useId, useMemo } from 'react';
import { formatLevel, formatNumber } from '../../lib/format.js';
import { HatchPattern } from '../hatch.js';
import { fitText, layoutElevation } from './building-elevation-layout.js';
import type { ElevationLevel, ElevationZone } from './building-elevation-layout.js';
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

/** Class 0…4 in fifths of the greatest amount; null where there is none. */
export function hatchClass(amount: number | null | undefined, greatest: number): number | null {
  if (amount == null || !(amount > 0) || !(greatest > 0)) return null;
  return Math.min(spacings.length - 1, Math.floor((amount / greatest) * spacings.length * (1 - 1e-9)));
}

/** The building as an elevation, each zone hatched by how much of something it takes, with the figure on it. */
export function BuildingQuantities({ levels, amounts, unit, decimals, what, label }: BuildingQuantitiesProps) {
  const { ref, width } = useElementWidth<HTMLDivElement>(760);
  const layout = useMemo(() => layoutElevation(levels, width), [levels, width]);
  const id = useId();
  const greatest = Math.max(0, ...[...amounts.values()].filter((v) => v !== null));
  const said = (zone: ElevationZone) => {
    const amount = amounts.get(zone.id);
    return amount == null ? `${zone.code} ${zone.name}: no ${what.toLowerCase()}` : `${zone.code} ${zone.name}: ${what.toLowerCase()} ${formatNumber(amount, decimals)} ${unit}`;
  };
  return (
    <div ref={ref} className="mt-elevation">
      <svg className="mt-drawing" viewBox={`0 0 ${layout.width} ${layout.height}`} role="img" aria-label={label}>
        <defs>{spacings.map((spacing, i) => <HatchPattern key={spacing} id={`${id}${i}`} color="var(--ink-2)" spacing={spacing} opacity={0.75} />)}</defs>
        {layout.marks.map(({ level, y, labelY }) => (
          <g key={level.id}>
            <line className="d-aid" x1={layout.plotLeft - 44} x2={layout.plotLeft} y1={y} y2={y} strokeDasharray="5 3" />
            <text className="d-sub" x={layout.plotLeft - 50} y={labelY - 3.5} fontSize="11.5" textAnchor="end">{formatLevel(level.elevationM)}</text>
          </g>
        ))}
        {layout.boxes.map(({ zone, x, y, width: w, height: h }) => {
          const amount = amounts.get(zone.id) ?? null;
          const hatch = hatchClass(amount, greatest);
          return (
            <g key={zone.id}>
              <title>{said(zone)}</title>
              <rect className="d-zone" x={x} y={y} width={w} height={h} strokeWidth="1.3" />
              {hatch !== null && <rect x={x} y={y} width={w} height={h} fill={`url(#${id}${hatch})`} />}
              <g className="d-halo">
                <text x={x + 11} y={y + 20} fontSize="14" fontWeight="600">{fitText(amount === null ? '–' : `${formatNumber(amount, decimals)} ${unit}`, w - 18, 14)}</text>
                {h > 46 && <text x={x + 11} y={y + 38} fontSize="12.5">{fitText(`${zone.code} ${zone.name}`, w - 18, 12.5)}</text>}
              </g>
            </g>
          );
        })}
        {layout.groundY !== null && <line className="d-line" x1="4" x2={layout.width} y1={layout.groundY} y2={layout.groundY} strokeWidth="1.8" />}
      </svg>
    </div>
  );
}
