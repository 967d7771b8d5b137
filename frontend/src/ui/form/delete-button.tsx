import { App, Button } from 'antd';

/** Asks before deleting, and says what goes with it. */
export function DeleteButton({ what, consequence, onDelete, busy, verb = 'Delete' }: { what: string; consequence: string; onDelete: () => void; busy: boolean; verb?: string }) {
  const { modal } = App.useApp();
  const ask = () => modal.confirm({ title: `${verb} ${what}?`, content: consequence, icon: null, okText: verb, okButtonProps: { danger: true }, cancelText: 'Keep', onOk: onDelete });
  return <Button danger type="text" loading={busy} onClick={ask}>{verb}</Button>;
}
