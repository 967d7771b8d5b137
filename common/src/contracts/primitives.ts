import { z } from 'zod';

/** What many contracts share: identifiers, trimmed text, and numbers that are really numbers. */
export const idSchema = z.uuid();
export const nameSchema = z.string().trim().min(1, 'is needed').max(200, 'is longer than 200 characters');
export const codeSchema = z.string().trim().min(1, 'is needed').max(60, 'is longer than 60 characters');
export const noteSchema = z.string().trim().max(2000, 'is longer than 2000 characters');
/** Each limit says itself; a message given to z.number alone would be said of every limit as well. */
function numberSentence(issue: z.core.$ZodRawIssue): string | undefined {
  if (issue.code === 'too_big') return `must be ${issue.inclusive ? 'at most' : 'below'} ${String(issue.maximum)}`;
  if (issue.code === 'too_small') return `must be ${issue.inclusive ? 'at least' : 'above'} ${String(issue.minimum)}`;
  return issue.code === 'invalid_type' ? 'must be a number' : undefined;
}
export const numberSchema = z.number({ error: numberSentence });
export const positiveSchema = numberSchema.positive('must be above 0');
export const nonNegativeSchema = numberSchema.min(0, 'must not be below 0');
/** Money and rates travel as decimal strings, never as binary floats. */
export const decimalSchema = z.string().regex(/^-?\d{1,12}(\.\d{1,6})?$/, 'must be an amount such as 12.50');
export const dateSchema = z.string().regex(/^\d{4}-\d{2}-\d{2}$/, 'must be a date such as 2026-11-30');
/** Sent back with every edit; a stale one is refused so that nobody overwrites another's change unseen. */
export const versionSchema = z.number().int().min(1);

export interface Page<T> {
  items: T[];
  total: number;
  page: number;
  pageSize: number;
}
export const pageSchema = <T extends z.ZodType>(item: T) => z.object({ items: z.array(item), total: z.number(), page: z.number(), pageSize: z.number() });

/** µm for coatings, mm for boards and sprays */
export const thicknessUnits = ['µm', 'mm'] as const;
