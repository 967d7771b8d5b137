import { Select } from 'antd';
import { useId, useMemo, useState } from 'react';
import type { Evidence, ProductKind, RegressionFit, ThermalProperties, ThicknessTable } from '@mantlet/common';
import { formatNumber } from '../../../lib/format.js';
import { SymbolText } from '../../../ui/drawing/symbol-text.js';
import { ThicknessMap } from '../../../ui/drawing/thickness-map.js';
import { Panel } from '../../../ui/panel.js';
import { Quantity } from '../../../ui/quantity.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';
import { fitName, orientationNames, shapeNames, tableName, thicknessUnitOf } from '../product-words.js';
import { RangeBox } from './range-box.js';

/** What the evidence holds, in the form it holds it. */
export function EvidenceView({ evidence, kind }: { evidence: Evidence; kind: ProductKind }) {
  if (evidence.form === 'table') return <TablesView tables={evidence.tables} kind={kind} />;
  if (evidence.form === 'regression') return <RegressionView fits={evidence.fits} kind={kind} />;
  return <ThermalView properties={evidence.properties} kind={kind} />;
}

type Choice = Pick<ThicknessTable, 'shape' | 'orientation' | 'periodMin'>;
const unique = <T,>(values: readonly T[]): T[] => [...new Set(values)];

/** The table nearest to what is asked for: a choice that has no table gives way from the right (period, then orientation). */
export function pickTable(tables: readonly ThicknessTable[], wish: Partial<Choice>): ThicknessTable | undefined {
  const rank = (t: ThicknessTable) => (t.shape === wish.shape ? 4 : 0) + (t.orientation === wish.orientation ? 2 : 0) + (t.periodMin === wish.periodMin ? 1 : 0);
  return tables.reduce<ThicknessTable | undefined>((best, t) => (!best || rank(t) > rank(best) ? t : best), undefined);
}

function Choose<T extends string | number>({ label, value, options, onChange }: { label: string; value: T; options: { value: T; label: string }[]; onChange: (value: T) => void }) {
  const id = useId();
  return (
    <div className="mt-field">
      <label className="mt-label" htmlFor={id}>{label}</label>
      <Select<T> id={id} value={value} options={options} onChange={onChange} style={{ minWidth: 168 }} />
    </div>
  );
}

function TablesView({ tables, kind }: { tables: readonly ThicknessTable[]; kind: ProductKind }) {
  const [wish, setWish] = useState<Partial<Choice>>({});
  const table = useMemo(() => pickTable(tables, wish), [tables, wish]);
  if (!table) return null;
  const ofShape = tables.filter((t) => t.shape === table.shape);
  const ofBoth = ofShape.filter((t) => t.orientation === table.orientation);
  const choose = (part: Partial<Choice>) => setWish({ shape: table.shape, orientation: table.orientation, periodMin: table.periodMin, ...part });
  return (
    <Panel title="Thickness over section factor and temperature" sub={`${tableName(table)}, in ${thicknessUnitOf(kind)}. Read by the next row up and the column below, a figure serves section factors up to its right edge and critical temperatures from its foot.`}>
      <div className="mt-map-choice">
        <Choose label="Section" value={table.shape} options={unique(tables.map((t) => t.shape)).map((value) => ({ value, label: shapeNames[value] }))} onChange={(shape) => choose({ shape })} />
        <Choose label="Member" value={table.orientation} options={unique(ofShape.map((t) => t.orientation)).map((value) => ({ value, label: orientationNames[value] }))} onChange={(orientation) => choose({ orientation })} />
        <Choose label="Period" value={table.periodMin} options={unique(ofBoth.map((t) => t.periodMin)).sort((a, b) => a - b).map((value) => ({ value, label: `R ${value}` }))} onChange={(periodMin) => choose({ periodMin })} />
      </div>
      <ThicknessMap key={tableName(table)} data={table} unit={thicknessUnitOf(kind)} label={`Thickness map: ${tableName(table)}`} />
    </Panel>
  );
}

const equation = 't = a_0 + a_1·d + a_2·d/(A/V) + a_3·θ + a_4·d·θ + a_5·d·θ/(A/V) + a_6·θ/(A/V) + a_7/(A/V)';

