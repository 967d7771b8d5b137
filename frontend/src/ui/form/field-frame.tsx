import type { ReactNode } from 'react';
import type { TermName } from '../../lib/terms.js';
import { Term } from '../term.js';

const bounds = { '<=': 'at most', '>=': 'at least', '<': 'below', '>': 'above' } as const;

/** "must be above 0" needs its subject; "say why" and a whole sentence stand alone; what a schema says of itself is put plainly. */
export function fieldSentence(label: string, problem: string): string {
  if (/^Invalid input/.test(problem)) return `${label} is needed.`;
  if (/^Invalid (?:option|discriminator|UUID)/.test(problem)) return `${label}: choose one of the values offered.`;
  const limit = /^Too (?:big|small): expected (?:number|int) to be (<=|>=|<|>)\s?(-?[\d.]+)/.exec(problem);
  if (limit) return `${label} must be ${bounds[limit[1] as keyof typeof bounds]} ${limit[2]}.`;
  const entries = /^Too (big|small): expected array to have [<>]=?\s?(\d+)/.exec(problem);
  if (entries) return `${label} needs at ${entries[1] === 'big' ? 'most' : 'least'} ${entries[2]} ${entries[2] === '1' ? 'entry' : 'entries'}.`;
  const length = /^Too (big|small): expected string to have [<>]=?\s?(\d+)/.exec(problem);
  if (length) return `${label} is ${length[1] === 'big' ? 'longer' : 'shorter'} than ${length[2]} characters.`;
  const asked = /^(say|choose|give|name|state)\b/.test(problem) ? problem.charAt(0).toUpperCase() + problem.slice(1) : problem;
  const text = /^[a-z]/.test(asked) ? `${label} ${asked}` : asked;
  return /[.!?]$/.test(text) ? text : `${text}.`;
}

export interface FieldCommon {
  label: string;
  /** a line below the input: what it means, where it comes from */
  help?: ReactNode;
  disabled?: boolean;
  /** also shown after the label for numbers */
  unit?: string | undefined;
  /** the trade word that the label is, explained on it */
  term?: TermName | undefined;
}

interface FrameProps extends FieldCommon { id: string; error: string | undefined; group?: boolean; children: ReactNode }
export const helpId = (id: string) => `${id}-help`;
export const errorId = (id: string) => `${id}-error`;
export const describedBy = (id: string, help: unknown, error: unknown) =>
  [help ? helpId(id) : '', error ? errorId(id) : ''].filter(Boolean).join(' ') || undefined;

/** Label, input, help and error in one block, tied together for assistive technology. */
export function FieldFrame({ id, label, unit, term, help, error, group = false, children }: FrameProps) {
  const name = <>{term ? <Term name={term}>{label}</Term> : label}{unit ? <span className="mt-unit"> ({unit})</span> : null}</>;
  return (
    <div className="mt-field">
      {group ? <span className="mt-label" id={`${id}-label`}>{name}</span> : <label className="mt-label" htmlFor={id}>{name}</label>}
      {children}
      {help && <p className="mt-help" id={helpId(id)}>{help}</p>}
      {error && <p className="mt-field-error" id={errorId(id)} role="alert">{fieldSentence(label, error)}</p>}
    </div>
  );
}
