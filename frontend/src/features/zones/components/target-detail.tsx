import { Link } from 'react-router-dom';
import { fireCurveNames } from '@mantlet/common';
import type { PolicyMaterialDto, TargetPolicy, ZoneDto, ZoneTargetDto } from '@mantlet/common';
import { formatNumber } from '../../../lib/format.js';
import { Quantity } from '../../../ui/quantity.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';
import { StatusWord } from '../../../ui/status-word.js';
import { Term } from '../../../ui/term.js';

export const policyName = (policy: TargetPolicy['policy'], bands?: number): string =>
  policy === 'own' ? 'Each its own' : policy === 'one' ? 'One for all' : bands ? `${bands} ${bands === 1 ? 'band' : 'bands'}` : 'Bands';
export const targetPolicyName = (p: TargetPolicy): string => policyName(p.policy, p.policy === 'bands' ? p.bands : undefined);
/** Coatings are given in µm by their evidence and in mm where people read them. */
export const thicknessMm = (value: number, unit: 'µm' | 'mm'): string => (unit === 'µm' ? formatNumber(value / 1000, 2) : formatNumber(value, value % 1 ? 1 : 0));
const manyMm = (values: readonly number[], unit: 'µm' | 'mm') =>
  values.length > 6 ? `${thicknessMm(values[0] ?? 0, unit)} to ${thicknessMm(values[values.length - 1] ?? 0, unit)} mm, ${values.length} thicknesses` : `${values.map((v) => thicknessMm(v, unit)).join(', ')} mm`;

function Policy({ material, unit, chosen }: { material: PolicyMaterialDto | undefined; unit: 'µm' | 'mm'; chosen: boolean }) {
  if (!material) return <span className="mt-sub">–</span>;
  return (
    <div className={chosen ? 'mt-strong' : ''}>
      <Quantity value={material.material} unit={material.materialUnit === 'm²' ? 'm² of sheet' : material.materialUnit} decimals={1} what="Material" />
      {material.materialUnit === 'm²' && material.volumeM3 !== undefined && (
        <div className="mt-sub"><Quantity value={material.volumeM3} unit="m³" decimals={2} what="Board in place, all layers" /> in place</div>
      )}
      {material.thicknesses.length > 0 && <div className="mt-sub">{manyMm(material.thicknesses, unit)}</div>}
      {chosen && <StatusWord kind="settled">Chosen</StatusWord>}
    </div>
  );
}

/** The zone's fire, and where its period comes from. */
function Facts({ zone }: { zone: ZoneDto }) {
  return (
    <p className="mt-sub mt-zone-facts">
      R {zone.periodMin}, {fireCurveNames[zone.curve.kind].toLowerCase()}{zone.curve.kind === 'parametric' && <> (<Term name="opening-factor">opening factor</Term> {formatNumber(zone.curve.openingFactor, 3)})</>}.
      {' '}{zone.reference ? <>Period from: <span className="mt-ink">{zone.reference}</span></> : <span className="mt-attention">No reference says where the period comes from.</span>}
    </p>
  );
}

/** The target protection of a zone, one line a system, with the three policies' materials side by side. */
export function TargetDetail({ zone, projectId }: { zone: ZoneDto; projectId: string }) {
  const of = (t: ZoneTargetDto, policy: TargetPolicy['policy']) => t.policies.find((p) => p.policy === policy);
  const column = (policy: TargetPolicy['policy'], title: string) => ({
    title, key: policy, numeric: true,
    render: (_: unknown, t: ZoneTargetDto) => <Policy material={of(t, policy)} unit={t.thicknessUnit} chosen={zone.targetPolicy.policy === policy} />,
  });
  if (zone.targets.length === 0) {
    const why = zone.members === 0 ? 'No member belongs to this zone yet.' : 'No target yet: it is worked out once its members have a system and a critical temperature.';
    return <><Facts zone={zone} /><p className="mt-sub mt-zone-facts">{why}</p></>;
  }
  return (
    <>
      <Facts zone={zone} />
      <ScheduleTable<ZoneTargetDto>
        caption={`Target protection of ${zone.code} ${zone.name}`} rows={zone.targets} rowKey={(t) => t.productId} sticky={false} className="mt-inset"
        columns={[
          { title: 'System', key: 'system', width: 170, render: (_, t) => <Link to={`/projects/${projectId}/products/${t.productId}`}>{t.productName}</Link> },
          { title: 'Members', key: 'members', numeric: true, render: (_, t) => <Quantity value={t.members} /> },
          { title: 'Area m²', foldLabel: 'Area', key: 'area', numeric: true, render: (_, t) => <Quantity value={t.areaM2} decimals={1} unit="m²" bare /> },
          {
            title: 'Governing member', key: 'governing', term: 'governing-member',
            render: (_, t) => (t.governing ? <><Link to={`/projects/${projectId}/members/${t.governing.memberId}`}>{t.governing.mark}</Link> needs {thicknessMm(t.governing.requiredThickness, t.thicknessUnit)}{'\u00a0'}mm</> : 'None needs any'),
          },
          { title: 'Lowest θcr', term: 'critical-temperature', key: 'theta', numeric: true, render: (_, t) => <Quantity value={t.lowestCriticalTemperatureC === null ? null : Math.floor(t.lowestCriticalTemperatureC + 1e-6)} unit="°C" what="Lowest critical temperature" /> },
          { title: 'Highest A/V', term: 'section-factor', key: 'av', numeric: true, render: (_, t) => <Quantity value={t.highestSectionFactorPerM} unit="1/m" what="Highest section factor" /> },
          column('own', 'Each its own'), column('bands', zone.targetPolicy.policy === 'bands' ? targetPolicyName(zone.targetPolicy) : 'Bands'), column('one', 'One for all'),
        ]}
      />
    </>
  );
}