function RegressionView({ fits, kind }: { fits: readonly RegressionFit[]; kind: ProductKind }) {
  const unit = thicknessUnitOf(kind);
  const coefficients = Array.from({ length: 8 }, (_, i) => ({ i }));
  return (
    <>
      <Panel flush title="Regression" sub={<>Time t in minutes to the design temperature θ in °C, at thickness d in {unit}: <SymbolText text={equation} /></>}>
        <ScheduleTable
          caption="Coefficients" rows={coefficients} rowKey={(r) => String(r.i)} sticky={false}
          columns={[
            { title: 'Coefficient', key: 'name', render: (_, r) => <SymbolText text={`a_${r.i}`} /> },
            ...fits.map((fit) => ({ title: fitName(fit), key: fitName(fit), numeric: true, render: (_: unknown, r: { i: number }) => String(fit.coefficients[r.i] ?? '–').replace('-', '\u2212') })),
          ]}
        />
      </Panel>
      <Panel title="Range of the regression" sub="A thickness is given inside the box only; nothing is extrapolated.">
        <div className="mt-range-boxes">
          {fits.map((fit) => (
            <div key={fitName(fit)}>
              <h3>{fitName(fit)}</h3>
              <RangeBox sectionFactor={[fit.minSectionFactorPerM, fit.maxSectionFactorPerM]} temperature={[fit.minTemperatureC, fit.maxTemperatureC]} label={`Range for ${fitName(fit)}`} />
              <p className="mt-sub">{formatNumber(fit.minThickness, fit.minThickness % 1 ? 1 : 0)} to {formatNumber(fit.maxThickness, fit.maxThickness % 1 ? 1 : 0)} {unit}, {formatNumber(fit.minPeriodMin)} to {formatNumber(fit.maxPeriodMin)} minutes.</p>
            </div>
          ))}
        </div>
      </Panel>
    </>
  );
}

function ThermalView({ properties: p, kind }: { properties: ThermalProperties; kind: ProductKind }) {
  const constant = typeof p.conductivityWPerMK === 'number' ? p.conductivityWPerMK : null;
  const byTemperature = typeof p.conductivityWPerMK === 'number' ? [] : p.conductivityWPerMK;
  return (
    <>
      <Panel title="Thermal properties" sub="The least thickness that keeps the steel at or below its critical temperature through the period, by EN 1993-1-2 (4.27).">
        <dl className="mt-facts">
          <dt>Conductivity λ</dt><dd>{constant === null ? 'By temperature, below' : <Quantity value={constant} decimals={3} unit="W/mK" />}</dd>
          <dt>Density ρ</dt><dd><Quantity value={p.densityKgPerM3} unit="kg/m³" /></dd>
          <dt>Specific heat c</dt><dd><Quantity value={p.specificHeatJPerKgK} unit="J/kgK" /></dd>
          <dt>Moisture</dt><dd><Quantity value={p.moisturePercent} decimals={1} unit="%" /></dd>
          <dt>{kind === 'board' ? 'Stocked thicknesses' : 'Rounded up to'}</dt>
          <dd>{p.stockThicknessesMm.length > 0 ? `${p.stockThicknessesMm.join(', ')} mm, at most ${p.maxLayers} ${p.maxLayers === 1 ? 'layer' : 'layers'}` : `steps of ${p.thicknessStepMm} mm`}</dd>
          <dt>Natural fires</dt><dd>{p.coversNaturalFire ? 'Covered, cooling included' : 'Not covered'}</dd>
        </dl>
        {byTemperature.length > 0 && (
          <table className="mt-small-table">
            <caption className="mt-sr">Conductivity by temperature</caption>
            <thead><tr><th scope="col">Temperature °C</th><th scope="col">Conductivity W/mK</th></tr></thead>
            <tbody>{byTemperature.map((r) => <tr key={r.temperatureC}><td>{formatNumber(r.temperatureC)}</td><td>{formatNumber(r.value, 3)}</td></tr>)}</tbody>
          </table>
        )}
      </Panel>
      <Panel title="Range of the properties" sub="Outside the box the product gives no thickness; nothing is extrapolated.">
        <div className="mt-range-boxes">
          <div>
            <RangeBox sectionFactor={[p.minSectionFactorPerM, p.maxSectionFactorPerM]} temperature={[null, p.maxTemperatureC]} label="Range of the thermal properties" />
            <p className="mt-sub">{formatNumber(p.minThicknessMm, p.minThicknessMm % 1 ? 1 : 0)} to {formatNumber(p.maxThicknessMm, p.maxThicknessMm % 1 ? 1 : 0)} mm, up to {formatNumber(p.maxPeriodMin)} minutes.</p>
          </div>
        </div>
      </Panel>
    </>
  );
}
