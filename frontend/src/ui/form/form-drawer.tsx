import { App, Button, Drawer } from 'antd';
import type { FormEventHandler, ReactNode } from 'react';
import { useEffect, useId, useRef, useState } from 'react';
import { FailedSave } from './failed-save.js';
import { useUnsavedChanges } from './use-unsaved-changes.js';

interface FormDrawerProps {
  title: string;
  open: boolean;
  onClose: () => void;
  /** form.handleSubmit(...) */
  onSubmit: FormEventHandler<HTMLFormElement>;
  dirty: boolean;
  saving: boolean;
  error?: unknown;
  onReload?: (() => void) | undefined;
  saveText?: string;
  /** e.g. a delete button, at the left of the foot */
  extra?: ReactNode;
  size?: number;
  children: ReactNode;
}

/** A drawer that leaves the page as it closes would leave the focus nowhere: it goes back to what opened it, or to the page. */
function useFocusBack(open: boolean): void {
  const [opener] = useState(() => document.activeElement);
  useEffect(() => {
    if (!open) return;
    return () => {
      setTimeout(() => {
        if (document.activeElement !== document.body) return;
        const back = opener?.isConnected && opener !== document.body ? opener : document.getElementById('main');
        (back as HTMLElement | null)?.focus();
      });
    };
  }, [open, opener]);
}

/** A form at the side of the page. Closing with unsaved changes asks first; a failed save keeps the form as it is. */
export function FormDrawer({ title, open, onClose, onSubmit, dirty, saving, error, onReload, saveText = 'Save', extra, size = 520, children }: FormDrawerProps) {
  const { modal } = App.useApp();
  const formId = useId();
  const form = useRef<HTMLFormElement>(null);
  // the drawer takes the focus while it slides in; once it stands, typing begins in its first field
  const begin = (isOpen: boolean) => {
    if (!isOpen || form.current?.contains(document.activeElement)) return;
    form.current?.querySelector<HTMLElement>('input:not(:disabled), textarea:not(:disabled)')?.focus();
  };
  useUnsavedChanges(open && dirty && !saving);
  useFocusBack(open);
  const close = () => {
    if (!dirty) return onClose();
    modal.confirm({ title: 'Close without saving?', content: 'What you typed is not saved yet.', icon: null, okText: 'Close', cancelText: 'Go on editing', onOk: onClose });
  };
  return (
    <Drawer
      title={title} open={open} onClose={close} afterOpenChange={begin} size={size} destroyOnHidden mask={{ closable: !dirty }} rootClassName="mt-drawer"
      footer={
        <div className="mt-drawer-foot">
          <div>{extra}</div>
          <div className="mt-actions">
            <Button onClick={close}>Cancel</Button>
            <Button type="primary" htmlType="submit" form={formId} loading={saving}>{saveText}</Button>
          </div>
        </div>
      }
    >
      <FailedSave error={error} onReload={onReload} />
      <form id={formId} ref={form} onSubmit={onSubmit} noValidate className="mt-form">{children}</form>
    </Drawer>
  );
}
