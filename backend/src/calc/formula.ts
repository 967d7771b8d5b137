import type { WorkingStepDto } from '@mantlet/common';

/** Where a formula or value comes from. `clause` includes equation or table numbers; `memory` marks a value not read from print. */
export interface Source {
  standard: string;
  clause: string;
  note?: string;
  memory?: boolean;
}

export interface SymbolSpec {
  /** as printed, with _ before a subscript: k_y,θ */
  symbol: string;
  meaning: string;
  /** as printed: MPa, mm², °C, 1/m; '' for a plain number */
  unit: string;
}

/**
 * A published formula: the one place that holds its equation, its symbols and its arithmetic.
 * The working, the PDF annex and docs/formulas.md are all printed from this descriptor.
 */
export interface Formula<I extends object> {
  label: string;
  source: Source;
  /** right-hand side as printed, using the symbols below: A·k_y,θ·f_y/γ_M,fi */
  expression: string;
  result: SymbolSpec;
  symbols: { [K in keyof I]: SymbolSpec };
  evaluate: (input: I) => number;
}

export function defineFormula<I extends object>(formula: Formula<I>): Formula<I> {
  return formula;
}

/** One line of a working: what was computed, by which equation, with which numbers. */
export type WorkingStep = WorkingStepDto;

export function citation(source: Source): string {
  return `${source.standard} ${source.clause}${source.memory ? ' (memory)' : ''}`;
}

/** Evaluates a formula and says how: the number and its line of working. */
export function explain<I extends object>(formula: Formula<I>, input: I): { value: number; step: WorkingStep } {
  const value = formula.evaluate(input);
  const keys = Object.keys(formula.symbols) as (keyof I)[];
  return {
    value,
    step: {
      what: formula.label,
      equation: `${formula.result.symbol} = ${formula.expression}`,
      inputs: keys.map((key) => ({
        symbol: formula.symbols[key].symbol,
        value: input[key] as number | string,
        unit: formula.symbols[key].unit,
      })),
      value,
      unit: formula.result.unit,
      source: citation(formula.source),
    },
  };
}
