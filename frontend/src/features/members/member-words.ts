import type { MemberRowDto, MemberSheetDto, VerdictKind } from '@mantlet/common';
import { exposureNames, formatPeriod, formatThickness, memberTypeNames } from '@mantlet/common';
import { countWord, formatNumber } from '../../lib/format.js';
import type { StatusKind } from '../../ui/status-word.js';

export const verdictNames: Record<VerdictKind, string> = {
  protected: 'Needs protection', bare: 'May stay bare', 'not-determined': 'Not determined', outside: 'Outside the assessment', 'under-strength': 'Under-strength cold',
};
export const acceptanceNames = { assumed: 'assumed critical temperature', 'high-temperature': 'high critical temperature', bare: 'staying bare' } as const;

/** The list's heading: how far the whole project is, and what of it is shown. */
export function listHeading(total: number | undefined, open: number | undefined): { heading: string; sub: string } {
  if (total === undefined || open === undefined) return { heading: 'Members', sub: '' };
  if (total === 0) return { heading: 'No members yet', sub: 'A schedule begins with its members.' };
  if (open === 0) return { heading: `All ${formatNumber(total)} members settled`, sub: 'Nothing is open on any of them.' };
  return { heading: `${formatNumber(total - open)} of ${formatNumber(total)} members settled`, sub: `${countWord(open)} ${open === 1 ? 'has' : 'have'} something open.` };
}

export const rowState = (row: Pick<MemberRowDto, 'open' | 'verdict'>): StatusKind => (row.open ? 'attention' : row.verdict === null ? 'neutral' : 'settled');

type RowResult = Pick<MemberRowDto, 'verdict' | 'requiredThickness' | 'appliedThickness' | 'thicknessUnit' | 'productName' | 'sentence'>;
/** The result as a row of the list says it, in one line: "34 mm Demo Spray M · zone gives 42 mm". Other results keep their sentence. */
export function rowResult(row: RowResult): string {
  const { verdict, requiredThickness: required, appliedThickness: applied, thicknessUnit: unit, productName } = row;
  if (verdict !== 'protected' || required === null || unit === null) return row.sentence;
  const [needs, gets] = [formatThickness(required, unit), formatThickness(applied, unit)];
  return `${needs}${productName ? ` ${productName}` : ''}${applied !== null && applied > required && gets !== needs ? ` · zone gives ${gets}` : ''}`;
}

/** The sheet's heading: the result, with its period where that completes the sentence. */
export function sheetHeading({ sentence, result, zone }: Pick<MemberSheetDto, 'sentence' | 'result' | 'zone'>): string {
  const text = sentence.replace(/\.$/, '');
  if (result?.verdict !== 'protected' && result?.verdict !== 'bare') return text;
  const minutes = `for ${zone.periodMin} minutes`;
  return text.includes(';') ? text.replace(';', ` ${minutes};`) : `${text} ${minutes}`;
}

export function sheetSub({ member, section, zone, level }: MemberSheetDto): string {
  const exposure = exposureNames[member.exposure.arrangement];
  const why = member.exposure.reason ? `: ${member.exposure.reason}` : '';
  return `${section.designation}, ${member.grade}, ${memberTypeNames[member.memberType].toLowerCase()}, ${formatNumber(member.lengthMm / 1000, 2)} m, ${member.quantity} off. ` +
    `Level ${level.code} ${level.name}, ${zone.code} ${zone.name}, ${formatPeriod(zone.periodMin)}. ${exposure}${why.replace(/\.$/, '')}.`;
}

/** Why a member with a result still counts as open, as far as its row tells; null where the result itself says it. */
export function openReason(row: Pick<MemberRowDto, 'open' | 'verdict' | 'assumed' | 'criticalTemperatureC'>, secondSignatureAboveC: number): string | null {
  if (!row.open || (row.verdict !== 'protected' && row.verdict !== 'bare')) return null;
  if (row.assumed) return 'Assumed temperature, not accepted yet';
  if (row.criticalTemperatureC !== null && row.criticalTemperatureC > secondSignatureAboveC) return `Above ${secondSignatureAboveC} °C, not accepted yet`;
  return row.verdict === 'bare' ? 'Staying bare is not accepted yet' : 'Something is open: see its zone and product';
}
