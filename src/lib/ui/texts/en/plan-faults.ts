import type { DraftFault } from '#lib/core/campaign/draft/draft-fault.ts';

/** What the formula module found wrong, in plain data. */
export interface FormulaTrouble {
  tag: string;
  [detail: string]: unknown;
}

const list = (items: unknown) => (Array.isArray(items) ? items.join(', ') : '');
const unit = (text: unknown) => (text === '' ? 'a plain number' : `in ${String(text)}`);

export const planFaults = {
  fault: (fault: DraftFault): string => {
    switch (fault.tag) {
      case 'title-empty':
        return 'Give the campaign a title.';
      case 'treatments-too-few':
        return `A comparison needs at least ${fault.least} treatments. Type or paste them.`;
      case 'treatments-too-many':
        return `Designs are made for up to ${fault.most} treatments. Split the comparison.`;
      case 'name-empty':
        return 'This needs a name.';
      case 'name-twice':
        return `“${fault.name}” is there twice. Two names must differ, or their results would be mixed.`;
      case 'too-long':
        return `Too long: at most ${fault.most} characters.`;
      case 'not-a-number':
        return `“${fault.text}” is not a number.`;
      case 'two-meanings':
        return fault.candidates.length > 1
          ? `“${fault.text}” can mean ${fault.candidates.join(' or ')}. Write it so that only one is possible (1.2340 or 1234).`
          : `“${fault.text}” is not finished.`;
      case 'not-whole':
        return `A whole number from ${fault.least} to ${fault.most} is needed.`;
      case 'not-positive':
        return 'This must be more than nothing.';
      case 'needed':
        return 'This is needed.';
      case 'range-upside-down':
        return 'The lower limit is above the upper one.';
      case 'expected-beyond-possible':
        return '“Look again” reaches beyond what “cannot be”. Make it narrower, or the other wider.';
      case 'no-slot-in-service':
        return 'No slot is in service. At least one is needed.';
      case 'id-not-a-name':
        return `“${fault.text}” cannot be used in a formula: begin with a letter; then letters, digits and _ only.`;
      case 'id-twice':
        return `“${fault.id}” is there twice. Each name in the formula stands for one thing.`;
      case 'formula-empty':
        return 'Write the formula, for instance before - after.';
      case 'no-measurand':
        return 'Say what is measured.';
      case 'alpha-out-of-range':
        return 'α lies between 0 and 0.5; 0.05 is usual.';
      case 'control-needed':
        return 'Mark a treatment as the control, or choose another comparison.';
      case 'fewer-specimens-than-two':
        return 'With fewer than two specimens this treatment can hardly be compared.';
      case 'complete-sessions':
        return `The machine has ${fault.slots} slots for ${fault.treatments} treatments: every session can hold all of them (complete sessions). That is allowed, and the simplest plan there is.`;
    }
  },
  formula: (trouble: FormulaTrouble): string => {
    const { tag } = trouble;
    const say = (key: string) => String(trouble[key]);
    switch (tag) {
      case 'formula-empty':
        return 'Write the formula, for instance before - after.';
      case 'formula-too-long':
        return `The formula is too long: at most ${say('most')} characters.`;
      case 'formula-too-deep':
        return 'The formula has too many brackets inside each other.';
      case 'formula-syntax':
        return `${
          trouble.at === null
            ? 'The formula makes no sense.'
            : `The formula makes no sense from character ${say('at')} on.`
        }${trouble.comma === true ? ' In a formula the decimal sign is a point: write 0.5, not 0,5.' : ''}`;
      case 'formula-forbidden':
        return `“${say('what')}” is not allowed in a formula. Allowed are names, numbers, + − * / ^, brackets and the listed functions.`;
      case 'formula-implicit-product':
        return `Between “${say('left')}” and “${say('right')}” the sign is missing. Write * for times.`;
      case 'formula-unknown-name':
        return `“${say('name')}” is neither a reading nor a constant. ${
          list(trouble.known) === '' ? 'Add it below.' : `Known are: ${list(trouble.known)}.`
        }`;
      case 'formula-unknown-function':
        return `“${say('name')}” is not a function here. Known are: ${list(trouble.known)}.`;
      case 'formula-ambiguous-log':
        return '“log” means two things. Write ln for the natural or log10 for the decimal logarithm.';
      case 'formula-argument-count':
        return `${say('name')} takes ${say('least')}${trouble.most === null ? ' or more' : ''} value${
          trouble.least === 1 && trouble.most === 1 ? '' : 's'
        }, not ${say('actual')}.`;
      case 'formula-reserved-name':
        return `“${say('name')}” has a meaning of its own in formulas. Choose another name for the reading or constant.`;
      case 'formula-duplicate-name':
        return `“${say('name')}” stands for two things. Rename one.`;
      case 'formula-missing-reading':
        return `There is no reading “${say('name')}” to take it from.`;
      case 'unit-not-understood':
        return `The unit “${say('unit')}”${trouble.of === '' ? '' : ` of ${say('of')}`} makes no sense. Write it like g/cm³, m^2 or N/mm².`;
      case 'units-differ':
        return `${say('left')} is ${unit(trouble.leftUnit)}, ${say('right')} is ${unit(trouble.rightUnit)}: these cannot be ${
          { add: 'added', subtract: 'subtracted', compare: 'compared' }[say('how')] ?? 'joined'
        }, because they are different kinds of quantity.`;
      case 'unit-in-exponent':
        return `${say('text')} is ${unit(trouble.unit)}: an exponent must be a plain number.`;
      case 'unit-to-unknown-power':
        return `${say('text')} is ${unit(trouble.unit)} and is raised to the power ${say('power')}, which changes from run to run: the result would have no unit.`;
      case 'unit-in-function':
        return `${say('name')} takes a plain number, but ${say('text')} is ${unit(trouble.unit)}.`;
      case 'unit-of-result':
        return `The formula gives ${trouble.found === '' ? 'a plain number' : say('found')}, but the unit above is ${
          trouble.wanted === '' ? 'empty' : say('wanted')
        }: these are different kinds of quantity.`;
      case 'value-missing':
        return `${say('name')} has no value yet.`;
      case 'division-by-zero':
        return `${say('text')} is zero, and nothing can be divided by zero.`;
      case 'not-real':
        return `${say('text')} has no value for these numbers.`;
      case 'not-finite':
        return `${say('text')} is too large to be a number.`;
      default:
        return 'The formula cannot be used.';
    }
  }
};
