import type { UseFormReturn } from 'react-hook-form';
import type { z } from 'zod';
import type { MemberDto, MemberInput, SectionDto } from '@mantlet/common';
import { memberInputSchema } from '@mantlet/common';
import type { EditWords, Standing } from '../../../ui/form/use-edit-form.js';

export type MemberFormIn = z.input<typeof memberInputSchema>;
export type MemberForm = UseFormReturn<MemberFormIn, unknown, MemberInput>;
export const memberSchema: z.ZodType<MemberInput, MemberFormIn> = memberInputSchema;

/** What a new member begins with: nothing that would decide anything but the usual case, each visible on the form. */
const blank = {
  mark: '', memberType: 'beam', grade: 'S355', quantity: 1, exposure: { arrangement: 'four-sides', reason: '' }, protectionForm: 'profile',
  coatBackConnections: 0, coatBackGirthMm: 0, deductionM2: 0, onSite: true, note: '',
} as const;
export const newMember = (zoneId: string | null): Standing<MemberFormIn> => ({ values: { ...blank, ...(zoneId ? { zoneId } : {}) } as unknown as MemberFormIn, version: null });

export function memberValues(m: MemberDto): MemberInput {
  const { zoneId, mark, memberType, sectionId, grade, lengthMm, quantity, exposure, protectionForm, coatBackConnections, coatBackGirthMm, deductionM2, onSite, note } = m;
  return { zoneId, mark, memberType, sectionId, grade, lengthMm, quantity, exposure, protectionForm, coatBackConnections, coatBackGirthMm, deductionM2, onSite, note };
}
export const memberStanding = (member: MemberDto): Standing<MemberFormIn> => ({ values: memberValues(member), version: member.version });

export interface Named { id: string; designation: string }
const labels: Record<string, string> = { quantity: 'Number off', zoneId: 'Zone', memberType: 'Type', grade: 'Steel grade', sectionId: 'Section', onSite: 'Protected on site' };
/** A member's fields as people call them; sections and zones by name, not by what the database knows them as. */
export const memberWords = ({ zones, sections }: { zones: readonly { value: string; label: string }[]; sections: readonly (Named | null)[] }): EditWords => ({
  label: (path) => labels[path],
  value: (path, value) => {
    if (path === 'zoneId') return zones.find((zone) => zone.value === value)?.label;
    return path === 'sectionId' && value ? sections.find((section) => section?.id === value)?.designation ?? 'another section' : undefined;
  },
});

export const sectionLabel = (s: Pick<SectionDto, 'designation' | 'projectId' | 'properties'>): string =>
  `${s.designation}${s.projectId ? ', of this project' : ''}`;
