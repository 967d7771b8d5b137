import { describe, expect, it } from 'vitest';
import type { MemberSheetDto } from '@mantlet/common';
import { message } from '@mantlet/common';
import { openMatters } from './open-matters.js';

type Result = NonNullable<MemberSheetDto['result']>;
const sheet = (result: Partial<Result> | null, acceptances: { kind: string; stillHolds: boolean }[] = [], sentence = 'Outside the assessment: A/V 342 is above 300') =>
  ({ result: result && { criticalTemperatureC: 560, assumed: false, reason: null, ...result }, sentence, member: { acceptances } }) as unknown as MemberSheetDto;

describe('what is open on a member, and who settles it', () => {
  it('is nothing for a member that is settled', () => expect(openMatters(sheet({ verdict: 'protected' }), 650)).toEqual([]));
  it('sends what is outside the evidence to the specifier, and what fails cold to the structural engineer', () => {
    expect(openMatters(sheet({ verdict: 'outside' }), 650)).toMatchObject([{ who: 'specifier', what: 'Outside the assessment: A/V 342 is above 300' }]);
    expect(openMatters(sheet({ verdict: 'under-strength', criticalTemperatureC: null }), 650)).toMatchObject([{ who: 'structural engineer' }]);
  });
  it('sends what is not determined to whom the reason names', () => {
    expect(openMatters(sheet({ verdict: 'not-determined', reason: message('assessment.no-basis', {}), criticalTemperatureC: null }), 650)).toMatchObject([{ who: 'structural engineer', place: 'structural' }]);
    expect(openMatters(sheet({ verdict: 'not-determined', reason: message('assessment.no-system', { memberType: 'beams' }) }), 650)).toMatchObject([{ who: 'specifier', place: 'zone' }]);
  });
  it('asks for signatures until they are given, and again when they no longer hold', () => {
    const whose = (acceptances: { kind: string; stillHolds: boolean }[]) => openMatters(sheet({ verdict: 'bare', criticalTemperatureC: 700 }, acceptances), 650).map((m) => m.what);
    expect(whose([])).toEqual(['The critical temperature of 700 °C is above 650 °C', 'Nobody has signed for leaving it bare']);
    expect(whose([{ kind: 'bare', stillHolds: true }, { kind: 'high-temperature', stillHolds: false }])).toEqual(['The critical temperature of 700 °C is above 650 °C']);
  });
  it('says that an assumed temperature waits, and that a member without a result has none', () => {
    expect(openMatters(sheet({ verdict: 'protected', assumed: true }), 650)).toMatchObject([{ who: 'structural engineer', what: 'The critical temperature of 560 °C is assumed by member type' }]);
    expect(openMatters(sheet(null, [], 'Not determined: not assessed yet'), 650)).toHaveLength(1);
  });
  it('says what is older than its inputs, and an assessment that has expired', () => {
    const protectedBy = { ...sheet({ verdict: 'protected' }), productName: 'Coat' };
    expect(openMatters({ ...protectedBy, outOfDate: true, evidenceExpiredOn: null }, 650)).toMatchObject([{ who: 'specifier', place: 'schedule' }]);
    expect(openMatters({ ...protectedBy, outOfDate: false, evidenceExpiredOn: '2026-03-01' }, 650)).toMatchObject([{ who: 'specifier', place: 'zone', what: 'The assessment of Coat expired on 1 Mar 2026' }]);
  });
});
