import type { Bound, DesignChoice, ProposeError, Reason } from '#lib/core/design/propose-types.ts';

const times = (n: number) => (n === 1 ? 'once' : n === 2 ? 'twice' : `${n} times`);
const span = (range: { min: number; max: number }, say: (n: number) => string, or = ' or ') =>
  range.min === range.max
    ? say(range.min)
    : `${range.min}${range.max === range.min + 1 ? or : ' to '}${say(range.max)}`;
const plainTimes = (n: number) => `${n} times`;

export const planChoices = {
  heading: 'How many sessions are enough?',
  demoMark: 'invented demo data',
  toChoices: 'Choices',
  waiting: 'As soon as there are two treatments and a machine with a slot, the choices stand here.',
  /** The design as a person would say it aloud. */
  sentence: (c: {
    treatments: number;
    sessions: number;
    size: { min: number; max: number };
    replication: { min: number; max: number };
    concurrence: { min: number; max: number };
  }): string => {
    const all = c.size.min === c.treatments && c.size.max === c.treatments;
    const size = all ? 'all in every session' : `${span(c.size, String)} to a session`;
    const each = c.replication.max === c.replication.min ? times(c.replication.min) : span(c.replication, plainTimes);
    const pair =
      c.concurrence.max === c.concurrence.min
        ? c.concurrence.min === 0
          ? 'never together'
          : `together ${times(c.concurrence.min)}`
        : `together ${c.concurrence.min === 0 ? `at most ${times(c.concurrence.max)}` : span(c.concurrence, plainTimes)}`;
    const sessions = c.sessions === 1 ? '1 session' : `${c.sessions} sessions`;
    return all
      ? `${c.treatments} treatments, ${size}, ${sessions}; each treatment ${each}.`
      : `${c.treatments} treatments, ${size}, ${sessions}; each treatment ${each}, each pair ${pair}.`;
  },
  recommended: 'recommended',
  reason: (reason: Reason, write: { value: (n: number) => string }): string => {
    switch (reason.tag) {
      case 'finds-difference':
        return `Recommended because it is the shortest that finds a difference of ${write.value(reason.difference)}: with ${reason.sessions} sessions ${write.value(reason.detectable)} is found in 8 of 10 cases.`;
      case 'most-precise-in-budget':
        return `Recommended because no other within the sessions you can afford is more precise: ${reason.sessions} sessions find ${write.value(reason.detectable)}.`;
      case 'balanced-in-budget':
        return `Recommended because it is balanced: in ${reason.sessions} sessions each pair meets ${times(reason.meets)}, so all comparisons are equally precise.`;
      case 'only-choice':
        return `The only choice for these numbers: ${reason.sessions} sessions.`;
    }
  },
  chosenByHand: 'Chosen by you; the recommendation is another one.',
  followAgain: 'Follow the recommendation',
  running: (percent: string) => `Looking for better designs: ${percent}`,
  done: (n: number) => (n === 1 ? '1 choice' : `${n} choices`),
  cancel: 'Stop here',
  cancelled: 'Stopped; these are the best found so far.',
  thorough: 'Look longer',
  failed: 'The search broke off. The choices shown are sound; try again for more.',
  table: {
    caption: 'Choices, fewest sessions first',
    choose: 'Choose',
    sessions: 'Sessions',
    specimens: 'Specimens',
    each: 'Each treatment',
    pairs: 'Pairs meet',
    efficiency: 'Efficiency',
    finds: 'Finds',
    time: 'Time',
    kind: 'Kind',
    balanced: 'balanced',
    complete: 'complete',
    near: 'not balanced',
    disconnected: 'falls apart',
    unfit: 'beyond what you have',
    more: (n: number) => `Show all ${n} choices`,
    fewer: 'Show fewer',
    shifts: (n: number) => (n === 1 ? '1 shift' : `${n} shifts`),
    hours: (hours: string) => `${hours} h`
  },
  plot: {
    title: 'Sessions against the difference that is found',
    summary: (n: number) =>
      `${n} choices; fewer sessions lie left, smaller detectable differences lie low. Balanced designs are filled squares on a beam.`,
    x: 'Sessions',
    y: (basis: string, unit: string) => `Found in 8 of 10 cases, ${basis}${unit ? `, in ${unit}` : ''}`,
    matters: 'matters',
    point: (sessions: number, finds: string, kind: string) => `${sessions} sessions find ${finds}, ${kind}`,
    columns: ['Sessions', 'Finds', 'Kind'],
    legend: { balanced: 'balanced', near: 'not balanced', chosen: 'chosen' },
    none: 'With no error degrees of freedom nothing can be said about detectable differences.'
  },
  basis: { tukey: 'all pairs (Tukey)', unadjusted: 'one pair' },
  sigma: 'σ',
  sigmaNote: 'In units of the scatter σ, until you say how large it is.',
  detail: {
    heading: 'This design',
    efficiency: 'Efficiency',
    efficiencyWhy: 'Information kept, compared with complete sessions of the same size and number of specimens.',
    bound: 'Of the best possible',
    boundWhy: (by: Bound['by']) =>
      ({
        mean: 'Bound from the mean of the eigenvalues.',
        concurrence: 'Bound from how evenly pairs can meet.',
        dual: 'Bound from the dual design.',
        resolvable: 'Bound for designs whose shifts hold every treatment once.',
        control: 'Bound for designs with a control in every session.'
      })[by],
    proven: 'no design can be better',
    sed: 'Standard error of a difference',
    sedRange: (from: string, to: string) => `${from} to ${to}, by pair`,
    finds: 'Finds, in 8 / 9 of 10 cases',
    findsOne: 'one pair by itself',
    findsAll: 'all pairs (Tukey)',
    power: 'Chance to find the difference that matters',
    df: 'Error degrees of freedom',
    time: 'Machine time',
    minutes: (hours: string) => `${hours} h on the machine`,
    rounds: (n: number) => `${n} loadings one after the other`,
    control: 'Mean variance, control / others',
    controlWhy: 'In units of σ²: a test against a control, a test against a test.',
    origin: 'How it was made',
    checked: 'Counted before it was shown: sessions, replication and every pair.',
    smallestBalanced: (s: { sessions: number; replication: number; meets: number }) =>
      `The smallest balanced design would take ${s.sessions} sessions, each treatment ${times(s.replication)}.`
  },
  map: {
    title: 'Who meets whom',
    summary: (min: number, max: number) =>
      min === max ? `Each pair of treatments meets in ${max} sessions.` : `Pairs meet in ${min} to ${max} sessions.`,
    meet: (one: string, other: string, n: number) =>
      n === 0 ? `${one} and ${other} never meet` : `${one} and ${other} meet ${times(n)}`,
    columns: ['Treatment', 'Treatment', 'Sessions together'],
    legend: { none: 'never', few: 'fewer', many: 'more' },
    placeholder: 'Names are drawn by lot when the plan is issued: which treatment takes which place is not yet fixed.'
  },
  slots: {
    heading: 'Slots and an early stop',
    exact: 'Each treatment visits each slot equally often.',
    'within-one': 'Each treatment visits the slots equally often, up to one visit: the best possible.',
    near: 'Slots in service differ, so visits are as even as a search could make them.',
    early: (after: number, of: number) =>
      `If work stops early: from session ${after} of ${of} on, all treatments can be compared.`,
    never: 'These sessions never tie all treatments together.',
    kept: (sessions: number, percent: string) => `${sessions} sessions: ${percent}`,
    keptTitle: 'What an early stop would leave',
    keptSummary: 'Information after each session, as a share of the whole plan.',
    keptY: 'Information kept',
    busy: 'Drawing slots and order …'
  },
  error: (error: ProposeError): string => {
    switch (error.tag) {
      case 'too-few-sessions':
        return `${error.sessions} sessions are too few: at least ${error.needed} are needed before all treatments can be compared.`;
      case 'too-few-specimens':
        return `Treatment ${error.treatment + 1} has too few specimens to be compared with the others.`;
      case 'constraints-contradict':
        return `What you ask for contradicts itself: ${error.why}`;
      case 'bad-request':
        return `This cannot be planned: ${error.why}`;
    }
  },
  control: {
    every: 'The control in every session',
    everyHint: 'Then each treatment is compared with it directly; comparisons among the others lose a little.',
    weigh: 'What should be most precise',
    weighs: {
      'test-control': 'each treatment against the control',
      'test-test': 'the treatments among each other',
      half: 'both alike'
    }
  },
  construction: (choice: Pick<DesignChoice, 'construction'>) => choice.construction.text
};
