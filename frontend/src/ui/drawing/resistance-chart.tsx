import { Radio } from 'antd';
import { useState } from 'react';
import type { MemberChartsDto } from '@mantlet/common';
import { formatLimitTemperature } from '@mantlet/common';
import { formatNumber, joinWords } from '../../lib/format.js';
import { niceTicks } from './chart-scale.js';
import { LineChart } from './line-chart.js';
import type { ChartFrame, ChartLabel } from './line-chart.js';

type LimitState = MemberChartsDto['resistance'][number];
interface ResistanceChartProps {
  limitStates: readonly LimitState[];
  /** name of the limit state that gives the lowest temperature */
  governing: string | null;
  criticalC: number | null;
}

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);
const force = (value: number | null, unit: string) => (value === null ? 'no value' : `${formatNumber(value, 1)} ${unit}`);

/** The temperature at which a falling resistance meets its effect; null where it starts below it or never falls to it. */
export function crossing({ points, effect }: Pick<LimitState, 'points' | 'effect'>): number | null {
  const [first] = points;
  if (!first || first[1] < effect) return null;
  for (let i = 1; i < points.length; i += 1) {
    const [x0, y0] = points[i - 1] as [number, number];
    const [x1, y1] = points[i] as [number, number];
    if (y0 >= effect && y1 < effect) return x0 + ((x1 - x0) * (y0 - effect)) / (y0 - y1);
  }
  return null;
}

export function resistanceInWords(state: LimitState): string {
  const cold = state.points[0]?.[1] ?? null;
  const at = crossing(state);
  return [
    `${capital(state.limitState)} resistance against steel temperature: ${force(cold, state.unit)} cold; the effect in fire is ${force(state.effect, state.unit)}.`,
    at !== null ? `They meet at ${formatLimitTemperature(at)}.` : cold !== null && cold < state.effect ? 'The effect is above the resistance from the start.' : 'They do not meet as far as drawn.',
  ].join(' ');
}

function OneState({ state, criticalC }: { state: LimitState; criticalC: number | null }) {
  const xTo = Math.max(1000, ...state.points.map(([t]) => t));
  const most = Math.max(state.effect, ...state.points.map(([, r]) => r));
  const yTicks = niceTicks(0, most * 1.04, 6);
  const name = `${state.limitState} resistance`;
  const temperature = criticalC ?? crossing(state);
  const marks = ({ x, y, plot }: ChartFrame) => (
    <>
      <line className="d-effect" x1={plot.x} x2={temperature === null ? plot.x + plot.width : x(temperature)} y1={y(state.effect)} y2={y(state.effect)} />
      {temperature !== null && <line className="d-limit" x1={x(temperature)} x2={x(temperature)} y1={y(state.effect)} y2={plot.y + plot.height} />}
    </>
  );
  const markLabels = ({ x, y, plot }: ChartFrame) => {
    const effectY = y(state.effect);
    const wishes: ChartLabel[] = [{ text: `effect in fire ${force(state.effect, state.unit)}`, fontSize: 12, className: 'd-attention', places: [{ x: plot.x + 8, y: effectY + 16, anchor: 'start' }, { x: plot.x + 8, y: effectY - 7, anchor: 'start' }] }];
    if (temperature !== null) {
      wishes.unshift({ text: formatLimitTemperature(temperature), fontSize: 13, weight: 600, places: [{ x: x(temperature) + 10, y: effectY - 6, anchor: 'start' }, { x: x(temperature) + 10, y: effectY + 18, anchor: 'start' }, { x: x(temperature) - 10, y: effectY - 8, anchor: 'end' }] });
    }
    return { wishes, lines: [{ x: plot.x, y: effectY - 1, width: (temperature === null ? plot.width : x(temperature) - plot.x), height: 2 }] };
  };
  const dot = ({ x, y }: ChartFrame) => temperature !== null && <circle className="d-mark" cx={x(temperature)} cy={y(state.effect)} r="4.5" />;
  return (
    <LineChart
      label={resistanceInWords(state)} step={10} unitX="°C" unitY={state.unit} decimals={1}
      series={[{ name, points: state.points, className: 'd-ink', textClassName: '', labelAt: 60 }]}
      xAxis={{ to: xTo, ticks: niceTicks(0, xTo, 7), label: 'steel temperature, °C' }} yAxis={{ to: yTicks[yTicks.length - 1] ?? most, ticks: yTicks, label: state.unit === 'kNm' ? 'M, kNm' : state.limitState === 'shear' ? 'V, kN' : 'N, kN' }}
      marks={(frame) => <>{marks(frame)}{dot(frame)}</>} markLabels={markLabels}
      sayAt={(at, [value]) => `At ${at} °C: ${name} ${force(value ?? null, state.unit)}, effect ${force(state.effect, state.unit)}`}
    />
  );
}

