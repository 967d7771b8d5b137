import { Radio } from 'antd';
import { useMemo, useState } from 'react';
import type { ReactNode } from 'react';
import type { MemberSheetDto } from '@mantlet/common';
import { formatForce, formatLimitTemperature, formatMoment, formatSectionFactor, formatThickness } from '@mantlet/common';
import { formatNumber, keepUnits } from '../../../lib/format.js';
import type { TermName } from '../../../lib/terms.js';
import { SectionDrawing } from '../../../ui/drawing/section-drawing.js';
import { shapeDetails } from '../../../ui/drawing/shape-preview.js';
import { SteelReading } from '../../../ui/drawing/steel-reading.js';
import { Panel } from '../../../ui/panel.js';
import { Term } from '../../../ui/term.js';
import { drawnStates, heatingCaption, loadCaption, loadSide, readingData } from '../reading.js';
import type { Caption } from '../reading.js';

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

function Words({ caption: { title, sub }, children }: { caption: Caption; children?: ReactNode }) {
  return <div className="mt-reading-words"><h2>{title}</h2><p className="mt-sub">{sub}</p>{children}</div>;
}

/** What is to be put on; nothing where nothing is determined or the steel stays bare. */
function protectionOf({ result, productName }: MemberSheetDto) {
  const thickness = result?.appliedThickness ?? result?.requiredThickness ?? null;
  return result?.verdict === 'protected' && thickness !== null ? { name: productName ?? 'protection', thickness, unit: result.thicknessUnit ?? 'mm' } : undefined;
}

function Section({ sheet }: { sheet: MemberSheetDto }) {
  const { outline, section, member } = sheet;
  return (
    <div className="mt-sheet-section">
      <h2>{section.designation}</h2>
      {outline
        ? <SectionDrawing outline={outline} name={section.designation} exposure={member.exposure} details={shapeDetails(section.shape)} protection={protectionOf(sheet)} />
        : <p className="mt-sub">Not drawn: the section and its exposure do not go together.</p>}
    </div>
  );
}

function Reading({ sheet }: { sheet: MemberSheetDto }) {
  const [chosen, choose] = useState<string | null>(null);
  const states = drawnStates(sheet);
  const data = useMemo(() => (sheet.charts ? readingData({ ...sheet, charts: sheet.charts }, chosen) : null), [sheet, chosen]);
  const options = [...states.map((s) => ({ value: s.limitState, label: capital(s.limitState) })), { value: 'all', label: 'All' }];
  return (
    <div className="mt-sheet-reading">
      <div className="mt-reading-head">
        <Words caption={loadCaption(sheet)}>
          {states.length > 1 && <Radio.Group aria-label="Limit state drawn" size="small" optionType="button" value={chosen ?? states[0]?.limitState} onChange={(e) => choose(e.target.value as string)} options={options} className="mt-noprint" />}
        </Words>
        <Words caption={heatingCaption(sheet)} />
      </div>
      {data && <SteelReading key={chosen ?? ''} data={data} />}
    </div>
  );
}

interface Answer { term: TermName; name: string; value: string; more: string; open?: boolean }
const missing = 'not determined';

function effectAnswer(sheet: MemberSheetDto): Answer {
  const [state] = drawnStates(sheet);
  if (state?.unit === '') {
    const used = state.points[0]?.[1] ? 1 / state.points[0][1] : null;
    return { term: 'utilisation', name: 'Utilisation in fire', value: used === null ? missing : formatNumber(used, 2), more: `${state.limitState}, cold`, open: used !== null && used > 1 };
  }
  if (state) {
    const format = state.unit === 'kNm' ? formatMoment : formatForce;
    const cold = state.points[0]?.[1] ?? null;
    return { term: 'actions', name: 'Effect in fire', value: format(state.effect), more: cold === null ? state.limitState : `${state.limitState}; ${format(cold)} resisted cold`, open: cold !== null && cold < state.effect };
  }
  const side = loadSide(sheet, null);
  const mu = sheet.result?.utilisation ?? side?.effect ?? null;
  if (mu !== null) return { term: 'utilisation', name: 'Utilisation in fire', value: formatNumber(mu, 2), more: 'of the cold resistance', open: mu > 1 };
  return { term: 'actions', name: 'Effect in fire', value: 'not given', more: sheet.result?.criticalTemperatureC == null ? 'nothing to compare' : 'the temperature does not need it' };
}

/** Load, temperature, heating, thickness: the line that the drawing above it is read for. */
function answers(sheet: MemberSheetDto): Answer[] {
  const { result } = sheet;
  const unit = result?.thicknessUnit ?? 'mm';
  const [needs, gets] = [formatThickness(result?.requiredThickness, unit), formatThickness(result?.appliedThickness, unit)];
  const bare = result?.verdict === 'bare';
  return [
    effectAnswer(sheet),
    { term: 'critical-temperature', name: 'Critical temperature', value: result?.criticalTemperatureC == null ? missing : formatLimitTemperature(result.criticalTemperatureC), more: result?.assumed ? 'assumed, not accepted' : result?.method ?? '', open: result?.criticalTemperatureC == null || result.assumed },
    { term: 'section-factor', name: 'Section factor', value: result?.sectionFactorPerM == null ? missing : formatSectionFactor(result.sectionFactorPerM).replace('1/m', 'm⁻¹'), more: result?.heatedPerimeterMm == null ? '' : `heated girth ${formatNumber(result.heatedPerimeterMm)} mm`, open: result?.sectionFactorPerM == null },
    bare ? { term: 'bare', name: 'Thickness', value: 'none', more: 'may stay bare' }
      : { term: 'required-thickness', name: 'Thickness', value: result?.requiredThickness == null ? missing : needs, more: result?.requiredThickness == null ? (result?.verdict === 'outside' ? 'outside the assessment' : '') : `${sheet.productName ?? ''}${result.appliedThickness !== null && gets !== needs ? `; its zone gives ${gets}` : ''}`, open: result?.requiredThickness == null },
  ];
}

function Answers({ sheet }: { sheet: MemberSheetDto }) {
  return (
    <dl className="mt-answers">
      {answers(sheet).map(({ term, name, value, more, open }) => (
        <div key={name}>
          <dt><Term name={term}>{name}</Term></dt>
          <dd><span className={`mt-answer ${open ? 'mt-attention' : ''}`}>{keepUnits(value)}</span>{more && <span className="mt-sub">{more}</span>}</dd>
        </div>
      ))}
    </dl>
  );
}

/** One sheet: the section, then load against temperature against time, and under them the four answers they give. */
export function MemberDrawing({ sheet }: { sheet: MemberSheetDto }) {
  return (
    <Panel flush label="Drawing" className="mt-sheet">
      <div className="mt-sheet-drawings">
        <Section sheet={sheet} />
        <Reading sheet={sheet} />
      </div>
      <Answers sheet={sheet} />
    </Panel>
  );
}
