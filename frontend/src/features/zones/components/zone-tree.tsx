import { Button } from 'antd';
import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { fireCurveNames, memberTypeNames } from '@mantlet/common';
import type { LevelDto, PolicyMaterialDto, TargetPolicy, ZoneDto, ZoneTargetDto } from '@mantlet/common';
import { count, formatLevel, formatNumber, joinWords } from '../../../lib/format.js';
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

/** The fire curve that all zones share, or null. */
export const commonCurve = (zones: readonly Pick<ZoneDto, 'curve'>[]) => {
  const kinds = new Set(zones.map((z) => z.curve.kind));
  return kinds.size === 1 ? [...kinds][0] ?? null : null;
};

interface SystemLine { productId: string; product: string; types: string; target: ZoneTargetDto | undefined }
/** One line a product, so that the materials beside it stand on the product's own line. */
export function systemLines(zone: ZoneDto): SystemLine[] {
  const lines = new Map<string, { product: string; types: string[] }>();
  for (const s of zone.systems) {
    const line = lines.get(s.productId) ?? { product: s.productName, types: [] };
    line.types.push(memberTypeNames[s.memberType].toLowerCase());
    lines.set(s.productId, line);
  }
  return [...lines].map(([productId, { product, types }]) => ({ productId, product, types: joinWords(types), target: zone.targets.find((t) => t.productId === productId) }));
}

function Systems({ zone }: { zone: ZoneDto }) {
  const lines = systemLines(zone);
  if (lines.length === 0) return <StatusWord kind="attention">No system yet</StatusWord>;
  return <>{lines.map((l) => <div key={l.productId} className="mt-line" title={`${l.product}: ${l.types}`}>{l.product}</div>)}</>;
}

/** What policies are compared by: sheet area counts layers, so that one thick board would look cheaper than two thin ones; volume does not. */
export function inPlace(material: PolicyMaterialDto | undefined): { value: number | null; unit: string; decimals: number } {
  if (material?.materialUnit === 'm²' && material.volumeM3 != null) return { value: material.volumeM3, unit: 'm³', decimals: 2 };
  return { value: material?.material ?? null, unit: material?.materialUnit ?? '', decimals: material?.materialUnit === 'm³' ? 2 : 0 };
}

/** What a policy would take of each product; bold where chosen. */
function Materials({ zone, policy }: { zone: ZoneDto; policy: TargetPolicy['policy'] }) {
  const chosen = zone.targetPolicy.policy === policy;
  return (
    <div className={chosen ? 'mt-strong' : 'mt-sub'}>
      {systemLines(zone).map(({ productId, product, target }) => {
        const material = target?.policies.find((p) => p.policy === policy);
        return (
          <div key={productId} className="mt-line">
            <Quantity {...inPlace(material)} what={product} reason={target ? 'not determined' : 'no member needs it'} />
          </div>
        );
      })}
      {chosen && <span className="mt-sr">chosen</span>}
    </div>
  );
}

/** On a phone a zone is its name and these lines; its materials stand where it unfolds. */
function FoldedZone({ zone }: { zone: ZoneDto }) {
  const systems = systemLines(zone).map((l) => l.product);
  return (
    <div className="mt-fold-only mt-sub">
      <div><span className="mt-strong mt-ink">R {zone.periodMin}</span> {fireCurveNames[zone.curve.kind]}, {zone.environment}, {count(zone.members, 'member')}{zone.open > 0 && <>, <span className="mt-attention mt-nowrap">{zone.open} open</span></>}</div>
      <div>{systems.length ? joinWords(systems) : <span className="mt-attention">No system yet</span>}</div>
    </div>
  );
}

/** the columns before the last, which a level's name runs across */
const zoneColumns = 9;
const zoneOnly = (render: (zone: ZoneDto) => ReactNode) => (_: unknown, row: ZoneRow) => (row.kind === 'zone' ? render(row.zone) : null);

