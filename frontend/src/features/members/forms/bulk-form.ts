import { z } from 'zod';
import { exposureSchema, idSchema, memberTypes, protectionForms, steelGrades } from '@mantlet/common';
import type { BulkMember } from '@mantlet/common';

/** Every field may stay empty: then the members keep what they have. */
export const bulkFormSchema = z
  .object({
    zoneId: idSchema.nullable(),
    memberType: z.enum(memberTypes).nullable(),
    sectionId: idSchema.nullable(),
    grade: z.enum(steelGrades).nullable(),
    exposure: exposureSchema.nullable(),
    protectionForm: z.enum(protectionForms).nullable(),
    onSite: z.enum(['site', 'shop']).nullable(),
  })
  .transform(({ onSite, ...rest }, context): BulkMember['set'] => {
    const given = Object.entries({ ...rest, onSite: onSite === null ? null : onSite === 'site' }).filter(([, value]) => value !== null);
    if (given.length === 0) context.addIssue({ code: 'custom', path: ['zoneId'], message: 'Choose at least one field to set.' });
    return Object.fromEntries(given) as BulkMember['set'];
  });
export const emptyBulk: z.input<typeof bulkFormSchema> = { zoneId: null, memberType: null, sectionId: null, grade: null, exposure: null, protectionForm: null, onSite: null };
