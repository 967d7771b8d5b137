import '@testing-library/jest-dom/vitest';
import { cleanup, configure } from '@testing-library/react';
import { afterEach, vi } from 'vitest';

// slow shared machines: a test fails on what it sees, not on the clock
configure({ asyncUtilTimeout: 15_000 });
vi.setConfig({ testTimeout: 90_000 });

/** What antd asks of a browser and jsdom does not have. */
window.matchMedia ??= (query: string) => ({
  matches: false, media: query, onchange: null, addEventListener: () => undefined, removeEventListener: () => undefined,
  addListener: () => undefined, removeListener: () => undefined, dispatchEvent: () => false,
}) as MediaQueryList;
class NoResize { observe() { /* jsdom lays nothing out */ } unobserve() { /* same */ } disconnect() { /* same */ } }
globalThis.ResizeObserver ??= NoResize as typeof ResizeObserver;
Element.prototype.scrollIntoView ??= () => undefined;
window.scrollTo = () => undefined;
// jsdom refuses pseudo-element styles, which antd reads to measure scroll bars
const computed = window.getComputedStyle.bind(window);
window.getComputedStyle = (element: Element) => computed(element);

afterEach(() => { cleanup(); vi.unstubAllGlobals(); });
