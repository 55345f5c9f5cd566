/** How a figure was computed: in words, as a formula, from which source. */
export interface HowText {
  words: string;
  formula: string;
  source: string;
}

export const how = {
  head: 'How this was computed',
  from: 'Source',
  means: {
    words:
      'Each mean is the prediction for that treatment in an average session. The session offsets are taken out by least squares, so only differences inside sessions count. The standard error is that of this prediction.',
    formula: 'y = μ + τᵢ + βⱼ + ε;  C τ̂ = Q;  mean = μ̂ + τ̂ᵢ + average of β̂ⱼ',
    source:
      'Cochran & Cox (1957), Experimental Designs, chapter 11; Montgomery, Design and Analysis of Experiments, section 4.4'
  },
  random: {
    words:
      'Session offsets are taken as drawn from a common normal distribution. The differences between session totals then carry information too. The two variances are estimated by restricted maximum likelihood; means by generalised least squares; errors and degrees of freedom allow for the variances being estimated.',
    formula: 'V = σ² I + σ_b² Z Zᵀ;  m̂ = (Xᵀ V⁻¹ X)⁻¹ Xᵀ V⁻¹ y',
    source: 'Patterson & Thompson (1971), Biometrika 58, 545; Kenward & Roger (1997), Biometrics 53, 983'
  },
  plain: {
    words:
      'The plain average of the readings of a treatment. It mixes the treatment with the sessions it happened to be in.',
    formula: 'sum of the readings / number of readings',
    source: 'definition'
  },
  letters: {
    words:
      'Two treatments that share a letter do not differ at the level of the plan, all pairs considered together. Not to differ is not to be equal.',
    formula: 'pairs by Tukey–Kramer; letters by insert and absorb',
    source: 'Piepho (2004), Journal of Computational and Graphical Statistics 13, 456'
  },
  tukey: {
    words: 'All pairs at once: the chance of even one false difference among all of them stays below the level.',
    formula: '|d| / SE ≥ q(1 − α; t, df) / √2',
    source: 'Tukey (1953); Kramer (1956), Biometrics 12, 307'
  },
  holm: {
    words:
      'Holds the chance of even one false difference below the level without assumptions on how the pairs hang together; a little less sharp for all pairs.',
    formula: 'p₍ᵢ₎ · (m − i + 1), made increasing',
    source: 'Holm (1979), Scandinavian Journal of Statistics 6, 65'
  },
  unadjusted: {
    words:
      'Each pair by itself. Right for one pair named before the first run; among many pairs some will look different by chance alone.',
    formula: '|d| / SE against Student’s t',
    source: 'Student (1908)'
  },
  dunnett: {
    words:
      'Every treatment against the control, and only that. The chance of even one false difference to the control stays below the level.',
    formula: '|dᵢ| / SEᵢ ≥ the two-sided quantile of the joint t distribution',
    source: 'Dunnett (1955), Journal of the American Statistical Association 50, 1096'
  },
  hsu: {
    words:
      'Every treatment against the best of the others. An interval that stays on the wrong side of zero rules the treatment out as the best.',
    formula: 'constrained intervals for μᵢ − max(j ≠ i) μⱼ',
    source: 'Hsu (1996), Multiple Comparisons, chapter 4'
  },
  equivalence: {
    words:
      'Two one-sided tests show that a treatment differs from the control by less than the margin of the plan. Only this can show equality; a large p-value of a difference cannot.',
    formula: 'the 1 − 2α interval lies inside −margin to +margin',
    source: 'Schuirmann (1987), Journal of Pharmacokinetics and Biopharmaceutics 15, 657'
  },
  contrasts: {
    words: 'The questions typed in the plan: a weighted sum of the adjusted means.',
    formula: 'Σ wᵢ mᵢ;  SE from the same covariance as the means',
    source: 'any text on linear models'
  },
  sessions: {
    words:
      'How far each session lay above or below the average session, freed of the treatments it held. With sessions random the offsets are drawn in towards zero by how uncertain they are.',
    formula: 'β̂ = diag(1/k)(B − Nᵀ m̂);  random: best linear unbiased prediction',
    source: 'Henderson (1975), Biometrics 31, 423'
  },
  workings: {
    words:
      'The handbook’s way, to be followed with a calculator: each treatment total less the totals of its sessions, spread over their runs.',
    formula: 'balanced: Qᵢ = k Tᵢ − B₍ᵢ₎ and τ̂ᵢ = Qᵢ / (λ t);  else: Qᵢ = Tᵢ − Σ session means, C τ̂ = Q',
    source: 'Montgomery, Design and Analysis of Experiments, section 4.4; Yates (1936)'
  },
  anova: {
    words:
      'The sum of squares is divided in both orders. Treatments adjusted for sessions answer the question; sessions adjusted for treatments say whether sessions differ.',
    formula: 'adjusted: fall in the error sum of squares when the source joins last',
    source: 'Montgomery, Design and Analysis of Experiments, table 4.23 and its text'
  },
  variance: {
    words: 'How much of the scatter of one reading comes from its session, how much from the run.',
    formula: 'share = σ_b² / (σ² + σ_b²);  test of no session variance: half of a chi-square on 1',
    source: 'Self & Liang (1987), Journal of the American Statistical Association 82, 605'
  },
  efficiency: {
    words:
      'The share of information about treatments that is left after sessions are taken out; 100 % would be sessions that hold every treatment.',
    formula: 'harmonic mean of the non-zero eigenvalues of R^(−1/2) C R^(−1/2)',
    source: 'John & Williams (1995), Cyclic and Computer Generated Designs, chapter 2'
  },
  residuals: {
    words:
      'What is left of each reading when its treatment and its session are taken out, divided by its own standard error from a fit without it.',
    formula: 'eᵢ / (s₍ᵢ₎ √(1 − hᵢᵢ))',
    source: 'Cook & Weisberg (1982), Residuals and Influence in Regression, chapter 2'
  },
  normal: {
    words:
      'Residuals in order against what normal residuals would be. The band holds what simulated normal readings of this very design gave.',
    formula: 'simulated envelope, seed and number of draws recorded',
    source: 'Atkinson (1981), Biometrika 68, 13'
  },
  ruined: {
    words:
      'The analysis once as it counts, without the ruined runs, and once with their readings taken at face value. A large change says that the verdict hangs on the decision to leave them out.',
    formula: 'change = mean without − mean with',
    source: 'common practice, no source'
  },
  repair: {
    words:
      'Each proposal is judged by the average variance of a treatment difference after it, against the plan. The extra session is the best that can be made of specimens that are left.',
    formula: 'A = 2 trace(C⁺) / (t − 1), updated for each added run',
    source: 'John & Williams (1995), chapter 2; Sherman & Morrison (1950)'
  },
  ranks: {
    words:
      'Readings are replaced by their rank inside the session; the tests ask whether rank sums differ more than chance would make them.',
    formula: 'Durbin: T₂ on t − 1 and bk − b − t + 1;  Skillings–Mack: Aᵀ Σ⁻ A',
    source:
      'Conover (1999), Practical Nonparametric Statistics, section 5.9; Skillings & Mack (1981), Technometrics 23, 171'
  },
  scale: {
    words:
      'The likelihood of the readings on each power scale. A value inside the interval is as good as the best; 1 is the scale as read, 0 the logarithm.',
    formula: 'y → (y^λ − 1) / (λ ẏ^(λ−1)), profile likelihood of λ',
    source: 'Box & Cox (1964), Journal of the Royal Statistical Society B 26, 211'
  },
  limits: {
    words:
      'Readings that stopped at a limit count as “at least” or “at most” this much. Means by maximum likelihood of a normal model with sessions.',
    formula: 'L = Π φ((y − m)/σ)/σ · Π Φ(±(limit − m)/σ)',
    source: 'Tobin (1958), Econometrica 26, 24'
  }
} satisfies Record<string, HowText | string>;
