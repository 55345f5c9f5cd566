import type { Plan } from '#lib/core/campaign/plan.ts';
import { parseReading } from '#lib/core/campaign/parse-reading.ts';
import type { CompiledFormula } from '#lib/formula/compile-formula.ts';
import { compileMeasurand } from '#lib/formula/compile-measurand.ts';
import { formulaFunctions } from '#lib/formula/formula-functions.ts';

/** A formula error as plain data: tag and details. */
type Trouble = { tag: string };
export type FormulaCheck =
  | { tag: 'none' }
  | { tag: 'checking' }
  | { tag: 'sound'; found: string; wanted: string; factor: number; readings: string[] }
  | { tag: 'faulty'; trouble: Trouble };
export type FormulaTrial = { tag: 'gives'; value: number } | { tag: 'trouble'; trouble: Trouble } | null;

export const functionNames: readonly string[] = [...formulaFunctions.keys()];

/** The formulas of a plan as they stand: compiled when they change, units and all. */
export class FormulaChecks {
  #checks = $state.raw<Record<string, FormulaCheck>>({});
  #compiled: Record<string, CompiledFormula> = {};
  #asked: Record<string, string> = {};
  #pending = $state(0);

  /** By key of the measurand in the draft. */
  get all(): Record<string, FormulaCheck> {
    return this.#checks;
  }

  get faulty(): boolean {
    return this.#pending > 0 || Object.values(this.#checks).some(({ tag }) => tag === 'faulty' || tag === 'checking');
  }

  /** Place of the first faulty formula among the measurands; 0 when there is none. */
  get firstFaulty(): number {
    return Math.max(
      0,
      Object.keys(this.#asked).findIndex((key) => this.#checks[key]?.tag === 'faulty')
    );
  }

  /** Looks at the formulas again; only one whose text, names or units changed is compiled. */
  look(plan: Plan, keys: readonly string[]): void {
    const asked: Record<string, string> = {};
    plan.measurands.forEach((measurand, i) => {
      const key = keys[i] ?? measurand.id;
      const { formula, unit } = measurand;
      if (formula === null || formula.trim() === '') return;
      const names = [plan.readings.map(({ id, unit: of }) => [id, of]), plan.constants];
      const question = JSON.stringify([formula, unit, names]);
      asked[key] = question;
      if (this.#asked[key] === question) return;
      // What is known stays in sight until the answer is there.
      if (!this.#checks[key] || this.#checks[key].tag === 'none') this.#say(key, { tag: 'checking' });
      this.#pending++;
      void compileMeasurand(measurand, plan).then((compiled) => {
        this.#pending--;
        if (this.#asked[key] !== question) return;
        if (!compiled.ok) {
          delete this.#compiled[key];
          this.#say(key, { tag: 'faulty', trouble: compiled.error });
          return;
        }
        this.#compiled[key] = compiled.value;
        const { units, readings } = compiled.value;
        this.#say(key, { tag: 'sound', ...units, readings });
      });
    });
    this.#asked = asked;
    for (const key of Object.keys(this.#checks)) if (!(key in asked)) this.#say(key, { tag: 'none' });
  }

  #say(key: string, check: FormulaCheck): void {
    this.#checks = { ...this.#checks, [key]: check };
  }

  /** What the formula gives for readings as typed; null while none is typed that can be read. */
  try(key: string, typed: Readonly<Record<string, string>>): FormulaTrial {
    const compiled = this.#compiled[key];
    if (!compiled) return null;
    const values: Record<string, number> = {};
    for (const [name, text] of Object.entries(typed)) {
      const read = parseReading(text);
      if (read.ok) values[name] = read.value.value;
    }
    const result = compiled.evaluate(values);
    return result.ok ? { tag: 'gives', value: result.value } : { tag: 'trouble', trouble: result.error };
  }
}
