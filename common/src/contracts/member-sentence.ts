import type { Message } from '../errors/message.js';
import { sentence } from '../errors/message.js';
import { formatThickness } from '../units/format.js';
import type { ThicknessUnit } from '../units/thickness.js';
import type { VerdictKind } from './assessment.js';

/** What the sentence of a member is made of; a stored result has all of it. */
export interface MemberSentenceInput {
  /** null: being worked out */
  verdict: VerdictKind | null;
  reason: Message | { code: string; params: unknown } | null;
  requiredThickness: number | null;
  appliedThickness: number | null;
  thicknessUnit: ThicknessUnit | null;
  productName: string | null;
}

const openings = {
  outside: 'Outside the assessment',
  'not-determined': 'Not determined',
  'under-strength': 'Under-strength cold',
} as const;

/**
 * The result of a member as people say it: the same words on the page, in the PDF and in exports.
 * "Needs 0.62 mm of …" · "May stay bare" · "Outside the assessment: …" · "Not determined: …" · "Under-strength cold: …"
 */
export function memberSentence(m: MemberSentenceInput): string {
  if (m.verdict === null) return 'Not determined: being recalculated';
  if (m.verdict === 'bare') return 'May stay bare';
  if (m.verdict === 'protected') return protectedSentence(m);
  return withOpening(openings[m.verdict], m.reason ? withoutLastStop(sentence(m.reason)) : 'no reason was stored');
}

function protectedSentence(m: MemberSentenceInput): string {
  if (m.requiredThickness === null || m.thicknessUnit === null) return 'Not determined: no thickness was stored';
  const required = formatThickness(m.requiredThickness, m.thicknessUnit);
  const applied = formatThickness(m.appliedThickness, m.thicknessUnit);
  const needs = `Needs ${required}${m.productName ? ` of ${m.productName}` : ''}`;
  const getsMore = m.appliedThickness !== null && m.appliedThickness > m.requiredThickness && applied !== required;
  return getsMore ? `${needs}; gets ${applied} with its zone` : needs;
}

/** Reasons may bring their opening with them. */
function withOpening(opening: string, reason: string): string {
  return reason.toLowerCase().startsWith(opening.toLowerCase()) ? reason : `${opening}: ${reason}`;
}

/** One sentence in a table has no full stop; several keep theirs. */
function withoutLastStop(text: string): string {
  return text.endsWith('.') && !/[.!?] /.test(text) ? text.slice(0, -1) : text;
}
