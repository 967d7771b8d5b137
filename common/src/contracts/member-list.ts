import { z } from 'zod';
import { criticalTemperatureWays, memberTypes, steelGrades } from './actions.js';
import { verdictKinds } from './assessment.js';
import { exposureArrangements, protectionForms } from './fire.js';
import { idSchema, nameSchema } from './primitives.js';
import { sectionFamilies } from './sections.js';

const most = 500;
/** In an address a list stands comma-separated. */
const list = <T extends z.ZodType>(item: T) =>
  z.preprocess((v) => (typeof v === 'string' ? v.split(',').filter(Boolean) : v), z.array(item).max(most, `has more than ${most} values`)).optional();
const number = z.preprocess(
  (v) => (typeof v === 'string' && v.trim() !== '' ? Number(v) : v), z.number({ error: 'must be a number' }).min(-1e6, 'is too small').max(1e6, 'is too large')).optional();
const yes = z.enum(['true', 'false']).optional();

/** What narrows the list of members. A range is above its lower limit and up to its upper one. */
export const memberNarrowingSchema = z.object({
  search: z.string().trim().max(100, 'is longer than 100 characters').optional(),
  levelIds: list(idSchema),
  zoneIds: list(idSchema),
  memberTypes: list(z.enum(memberTypes)),
  families: list(z.enum(sectionFamilies)),
  sectionIds: list(idSchema),
  grades: list(z.enum(steelGrades)),
  exposures: list(z.enum(exposureArrangements)),
  protectionForms: list(z.enum(protectionForms)),
  periods: list(z.coerce.number().int().min(1).max(1000)),
  productIds: list(idSchema),
  verdicts: list(z.enum(verdictKinds)),
  ways: list(z.enum(criticalTemperatureWays)),
  memberIds: list(idSchema),
  /** something keeps the schedule from being prepared */
  open: yes,
  /** rests on an assumed temperature that nobody accepted */
  assumed: yes,
  /** carries an acceptance that still stands */
  accepted: yes,
  sectionFactorAbove: number, sectionFactorUpTo: number,
  criticalTemperatureAbove: number, criticalTemperatureUpTo: number,
  /** mm, whatever the product is measured in */
  thicknessAbove: number, thicknessUpTo: number,
  utilisationAbove: number, utilisationUpTo: number,
  /** m */
  lengthAbove: number, lengthUpTo: number,
});
export type MemberNarrowing = z.infer<typeof memberNarrowingSchema>;

export const memberSortKeys = [
  'mark', 'level', 'zone', 'type', 'section', 'family', 'grade', 'length', 'quantity', 'exposure', 'form', 'sectionFactor', 'criticalTemperature', 'way',
  'thickness', 'applied', 'product', 'area', 'period', 'utilisation', 'verdict',
] as const;
export type MemberSortKey = (typeof memberSortKeys)[number];

export const memberQuerySchema = memberNarrowingSchema.extend({
  sort: z.enum(memberSortKeys).default('mark'),
  direction: z.enum(['asc', 'desc']).default('asc'),
  page: z.coerce.number().int().min(1).max(100_000).default(1),
  pageSize: z.coerce.number().int().min(1).max(500).default(100),
});
export type MemberQuery = z.infer<typeof memberQuerySchema>;

/** A list somebody keeps for themselves: filter, order and columns as the address has them. */
export const memberViewInputSchema = z.object({
  name: nameSchema.max(60, 'is longer than 60 characters'),
  query: z.string().max(4000, 'is longer than 4000 characters').regex(/^[\x20-\x7e]*$/, 'is not the query of an address'),
});
export type MemberViewInput = z.infer<typeof memberViewInputSchema>;
export const mostMemberViews = 50;
