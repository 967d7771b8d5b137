import { z } from 'zod';
import { nameSchema } from './primitives.js';

/** Roles a person may hold on a project; several at once. */
export const roles = ['fire-engineer', 'structural-engineer', 'specifier', 'contractor', 'inspector', 'reader'] as const;
export type Role = (typeof roles)[number];
export const roleNames: Record<Role, string> = {
  'fire-engineer': 'Fire engineer', 'structural-engineer': 'Structural engineer', specifier: 'Specifier',
  contractor: 'Contractor', inspector: 'Inspector', reader: 'Reader',
};
/** The roles that see work in progress; the others see what is issued. */
export const designRoles = ['fire-engineer', 'structural-engineer', 'specifier'] as const satisfies readonly Role[];

export const emailSchema = z.string().trim().toLowerCase().max(254).pipe(z.email({ error: 'is not an e-mail address' }));
export const passwordSchema = z.string().min(12, 'needs at least 12 characters').max(200);
export const signInSchema = z.object({ email: emailSchema, password: z.string().min(1, 'is needed').max(200) });
export type SignIn = z.infer<typeof signInSchema>;

/** The first visitor of an empty installation makes the administrator's account. */
export const setUpSchema = z.object({ name: nameSchema, email: emailSchema, password: passwordSchema });
export type SetUp = z.infer<typeof setUpSchema>;
/** The administrator gives a name and an address; the person chooses the password by the link that is mailed. */
export const invitationInputSchema = z.object({ name: nameSchema, email: emailSchema, administrator: z.boolean().default(false) });
export type InvitationInput = z.infer<typeof invitationInputSchema>;
export const userUpdateSchema = z.object({ name: nameSchema, administrator: z.boolean(), disabled: z.boolean() });
export type UserUpdate = z.infer<typeof userUpdateSchema>;
export const passwordChangeSchema = z.object({ current: z.string().min(1, 'is needed').max(200), next: passwordSchema });
export type PasswordChange = z.infer<typeof passwordChangeSchema>;

/** A link that was mailed: to begin an account, or to choose another password. */
export const linkPurposes = ['invitation', 'password-reset'] as const;
export type LinkPurpose = (typeof linkPurposes)[number];
export const resetRequestSchema = z.object({ email: emailSchema });
export type ResetRequest = z.infer<typeof resetRequestSchema>;
export const accountLinkSchema = z.object({ purpose: z.enum(linkPurposes), token: z.string().min(1, 'is needed').max(200) });
export type AccountLink = z.infer<typeof accountLinkSchema>;
export const accountLinkUseSchema = accountLinkSchema.extend({ password: passwordSchema });
export type AccountLinkUse = z.infer<typeof accountLinkUseSchema>;
/** A session is named by a digest: what is in the cookie never leaves it. */
export const sessionIdSchema = z.string().regex(/^[0-9a-f]{64}$/, 'is not a session');
export const caughtMailIdSchema = z.string().regex(/^[0-9]{13}-[0-9a-f]{8}$/, 'is not a mail');
