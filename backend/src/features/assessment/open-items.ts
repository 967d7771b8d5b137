import { formatNumber, memberTypeNames, roles, sentence } from '@mantlet/common';
import type { MemberType, Message, OpenItemDto, Role, VerdictKind } from '@mantlet/common';

/** What the list needs to know of a member. */
export interface OpenMember {
  id: string;
  mark: string;
  memberType: MemberType;
  zoneId: string;
  zoneLabel: string;
  verdict: VerdictKind;
  reason: Message | null;
  assumed: boolean;
  governing: string | null;
  utilisation: number | null;
  criticalTemperatureC: number | null;
  /** above the project's limit, without a signature that holds */
  highUnsigned: boolean;
  /** left bare, without a signature that holds */
  bareUnsigned: boolean;
}

interface Finding {
  kind: OpenItemDto['kind'];
  code: string;
  role: Role;
  page: OpenItemDto['page'];
  say: (members: readonly OpenMember[]) => string;
}

/** ids listed with an item; `count` says how many there are */
export const LISTED_MEMBERS = 500;

const count = (n: number, one: string, many = `${one}s`): string => `${formatNumber(n)} ${n === 1 ? one : many}`;
const plainTypes: Record<MemberType, [string, string]> = {
  beam: ['beam', 'beams'], 'secondary-beam': ['secondary beam', 'secondary beams'], column: ['column', 'columns'], bracing: ['brace', 'braces'], tie: ['tie', 'ties'],
};
/** "3 beams" where all are of one type, "3 members" otherwise */
function counted(members: readonly OpenMember[]): string {
  const type = members[0]?.memberType;
  const names = type && members.every((m) => m.memberType === type) ? plainTypes[type] : (['member', 'members'] as const);
  return count(members.length, names[0], names[1]);
}
const first = (members: readonly OpenMember[]): OpenMember => members[0] as OpenMember;
const has = (members: readonly OpenMember[]): string => (members.length === 1 ? 'has' : 'have');

/** The reason without the verdict that leads it, and without its full stop. */
function bareReason(reason: Message | null): string {
  const text = reason ? sentence(reason) : 'no reason is stored';
  return text.replace(/^(Outside the assessment|Not determined|Under-strength cold): /, '').replace(/\.$/, '');
}

function sayOutside(members: readonly OpenMember[]): string {
  if (members.length === 1) return `${first(members).mark}: ${bareReason(first(members).reason)}, outside the assessment`;
  return `${counted(members)} are outside the assessment, among them ${first(members).mark}: ${bareReason(first(members).reason)}`;
}

function sayUndetermined(members: readonly OpenMember[]): string {
  const code = first(members).reason?.code;
  if (code === 'assessment.no-basis') return `${counted(members)} ${has(members)} neither actions nor a critical temperature`;
  if (code === 'assessment.no-actions') return `${counted(members)} ${has(members)} no actions`;
  const reason = bareReason(first(members).reason);
  if (members.length === 1) return `${first(members).mark} is not determined: ${reason}`;
  const same = members.every((m) => bareReason(m.reason) === reason);
  return `${counted(members)} are not determined${same ? `: ${reason}` : `, among them ${first(members).mark}: ${reason}`}`;
}

function sayUnderStrength(members: readonly OpenMember[]): string {
  const worst = members.reduce((a, b) => ((b.utilisation ?? 0) > (a.utilisation ?? 0) ? b : a));
  const of = worst.governing ? `its ${worst.governing} resistance` : 'its resistance';
  const at = worst.utilisation === null ? worst.mark : `${worst.mark} at ${worst.utilisation.toFixed(2)} of ${of}`;
  return members.length === 1 ? `1 ${plainTypes[worst.memberType][0]} fails cold: ${at}` : `${counted(members)} fail cold, the worst ${at}`;
}

/** Reasons that the specifier settles by another section, form or system; the structural engineer settles the others. */
const specifiersReasons = /^(product\.|section\.|assessment\.(no-system|form-mismatch|unknown-grade|too-thick-for-grade)$)/;

/** What of a member decides whether, and by whom, it must be settled. */
type Blocking = Pick<OpenMember, 'verdict' | 'memberType' | 'assumed'> & { reason: { code: string } | null };

export function blockerOf(m: Blocking): Finding | null {
  const page = 'members';
  if (m.verdict === 'under-strength') return { kind: 'blocker', code: 'under-strength', role: 'structural-engineer', page, say: sayUnderStrength };
  const code = m.reason?.code ?? 'unknown';
  if (m.verdict === 'outside') return { kind: 'blocker', code, role: 'specifier', page, say: sayOutside };
  if (m.verdict === 'not-determined') {
    if (code === 'assessment.no-system') {
      return { kind: 'blocker', code: `${code}.${m.memberType}`, role: 'specifier', page: 'zones', say: (all) => `No system is set for ${memberTypeNames[m.memberType].toLowerCase()} members (${formatNumber(all.length)})` };
    }
    return { kind: 'blocker', code, role: specifiersReasons.test(code) ? 'specifier' : 'structural-engineer', page, say: sayUndetermined };
  }
  if (!m.assumed) return null;
  return {
    kind: 'blocker', code: 'assumed', role: 'fire-engineer', page,
    say: (all) => `${counted(all)} ${all.length === 1 ? 'rests' : 'rest'} on an assumed temperature that nobody has accepted`,
  };
}

function warningsOf(m: OpenMember, limitC: number): Finding[] {
  const found: Finding[] = [];
  if (m.highUnsigned) {
    found.push({
      kind: 'warning', code: 'high-temperature', role: 'fire-engineer', page: 'members',
      say: (all) => `${counted(all)} ${has(all)} a critical temperature above ${formatNumber(limitC)} °C without a second signature`,
    });
  }
  if (m.bareUnsigned) {
    found.push({
      kind: 'warning', code: 'bare', role: 'fire-engineer', page: 'members',
      say: (all) => `${counted(all)} may stay bare; no reason is signed yet`,
    });
  }
  return found;
}

/** Members grouped by what is open about them and by zone: one sentence each, with who must act and where. */
export function itemsOfMembers(members: readonly OpenMember[], secondSignatureAboveC: number): OpenItemDto[] {
  const groups = new Map<string, { finding: Finding; members: OpenMember[] }>();
  for (const member of members) {
    const blocker = blockerOf(member);
    for (const finding of [...(blocker ? [blocker] : []), ...warningsOf(member, secondSignatureAboveC)]) {
      const key = `${finding.kind}|${finding.code}|${member.zoneId}`;
      const group = groups.get(key);
      if (group) group.members.push(member);
      else groups.set(key, { finding, members: [member] });
    }
  }
  return [...groups.values()].map(({ finding, members: all }) => ({
    role: finding.role, kind: finding.kind, code: finding.code, title: finding.say(all), zoneId: first(all).zoneId, zoneLabel: first(all).zoneLabel,
    memberIds: all.slice(0, LISTED_MEMBERS).map((m) => m.id), count: all.length, page: all.length === 1 && finding.page === 'members' ? 'member' : finding.page,
  }));
}

/** Blockers before warnings, then in the order in which people must act: actions come before what rests on them. */
export function inOrder(items: readonly OpenItemDto[]): OpenItemDto[] {
  const order: Role[] = ['structural-engineer', 'fire-engineer', 'specifier', ...roles];
  return items.map((item, i) => ({ item, i })).sort((a, b) =>
    Number(a.item.kind === 'warning') - Number(b.item.kind === 'warning') || order.indexOf(a.item.role) - order.indexOf(b.item.role) || a.i - b.i,
  ).map(({ item }) => item);
}
