import { formatNumber } from '../../lib/format.js';
import { fitText } from './building-elevation-layout.js';
import { textWidth } from './label-layout.js';
import { useElementWidth } from './use-element-width.js';

export interface FloorAmount { id: string; code: string; name: string; elevationM: number; amount: number | null }
interface FloorBarsProps { floors: readonly FloorAmount[]; unit: string; decimals: number; label: string }

const row = 30;
const ordered = (floors: readonly FloorAmount[]) => [...floors].sort((a, b) => b.elevationM - a.elevationM);

/** How far a bar reaches so that its figure still has room after it. */
export function barLengths(floors: readonly FloorAmount[], room: number, widest: number): Map<string, number> {
  const greatest = Math.max(0, ...floors.map((f) => f.amount ?? 0));
  const most = Math.max(0, room - widest - 8);
  return new Map(floors.map((f) => [f.id, greatest > 0 ? ((f.amount ?? 0) / greatest) * most : 0]));
}

/** The floors from the top down, each with a bar and its figure: the same order as the elevation beside it. */
export function FloorBars({ floors, unit, decimals, label }: FloorBarsProps) {
  const { ref, width } = useElementWidth<HTMLDivElement>(330);
  const rows = ordered(floors);
  const said = (f: FloorAmount) => (f.amount === null ? '–' : `${formatNumber(f.amount, decimals)} ${unit}`);
  const left = Math.min(150, width * 0.36);
  const lengths = barLengths(rows, width - left - 4, Math.max(0, ...rows.map((f) => textWidth(said(f), 12.5))));
  const ground = rows.findIndex((f) => f.elevationM < 0);
  return (
    <div ref={ref} className="mt-elevation">
      <svg className="mt-drawing" viewBox={`0 0 ${width} ${rows.length * row + 12}`} role="img" aria-label={`${label}. ${rows.map((f) => `${f.code} ${f.name} ${said(f)}`).join('; ')}.`}>
        {rows.map((f, i) => {
          const length = lengths.get(f.id) ?? 0;
          return (
            <g key={f.id} transform={`translate(0 ${i * row + 6})`}>
              <text x="2" y="19" fontSize="12.5">{fitText(`${f.code} ${f.name}`, left - 14, 12.5)}</text>
              {length > 0 && <rect className="d-bar" x={left} y="8" width={length} height="14" />}
              <text x={left + length + 7} y="19" fontSize="12.5" fontWeight="500">{said(f)}</text>
            </g>
          );
        })}
        <line className="d-line" x1={left} x2={left} y1="6" y2={rows.length * row + 6} strokeWidth="1.2" />
        {ground > 0 && <line className="d-line" x1="0" x2={width} y1={ground * row + 6} y2={ground * row + 6} strokeWidth="1.6" />}
      </svg>
    </div>
  );
}
