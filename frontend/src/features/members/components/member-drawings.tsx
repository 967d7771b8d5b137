import type { MemberSheetDto } from '@mantlet/common';
import { fireCurveNames, formatLimitTemperature, formatThickness, wayNames } from '@mantlet/common';
import { formatDate, formatNumber } from '../../../lib/format.js';
import { HeatingChart } from '../../../ui/drawing/heating-chart.js';
import { ResistanceChart } from '../../../ui/drawing/resistance-chart.js';
import { SectionDrawing } from '../../../ui/drawing/section-drawing.js';
import { firstReach, valueAt } from '../../../ui/drawing/chart-scale.js';
import { shapeDetails } from '../../../ui/drawing/shape-preview.js';
import { Panel } from '../../../ui/panel.js';

const fireName = (curve: string) => (fireCurveNames as Record<string, string>)[curve] ?? curve;
const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

function SectionPanel({ sheet }: { sheet: MemberSheetDto }) {
  const { outline, section, member } = sheet;
  return (
    <Panel title={section.designation}>
      {outline
        ? <SectionDrawing outline={outline} name={section.designation} exposure={member.exposure} details={shapeDetails(section.shape)} />
        : <p className="mt-sub">Not drawn: the section and its exposure do not go together. {sheet.sentence}</p>}
    </Panel>
  );
}

/** "Calculated from actions, 12 Nov 2026, I. Structural." */
export function provenance({ member, result }: Pick<MemberSheetDto, 'member' | 'result'>): string {
  const reference = 'reference' in member.basis && member.basis.reference ? `, ${member.basis.reference}` : '';
  const who = member.basisSetBy ? `, ${formatDate(member.basisSetAt)}, ${member.basisSetBy}` : '';
  return `${wayNames[member.basis.way]}${result?.assumed ? ' and not accepted' : ''}${reference}${who}.`;
}

function ResistancePanel({ sheet }: { sheet: MemberSheetDto }) {
  const { result, charts } = sheet;
  const critical = result?.criticalTemperatureC ?? null;
  const governs = result?.governing ? `${capital(result.governing)} governs. ` : '';
  const title = critical !== null ? (charts?.resistance.length ? `Carries its load up to ${formatLimitTemperature(critical)}` : `Critical temperature ${formatLimitTemperature(critical)}`)
    : result?.verdict === 'under-strength' ? 'Does not carry its load cold' : 'Critical temperature not determined';
  return (
    <Panel title={title} sub={`${governs}${provenance(sheet)}`}>
      {charts && charts.resistance.length > 0
        ? <ResistanceChart limitStates={charts.resistance} governing={result?.governing ?? null} criticalC={critical} />
        : <p className="mt-sub">{critical === null ? 'There is no resistance to draw until actions or a utilisation are given.' : 'No resistance is drawn: the temperature does not come from actions.'}</p>}
    </Panel>
  );
}

/** Bare steel at the end of the period, as stored or, where the member has no result to store it with, as drawn. */
export const bareAtEnd = ({ result, charts }: Pick<MemberSheetDto, 'result' | 'charts'>): number | null =>
  result?.bareTemperatureC ?? (charts ? valueAt(charts.bare, charts.periodMin) : null);

function HeatingPanel({ sheet }: { sheet: MemberSheetDto }) {
  const { result, charts, zone } = sheet;
  if (!charts) return <Panel title="Heating not determined"><p className="mt-sub">There is no section factor to heat the steel by.</p></Panel>;
  const critical = result?.criticalTemperatureC ?? null;
  const limit = result?.verdict === 'bare' ? result.bareCriticalTemperatureC ?? critical : critical;
  const minutes = limit === null ? null : firstReach(charts.bare, limit);
  const end = bareAtEnd(sheet);
  const title = limit === null ? (end === null ? 'How it heats without protection' : `Bare, it is at ${formatNumber(end)} °C after ${charts.periodMin} minutes`)
    : minutes === null ? `Bare, it stays below ${formatLimitTemperature(limit)}` : `Bare, it is at ${formatLimitTemperature(limit)} after ${Math.floor(minutes)} minutes`;
  const holds = charts.protected && limit !== null ? firstReach(charts.protected, limit) : null;
  const thickness = formatThickness(result?.requiredThickness, result?.thicknessUnit ?? 'mm');
  const protectedWords = !charts.protected ? (result?.verdict === 'protected' ? ' The product states thickness, not temperature: no protected line.' : '')
    : holds === null ? ` With ${thickness} it stays below to the end of the drawing.` : ` With ${thickness} it holds to ${Math.floor(holds)} minutes.`;
  return (
    <Panel title={title} sub={`${fireName(zone.curve)}.${protectedWords}`}>
      <HeatingChart charts={charts} criticalC={limit} fireName={fireName(zone.curve)} />
    </Panel>
  );
}

/** Section, resistance and heating, side by side; where no resistance can be drawn, its words stand over a wider heating. */
export function MemberDrawings({ sheet }: { sheet: MemberSheetDto }) {
  if (!sheet.charts?.resistance.length) return <div className="mt-drawings mt-drawings-two"><SectionPanel sheet={sheet} /><div className="mt-stack"><ResistancePanel sheet={sheet} /><HeatingPanel sheet={sheet} /></div></div>;
  return <div className="mt-drawings"><SectionPanel sheet={sheet} /><ResistancePanel sheet={sheet} /><HeatingPanel sheet={sheet} /></div>;
}