function useColumns(actions: ZoneTreeActions, projectId: string, /** said once above the table */ sameCurve: boolean): ScheduleColumn<ZoneRow>[] {
  const may = useMay();
  const fire = may('edit-zones');
  const specifier = may('edit-protection');
  const columns: ScheduleColumn<ZoneRow>[] = [
    {
      title: 'Level and zone', term: 'zone', key: 'name', foldLabel: '', width: 190, className: 'mt-fold-head',
      onCell: (row) => (row.kind === 'level' ? { colSpan: zoneColumns } : {}),
      render: (_, row) => row.kind === 'level'
        ? <span>{row.level.code} {row.level.name} <span className="mt-unit mt-level-facts">{formatLevel(row.level.elevationM)} m, {formatNumber(row.level.heightM, 2)} m high</span></span>
        : <div className="mt-tree-1"><Link to={`/projects/${projectId}/members?zoneIds=${row.zone.id}`}>{row.zone.code} {row.zone.name}</Link><FoldedZone zone={row.zone} /></div>,
    },
    { title: 'Period', term: 'period', key: 'period', width: sameCurve ? 68 : 112, className: 'mt-fold-hide', render: zoneOnly((z) => <><span className="mt-strong">R {z.periodMin}</span>{!sameCurve && <div className="mt-sub">{fireCurveNames[z.curve.kind]}</div>}</>) },
    { title: 'Environment', term: 'environment', key: 'environment', width: 96, className: 'mt-fold-hide', render: zoneOnly((z) => z.environment) },
    { title: 'Systems', term: 'system', key: 'systems', className: 'mt-fold-hide', render: zoneOnly((z) => <Systems zone={z} />) },
    { title: 'Target', term: 'target-policy', key: 'target', width: 112, className: 'mt-fold-hide', render: zoneOnly((z) => targetPolicyName(z.targetPolicy)) },
    { title: 'Each its own', key: 'own', numeric: true, width: 92, className: 'mt-fold-hide', render: zoneOnly((z) => <Materials zone={z} policy="own" />) },
    { title: 'Bands', term: 'band', key: 'bands', numeric: true, width: 92, className: 'mt-fold-hide', render: zoneOnly((z) => <Materials zone={z} policy="bands" />) },
    { title: 'One for all', key: 'one', numeric: true, width: 92, className: 'mt-fold-hide', render: zoneOnly((z) => <Materials zone={z} policy="one" />) },
    {
      title: 'Members', key: 'members', numeric: true, width: 76, className: 'mt-fold-hide',
      render: zoneOnly((z) => <><Quantity value={z.members} what="Members" />{z.open > 0 && <div className="mt-attention">{z.open} open</div>}</>),
    },
  ];
  for (const column of columns.slice(1)) column.onCell = (row) => (row.kind === 'level' ? { colSpan: 0 } : {});
  if (fire || specifier) {
    columns.push({
      title: <span className="mt-sr">Change</span>, key: 'change', foldLabel: '', className: 'mt-noprint mt-zone-change', align: 'right', width: fire && specifier ? 166 : fire ? 150 : 110,
      render: (_, row) => row.kind === 'level'
        ? fire && <span className="mt-row-actions"><Button size="small" onClick={() => actions.editLevel(row.level)} aria-label={`Edit level ${row.level.code}`}>Edit</Button><Button size="small" onClick={() => actions.addZone(row.level)} aria-label={`Add zone on ${row.level.code}`}>Add zone</Button></span>
        : <span className="mt-row-actions">
          {fire && <Button size="small" onClick={() => actions.editZone(row.zone)} aria-label={`Edit zone ${row.zone.code}`}>Edit</Button>}
          {specifier && <Button size="small" onClick={() => actions.editProtection(row.zone)} aria-label={`Protection of zone ${row.zone.code}`}>Protection</Button>}
        </span>,
    });
  }
  return columns;
}

/** What the columns take and room for the name of a system; narrower, the table scrolls sideways. */
const treeWidth = 1160;

interface ZoneTreeProps { rows: ZoneRow[]; projectId: string; openZones: string[]; onOpenZones: (ids: string[]) => void; actions: ZoneTreeActions; marked: string | null }
const keyOf = (row: ZoneRow) => (row.kind === 'zone' ? row.zone.id : row.level.id);

/** Levels and zones in one table; a zone unfolds to its target protection. */
export function ZoneTree({ rows, projectId, openZones, onOpenZones, actions, marked }: ZoneTreeProps) {
  const columns = useColumns(actions, projectId, commonCurve(rows.flatMap((r) => (r.kind === 'zone' ? [r.zone] : []))) !== null);
  return (
    <ScheduleTable<ZoneRow>
      caption="Levels and zones" minWidth={treeWidth} columns={columns} rows={rows} rowKey={keyOf} className="mt-zones"
      rowClassName={(row) => (row.kind === 'level' ? 'mt-row-group' : row.zone.id === marked ? 'mt-row-marked' : '')}
      onRow={(row) => ({ id: `row-${keyOf(row)}` })}
      expandable={{
        columnTitle: <span className="mt-sr">Target protection</span>,
        expandedRowKeys: openZones,
        onExpandedRowsChange: (keys) => onOpenZones(keys.map(String)),
        rowExpandable: (row) => row.kind === 'zone',
        expandedRowRender: (row) => (row.kind === 'zone' ? <TargetDetail zone={row.zone} projectId={projectId} /> : null),
        expandIcon: ({ expanded, expandable, onExpand, record }) => expandable && record.kind === 'zone'
          ? <button type="button" className="mt-unfold" aria-expanded={expanded} aria-label={`Target of ${record.zone.code}`} title="Target protection and where the period comes from" onClick={(e) => onExpand(record, e)}>{expanded ? '−' : '+'}</button>
          : null,
      }}
    />
  );
}
