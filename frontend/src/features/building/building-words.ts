import type { BuildingDto, BuildingLevelDto, BuildingZoneDto, IssuedBuildingDto, IssuedZoneDto } from '@mantlet/common';
import { count, countWord, formatDate, formatNumber } from '../../lib/format.js';
import type { Keynote } from './keynotes.js';

export interface Words { heading: string; sub: string }

/** How many lines of the list are the reader's: "One line waits on you." */
function waitingWords(keynotes: readonly Keynote[], settled: number): string {
  const mine = keynotes.filter((k) => k.mine).length;
  if (keynotes.length === 0) return '';
  // before the first member is settled the first steps say whose turn it is, which is not in the list
  if (mine === 0) return settled === 0 ? '' : ' Nothing waits on you.';
  return mine === 1 ? ' One line waits on you.' : ` ${countWord(mine)} lines wait on you.`;
}

export function buildingWords({ members, settled, open, unassessed, levels, openItems }: BuildingDto, keynotes: readonly Keynote[] = []): Words {
  if (levels.length === 0) return { heading: 'No levels yet', sub: 'The building is drawn from its levels and zones.' };
  if (members === 0) return { heading: 'No members yet', sub: 'The levels are there; the member schedule is not.' };
  const old = openItems.find((item) => item.code === 'stale');
  if (old) {
    return {
      heading: old.count === 0 ? 'The zones’ targets are out of date' : `${formatNumber(old.count)} of ${formatNumber(members)} results ${old.count === 1 ? 'is' : 'are'} out of date`,
      sub: `They rest on other inputs than there are now, or on an earlier edition of the calculation; the drawing shows them as they were.${waitingWords(keynotes, settled)}`,
    };
  }
  if (open === 0 && settled === members) return { heading: `All ${formatNumber(members)} members settled`, sub: 'Nothing is open; the schedule can be prepared.' };
  if (unassessed > 0) {
    return {
      heading: `${formatNumber(settled)} of ${formatNumber(members)} members settled, ${formatNumber(unassessed)} being recalculated`,
      sub: `The new results come zone by zone; what is open is known when all are there.${waitingWords(keynotes, settled)}`,
    };
  }
  const rest = open === 0 ? 'No member is open.' : `${countWord(open)} ${open === 1 ? 'is' : 'are'} open; the schedule can be prepared when ${open === 1 ? 'it is' : 'they are'} closed.`;
  return { heading: `${formatNumber(settled)} of ${formatNumber(members)} members settled`, sub: rest + waitingWords(keynotes, settled) };
}

export function issuedWords({ revision, protectedMembers, bareMembers, protectedAreaM2 }: IssuedBuildingDto): Words {
  if (!revision) return { heading: 'Nothing has been issued yet', sub: 'The building appears here with the first issued revision of the schedule.' };
  const bare = bareMembers === 0 ? '' : `; ${formatNumber(bareMembers)} ${bareMembers === 1 ? 'stays' : 'stay'} bare`;
  return {
    heading: `${revision.code}: ${count(protectedMembers, 'member')} to protect, ${formatNumber(protectedAreaM2)} m²${bare}`,
    sub: `As issued on ${formatDate(revision.issuedAt)}. Later changes are not in it until the next revision is issued.`,
  };
}

type Place = Pick<BuildingLevelDto, 'code'>;
export const sayZone = (zone: BuildingZoneDto, level: Place): string =>
  `Zone ${zone.code} ${zone.name}, level ${level.code}: R ${zone.periodMin}, ${zone.unassessed ? 'being recalculated' : `${formatNumber(zone.protectedAreaM2)} m² protected`}, ` +
  `${zone.settled} of ${zone.members} members settled, ${zone.open} open, ${zone.issuedMembers} issued`;
export const sayIssued = (zone: IssuedZoneDto, level: Place): string =>
  `Zone ${zone.code} ${zone.name}, level ${level.code}: R ${zone.periodMin}, ${formatNumber(zone.protectedAreaM2)} m² to protect, ` +
  `${zone.protectedMembers} of ${zone.members} members protected, ${zone.bareMembers} ${zone.bareMembers === 1 ? 'stays' : 'stay'} bare`;
