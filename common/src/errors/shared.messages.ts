/** Said anywhere. Sentences say what is wrong, where, and what to do. */
export const sharedMessages = {
  'shared.invalid': (p: { where: string; problem: string }) => `${p.where}: ${p.problem}`,
  'shared.not-found': (p: { what: string }) => `There is no such ${p.what}, or it is not yours to see.`,
  'shared.forbidden': (p: { who: string; what: string }) => `Only ${p.who} may ${p.what}.`,
  'shared.stale': (p: { what: string }) =>
    `Somebody else saved this ${p.what} after you opened it. Compare the two versions and save again.`,
  'shared.exists': (p: { what: string; name: string }) => `There already is a ${p.what} "${p.name}".`,
  'shared.in-use': (p: { what: string; by: string }) => `This ${p.what} is used by ${p.by}; change that first.`,
  'shared.unexpected': (_: Record<string, never>) =>
    'Something went wrong on the server. Nothing was changed; try again, and tell the administrator if it stays.',
  'shared.too-many-requests': (_: Record<string, never>) => 'Too many attempts. Wait a minute and try again.',
};
