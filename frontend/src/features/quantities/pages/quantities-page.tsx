import { Button, Select } from 'antd';
import { useId } from 'react';
import { Link, useSearchParams } from 'react-router-dom';
import { deliveryRules, quantityQuerySchema, sentence, splitKeyNames, splitKeys } from '@mantlet/common';
import type { BuildingDto, ProjectDto, QuantitiesDto, QuantityQuery, SplitKey } from '@mantlet/common';
import { BuildingQuantities } from '../../../ui/drawing/building-quantities.js';
import { FloorBars } from '../../../ui/drawing/floor-bars.js';
import { Page } from '../../../ui/page.js';
import { Panel } from '../../../ui/panel.js';
import { Quantity } from '../../../ui/quantity.js';
import { EmptyState, QueryState } from '../../../ui/states.js';
import { StatusWord } from '../../../ui/status-word.js';
import { Term } from '../../../ui/term.js';
import { useBuilding } from '../../building/api/building.js';
import { RequireRight, useCurrentProject } from '../../projects/project-context.js';
import { linesCsvUrl, useQuantities, workbookUrl } from '../api/quantities.js';
import { AllMeasures, Matrix } from '../components/matrix.js';
import { Purchases } from '../components/purchases.js';
import { byZone, labelOf, measureKeys, measures, unitOf } from '../measures.js';
import type { MeasureKey } from '../measures.js';
import { quantitiesHeading } from '../quantity-words.js';
import '../quantities.css';

interface Choice extends QuantityQuery { measure: MeasureKey }
const deliveryNames: Record<QuantityQuery['delivery'], string> = { project: 'Once for the whole project', level: 'Level by level' };

/** The choice of the address; what it says wrongly is as if it said nothing. */
export function readChoice(params: URLSearchParams): Choice {
  const query = quantityQuerySchema.safeParse({ rows: params.get('rows') ?? undefined, columns: params.get('columns') ?? undefined, delivery: params.get('delivery') ?? undefined });
  const measure = measureKeys.find((key) => key === params.get('measure')) ?? 'area';
  return { ...(query.success ? query.data : { rows: 'level', columns: 'product', delivery: 'project' }), measure };
}

/** Rows and columns never split by the same: choosing the other's key swaps the two. */
export function withSplit(choice: Choice, side: 'rows' | 'columns', key: SplitKey): Choice {
  const other = side === 'rows' ? 'columns' : 'rows';
  return choice[other] === key ? { ...choice, [side]: key, [other]: choice[side] } : { ...choice, [side]: key };
}

function Choose<T extends string>({ label, value, options, onChange }: { label: string; value: T; options: { value: T; label: string }[]; onChange: (value: T) => void }) {
  const id = useId();
  return <div className="mt-field"><label className="mt-label" htmlFor={id}>{label}</label><Select<T> id={id} value={value} options={options} onChange={onChange} style={{ minWidth: 172 }} /></div>;
}

function Choices({ choice, currency, onChange }: { choice: Choice; currency: string; onChange: (choice: Choice) => void }) {
  const splits = splitKeys.map((value) => ({ value, label: splitKeyNames[value] }));
  return (
    <div className="mt-quantity-choice mt-noprint" role="group" aria-label="How the quantities are split">
      <Choose label="Rows" value={choice.rows} options={splits} onChange={(key) => onChange(withSplit(choice, 'rows', key))} />
      <Choose label="Columns" value={choice.columns} options={splits} onChange={(key) => onChange(withSplit(choice, 'columns', key))} />
      <Choose label="Shown" value={choice.measure} options={measureKeys.map((value) => ({ value, label: labelOf(value, currency) }))} onChange={(measure) => onChange({ ...choice, measure })} />
      <Choose label="Delivered" value={choice.delivery} options={deliveryRules.map((value) => ({ value, label: deliveryNames[value] }))} onChange={(delivery) => onChange({ ...choice, delivery })} />
    </div>
  );
}

function Drawing({ data, building, measure, project }: { data: QuantitiesDto; building: BuildingDto; measure: MeasureKey; project: ProjectDto }) {
  const amounts = new Map([...byZone(data.lines, measure)].map(([zone, amount]) => [zone, amount === null ? null : Number(amount)]));
  const { name } = measures[measure];
  const unit = unitOf(measure, data.currency);
  const decimals = measure === 'volume' ? 1 : 0;
  const floors = building.levels.map(({ id, code, name: levelName, elevationM, zones }) => {
    const own = zones.map((zone) => amounts.get(zone.id)).filter((a) => a !== undefined);
    // a floor with a zone that is not determined has no sum
    const amount = own.length === 0 || own.includes(null) ? null : own.reduce<number>((sum, a) => sum + (a ?? 0), 0);
    return { id, code, name: levelName, elevationM, amount };
  });
  return (
    <div className="mt-columns mt-quantity-drawings">
      <Panel flush title={`${name} by zone`}>
        <BuildingQuantities levels={building.levels} amounts={amounts} unit={unit} decimals={decimals} what={name} label={`Elevation of ${project.name}: ${name.toLowerCase()} by zone.`} />
      </Panel>
      <div className="mt-stack">
        <Panel flush title={`${name} by level`}><FloorBars floors={floors} unit={unit} decimals={decimals} label={`${name} by level`} /></Panel>
        <MoneyLine data={data} />
      </div>
    </div>
  );
}

