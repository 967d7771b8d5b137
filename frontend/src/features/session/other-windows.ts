import { leaveUnsaved } from '../../ui/form/use-unsaved-changes.js';

const key = 'mantlet.signed-in';

/** Windows of one browser share its session: whoever signs in in one is signed in in all. */
export function tellOtherWindows(userId: string): void {
  try { localStorage.setItem(key, userId); } catch { /* they learn of it when they next ask the server */ }
}

/** Calls when another window says who is signed in now. @returns what ends it */
export function onSignedInElsewhere(listener: (userId: string) => void): () => void {
  const heard = (event: StorageEvent) => { if (event.key === key && event.newValue) listener(event.newValue); };
  window.addEventListener('storage', heard);
  return () => window.removeEventListener('storage', heard);
}

/** Somebody else is signed in: nothing of whoever was here stays on the page. What they typed is among their own drafts. */
export function leaveToSomebodyElse(): void {
  leaveUnsaved();
  window.location.replace('/projects');
}
