import { describe, expect, it } from 'vitest';
import { message } from '../errors/message.js';
import type { MemberSentenceInput } from './member-sentence.js';
import { memberSentence } from './member-sentence.js';

const result: MemberSentenceInput = {
  verdict: 'protected', reason: null, requiredThickness: 620, appliedThickness: 620, thicknessUnit: 'µm', productName: 'Test coating',
};

describe('memberSentence', () => {
  it('says what a protected member needs, and what it gets where its zone gives more', () => {
    expect(memberSentence(result)).toBe('Needs 0.62 mm of Test coating');
    expect(memberSentence({ ...result, appliedThickness: 800 })).toBe('Needs 0.62 mm of Test coating; gets 0.80 mm with its zone');
    expect(memberSentence({ ...result, requiredThickness: 25, appliedThickness: 25, thicknessUnit: 'mm', productName: null })).toBe('Needs 25 mm');
  });

  it('says so where steel may stay bare or nothing was assessed', () => {
    expect(memberSentence({ ...result, verdict: 'bare' })).toBe('May stay bare');
    expect(memberSentence({ ...result, verdict: null })).toBe('Not determined: being recalculated');
  });

  it('opens with the verdict once, whether or not the reason brings it', () => {
    const outside = message('product.outside-section-factor', { sectionFactorPerM: 342, limitPerM: 300 });
    expect(memberSentence({ ...result, verdict: 'outside', reason: outside })).toBe('Outside the assessment: A/V 342 is above 300');
    const noActions = message('assessment.no-actions', {});
    expect(memberSentence({ ...result, verdict: 'not-determined', reason: noActions })).toBe('Not determined: no actions given');
    const bare = message('section.no-face', {});
    expect(memberSentence({ ...result, verdict: 'not-determined', reason: bare })).toBe(
      'Not determined: No face of the section sees fire. Name at least one, or take the member out of the schedule.',
    );
    const weak = message('assessment.under-strength-utilisation', { utilisation: 1.04 });
    expect(memberSentence({ ...result, verdict: 'under-strength', reason: weak })).toMatch(/^Under-strength cold: .*1\.04/);
  });

  it('never shows an empty result as a number', () => {
    expect(memberSentence({ ...result, requiredThickness: null })).toBe('Not determined: no thickness was stored');
    expect(memberSentence({ ...result, verdict: 'outside', reason: null })).toBe('Outside the assessment: no reason was stored');
  });
});
