import { z } from 'zod';
import { idSchema } from './primitives.js';
import { productKinds } from './products.js';
import { openItemDtoSchema } from './projects.responses.js';
import { revisionStates } from './revisions.js';

/** userId tells two people of one name apart */
export const signatureDtoSchema = z.object({ userId: idSchema, name: z.string(), at: z.string() });
export type SignatureDto = z.infer<typeof signatureDtoSchema>;
export const revisionDtoSchema = z.object({
  id: idSchema, code: z.string(), purpose: z.string(), state: z.enum(revisionStates), createdAt: z.string(),
  prepared: signatureDtoSchema.nullable(), checked: signatureDtoSchema.nullable(), issued: signatureDtoSchema.nullable(),
  returnedComment: z.string().nullable(),
  snapshotSha256: z.string().nullable(), pdfSha256: z.string().nullable(), pdfBytes: z.number().nullable(),
  members: z.number().nullable(), protectedAreaM2: z.number().nullable(),
});
export type RevisionDto = z.infer<typeof revisionDtoSchema>;
/** current says whether results are up to date with their inputs */
export const readinessDtoSchema = z.object({
  ready: z.boolean(), current: z.boolean(), blockers: z.array(openItemDtoSchema), warnings: z.array(openItemDtoSchema),
});
export type ReadinessDto = z.infer<typeof readinessDtoSchema>;
/** What the frozen snapshot of a revision holds, in short. */
export const revisionSummaryDtoSchema = z.object({
  levels: z.number(),
  zones: z.number(),
  members: z.number(),
  pieces: z.number(),
  bareMembers: z.number(),
  protectedAreaM2: z.number(),
  products: z.array(z.object({
    id: idSchema, name: z.string(), kind: z.enum(productKinds), invented: z.boolean(),
    evidenceReference: z.string(), evidenceEdition: z.string(), evidenceExpiresOn: z.string(),
    members: z.number(), areaM2: z.string(),
    /** what to buy, in words; null where the supply data lack something */
    purchase: z.string().nullable(),
  })),
  /** what stood unsettled, though not in the way, when it was prepared */
  warnings: z.array(openItemDtoSchema),
});
export type RevisionSummaryDto = z.infer<typeof revisionSummaryDtoSchema>;
/** summary is null while a revision is in draft: nothing is frozen yet */
export const revisionDetailDtoSchema = revisionDtoSchema.extend({ summary: revisionSummaryDtoSchema.nullable() });
export type RevisionDetailDto = z.infer<typeof revisionDetailDtoSchema>;
export const revisionVerificationDtoSchema = z.object({ pdfMatches: z.boolean().nullable(), snapshotMatches: z.boolean().nullable() });
export type RevisionVerificationDto = z.infer<typeof revisionVerificationDtoSchema>;
