import { describe, expect, it } from 'vitest';
import { auditFilterOf, auditParams, isNarrowed } from './audit-filter.js';

const who = '11111111-1111-4111-8111-111111111111';
const of = (text: string) => auditFilterOf(new URLSearchParams(text));

describe('the filter of the audit trail', () => {
  it('goes to the address and back unchanged', () => {
    const text = `search=C12&who=${who}&what=zone&from=2026-05-01&to=2026-05-31&entries=3`;
    expect(new URLSearchParams(auditParams(of(text))).toString()).toBe(text);
    expect(auditParams(of(''))).toEqual({});
  });
  it('lets what is not right narrow nothing', () => {
    expect(of('who=everybody&what=secrets&from=yesterday&to=2026-99-99&entries=-4')).toEqual({ search: '', who: '', what: '', from: '', to: '', page: 1 });
    expect(of('what=toString').what).toBe('');
    expect(isNarrowed(of('entries=2'))).toBe(false);
    expect(isNarrowed(of('to=2026-05-31'))).toBe(true);
  });
});
