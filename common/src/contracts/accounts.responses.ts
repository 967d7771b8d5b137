import { z } from 'zod';
import { idSchema } from './primitives.js';

export const meDtoSchema = z.object({ id: idSchema, name: z.string(), email: z.string(), administrator: z.boolean() });
export type MeDto = z.infer<typeof meDtoSchema>;
export const sessionDtoSchema = z.object({
  user: meDtoSchema.nullable(),
  /** nobody has an account yet */
  needsSetUp: z.boolean(),
});
export type SessionDto = z.infer<typeof sessionDtoSchema>;
export const userDtoSchema = meDtoSchema.extend({ disabled: z.boolean(), lastSignedInAt: z.string().nullable() });
export type UserDto = z.infer<typeof userDtoSchema>;
