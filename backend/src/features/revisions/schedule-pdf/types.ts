import type { RevisionState, ScheduleSnapshot, SignatureDto } from '@mantlet/common';

/** Who stands behind the revision, and how far it has come; not in the snapshot, because it is known later. */
export interface PdfSignatures {
  state: RevisionState;
  prepared: SignatureDto | null;
  checked: SignatureDto | null;
  issued: SignatureDto | null;
}
/** All that the PDF is made of. Plain data, so that it can be sent to a worker thread. */
export interface SchedulePdfInput {
  snapshot: ScheduleSnapshot;
  /** null for a draft: nothing is frozen */
  snapshotSha256: string | null;
  signatures: PdfSignatures;
}
