import { App, ConfigProvider } from 'antd';
import { createContext, useContext, useEffect, useLayoutEffect, useMemo, useState } from 'react';
import type { ReactNode } from 'react';
import { antdTheme } from './antd-theme.js';
import { dark, light, paletteCss } from './palette.js';
import { styleNonce } from './style-nonce.js';

export const themeChoices = ['system', 'light', 'dark'] as const;
export type ThemeChoice = (typeof themeChoices)[number];
const storageKey = 'mantlet.theme';

interface ThemeState { choice: ThemeChoice; ground: 'light' | 'dark'; choose: (choice: ThemeChoice) => void }
const ThemeContext = createContext<ThemeState>({ choice: 'system', ground: 'light', choose: () => undefined });
/** The chosen theme, the ground it comes to, and how to change it. Remembered on this device. */
export const useTheme = () => useContext(ThemeContext);

function remembered(): ThemeChoice {
  try {
    const kept = localStorage.getItem(storageKey);
    return themeChoices.find((c) => c === kept) ?? 'system';
  } catch {
    return 'system'; // storage may be forbidden; the system's wish then stands
  }
}
const darkWanted = () => window.matchMedia('(prefers-color-scheme: dark)');
const stillWanted = () => window.matchMedia('(prefers-reduced-motion: reduce)');

/** Follows a wish of the system while the page is open. */
function useWish(wish: () => MediaQueryList): boolean {
  const [holds, setHolds] = useState(() => wish().matches);
  useEffect(() => {
    const query = wish();
    const follow = () => setHolds(query.matches);
    query.addEventListener('change', follow);
    return () => query.removeEventListener('change', follow);
  }, [wish]);
  return holds;
}

export function ThemeProvider({ children }: { children: ReactNode }) {
  const [choice, setChoice] = useState(remembered);
  const systemDark = useWish(darkWanted);
  const still = useWish(stillWanted);
  const ground = choice === 'system' ? (systemDark ? 'dark' : 'light') : choice;
  useLayoutEffect(() => { document.documentElement.dataset['ground'] = ground; }, [ground]);
  const state = useMemo<ThemeState>(() => ({
    choice, ground,
    choose: (next) => {
      setChoice(next);
      try { localStorage.setItem(storageKey, next); } catch { /* kept for this visit only */ }
    },
  }), [choice, ground]);
  const config = useMemo(() => {
    const theme = antdTheme(ground === 'dark' ? dark : light);
    // a list that waits for the end of a motion that styles cut short would stay off the page: without motion nothing waits
    return still ? { ...theme, token: { ...theme.token, motion: false } } : theme;
  }, [ground, still]);
  return (
    <ThemeContext value={state}>
      <style nonce={styleNonce}>{paletteCss}</style>
      <ConfigProvider theme={config} {...(styleNonce ? { csp: { nonce: styleNonce } } : {})} button={{ autoInsertSpace: false }} wave={{ disabled: true }}>
        <App component={false}>{children}</App>
      </ConfigProvider>
    </ThemeContext>
  );
}
