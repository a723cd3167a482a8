/** The working of a duty: how each figure came about, shown like a page of a handbook. */

export interface WorkingInput {
  readonly symbol: string;
  readonly value: number;
  readonly unit: string;
}
export interface WorkingStep {
  /** The heading it stands under: a phase, or what is common to all. */
  readonly section: string;
  readonly symbol: string;
  readonly name: string;
  readonly formula: string;
  readonly inputs: readonly WorkingInput[];
  readonly value: number;
  readonly unit: string;
  readonly source: string;
}
export interface WorkingTotal {
  readonly name: string;
  readonly value: number;
  readonly unit: string;
}
export interface Working {
  readonly title: string;
  readonly cautions: readonly string[];
  readonly steps: readonly WorkingStep[];
  readonly totals: readonly WorkingTotal[];
  /** Figures that are possible but unlikely, each a sentence that says what to look at. */
  readonly warnings: readonly string[];
}

/** One line of working, its value computed from the very inputs that are shown. */
export interface Derivation<Symbols extends string> {
  readonly symbol: string;
  readonly name: string;
  readonly formula: string;
  readonly unit: string;
  readonly source: string;
  readonly inputs: Readonly<Record<Symbols, readonly [value: number, unit: string]>>;
  readonly value: (inputs: Readonly<Record<Symbols, number>>) => number;
}

/** A page being written. */
export interface WorkingSheet {
  /** Starts a section; the steps that follow stand under it. */
  section(name: string): void;
  /** Computes a step, writes it down and returns its value. */
  step<Symbols extends string>(derivation: Derivation<Symbols>): number;
  /** Writes a closing figure and returns it. */
  total(name: string, value: number, unit: string): number;
  /** Writes a warning: what is unlikely, and what to look at. */
  warn(sentence: string): void;
  /** The finished page. */
  finish(): Working;
}

/** Opens a page of working. */
export function openWorking(title: string, cautions: readonly string[]): WorkingSheet {
  const steps: WorkingStep[] = [];
  const totals: WorkingTotal[] = [];
  const warnings: string[] = [];
  let section = title;
  return {
    section: (name) => {
      section = name;
    },
    step: ({ symbol, name, formula, unit, source, inputs, value }) => {
      const entries = Object.entries<readonly [number, string]>(inputs);
      const numbers = Object.fromEntries(entries.map(([key, [number]]) => [key, number]));
      const result = value(numbers as Readonly<Record<keyof typeof inputs, number>>);
      const shown = entries.map(([key, [number, itsUnit]]) => ({ symbol: key, value: number, unit: itsUnit }));
      steps.push({ section, symbol, name, formula, inputs: shown, value: result, unit, source });
      return result;
    },
    total: (name, value, unit) => {
      totals.push({ name, value, unit });
      return value;
    },
    warn: (sentence) => {
      warnings.push(sentence);
    },
    finish: () => ({ title, cautions, steps: [...steps], totals: [...totals], warnings: [...warnings] }),
  };
}
