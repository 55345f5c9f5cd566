import type { MeanLine, PairLine } from '../../analysis/analysis-result.ts';
import { number, text, whole } from './fields.ts';
import type { PackagedResult } from './package-input.ts';
import type { Cell, Table } from './table.ts';

interface ModelBlock {
  model: 'fixed' | 'random';
  means: MeanLine[];
  pairs: PairLine[];
}

const blocks = ({ analysis }: PackagedResult): ModelBlock[] => [
  ...(analysis.fixed.ok
    ? [{ model: 'fixed' as const, means: analysis.fixed.value.means, pairs: analysis.fixed.value.pairs }]
    : []),
  ...(analysis.random.ok
    ? [
        {
          model: 'random' as const,
          means: analysis.random.value.kenwardRoger.means,
          pairs: analysis.random.value.kenwardRoger.pairs
        }
      ]
    : [])
];

const ids = (result: PackagedResult) => ({
  treatment: (i: number): string => result.input.treatments[i]?.id ?? String(i),
  session: (j: number): string => result.input.sessions[j]?.id ?? String(j)
});

/** Adjusted means under each model, plain averages beside. */
export const meansTable = (results: readonly PackagedResult[]): Table => ({
  name: 'result-means',
  path: 'results/means.csv',
  title: 'Adjusted means',
  primaryKey: ['measurand', 'model', 'treatment'],
  fields: [
    text('measurand', 'Measurand'),
    text('model', 'Sessions fixed or random (Kenward–Roger)'),
    text('treatment', 'Treatment'),
    whole('runs', 'Runs that count'),
    number('plain', 'Plain average'),
    number('adjusted', 'Adjusted mean'),
    number('se', 'Standard error'),
    number('df', 'Degrees of freedom'),
    number('lower', 'Lower end of the interval'),
    number('upper', 'Upper end of the interval'),
    whole('part', 'Connected part, counted from 1')
  ],
  rows: results.flatMap((result) =>
    blocks(result).flatMap(({ model, means }) =>
      means.map((m): Cell[] => [
        result.measurand.id,
        model,
        ids(result).treatment(m.treatment),
        m.n,
        m.plain,
        m.estimate,
        m.se,
        m.df,
        m.lower,
        m.upper,
        m.part === null ? null : m.part + 1
      ])
    )
  )
});

/** Differences of adjusted means, a − b. */
export const pairsTable = (results: readonly PackagedResult[]): Table => ({
  name: 'result-pairs',
  path: 'results/pairs.csv',
  title: 'Differences of adjusted means, a − b',
  primaryKey: ['measurand', 'model', 'a', 'b'],
  fields: [
    text('measurand', 'Measurand'),
    text('model', 'Sessions fixed or random (Kenward–Roger)'),
    text('a', 'Treatment a'),
    text('b', 'Treatment b'),
    number('difference', 'a − b'),
    number('se', 'Standard error'),
    number('df', 'Degrees of freedom'),
    number('p', 'p, unadjusted'),
    number('p_holm', 'p, Holm'),
    number('p_tukey', 'p, Tukey–Kramer'),
    number('lower_tukey', 'Lower end, simultaneous'),
    number('upper_tukey', 'Upper end, simultaneous')
  ],
  rows: results.flatMap((result) =>
    blocks(result).flatMap(({ model, pairs }) =>
      pairs.map((p): Cell[] => [
        result.measurand.id,
        model,
        ids(result).treatment(p.a),
        ids(result).treatment(p.b),
        p.estimate,
        p.se,
        p.df,
        p.p,
        p.pHolm,
        p.pTukey,
        p.lowerTukey,
        p.upperTukey
      ])
    )
  )
});

