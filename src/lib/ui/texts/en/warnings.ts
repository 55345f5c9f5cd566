import { pIs } from '../p-value.ts';

const comparisons = (n: string): string => (n === '1' ? 'one comparison' : `${n} comparisons`);

/** Each warning: what was seen, and what to do. Numbers arrive written. */
export const warnings = {
  parts: (parts: string) => ({
    said: `The sessions fall into ${parts} groups without a treatment in common, so the groups cannot be compared.`,
    act: 'Read the groups apart, and add the joining session named under Repair.'
  }),
  lostPairs: (pairs: string) => ({
    said: `${pairs} comparisons that the plan allowed are lost.`,
    act: 'See Repair: one extra session can bring them back.'
  }),
  unread: (names: string) => ({
    said: `No reading that counts: ${names}.`,
    act: 'Record these treatments, or say in the report why they are missing.'
  }),
  fewDf: (df: string) => ({
    said: `Only ${df} degrees of freedom judge the chance scatter, so intervals are wide and uncertain.`,
    act: 'Further sessions are the remedy. Do not read small differences as findings.'
  }),
  varianceZero: () => ({
    said: 'Sessions differ by no more than chance would make them: their variance was estimated as zero.',
    act: 'Nothing to mend. With sessions random the result is then close to plain averages; keep to the analysis fixed in the plan.'
  }),
  outlier: (run: string, p: string) => ({
    said: `One reading stands out: ${run} (${pIs(p)}, allowing for the number of readings).`,
    act: 'Look up its notes and the raw entry. Strike it out only for a cause found, never because it stands out.'
  }),
  slots: (p: string, inModel: boolean) => ({
    said: `Slots differ (${pIs(p)}).`,
    act: inModel
      ? 'The model already allows for slots. Have the machine looked at.'
      : 'Have the machine looked at, and consider an amendment that takes slots into the model.'
  }),
  trend: (p: string) => ({
    said: `Session offsets drift with time (${pIs(p)}).`,
    act: 'Comparisons within sessions are not affected. Look for wear, warm-up or a changing consumable.'
  }),
  scatter: (p: string) => ({
    said: `Treatments scatter differently (${pIs(p)}).`,
    act: 'A common error is then too small for some and too large for others. See Power scale; a logarithm often helps.'
  }),
  nonadditive: (p: string) => ({
    said: `Session offsets grow or shrink with the level of the treatments (${pIs(p)}).`,
    act: 'See Power scale: on a fitting scale offsets simply add.'
  }),
  scale: (lambda: string, p: string) => ({
    said: `Another scale (power ${lambda}) fits the readings better than the one as read (${pIs(p)}).`,
    act: 'Compare the verdicts under Power scale. If they agree, stay with the scale as read.'
  }),
  notNormal: (p: string) => ({
    said: `The residuals do not look normal (${pIs(p)}).`,
    act: 'See the normal plot. Differences of means are robust to mild departures; single odd readings are not.'
  }),
  ruinAssociated: (p: string) => ({
    said: `Ruin falls unevenly on the treatments (${pIs(p)}), so what is missing may not be missing by chance.`,
    act: 'Compare with and without under Ruined runs, and name the cause in the report.'
  }),
  verdictTurns: (pairs: string) => ({
    said: `With the ruined readings taken at face value, ${comparisons(pairs)} would turn.`,
    act: 'See Ruined runs. The verdict hangs on leaving them out: say why in the report.'
  }),
  limits: (runs: string) => ({
    said: `${runs} readings stopped at a limit and are taken here as if the limit were the value.`,
    act: 'See Readings at a limit for the analysis that allows for it.'
  }),
  disagree: (pairs: string) => ({
    said: `The two ways to treat sessions give different verdicts for ${comparisons(pairs)}.`,
    act: 'The analysis fixed in the plan counts; report the other beside it.'
  }),
  single: (sessions: string) => ({
    said: `Only one reading counts in session ${sessions}; with sessions fixed it says nothing about treatments.`,
    act: 'Run the lost runs again if specimens are left.'
  }),
  factorOut: (factor: string, why: string) => ({
    said: `The ${factor} was left out of the model. ${why}`,
    act: 'The treatments are not affected by this unless it really makes a difference; say so in the report.'
  }),
  factors: {
    treatment: 'treatment',
    session: 'session',
    slot: 'slot',
    machine: 'machine',
    shift: 'shift',
    covariate: 'specimen property'
  } as Record<string, string>
};
