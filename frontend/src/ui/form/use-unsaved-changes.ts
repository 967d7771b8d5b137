import { App } from 'antd';
import { useEffect } from 'react';
import { useBlocker } from 'react-router-dom';

/** What is unsaved on the page now. A page has several forms, the router asks one guard only: the forms sign in here. */
const unsaved = new Set<symbol>();
const ask = (event: BeforeUnloadEvent) => event.preventDefault();

/** Has the page asked about before it is left: by a link, by the back button, or by closing the tab. */
export function useUnsavedChanges(dirty: boolean): void {
  useEffect(() => {
    if (!dirty) return;
    const form = Symbol('form');
    if (unsaved.size === 0) window.addEventListener('beforeunload', ask);
    unsaved.add(form);
    return () => {
      unsaved.delete(form);
      if (unsaved.size === 0) window.removeEventListener('beforeunload', ask);
    };
  }, [dirty]);
}

/** Stands once in the application, above its pages, and asks for all of their forms. */
export function LeaveGuard(): null {
  const { modal } = App.useApp();
  const blocker = useBlocker(({ currentLocation, nextLocation }) => unsaved.size > 0 && currentLocation.pathname !== nextLocation.pathname);
  useEffect(() => {
    if (blocker.state !== 'blocked') return;
    const dialog = modal.confirm({
      title: 'Leave without saving?', content: 'What you changed on this page is not saved yet.', icon: null,
      okText: 'Leave', cancelText: 'Stay here', onOk: () => blocker.proceed(), onCancel: () => blocker.reset(),
    });
    return () => dialog.destroy();
  }, [blocker, modal]);
  return null;
}
