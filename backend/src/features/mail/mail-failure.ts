import type { MailFailure } from '@mantlet/common';

interface SmtpError {
  code?: string;
  command?: string;
  responseCode?: number;
}

/** What went wrong, in one of the few ways that an administrator can do something about. */
export function failureOf(error: unknown): MailFailure {
  const { code, command, responseCode } = error as SmtpError;
  if (code === 'EAUTH') return 'not-let-in';
  if (code === 'EENVELOPE' && command !== 'MAIL FROM') return 'address-refused';
  if (responseCode === undefined && code !== 'EMESSAGE' && code !== 'EPROTOCOL') return 'unreachable';
  return 'other';
}

/** A refusal for good (5xx) or a wrong password will be the same in a minute. */
export function isWorthAnother(error: unknown): boolean {
  const { code, responseCode } = error as SmtpError;
  return code !== 'EAUTH' && (responseCode === undefined || responseCode < 500);
}
