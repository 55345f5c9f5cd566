import { fail, ok, type Result } from '#lib/core/result.ts';
import { knownUnit } from './unit-library.ts';

/**
 * A unit as a product of powers. `size` is its size in SI units; `dimension` the powers of the bases it is made of
 * (SI bases and units of their own such as "points"); `names` the powers as they were written, for showing.
 */
export interface Unit {
  size: number;
  dimension: ReadonlyMap<string, number>;
  names: ReadonlyMap<string, number>;
}

const bases = ['mass', 'length', 'time', 'current', 'temperature', 'luminous', 'amount', 'angle', 'bit'];
const superscripts = '⁰¹²³⁴⁵⁶⁷⁸⁹';
/** Names a laboratory means as a count or a scale of its own, whatever a unit library makes of them. */
const ownKinds = /^(cycles?|revs?|revolutions?|strokes?|turns?|points?|score|grade|counts?|pieces?|b|B|VAR)$/;

const shares = new Map([
  ['%', 0.01],
  ['‰', 0.001],
  ['ppm', 1e-6],
  ['ppb', 1e-9]
]);

export const plain: Unit = { size: 1, dimension: new Map(), names: new Map() };

/**
 * Returns what a unit text means: "g/(m²·g/cm³)", "µm", "N mm^-2", "%", or nothing for a plain number.
 *
 * A name the table does not know ("GU", "points", "°C") is a unit of its own kind: it equals only itself.
 *
 * **Source** of the table: mathjs units. **Checked by** test/formula/unit.test.ts
 */
export function readUnit(text: string): Result<Unit, { tag: 'unit-not-understood'; unit: string }> {
  const tokens = tokenise(text);
  if (tokens.length === 0) return ok(plain);
  const reader = { tokens, at: 0 };
  const unit = readProduct(reader);
  return unit && reader.at === tokens.length ? ok(unit) : fail({ tag: 'unit-not-understood', unit: text });
}

export const multiply = (a: Unit, b: Unit, power = 1): Unit => ({
  size: a.size * b.size ** power,
  dimension: addPowers(a.dimension, b.dimension, power),
  names: addPowers(a.names, b.names, power)
});

export const raise = (unit: Unit, power: number): Unit => multiply(plain, unit, power);

export const sameKind = (a: Unit, b: Unit): boolean => addPowers(a.dimension, b.dimension, -1).size === 0;

/** Returns the unit as a person writes it: "cm³/m²", "1/s", and "" for a plain number. */
export function printUnit(unit: Unit): string {
  const side = (sign: 1 | -1) =>
    [...unit.names].filter(([, power]) => power * sign > 0).map(([name, power]) => name + printPower(power * sign));
  const [over, under] = [side(1), side(-1)];
  if (under.length === 0) return over.join('·');
  return `${over.join('·') || '1'}/${under.length > 1 ? `(${under.join('·')})` : under.join('')}`;
}

function printPower(power: number): string {
  if (power === 1) return '';
  if (!Number.isInteger(power)) return `^${Number(power.toPrecision(4))}`;
  return [...String(power)].map((digit) => superscripts[Number(digit)]).join('');
}

function addPowers(a: ReadonlyMap<string, number>, b: ReadonlyMap<string, number>, times: number): Map<string, number> {
  const sum = new Map(a);
  for (const [name, power] of b) {
    const total = (sum.get(name) ?? 0) + times * power;
    if (Math.abs(total) < 1e-12) sum.delete(name);
    else sum.set(name, total);
  }
  return sum;
}

const name = /^[\p{L}°'"$€_]+(?:\d+\p{L}+)*$/u;
const token = /[\p{L}°'"$€_]+(?:\d+\p{L}+)*|-?\d+(?:\.\d+)?|\S/gu;

/** "mm²·s" → mm ^ 2 · s. Multiplication signs, blanks and superscripts come in many forms. */
function tokenise(text: string): string[] {
  const plainText = text
    .normalize('NFC')
    .replace(/[⁺⁻]?[⁰¹²³⁴⁵⁶⁷⁸⁹]+/g, (power) => '^' + [...power].map(plainDigit).join(''))
    .replace(/−/g, '-')
    .replace(/\*\*/g, '^');
  const tokens: string[] = plainText.match(token) ?? [];
  // "mm2" is mm ^ 2.
  return tokens.flatMap((part, i) => (/^-?\d+$/.test(part) && name.test(tokens[i - 1] ?? '') ? ['^', part] : [part]));
}

const plainDigit = (sign: string) => (sign === '⁻' ? '-' : sign === '⁺' ? '' : String(superscripts.indexOf(sign)));

interface Reader {
  tokens: string[];
  at: number;
}

function readProduct(reader: Reader): Unit | null {
  let unit = readPower(reader);
  while (unit && reader.at < reader.tokens.length && reader.tokens[reader.at] !== ')') {
    const sign = reader.tokens[reader.at] ?? '';
    const divided = /^[/∕÷]$/.test(sign);
    if (divided || /^[*·⋅×]$/.test(sign)) reader.at++;
    const next = readPower(reader);
    unit = next && multiply(unit, next, divided ? -1 : 1);
  }
  return unit;
}

function readPower(reader: Reader): Unit | null {
  const unit = readAtom(reader);
  if (!unit || reader.tokens[reader.at] !== '^') return unit;
  const power = Number(reader.tokens[reader.at + 1]);
  if (!Number.isInteger(power) || Math.abs(power) > 20) return null;
  reader.at += 2;
  return raise(unit, power);
}

function readAtom(reader: Reader): Unit | null {
  const token = reader.tokens[reader.at++];
  if (token === undefined) return null;
  if (token === '(') {
    const inside = readProduct(reader);
    return reader.tokens[reader.at++] === ')' ? inside : null;
  }
  if (token === '1') return plain;
  const share = shares.get(token);
  if (share !== undefined) return { size: share, dimension: new Map(), names: new Map([[token, 1]]) };
  return name.test(token) ? named(token) : null;
}

function named(text: string): Unit {
  const plainName = text.replace(/^[µμ]/, 'u').replace(/[ΩΩ]$/, 'ohm').replace(/^Å$/, 'angstrom').replace(/^°$/, 'deg');
  const known = ownKinds.test(text) ? null : knownUnit(plainName);
  const names = new Map([[text, 1]]);
  if (!known) return { size: 1, dimension: new Map([[`own ${text}`, 1]]), names };
  const dimension = new Map(
    known.dimension.flatMap((power, i) => (power ? [[bases[i] ?? String(i), power] as const] : []))
  );
  return { size: known.size, dimension, names };
}