/** All limit states on one axis: resistance as a multiple of its own effect, so that each crosses at 1. */
function AllStates({ states }: { states: readonly LimitState[] }) {
  const shown = states.filter((s) => s.effect > 0);
  const ratios = shown.map((s) => ({ ...s, points: s.points.map(([t, r]) => [t, r / s.effect] as [number, number]) }));
  const xTo = Math.max(1000, ...ratios.flatMap((s) => s.points.map(([t]) => t)));
  const most = Math.max(1, ...ratios.flatMap((s) => s.points.map(([, r]) => r)));
  const yTicks = niceTicks(0, most * 1.04, 6);
  const looks = ['d-ink', 'd-thin', 'd-dashed'];
  return (
    <LineChart
      label={shown.map(resistanceInWords).join(' ')} step={10} unitX="°C" unitY="times its effect" decimals={2}
      series={ratios.map((s, i) => ({ name: s.limitState, points: s.points, className: looks[i % looks.length] as string, textClassName: '', labelAt: 60 + 120 * i }))}
      xAxis={{ to: xTo, ticks: niceTicks(0, xTo, 7), label: 'steel temperature, °C' }} yAxis={{ to: yTicks[yTicks.length - 1] ?? most, ticks: yTicks, label: 'resistance as a multiple of its effect' }}
      marks={({ y, plot }) => <line className="d-effect" x1={plot.x} x2={plot.x + plot.width} y1={y(1)} y2={y(1)} />}
      markLabels={({ y, plot }) => ({ wishes: [{ text: 'effect in fire', fontSize: 12, className: 'd-attention', places: [{ x: plot.x + 8, y: y(1) + 15, anchor: 'start' }, { x: plot.x + 8, y: y(1) - 6, anchor: 'start' }] }], lines: [{ x: plot.x, y: y(1) - 1, width: plot.width, height: 2 }] })}
      sayAt={(at, values) => `At ${at} °C: ${joinWords(ratios.map((s, i) => `${s.limitState} ${values[i] == null ? 'no value' : `${values[i].toFixed(2)} times its effect`}`))}`}
    />
  );
}

/** Resistance falling with steel temperature, and the effect in fire that crosses it at the critical temperature. */
export function ResistanceChart({ limitStates, governing, criticalC }: ResistanceChartProps) {
  const first = limitStates.find((s) => s.limitState === governing) ?? limitStates[0];
  const [chosen, choose] = useState<string | null>(null);
  if (!first) return null;
  const several = limitStates.filter((s) => s.effect > 0).length > 1;
  const state = limitStates.find((s) => s.limitState === chosen) ?? first;
  const options = [...limitStates.map((s) => ({ value: s.limitState, label: capital(s.limitState) })), { value: 'all', label: 'All' }];
  return (
    <div className="mt-stack mt-tight">
      {several && <Radio.Group aria-label="Limit state drawn" size="small" optionType="button" value={chosen ?? first.limitState} onChange={(e) => choose(e.target.value as string)} options={options} className="mt-noprint" />}
      {chosen === 'all' ? <AllStates states={limitStates} /> : <OneState key={state.limitState} state={state} criticalC={state === first ? criticalC : crossing(state)} />}
    </div>
  );
}

