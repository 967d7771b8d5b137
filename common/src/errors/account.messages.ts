export const accountMessages = {
  'account.sign-in-failed': (_: Record<string, never>) => 'The e-mail address and password do not belong together.',
  'account.signed-out': (_: Record<string, never>) => 'You are not signed in, or your session has ended. Sign in to go on.',
  'account.set-up-already': (_: Record<string, never>) => 'This installation already has an administrator. Sign in instead.',
};
