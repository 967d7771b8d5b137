import { Button } from 'antd';
import { useEffect, useId, useRef, useState } from 'react';
import { formatDateTime } from '../../lib/format.js';
import { fieldName, valueInWords } from '../../lib/record-words.js';
import { firstChoices, undecided } from '../../lib/three-way.js';
import type { Choice, Choices, Difference } from '../../lib/three-way.js';
import type { Comparison, EditWords } from './use-edit-form.js';

const upper = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);
const labelOf = (words: EditWords, path: string) => words.label?.(path) ?? upper(fieldName(path));
/** In full: of two long notes the difference may stand at the end. */
const valueOf = (words: EditWords, path: string, value: unknown) => words.value?.(path, value) ?? valueInWords(path, value, Infinity);

interface RowProps { difference: Difference; words: EditWords; theirsName: string; chosen: Choice | undefined; onChoose: (choice: Choice) => void }

function Row({ difference, words, theirsName, chosen, onChoose }: RowProps) {
  const group = useId();
  const { path, base, mine, theirs, by } = difference;
  const label = labelOf(words, path);
  const cell = (choice: Choice, name: string, value: unknown) => {
    const text = valueOf(words, path, value);
    return (
      <td className="mt-compare-choice">
        <label>
          <input type="radio" name={group} checked={chosen === choice} onChange={() => onChoose(choice)} aria-label={`${label}: ${name}, ${text}`} />
          <span><span className="mt-compare-side">{name}</span><bdi className="mt-compare-value">{text}</bdi></span>
        </label>
      </td>
    );
  };
  return (
    <tr className={chosen ? undefined : 'mt-compare-open'}>
      <th scope="row">{label}{by === 'both' && <span className="mt-compare-both">{chosen ? 'Both changed it' : '▲ Both changed it: choose'}</span>}</th>
      <td><span className="mt-compare-side">When you opened it</span><bdi className="mt-compare-value">{valueOf(words, path, base)}</bdi></td>
      {cell('mine', 'Yours', mine)}
      {cell('theirs', theirsName, theirs)}
    </tr>
  );
}

const headings: Record<Comparison['why'], string> = {
  save: 'Not saved yet: somebody else saved this while you were editing',
  draft: 'This was changed after you left it',
  moved: 'Somebody else saved this while you were editing',
};

interface ComparisonTableProps { comparison: Comparison; words: EditWords; saving: boolean; onChoose: (choices: Choices) => void; onBack: () => void }

/** Both versions of a record, field by field, with a choice for each. What only one of the two changed is chosen already. */
export function ComparisonTable({ comparison, words, saving, onChoose, onBack }: ComparisonTableProps) {
  const { why, by, at, differences } = comparison;
  const heading = useRef<HTMLHeadingElement>(null);
  const id = useId();
  const [choices, setChoices] = useState<Choices>(() => firstChoices(differences));
  const [asked, setAsked] = useState(false);
  // the form below is put away: whoever was in it is brought here, and hears what happened
  useEffect(() => { heading.current?.focus(); heading.current?.scrollIntoView?.({ block: 'nearest' }); }, []);
  const open = undecided(differences, choices).length;
  const all = (choice: Choice) => setChoices(Object.fromEntries(differences.map(({ path }) => [path, choice])));
  const who = by ?? 'Somebody else';
  const theirsName = by || at ? `${who}${at ? `, ${formatDateTime(at)}` : ''}` : 'As saved now';
  const take = () => { if (open > 0) setAsked(true); else onChoose(choices); };
  return (
    <section className="mt-compare" aria-labelledby={id}>
      <h2 id={id} ref={heading} tabIndex={-1}>{headings[why]}</h2>
      <p className="mt-sub">{by || at ? `${who} saved it${at ? ` on ${formatDateTime(at)}` : ''}. ` : ''}Choose for each field which to keep. What only one of you changed is chosen already; nothing is saved until you say so.</p>
      <table>
        <caption className="mt-sr">Fields in which the two versions differ</caption>
        <thead><tr><th scope="col">Field</th><th scope="col">When you opened it</th><th scope="col">Yours</th><th scope="col">{by || at ? `Saved by ${theirsName}` : 'As saved now'}</th></tr></thead>
        <tbody>
          {differences.map((difference) => (
            <Row key={difference.path} difference={difference} words={words} theirsName={theirsName} chosen={choices[difference.path]} onChoose={(choice) => setChoices({ ...choices, [difference.path]: choice })} />
          ))}
        </tbody>
      </table>
      <p className="mt-field-error" role="alert" hidden={!asked || open === 0}>{`${open === 1 ? 'One field is' : `${open} fields are`} still to be chosen.`}</p>
      <div className="mt-actions">
        <Button type="primary" loading={saving} onClick={take}>{why === 'save' ? 'Save this' : 'Put this into the form'}</Button>
        <Button onClick={() => all('mine')}>Take all of mine</Button>
        <Button onClick={() => all('theirs')}>Take all of theirs</Button>
        <Button onClick={onBack}>Back to the form</Button>
      </div>
    </section>
  );
}
