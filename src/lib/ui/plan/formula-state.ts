import type { FormulaTrouble } from '../texts/en/plan-faults.ts';

/** What is known about the formula of a measurand. */
export type FormulaState =
  | { tag: 'none' }
  | { tag: 'checking' }
  | { tag: 'sound'; found: string; wanted: string; factor: number; readings: string[] }
  | { tag: 'faulty'; trouble: FormulaTrouble };

/** What a trial of the formula gives. */
export type Trial = { tag: 'gives'; value: number } | { tag: 'trouble'; trouble: FormulaTrouble } | null;
