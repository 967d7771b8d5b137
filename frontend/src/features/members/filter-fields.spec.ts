import { describe, expect, it } from 'vitest';
import type { MemberValuesDto } from '@mantlet/common';
import { memberNarrowingSchema } from '@mantlet/common';
import { columnKeys, usualColumns } from './components/member-columns.js';
import { chipWords, chosenFields, filterFields, keysOf, without } from './filter-fields.js';

const id = '11111111-1111-4111-8111-111111111111';
const other = '22222222-2222-4222-8222-222222222222';
const values = { zoneIds: [{ value: id, label: 'Z03 Reading room', members: 7 }, { value: other, label: 'Z04 Stair', members: 3 }] } as unknown as MemberValuesDto;
const field = (key: string) => filterFields.find((f) => f.key === key)!;

describe('filters in words', () => {
  it('say what is chosen', () => {
    expect(chipWords(field('zoneIds'), { zoneIds: [id, other] }, values)).toBe('Zone Z03 or Z04');
    expect(chipWords(field('verdicts'), { verdicts: ['bare'] }, undefined)).toBe('Result May stay bare');
    expect(chipWords(field('sectionFactor'), { sectionFactorAbove: 200 }, undefined)).toBe('A/V above 200 1/m');
    expect(chipWords(field('thickness'), { thicknessAbove: 0.5, thicknessUpTo: 2 }, undefined)).toBe('Required thickness above 0.50, up to 2 mm');
    expect(chipWords(field('open'), { open: 'false' }, undefined)).toBe('Nothing open');
    expect(chipWords(field('periods'), { periods: [60, 90] }, undefined)).toBe('Period 60 min or 90 min');
    expect(chipWords(field('zoneIds'), { zoneIds: ['33333333-3333-4333-8333-333333333333'] }, values)).toMatch(/^Zone one/);
  });
  it('are offered for everything that the server narrows by, but for search and members picked out', () => {
    const offered = new Set(filterFields.flatMap(keysOf));
    expect(Object.keys(memberNarrowingSchema.shape).filter((key) => !offered.has(key as never))).toEqual(['search', 'memberIds']);
  });
  it('go one by one', () => {
    const filter = { zoneIds: [id], sectionFactorAbove: 0, open: 'true' as const, sort: 'zone' as const };
    expect(chosenFields(filter).map((f) => f.key)).toEqual(['zoneIds', 'open', 'sectionFactor']);
    expect(without(filter, field('sectionFactor'))).toEqual({ zoneIds: [id], open: 'true', sort: 'zone' });
  });
});

describe('columns in an address', () => {
  it('keep their order, lose what is unknown or twice, and never the mark', () => {
    expect(columnKeys('verdict,mark,verdict,nonsense,area')).toEqual(['verdict', 'mark', 'area']);
    expect(columnKeys('area')).toEqual(['mark', 'area']);
    expect(columnKeys('nonsense')).toBeNull();
    expect(columnKeys(null)).toBeNull();
    expect(columnKeys(usualColumns.join(','))).toEqual(usualColumns);
  });
});
