import { Button } from 'antd';
import type { ReactNode } from 'react';
import type { AcceptanceDto, MemberSheetDto } from '@mantlet/common';
import { exposureNames, formatArea, formatLimitTemperature, formatMinutes, formatSectionFactor, formatTemperature, formatThickness, memberTypeNames, wayNames } from '@mantlet/common';
import { count, formatDate, formatNumber } from '../../../lib/format.js';
import type { TermName } from '../../../lib/terms.js';
import { Panel } from '../../../ui/panel.js';
import { StatusWord } from '../../../ui/status-word.js';
import { Term } from '../../../ui/term.js';
import { useMay } from '../../projects/project-context.js';
import { useWithdrawAcceptance } from '../api/members.js';
import { FailedSave } from '../../../ui/form/failed-save.js';
import { acceptanceNames } from '../member-words.js';
import { bareAtEnd } from '../reading.js';

const missing = 'not determined';
const orMissing = (text: string) => (text === '–' ? missing : text);

/** Unprotected under a slab, κ1 is another than protected: the temperature it must hold is then said as well. */
function bareWords(result: MemberSheetDto['result']): string {
  if (result?.criticalTemperatureC == null) return missing;
  if (result.bareMinutes === null) return 'longer than 240 min';
  const { bareCriticalTemperatureC: bare, criticalTemperatureC: critical } = result;
  const apart = bare !== null && bare !== critical ? `, then at ${formatLimitTemperature(bare)} (κ1 of an unprotected beam)` : '';
  return `${formatMinutes(Math.floor(result.bareMinutes))}${apart}`;
}

type Fact = [name: string, value: ReactNode, term?: TermName];
const layersInWords = (layers: readonly number[] | null): string => (layers && layers.length > 1 ? ` in layers of ${layers.join(' + ')} mm` : '');

function facts(sheet: MemberSheetDto): Fact[] {
  const { member, section, result, areaM2, productName } = sheet;
  const girth = (value: number | null | undefined) => (value == null ? missing : `${formatNumber(value)} mm`);
  return [
    ['Type', memberTypeNames[member.memberType]],
    ['Section', `${section.designation}, ${member.grade}, ${formatNumber(section.properties.massKgPerM, 1)} kg/m`],
    ['Length', `${formatNumber(member.lengthMm)} mm, ${member.quantity} off`],
    ['Exposure', `${exposureNames[member.exposure.arrangement]}${member.exposure.faces?.length ? ` (${member.exposure.faces.join(', ')})` : ''}${member.exposure.reason ? `: ${member.exposure.reason}` : ''}`, 'exposure'],
    ['Protection', `${productName ?? 'No system set for its type in this zone'}, ${member.protectionForm === 'boxed' ? 'boxed' : 'following the profile'}, ${member.onSite ? 'on site' : 'in the shop'}`, 'system'],
    ['Section factor', orMissing(formatSectionFactor(result?.sectionFactorPerM)).replace('1/m', 'm⁻¹'), 'section-factor'],
    ['Heated girth', girth(result?.heatedPerimeterMm), 'heated-girth'],
    ['Coated girth', girth(result?.coatedGirthMm), 'coated-girth'],
    ['Area to protect', result?.verdict === 'bare' ? 'none' : orMissing(formatArea(areaM2)), 'net-area'],
    ['How the temperature comes about', `${wayNames[member.basis.way]}${result?.method && result.method.toLowerCase() !== wayNames[member.basis.way].toLowerCase() ? `: ${result.method}` : ''}`, member.basis.way === 'declared' ? 'declared' : result?.assumed ? 'assumed' : 'critical-temperature'],
    ['Utilisation in fire', result?.utilisation == null ? 'not calculated' : formatNumber(result.utilisation, 2), 'utilisation'],
    [`Bare steel at ${sheet.zone.periodMin} min`, orMissing(formatTemperature(bareAtEnd(sheet)))],
    ['Bare steel holds', bareWords(result)],
    ['Needs', result?.verdict === 'bare' ? 'no protection' : result?.requiredThickness == null ? missing : formatThickness(result.requiredThickness, result.thicknessUnit ?? 'mm'), 'required-thickness'],
    ...(result?.appliedThickness == null ? [] : [['Gets with its zone', `${formatThickness(result.appliedThickness, result.thicknessUnit ?? 'mm')}${layersInWords(result.layers)}`, 'target'] as Fact]),
    ...(result?.evidenceReading ? [['Read in the evidence at', result.evidenceReading, 'evidence'] as Fact] : []),
    ...(member.coatBackConnections > 0 ? [['Coat-back', `${count(member.coatBackConnections, 'connection')}, girth ${formatNumber(member.coatBackGirthMm)} mm`, 'coat-back'] as Fact] : []),
    ...(member.deductionM2 > 0 ? [['Deduction', formatArea(member.deductionM2, 2), 'deduction'] as Fact] : []),
    ...(member.note ? [['Note', member.note] as Fact] : []),
  ];
}

export function MemberFacts({ sheet }: { sheet: MemberSheetDto }) {
  return <Panel title="Facts"><dl className="mt-facts">{facts(sheet).map(([name, value, term]) => <div key={name} style={{ display: 'contents' }}><dt>{term ? <Term name={term}>{name}</Term> : name}</dt><dd>{value}</dd></div>)}</dl></Panel>;
}

/** Who accepted what, and whether it still holds. */
export function Acceptances({ projectId, memberId, acceptances }: { projectId: string; memberId: string; acceptances: readonly AcceptanceDto[] }) {
  const may = useMay();
  const withdraw = useWithdrawAcceptance(projectId);
  if (acceptances.length === 0) return null;
  return (
    <Panel title="Accepted">
      <FailedSave error={withdraw.error} />
      <ul className="mt-history">
        {acceptances.map((a) => (
          <li key={`${a.kind} ${a.at}`}>
            <StatusWord kind={a.stillHolds ? 'settled' : 'attention'}>{acceptanceNames[a.kind]}{a.valueC === null ? '' : `, ${formatLimitTemperature(a.valueC)}`}: {a.stillHolds ? 'holds' : 'lapsed, the value has changed'}</StatusWord>
            <span>{a.reason}</span>
            <span className="mt-sub">{a.by}, {formatDate(a.at)}</span>
            {may('accept-temperatures') && <div><Button size="small" loading={withdraw.isPending} onClick={() => withdraw.mutate({ memberIds: [memberId], kind: a.kind })}>Withdraw the acceptance</Button></div>}
          </li>
        ))}
      </ul>
    </Panel>
  );
}
