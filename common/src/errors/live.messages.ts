/** Streams of changes, and work that goes on in the background. */
export const liveMessages = {
  'live.not-a-stream': (_: Record<string, never>) =>
    'This address sends changes as they happen, to a page that listens (Accept: text/event-stream). Open the project in Mantlet instead.',
  'live.too-many': (p: { windows: number }) =>
    `This browser follows changes in ${p.windows} windows already. Close one of them, and this page follows again by itself.`,
  'live.too-many-in-all': (p: { windows: number }) =>
    `You follow changes in ${p.windows} windows already, on all your devices together. Close some of them, or end sessions you no longer use, and this page follows again by itself.`,
  'live.unavailable': (_: Record<string, never>) => 'Changes cannot be followed at the moment. The page tries again by itself.',
  'job.failed': (p: { done: number; total: number }) =>
    `${p.done} of ${p.total} members are recalculated; then it failed. Try again, and tell the administrator if it fails again.`,
  'job.not-failed': (_: Record<string, never>) => 'This has not failed: it is under way or done. Nothing was changed.',
  'job.recalculating': (p: { members: number }) =>
    `${p.members === 1 ? '1 member is' : `${p.members} members are`} being recalculated, so this would be incomplete. Try again when it is done.`,
};
