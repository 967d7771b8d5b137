import { Button } from 'antd';
import { Link } from 'react-router-dom';
import { fireCurveNames, memberTypeNames } from '@mantlet/common';
import type { LevelDto, TargetPolicy, ZoneDto } from '@mantlet/common';
import { formatLevel, formatNumber, joinWords } from '../../../lib/format.js';
import { Quantity } from '../../../ui/quantity.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';
import type { ScheduleColumn } from '../../../ui/schedule-table.js';
import { StatusWord } from '../../../ui/status-word.js';
import { useMay } from '../../projects/project-context.js';
import { TargetDetail, targetPolicyName } from './target-detail.js';

export type ZoneRow = { kind: 'level'; level: LevelDto } | { kind: 'zone'; level: LevelDto; zone: ZoneDto };
export interface ZoneTreeActions { editLevel: (level: LevelDto) => void; addZone: (level: LevelDto) => void; editZone: (zone: ZoneDto) => void; editProtection: (zone: ZoneDto) => void }

/** Levels from the roof down, each followed by its zones by code: as the building stands. */
export function treeRows(levels: readonly LevelDto[], zones: readonly ZoneDto[]): ZoneRow[] {
  return [...levels].sort((a, b) => b.elevationM - a.elevationM).flatMap((level): ZoneRow[] => [
    { kind: 'level', level },
    ...zones.filter((z) => z.levelId === level.id).sort((a, b) => a.code.localeCompare(b.code, 'en', { numeric: true })).map((zone): ZoneRow => ({ kind: 'zone', level, zone })),
  ]);
}

/** "Beam, secondary beam: Harbour coat" — one line a product. */
function systemLines(zone: ZoneDto): { product: string; types: string }[] {
  const byProduct = new Map<string, string[]>();
  for (const s of zone.systems) byProduct.set(s.productName, [...(byProduct.get(s.productName) ?? []), memberTypeNames[s.memberType]]);
  return [...byProduct].map(([product, types]) => ({ product, types: joinWords(types.map((t, i) => (i ? t.toLowerCase() : t))) }));
}

function Systems({ zone }: { zone: ZoneDto }) {
  const lines = systemLines(zone);
  if (lines.length === 0) return <StatusWord kind="attention">No system yet</StatusWord>;
  return <>{lines.map((l) => <div key={l.product}>{l.product}<div className="mt-sub">{l.types}</div></div>)}</>;
}

/** What a policy would take, one line a unit of material; bold where chosen. */
function Materials({ zone, policy }: { zone: ZoneDto; policy: TargetPolicy['policy'] }) {
  const chosen = zone.targetPolicy.policy === policy;
  const lines = zone.targets.flatMap((t) => t.policies.filter((p) => p.policy === policy).map((p) => ({ id: t.productId, product: t.productName, ...p })));
  if (lines.length === 0) return <span aria-hidden="true">–</span>;
  return (
    <div className={chosen ? 'mt-strong' : 'mt-sub'}>
      {lines.map((l) => <div key={l.id}><Quantity value={l.material} unit={l.materialUnit} decimals={l.materialUnit === 'm³' ? 2 : 0} what={l.product} /></div>)}
      {chosen && <span className="mt-sr">chosen</span>}
    </div>
  );
}

const zoneOnly = (render: (zone: ZoneDto) => React.ReactNode) => (_: unknown, row: ZoneRow) => (row.kind === 'zone' ? render(row.zone) : null);

