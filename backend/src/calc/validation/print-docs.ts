import { citation } from '../formula.js';
import { validationSets } from './all-cases.js';
import { decisions, formulaChapters, refused, tablesRead } from './formula-list.js';
import type { PrintedFormula } from './formula-list.js';
import type { ValidationCase, ValidationSet } from './validation-case.js';

const caution =
  'Results support, and do not replace, design by licensed engineers. Local codes and the authority having jurisdiction govern; the period comes from the fire strategy, and the product’s evidence governs its thickness.';
/** A table cell: a bar would end it. */
const cell = (text: string): string => text.replaceAll('|', '\\|');
const bullets = (lines: string[]): string => lines.map((line) => `- ${line}`).join('\n');

function formulaText(f: PrintedFormula): string {
  const rows = [f.result, ...Object.values(f.symbols)].map((s) => `| ${cell(s.symbol)} | ${cell(s.meaning)} | ${s.unit || '–'} |`);
  const note = f.source.note ? `\n\n${f.source.note.replace(/^[a-z](?=[a-z])/, (first) => first.toUpperCase())}.` : '';
  return `### ${f.label}\n\n${citation(f.source)}${note}\n\n    ${f.result.symbol} = ${f.expression}\n\n| symbol | meaning | unit |\n|---|---|---|\n${rows.join('\n')}`;
}

/** docs/formulas.md: every formula the core evaluates, from its descriptor; what is decided; what is refused. */
export function formulasMarkdown(): string {
  const chapters = formulaChapters.map((c) => `## ${c.title}\n\n${c.formulas.map(formulaText).join('\n\n')}`);
  const tables = `## Tables and factors\n\n| source | what is read |\n|---|---|\n${tablesRead.map(([a, b]) => `| ${cell(a)} | ${cell(b)} |`).join('\n')}`;
  return [
    '# Formulas\n\nPrinted from the descriptors the program computes with; do not edit by hand (`node backend/scripts/docs.mjs`). “(memory)” marks what was recalled. The rest is as published in the source named, taken from a compilation and not read again in the printed standard.',
    caution, ...chapters, tables, `## Decisions\n\n${bullets(decisions)}`, `## Refused by name\n\n${bullets(refused)}`,
  ].join('\n\n') + '\n';
}

function decimals(c: ValidationCase): number {
  if (c.tolerance > 0 && c.tolerance < 1e-6) return 4;
  return c.tolerance >= 1 ? 1 : 3;
}

function number(value: number, places: number): string {
  const text = value.toFixed(places);
  return Number(text) === 0 ? (0).toFixed(places) : text;
}

function setText(set: ValidationSet): string {
  const rows = set.cases.map((c) => `| ${cell(c.what)} | ${c.expected} | ${number(c.compute(), decimals(c))} | ${c.tolerance < 1e-6 ? 'exact' : Number(c.tolerance.toFixed(4))} | ${c.unit || '–'} |`);
  const reasons = [...new Set(set.cases.flatMap((c) => (c.toleranceReason ? [c.toleranceReason] : [])))];
  const why = reasons.length > 0 ? `\n\nTolerance: ${reasons.join('; ')}.` : '';
  return `## ${set.source}\n\n${set.where} (${set.standing})${why}\n\n| value | source | computed | tolerance | unit |\n|---|---|---|---|---|\n${rows.join('\n')}`;
}

/** docs/validation.md: every checked value beside its source. */
export function validationMarkdown(): string {
  const total = validationSets.reduce((sum, set) => sum + set.cases.length, 0);
  return [
    `# Validation\n\nPrinted from the cases the tests run; do not edit by hand (\`node backend/scripts/docs.mjs\`). ${total} values from ${validationSets.length} sources. *published*: as published in the source named, taken from a compilation of its values and not read again in the printed standard; *memory*: recalled, to be confirmed against print; *second computation*: no print gives it, it was computed independently of this code; *own check*: an identity or limit that the source’s own equations must keep. Whoever relies on a figure should hold it against the printed standard first.`,
    'Beyond these, `heat-balance.spec.ts` integrates the heat balance of bare and protected steel a second way, by a general-purpose package for ordinary differential equations, and the specs beside the methods hold the invariants (the resistance at the critical temperature is the effect, more load or length never raises it, and so on). Section properties are checked beside `calc/sections`.',
    ...validationSets.map(setText),
  ].join('\n\n') + '\n';
}
