import { z } from 'zod';
import type { MemberResultDto } from './assessment.responses.js';
import type { CriticalTemperatureBasis, MemberType } from './actions.js';
import type { Exposure, FireCurve, NominalCurve, ProtectionForm } from './fire.js';
import type { AcceptanceDto } from './members.responses.js';
import type { Evidence, ProductKind, ProductSupply } from './products.js';
import type { OpenItemDto } from './projects.responses.js';
import type { PurchaseDto, QuantityLineDto, QuantitySplitDto } from './quantities.responses.js';
import type { ProjectSettings, TargetPolicy } from './settings.js';
import type { ZoneTargetDto } from './zones.responses.js';
import { codeSchema, noteSchema } from './primitives.js';

export const revisionStates = ['draft', 'prepared', 'checked', 'issued', 'superseded'] as const;
export type RevisionState = (typeof revisionStates)[number];
export const revisionStateNames: Record<RevisionState, string> = {
  draft: 'Draft', prepared: 'Prepared', checked: 'Checked', issued: 'Issued', superseded: 'Superseded',
};
export const revisionInputSchema = z.object({ code: codeSchema, purpose: noteSchema.default('') });
export type RevisionInput = z.infer<typeof revisionInputSchema>;
/** was: what the form showed when it was opened; refused where that no longer stands. */
export const revisionUpdateSchema = revisionInputSchema.extend({ was: revisionInputSchema.optional() });
export type RevisionUpdate = z.infer<typeof revisionUpdateSchema>;
export const returnInputSchema = z.object({ comment: z.string().trim().min(3, 'say what must change').max(2000) });
export type ReturnInput = z.infer<typeof returnInputSchema>;

/** The next code after those in use: the last number counted up in the same pattern, P01 for the first. */
export function suggestRevisionCode(codes: readonly string[]): string {
  let best: { prefix: string; number: number; width: number } | null = null;
  for (const code of codes) {
    const found = /^(.*?)(\d+)$/.exec(code);
    if (!found) continue;
    const [, prefix = '', digits = ''] = found;
    const number = Number(digits);
    if (Number.isSafeInteger(number + 1) && (!best || number >= best.number)) best = { prefix, number, width: digits.length };
  }
  return best ? `${best.prefix}${String(best.number + 1).padStart(best.width, '0')}` : 'P01';
}

/**
 * What a revision says, frozen when it is prepared: the PDF, the contractor's page and any comparison read this and nothing else.
 * Everything is by value; ids serve to link parts of the snapshot to each other.
 */
export interface ScheduleSnapshot {
  format: 1;
  project: { id: string; number: string; name: string; place: string; currency: string };
  revision: { id: string; code: string; purpose: string };
  takenAt: string;
  settings: ProjectSettings;
  levels: SnapshotLevel[];
  zones: SnapshotZone[];
  products: SnapshotProduct[];
  members: SnapshotMember[];
  quantities: SnapshotQuantities;
  blockers: OpenItemDto[];
  warnings: OpenItemDto[];
}
export interface SnapshotLevel { id: string; code: string; name: string; elevationM: number; heightM: number }
export interface SnapshotZone {
  id: string; levelId: string; code: string; name: string; periodMin: number; curve: FireCurve; reference: string; environment: string;
  targetPolicy: TargetPolicy;
  systems: { memberType: MemberType; productId: string }[];
  targets: ZoneTargetDto[];
}
export interface SnapshotProduct {
  id: string; name: string; maker: string; kind: ProductKind; invented: boolean;
  evidenceReference: string; evidenceEdition: string; evidenceExpiresOn: string; evidenceStandard: string;
  evidenceForm: Evidence['form'];
  /** digest of the assessed data as used, and of the uploaded report where there is one */
  evidenceSha256: string; evidenceFileSha256: string | null;
  curves: NominalCurve[]; environments: string[]; supply: ProductSupply; note: string;
}
export interface SnapshotMember {
  id: string; mark: string; zoneId: string; memberType: MemberType; section: string; grade: string; lengthMm: number; quantity: number;
  exposure: Exposure; protectionForm: ProtectionForm; coatBackConnections: number; coatBackGirthMm: number; deductionM2: number; onSite: boolean; note: string;
  basis: CriticalTemperatureBasis; basisSetBy: string | null; basisSetAt: string | null;
  acceptances: AcceptanceDto[];
  result: MemberResultDto | null;
  /** net protected area of all its pieces */
  areaM2: number | null;
  inputsHash: string | null;
}
export interface SnapshotQuantities {
  lines: QuantityLineDto[];
  byLevelAndProduct: QuantitySplitDto;
  purchases: PurchaseDto[];
  /** whole packages where each floor is delivered by itself; absent from records frozen before this was kept */
  purchasesByLevel?: PurchaseDto[];
  markUpPercent: string; markUp: string | null; totalWithMarkUp: string | null;
}
