import type { z } from 'zod';
import type { MemberDto, MemberInput, SectionDto } from '@mantlet/common';
import { memberInputSchema } from '@mantlet/common';
import { useContractForm } from '../../../ui/form/use-contract-form.js';

export type MemberFormIn = z.input<typeof memberInputSchema>;
/** What a new member begins with: nothing that would decide anything but the usual case, each visible on the form. */
const blank = {
  mark: '', memberType: 'beam', grade: 'S355', quantity: 1, exposure: { arrangement: 'four-sides', reason: '' }, protectionForm: 'profile',
  coatBackConnections: 0, coatBackGirthMm: 0, deductionM2: 0, onSite: true, note: '',
} as const;

export function memberValues(m: MemberDto): MemberInput {
  const { zoneId, mark, memberType, sectionId, grade, lengthMm, quantity, exposure, protectionForm, coatBackConnections, coatBackGirthMm, deductionM2, onSite, note } = m;
  return { zoneId, mark, memberType, sectionId, grade, lengthMm, quantity, exposure, protectionForm, coatBackConnections, coatBackGirthMm, deductionM2, onSite, note };
}

/** The specifier's form, new or filled from a member. A reload fills fields nobody touched. */
export const useMemberForm = (member: MemberDto | null, start: Partial<MemberInput> = {}) =>
  useContractForm<MemberFormIn, MemberInput>(memberInputSchema, member ? { values: memberValues(member) } : { defaultValues: { ...blank, ...start } });
export type MemberForm = ReturnType<typeof useMemberForm>;

export const sectionLabel = (s: Pick<SectionDto, 'designation' | 'projectId' | 'properties'>): string =>
  `${s.designation}${s.projectId ? ', of this project' : ''}`;
