import type { ReactNode } from 'react';

export type StatusKind = 'settled' | 'attention' | 'neutral';
const marks: Record<StatusKind, ReactNode> = {
  settled: <path d="M2 6.5 5 9.5 10.5 2.5" />,
  attention: <path d="M6 1.5 11 10.5H1z" />,
  neutral: <path d="M2 6h8" />,
};

/** A state as a word with a mark of its own shape: the colour only repeats what both say. */
export function StatusWord({ kind, children }: { kind: StatusKind; children: ReactNode }) {
  return (
    <span className={`mt-status mt-status-${kind}`}>
      <svg width="11" height="11" viewBox="0 0 12 12" fill="none" stroke="currentColor" strokeWidth="1.8" aria-hidden="true" focusable="false">{marks[kind]}</svg>
      <span>{children}</span>
    </span>
  );
}
