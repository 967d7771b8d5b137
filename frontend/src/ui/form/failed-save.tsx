import { Alert, Button } from 'antd';
import { useEffect, useRef } from 'react';
import type { ReactNode } from 'react';
import { ApiError } from '../../lib/api-client.js';
import { fieldName } from '../../lib/record-words.js';
import { fieldSentence } from './field-frame.js';

interface FailedSaveProps {
  error: unknown;
  /** after 409: fetch the saved version again, so that both can be compared; the form keeps what was typed */
  onReload?: (() => void) | undefined;
}

function words(error: unknown): { title: string; rest: ReactNode } {
  if (!(error instanceof ApiError)) return { title: 'Not saved', rest: 'Something went wrong in this page. What you typed is still here; try again.' };
  if (error.isStale) return { title: 'Not saved: somebody else was here', rest: error.message };
  if (error.isSignedOut) return { title: 'Not saved: your session has ended', rest: 'Sign in again in the dialog; what you typed stays here. Then save once more.' };
  return { title: 'Not saved', rest: error.message };
}

/** "curve.fireLoadTotalMjPerM2" → "Curve fire load total" */
const nameOf = (path: string) => { const name = fieldName(path); return name.charAt(0).toUpperCase() + name.slice(1); };

/** Stands above a form whose save failed. The form below keeps everything that was typed. */
export function FailedSave({ error, onReload }: FailedSaveProps) {
  const place = useRef<HTMLDivElement>(null);
  // the save button stands at the form's foot; what went wrong, above the form, may be out of sight
  useEffect(() => { if (error) place.current?.scrollIntoView?.({ block: 'nearest' }); }, [error]);
  if (!error) return null;
  const { title, rest } = words(error);
  const issues = error instanceof ApiError ? error.issues : [];
  return (
    <div ref={place} className="mt-failed">
      <Alert
        type="error" role="alert" title={title}
        description={
          <>
            <p>{rest}</p>
            {issues.length > 0 && <ul>{issues.map((i) => <li key={i.path + i.message}>{i.path ? fieldSentence(nameOf(i.path), i.message) : i.message}</li>)}</ul>}
            {error instanceof ApiError && error.isStale && onReload && <Button size="small" onClick={onReload}>Load the saved version into the untouched fields</Button>}
          </>
        }
      />
    </div>
  );
}
