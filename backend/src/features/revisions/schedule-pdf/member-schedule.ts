import { exposureNames, formatLength, formatLimitTemperature, formatNumber, formatPeriod, formatThickness, memberSentence, memberTypeNames, wayNames } from '@mantlet/common';
import type { ScheduleSnapshot, SnapshotMember } from '@mantlet/common';
import type { Content } from 'pdfmake/interfaces.js';
import { day, heading, paragraph, schedule, subheading } from './layout.js';
import { zonesByLevel } from './zones-and-systems.js';

const exposureInWords = ({ exposure, protectionForm }: SnapshotMember): string => {
  const faces = exposure.arrangement === 'given-faces' ? `Faces: ${(exposure.faces ?? []).join(', ')}` : exposureNames[exposure.arrangement];
  // one line where it can be: a slab on top is what three sides mean
  const short = exposure.arrangement === 'three-sides' ? 'Three sides' : faces;
  return protectionForm === 'boxed' ? `${short}, boxed` : short;
};

/** Where the critical temperature comes from: the way, what governs, its reference, and signatures under it. */
export function provenance(m: SnapshotMember): string {
  const { result, basis } = m;
  const calculated = basis.way === 'calculated';
  const parts: string[] = [calculated ? 'Calculated' : wayNames[basis.way]];
  if (result?.governing) parts[0] += `, ${result.governing}`;
  if (result?.utilisation != null) parts[0] += ` ${formatNumber(result.utilisation, 2)}`;
  // what every calculated member shares stands once, above the table
  const unusual = calculated ? result?.method !== 'limit states of EN 1993-1-2' : basis.way !== 'declared' && basis.way !== 'assumed';
  if (result?.method && unusual) parts.push(result.method);
  if ('reference' in basis) parts.push(basis.reference);
  const accepted = m.acceptances.find((a) => a.stillHolds && a.kind === 'assumed');
  if (accepted) parts.push(`accepted by ${accepted.by}, ${day(accepted.at)}: ${accepted.reason}`);
  else if (result?.assumed) parts.push('accepted by nobody');
  const high = m.acceptances.find((a) => a.stillHolds && a.kind === 'high-temperature');
  if (high) parts.push(`high temperature accepted by ${high.by}, ${day(high.at)}: ${high.reason}`);
  return parts.join('; ');
}

function verdict(m: SnapshotMember, names: ReadonlyMap<string, string>): string {
  const { result } = m;
  const said = memberSentence({
    verdict: result?.verdict ?? null, reason: result?.reason ?? null, requiredThickness: result?.requiredThickness ?? null,
    // what the zone's policy gives stands in a column of its own
    appliedThickness: result?.requiredThickness ?? null, thicknessUnit: result?.thicknessUnit ?? null,
    productName: (result?.productId && names.get(result.productId)) || null,
  });
  if (result?.verdict !== 'bare') return said;
  const signed = m.acceptances.find((a) => a.stillHolds && a.kind === 'bare');
  return signed ? `${said}: ${signed.reason} (${signed.by}, ${day(signed.at)})` : said;
}

function applied({ result }: SnapshotMember): string {
  if (result?.verdict !== 'protected' || result.appliedThickness === null || result.thicknessUnit === null) return '–';
  const layers = result.layers && result.layers.length > 1 ? `\n(${result.layers.join(' + ')})` : '';
  return formatThickness(result.appliedThickness, result.thicknessUnit) + layers;
}

/** Every member, by level and zone. */
export function memberSchedule(snapshot: ScheduleSnapshot): Content[] {
  const names = new Map(snapshot.products.map((p) => [p.id, p.name]));
  const byZone = new Map<string, SnapshotMember[]>(snapshot.zones.map((zone) => [zone.id, []]));
  for (const m of snapshot.members) byZone.get(m.zoneId)?.push(m);
  const columns = [
    { head: 'Mark', width: 46, value: (m: SnapshotMember) => m.mark },
    { head: 'Type', width: 44, value: (m: SnapshotMember) => memberTypeNames[m.memberType] },
    { head: 'Section, grade', width: 88, value: (m: SnapshotMember) => `${m.section}, ${m.grade}` },
    { head: 'No.', width: 20, right: true, value: (m: SnapshotMember) => formatNumber(m.quantity) },
    { head: 'Length', width: 42, right: true, value: (m: SnapshotMember) => formatLength(m.lengthMm) },
    { head: 'Exposure', width: 62, value: exposureInWords },
    { head: 'A/V', width: 24, right: true, value: (m: SnapshotMember) => formatNumber(m.result?.sectionFactorPerM) },
    { head: 'θ_cr', width: 34, right: true, value: (m: SnapshotMember) => formatLimitTemperature(m.result?.criticalTemperatureC) },
    { head: 'θ_cr comes from', width: '*' as const, value: provenance },
    { head: 'Apply', width: 44, right: true, value: applied },
    { head: 'Verdict', width: 104, value: (m: SnapshotMember) => verdict(m, names) },
  ];
  return [
    heading('4  Member schedule', { pageBreak: 'before' }),
    paragraph('By level and zone. Three sides: the slab covers the top. A/V in 1/m, shown to 1 1/m and read unrounded; θ_cr is rounded down, thickness up. "Calculated": the limit states of EN 1993-1-2, the governing one with its degree of utilisation at the start of the fire. Board and spray in mm; coatings as dry film in mm. "Apply" is what the zone\'s policy gives the member: never less than it needs.'),
    ...zonesByLevel(snapshot).flatMap(({ level, zones }) => zones.flatMap((zone): Content[] => {
      const members = byZone.get(zone.id) ?? [];
      const title = `Level ${level.code} ${level.name} · Zone ${zone.code} ${zone.name} · ${formatPeriod(zone.periodMin)}`;
      return members.length === 0 ? [subheading(title), paragraph('No members.')] : [schedule(columns, members, { title })];
    })),
  ];
}
