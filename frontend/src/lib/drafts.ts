import { z } from 'zod';

/**
 * What was typed and not saved, kept in this browser for its own person: it outlives a reload, an ended session and a closed window.
 * Where the browser refuses to store (no room, or storage switched off), forms work as before and nothing is kept.
 */
const draftSchema = z.object({
  /** as people call the form: "Zone Z1" */
  title: z.string(),
  /** when it was last typed in, ISO 8601 */
  at: z.iso.datetime(),
  /** what the form showed when it was opened */
  base: z.record(z.string(), z.unknown()),
  values: z.record(z.string(), z.unknown()),
});
export type Draft = z.infer<typeof draftSchema>;

const dayMs = 86_400_000;
export const keptDays = 7;
const prefix = 'mantlet.draft.';
const keyOf = (owner: string, form: string) => `${prefix}${owner}.${form}`;

function keys(start: string): string[] {
  try {
    return Array.from({ length: localStorage.length }, (_, i) => localStorage.key(i)).filter((key): key is string => key?.startsWith(start) ?? false);
  } catch {
    return [];
  }
}

function read(key: string): Draft | null {
  try {
    const text = localStorage.getItem(key);
    const draft = text === null ? null : draftSchema.safeParse(JSON.parse(text));
    return draft?.success ? draft.data : null;
  } catch {
    return null;
  }
}

function drop(key: string): void {
  try { localStorage.removeItem(key); } catch { /* nothing was kept either */ }
}

export const readDraft = (owner: string, form: string): Draft | null => read(keyOf(owner, form));
export const forgetDraft = (owner: string, form: string): void => drop(keyOf(owner, form));

/** @returns whether it is kept */
export function keepDraft(owner: string, form: string, draft: Draft): boolean {
  try {
    localStorage.setItem(keyOf(owner, form), JSON.stringify(draft));
    return true;
  } catch {
    return false;
  }
}

/** What this person left in this browser, newest first. */
export const draftsOf = (owner: string): Draft[] =>
  keys(`${prefix}${owner}.`).flatMap((key) => read(key) ?? []).sort((a, b) => b.at.localeCompare(a.at));
export const forgetDraftsOf = (owner: string): void => keys(`${prefix}${owner}.`).forEach(drop);

/** Drops everybody's drafts that are older than seven days, or cannot be read. */
export function pruneDrafts(now = Date.now()): void {
  for (const key of keys(prefix)) {
    const draft = read(key);
    if (!draft || now - Date.parse(draft.at) > keptDays * dayMs) drop(key);
  }
}
