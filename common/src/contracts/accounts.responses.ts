import { z } from 'zod';
import { caughtMailIdSchema, linkPurposes, sessionIdSchema } from './accounts.js';
import { idSchema } from './primitives.js';

export const meDtoSchema = z.object({ id: idSchema, name: z.string(), email: z.string(), administrator: z.boolean() });
export type MeDto = z.infer<typeof meDtoSchema>;
export const sessionDtoSchema = z.object({
  user: meDtoSchema.nullable(),
  /** nobody has an account yet */
  needsSetUp: z.boolean(),
  /** mail does not leave this server: it can be read on a page of its own */
  caughtMail: z.boolean(),
});
export type SessionDto = z.infer<typeof sessionDtoSchema>;

/** invited: has not chosen a password yet */
export const accountStates = ['invited', 'active', 'disabled'] as const;
export type AccountState = (typeof accountStates)[number];
export const userDtoSchema = meDtoSchema.extend({
  state: z.enum(accountStates),
  lastSignedInAt: z.string().nullable(),
  /** until when the newest invitation can be accepted; null once it was */
  invitationExpiresAt: z.string().nullable(),
  /** a sentence, where the last mail to this person did not leave */
  mailFailure: z.string().nullable(),
});
export type UserDto = z.infer<typeof userDtoSchema>;

/** One of a person's own sessions. */
export const ownSessionDtoSchema = z.object({
  id: sessionIdSchema,
  /** browser and system, as far as the browser says */
  device: z.string(),
  startedAt: z.string().nullable(),
  lastSeenAt: z.string(),
  /** the one that asks */
  current: z.boolean(),
});
export type OwnSessionDto = z.infer<typeof ownSessionDtoSchema>;

/** Whose link it is; told to whoever holds it. */
export const accountLinkDtoSchema = z.object({ purpose: z.enum(linkPurposes), name: z.string(), email: z.string(), expiresAt: z.string() });
export type AccountLinkDto = z.infer<typeof accountLinkDtoSchema>;

export const caughtMailDtoSchema = z.object({ id: caughtMailIdSchema, at: z.string(), to: z.string(), subject: z.string() });
export type CaughtMailDto = z.infer<typeof caughtMailDtoSchema>;
export const caughtMailTextDtoSchema = caughtMailDtoSchema.extend({ text: z.string() });
export type CaughtMailTextDto = z.infer<typeof caughtMailTextDtoSchema>;
