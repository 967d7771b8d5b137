import { App, Button, Drawer } from 'antd';
import type { FormEventHandler, ReactNode } from 'react';
import { useEffect, useId, useRef, useState } from 'react';
import { EditNotices } from './edit-notices.js';
import { FailedSave } from './failed-save.js';
import type { EditForm } from './use-edit-form.js';
import { useUnsavedChanges } from './use-unsaved-changes.js';

/** A form that keeps nothing of what is typed: passwords, and what is only shown. */
interface PlainForm {
  /** form.handleSubmit(...) */
  onSubmit: FormEventHandler<HTMLFormElement>;
  dirty: boolean;
  saving: boolean;
  error?: unknown;
}
interface DrawerProps {
  title: string;
  open: boolean;
  onClose: () => void;
  saveText?: string;
  /** e.g. a delete button, at the left of the foot */
  extra?: ReactNode;
  size?: number;
  children: ReactNode;
}
type FormDrawerProps = DrawerProps & (PlainForm | { edit: EditForm; /** of something else than the save, such as deleting */ error?: unknown; onSubmit?: FormEventHandler<HTMLFormElement> });

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
export function FormDrawer({ title, open, onClose, saveText = 'Save', extra, size = 520, children, ...form }: FormDrawerProps) {
  const edit = 'edit' in form ? form.edit : null;
  const { onSubmit, dirty, saving } = 'edit' in form ? { ...form.edit, onSubmit: form.onSubmit ?? form.edit.submit } : form;
  const comparing = edit?.comparison != null;
  const { modal } = App.useApp();
  const formId = useId();
  const fields = useRef<HTMLFormElement>(null);
  // the drawer takes the focus while it slides in; once it stands, typing begins in its first field
  const begin = (isOpen: boolean) => {
    if (!isOpen || fields.current?.contains(document.activeElement)) return;
    fields.current?.querySelector<HTMLElement>('input:not(:disabled), textarea:not(:disabled)')?.focus();
  };
  // an edit form signs in itself
  useUnsavedChanges(open && !edit && dirty && !saving, title);
  useFocusBack(open);
  const close = () => {
    if (!dirty) return onClose();
    modal.confirm({ title: 'Close without saving?', content: 'What you typed is not saved yet, and will be lost.', icon: null, okText: 'Close', cancelText: 'Go on editing', onOk: () => { edit?.discard(); onClose(); } });
  };
  return (
    <Drawer
      title={title} open={open} onClose={close} afterOpenChange={begin} size={size} destroyOnHidden mask={{ closable: !dirty }} rootClassName="mt-drawer"
      footer={
        <div className="mt-drawer-foot">
          <div>{extra}</div>
          <div className="mt-actions">
            <Button onClick={close}>Cancel</Button>
            {!comparing && <Button type="primary" htmlType="submit" form={formId} loading={saving}>{saveText}</Button>}
          </div>
        </div>
      }
    >
      {edit && <EditNotices edit={edit} />}
      <FailedSave error={form.error} />
      <form id={formId} ref={fields} onSubmit={onSubmit} noValidate className="mt-form" hidden={comparing}>{children}</form>
    </Drawer>
  );
}
