import type { MemberChartsDto } from '@mantlet/common';
import { formatLimitTemperature } from '@mantlet/common';
import { joinWords } from '../../lib/format.js';
import { firstReach, minuteTicks, niceTicks, valueAt } from './chart-scale.js';
import { LineChart } from './line-chart.js';
import type { ChartFrame, ChartLabel, Series } from './line-chart.js';

interface HeatingChartProps {
  charts: Pick<MemberChartsDto, 'fire' | 'bare' | 'protected' | 'periodMin'>;
  /** null: not determined, and no line is drawn */
  criticalC: number | null;
  /** e.g. "Standard fire" */
  fireName: string;
}

const degrees = (value: number | null) => (value === null ? 'no value' : `${value.toFixed(0)} °C`);

/** The drawing in one sentence each line. */
export function heatingInWords({ charts, criticalC, fireName }: HeatingChartProps): string {
  const { bare, fire, periodMin } = charts;
  const reached = criticalC === null ? null : firstReach(bare, criticalC);
  const end = (points: [number, number][]) => degrees(valueAt(points, periodMin));
  return [
    `${fireName} against time. At ${periodMin} min the fire is at ${end(fire)}, bare steel at ${end(bare)}${charts.protected ? ` and protected steel at ${end(charts.protected)}` : ''}.`,
    criticalC === null ? 'The critical temperature is not determined.'
      : reached === null ? `Bare steel stays below its critical temperature of ${formatLimitTemperature(criticalC)} as far as drawn.`
        : `Bare steel reaches its critical temperature of ${formatLimitTemperature(criticalC)} after ${reached.toFixed(0)} min.`,
  ].join(' ');
}

function seriesOf(charts: HeatingChartProps['charts'], to: number): Series[] {
  return [
    { name: 'fire', points: charts.fire, className: 'd-dashed', labelAt: to * 0.07 },
    { name: 'bare', points: charts.bare, className: 'd-thin', labelAt: to * 0.24, side: 'below' },
    ...(charts.protected ? [{ name: 'protected', points: charts.protected, className: 'd-protected', textClassName: 'd-settled-text', labelAt: to * 0.5, side: 'below' as const }] : []),
  ];
}

/** Fire, bare and protected steel against minutes, with the period and the critical temperature. */
export function HeatingChart(props: HeatingChartProps) {
  const { charts, criticalC } = props;
  const to = Math.max(charts.periodMin, charts.fire[charts.fire.length - 1]?.[0] ?? 0);
  const peak = Math.max(20, ...charts.fire.map(([, c]) => c), ...charts.bare.map(([, c]) => c));
  const yTicks = niceTicks(0, Math.max(peak, criticalC ?? 0), 7);
  const series = seriesOf(charts, to);
  const marks = ({ x, y, plot }: ChartFrame) => (
    <>
      <line className="d-axis" x1={x(charts.periodMin)} x2={x(charts.periodMin)} y1={plot.y} y2={plot.y + plot.height} />
      {criticalC !== null && <line className="d-limit" x1={plot.x} x2={plot.x + plot.width} y1={y(criticalC)} y2={y(criticalC)} />}
    </>
  );
  const markLabels = ({ x, y, plot }: ChartFrame) => {
    const [px, foot, right] = [x(charts.periodMin), plot.y + plot.height, plot.x + plot.width];
    const wishes: ChartLabel[] = [{ text: `R ${charts.periodMin}`, fontSize: 12.5, weight: 600, places: [{ x: px + 6, y: foot - 12, anchor: 'start' }, { x: px - 6, y: foot - 12, anchor: 'end' }] }];
    if (criticalC !== null) {
      const text = `θ_cr ${formatLimitTemperature(criticalC)}`;
      wishes.push({ text, fontSize: 12, weight: 500, className: 'd-attention', places: [{ x: right - 4, y: y(criticalC) + 15, anchor: 'end' }, { x: right - 4, y: y(criticalC) - 6, anchor: 'end' }, { x: px - 8, y: y(criticalC) - 6, anchor: 'end' }, { x: px - 8, y: y(criticalC) + 15, anchor: 'end' }, { x: plot.x + 6, y: y(criticalC) - 6, anchor: 'start' }] });
    }
    const lines = [{ x: px - 1, y: plot.y, width: 2, height: plot.height }, ...(criticalC === null ? [] : [{ x: plot.x, y: y(criticalC) - 1, width: plot.width, height: 2 }])];
    return { wishes, lines };
  };
  return (
    <LineChart
      label={heatingInWords(props)} series={series} step={1} unitX="min" unitY="°C" marks={marks} markLabels={markLabels}
      xAxis={{ to, ticks: minuteTicks(to), label: 'minutes' }} yAxis={{ to: yTicks[yTicks.length - 1] ?? peak, ticks: yTicks, label: '°C' }}
      sayAt={(at, values) => `At ${at} min: ${joinWords(series.map((s, i) => `${s.name} ${degrees(values[i] ?? null)}`))}`}
    />
  );
}
