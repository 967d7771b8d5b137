import type { ReactNode } from 'react';
import { Mark } from '../../../ui/mark.js';
import { useTitle } from '../../../ui/page-info.js';

/** The sheet a visitor meets before they are in. */
export function Gate({ title, heading, sub, children }: { title: string; heading: string; sub: ReactNode; children: ReactNode }) {
  useTitle(title);
  return (
    <main className="mt-gate">
      <div className="mt-gate-sheet">
        <div className="mt-gate-brand"><Mark size={24} /><span>Mantlet</span></div>
        <div className="mt-gate-body">
          <div>
            <h1>{heading}</h1>
            <p className="mt-sub">{sub}</p>
          </div>
          {children}
        </div>
      </div>
    </main>
  );
}
