import { App, Button } from 'antd';

/** Asks before deleting, and says what goes with it. */
export function DeleteButton({ what, consequence, onDelete, busy }: { what: string; consequence: string; onDelete: () => void; busy: boolean }) {
  const { modal } = App.useApp();
  const ask = () => modal.confirm({ title: `Delete ${what}?`, content: consequence, icon: null, okText: 'Delete', okButtonProps: { danger: true }, cancelText: 'Keep', onOk: onDelete });
  return <Button danger type="text" loading={busy} onClick={ask}>Delete</Button>;
}
