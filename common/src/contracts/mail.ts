/** The mails that the product sends, as a sentence begins with them. */
export const mailNames = {
  invitation: 'The invitation',
  'password-reset': 'The link for another password',
  'password-changed': 'The notice that the password was changed',
  'added-to-team': 'The notice of a project joined',
} as const;
export type MailTemplate = keyof typeof mailNames;

/** Why one did not leave. */
export const mailFailures = {
  'not-set-up': 'this installation has no mail server',
  unreachable: 'the mail server cannot be reached',
  'not-let-in': 'the mail server did not accept this installation’s name and password',
  'address-refused': 'the mail server does not accept this address',
  stopped: 'the server was stopped before it left',
  other: 'the mail server did not take it',
} as const;
export type MailFailure = keyof typeof mailFailures;
