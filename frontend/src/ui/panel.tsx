import { useId } from 'react';
import type { ReactNode } from 'react';

interface PanelProps {
  title?: ReactNode;
  sub?: ReactNode;
  actions?: ReactNode;
  /** flush: the content (a table, a drawing) runs to the panel's edge */
  flush?: boolean;
  /** accessible name where there is no title */
  label?: string;
  className?: string;
  children?: ReactNode;
}

/** A sheet with a hairline round it. Never inside another panel. */
export function Panel({ title, sub, actions, flush = false, label, className = '', children }: PanelProps) {
  const id = useId();
  return (
    <section className={`mt-panel ${flush ? 'mt-panel-flush' : ''} ${className}`} aria-labelledby={title ? id : undefined} aria-label={title ? undefined : label}>
      {(title || actions) && (
        <header className="mt-panel-head">
          <div>
            {title && <h2 id={id}>{title}</h2>}
            {sub && <p className="mt-sub">{sub}</p>}
          </div>
          {actions && <div className="mt-actions">{actions}</div>}
        </header>
      )}
      {children}
    </section>
  );
}
