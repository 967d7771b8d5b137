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
  'shared.busy': (_: Record<string, never>) => 'Somebody else was changing the same things at that moment. Nothing was changed; try again.',
  'shared.took-too-long': (_: Record<string, never>) => 'This took longer than the server allows. Nothing was changed; try again, with less at once if it stays.',
  'shared.too-large': (p: { what: 'file' | 'input' }) => `The ${p.what} is larger than is accepted here. Nothing was changed; send less at once.`,
  'shared.unreadable': (_: Record<string, never>) => 'The request could not be read: its address or its content is malformed. Nothing was changed; reload the page and try again.',
  'shared.upload-unreadable': (_: Record<string, never>) =>
    'The upload could not be read. Nothing was changed; choose one file, with an ordinary name, and send it again.',
  'shared.too-many-requests': (_: Record<string, never>) => 'Too many attempts. Wait a minute and try again.',
};
