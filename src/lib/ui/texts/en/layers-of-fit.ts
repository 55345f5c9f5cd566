import { pIs } from '../p-value.ts';

/** Layers that follow the figures of the fit, from the comparisons to the checks. */
export const layersOfFit = {
  comparisons: {
    title: 'Comparisons',
    finding: (different: string, total: string) =>
      `${different} of ${total} pairs differ, all pairs considered together.`,
    method: 'Method',
    model: 'Sessions',
    methods: {
      tukey: { name: 'All pairs (Tukey–Kramer)', when: 'Right when every pair is of interest, and for the letters.' },
      holm: {
        name: 'All pairs (Holm)',
        when: 'Right when a few pairs of many are of interest and nothing else is assumed.'
      },
      none: { name: 'Single pair, unadjusted', when: 'Right only for a pair named before the first run.' },
      dunnett: {
        name: 'Against the control (Dunnett)',
        when: 'Right when only differences to the control matter; sharper than all pairs.'
      },
      hsu: { name: 'Against the best (Hsu)', when: 'Right when the question is which treatments may be the best.' },
      equivalence: {
        name: 'Equivalent to the control',
        when: 'Right when a treatment is to be shown as good as the control.'
      },
      contrasts: {
        name: 'Questions typed in the plan',
        when: 'Right for a comparison of groups or a trend, named before data.'
      }
    },
    planned: 'fixed in the plan',
    pair: 'Pair',
    difference: 'Difference',
    se: 'Standard error',
    interval: (level: string) => `${level} interval`,
    p: 'p',
    verdict: 'Verdict',
    differs: 'differ',
    same: 'not told apart',
    lost: 'cannot be compared',
    mayBeBest: 'may be the best',
    notBest: 'not the best',
    isBest: 'the best',
    equivalent: 'equivalent',
    notEquivalent: 'not shown equivalent',
    picture: (method: string) => `Differences: ${method}`,
    pictureSummary: (n: string) =>
      `${n} differences with intervals around zero; an interval that leaves zero out shows a difference.`,
    bandSummary: (margin: string) => `The band marks the margin of ${margin}.`,
    label: (pair: string, d: string, lower: string, upper: string, verdict: string) =>
      `${pair}: ${d}, interval ${lower} to ${upper}; ${verdict}`,
    versus: (a: string, b: string) => `${a} − ${b}`,
    focus: 'Show the pairs of',
    all: 'all treatments',
    many: (shown: string, total: string) =>
      `${shown} of ${total} pairs are listed. Choose a treatment to see its pairs.`,
    matrix: 'Every pair at a glance',
    accuracy: (error: string) => `p to within ${error} (simulated to a stated error)`,
    contrast: 'Question',
    estimate: 'Estimate',
    unadjustedInterval:
      'This method adjusts p but has no simultaneous interval; the intervals shown are of single pairs.'
  },
  sessions: {
    title: 'Sessions',
    finding: (spread: string, trend: string) => `Sessions lay between ${spread} of their average. ${trend}`,
    spread: (low: string, high: string) => `${low} and ${high}`,
    drift: (slope: string, p: string) => `They drift by ${slope} a session (${pIs(p)}).`,
    noDrift: (p: string) => `No drift is shown (${pIs(p)}).`,
    noTest: '',
    picture: 'Session offsets in loading order',
    pictureSummary: 'How far each session lay from the average session, in the order they were run.',
    x: 'session, in loading order',
    y: (unit: string) => `offset${unit ? `, ${unit}` : ''}`,
    label: (name: string, fixed: string, random: string) =>
      `${name}: offset ${fixed}; drawn in with sessions random ${random}`,
    number: 'Session',
    shift: 'Shift',
    total: 'Total of readings',
    size: 'Runs that count',
    fixed: 'Offset, fixed',
    random: 'Offset, random',
    sd: 'its uncertainty',
    legendFixed: 'sessions fixed',
    legendRandom: 'sessions random'
  },
  workings: {
    title: 'Workings',
    finding: (sum: string) =>
      `The effects add to ${sum}: every step of the adjustment, to be followed with a calculator.`,
    treatment: 'Treatment',
    T: 'Total T',
    B: 'Session totals B',
    kQ: 'kQ = kT − B',
    means: 'Session means',
    Q: 'Q = T − session means',
    effect: 'Effect',
    sum: 'Sum',
    balanced: (t: string, k: string, r: string, lambda: string) =>
      `Balanced: t = ${t} treatments, k = ${k} a session, r = ${r} runs each, each pair together λ = ${lambda} times. Effect = kQ / (λt).`,
    unbalanced: 'Not balanced: the effects solve C τ̂ = Q together; the table shows Q and the solution.',
    further:
      'Further causes (slot, machine, shift or a specimen property) are in the model, so the effects are not from Q alone.',
    sessions: 'Session totals',
    session: 'Session',
    total: 'Total',
    size: 'Runs'
  },
  precision: {
    title: 'Scatter and efficiency',
    finding: (sigma: string, sed: string) =>
      `Runs scatter by ${sigma} inside a session; a difference has a standard error of ${sed} on average.`,
    anova: 'Analysis of variance',
    source: 'Source',
    df: 'df',
    ss: 'Sum of squares',
    ms: 'Mean square',
    F: 'F',
    p: 'p',
    order: { adjusted: 'adjusted', unadjusted: 'unadjusted' },
    sources: {
      treatment: 'Treatments',
      session: 'Sessions',
      slot: 'Slots',
      machine: 'Machines',
      shift: 'Shifts',
      covariate: 'Specimen property'
    } as Record<string, string>,
    error: 'Error',
    total: 'Total',
    variance: 'Variances, sessions random',
    between: 'between sessions',
    within: 'between runs of a session',
    sd: 'Standard deviation',
    share: 'Share',
    test: (p: string) => `Test of no session variance: ${pIs(p)}.`,
    zero: 'The session variance was estimated as zero: sessions differed no more than chance.',
    design: 'The design that is left',
    planned: 'As planned',
    kept: 'Runs that count',
    runs: 'Runs',
    sessionsN: 'Sessions',
    replication: 'Runs a treatment',
    meetings: 'Meetings of a pair',
    balanced: 'Balanced',
    yes: 'yes',
    no: 'no',
    efficiency: 'Efficiency',
    seDifference: 'Standard error of a difference, average (smallest to largest)',
    range: (low: string, high: string) => (low === high ? low : `${low} to ${high}`)
  },
  diagnostics: {
    title: 'Diagnostics',
    finding: (n: number) =>
      n === 0
        ? 'The residuals give no cause for concern.'
        : `${n} ${n === 1 ? 'check asks' : 'checks ask'} for a look.`,
    residual: 'studentised residual',
    fitted: 'fitted value',
    byFitted: 'Residuals against fitted values',
    bySession: 'Residuals in session order',
    bySlot: 'Residuals by slot',
    byTreatment: 'Residuals by treatment',
    normal: 'Normal plot with envelope',
    theoretical: 'expected of normal readings',
    slot: 'slot',
    session: 'session, in loading order',
    treatment: 'treatment',
    label: (run: string, y: string, residual: string) => `${run}: reading ${y}, residual ${residual}`,
    summary: (n: string) => `${n} residuals; ringed ones lie beyond what chance would make common.`,
    normalSummary: (level: string, draws: string) =>
      `Residuals in order against normal ones; the band holds ${level} of ${draws} simulated campaigns.`,
    tests: 'Checks',
    check: 'Check',
    result: 'Result',
    p: 'p',
    meaning: 'What it says',
    names: {
      outlier: 'Largest residual (Bonferroni)',
      normality: 'Normal residuals (Shapiro–Wilk)',
      slot: 'Slots differ (F)',
      slotTrend: 'Trend along the slots',
      sessionTrend: 'Drift over sessions',
      scatter: 'Scatter differs by treatment',
      nonadditivity: 'Offsets grow with level (Tukey, one df)'
    },
    fine: 'nothing to see',
    look: 'look',
    leverage: 'Leverage',
    cook: 'Cook’s distance',
    largest: 'The readings that weigh most',
    run: 'Run',
    reading: 'Reading',
    noPlot: 'Too many residuals for a list; the picture and the data package hold them all.'
  }
};
