import { describe, expect, it } from 'vitest';
import { addressOfFilter, cleared, filterOfAddress, isNarrowed, narrowing } from './member-filter.js';

const id = '11111111-1111-4111-8111-111111111111';
const other = '22222222-2222-4222-8222-222222222222';

describe('the filter in the address', () => {
  it('comes back as it went', () => {
    const filter = { search: 'B2 & more', zoneIds: [id, other], verdicts: ['outside' as const, 'not-determined' as const], open: 'true' as const, sort: 'section' as const, direction: 'desc' as const, sectionFactorAbove: 200, thicknessUpTo: 1.5, periods: [60, 90], grades: ['S355' as const], accepted: 'false' as const };
    expect(filterOfAddress(new URLSearchParams(addressOfFilter(filter).toString()))).toEqual(filter);
  });
  it('leaves defaults and emptiness out, and other parameters in', () => {
    expect(addressOfFilter({ search: '', zoneIds: [], sort: 'mark', direction: 'asc' }).toString()).toBe('');
    expect(addressOfFilter({ open: 'true' }, new URLSearchParams('columns=mark&search=x')).toString()).toBe('columns=mark&open=true');
  });
  it('loses a wrong value only, never the rest', () => {
    expect(filterOfAddress(new URLSearchParams(`zoneIds=${id}&verdicts=sideways&sectionFactorAbove=much&lengthUpTo=1e99&periods=x&open=maybe&sort=mark`))).toEqual({ zoneIds: [id], sort: 'mark' });
  });
  it('clears without losing the order, and knows what narrows', () => {
    expect(cleared({ search: 'x', zoneIds: [id], sort: 'zone', direction: 'desc' })).toEqual({ sort: 'zone', direction: 'desc' });
    expect(isNarrowed({ sort: 'zone' })).toBe(false);
    expect(isNarrowed({ memberIds: [id] })).toBe(true);
    expect(isNarrowed({ sectionFactorAbove: 0 })).toBe(true);
    expect(narrowing({ sort: 'zone', direction: 'desc', search: '', zoneIds: [], open: 'true' })).toEqual({ open: 'true' });
  });
});
