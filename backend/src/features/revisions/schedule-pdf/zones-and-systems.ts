import { fireCurveNames, formatLimitTemperature, formatNumber, formatPeriod, formatThickness, memberTypeNames, memberTypes, productKindNames } from '@mantlet/common';
import type { ScheduleSnapshot, SnapshotProduct, SnapshotZone, TargetPolicy } from '@mantlet/common';
import type { Content } from 'pdfmake/interfaces.js';
import { facts, heading, paragraph, schedule, subheading } from './layout.js';

/** Zones in the order of their levels, from the ground up. */
export function zonesByLevel(snapshot: ScheduleSnapshot): { level: ScheduleSnapshot['levels'][number]; zones: SnapshotZone[] }[] {
  return snapshot.levels.map((level) => ({ level, zones: snapshot.zones.filter((zone) => zone.levelId === level.id) })).filter(({ zones }) => zones.length > 0);
}

function policyInWords(policy: TargetPolicy): string {
  if (policy.policy === 'own') return 'each member its own';
  return policy.policy === 'one' ? 'one thickness for all' : `at most ${policy.bands} bands`;
}

function curveInWords({ curve }: SnapshotZone): string {
  if (curve.kind !== 'parametric') return fireCurveNames[curve.kind];
  return `Parametric: O ${curve.openingFactor}, b ${curve.thermalAbsorptivity}, q_t,d ${curve.fireLoadTotalMjPerM2} MJ/m², t_lim ${curve.limitTimeMin} min`;
}

/** One system for all is said once; where they differ, each with what it is for. */
function systemsInWords({ systems }: SnapshotZone, names: ReadonlyMap<string, string>): string {
  const byProduct = new Map<string, string[]>();
  for (const { productId, memberType } of systems) {
    byProduct.set(productId, [...(byProduct.get(productId) ?? []), memberTypeNames[memberType].toLowerCase()]);
  }
  if (byProduct.size === 1 && systems.length === memberTypes.length) return `${names.get(systems[0]?.productId ?? '') ?? ''} throughout`;
  return [...byProduct].map(([productId, types]) => `${names.get(productId) ?? ''}: ${types.join(', ')}`).join('; ') || 'none';
}

export function zonesSection(snapshot: ScheduleSnapshot): Content[] {
  const levels = new Map(snapshot.levels.map((level) => [level.id, level]));
  const names = new Map(snapshot.products.map((p) => [p.id, p.name]));
  const targets = snapshot.zones.flatMap((zone) => zone.targets.map((target) => ({ zone, target })));
  return [
    heading('2  Zones: periods and targets'),
    schedule([
      { head: 'Level', width: 70, value: (z) => levels.get(z.levelId)?.code ?? '' },
      { head: 'Zone', width: 110, value: (z) => `${z.code} ${z.name}` },
      { head: 'Period', width: 38, value: (z) => formatPeriod(z.periodMin) },
      { head: 'Fire', width: 90, value: curveInWords },
      { head: 'Environment', width: 54, value: (z) => z.environment },
      { head: 'Systems', width: '*', value: (z) => systemsInWords(z, names) },
      { head: 'Thickness policy', width: 90, value: (z) => policyInWords(z.targetPolicy) },
      { head: 'Reference', width: 90, value: (z) => z.reference || '–' },
    ], snapshot.zones),
    schedule([
      { head: 'Zone', width: 110, value: ({ zone }) => `${zone.code} ${zone.name}` },
      { head: 'System', width: '*', value: ({ target }) => target.productName },
      { head: 'Period', width: 38, value: ({ zone }) => formatPeriod(zone.periodMin) },
      { head: 'Marks', width: 34, right: true, value: ({ target }) => formatNumber(target.members) },
      { head: 'Governed by', width: 70, value: ({ target }) => target.governing?.mark ?? '–' },
      { head: 'Lowest θ_cr', width: 54, right: true, value: ({ target }) => formatLimitTemperature(target.lowestCriticalTemperatureC) },
      { head: 'Highest A/V, 1/m', width: 66, right: true, value: ({ target }) => formatNumber(target.highestSectionFactorPerM) },
      { head: 'Thickness applied', width: 150, value: ({ zone, target }) => appliedInWords(zone, target) },
    ], targets, { title: 'Target protection level of each zone and system' }),
  ];
}

function appliedInWords(zone: SnapshotZone, target: SnapshotZone['targets'][number]): string {
  const chosen = target.policies.find((p) => p.policy === zone.targetPolicy.policy)?.thicknesses ?? [];
  if (chosen.length === 0) return '–';
  const say = (t: number | undefined): string => formatThickness(t, target.thicknessUnit);
  return chosen.length <= 4 ? chosen.map(say).join(', ') : `${say(chosen[0])} to ${say(chosen.at(-1))}, ${chosen.length} steps`;
}

const formWords: Record<SnapshotProduct['evidenceForm'], string> = {
  table: 'thickness tables', regression: 'regression coefficients', thermal: 'thermal properties',
};

function supplyFacts({ kind, supply }: SnapshotProduct): [string, string][] {
  const known = (value: number | null, unit: string): string => (value === null ? 'not given' : `${value} ${unit}`);
  if (kind === 'coating') {
    return [['Volume solids', known(supply.volumeSolidsPercent, '%')], ['Greatest dry film of one coat', known(supply.maxDftPerCoatUm, 'µm')],
      ['Container', known(supply.containerL, 'L')], ['Loss allowed for', `${formatNumber(supply.lossFraction * 100)} %`]];
  }
  if (kind === 'board') return [['Sheet', supply.sheetLengthMm && supply.sheetWidthMm ? `${supply.sheetLengthMm} × ${supply.sheetWidthMm} mm` : 'not given']];
  return [['Bag', known(supply.bagKg, 'kg')], ['Yield of a bag in place', known(supply.bagYieldM3, 'm³')], ['Loss allowed for', `${formatNumber(supply.lossFraction * 100)} %`]];
}

export function systemsSection({ products }: ScheduleSnapshot): Content[] {
  if (products.length === 0) return [heading('3  Systems and their evidence'), paragraph('No system is set.')];
  return products.map((p, i): Content => ({
    unbreakable: true,
    stack: [
      ...(i === 0 ? [heading('3  Systems and their evidence')] : []),
      subheading(`${p.name}${p.invented ? ' (invented for demonstration)' : ''}`),
      facts([
        ['Kind', productKindNames[p.kind]], ['Maker', p.maker],
        ['Evidence', p.evidenceReference], ['Edition', p.evidenceEdition], ['Valid until', p.evidenceExpiresOn], ['Assessed to', p.evidenceStandard],
        ['Form of the data', formWords[p.evidenceForm]], ['Fires covered', p.curves.map((c) => fireCurveNames[c]).join(', ')],
        ['Environments', p.environments.join(', ') || 'not stated'], ...supplyFacts(p),
        ['SHA-256 of the data used', p.evidenceSha256], ['SHA-256 of the report', p.evidenceFileSha256 ?? 'no report is stored'],
      ]),
    ],
  }));
}
