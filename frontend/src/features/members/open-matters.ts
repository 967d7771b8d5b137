import type { MemberSheetDto } from '@mantlet/common';
import { formatLimitTemperature } from '@mantlet/common';
import { formatDate } from '../../lib/format.js';

/** Something on a member that waits on somebody: what it is, whose turn it is, and what settles it. */
export interface OpenMatter { what: string; who: 'structural engineer' | 'specifier' | 'fire engineer'; how: string; place: 'structural' | 'member' | 'accept' | 'zone' | 'schedule' }

/** Reasons that somebody else than the structural engineer settles. */
const bySpecifier: Record<string, Pick<OpenMatter, 'how' | 'place'>> = {
  'assessment.no-system': { how: 'Choose a protection system for its type in the zone.', place: 'zone' },
  'assessment.form-mismatch': { how: 'Change the protection form of the member, or the system of its zone.', place: 'member' },
  'assessment.unknown-grade': { how: 'Choose a listed grade, or have the critical temperature declared.', place: 'member' },
  'section.no-face': { how: 'Name the faces that see fire, or take the member out of the schedule.', place: 'member' },
  'section.web-filled': { how: 'Choose another exposure.', place: 'member' },
};

function ofVerdict({ result, sentence }: MemberSheetDto): OpenMatter[] {
  const what = sentence.replace(/\.$/, '');
  switch (result?.verdict) {
    case 'under-strength': return [{ what, who: 'structural engineer', how: 'Check the actions and the section. Fire protection cannot make up for strength that is missing cold, so no thickness is given.', place: 'structural' }];
    case 'outside': return [{ what, who: 'specifier', how: 'Choose another product for the zone, another section, or another protection form. Nothing is read beyond the evidence.', place: 'zone' }];
    case 'not-determined': {
      const found = result.reason ? bySpecifier[result.reason.code] : undefined;
      if (found) return [{ what, who: 'specifier', ...found }];
      if (result.reason?.code.startsWith('product.') || result.reason?.code.startsWith('section.')) return [{ what, who: 'specifier', how: 'Change the member, or the product of its zone.', place: 'member' }];
      return [{ what, who: 'structural engineer', how: 'Give actions or a utilisation, or declare the critical temperature with a reference.', place: 'structural' }];
    }
    case undefined: return [{ what, who: 'specifier', how: 'Recalculate the results on the Schedule page.', place: 'schedule' }];
    default: return [];
  }
}

/** What is open on a member, in the order in which it can be settled. */
export function openMatters(sheet: MemberSheetDto, secondSignatureAboveC: number): OpenMatter[] {
  const { result, member } = sheet;
  const signed = (kind: string) => member.acceptances.some((a) => a.kind === kind && a.stillHolds);
  const matters = ofVerdict(sheet);
  if (sheet.outOfDate) matters.unshift({ what: 'This sheet is worked out from the inputs as they stand; lists, quantities and the schedule still carry an earlier result', who: 'specifier', how: 'Recalculate the results on the Schedule page.', place: 'schedule' });
  if (sheet.evidenceExpiredOn) matters.push({ what: `The assessment of ${sheet.productName ?? 'its product'} expired on ${formatDate(sheet.evidenceExpiredOn)}`, who: 'specifier', how: 'Enter the renewed assessment, or choose another product for the zone. Until then no schedule can be prepared with it.', place: 'zone' });
  const critical = result?.criticalTemperatureC ?? null;
  if (result?.assumed) matters.push({ what: `The critical temperature of ${formatLimitTemperature(critical)} is assumed by member type`, who: 'structural engineer', how: 'Give actions, a utilisation or a declared temperature; or the fire engineer accepts the assumed one, with a reason.', place: 'structural' });
  if (critical !== null && critical > secondSignatureAboveC && !signed('high-temperature')) matters.push({ what: `The critical temperature of ${formatLimitTemperature(critical)} is above ${secondSignatureAboveC} °C`, who: 'fire engineer', how: 'Accept it with a reason, or ask for a lower one.', place: 'accept' });
  if (result?.verdict === 'bare' && !signed('bare')) matters.push({ what: 'Nobody has signed for leaving it bare', who: 'fire engineer', how: 'Accept it with a reason, or have it protected all the same.', place: 'accept' });
  return matters;
}
