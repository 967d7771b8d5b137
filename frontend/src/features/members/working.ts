import type { WorkingStepDto } from '@mantlet/common';

const symbolChar = /[\p{L}\p{N}\p{M}_]/u;

/** A figure as it stands in a working: short, but with enough digits to follow it. */
export function figure(value: number | string): string {
  if (typeof value === 'string') return value;
  if (!Number.isFinite(value)) return '–';
  if (value === 0) return '0';
  const size = Math.abs(value);
  const digits = size >= 1000 ? 0 : size >= 100 ? 1 : size >= 10 ? 2 : size >= 1 ? 3 : 4;
  const text = size < 0.001 ? value.toPrecision(3) : value.toFixed(digits);
  const trimmed = /\.\d*0+$/.test(text) ? text.replace(/\.?0+$/, '') : text;
  return grouped(trimmed).replace('-', '\u2212');
}
/** Thousands apart from five figures up. */
const grouped = (text: string) => text.replace(/^(-?)(\d{5,})/, (_, sign: string, whole: string) => sign + whole.replace(/\B(?=(\d{3})+$)/g, '\u202f'));

const scaled: Record<string, { unit: string; by: number; above: number }> = { 'N·mm': { unit: 'kNm', by: 1e6, above: 1e5 }, N: { unit: 'kN', by: 1e3, above: 1e3 } };
/** A temperature in a working, to 0.1 °C and downwards as limits are everywhere: 615.98 °C must not read 616 here and 615 in the heading. */
const temperature = (valueC: number) => grouped((Math.floor(valueC * 10 + 1e-6) / 10).toFixed(1)).replace('-', '\u2212');
const inputFigure = ({ value, unit }: WorkingStepDto['inputs'][number]) => (unit === '°C' && typeof value === 'number' && !Number.isInteger(value) ? temperature(value) : figure(value));

/** A result in the unit people read it in: 522 213 518 N·mm is 522.2 kNm. */
export function resultText({ value, unit }: Pick<WorkingStepDto, 'value' | 'unit'>): string | null {
  if (value === null) return null;
  const scale = scaled[unit];
  const [shown, as] = scale && Math.abs(value) >= scale.above ? [value / scale.by, scale.unit] : [value, unit];
  const text = as === '°C' ? temperature(shown) : as === 'kN' || as === 'kNm' ? figure(Math.round(shown * 10) / 10) : figure(shown);
  return as ? `${text}\u00a0${as === '1/m' ? 'm⁻¹' : as}` : text;
}

// a name with its subscript: nothing inside it is a symbol of its own (the t of θ_a,t+Δt is not time)
const name = /^[\p{L}\p{N}\p{M}]+(?:_[\p{L}\p{N}\p{M}+Δ]+(?:,[\p{L}\p{N}\p{M}+Δ]+)*)?/u;

interface Substitution { text: string; used: Set<string> }
/** Puts numbers for symbols, the longest symbol first, and never inside another symbol. */
function substitute(expression: string, inputs: WorkingStepDto['inputs']): Substitution {
  const symbols = [...inputs].sort((a, b) => b.symbol.length - a.symbol.length);
  const used = new Set<string>();
  let text = '';
  for (let at = 0; at < expression.length;) {
    const rest = expression.slice(at);
    const found = symbols.find(({ symbol }) => symbol && rest.startsWith(symbol) && !symbolChar.test(rest[symbol.length] ?? ' '));
    if (found) {
      used.add(found.symbol);
      const number = inputFigure(found);
      text += number.startsWith('\u2212') ? `(${number})` : number;
      at += found.symbol.length;
    } else {
      const kept = name.exec(rest)?.[0] ?? rest.charAt(0);
      text += kept;
      at += kept.length;
    }
  }
  return { text, used };
}

export interface WorkingLine {
  /** the equation as printed */
  equation: string;
  /** the same with numbers, without what stands left of the equals sign; null where nothing could be put in */
  numbers: string | null;
  /** numbers that enter but stand in no printed symbol */
  rest: { symbol: string; text: string }[];
}

/** An equation and its numbers. What follows a comma (the parts of an equation) is left as printed. */
export function workingLine(step: WorkingStepDto): WorkingLine {
  const equals = step.equation.indexOf(' = ');
  const [head] = equals < 0 ? [''] : step.equation.slice(equals + 3).split(/, (?=\S+ = )/);
  const { text, used } = substitute(head ?? '', step.inputs);
  const rest = step.inputs.filter(({ symbol }) => !used.has(symbol)).map((input) => ({ ...input, number: inputFigure(input) })).map(({ symbol, number, unit }) => ({ symbol, text: `${number}${unit ? `\u00a0${unit === '1/m' ? 'm⁻¹' : unit}` : ''}` }));
  return { equation: step.equation, numbers: used.size > 0 ? text : null, rest };
}

/** A result in the three parts that line up in a column: before the decimal mark, from it on, and the unit. */
export function resultParts(step: Pick<WorkingStepDto, 'value' | 'unit'>): { whole: string; fraction: string; unit: string } | null {
  const text = resultText(step);
  if (text === null) return null;
  const [number = '', unit = ''] = text.split('\u00a0');
  const mark = number.indexOf('.');
  return mark < 0 ? { whole: number, fraction: '', unit } : { whole: number.slice(0, mark), fraction: number.slice(mark), unit };
}

/** The working as plain text, to paste into a report: what, equation, numbers, result and source of each step. */
export function workingAsText(heading: string, working: readonly WorkingStepDto[]): string {
  const steps = working.map((step, i) => {
    const { equation, numbers, rest } = workingLine(step);
    const result = resultText(step);
    return [
      `${i + 1}  ${step.what}${result === null ? '' : `: ${result}`}`, ...(equation ? [`   ${equation}`] : []), ...(numbers ? [`   = ${numbers}`] : []),
      ...(rest.length > 0 ? [`   with ${rest.map(({ symbol, text }) => `${symbol} = ${text}`).join(', ')}`] : []), ...(step.note ? [`   ${step.note}`] : []), `   ${step.source}`,
    ].join('\n');
  });
  return [heading, ...steps].join('\n\n');
}
