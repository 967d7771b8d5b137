import { describe, expect, it } from 'vitest';
import { addressOfFilter, changed, cleared, filterOfAddress, isNarrowed } from './member-filter.js';

const id = '11111111-1111-4111-8111-111111111111';
const other = '22222222-2222-4222-8222-222222222222';

describe('the filter in the address', () => {
  it('comes back as it went', () => {
    const filter = { search: 'B2 & more', zoneIds: [id, other], verdicts: ['outside' as const, 'not-determined' as const], open: 'true' as const, sort: 'section' as const, direction: 'desc' as const, page: 3, pageSize: 250 };
    expect(filterOfAddress(new URLSearchParams(addressOfFilter(filter).toString()))).toEqual(filter);
  });
  it('leaves defaults and emptiness out, and other parameters in', () => {
    expect(addressOfFilter({ search: '', zoneIds: [], sort: 'mark', direction: 'asc', page: 1, pageSize: 100 }).toString()).toBe('');
    expect(addressOfFilter({ page: 2 }, new URLSearchParams('drawer=add&search=x')).toString()).toBe('drawer=add&page=2');
  });
  it('loses a wrong value only, never the rest', () => {
    expect(filterOfAddress(new URLSearchParams(`zoneIds=${id}&verdicts=sideways&page=-4&pageSize=9999&open=maybe&sort=mark`))).toEqual({ zoneIds: [id], sort: 'mark' });
  });
  it('begins another filter at its first page, and clears without losing the order', () => {
    expect(changed({ page: 7, sort: 'zone' }, { search: 'C0' })).toEqual({ page: 1, sort: 'zone', search: 'C0' });
    expect(cleared({ search: 'x', zoneIds: [id], sort: 'zone', direction: 'desc', page: 4 })).toEqual({ sort: 'zone', direction: 'desc' });
    expect(isNarrowed({ sort: 'zone', page: 2 })).toBe(false);
    expect(isNarrowed({ memberIds: [id] })).toBe(true);
  });
});
