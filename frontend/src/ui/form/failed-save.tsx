import { Alert, Button } from 'antd';
import { useEffect, useRef, useSyncExternalStore } from 'react';
import type { ReactNode } from 'react';
import { ApiError } from '../../lib/api-client.js';
import { fieldName } from '../../lib/record-words.js';
import { fieldSentence } from './field-frame.js';

interface FailedSaveProps {
  error: unknown;
  /** what was edited was deleted meanwhile */
  gone?: boolean;
  /** saves once more; offered where the same again may go through */
  retry?: (() => void) | undefined;
  saving?: boolean;
  actions?: ReactNode;
}

function subscribe(changed: () => void) {
  window.addEventListener('online', changed);
  window.addEventListener('offline', changed);
  return () => { window.removeEventListener('online', changed); window.removeEventListener('offline', changed); };
}
const useOnline = (): boolean => useSyncExternalStore(subscribe, () => navigator.onLine);

function words(error: unknown, gone: boolean, online: boolean): { title: string; rest: ReactNode } {
  if (!(error instanceof ApiError)) return { title: 'Not saved', rest: 'Something went wrong in this page. What you typed is still here; try again.' };
  if (error.status === 0 && !online) return { title: 'Not saved: you are offline', rest: 'What you typed is still here. Save again once this device is connected.' };
  if (gone) return { title: 'Not saved: it is no longer there', rest: 'Somebody deleted it while you were editing, or it is no longer yours to see. What you typed is still here.' };
  if (error.isStale) return { title: 'Not saved: somebody else was here', rest: error.message };
  if (error.isSignedOut) return { title: 'Not saved: your session has ended', rest: 'Sign in again in the dialog; what you typed stays here. Then save once more.' };
  if (error.isPassing) return { title: 'Not saved', rest: `${error.message}${/still here/.test(error.message) ? '' : ' What you typed is still here.'}` };
  return { title: 'Not saved', rest: error.message };
}

/** "curve.fireLoadTotalMjPerM2" → "Curve fire load total" */
const nameOf = (path: string) => { const name = fieldName(path); return name.charAt(0).toUpperCase() + name.slice(1); };

/** Stands above a form whose save failed. The form below keeps everything that was typed. */
export function FailedSave({ error, gone = false, retry, saving = false, actions }: FailedSaveProps) {
  const place = useRef<HTMLDivElement>(null);
  const online = useOnline();
  // the save button stands at the form's foot; what went wrong, above the form, may be out of sight
  useEffect(() => { if (error) place.current?.scrollIntoView?.({ block: 'nearest' }); }, [error]);
  if (!error) return null;
  const { title, rest } = words(error, gone, online);
  const issues = error instanceof ApiError ? error.issues : [];
  const again = retry && error instanceof ApiError && error.isPassing;
  return (
    <div ref={place} className="mt-failed">
      <Alert
        type="error" role="alert" title={title}
        description={
          <>
            <p>{rest}</p>
            {issues.length > 0 && <ul>{issues.map((i) => <li key={i.path + i.message}>{i.path ? fieldSentence(nameOf(i.path), i.message) : i.message}</li>)}</ul>}
            {(again || actions) && <div className="mt-actions">{again && <Button size="small" loading={saving} onClick={retry}>Save again</Button>}{actions}</div>}
          </>
        }
      />
    </div>
  );
}
