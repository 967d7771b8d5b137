import { useId, useMemo } from 'react';
import { HatchPattern } from '../hatch.js';
import { layoutElevation } from './building-elevation-layout.js';
import type { ElevationLevel } from './building-elevation-layout.js';
import { Ground, LevelMarks, Slabs } from './elevation-parts.js';
import { useElementWidth } from './use-element-width.js';

/** The elevation at a glance: levels, zones and the open share; its words are beside it or on the page it leads to. */
export function BuildingSketch({ levels }: { levels: readonly ElevationLevel[] }) {
  const { ref, width } = useElementWidth<HTMLDivElement>(480);
  const layout = useMemo(() => layoutElevation(levels, Math.max(width, 320), 40), [levels, width]);
  const id = useId();
  return (
    <div ref={ref}>
      <svg className="mt-drawing" viewBox={`0 0 ${layout.width} ${layout.height}`} aria-hidden="true">
        <defs>
          <HatchPattern id={id} />
          <HatchPattern id={`${id}ground`} color="var(--ink-3)" spacing={5} opacity={1} />
        </defs>
        <LevelMarks layout={layout} />
        {layout.boxes.map(({ zone, x, y, width: w, height, openWidth }) => (
          <g key={zone.id}>
            <rect className="d-zone" x={x} y={y} width={w} height={height} strokeWidth="1.2" />
            {openWidth > 0 && <rect x={x + w - openWidth} y={y} width={openWidth} height={height} fill={`url(#${id})`} />}
            {height >= 22 && w >= 44 && <text x={x + 7} y={y + 16} fontSize="12" fontWeight="600">R {zone.periodMin}</text>}
          </g>
        ))}
        <Slabs layout={layout} />
        <Ground layout={layout} hatch={`${id}ground`} />
      </svg>
    </div>
  );
}
