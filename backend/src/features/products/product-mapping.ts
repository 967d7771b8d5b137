import { evidenceRange } from '@mantlet/common';
import type { Evidence, ProductDto, ProductInput, ProductSummaryDto } from '@mantlet/common';
import { canonicalJson, sha256 } from '../../shared/canonical-json.js';
import { changesBetween } from '../audit/audit.service.js';
import type { Change } from '../audit/audit.service.js';
import type { Product } from './product.entity.js';

export const inputFields = [
  'name', 'maker', 'kind', 'invented', 'evidenceReference', 'evidenceEdition', 'evidenceExpiresOn', 'evidenceStandard',
  'curves', 'environments', 'supply', 'note',
] as const satisfies readonly (keyof ProductInput)[];

/** today by UTC, as the expiry dates are read */
const today = (): string => new Date().toISOString().slice(0, 10);

function withoutEvidence(product: Product): Omit<ProductDto, 'evidence'> {
  const { id, projectId, version, evidenceFileName, evidenceFileSha256, evidenceFileBytes } = product;
  const input = Object.fromEntries(inputFields.map((field) => [field, product[field]])) as Omit<ProductInput, 'evidence'>;
  return {
    ...input, id, projectId, version,
    // valid through its last day
    expired: product.evidenceExpiresOn < today(),
    evidenceFile: evidenceFileName && evidenceFileSha256 ? { name: evidenceFileName, bytes: evidenceFileBytes ?? 0, sha256: evidenceFileSha256 } : null,
  };
}

export const toProductDto = (product: Product): ProductDto => ({ ...withoutEvidence(product), evidence: product.evidence });

/** A product as those see it who neither keep the library nor work on a project that uses it: what it costs is not theirs to know. */
export const withoutRates = <T extends Pick<ProductDto, 'supply'>>(product: T): T => ({ ...product, supply: { ...product.supply, materialRate: null, labourRate: null } });

export const toProductSummaryDto = (product: Product, usedByZones: number): ProductSummaryDto =>
  ({ ...withoutEvidence(product), form: product.evidence.form, range: evidenceRange(product.evidence), usedByZones });

/** What changed, for the trail. Evidence is large: it is told by what it holds and its digest. */
export function productChanges(before: Partial<ProductInput>, after: ProductInput): Change[] {
  const plain = changesBetween<ProductInput>(before, after, inputFields);
  const old = before.evidence ? evidenceInWords(before.evidence) : null;
  const next = evidenceInWords(after.evidence);
  return old === next ? plain : [...plain, { field: 'evidence', old, new: next }];
}

function evidenceInWords(evidence: Evidence): string {
  const digest = sha256(canonicalJson(evidence)).slice(0, 16);
  if (evidence.form === 'table') return `${count(evidence.tables.length, 'thickness table')} (SHA-256 ${digest}…)`;
  if (evidence.form === 'regression') return `${count(evidence.fits.length, 'regression')} (SHA-256 ${digest}…)`;
  return `thermal properties (SHA-256 ${digest}…)`;
}

export const count = (n: number, what: string): string => `${n} ${what}${n === 1 ? '' : 's'}`;
