import { useVirtualizer, useWindowVirtualizer } from '@tanstack/react-virtual';
import type { Virtualizer } from '@tanstack/react-virtual';
import { useEffect, useLayoutEffect, useRef, useState, useSyncExternalStore } from 'react';
import type { RefObject } from 'react';

const narrowly = '(max-width: 760px)';
const watch = (changed: () => void) => {
  const media = window.matchMedia(narrowly);
  media.addEventListener('change', changed);
  return () => media.removeEventListener('change', changed);
};
const rowHeight = { wide: 34, narrow: 62 };

interface Place { search: string; index: number; top: number }
const keyOf = (name: string) => `mantlet:place:${name}`;
function takePlace(name: string, search: string): Place | null {
  try {
    const place = JSON.parse(sessionStorage.getItem(keyOf(name)) ?? 'null') as Place | null;
    sessionStorage.removeItem(keyOf(name));
    return place?.search === search ? place : null;
  } catch { return null; }
}

export interface RowWindow {
  narrow: boolean;
  scroller: RefObject<HTMLDivElement | null>;
  virtualizer: Pick<Virtualizer<never, never>, 'getVirtualItems' | 'getTotalSize' | 'scrollToIndex'>;
  /** of the list within the page, where the page itself scrolls */
  margin: number;
  active: number;
  setActive: (index: number) => void;
  /** whether the place that was left is taken up again, focus and all */
  restored: boolean;
  /** remembers row and scroll until this list is opened again in this tab */
  leave: (index: number) => void;
}

/** Which rows are drawn: inside the list on a wide screen, in the page's own scroll on a narrow one. */
export function useRowWindow(name: string, search: string, total: number): RowWindow {
  const narrow = useSyncExternalStore(watch, () => window.matchMedia(narrowly).matches, () => false);
  const scroller = useRef<HTMLDivElement>(null);
  const [place] = useState(() => takePlace(name, search));
  const [active, setActive] = useState(place?.index ?? 0);
  const [margin, setMargin] = useState(0);
  useLayoutEffect(() => { if (narrow && scroller.current) setMargin(scroller.current.getBoundingClientRect().top + window.scrollY); }, [narrow, total]);
  // eslint-disable-next-line react-hooks/incompatible-library -- nothing here is memoised by a compiler; rows are drawn anew at each scroll
  const wide = useVirtualizer({ count: total, enabled: !narrow, getScrollElement: () => scroller.current, estimateSize: () => rowHeight.wide, overscan: 12, scrollPaddingStart: 40 });
  const page = useWindowVirtualizer({ count: total, enabled: narrow, estimateSize: () => rowHeight.narrow, overscan: 8, scrollMargin: margin, scrollPaddingStart: 60 });
  const back = useRef(place);
  useEffect(() => {
    if (!back.current || total === 0) return;
    if (narrow) window.scrollTo({ top: back.current.top });
    else if (scroller.current) scroller.current.scrollTop = back.current.top;
    back.current = null;
  }, [total, narrow]);
  const leave = (index: number) => {
    const top = narrow ? window.scrollY : scroller.current?.scrollTop ?? 0;
    try { sessionStorage.setItem(keyOf(name), JSON.stringify({ search, index, top } satisfies Place)); } catch { /* a browser that keeps nothing still opens the sheet */ }
  };
  return { narrow, scroller, virtualizer: (narrow ? page : wide) as unknown as RowWindow['virtualizer'], margin, active: Math.min(active, Math.max(total - 1, 0)), setActive, restored: place !== null, leave };
}
