import { sumDecimals } from '@mantlet/common';
import type { IssuedBuildingDto, IssuedZoneDto, ScheduleSnapshot, SnapshotMember, SnapshotZone } from '@mantlet/common';

const netM2 = (lines: ScheduleSnapshot['quantities']['lines']): number => sumDecimals(lines.map((line) => line.netM2)).toNumber();

function zoneOf(zone: SnapshotZone, members: readonly SnapshotMember[], lines: ScheduleSnapshot['quantities']['lines']): IssuedZoneDto {
  const own = members.filter((m) => m.zoneId === zone.id);
  const having = (verdict: string) => own.filter((m) => m.result?.verdict === verdict).length;
  return {
    id: zone.id, code: zone.code, name: zone.name, periodMin: zone.periodMin, curve: zone.curve.kind,
    protectedAreaM2: netM2(lines.filter((line) => line.zoneId === zone.id)),
    members: own.length, protectedMembers: having('protected'), bareMembers: having('bare'),
  };
}

/** A frozen schedule as the building it is of. The totals are those of the zones. Pure. */
export function issuedBuildingOf({ levels, zones, members, quantities: { lines } }: ScheduleSnapshot): Omit<IssuedBuildingDto, 'revision'> {
  const drawn = levels.map(({ id, code, name, elevationM, heightM }) => ({
    id, code, name, elevationM, heightM, zones: zones.filter((zone) => zone.levelId === id).map((zone) => zoneOf(zone, members, lines)),
  }));
  const all = drawn.flatMap((level) => level.zones);
  const total = (of: (zone: IssuedZoneDto) => number) => all.reduce((sum, zone) => sum + of(zone), 0);
  return {
    members: total((z) => z.members), protectedMembers: total((z) => z.protectedMembers), bareMembers: total((z) => z.bareMembers),
    protectedAreaM2: netM2(lines), levels: drawn,
  };
}
