import { stepNames, steps } from '../import-words.js';
import type { Step } from '../import-words.js';

/** Where in the import one is. */
export function StepsLine({ now }: { now: Step }) {
  const at = steps.indexOf(now);
  return (
    <ol className="mt-steps" aria-label="Steps of the import">
      {steps.map((step, i) => (
        <li key={step} aria-current={step === now ? 'step' : undefined} data-state={i < at ? 'done' : i === at ? 'now' : 'later'}>
          <span className="mt-steps-number">{i + 1}</span>{stepNames[step]}{i < at && <span className="mt-sr">, done</span>}
        </li>
      ))}
    </ol>
  );
}
