import type { AuditEntryDto } from '@mantlet/common';
import { count } from '../../../lib/format.js';

/** What one person did in one go: an import of 400 members is one line of the trail that unfolds, not 400. */
export type AuditGroup = AuditEntryDto[];
const oneGoMs = 60_000;

function belongs(group: AuditGroup, entry: AuditEntryDto): boolean {
  const first = group[0];
  if (!first) return false;
  return first.userName === entry.userName && first.action === entry.action && first.entity === entry.entity && first.why === entry.why
    && Math.abs(Date.parse(first.at) - Date.parse(entry.at)) < oneGoMs && group.every((e) => e.label !== entry.label);
}

/** Neighbours that tell of the same act on different things, in the order given. */
export function groupEntries(entries: readonly AuditEntryDto[]): AuditGroup[] {
  const groups: AuditGroup[] = [];
  for (const entry of entries) {
    const last = groups.at(-1);
    if (last && belongs(last, entry)) last.push(entry);
    else groups.push([entry]);
  }
  return groups;
}

/** "Member imported", or "Zone changed"; what it was done to is named where the act does not name it. */
export function actInWords({ action, entity }: Pick<AuditEntryDto, 'action' | 'entity'>, many = false): string {
  const act = action.charAt(0).toUpperCase() + action.slice(1);
  return many || action.includes(entity) || entity === 'membership' || entity === 'import' ? act : `${act}: ${entity}`;
}

/** "6 members" */
export const groupSize = (group: AuditGroup): string => {
  const entity = group[0]?.entity ?? '';
  return entity === 'membership' ? count(group.length, 'person', 'people') : count(group.length, entity);
};
