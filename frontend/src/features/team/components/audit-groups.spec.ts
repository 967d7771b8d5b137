import { describe, expect, it } from 'vitest';
import type { AuditEntryDto } from '@mantlet/common';
import { actInWords, groupEntries, groupSize } from './audit-groups.js';

const entry = (label: string, more: Partial<AuditEntryDto> = {}): AuditEntryDto =>
  ({ id: label, at: '2026-12-01T10:27:18Z', userName: 'O', action: 'member imported', entity: 'member', entityId: null, label, changes: [], why: null, ...more });

describe('the audit trail in groups', () => {
  it('takes neighbours of one act together and loses none', () => {
    const entries = [entry('A'), entry('B'), entry('C', { action: 'member deleted' }), entry('D'), entry('E', { userName: 'P' }), entry('F', { userName: 'P', at: '2026-12-01T10:29:18Z' })];
    const groups = groupEntries(entries);
    expect(groups.map((g) => g.map((e) => e.label))).toEqual([['A', 'B'], ['C'], ['D'], ['E'], ['F']]);
    expect(groups.flat()).toEqual(entries);
  });
  it('keeps two changes of one thing, and different reasons, apart', () => {
    expect(groupEntries([entry('A'), entry('A')])).toHaveLength(2);
    expect(groupEntries([entry('A', { why: 'x' }), entry('B', { why: 'y' })])).toHaveLength(2);
  });
  it('names the act once', () => {
    expect(actInWords({ action: 'member imported', entity: 'member' })).toBe('Member imported');
    expect(actInWords({ action: 'leaving bare accepted', entity: 'member' })).toBe('Leaving bare accepted: member');
    expect(actInWords({ action: 'leaving bare accepted', entity: 'member' }, true)).toBe('Leaving bare accepted');
    expect(groupSize([entry('A'), entry('B')])).toBe('2 members');
    expect(groupSize([entry('A', { entity: 'membership' }), entry('B')])).toBe('2 people');
  });
});
