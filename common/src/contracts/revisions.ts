import { z } from 'zod';
import type { OpenItemDto } from './projects.js';
import { codeSchema, noteSchema } from './primitives.js';

export const revisionStates = ['draft', 'prepared', 'checked', 'issued', 'superseded'] as const;
export type RevisionState = (typeof revisionStates)[number];
export const revisionStateNames: Record<RevisionState, string> = {
  draft: 'Draft', prepared: 'Prepared', checked: 'Checked', issued: 'Issued', superseded: 'Superseded',
};
export const revisionInputSchema = z.object({ code: codeSchema, purpose: noteSchema.default('') });
export type RevisionInput = z.infer<typeof revisionInputSchema>;
export const returnSchema = z.object({ comment: z.string().trim().min(3, 'say what must change').max(2000) });
export interface SignatureDto { name: string; at: string }
export interface RevisionDto {
  id: string; code: string; purpose: string; state: RevisionState; createdAt: string;
  prepared: SignatureDto | null; checked: SignatureDto | null; issued: SignatureDto | null;
  returnedComment: string | null;
  snapshotSha256: string | null; pdfSha256: string | null; pdfBytes: number | null;
  members: number | null; protectedAreaM2: number | null;
}
/** current says whether results are up to date with their inputs */
export interface ReadinessDto { ready: boolean; blockers: OpenItemDto[]; warnings: OpenItemDto[] }
