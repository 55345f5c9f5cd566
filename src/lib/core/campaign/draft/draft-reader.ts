import { parseReading } from '../parse-reading.ts';
import type { Range } from '../plan.ts';
import type { DraftFault } from './draft-fault.ts';
import type { DraftRange } from './plan-draft.ts';

type Bare = DraftFault extends infer F ? (F extends DraftFault ? Omit<F, 'path' | 'weight'> : never) : never;

/** Reads typed fields and gathers what is wrong with them. An empty field is null and no fault. */
export class DraftReader {
  readonly faults: DraftFault[] = [];

  fault(path: string, fault: Bare): void {
    this.faults.push({ path, weight: 'stop', ...fault } as DraftFault);
  }

  /** Allowed, but worth saying. */
  tell(path: string, fault: Bare): void {
    this.faults.push({ path, weight: 'told', ...fault } as DraftFault);
  }

  text(path: string, typed: string, most: number): string {
    const text = typed.trim();
    if (text.length > most) this.fault(path, { tag: 'too-long', most });
    return text.slice(0, most);
  }

  lines(path: string, typed: string, most: number): string[] {
    const lines = typed.split('\n').map((line) => line.trim());
    if (lines.some((line) => line.length > most)) this.fault(path, { tag: 'too-long', most });
    return lines.filter((line) => line !== '').map((line) => line.slice(0, most));
  }

  number(path: string, typed: string): number | null {
    const parsed = parseReading(typed);
    if (parsed.ok) return parsed.value.value;
    switch (parsed.error.tag) {
      case 'empty':
        return null;
      case 'ambiguous':
      case 'unfinished':
        this.fault(path, {
          tag: 'two-meanings',
          text: typed.trim(),
          candidates: parsed.error.candidates.map(({ plain }) => plain)
        });
        return null;
      default:
        this.fault(path, { tag: 'not-a-number', text: typed.trim() });
        return null;
    }
  }

  positive(path: string, typed: string): number | null {
    const value = this.number(path, typed);
    if (value === null || value > 0) return value;
    this.fault(path, { tag: 'not-positive' });
    return null;
  }

  whole(path: string, typed: string, least: number, most: number): number | null {
    const value = this.number(path, typed);
    if (value === null || (Number.isInteger(value) && value >= least && value <= most)) return value;
    this.fault(path, { tag: 'not-whole', least, most });
    return null;
  }

  range(path: string, { min, max }: DraftRange): Range {
    const range = { min: this.number(`${path}.min`, min), max: this.number(`${path}.max`, max) };
    if (range.min !== null && range.max !== null && range.min > range.max) {
      this.fault(path, { tag: 'range-upside-down' });
    }
    return range;
  }

  /** The two pairs of limits: what cannot be, and what is worth another look. */
  ranges(path: string, typed: { possible: DraftRange; expected: DraftRange }): { possible: Range; expected: Range } {
    const possible = this.range(`${path}.possible`, typed.possible);
    const expected = this.range(`${path}.expected`, typed.expected);
    const below = expected.min !== null && possible.min !== null && expected.min < possible.min;
    const above = expected.max !== null && possible.max !== null && expected.max > possible.max;
    if (below || above) this.fault(`${path}.expected`, { tag: 'expected-beyond-possible' });
    return { possible, expected };
  }

  /** A name a formula can use, once in the plan. */
  id(path: string, typed: string, taken: Set<string>): string {
    const id = typed.trim();
    if (id === '') this.fault(path, { tag: 'name-empty' });
    else if (!/^[a-z][a-z0-9_]{0,39}$/i.test(id)) this.fault(path, { tag: 'id-not-a-name', text: id });
    else if (taken.has(id)) this.fault(path, { tag: 'id-twice', id });
    taken.add(id);
    return id;
  }
}
