import { useId, useMemo, useState } from 'react';
import type { KeyboardEvent } from 'react';
import { Link } from 'react-router-dom';
import { formatNumber } from '../../lib/format.js';
import { HatchPattern } from '../hatch.js';
import { layoutElevation } from './building-elevation-layout.js';
import type { ElevationLevel, ElevationZone, ZoneBox } from './building-elevation-layout.js';
import { labelZone } from './elevation-labels.js';
import { Ground, LevelMarks, ScaleBar, Slabs, ZoneText } from './elevation-parts.js';
import { stepFrom } from './elevation-steps.js';
import { useElementWidth } from './use-element-width.js';

/** A share of a zone's members drawn along its floor. */
export interface Rail { key: string; kind: 'settled' | 'ink'; members: number }
/** What is pointed at, in the drawing or in the list beside it. */
export interface Pointed { zoneId: string | null; keynote: number | null }

interface BuildingElevationProps {
  levels: readonly ElevationLevel[];
  /** where a click on the zone leads */
  zoneHref: (zone: ElevationZone) => string;
  /** the drawing's accessible name */
  label: string;
  /** from the floor up */
  rails: (zone: ElevationZone) => readonly Rail[];
  /** all of a zone's figures in a sentence */
  say: (zone: ElevationZone, level: ElevationLevel) => string;
  /** zone id → numbers in the list beside the drawing */
  keynotes?: ReadonlyMap<string, readonly number[]>;
  pointed?: Pointed;
  onPoint?: (pointed: Pointed) => void;
}
const none: readonly number[] = [];
const nothing: Pointed = { zoneId: null, keynote: null };
/** The first rail stands on the floor slab; those above it are lines. */
const railPx = (i: number) => (i === 0 ? 5 : 2.5);
const railsPx = (n: number) => 2 + Array.from({ length: n }, (_, i) => railPx(i) + 2).reduce((a, b) => a + b, 0);

function Rails({ box, rails }: { box: ZoneBox; rails: readonly Rail[] }) {
  const { zone, x, y, width, height } = box;
  return rails.map(({ key, kind, members }, i) => {
    const share = zone.members > 0 ? (width * Math.min(members, zone.members)) / zone.members : 0;
    return share > 0 && <rect key={key} className={`d-rail-${kind}`} x={x + 1.5} y={y + height - railsPx(i + 1) + 2} width={Math.max(0, share - 3)} height={railPx(i)} pointerEvents="none" />;
  });
}

interface ZoneProps extends Pick<BuildingElevationProps, 'zoneHref' | 'rails' | 'say' | 'onPoint'> { box: ZoneBox; hatch: string; keynotes: readonly number[]; pointed: Pointed; focusable: boolean }
function Zone({ box, zoneHref, rails, say, hatch, keynotes, pointed, onPoint, focusable }: ZoneProps) {
  const { zone, level, x, y, width, height } = box;
  const own = height >= 30 ? rails(zone) : rails(zone).slice(0, 1);
  const labels = labelZone(box, { strong: `R ${zone.periodMin}`, code: zone.code, name: zone.name, aside: zone.unassessed ? 'recalculating' : `${formatNumber(zone.protectedAreaM2)} m²`, keynotes }, railsPx(own.length));
  const on = pointed.zoneId === zone.id;
  return (
    <g
      className={`d-zone-link ${on ? 'd-zone-on' : ''}`}
      onPointerEnter={() => onPoint?.({ zoneId: zone.id, keynote: null })} onPointerLeave={() => onPoint?.(nothing)}
      onFocus={() => onPoint?.({ zoneId: zone.id, keynote: null })} onBlur={() => onPoint?.(nothing)}
    >
      <rect className="d-zone" x={x} y={y} width={width} height={height} strokeWidth="1.3" />
      {box.openWidth > 0 && <rect x={x + width - box.openWidth} y={y} width={box.openWidth} height={height} fill={`url(#${hatch})`} pointerEvents="none" />}
      <Rails box={box} rails={own} />
      <ZoneText labels={labels} activeKeynote={pointed.keynote} />
      {/* above the texts, which are cut where there is no room: the link's own name says all of them */}
      <Link to={zoneHref(zone)} aria-label={say(zone, level)} data-zone={zone.id} tabIndex={focusable ? 0 : -1}>
        <rect x={x} y={y} width={width} height={height} fill="transparent" />
      </Link>
    </g>
  );
}

/** One stop of the Tab key; the arrows lead from zone to zone as the eye would go. */
function useArrows(boxes: readonly ZoneBox[]) {
  const [at, setAt] = useState<string | null>(null);
  const current = boxes.some((b) => b.zone.id === at) ? at : boxes.at(-1)?.zone.id ?? null;
  const onKeyDown = (event: KeyboardEvent<SVGSVGElement>) => {
    const from = (event.target as Element).getAttribute('data-zone');
    const next = from && !event.altKey && !event.ctrlKey && !event.metaKey ? stepFrom(boxes, from, event.key) : null;
    if (next === null) return;
    event.preventDefault();
    setAt(next);
    event.currentTarget.querySelector<SVGElement>(`[data-zone="${next}"]`)?.focus();
  };
  return { current, onKeyDown };
}

/**
 * The building as an elevation: heights to scale with level marks in metres, zones by protected area, the open share hatched and numbered.
 * Every zone is a link; the drawing's numbers stand in a table as well (see ZoneList).
 */
export function BuildingElevation({ levels, label, keynotes, pointed = nothing, ...zoneProps }: BuildingElevationProps) {
  const { ref, width } = useElementWidth<HTMLDivElement>(760);
  const layout = useMemo(() => layoutElevation(levels, width), [levels, width]);
  const arrows = useArrows(layout.boxes);
  const openHatch = useId();
  const groundHatch = useId();
  return (
    <div ref={ref} className="mt-elevation">
      <svg className="mt-drawing" viewBox={`0 0 ${layout.width} ${layout.height}`} role="group" aria-label={label} onKeyDown={arrows.onKeyDown}>
        <defs>
          <HatchPattern id={openHatch} />
          <HatchPattern id={groundHatch} color="var(--ink-3)" spacing={5} opacity={1} />
        </defs>
        <LevelMarks layout={layout} />
        {layout.emptyBands.map(({ level, ...box }) => (
          <g key={level.id}>
            <rect {...box} className="d-aid" strokeDasharray="6 4" strokeWidth="1" />
            {box.height >= 14 && <text className="d-sub" x={box.x + 11} y={box.y + Math.min(19, box.height - 4)} fontSize="12.5">{level.code} {level.name}: no zone yet</text>}
          </g>
        ))}
        {layout.boxes.map((box) => (
          <Zone key={box.zone.id} box={box} hatch={openHatch} keynotes={keynotes?.get(box.zone.id) ?? none} pointed={pointed} focusable={box.zone.id === arrows.current} {...zoneProps} />
        ))}
        <Slabs layout={layout} />
        <Ground layout={layout} hatch={groundHatch} />
        <ScaleBar layout={layout} />
      </svg>
    </div>
  );
}
