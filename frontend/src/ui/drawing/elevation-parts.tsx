import { formatLevel } from '../../lib/format.js';
import { fitText, scaleBar, wideFrom } from './building-elevation-layout.js';
import type { ElevationLayout } from './building-elevation-layout.js';
import type { ZoneLabels } from './elevation-labels.js';

/** A triangle standing on each floor with its height above the datum. */
export function LevelMarks({ layout }: { layout: ElevationLayout }) {
  // on a narrow screen the mark stands close to the wall and the dashed line is left out
  const compact = layout.width < wideFrom;
  const tip = layout.plotLeft - (compact ? 9 : 49);
  const wallAt = (y: number) => Math.min(...layout.boxes.filter((b) => Math.abs(b.y + b.height - y) < 0.5).map((b) => b.x), layout.plotLeft + layout.plotWidth);
  return (
    <g aria-hidden="true">
      {layout.marks.map(({ level, y, labelY }, i) => (
        <g key={level.id}>
          {!compact && <line className="d-aid" x1={tip} x2={Math.max(layout.plotLeft, wallAt(y))} y1={y} y2={y} strokeWidth="1" strokeDasharray="5 3" />}
          <path d={`M${tip - 5} ${labelY - 9}h10l-5 8z`} fill="var(--ink)" />
          <text className="d-sub" x={tip - 9} y={labelY - 3.5} fontSize="11.5" textAnchor="end">{formatLevel(level.elevationM)}</text>
          {labelY - (layout.marks[i - 1]?.labelY ?? -Infinity) >= 32 && <text x={tip - 9} y={labelY - 17.5} fontSize="11.5" fontWeight="600" textAnchor="end">{fitText(level.code, tip - 9, 11.5)}</text>}
        </g>
      ))}
    </g>
  );
}

/** Floors as slabs: a line with thickness under every level. */
export function Slabs({ layout }: { layout: ElevationLayout }) {
  const bands = new Map<number, { from: number; to: number }>();
  for (const b of [...layout.boxes, ...layout.emptyBands]) {
    const y = Math.round((b.y + b.height) * 10) / 10;
    const band = bands.get(y);
    bands.set(y, { from: Math.min(band?.from ?? Infinity, b.x), to: Math.max(band?.to ?? 0, b.x + b.width) });
  }
  return <g aria-hidden="true">{[...bands].map(([y, { from, to }]) => <rect key={y} className="d-ink" x={from - 1} width={to - from + 2} y={y - 1.2} height="2.6" />)}</g>;
}

export function Ground({ layout, hatch }: { layout: ElevationLayout; hatch: string }) {
  const y = layout.groundY;
  if (y == null) return null;
  const from = 4;
  const wall = layout.plotLeft + layout.plotWidth;
  const to = Math.min(layout.width, wall + 12);
  return (
    <g aria-hidden="true" className="d-ground">
      <rect x={from} y={y} width={layout.plotLeft - from} height="7" fill={`url(#${hatch})`} />
      <rect x={wall} y={y} width={to - wall} height="7" fill={`url(#${hatch})`} />
      <line className="d-line" x1={from} x2={to} y1={y} y2={y} strokeWidth="1.8" />
    </g>
  );
}

/** Heights only are to scale, so the bar stands upright. */
export function ScaleBar({ layout }: { layout: ElevationLayout }) {
  const bar = scaleBar(layout);
  if (!bar) return null;
  const { x, steps } = bar;
  const last = steps.at(-1);
  return (
    <g aria-hidden="true">
      {steps.map((step, i) => <rect key={step.fromM} className={i % 2 ? 'd-zone' : 'd-ink'} x={x} y={step.y} width="6" height={step.height} stroke="var(--ink)" strokeWidth="1" />)}
      {steps.map((step) => <text key={step.fromM} className="d-sub" x={x + 11} y={step.y + step.height + 4} fontSize="11">{step.fromM}</text>)}
      {last && <text className="d-sub" x={x + 11} y={last.y + 4} fontSize="11">{last.toM} m</text>}
    </g>
  );
}

/** The words on a zone, and its balloons filled as the sheet is, so that hatch and rails end at them. */
export function ZoneText({ labels, activeKeynote }: { labels: ZoneLabels; activeKeynote?: number | null }) {
  const classes = { strong: '', name: '', aside: 'd-sub', more: 'd-attention' } as const;
  return (
    <g className="d-halo" aria-hidden="true" pointerEvents="none">
      {labels.texts.map((t) => <text key={t.role} className={classes[t.role]} x={t.x} y={t.y} fontSize={t.size} textAnchor={t.anchor} fontWeight={t.role === 'strong' ? 600 : t.role === 'more' ? 500 : 400}>{t.text}</text>)}
      {labels.balloons.map(({ number, cx, cy, r }) => (
        <g key={number} className={`d-balloon ${number === activeKeynote ? 'd-balloon-on' : ''}`}>
          <circle cx={cx} cy={cy} r={r} />
          <text x={cx} y={cy + 4} fontSize={number > 99 ? 9.5 : 11.5} fontWeight="600" textAnchor="middle">{number}</text>
        </g>
      ))}
    </g>
  );
}
