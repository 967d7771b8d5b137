/** Streams of changes, and work that goes on in the background. */
export const liveMessages = {
  'live.not-a-stream': (_: Record<string, never>) =>
    'This address sends changes as they happen, to a page that listens (Accept: text/event-stream). Open the project in Mantlet instead.',
  'live.too-many': (p: { windows: number }) =>
    `This browser follows changes in ${p.windows} windows already. Close one of them, and this page follows again by itself.`,
  'live.unavailable': (_: Record<string, never>) => 'Changes cannot be followed at the moment. The page tries again by itself.',
};