function useColumns(actions: ZoneTreeActions, projectId: string): ScheduleColumn<ZoneRow>[] {
  const may = useMay();
  const fire = may('edit-zones');
  const specifier = may('edit-protection');
  const columns: ScheduleColumn<ZoneRow>[] = [
    {
      title: 'Level and zone', key: 'name', foldLabel: '',
      render: (_, row) => row.kind === 'level'
        ? <span>{row.level.code} {row.level.name} <span className="mt-unit">{formatLevel(row.level.elevationM)} m, {formatNumber(row.level.heightM, 2)} m high</span></span>
        : <div className="mt-tree-1"><Link to={`/projects/${projectId}/members?zoneIds=${row.zone.id}`}>{row.zone.code} {row.zone.name}</Link></div>,
    },
    { title: 'Period', key: 'period', render: zoneOnly((z) => <><span className="mt-strong">R {z.periodMin}</span><div className="mt-sub">{fireCurveNames[z.curve.kind]}</div></>) },
    { title: 'Environment', key: 'environment', render: zoneOnly((z) => z.environment) },
    { title: 'Systems', key: 'systems', render: zoneOnly((z) => <Systems zone={z} />) },
    { title: 'Target', key: 'target', render: zoneOnly((z) => targetPolicyName(z.targetPolicy)) },
    { title: 'Each its own', key: 'own', numeric: true, render: zoneOnly((z) => <Materials zone={z} policy="own" />) },
    { title: 'Bands', key: 'bands', numeric: true, render: zoneOnly((z) => <Materials zone={z} policy="bands" />) },
    { title: 'One for all', key: 'one', numeric: true, render: zoneOnly((z) => <Materials zone={z} policy="one" />) },
    {
      title: 'Members', key: 'members', numeric: true,
      render: zoneOnly((z) => <><Quantity value={z.members} what="Members" />{z.open > 0 && <div className="mt-attention">{z.open} open</div>}</>),
    },
  ];
  if (fire || specifier) {
    columns.push({
      title: <span className="mt-sr">Change</span>, key: 'change', foldLabel: '', className: 'mt-noprint', align: 'right',
      render: (_, row) => row.kind === 'level'
        ? fire && <span className="mt-row-actions"><Button size="small" onClick={() => actions.editLevel(row.level)} aria-label={`Edit level ${row.level.code}`}>Edit</Button><Button size="small" onClick={() => actions.addZone(row.level)} aria-label={`Add a zone on ${row.level.code}`}>Add zone</Button></span>
        : <span className="mt-row-actions">
          {fire && <Button size="small" onClick={() => actions.editZone(row.zone)} aria-label={`Edit zone ${row.zone.code}`}>Edit</Button>}
          {specifier && <Button size="small" onClick={() => actions.editProtection(row.zone)} aria-label={`Protection of zone ${row.zone.code}`}>Protection</Button>}
        </span>,
    });
  }
  return columns;
}

interface ZoneTreeProps { rows: ZoneRow[]; projectId: string; openZones: string[]; onOpenZones: (ids: string[]) => void; actions: ZoneTreeActions; marked: string | null }
const keyOf = (row: ZoneRow) => (row.kind === 'zone' ? row.zone.id : row.level.id);

/** Levels and zones in one table; a zone unfolds to its target protection. */
export function ZoneTree({ rows, projectId, openZones, onOpenZones, actions, marked }: ZoneTreeProps) {
  const columns = useColumns(actions, projectId);
  return (
    <ScheduleTable<ZoneRow>
      caption="Levels and zones" columns={columns} rows={rows} rowKey={keyOf} className="mt-zones"
      rowClassName={(row) => (row.kind === 'level' ? 'mt-row-group' : row.zone.id === marked ? 'mt-row-marked' : '')}
      onRow={(row) => ({ id: `row-${keyOf(row)}` })}
      expandable={{
        expandedRowKeys: openZones,
        onExpandedRowsChange: (keys) => onOpenZones(keys.map(String)),
        rowExpandable: (row) => row.kind === 'zone' && row.zone.targets.length > 0,
        expandedRowRender: (row) => (row.kind === 'zone' ? <TargetDetail zone={row.zone} projectId={projectId} /> : null),
        expandIcon: ({ expanded, expandable, onExpand, record }) => expandable && record.kind === 'zone'
          ? <button type="button" className="mt-unfold" aria-expanded={expanded} aria-label={`Target of ${record.zone.code}`} title="Target protection" onClick={(e) => onExpand(record, e)}>{expanded ? '−' : '+'}</button>
          : null,
      }}
    />
  );
}
