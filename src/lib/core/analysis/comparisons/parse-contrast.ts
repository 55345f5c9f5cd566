import { fail, ok, type Result } from '../../result.ts';
import { ContrastScanner } from './contrast-scanner.ts';

/** Why a typed question was not understood; `at` is the position in the text. */
export type ContrastFault =
  | { tag: 'empty' }
  | { tag: 'too-long'; limit: number }
  | { tag: 'unknown-name'; at: number; found: string }
  | { tag: 'unexpected'; at: number; found: string }
  | { tag: 'ended-early' }
  | { tag: 'unclosed'; at: number }
  | { tag: 'product-of-treatments'; at: number }
  | { tag: 'division-by-treatments'; at: number }
  | { tag: 'division-by-zero'; at: number }
  | { tag: 'number-without-treatment'; constant: number }
  | { tag: 'weights-do-not-cancel'; sum: number }
  | { tag: 'nothing-left' };

const LONGEST = 2000;
const DEEPEST = 40;
const ROUNDING = 1e-9;

/** A number plus a weighted sum of treatments. */
interface Linear {
  constant: number;
  weights: Float64Array;
}

class Refusal {
  readonly fault: ContrastFault;
  constructor(fault: ContrastFault) {
    this.fault = fault;
  }
}

/**
 * Reads a question that a person typed about treatments, such as `A − B` or `(A + B)/2 − C`, as weights.
 *
 * Grammar: sum = product (('+' | '-') product)*; product = sign* factor (('*' | '/')? factor)*; factor = number |
 * treatment | '(' sum ')'. Names are matched longest first, whatever they contain, without regard to case and to how
 * many blanks there are; a name in double quotes is taken whole. A treatment that is
 * called 2 is meant by 2 unless that multiplies or divides something. Numbers may have a decimal comma; −, ·, ×, ÷ and ½ are
 * understood.
 *
 * @param text as typed
 * @param names of the treatments, in their order
 * @returns weights that add to zero, in the order of the treatments
 *
 * Checked by: test/core/analysis/comparisons/parse-contrast.test.ts
 */
export function parseContrast(text: string, names: readonly string[]): Result<Float64Array, ContrastFault> {
  if (text.trim() === '') return fail({ tag: 'empty' });
  if (text.length > LONGEST) return fail({ tag: 'too-long', limit: LONGEST });
  try {
    const scanner = new ContrastScanner(text, names);
    const { constant, weights } = sum(scanner, names.length, 0);
    if (!scanner.atEnd()) throw unexpected(scanner);
    return checked(constant, weights);
  } catch (caught) {
    if (caught instanceof Refusal) return fail(caught.fault);
    throw caught;
  }
}

function checked(constant: number, weights: Float64Array): Result<Float64Array, ContrastFault> {
  const scale = weights.reduce((s, w) => s + Math.abs(w), 0);
  if (Math.abs(constant) > ROUNDING * Math.max(1, scale)) return fail({ tag: 'number-without-treatment', constant });
  if (!(scale > ROUNDING)) return fail({ tag: 'nothing-left' });
  const total = weights.reduce((s, w) => s + w, 0);
  if (Math.abs(total) > ROUNDING * scale) return fail({ tag: 'weights-do-not-cancel', sum: total });
  return ok(weights);
}

function sum(scanner: ContrastScanner, size: number, depth: number): Linear {
  if (depth > DEEPEST) throw unexpected(scanner);
  const result = product(scanner, size, depth);
  for (;;) {
    const sign = scanner.take('+') ? 1 : scanner.take('-') ? -1 : 0;
    if (sign === 0) return result;
    const next = product(scanner, size, depth);
    result.constant += sign * next.constant;
    next.weights.forEach((w, i) => (result.weights[i]! += sign * w));
  }
}

function product(scanner: ContrastScanner, size: number, depth: number): Linear {
  let sign = 1;
  while (scanner.peek() === '-' || scanner.peek() === '+')
    if (scanner.take('-')) sign = -sign;
    else scanner.take('+');
  let result = scaled(factor(scanner, size, depth), sign);
  for (;;) {
    const at = scanner.position();
    if (scanner.take('/')) result = divided(result, number(scanner, size, depth), at);
    else if (scanner.take('*') || scanner.startsFactor()) {
      const next = isNumber(result) ? factor(scanner, size, depth) : number(scanner, size, depth);
      result = multiplied(result, next, at);
    } else return result;
  }
}

/** Only a number makes sense here, even where a treatment is called 2. */
function number(scanner: ContrastScanner, size: number, depth: number): Linear {
  const constant = scanner.takeNumber();
  return constant === null ? factor(scanner, size, depth) : { constant, weights: new Float64Array(size) };
}

function factor(scanner: ContrastScanner, size: number, depth: number): Linear {
  const at = scanner.position();
  if (scanner.atEnd()) throw new Refusal({ tag: 'ended-early' });
  if (scanner.take('(')) {
    const inside = sum(scanner, size, depth + 1);
    if (!scanner.take(')')) throw scanner.atEnd() ? new Refusal({ tag: 'unclosed', at }) : unexpected(scanner);
    return inside;
  }
  const treatment = scanner.takeTreatment();
  if (treatment !== null) {
    const weights = new Float64Array(size);
    weights[treatment] = 1;
    return { constant: 0, weights };
  }
  const constant = scanner.takeNumber();
  if (constant !== null) return { constant, weights: new Float64Array(size) };
  throw unexpected(scanner);
}

function unexpected(scanner: ContrastScanner): Refusal {
  const at = scanner.position();
  const word = scanner.word();
  if (word !== '') return new Refusal({ tag: 'unknown-name', at, found: word });
  return new Refusal({ tag: 'unexpected', at, found: scanner.peek() });
}

function scaled({ constant, weights }: Linear, by: number): Linear {
  return { constant: constant * by, weights: weights.map((w) => w * by) };
}

function isNumber({ weights }: Linear): boolean {
  return weights.every((w) => w === 0);
}

function multiplied(a: Linear, b: Linear, at: number): Linear {
  if (isNumber(a)) return scaled(b, a.constant);
  if (isNumber(b)) return scaled(a, b.constant);
  throw new Refusal({ tag: 'product-of-treatments', at });
}

function divided(a: Linear, b: Linear, at: number): Linear {
  if (!isNumber(b)) throw new Refusal({ tag: 'division-by-treatments', at });
  if (b.constant === 0) throw new Refusal({ tag: 'division-by-zero', at });
  return scaled(a, 1 / b.constant);
}