/** Analysis of variance in both orders, sessions fixed. */
export const anovaTable = (results: readonly PackagedResult[]): Table => ({
  name: 'result-anova',
  path: 'results/anova.csv',
  title: 'Analysis of variance, sessions fixed',
  primaryKey: ['measurand', 'source', 'order'],
  fields: [
    text('measurand', 'Measurand'),
    text('source', 'Source'),
    text('order', 'adjusted: after all others; unadjusted: alone'),
    whole('df', 'Degrees of freedom'),
    number('ss', 'Sum of squares'),
    number('ms', 'Mean square'),
    number('f', 'F'),
    number('p', 'p')
  ],
  rows: results.flatMap(({ measurand, analysis }) => {
    if (!analysis.fixed.ok) return [];
    const { sources, error, total } = analysis.fixed.value.anova;
    const line = (source: string, order: string, l: typeof error): Cell[] => [
      measurand.id,
      source,
      order,
      l.df,
      l.ss,
      l.ms,
      l.F,
      l.p
    ];
    return [
      ...sources.flatMap((s) => [line(s.source, 'adjusted', s.adjusted), line(s.source, 'unadjusted', s.unadjusted)]),
      line('error', '', error),
      line('total', '', total)
    ];
  })
});

/** Session offsets under both models. */
export const offsetsTable = (results: readonly PackagedResult[]): Table => ({
  name: 'result-sessions',
  path: 'results/session-offsets.csv',
  title: 'Session offsets',
  primaryKey: ['measurand', 'session'],
  fields: [
    text('measurand', 'Measurand'),
    text('session', 'Session'),
    number('fixed', 'Offset, sessions fixed'),
    number('random', 'Predicted offset, sessions random'),
    number('random_sd', 'Uncertainty of the prediction')
  ],
  rows: results.flatMap((result) => {
    const { fixed, random } = result.analysis;
    const effects = new Map(fixed.ok ? fixed.value.sessionEffects.map((s) => [s.session, s.effect]) : []);
    const predicted = new Map(random.ok ? random.value.sessions.map((s) => [s.session, s]) : []);
    return result.input.sessions.map((session, j): Cell[] => [
      result.measurand.id,
      session.id,
      effects.get(j) ?? null,
      predicted.get(j)?.estimate ?? null,
      predicted.get(j)?.sd ?? null
    ]);
  })
});

/** Variance components, sessions random. */
export const varianceTable = (results: readonly PackagedResult[]): Table => ({
  name: 'result-variance',
  path: 'results/variance.csv',
  title: 'Variances, sessions random',
  primaryKey: ['measurand'],
  fields: [
    text('measurand', 'Measurand'),
    number('session', 'Variance between sessions'),
    number('run', 'Variance between runs of a session'),
    number('log_likelihood', 'Restricted log-likelihood')
  ],
  rows: results.flatMap(({ measurand, analysis }): Cell[][] =>
    analysis.random.ok
      ? [
          [
            measurand.id,
            analysis.random.value.variance.session,
            analysis.random.value.variance.run,
            analysis.random.value.variance.logLik
          ]
        ]
      : []
  )
});

/** Residuals and influence, sessions fixed. */
export const diagnosticsTable = (results: readonly PackagedResult[]): Table => ({
  name: 'result-diagnostics',
  path: 'results/diagnostics.csv',
  title: 'Residuals and influence, sessions fixed',
  primaryKey: ['measurand', 'run'],
  fields: [
    text('measurand', 'Measurand'),
    text('run', 'Run'),
    number('fitted', 'Fitted value'),
    number('residual', 'Residual'),
    number('leverage', 'Leverage'),
    number('studentised', 'Externally studentised residual'),
    number('cook', 'Cook’s distance')
  ],
  rows: results.flatMap((result): Cell[][] =>
    result.analysis.diagnostics.ok
      ? result.analysis.diagnostics.value.rows.map((d) => [
          result.measurand.id,
          result.input.rows[d.row]?.runId ?? String(d.row),
          d.fitted,
          d.residual,
          d.leverage,
          d.studentized,
          d.cook
        ])
      : []
  )
});
