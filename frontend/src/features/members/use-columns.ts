import { useState } from 'react';
import { columnKeys, usualColumns } from './components/member-columns.js';

const keyOf = (userId: string) => `mantlet:columns:${userId}`;
function remembered(userId: string): string[] | null {
  try { return columnKeys(localStorage.getItem(keyOf(userId))); } catch { return null; }
}

/** The columns in the address, else those this person chose last on this computer, else the usual ones. */
export function useColumns(userId: string, inAddress: string | null): [string[], (keys: readonly string[]) => void] {
  const [own, setOwn] = useState(() => remembered(userId));
  const remember = (keys: readonly string[]) => {
    setOwn([...keys]);
    try { localStorage.setItem(keyOf(userId), keys.join(',')); } catch { /* not remembered, but shown */ }
  };
  return [columnKeys(inAddress) ?? own ?? [...usualColumns], remember];
}
