import { memberSentence } from '@mantlet/common';
import type { AcceptanceDto, MemberDto, MemberResultDto } from '@mantlet/common';
import type { MemberResult } from '../assessment/member-result.entity.js';
import type { MemberAcceptance } from './member-acceptance.entity.js';
import type { Member } from './member.entity.js';

/** The stored result without what only the server keeps beside it. */
export function toResultDto(stored: MemberResult): MemberResultDto {
  const {
    verdict, reason, heatedPerimeterMm, sectionFactorPerM, coatedGirthMm, criticalTemperatureC, bareCriticalTemperatureC, way, method, governing,
    utilisation, assumed, bareMinutes, bareTemperatureC, requiredThickness, appliedThickness, thicknessUnit, layers, productId, evidenceReading,
  } = stored;
  return {
    verdict, reason, heatedPerimeterMm, sectionFactorPerM, coatedGirthMm, criticalTemperatureC, bareCriticalTemperatureC, way, method, governing,
    utilisation, assumed, bareMinutes, bareTemperatureC, requiredThickness, appliedThickness, thicknessUnit, layers, productId, evidenceReading,
  };
}

/** A member with its relations `acceptances.acceptedBy`, `basisSetBy` and `result` read. */
export function toMemberDto(member: Member, holds: (acceptance: MemberAcceptance, result: MemberResultDto) => boolean): MemberDto {
  const {
    id, version, zoneId, mark, memberType, sectionId, grade, lengthMm, quantity, exposure, protectionForm, coatBackConnections, coatBackGirthMm,
    deductionM2, onSite, note, basis,
  } = member;
  const result = member.result ? toResultDto(member.result) : null;
  return {
    id, version, zoneId, mark, memberType, sectionId, grade, lengthMm, quantity, exposure, protectionForm, coatBackConnections, coatBackGirthMm,
    deductionM2, onSite, note, basis,
    basisSetBy: member.basisSetBy?.name ?? null, basisSetAt: member.basisSetAt?.toISOString() ?? null,
    acceptances: member.acceptances.map((acceptance) => toAcceptanceDto(acceptance, result !== null && holds(acceptance, result))),
  };
}

function toAcceptanceDto(acceptance: MemberAcceptance, stillHolds: boolean): AcceptanceDto {
  const { kind, valueC, reason, acceptedBy, acceptedAt } = acceptance;
  return { kind, valueC, reason, by: acceptedBy.name, at: acceptedAt.toISOString(), stillHolds };
}

export function sentenceOf(result: MemberResultDto | null, productName: string | null): string {
  return memberSentence({
    verdict: result?.verdict ?? null, reason: result?.reason ?? null, requiredThickness: result?.requiredThickness ?? null,
    appliedThickness: result?.appliedThickness ?? null, thicknessUnit: result?.thicknessUnit ?? null, productName,
  });
}
