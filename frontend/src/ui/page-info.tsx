import { createContext, useContext, useEffect, useMemo, useState } from 'react';
import type { ReactNode } from 'react';
import type { StatusKind } from './status-word.js';

/** What a page tells the title strip about itself. */
export interface PageInfo {
  title: string;
  state?: { word: string; kind: StatusKind; /** the revision that the page shows, where it is not the project's current one */ revision?: string | undefined } | undefined;
}
interface Store { info: PageInfo; set: (info: PageInfo) => void }
const PageInfoContext = createContext<Store>({ info: { title: '' }, set: () => undefined });

export function PageInfoProvider({ children }: { children: ReactNode }) {
  const [info, set] = useState<PageInfo>({ title: '' });
  const store = useMemo(() => ({ info, set }), [info]);
  return <PageInfoContext value={store}>{children}</PageInfoContext>;
}
export const usePageInfo = () => useContext(PageInfoContext).info;

/** Sets the strip's page and state and the browser's title: "Members · Tern Quay Library · Mantlet", "G-B4 · Members · Tern Quay Library · Mantlet". */
export function useTitle(title: string, projectName?: string, state?: PageInfo['state'], trail?: readonly string[]): void {
  const { set } = useContext(PageInfoContext);
  const word = state?.word;
  const kind = state?.kind;
  const revision = state?.revision;
  const words = (trail ?? [title]).join(' · ');
  useEffect(() => {
    set({ title, state: word && kind ? { word, kind, revision } : undefined });
    document.title = [words, projectName, 'Mantlet'].filter(Boolean).join(' · ');
  }, [set, title, words, projectName, word, kind, revision]);
}
