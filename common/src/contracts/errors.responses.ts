import { z } from 'zod';

/** What every error answer carries: a sentence, its code, and the fields it concerns. */
export const errorDtoSchema = z.object({
  message: z.string(),
  code: z.string(),
  issues: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
  /** the version on the server, where a stale one was sent; who saved it, and when */
  current: z.unknown().optional(),
  by: z.string().optional(),
  at: z.string().optional(),
});
export type ErrorDto = z.infer<typeof errorDtoSchema>;
