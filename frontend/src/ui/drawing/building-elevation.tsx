import { useId, useMemo } from 'react';
import { Link } from 'react-router-dom';
import { formatLevel, formatNumber } from '../../lib/format.js';
import { HatchPattern } from '../hatch.js';
import { fitText, layoutElevation } from './building-elevation-layout.js';
import type { ElevationLayout, ElevationLevel, ElevationZone, ZoneBox } from './building-elevation-layout.js';
import { useElementWidth } from './use-element-width.js';

interface BuildingElevationProps {
  levels: readonly ElevationLevel[];
  /** where a click on the zone leads */
  zoneHref: (zone: ElevationZone) => string;
  /** the drawing's accessible name */
  label: string;
}

export const zoneInWords = ({ zone, level }: Pick<ZoneBox, 'zone' | 'level'>): string =>
  `Zone ${zone.code} ${zone.name}, level ${level.code}: R ${zone.periodMin}, ${formatNumber(zone.protectedAreaM2)} m² protected, ` +
  `${zone.settled} of ${zone.members} members settled, ${zone.open} open, ${zone.issuedMembers} issued`;

function Zone({ box, href, hatch }: { box: ZoneBox; href: string; hatch: string }) {
  const { zone, x, y, width, height } = box;
  const bar = Math.min(6, height / 4);
  const area = `${formatNumber(zone.protectedAreaM2)} m²`;
  const room = width - 22;
  const tall = height >= 50;
  const wide = room > 118;
  return (
    <g className="d-zone-link">
      <rect className="d-zone" x={x} y={y} width={width} height={height} strokeWidth="1.3" />
      {box.openWidth > 0 && <rect x={x + width - box.openWidth} y={y} width={box.openWidth} height={height} fill={`url(#${hatch})`} pointerEvents="none" />}
      <rect className="d-settled" x={x} y={y + height - bar} width={box.settledWidth} height={bar} pointerEvents="none" />
      {box.issuedWidth > 0 && <line className="d-line" x1={x} x2={x + box.issuedWidth} y1={y + height - bar - 3} y2={y + height - bar - 3} strokeWidth="2" />}
      <g className="d-halo" aria-hidden="true" pointerEvents="none">
        <text x={x + 11} y={y + 19} fontSize="14.5" fontWeight="600">R {zone.periodMin}</text>
        {tall && <text x={x + 11} y={y + 37} fontSize="12.5">{fitText(`${zone.code} ${zone.name}`, wide && zone.open > 0 ? room - 52 : room, 12.5)}</text>}
        {wide && <text className="d-sub" x={x + width - 11} y={y + 19} fontSize="12.5" textAnchor="end">{area}</text>}
        {zone.open > 0 && (wide || height >= 68) && (
          <text className="d-attention" x={wide ? x + width - 11 : x + 11} y={wide ? y + 37 : y + 55} fontSize="12.5" fontWeight="500" textAnchor={wide ? 'end' : 'start'}>{zone.open} open</text>
        )}
      </g>
      {/* above the texts, which are cut where there is no room: the link's own name says all of them */}
      <Link to={href} aria-label={zoneInWords(box)}>
        <rect x={x} y={y} width={width} height={height} fill="transparent" />
        <title>{zoneInWords(box)}</title>
      </Link>
    </g>
  );
}

function LevelMarks({ layout }: { layout: ElevationLayout }) {
  // on a narrow screen the mark stands close to the wall and the dashed line is left out
  const compact = layout.plotLeft < 100;
  const tip = layout.plotLeft - (compact ? 9 : 49);
  return (
    <g aria-hidden="true">
      {layout.marks.map(({ level, y, labelY }) => (
        <g key={level.id}>
          {!compact && <line className="d-aid" x1={tip} x2={layout.plotLeft} y1={y} y2={y} strokeWidth="1" strokeDasharray="5 3" />}
          <path d={`M${tip - 5} ${labelY - 9}h10l-5 8z`} fill="var(--ink)" />
          <text className="d-sub" x={tip - 9} y={labelY - 3.5} fontSize="11.5" textAnchor="end">{formatLevel(level.elevationM)}</text>
        </g>
      ))}
    </g>
  );
}

function Ground({ layout, hatch }: { layout: ElevationLayout; hatch: string }) {
  const y = layout.groundY;
  if (y == null) return null;
  const from = 4;
  return (
    <g aria-hidden="true" className="d-ground">
      <rect x={from} y={y} width={layout.plotLeft - from} height="7" fill={`url(#${hatch})`} />
      <rect x={layout.plotLeft + layout.plotWidth} y={y} width={layout.width - layout.plotLeft - layout.plotWidth} height="7" fill={`url(#${hatch})`} />
      <line className="d-line" x1={from} x2={layout.width} y1={y} y2={y} strokeWidth="1.8" />
    </g>
  );
}

/**
 * The building as an elevation: heights to scale with level marks in metres, zones by protected area, the open share hatched.
 * Every zone is a link; the drawing's numbers stand in a table as well (see ZoneList).
 */
export function BuildingElevation({ levels, zoneHref, label }: BuildingElevationProps) {
  const { ref, width } = useElementWidth<HTMLDivElement>(760);
  const layout = useMemo(() => layoutElevation(levels, width), [levels, width]);
  const openHatch = useId();
  const groundHatch = useId();
  return (
    <div ref={ref} className="mt-elevation">
      <svg className="mt-drawing" viewBox={`0 0 ${layout.width} ${layout.height}`} role="group" aria-label={label}>
        <defs>
          <HatchPattern id={openHatch} />
          <HatchPattern id={groundHatch} color="var(--ink-3)" spacing={5} opacity={1} />
        </defs>
        <LevelMarks layout={layout} />
        {layout.emptyBands.map(({ level, ...box }) => (
          <g key={level.id}>
            <rect {...box} className="d-aid" strokeDasharray="6 4" strokeWidth="1" />
            <text className="d-sub" x={box.x + 11} y={box.y + Math.min(19, box.height - 4)} fontSize="12.5">{level.code} {level.name}: no zone yet</text>
          </g>
        ))}
        {layout.boxes.map((box) => <Zone key={box.zone.id} box={box} href={zoneHref(box.zone)} hatch={openHatch} />)}
        <Ground layout={layout} hatch={groundHatch} />
      </svg>
    </div>
  );
}
