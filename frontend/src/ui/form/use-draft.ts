import { createContext, useContext, useEffect, useMemo, useRef, useState } from 'react';
import type { FieldValues, UseFormReturn } from 'react-hook-form';
import { forgetDraft, keepDraft, readDraft } from '../../lib/drafts.js';
import type { Draft } from '../../lib/drafts.js';
import { sameValue } from '../../lib/three-way.js';

/** Whose drafts are read and kept: the person signed in. Without one nothing is kept. */
export const DraftOwner = createContext<string | null>(null);
export const useDraftOwner = (): string | null => useContext(DraftOwner);

const pauseMs = 300;

interface DraftOptions {
  name: string;
  title: string;
  /** the record as it stands while the form is drawn first */
  standing: FieldValues;
  /** what the form showed when it was opened, asked for at each keeping */
  opened: () => FieldValues;
}

export interface DraftKeeping {
  /** left here earlier and not answered yet */
  offered: Draft | null;
  /** whether this browser keeps what is typed */
  kept: boolean;
  /** the offer was taken or refused */
  answered: () => void;
  /** after a save, or for whoever gives up what they typed */
  forget: () => void;
}

/** Keeps what is typed into a form in this browser until it is saved or given up, and offers what was left earlier. */
export function useDraft<In extends FieldValues, Out>(form: UseFormReturn<In, unknown, Out>, { name, title, standing, opened }: DraftOptions): DraftKeeping {
  const owner = useDraftOwner();
  const [offered, setOffered] = useState<Draft | null>(() => {
    const draft = owner === null ? null : readDraft(owner, name);
    return draft && !sameValue(draft.values, standing) ? draft : null;
  });
  const [kept, setKept] = useState(owner !== null);
  const pending = useRef<ReturnType<typeof setTimeout> | null>(null);
  const facts = useRef({ title, opened });
  useEffect(() => { facts.current = { title, opened }; });
  useEffect(() => {
    if (owner === null) return;
    let wrote = false;
    const keep = () => {
      pending.current = null;
      const [base, values] = [facts.current.opened(), form.getValues()];
      if (!sameValue(base, values)) {
        wrote = true;
        setKept(keepDraft(owner, name, { title: facts.current.title, at: new Date().toISOString(), base, values }));
      // back at what it was opened with: nothing to keep. What was left earlier stays until it is answered.
      } else if (wrote) forgetDraft(owner, name);
    };
    const stop = form.subscribe({
      formState: { values: true },
      callback: () => {
        if (pending.current) clearTimeout(pending.current);
        pending.current = setTimeout(keep, pauseMs);
      },
    });
    const now = () => {
      if (!pending.current) return;
      clearTimeout(pending.current);
      keep();
    };
    window.addEventListener('pagehide', now);
    return () => {
      window.removeEventListener('pagehide', now);
      stop();
      now();
    };
  }, [form, name, owner]);
  return useMemo(() => ({
    offered, kept: owner !== null && kept,
    answered: () => setOffered(null),
    forget: () => {
      if (pending.current) clearTimeout(pending.current);
      pending.current = null;
      setOffered(null);
      if (owner !== null) forgetDraft(owner, name);
    },
  }), [offered, kept, name, owner]);
}