function MoneyLine({ data }: { data: QuantitiesDto }) {
  const { total } = data.split;
  const money = (value: string | null, what: string) => <Quantity value={value} decimals={2} unit={data.currency} what={what} reason={total.missing.map(sentence).join(' ') || 'not priced'} />;
  return (
    <Panel title="Money">
      <dl className="mt-facts">
        <dt><Term name="rate">Material</Term></dt><dd>{money(total.materialCost, 'Material')}</dd>
        <dt>Labour</dt><dd>{money(total.labourCost, 'Labour')}</dd>
        <dt>Both</dt><dd>{money(total.cost, 'Material and labour')}</dd>
        <dt>Overheads, {data.markUpPercent} %</dt><dd>{money(data.markUp, 'Overheads')}</dd>
        <dt>Total</dt><dd className="mt-strong">{money(data.totalWithMarkUp, 'Total')}</dd>
      </dl>
    </Panel>
  );
}

function Content({ data, choice, project }: { data: QuantitiesDto; choice: Choice; project: ProjectDto }) {
  const building = useBuilding(project.id);
  const { missing } = data.split.total;
  const stale = building.data?.openItems.find((item) => item.code === 'stale');
  return (
    <>
      {stale && <p className="mt-old"><StatusWord kind="attention">Out of date</StatusWord> {stale.title.replace(/; recalculate$/, '')}. These figures follow once they are recalculated on the <Link to={`/projects/${project.id}/schedule`}>Schedule page</Link>.</p>}
      {missing.length > 0 && (
        <Panel title="Some quantities are not determined"><ul className="mt-missing">{missing.map(sentence).map((m) => <li key={m}>{m}</li>)}</ul></Panel>
      )}
      <QueryState query={building} what="the building">{(b) => <Drawing data={data} building={b} measure={choice.measure} project={project} />}</QueryState>
      <Panel flush className="mt-fit" title={`${measures[choice.measure].name} by ${splitKeyNames[choice.rows].toLowerCase()} and ${splitKeyNames[choice.columns].toLowerCase()}`} sub={`In ${unitOf(choice.measure, data.currency)}. Every split adds up to the same grand total.`}>
        <Matrix data={data} rows={choice.rows} columns={choice.columns} measure={choice.measure} />
      </Panel>
      <Panel flush className="mt-fit" title="What to order" sub="Containers, bags and sheets are rounded up once for each product and delivery, not for each member."><Purchases data={data} /></Panel>
      <Panel flush title={`All quantities by ${splitKeyNames[choice.rows].toLowerCase()}`} sub="Rounded for reading; the figures in full are in the CSV and the workbook."><AllMeasures data={data} rows={choice.rows} /></Panel>
    </>
  );
}

function Quantities({ project }: { project: ProjectDto }) {
  const [params, setParams] = useSearchParams();
  const choice = readChoice(params);
  const { measure, ...query } = choice;
  const quantities = useQuantities(project.id, query);
  const change = (next: Choice) => setParams({ rows: next.rows, columns: next.columns, measure: next.measure, ...(next.delivery === 'project' ? {} : { delivery: next.delivery }) }, { replace: true });
  const empty = quantities.data?.lines.length === 0;
  return (
    <Page
      title="Quantities" projectName={project.name} heading={quantities.data ? quantitiesHeading(quantities.data) : 'Quantities'}
      sub={empty ? undefined : 'Net of deductions, from the results as they stand; members that are open are not in these figures.'}
      actions={empty ? null : <>
        <Button href={linesCsvUrl(project.id)} download>Lines as CSV</Button>
        <Button href={workbookUrl(project.id, query)} download>Workbook as XLSX</Button>
      </>}
    >
      <QueryState query={quantities} what="the quantities">
        {(data) => data.lines.length === 0
          ? <Panel label="Quantities"><EmptyState title="No member needs protection yet">Quantities appear once members are settled with a thickness: members with a critical temperature, in zones with a system.</EmptyState></Panel>
          : <><Choices choice={{ ...query, measure }} currency={data.currency} onChange={change} /><Content data={data} choice={choice} project={project} /></>}
      </QueryState>
    </Page>
  );
}

export default function QuantitiesPage() {
  const project = useCurrentProject();
  return <RequireRight right="see-design"><Quantities project={project} /></RequireRight>;
}
