import type { ReactNode } from 'react';

// a subscript runs on through letters, digits and commas that stand between them; a comma before a space ends it
// a power is a number after ^
const script = /_([\p{L}\p{N}\p{M}+Δ]+(?:,[\p{L}\p{N}\p{M}+Δ]+)*)|\^(\d+(?:\.\d+)?)/u;

/** Equations as the contracts carry them, k_y,θ·f_y, typeset with their subscripts and powers. */
export function SymbolText({ text }: { text: string }) {
  const parts: ReactNode[] = [];
  let rest = text;
  for (let found = script.exec(rest); found; found = script.exec(rest)) {
    parts.push(rest.slice(0, found.index), found[1] === undefined ? <sup key={parts.length}>{found[2]}</sup> : <sub key={parts.length}>{found[1]}</sub>);
    rest = rest.slice(found.index + found[0].length);
  }
  return <span className="mt-symbol">{parts}{rest}</span>;
}
