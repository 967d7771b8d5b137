import { Tooltip } from 'antd';
import { useEffect, useState } from 'react';
import type { HTMLAttributes, KeyboardEvent, MouseEvent, ReactElement, ReactNode, Ref } from 'react';
import { termAnchor, terms } from '../lib/terms.js';
import type { TermName } from '../lib/terms.js';

/**
 * The sentence stands in the document once, hidden, whether its bubble is open or not: a screen reader asks for the description
 * the moment the word has the focus. Outside the word, so that the name of a label or column stays the word alone.
 */
function useSentence(name: TermName): string {
  const id = `said-${termAnchor(name)}`;
  useEffect(() => {
    if (document.getElementById(id)) return;
    const said = document.createElement('div');
    said.id = id;
    said.hidden = true;
    said.textContent = terms[name].sentence;
    document.body.append(said);
  }, [id, name]);
  return id;
}

interface WordProps extends HTMLAttributes<HTMLElement> { describedBy: string; ref?: Ref<HTMLElement> }
/** Takes the bubble's handlers but not its description, which would be read a second time. */
function Word({ describedBy, ref, 'aria-describedby': _bubble, ...rest }: WordProps) {
  return <dfn {...rest} ref={ref as Ref<HTMLElement>} tabIndex={0} className="mt-term" aria-describedby={describedBy} />;
}

/** The same sentence behind something that is worked with itself, such as the button that orders a column. */
export function BehindTerm({ name, children }: { name: TermName; children: (describedBy: string) => ReactElement }) {
  const id = useSentence(name);
  return <Tooltip title={terms[name].sentence} trigger={['hover', 'focus']} mouseEnterDelay={0.25} placement="top" arrow={false} destroyOnHidden classNames={{ root: 'mt-term-bubble mt-noprint' }}>{children(id)}</Tooltip>;
}

/** A word of the trade with its sentence behind it: on hover, focus and tap; Escape closes. */
export function Term({ name, children }: { name: TermName; children?: ReactNode }) {
  const [open, setOpen] = useState(false);
  const id = useSentence(name);
  return (
    <Tooltip
      title={terms[name].sentence} open={open} onOpenChange={setOpen} trigger={['hover', 'focus']} mouseEnterDelay={0.25} placement="top" arrow={false} destroyOnHidden
      classNames={{ root: 'mt-term-bubble mt-noprint' }}
    >
      <Word
        describedBy={id}
        // a tap on a label would move on to its input and close the bubble again
        onClick={(event: MouseEvent) => { if (event.currentTarget.closest('label')) event.preventDefault(); setOpen(true); }}
        onKeyDown={(event: KeyboardEvent) => { if (event.key === 'Enter' || event.key === ' ') { event.preventDefault(); event.stopPropagation(); setOpen(true); } }}
      >
        {children ?? terms[name].word}
      </Word>
    </Tooltip>
  );
}
