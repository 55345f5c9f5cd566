import type { report as en } from '../en/report.ts';

export const report: typeof en = {
  title: 'Bericht',
  file: 'bericht',
  save: 'Bericht speichern',
  saveHint: 'Eine HTML-Datei, die sich überall öffnen lässt und sonst nichts braucht.',
  print: 'Drucken oder als PDF speichern',
  printHint: 'A4 und Letter passen beide; das Papier wird im Druckfenster gewählt.',
  package: 'Datenpaket speichern',
  packageHint:
    'Eine ZIP-Datei: Messwerte, Belegungen, Plan und Ergebnisse als CSV, eine Beschreibung und Skripte für R und Python, die die Modelle noch einmal anpassen.',
  making: 'Wird zusammengestellt …',
  saved: (name) => `Gespeichert: ${name}`,
  failed: 'Das ließ sich nicht herstellen. Die Aufzeichnung ist nicht betroffen; noch einmal versuchen.',
  preview: 'So wird es gedruckt',
  subtitle: (measurand, date) => `${measurand}. Erstellt am ${date}.`,
  mark: 'Erfundene Beispieldaten: nichts in diesem Bericht wurde gemessen',
  question: 'Frage',
  answer: 'Antwort',
  pictureCaption: (level, model) =>
    `Bereinigte Mittelwerte (Strich) mit ${level}-Intervallen, ${model}; Kreise sind einfache Mittelwerte. Varianten mit gemeinsamem Buchstaben sind nicht zu unterscheiden.`,
  how: 'Wie sie gefunden wurde',
  howText: (runs, sessions, treatments, model) =>
    `${runs} zählende Läufe in ${sessions} Belegungen vergleichen ${treatments} Varianten. Unterschiede der Belegungen sind herausgenommen (${model}).`,
  interim: (done, planned) =>
    `Zwischenstand: ${done} von ${planned} geplanten Läufen zählen. Die Antwort kann noch umschlagen; wer ihretwegen aufhört, macht größere Fehler als angegeben.`,
  cautions: 'Zu bedenken',
  noCautions: 'Die Prüfungen fanden nichts zu bedenken.',
  plan: {
    title: 'Der Plan',
    issued: 'Herausgegeben',
    treatments: 'Varianten',
    control: 'Kontrolle',
    machines: 'Maschinen',
    slots: (n) => `${n} Plätze`,
    readings: 'Messungen',
    formula: 'Formel',
    constants: 'Konstanten',
    primary: 'Maßgebliche Auswertung, vor den Daten festgelegt',
    primaryText: (measurand, sessions, comparison, alpha) =>
      `${measurand}; ${sessions}; ${comparison}; Irrtumswahrscheinlichkeit ${alpha}`,
    comparison: { 'all-pairs': 'alle Paare', 'to-control': 'gegen die Kontrolle', 'to-best': 'gegen die beste' },
    design: 'Versuchsplan',
    balanced: 'ausgewogen, durch Zählen geprüft',
    notBalanced: 'nicht ausgewogen',
    seed: 'Startwert der Ladereihenfolge',
    chance: 'Wie der Zufall eingesetzt wurde',
    amendments: 'Nachträge',
    noAmendments: 'keine',
    amendment: (at, who, what, why) => `${at}, ${who}: ${what}. Begründung: ${why}`,
    changes: {
      'add-session': 'eine Belegung wurde hinzugefügt',
      'drop-session': 'eine Belegung wurde gestrichen',
      'slot-service': 'ein Platz wurde außer oder in Betrieb genommen',
      'replace-plan': 'der Plan wurde geändert'
    },
    precautions: 'Vorsichtsmaßnahmen',
    precautionsLead:
      'Es sind die der Kampagne. Die Verfahren des Labors, das Handbuch der Maschine und örtliche Vorschriften gehen vor.'
  },
  loading: {
    title: 'Ladereihenfolge',
    session: 'Belegung',
    shift: 'Schicht',
    machine: 'Maschine',
    slot: (name) => `Platz ${name}`,
    state: 'Stand',
    states: {
      waiting: 'steht aus',
      loading: 'wird geladen',
      running: 'läuft',
      reading: 'wird gemessen',
      closed: 'abgeschlossen',
      dropped: 'gestrichen'
    },
    repeats: (n) => `wiederholt ${n}`
  },
  readings: {
    title: 'Messwerte',
    lead: 'Jeder geltende Messwert, wie aufgezeichnet. Durchgestrichen: verworfen, zählt nicht. Berichtigungen und alle früheren Fassungen stehen im Datenpaket.',
    run: 'Lauf',
    specimen: 'Probe',
    treatment: 'Variante',
    who: 'Von',
    remark: 'Bemerkung',
    corrected: (n) => (n === 1 ? 'einmal berichtigt' : `${n}-mal berichtigt`),
    kept: (why) => `behalten: ${why}`,
    ruined: (why) => `verworfen: ${why}`,
    missing: (why) => `fehlt: ${why}`,
    paper: 'vom Papier',
    imported: 'aus einer Datei',
    tooMany: (n) => `${n} Läufe sind zu viele für Papier; das Datenpaket enthält alle.`,
    runName: (session, slot) => `${session}, Platz ${slot}`
  },
  analysis: 'Auswertung',
  method: 'Verfahren',
  deviations: 'Was nicht nach Plan lief',
  provenance: {
    title: 'Woher dies kommt',
    campaign: 'Kampagne',
    events: 'Ereignisse',
    file: 'Kampagnendatei',
    noFile: 'Für diesen Bericht wurde keine Kampagnendatei geschrieben.',
    devices: 'Geräte',
    device: (id, events) => `${id} (${events} Ereignisse)`,
    people: 'Personen',
    app: 'Programm',
    algorithm: 'Auswertung',
    made: 'Erstellt',
    flags: 'Bemerkungen zur Aufzeichnung',
    flagsNone: 'keine',
    chain:
      'Jedes Ereignis trägt die Prüfsumme des vorigen auf seinem Gerät: Lücken und Änderungen fallen auf. Namen ordnen die Aufzeichnung Personen zu; sie beweisen nicht, wer es war.'
  },
  limits: {
    title: 'Grenzen und Sicherheit',
    items: [
      'Ergebnisse helfen bei der Entscheidung, sie sind keine Zertifizierung.',
      'Ein Unterschied, der sich nicht zeigt, ist nicht als abwesend erwiesen.',
      'Intervalle und p-Werte gelten für das genannte Modell und die vor den Daten festgelegte Auswertung; andere dienen der Orientierung.',
      'Der Vergleich gilt für die Proben, Maschinen und Bedingungen dieser Kampagne.',
      'Die Arbeit an Maschinen folgt den Verfahren des Labors, dem Handbuch der Maschine und örtlichen Vorschriften; sie gehen allem vor, was hier gedruckt ist.'
    ]
  },
  footer: (title, app) => `${title}. Evenload ${app}.`,
  page: 'Die erste Seite antwortet; der Rest zeigt warum.'
};
