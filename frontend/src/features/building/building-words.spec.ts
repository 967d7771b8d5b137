import { describe, expect, it } from 'vitest';
import type { BuildingDto, BuildingZoneDto } from '@mantlet/common';
import { buildingWords, sayZone } from './building-words.js';

const zone: BuildingZoneDto = {
  id: 'z', code: 'Z03', name: 'Hall', periodMin: 60, curve: 'standard', protectedAreaM2: 0, members: 40, settled: 0, open: 40, issuedMembers: 0, unassessed: 40,
};
const building: BuildingDto = {
  members: 100, settled: 60, open: 40, unassessed: 40, openItems: [], protection: [],
  levels: [{ id: 'l', code: 'L1', name: 'First', elevationM: 4, heightM: 4, zones: [zone] }],
};

describe('a building that is being recalculated', () => {
  it('says so in its heading, and counts nothing as open that nobody can settle', () => {
    const { heading, sub } = buildingWords(building);
    expect(heading).toBe('60 of 100 members settled, 40 being recalculated');
    expect(sub).not.toContain('40');
    expect(buildingWords({ ...building, unassessed: 0 }).heading).toBe('60 of 100 members settled');
  });
  it('does not call members settled whose results are out of date', () => {
    const stale = { role: 'specifier', kind: 'blocker', code: 'stale', title: '', zoneId: null, zoneLabel: null, memberIds: [], count: 90, page: 'schedule' } as const;
    const { heading } = buildingWords({ ...building, unassessed: 0, openItems: [stale] });
    expect(heading).toBe('90 of 100 results are out of date');
  });
  it('gives no area that is not known', () => {
    expect(sayZone(zone, { code: 'L1' })).toContain('R 60, being recalculated, 0 of 40 members settled');
    expect(sayZone({ ...zone, unassessed: 0, protectedAreaM2: 12 }, { code: 'L1' })).toContain('12 m² protected');
  });
});
