import type { LinkPurpose } from '../contracts/accounts.js';
import { mailFailures, mailNames } from '../contracts/mail.js';
import type { MailFailure, MailTemplate } from '../contracts/mail.js';

export const accountMessages = {
  'account.sign-in-failed': (_: Record<string, never>) => 'The e-mail address and password do not belong together.',
  'account.signed-out': (_: Record<string, never>) => 'You are not signed in, or your session has ended. Sign in to go on.',
  'account.set-up-already': (_: Record<string, never>) => 'This installation already has an administrator. Sign in instead.',
  'account.mail-elsewhere': (_: Record<string, never>) =>
    'Caught mail opens every account, so it can be read at the machine that Mantlet runs on only, under its address there. For work with others, have its administrator name a mail server.',
  'account.link-ended': (p: { purpose: LinkPurpose }) =>
    p.purpose === 'invitation'
      ? 'This invitation has expired, was used or replaced already, or its link is not complete. Ask the administrator of this installation to send it again.'
      : 'This link has expired, was used already, or is not complete. Ask for a new one; each can be used once, within an hour.',
  'account.invitation-over': (p: { name: string }) => `${p.name} has no open invitation: the account is in use or closed.`,
  'account.too-many-attempts': (p: { seconds: number }) =>
    `Too many attempts. Wait ${p.seconds <= 60 ? 'a minute' : `${Math.ceil(p.seconds / 60)} minutes`} and try again.`,
  'mail.not-sent': (p: { what: MailTemplate; reason: MailFailure }) => `${mailNames[p.what]} could not be sent: ${mailFailures[p.reason]}.`,
};
