import { Button } from 'antd';
import type { ReactNode } from 'react';
import { ApiError } from '../lib/api-client.js';

/** Nothing here yet: says what to do first. */
export function EmptyState({ title, children, action }: { title: ReactNode; children?: ReactNode; action?: ReactNode }) {
  return (
    <div className="mt-state">
      <p className="mt-state-title">{title}</p>
      {children && <div className="mt-sub">{children}</div>}
      {action && <div className="mt-actions">{action}</div>}
    </div>
  );
}

export function LoadingState({ what = 'this page' }: { what?: string }) {
  return (
    <div className="mt-state mt-state-loading" role="status">
      <span className="mt-sub">Loading {what}…</span>
      <span className="mt-lines" aria-hidden="true"><span /><span /><span /><span /></span>
    </div>
  );
}

/** What a person may not see or do, and who may. */
export function RefusedState({ children }: { children: ReactNode }) {
  return (
    <div className="mt-state" role="note">
      <p className="mt-state-title">Not yours to see</p>
      <p className="mt-sub">{children}</p>
    </div>
  );
}

export function ErrorState({ error, retry }: { error: unknown; retry?: (() => void) | undefined }) {
  if (error instanceof ApiError && error.isRefused) return <RefusedState>{error.message}</RefusedState>;
  const missing = error instanceof ApiError && error.isMissing;
  const said = error instanceof ApiError ? error.message : 'This page could not be shown. Load it again, and tell the administrator if it stays.';
  return (
    <div className="mt-state" role="alert">
      <p className="mt-state-title">{missing ? 'Nothing at this address' : 'This could not be loaded'}</p>
      <p className="mt-sub">{said}</p>
      {retry && !missing && <div className="mt-actions"><Button onClick={retry}>Try again</Button></div>}
    </div>
  );
}

interface QueryLike<T> { data: T | undefined; error: unknown; isPending: boolean; refetch: () => unknown }

/**
 * Loading, error or content of a query. Data once shown stays on screen when a later refresh fails,
 * so that a form open over it keeps what was typed.
 */
export function QueryState<T>({ query, what, children }: { query: QueryLike<T>; what?: string | undefined; children: (data: T) => ReactNode }) {
  if (query.data !== undefined) return <>{children(query.data)}</>;
  if (query.error) return <ErrorState error={query.error} retry={() => { void query.refetch(); }} />;
  return <LoadingState {...(what ? { what } : {})} />;
}
