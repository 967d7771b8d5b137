import { describe, expect, it } from 'vitest';
import type { OpenItemDto, Role } from '@mantlet/common';
import { groupsOf, keynotesOf, numbersByZone } from './keynotes.js';

const item = (role: Role, title: string, zoneId: string | null): OpenItemDto => ({ role, title, zoneId, kind: 'blocker', code: title, zoneLabel: zoneId, memberIds: [], count: 1, page: 'members' });
const items = [item('structural-engineer', 'a', 'z1'), item('fire-engineer', 'b', 'z2'), item('specifier', 'c', 'z1'), item('structural-engineer', 'd', null)];

describe('keynotes', () => {
  it('number what waits on the reader first, then one role after the other', () => {
    const keynotes = keynotesOf(items, ['specifier']);
    expect(keynotes.map((k) => [k.number, k.item.title, k.mine])).toEqual([[1, 'c', true], [2, 'a', false], [3, 'd', false], [4, 'b', false]]);
    expect(groupsOf(keynotes).map((g) => [g.role, g.keynotes.map((k) => k.number)])).toEqual([['you', [1]], ['structural-engineer', [2, 3]], ['fire-engineer', [4]]]);
  });
  it('stand on their zone; what belongs to none stands in the list only', () => {
    expect([...numbersByZone(keynotesOf(items, []))]).toEqual([['z1', [1, 4]], ['z2', [3]]]);
  });
});
