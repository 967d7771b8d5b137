import { App } from 'antd';
import { useEffect } from 'react';
import { useBlocker } from 'react-router-dom';
import { keptDays } from '../../lib/drafts.js';

/** A form with something typed and not saved. */
export interface UnsavedForm {
  title: string;
  /** whether what was typed is kept in this browser when the page is left */
  kept: boolean;
}
/** What is unsaved on the page now. A page has several forms, the router asks one guard only: the forms sign in here. */
const unsaved = new Map<symbol, UnsavedForm>();
const ask = (event: BeforeUnloadEvent) => event.preventDefault();
export const unsavedForms = (): UnsavedForm[] => [...unsaved.values()];

/** For leaving by choice, after it was asked: the browser does not ask a second time. */
export function leaveUnsaved(): void {
  unsaved.clear();
  window.removeEventListener('beforeunload', ask);
}

/** Has the page asked about before it is left: by a link, by the back button, by closing the tab, or by signing out. */
export function useUnsavedChanges(dirty: boolean, title = 'This page', kept = false): void {
  useEffect(() => {
    if (!dirty) return;
    const form = Symbol('form');
    if (unsaved.size === 0) window.addEventListener('beforeunload', ask);
    unsaved.set(form, { title, kept });
    return () => {
      unsaved.delete(form);
      if (unsaved.size === 0) window.removeEventListener('beforeunload', ask);
    };
  }, [dirty, title, kept]);
}

const consequence = () =>
  unsavedForms().every((form) => form.kept)
    ? `What you changed on this page is not saved yet. It is kept in this browser for ${keptDays} days and offered when you open the form again.`
    : 'What you changed on this page is not saved yet, and will be lost.';

/** Stands once in the application, above its pages, and asks for all of their forms. */
export function LeaveGuard(): null {
  const { modal } = App.useApp();
  const blocker = useBlocker(({ currentLocation, nextLocation }) => unsaved.size > 0 && currentLocation.pathname !== nextLocation.pathname);
  useEffect(() => {
    if (blocker.state !== 'blocked') return;
    const dialog = modal.confirm({
      title: 'Leave without saving?', content: consequence(), icon: null,
      okText: 'Leave', cancelText: 'Stay here', onOk: () => blocker.proceed(), onCancel: () => blocker.reset(),
    });
    return () => dialog.destroy();
  }, [blocker, modal]);
  return null;
}
