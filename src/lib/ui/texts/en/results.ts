import { inSentence } from '../../format/unit-text.ts';

export const results = {
  title: 'Results',
  heading: (campaign: string) => `Results: ${campaign}`,
  waiting: 'Computing …',
  waitingFor: (seconds: string) => `Computing, ${seconds} s so far. You may go on working; the screen stays free.`,
  stages: {
    design: 'Counting what is left of the design',
    limits: 'Allowing for readings at a limit',
    ranks: 'Ranks',
    answer: 'The answer',
    start: 'Reading the record',
    fixed: 'Adjusting for sessions',
    random: 'Estimating the session variance',
    comparisons: 'Comparing the treatments',
    diagnostics: 'Looking at the residuals',
    ruined: 'With and without the ruined runs'
  } as Record<string, string>,
  cancel: 'Stop computing',
  cancelled: 'Computing was stopped. The record is not affected.',
  again: 'Compute again',
  failed:
    'The computation broke off. The record is not affected; compute again, and keep the message below for the person who looks after the program.',
  noPlan: 'This campaign has no issued plan yet, so there is nothing to compare. Issue the plan first.',
  toBench: 'To the bench',
  toDesk: 'Bring in a file',
  question: 'Question',
  demo: 'invented demo data',
  measurand: 'Measurand',
  primary: 'primary',
  primaryLong: 'primary analysis, fixed in the plan',
  level: (level: string) => `${level} interval`,
  contents: 'Underneath',
  contentsHint: 'Each layer says its finding in one line; open it for the figures.',
  open: 'Open',
  looks: 'Look at this first',
  nothingToLook: 'No warning: the checks found nothing to look at.',
  todo: 'To do',
  picture: (what: string) => `Adjusted means: ${inSentence(what)}`,
  pictureSummary: (level: string, what: string, first: string, last: string) =>
    `Adjusted means of ${inSentence(what)} with ${level} intervals, best first: from ${first} to ${last}. Plain averages beside, letters at the right.`,
  legend: {
    estimate: 'adjusted mean',
    interval: (level: string) => `${level} interval`,
    plain: 'plain average',
    letters: 'one letter in common: not told apart'
  },
  letters: 'letters',
  pointLabel: (name: string, mean: string, lower: string, upper: string, plain: string) =>
    `${name}: adjusted mean ${mean}, interval ${lower} to ${upper}; plain average ${plain}`,
  pointLabelBare: (name: string, mean: string) => `${name}: ${mean}`,
  table: {
    caption: (what: string, unit: string) => `${what}${unit ? `, ${unit}` : ''}: every treatment, best first`,
    treatment: 'Treatment',
    control: 'control',
    adjusted: 'Adjusted mean',
    se: 'Standard error',
    interval: (level: string) => `${level} interval`,
    letters: 'Letters',
    plain: 'Plain average',
    runs: 'Runs that count',
    shift: 'Adjusted − plain',
    part: 'Group',
    none: 'no reading'
  },
  models: {
    title: 'Sessions fixed and random',
    finding: (agree: boolean): string =>
      agree
        ? 'Both ways to treat sessions lead to the same order of means.'
        : 'The two ways to treat sessions order the means differently.',
    absent: 'Only one of the two analyses is possible here.',
    fixed: 'Sessions fixed',
    random: 'Sessions random',
    fixedWhy: 'Compares only inside sessions. Needs no assumption on how sessions vary; the safe choice.',
    randomWhy:
      'Uses the session totals too, as if sessions were drawn by chance from many. Sharper when sessions differ little.',
    df: 'Degrees of freedom',
    caption: 'Adjusted means both ways'
  },
  several: {
    title: 'Several measurands',
    caption: 'Every treatment by every measurand',
    order: (first: string) => `Best first by ${inSentence(first)}.`,
    alone:
      'Each measurand was analysed for itself: letters and ranks hold inside their own columns, and no measurand was weighed against another.',
    agree: (n: string, name: string) => `${n} measurands; ${name} has the best adjusted mean in each.`,
    disagree: (n: string) => `${n} measurands; they do not name the same treatment first.`,
    each: (n: string) => `${n} measurands; each has its own answer.`,
    computing: (known: string, all: string) => `Computed so far: ${known} of ${all} measurands.`,
    mean: 'Adjusted mean',
    letters: 'Letters',
    rank: 'Rank',
    better: {
      lower: 'lower is better',
      higher: 'higher is better',
      target: (value: string) => `nearest to ${value} is best`
    },
    full: 'Full result',
    fullOf: (what: string) => `Full result: ${inSentence(what)}`,
    shown: 'shown on this page',
    note: (what: string, why: string) => `${what}: ${why}`
  },
  runName: (treatment: string, session: string, slot: string | null) =>
    `${treatment}, ${session}${slot === null ? '' : `, slot ${slot}`}`,
  session: (number: string) => `session ${number}`,
  noneOpen: 'No campaign is open.',
  formulaFault: 'The formula of this measurand cannot be used. See the plan; the readings are not affected.',
  newRecord: 'New readings have come in since this was computed.',
  stale: 'Compute with them',
  took: (seconds: string) => `Computed in ${seconds} s on this device.`,
  save: 'Take it with you',
  report: 'Report',
  package: 'Data package',
  decision:
    'Results are decision support, not certification. The laboratory’s procedures and local rules take precedence.'
};
