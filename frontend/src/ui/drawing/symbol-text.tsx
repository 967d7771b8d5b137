import type { ReactNode } from 'react';

// a subscript runs on through letters, digits and commas that stand between them; a comma before a space ends it
const subscript = /_([\p{L}\p{N}\p{M}+Δ]+(?:,[\p{L}\p{N}\p{M}+Δ]+)*)/u;

/** Equations as the contracts carry them, k_y,θ·f_y, typeset with their subscripts. */
export function SymbolText({ text }: { text: string }) {
  const parts: ReactNode[] = [];
  let rest = text;
  for (let found = subscript.exec(rest); found; found = subscript.exec(rest)) {
    parts.push(rest.slice(0, found.index), <sub key={parts.length}>{found[1]}</sub>);
    rest = rest.slice(found.index + found[0].length);
  }
  return <span className="mt-symbol">{parts}{rest}</span>;
}
