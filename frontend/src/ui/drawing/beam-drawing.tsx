import { useId } from 'react';
import { beamSupportNames } from '@mantlet/common';
import type { BeamSupport } from '@mantlet/common';
import { formatNumber, joinWords } from '../../lib/format.js';
import { HatchPattern } from '../hatch.js';
import { layOutBeam } from './beam-layout.js';
import type { BeamLayout, BeamToDraw, PlacedLoad } from './beam-layout.js';
import { DimensionLine } from './dimension-line.js';
import { useElementWidth } from './use-element-width.js';

const arrow = (x: number, from: number, to: number) => { const back = to > from ? -5 : 5; return `M${x} ${from}V${to}M${x - 3} ${to + back}L${x} ${to}L${x + 3} ${to + back}`; };

/** Arrows point the way the load pushes: to its line from above, or from it upwards. */
function Load({ load }: { load: PlacedLoad }) {
  const { from, to, start, end, base, label, kind } = load;
  const along = (at: number) => start + (end - start) * at;
  const count = Math.max(1, Math.floor((to - from) / 26));
  const places = kind === 'point' ? [0] : Array.from({ length: count + 1 }, (_, i) => i / count);
  // a load upwards stands above its line all the same: only its arrows turn
  const arrows = places.filter((at) => Math.abs(along(at)) > 7).map((at) => {
    const [x, tall] = [from + (to - from) * at, along(at)];
    return tall > 0 ? arrow(x, base - tall, base) : arrow(x, base, base + tall);
  }).join('');
  return (
    <g>
      {kind === 'distributed' && <path className="d-aid" strokeWidth="1" d={`M${from} ${base}V${base - Math.abs(start)}L${to} ${base - Math.abs(end)}V${base}Z`} />}
      <path className="d-line" strokeWidth={kind === 'point' ? 1.8 : 1.1} d={arrows} />
      <text className="d-halo-text" x={label.x} y={label.y} fontSize="12" textAnchor="middle">{label.text}</text>
    </g>
  );
}

function Support({ x, y, kind, hatch }: { x: number; y: number; kind: 'wall-left' | 'wall-right' | 'pin' | 'roller'; hatch: string }) {
  if (kind === 'wall-left' || kind === 'wall-right') {
    const outside = kind === 'wall-left' ? x - 9 : x;
    return <g><rect x={outside} y={y - 17} width="9" height="34" fill={`url(#${hatch})`} /><path className="d-line" strokeWidth="1.6" d={`M${x} ${y - 17}v34`} /></g>;
  }
  return <path className="d-line" strokeWidth="1.3" d={`M${x} ${y + 2}l-8 13h16Z${kind === 'roller' ? `M${x - 9} ${y + 19}h18` : `M${x - 12} ${y + 15}h24`}`} />;
}
const supportsOf: Record<BeamSupport, ['wall-left' | 'pin', 'wall-right' | 'roller' | null]> = {
  simple: ['pin', 'roller'], propped: ['wall-left', 'roller'], fixed: ['wall-left', 'wall-right'], cantilever: ['wall-left', null],
};

/** The same in words, for whoever does not see it. */
export function beamInWords(beam: BeamToDraw, layout: BeamLayout): string {
  const held = layout.lateral.length;
  const places = beam.lateralSupportsMm.flatMap((at) => (at === null ? [] : [formatNumber(at, 0)]));
  return [
    `${beamSupportNames[beam.supports]}, span ${formatNumber(beam.spanMm ?? 0, 0)} mm.`,
    layout.loads.length > 0 ? `Loads: ${layout.loads.map((load) => load.label.text).join('; ')}.` : 'No load is complete yet.',
    held > 0 ? `Held sideways between its ends at ${joinWords(places)} mm.` : 'Not held sideways between its ends.',
  ].join(' ');
}

/** The beam as described so far: supports, loads where they act, and what holds it sideways. Lengths are to scale. */
export function BeamDrawing({ beam, showLateral }: { beam: BeamToDraw; showLateral: boolean }) {
  const { ref, width } = useElementWidth<HTMLDivElement>(600);
  const hatch = useId();
  const layout = layOutBeam(beam, width);
  const [start, end] = supportsOf[beam.supports];
  return (
    <div ref={ref}>
      {layout === null ? <p className="mt-help">The beam is drawn here once its span is given.</p> : (
        <>
          <svg className="mt-drawing" viewBox={`0 0 ${width} ${layout.height}`} width="100%" role="img" aria-label={beamInWords(beam, layout)}>
            <defs><HatchPattern id={hatch} color="var(--ink-2)" spacing={5} /></defs>
            {layout.loads.map((load) => <Load key={load.number} load={load} />)}
            <path className="d-line" strokeWidth="3" d={`M${layout.left} ${layout.axis}H${layout.right}`} />
            <Support x={layout.left} y={layout.axis} kind={start} hatch={hatch} />
            {end && <Support x={layout.right} y={layout.axis} kind={end} hatch={hatch} />}
            {showLateral && layout.lateral.map((x, i) => <path key={i} className="d-line" strokeWidth="1.6" d={`M${x - 5} ${layout.axis - 5}l10 10m0 -10l-10 10`} />)}
            <DimensionLine from={[layout.left, layout.axis + 34]} to={[layout.right, layout.axis + 34]} text={formatNumber(beam.spanMm ?? 0, 0)} />
          </svg>
          <p className="mt-help">
            Lengths to scale, in mm; characteristic loads by their numbers below.{showLateral && layout.lateral.length > 0 ? ' × holds the beam sideways.' : ''}
            {layout.missing.length > 0 && ` Not drawn, as incomplete or beyond the span: ${layout.missing.length === 1 ? 'load' : 'loads'} ${joinWords(layout.missing.map(String))}.`}
          </p>
        </>
      )}
    </div>
  );
}
