import type { Placed } from './steel-reading-layout.js';
import { valueAt } from './chart-scale.js';
import type { Points } from './chart-scale.js';

/** The same subscripts as in the page's text, inside a drawing. */
function SvgSymbol({ text, size }: { text: string; size: number }) {
  const found = /^(.*?)_(\S+)(.*)$/.exec(text);
  if (!found) return text;
  return <>{found[1]}<tspan dy={size * 0.24} fontSize={size * 0.74}>{found[2]}</tspan><tspan dy={-size * 0.24}>{found[3]}</tspan></>;
}

export function PlacedLabels({ labels }: { labels: readonly Placed[] }) {
  return labels.map(({ label, place }) => (
    <text key={label.text} className={`d-label ${label.className ?? ''}`} x={place.x} y={place.y} fontSize={label.fontSize} fontWeight={label.weight ?? 400} textAnchor={place.anchor}>
      <SvgSymbol text={label.text} size={label.fontSize} />
    </text>
  ));
}

interface ValuesProps { caption: string; unit: string; at: readonly number[]; series: readonly (readonly [string, Points])[]; format: (value: number) => string }
/** Lines of a drawing as a table, at the ticks of its axis. */
export function ValuesTable({ caption, unit, at, series, format }: ValuesProps) {
  const rows = at.map((t) => ({ t, values: series.map(([, points]) => valueAt(points, t)) })).filter((row) => row.values.some((v) => v !== null));
  return (
    <table>
      <caption className="mt-sub">{caption}</caption>
      <thead><tr><th scope="col">{unit}</th>{series.map(([name]) => <th key={name} scope="col">{name}</th>)}</tr></thead>
      <tbody>{rows.map(({ t, values }) => <tr key={t}><th scope="row">{t}</th>{values.map((v, i) => <td key={series[i]?.[0]}>{v === null ? '–' : format(v)}</td>)}</tr>)}</tbody>
    </table>
  );
}
