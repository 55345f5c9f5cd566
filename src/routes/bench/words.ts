import type { Finding } from '#lib/core/campaign/checks/finding.ts';
import type { UnderstoodReading } from '#lib/core/campaign/parse-reading.ts';
import type { Plan, Range } from '#lib/core/campaign/plan.ts';
import type { BenchWords } from '#lib/state/bench/bench-words.ts';
import { writtenPlain, writtenValue } from '#lib/ui/format/reading-text.ts';
import { unitText } from '#lib/ui/format/unit-text.ts';
import { writer } from '#lib/ui/format/writer.svelte.ts';
import { findingTexts } from '#lib/ui/texts/findings.ts';

interface Quantity {
  unit: string;
  decimals: number;
}

/** A value with its unit, in the person's decimal sign. */
export function quantity(value: number, { unit, decimals }: Quantity): string {
  const number = writtenValue(value, decimals, writer().locale);
  return unit === '' ? number : `${number} ${unit}`;
}

/** The same as typed: every digit that was given. */
export function quantityAsTyped({ plain, limit }: UnderstoodReading, unit: string): string {
  const sign = limit === 'at-least' ? '≥ ' : limit === 'at-most' ? '≤ ' : '';
  const number = sign + writtenPlain(plain, writer().locale);
  return unit === '' ? number : `${number} ${unit}`;
}

/** A range with its unit once; empty where no limit is set. */
export function rangeText(range: Range, of: Quantity): string {
  const last = range.max !== null ? 'max' : 'min';
  const write = (side: 'min' | 'max') => {
    const value = range[side];
    if (value === null) return null;
    return side === last ? quantity(value, of) : quantity(value, { ...of, unit: '' });
  };
  return findingTexts().range(write('min'), write('max'));
}

/** What a check says, in plain words, with what was expected. */
export function findingText(finding: Finding, of: Quantity, plan: Plan | null): string {
  const t = findingTexts();
  // As few digits as say it: 35 to 55 g, not 35.0000 to 55.0000 g.
  const natural = { unit: of.unit, decimals: 0 };
  const value = quantity(finding.value, natural);
  switch (finding.check) {
    case 'impossible':
    case 'unexpected': {
      const measurand = plan?.measurands.find(({ id }) => id === finding.measurand);
      if (measurand) {
        const its = { decimals: measurand.decimals, unit: unitText(measurand.unit) };
        const range = rangeText(finding.range, { ...its, decimals: 0 });
        return t.measurandOutside[finding.check](measurand.label, quantity(finding.value, its), finding.side, range);
      }
      return t[finding.check](value, finding.side, rangeText(finding.range, natural));
    }
    case 'slip': {
      const [first] = finding.candidates;
      return first ? t.slip(quantity(first.value, natural), first.how) : '';
    }
    case 'stuck':
      return t.stuck(value, finding.times);
    case 'surprise': {
      const measurand = plan?.measurands.find(({ id }) => id === finding.measurand);
      const its = measurand ? { decimals: measurand.decimals, unit: unitText(measurand.unit) } : of;
      const low = quantity(finding.low, { ...its, unit: '' });
      return t.surprise(measurand?.label ?? '', quantity(finding.value, its), low, quantity(finding.high, its));
    }
    case 'condition': {
      const condition = plan?.conditions.find(({ id }) => id === finding.condition);
      return t.condition(condition?.label ?? '', value, finding.side, rangeText(finding.window, natural));
    }
  }
}

/** Decimals in which limits of a condition are written. */
export const conditionQuantity = (unit: string): Quantity => ({ unit, decimals: 0 });

export function benchWords(plan: () => Plan | null): BenchWords {
  return {
    finding: (finding, definition) => findingText(finding, { ...definition, unit: unitText(definition.unit) }, plan()),
    slipTaken: (typed, taken, { unit }) =>
      findingTexts().slipTaken(typed, quantity(taken, { unit: unitText(unit), decimals: 0 })),
    condition: (finding, condition) => findingText(finding, conditionQuantity(condition.unit), plan())
  };
}

/** `mm:ss`, or `h:mm:ss` from an hour on. */
export function clockText(seconds: number): string {
  const whole = Math.floor(Math.abs(seconds));
  const two = (n: number) => String(n).padStart(2, '0');
  const [hours, minutes, rest] = [Math.floor(whole / 3600), Math.floor(whole / 60) % 60, whole % 60];
  return hours > 0 ? `${hours}:${two(minutes)}:${two(rest)}` : `${two(minutes)}:${two(rest)}`;
}

/** Time of day of a recorded moment, where it was recorded. */
export const timeOfDay = (at: string): string => at.slice(11, 16);
