import { createUnitClass } from 'mathjs';
import { create, factory } from 'mathjs/number';

declare module 'mathjs' {
  /** Exported by the library, but missing from its types. */
  export const createUnitClass: FactoryFunctionMap;
}

/** What one unit name means: its size in SI units, and its dimension over the nine bases of the library. */
export interface KnownUnit {
  size: number;
  dimension: readonly number[];
}

interface LibraryUnit {
  dimensions: number[];
  units: { unit: { value: unknown; offset: number }; prefix: { value: number } }[];
}
interface UnitClass {
  isValuelessUnit: (name: string) => boolean;
  parse: (text: string) => LibraryUnit;
}

const given = (name: string, value: unknown) => factory(name, [], () => value);
class NotUsed {}

/** The library's unit class over plain numbers: only its table of units is used, not its arithmetic. */
const { Unit } = create(
  {
    createUnitClass,
    ...Object.fromEntries(
      Object.entries({
        addScalar: (a: number, b: number) => a + b,
        subtractScalar: (a: number, b: number) => a - b,
        multiplyScalar: (a: number, b: number) => a * b,
        divideScalar: (a: number, b: number) => a / b,
        pow: (a: number, b: number) => a ** b,
        abs: Math.abs,
        fix: Math.trunc,
        round: Math.round,
        equal: (a: number, b: number) => a === b,
        isNumeric: (value: unknown) => typeof value === 'number',
        format: String,
        number: Number,
        Complex: NotUsed,
        BigNumber: NotUsed,
        Fraction: NotUsed
      }).map(([name, value]) => [name, given(name, value)])
    )
  },
  {}
) as unknown as { Unit: UnitClass };

/**
 * Returns what a single unit name means, or null when the library does not know it as a plain multiple of SI units:
 * a temperature scale with a shifted zero (°C, °F) is null too.
 */
export function knownUnit(name: string): KnownUnit | null {
  if (!/^[a-zA-Z][a-zA-Z0-9]*$/.test(name) || !Unit.isValuelessUnit(name)) return null;
  const parsed = Unit.parse(name);
  const [only] = parsed.units;
  if (!only || parsed.units.length !== 1 || only.unit.offset !== 0 || typeof only.unit.value !== 'number') return null;
  return { size: only.unit.value * only.prefix.value, dimension: parsed.dimensions };
}
