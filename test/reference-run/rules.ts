/** How a field is compared. First rule that fits the path counts; `[]` stands for any position in a list. */
export interface Rule {
  path: RegExp;
  /** Relative to the file's value. */
  relative?: number;
  /** Absolute floor in units of `scale`. */
  absolute?: number;
  /** What the absolute floor is measured in: 1, the residual standard deviation, or that of the sessions. */
  scale?: 'one' | 'sigma' | 'session';
  /** Fields of the file that state its own error; the tolerance is at least that. */
  statedBy?: string[];
}

/** Rounding of sums of readings, as a share of the residual standard deviation. */
const ROUNDING = 1e-9;

/** Tolerances: the project's own, never wider than what the reference supports; the reason stands beside each exception. */
export const RULES: readonly Rule[] = [
  { path: /^design\./ },
  { path: /^efficiency\./, relative: 1e-9, absolute: 1e-12 },
  // Integrated to about 1e-12 there and here; the aim is absolute.
  { path: /^intra\.pairs\.pTukey/, absolute: 1e-8 },
  // The reference is quasi-Monte Carlo where correlations are not products: 1e-4, or the error it states.
  { path: /^intra\.dunnett\.p\[\]/, absolute: 1e-4, statedBy: ['pError', 'tolerance'] },
  // p falls by about 0.1 per unit there, so 1e-4 in p is 1e-3 in the critical value.
  { path: /^intra\.dunnett\.critical95$/, absolute: 1e-3, statedBy: ['critical95Tolerance'] },
  { path: /^intra\.dunnett\.(estimate|se|t)/, relative: 1e-9, absolute: ROUNDING, scale: 'sigma' },
  { path: /^intra\.dunnett\./, relative: 1e-9, absolute: 1e-9 },
  { path: /^intra\.diagnostics\.(residual|fitted)/, relative: 1e-8, absolute: 1e-8, scale: 'sigma' },
  { path: /^intra\.diagnostics\./, relative: 1e-8, absolute: 1e-8 },
  { path: /^intra\.outlier\./, relative: 1e-8 },
  // A difference of nearly equal means keeps the rounding of the means.
  { path: /^intra\.(pairs|means)\.(estimate|rawMean)/, relative: 1e-9, absolute: ROUNDING, scale: 'sigma' },
  { path: /^intra\.pairs\.t\[\]/, relative: 1e-9, absolute: ROUNDING },
  // Tails below 1e-300 are zero in the file.
  { path: /^intra\.(anova\..*\.p$|pairs\.p)/, relative: 1e-9, absolute: 1e-300 },
  { path: /^intra\./, relative: 1e-9 },
  // Other optimisers stop early: up to 3e-5 in the variances; on the boundary one of them stops at 1e-9.
  { path: /^reml\.varianceComponents\.(lme4Default|nlme)\.var/, relative: 1e-4, absolute: 1e-8, scale: 'session' },
  { path: /^reml\.varianceComponents\.(lme4Default|nlme)\.logLik/, relative: 1e-8, absolute: 1e-8 },
  { path: /^reml\.varianceComponents\.logLik/, relative: 1e-8 },
  { path: /^reml\.varianceComponents\./, relative: 1e-6 },
  { path: /^reml\..*\.estimate\[\]/, relative: 1e-7, absolute: 1e-7, scale: 'session' },
  { path: /^reml\..*\.(df\[\]|dfMin|dfMax|denDf)$/, relative: 1e-4 },
  { path: /^reml\.satterthwaite\.(means|pairs)\.(se\[\]|seMin|seMean|seMax)$/, relative: 1e-7 },
  { path: /^reml\..*\.(se\[\]|seMin|seMean|seMax|conditionalSd\[\])$/, relative: 1e-6 },
  { path: /^reml\..*\.t\[\]$/, relative: 1e-6, absolute: 1e-7 },
  { path: /^reml\..*\.pTukey\[\]$/, absolute: 1e-8 },
  { path: /^reml\..*\.p(\[\])?$/, relative: 1e-6, absolute: 1e-300 },
  { path: /^reml\.fTests\..*\.F$/, relative: 1e-6 },
  { path: /^reml\./ },
  { path: /^tests\.(durbin|skillingsMack|friedman)\./, relative: 1e-9, absolute: 1e-12 },
  { path: /^tests\.nonadditivity\./, relative: 1e-8, absolute: 1e-300 },
  { path: /^tests\.boxCox\.(lambda|ci95)/, relative: 1e-6, absolute: 1e-6 },
  { path: /^tests\.boxCox\./, relative: 1e-8, absolute: 1e-8 },
  // An approximation in itself (Royston).
  { path: /^tests\.shapiroWilk\./, relative: 1e-6 },
  { path: /^/ }
];

/** Fields that are input or describe the file. */
export const INPUT = [
  /^(schema|id|title|split|part|tags|source|generator|model|data)(\.|\[|$)/,
  /^tests\.\w+\.(definition|source|on)$/,
  /^design\.estimability\.note$/,
  /^(intra|reml)\.model$/,
  /^intra\.dunnett\.method$/
];

/** Fields that are not compared, each with its reason. */
export const SKIPPED: readonly { path: RegExp; reason: string }[] = [
  { path: /^checks(\.|$)/, reason: 'differences between two ways of computing inside the reference' },
  { path: /^published(\[|$)/, reason: 'free text; the same quantity is compared in its own field' },
  { path: /^intra\.pairs\.pTukeyR/, reason: 'kept by the reference to show an inaccurate tail; pTukey is compared' },
  { path: /^intra\.critical\.tukey95R$/, reason: 'likewise; tukey95 is compared' },
  {
    path: /^intra\.dunnett\.(pError|tolerance|critical95Tolerance)/,
    reason: 'errors of the reference itself; used as tolerance'
  },
  {
    path: /^reml\.varianceComponents\.nlme\.(relDiff|absDiff)/,
    reason: 'difference between two optimisers of the reference'
  }
];
