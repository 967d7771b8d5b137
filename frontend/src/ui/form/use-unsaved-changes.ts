import { App } from 'antd';
import { useEffect } from 'react';
import { useBlocker } from 'react-router-dom';

/** Asks before a page or form with unsaved changes is left: by a link, by the back button, or by closing the tab. */
export function useUnsavedChanges(dirty: boolean): void {
  const { modal } = App.useApp();
  const blocker = useBlocker(({ currentLocation, nextLocation }) => dirty && currentLocation.pathname !== nextLocation.pathname);
  useEffect(() => {
    if (!dirty) return;
    const ask = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', ask);
    return () => window.removeEventListener('beforeunload', ask);
  }, [dirty]);
  useEffect(() => {
    if (blocker.state !== 'blocked') return;
    const dialog = modal.confirm({
      title: 'Leave without saving?', content: 'What you changed on this page is not saved yet.', icon: null,
      okText: 'Leave', cancelText: 'Stay here', onOk: () => blocker.proceed(), onCancel: () => blocker.reset(),
    });
    return () => dialog.destroy();
  }, [blocker, modal]);
}
