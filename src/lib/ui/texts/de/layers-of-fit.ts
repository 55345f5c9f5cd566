import { pIs } from '../p-value.ts';
import type { layersOfFit as en } from '../en/layers-of-fit.ts';

export const layersOfFit: typeof en = {
  comparisons: {
    title: 'Vergleiche',
    finding: (different, total) =>
      `${different} von ${total} Paaren unterscheiden sich, alle Paare zusammen betrachtet.`,
    method: 'Verfahren',
    model: 'Belegungen',
    methods: {
      tukey: { name: 'Alle Paare (Tukey–Kramer)', when: 'Richtig, wenn jedes Paar zählt, und für die Buchstaben.' },
      holm: {
        name: 'Alle Paare (Holm)',
        when: 'Richtig, wenn von vielen Paaren wenige zählen und sonst nichts angenommen wird.'
      },
      none: {
        name: 'Einzelnes Paar, nicht angepasst',
        when: 'Richtig nur für ein Paar, das vor dem ersten Lauf benannt war.'
      },
      dunnett: {
        name: 'Gegen die Kontrolle (Dunnett)',
        when: 'Richtig, wenn nur Unterschiede zur Kontrolle zählen; schärfer als alle Paare.'
      },
      hsu: {
        name: 'Gegen die beste (Hsu)',
        when: 'Richtig, wenn gefragt ist, welche Varianten die beste sein können.'
      },
      equivalence: {
        name: 'Gleichwertig mit der Kontrolle',
        when: 'Richtig, wenn gezeigt werden soll, dass eine Variante so gut ist wie die Kontrolle.'
      },
      contrasts: {
        name: 'Im Plan eingegebene Fragen',
        when: 'Richtig für den Vergleich von Gruppen oder einen Verlauf, vor den Daten benannt.'
      }
    },
    planned: 'im Plan festgelegt',
    pair: 'Paar',
    difference: 'Unterschied',
    se: 'Standardfehler',
    interval: (level) => `${level}-Intervall`,
    p: 'p',
    verdict: 'Urteil',
    differs: 'verschieden',
    same: 'nicht zu unterscheiden',
    lost: 'nicht vergleichbar',
    mayBeBest: 'kann die beste sein',
    notBest: 'nicht die beste',
    isBest: 'die beste',
    equivalent: 'gleichwertig',
    notEquivalent: 'Gleichwertigkeit nicht gezeigt',
    picture: (method) => `Unterschiede: ${method}`,
    pictureSummary: (n) =>
      `${n} Unterschiede mit Intervallen um null; ein Intervall ohne die Null zeigt einen Unterschied.`,
    bandSummary: (margin) => `Das Band zeigt die Grenze von ${margin}.`,
    label: (pair, d, lower, upper, verdict) => `${pair}: ${d}, Intervall ${lower} bis ${upper}; ${verdict}`,
    versus: (a, b) => `${a} − ${b}`,
    focus: 'Paare zeigen von',
    all: 'allen Varianten',
    many: (shown, total) => `${shown} von ${total} Paaren stehen hier. Eine Variante wählen, um ihre Paare zu sehen.`,
    matrix: 'Alle Paare auf einen Blick',
    accuracy: (error) => `p auf ${error} genau (mit angegebenem Fehler simuliert)`,
    contrast: 'Frage',
    estimate: 'Schätzwert',
    unadjustedInterval:
      'Dieses Verfahren passt p an, kennt aber kein gemeinsames Intervall; gezeigt sind Intervalle einzelner Paare.'
  },
  sessions: {
    title: 'Belegungen',
    finding: (spread, trend) => `Die Belegungen lagen zwischen ${spread} von ihrem Durchschnitt. ${trend}`,
    spread: (low, high) => `${low} und ${high}`,
    drift: (slope, p) => `Sie laufen um ${slope} je Belegung davon (${pIs(p)}).`,
    noDrift: (p) => `Eine Drift zeigt sich nicht (${pIs(p)}).`,
    noTest: '',
    picture: 'Abweichungen der Belegungen in Ladereihenfolge',
    pictureSummary: 'Wie weit jede Belegung von der durchschnittlichen lag, in der Reihenfolge, in der sie liefen.',
    x: 'Belegung, in Ladereihenfolge',
    y: (unit) => `Abweichung${unit ? `, ${unit}` : ''}`,
    label: (name, fixed, random) => `${name}: Abweichung ${fixed}; mit zufälligen Belegungen eingezogen auf ${random}`,
    number: 'Belegung',
    shift: 'Schicht',
    total: 'Summe der Messwerte',
    size: 'Zählende Läufe',
    fixed: 'Abweichung, fest',
    random: 'Abweichung, zufällig',
    sd: 'deren Unsicherheit',
    legendFixed: 'Belegungen fest',
    legendRandom: 'Belegungen zufällig'
  },
  workings: {
    title: 'Rechengang',
    finding: (sum) =>
      `Die Effekte ergeben zusammen ${sum}: jeder Schritt der Bereinigung, mit dem Taschenrechner nachzugehen.`,
    treatment: 'Variante',
    T: 'Summe T',
    B: 'Belegungssummen B',
    kQ: 'kQ = kT − B',
    means: 'Belegungsmittel',
    Q: 'Q = T − Belegungsmittel',
    effect: 'Effekt',
    sum: 'Summe',
    balanced: (t, k, r, lambda) =>
      `Ausgewogen: t = ${t} Varianten, k = ${k} je Belegung, r = ${r} Läufe je Variante, jedes Paar λ = ${lambda}-mal zusammen. Effekt = kQ / (λt).`,
    unbalanced: 'Nicht ausgewogen: die Effekte lösen C τ̂ = Q gemeinsam; die Tabelle zeigt Q und die Lösung.',
    further:
      'Weitere Ursachen (Platz, Maschine, Schicht oder eine Probeneigenschaft) stehen im Modell, die Effekte folgen also nicht aus Q allein.',
    sessions: 'Belegungssummen',
    session: 'Belegung',
    total: 'Summe',
    size: 'Läufe'
  },
  precision: {
    title: 'Streuung und Wirkungsgrad',
    finding: (sigma, sed) =>
      `Läufe streuen innerhalb einer Belegung um ${sigma}; ein Unterschied hat im Mittel den Standardfehler ${sed}.`,
    anova: 'Varianzanalyse',
    source: 'Ursache',
    df: 'FG',
    ss: 'Quadratsumme',
    ms: 'Mittleres Quadrat',
    F: 'F',
    p: 'p',
    order: { adjusted: 'bereinigt', unadjusted: 'nicht bereinigt' },
    sources: {
      treatment: 'Varianten',
      session: 'Belegungen',
      slot: 'Plätze',
      machine: 'Maschinen',
      shift: 'Schichten',
      covariate: 'Probeneigenschaft'
    },
    error: 'Fehler',
    total: 'Gesamt',
    variance: 'Varianzen, Belegungen zufällig',
    between: 'zwischen Belegungen',
    within: 'zwischen Läufen einer Belegung',
    sd: 'Standardabweichung',
    share: 'Anteil',
    test: (p) => `Test auf fehlende Belegungsvarianz: ${pIs(p)}.`,
    zero: 'Die Belegungsvarianz wurde mit null geschätzt: die Belegungen unterschieden sich nicht mehr, als der Zufall es täte.',
    design: 'Der Plan, der geblieben ist',
    planned: 'Wie geplant',
    kept: 'Zählende Läufe',
    runs: 'Läufe',
    sessionsN: 'Belegungen',
    replication: 'Läufe je Variante',
    meetings: 'Treffen eines Paars',
    balanced: 'Ausgewogen',
    yes: 'ja',
    no: 'nein',
    efficiency: 'Wirkungsgrad',
    seDifference: 'Standardfehler eines Unterschieds, im Mittel (kleinster bis größter)',
    range: (low, high) => (low === high ? low : `${low} bis ${high}`)
  },
  diagnostics: {
    title: 'Prüfung der Annahmen',
    finding: (n) =>
      n === 0
        ? 'Die Residuen geben keinen Anlass zur Sorge.'
        : n === 1
          ? 'Eine Prüfung verlangt einen Blick.'
          : `${n} Prüfungen verlangen einen Blick.`,
    residual: 'studentisiertes Residuum',
    fitted: 'angepasster Wert',
    byFitted: 'Residuen gegen angepasste Werte',
    bySession: 'Residuen in der Folge der Belegungen',
    bySlot: 'Residuen nach Platz',
    byTreatment: 'Residuen nach Variante',
    normal: 'Normalplot mit Hülle',
    theoretical: 'bei Normalverteilung zu erwarten',
    slot: 'Platz',
    session: 'Belegung, in Ladereihenfolge',
    treatment: 'Variante',
    label: (run, y, residual) => `${run}: Messwert ${y}, Residuum ${residual}`,
    summary: (n) => `${n} Residuen; die umringten liegen weiter außen, als es durch Zufall oft vorkommt.`,
    normalSummary: (level, draws) =>
      `Geordnete Residuen gegen normalverteilte; das Band umfasst ${level} von ${draws} simulierten Kampagnen.`,
    tests: 'Prüfungen',
    check: 'Prüfung',
    result: 'Ergebnis',
    p: 'p',
    meaning: 'Was es sagt',
    names: {
      outlier: 'Größtes Residuum (Bonferroni)',
      normality: 'Normale Residuen (Shapiro–Wilk)',
      slot: 'Plätze unterscheiden sich (F)',
      slotTrend: 'Verlauf entlang der Plätze',
      sessionTrend: 'Drift über die Belegungen',
      scatter: 'Streuung je Variante verschieden',
      nonadditivity: 'Abweichungen wachsen mit der Höhe (Tukey, ein FG)'
    },
    fine: 'nichts zu sehen',
    look: 'ansehen',
    leverage: 'Hebel',
    cook: 'Cook-Abstand',
    largest: 'Die Messwerte mit dem größten Gewicht',
    run: 'Lauf',
    reading: 'Messwert',
    noPlot: 'Zu viele Residuen für eine Liste; Bild und Datenpaket enthalten alle.'
  }
};
