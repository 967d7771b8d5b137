import { Button, Checkbox, Drawer } from 'antd';
import { useRef } from 'react';
import { memberColumns, usualColumns } from './member-columns.js';

interface ColumnsDrawerProps { keys: readonly string[]; onChange: (keys: string[]) => void; onClose: () => void }

/** Which columns are shown, and in which order. It holds at once; the list behind it follows. */
export function ColumnsDrawer({ keys, onChange, onClose }: ColumnsDrawerProps) {
  const list = useRef<HTMLUListElement>(null);
  const ordered = [...keys, ...memberColumns.map((c) => c.key).filter((key) => !keys.includes(key))];
  const move = (key: string, by: -1 | 1) => {
    const at = keys.indexOf(key);
    const next = keys.filter((k) => k !== key);
    next.splice(at + by, 0, key);
    onChange(next);
    // the row moves and takes the focus with it
    setTimeout(() => list.current?.querySelector<HTMLElement>(`[data-move="${key}${by}"]:not(:disabled)`)?.focus());
  };
  return (
    <Drawer title="Columns" open onClose={onClose} size={420} rootClassName="mt-drawer" footer={<div className="mt-drawer-foot"><Button onClick={() => onChange([...usualColumns])}>The usual columns</Button><Button type="primary" onClick={onClose}>Done</Button></div>}>
      <p className="mt-sub">Remembered for you on this computer, and kept with a list that you keep.</p>
      <ul className="mt-column-list" ref={list}>
        {ordered.map((key) => {
          const column = memberColumns.find((c) => c.key === key);
          if (!column) return null;
          const at = keys.indexOf(key);
          return (
            <li key={key}>
              <Checkbox checked={at >= 0} disabled={key === 'mark'} onChange={(e) => onChange(e.target.checked ? [...keys, key] : keys.filter((k) => k !== key))}>{column.name}</Checkbox>
              {at >= 0 && (
                <span className="mt-row-actions">
                  <Button size="small" data-move={`${key}-1`} disabled={at === 0} aria-label={`Move ${column.name} towards the left`} onClick={() => move(key, -1)}>Earlier</Button>
                  <Button size="small" data-move={`${key}1`} disabled={at === keys.length - 1} aria-label={`Move ${column.name} towards the right`} onClick={() => move(key, 1)}>Later</Button>
                </span>
              )}
            </li>
          );
        })}
      </ul>
    </Drawer>
  );
}
