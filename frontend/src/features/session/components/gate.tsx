import type { ReactNode } from 'react';
import { Mark } from '../../../ui/mark.js';
import { ApiError } from '../../../lib/api-client.js';
import { FailedSave } from '../../../ui/form/failed-save.js';
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

/** What the server refused, in its own sentence; nothing was to be saved yet. What is said beside a field is not said again. */
export function GateError({ error }: { error: unknown }) {
  if (!error) return null;
  if (!(error instanceof ApiError) || error.status === 0 || error.status >= 500) return <FailedSave error={error} />;
  return error.issues.some((issue) => issue.path) ? null : <p className="mt-field-error" role="alert">{error.message}</p>;
}
