import { z } from 'zod';
import { idSchema } from './primitives.js';

export const jobKinds = ['recalculation'] as const;
export type JobKind = (typeof jobKinds)[number];
export const jobStates = ['waiting', 'running', 'failed', 'done'] as const;
export type JobState = (typeof jobStates)[number];

/** Work that goes on in the background and is not over, or failed. */
export const jobDtoSchema = z.object({
  id: idSchema,
  kind: z.enum(jobKinds),
  state: z.enum(jobStates),
  /** members to be worked out, and how many of them are */
  total: z.number().int(),
  done: z.number().int(),
  /** what is expected to be left, from what was done so far; null before anything is */
  secondsLeft: z.number().nullable(),
  /** nobody works off the queue at present */
  withoutWorker: z.boolean(),
  /** why it failed, and what to do */
  error: z.string().nullable(),
});
export type JobDto = z.infer<typeof jobDtoSchema>;
