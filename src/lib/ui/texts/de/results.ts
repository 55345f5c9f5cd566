import type { results as en } from '../en/results.ts';

export const results: typeof en = {
  title: 'Ergebnis',
  heading: (campaign) => `Ergebnis: ${campaign}`,
  waiting: 'Es wird gerechnet …',
  waitingFor: (seconds) =>
    `Es wird gerechnet, bisher ${seconds} s. Sie können weiterarbeiten; der Bildschirm bleibt frei.`,
  stages: {
    design: 'Zählen, was vom Plan geblieben ist',
    limits: 'Messwerte an der Grenze berücksichtigen',
    ranks: 'Ränge',
    answer: 'Die Antwort',
    start: 'Die Aufzeichnung lesen',
    fixed: 'Für Belegungen bereinigen',
    random: 'Die Varianz der Belegungen schätzen',
    comparisons: 'Die Varianten vergleichen',
    diagnostics: 'Die Residuen ansehen',
    ruined: 'Mit und ohne die verworfenen Läufe'
  },
  cancel: 'Rechnung abbrechen',
  cancelled: 'Die Rechnung wurde abgebrochen. Die Aufzeichnung ist nicht betroffen.',
  again: 'Neu rechnen',
  failed:
    'Die Rechnung brach ab. Die Aufzeichnung ist nicht betroffen; neu rechnen und die Meldung unten für die Person aufheben, die das Programm betreut.',
  noPlan:
    'Diese Kampagne hat noch keinen herausgegebenen Plan, es gibt also nichts zu vergleichen. Zuerst den Plan herausgeben.',
  toBench: 'Zum Prüfstand',
  toDesk: 'Eine Datei einlesen',
  question: 'Frage',
  demo: 'erfundene Beispieldaten',
  measurand: 'Messgröße',
  primary: 'maßgeblich',
  primaryLong: 'maßgebliche Auswertung, im Plan festgelegt',
  level: (level) => `${level}-Intervall`,
  contents: 'Darunter',
  contentsHint: 'Jede Schicht sagt ihren Befund in einer Zeile; zum Aufklappen für die Zahlen.',
  open: 'Öffnen',
  looks: 'Zuerst ansehen',
  nothingToLook: 'Keine Warnung: die Prüfungen fanden nichts, was man ansehen müsste.',
  todo: 'Zu tun',
  picture: (what) => `Bereinigte Mittelwerte: ${what}`,
  pictureSummary: (level, what, first, last) =>
    `Bereinigte Mittelwerte von ${what} mit ${level}-Intervallen, die beste zuerst: von ${first} bis ${last}. Einfache Mittelwerte daneben, Buchstaben rechts.`,
  legend: {
    estimate: 'bereinigter Mittelwert',
    interval: (level) => `${level}-Intervall`,
    plain: 'einfacher Mittelwert',
    letters: 'gemeinsamer Buchstabe: nicht zu unterscheiden'
  },
  letters: 'Buchstaben',
  pointLabel: (name, mean, lower, upper, plain) =>
    `${name}: bereinigter Mittelwert ${mean}, Intervall ${lower} bis ${upper}; einfacher Mittelwert ${plain}`,
  pointLabelBare: (name, mean) => `${name}: ${mean}`,
  table: {
    caption: (what, unit) => `${what}${unit ? `, ${unit}` : ''}: jede Variante, die beste zuerst`,
    treatment: 'Variante',
    control: 'Kontrolle',
    adjusted: 'Bereinigtes Mittel',
    se: 'Standardfehler',
    interval: (level) => `${level}-Intervall`,
    letters: 'Buchstaben',
    plain: 'Einfaches Mittel',
    runs: 'Zählende Läufe',
    shift: 'Bereinigt − einfach',
    part: 'Gruppe',
    none: 'kein Messwert'
  },
  models: {
    title: 'Belegungen fest und zufällig',
    finding: (agree) =>
      agree
        ? 'Beide Arten, Belegungen zu behandeln, führen zur selben Reihenfolge.'
        : 'Die beiden Arten, Belegungen zu behandeln, ordnen die Mittelwerte verschieden.',
    absent: 'Hier ist nur eine der beiden Auswertungen möglich.',
    fixed: 'Belegungen fest',
    random: 'Belegungen zufällig',
    fixedWhy:
      'Vergleicht nur innerhalb der Belegungen. Braucht keine Annahme darüber, wie Belegungen schwanken; die sichere Wahl.',
    randomWhy:
      'Nutzt auch die Belegungssummen, als wären die Belegungen zufällig aus vielen gezogen. Schärfer, wenn Belegungen sich wenig unterscheiden.',
    df: 'Freiheitsgrade',
    caption: 'Bereinigte Mittelwerte auf beide Arten'
  },
  several: {
    title: 'Mehrere Messgrößen',
    caption: 'Jede Variante nach jeder Messgröße',
    order: (first) => `Die beste zuerst nach: ${first}.`,
    alone:
      'Jede Messgröße wurde für sich ausgewertet: Buchstaben und Ränge gelten in ihren eigenen Spalten, keine Messgröße wurde gegen eine andere gewichtet.',
    agree: (n, name) => `${n} Messgrößen; ${name} hat in jeder das beste bereinigte Mittel.`,
    disagree: (n) => `${n} Messgrößen; sie setzen nicht dieselbe Variante an die erste Stelle.`,
    each: (n) => `${n} Messgrößen; jede hat ihre eigene Antwort.`,
    computing: (known, all) => `Bisher gerechnet: ${known} von ${all} Messgrößen.`,
    mean: 'Bereinigtes Mittel',
    letters: 'Buchstaben',
    rank: 'Rang',
    better: {
      lower: 'niedriger ist besser',
      higher: 'höher ist besser',
      target: (value) => `am nächsten an ${value} ist am besten`
    },
    full: 'Ganzes Ergebnis',
    fullOf: (what) => `Ganzes Ergebnis: ${what}`,
    shown: 'auf dieser Seite gezeigt',
    note: (what, why) => `${what}: ${why}`
  },
  runName: (treatment, session, slot) => `${treatment}, ${session}${slot === null ? '' : `, Platz ${slot}`}`,
  session: (number) => `Belegung ${number}`,
  noneOpen: 'Keine Kampagne ist geöffnet.',
  formulaFault:
    'Die Formel dieser Messgröße lässt sich nicht verwenden. Siehe Plan; die Messwerte sind nicht betroffen.',
  newRecord: 'Seit dieser Rechnung sind neue Messwerte eingegangen.',
  stale: 'Mit ihnen rechnen',
  took: (seconds) => `In ${seconds} s auf diesem Gerät gerechnet.`,
  save: 'Mitnehmen',
  report: 'Bericht',
  package: 'Datenpaket',
  decision:
    'Ergebnisse helfen bei der Entscheidung, sie sind keine Zertifizierung. Die Verfahren des Labors und örtliche Vorschriften gehen vor.'
};
