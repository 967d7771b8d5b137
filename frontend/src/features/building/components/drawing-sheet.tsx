import type { ReactNode } from 'react';

interface DrawingSheetProps {
  /** what is pointed at, in a sentence; without it the line says how to read the drawing */
  reading: string | null;
  /** cells of the block in the corner */
  block: readonly { term: string; value: ReactNode }[];
  legend: ReactNode;
  children: ReactNode;
  label: string;
}

/** A drawing on its sheet: the drawing, the line that reads out what is pointed at, the key and, in the corner, what the sheet is. */
export function DrawingSheet({ reading, block, legend, children, label }: DrawingSheetProps) {
  return (
    <section className="mt-panel mt-panel-flush mt-elevation-sheet" aria-label={label}>
      {children}
      <p className="mt-elevation-reading mt-noprint" aria-hidden="true">{reading ?? 'Point at a zone, or move between zones with the arrow keys, to read its figures here.'}</p>
      <div className="mt-elevation-foot">
        <div className="mt-elevation-key">{legend}</div>
        <dl className="mt-elevation-block">{block.map(({ term, value }) => <div key={term}><dt>{term}</dt><dd>{value}</dd></div>)}</dl>
      </div>
    </section>
  );
}

/** One line of a key: the mark as drawn, and what it says. */
export function KeyLine({ mark, children }: { mark: 'settled' | 'ink' | 'open' | 'balloon'; children: ReactNode }) {
  return <span className="mt-key-line"><span className={`mt-key mt-key-${mark}`} aria-hidden="true">{mark === 'balloon' ? 'n' : ''}</span>{children}</span>;
}
